import { type InfiniteData, useQueryClient } from '@tanstack/react-query'
import { jobStageNames, type JobStage } from '../../../shared/jobs/job-stage.ts'
import type { Board, JobCard } from '../../../shared/jobs/job-views.ts'
import { stageDrop } from '../../../shared/jobs/stage-drop.ts'
import { failureText } from '../../lib/failure-text.ts'
import { useSession } from '../../lib/session.ts'
import { useToast } from '../../ui/toast.tsx'
import { jobQueries, useSetFactOf } from './job-queries.ts'

type Pages = InfiniteData<Board>

/** The board as it will be, so that a card stays where it was dropped while the server decides. */
function withStage(data: Pages, card: JobCard, stage: JobStage): Pages {
  return {
    ...data,
    pages: data.pages.map((page) => ({
      ...page,
      counts: {
        ...page.counts,
        [card.stage]: page.counts[card.stage] - 1,
        [stage]: page.counts[stage] + 1,
      },
      jobs: page.jobs.map((one) => (one.id === card.id ? { ...one, stage } : one)),
    })),
  }
}

/** A card dropped on another stage: the fact that puts it there is set today, and Undo takes it back. */
export function useStageDrop() {
  const client = useQueryClient()
  const toast = useToast()
  const { today } = useSession().firm
  const setFact = useSetFactOf()
  const boards = { queryKey: [...jobQueries.all(), 'board'] }

  const failed = (error: unknown) => {
    toast(failureText(error) ?? 'That was not saved. Try again.', { kind: 'stop' })
    void client.invalidateQueries(boards)
  }

  return (card: JobCard, to: JobStage) => {
    const drop = stageDrop(card.stage, to, today)
    if (drop === null || setFact.isPending) return
    if ('refused' in drop) {
      toast(drop.refused, { kind: 'stop' })
      return
    }
    const { fact, on, said } = drop
    client.setQueriesData<Pages>(boards, (data) => (data ? withStage(data, card, to) : data))
    setFact.mutate(
      { jobId: card.id, version: card.version, fact, on },
      {
        onSuccess: (job) => {
          const where = job.stage === to ? '' : ` It is ${jobStageNames[job.stage].toLowerCase()}.`
          const before = card.facts?.[fact] ?? null
          toast(`${card.number}: ${said.toLowerCase()}.${where}`, {
            undo: () =>
              setFact.mutate(
                { jobId: card.id, version: job.version, fact, on: before },
                { onError: failed },
              ),
          })
        },
        onError: failed,
      },
    )
  }
}
