import { useInfiniteQuery } from '@tanstack/react-query'
import { Plus } from 'lucide-react'
import { Link } from 'react-router-dom'
import { type JobStage, jobStageNames, jobStages } from '../../../shared/jobs/job-stage.ts'
import type { Board, JobCard as JobCardData } from '../../../shared/jobs/job-views.ts'
import { failureText } from '../../lib/failure-text.ts'
import { useMay } from '../../lib/session.ts'
import { useSettled } from '../../lib/use-settled.ts'
import { Button, buttonClass } from '../../ui/button.tsx'
import { PageHeader } from '../../ui/page-header.tsx'
import { Segmented } from '../../ui/segmented.tsx'
import { Skeleton } from '../../ui/skeleton.tsx'
import { EmptyState, ErrorState } from '../../ui/states.tsx'
import { type BoardView, useBoardAddress } from './board-address.ts'
import { BoardColumns } from './board-columns.tsx'
import { BoardFilters } from './board-filters.tsx'
import { BoardTable } from './board-table.tsx'
import { FirstSteps } from './first-steps.tsx'
import { JobCard } from './job-card.tsx'
import { jobQueries } from './job-queries.ts'

const settleMs = 200
const boardViews: readonly { value: BoardView; label: string }[] = [
  { value: 'stages', label: 'Stages' },
  { value: 'table', label: 'Table' },
]

function BoardSkeleton() {
  return (
    <div role="status" aria-label="Loading the board" className="gap-2 max-lg:space-y-3 lg:flex">
      {jobStages.map((stage) => (
        <div key={stage} className="space-y-2 lg:w-36 lg:grow">
          <Skeleton className="h-8 w-full" />
          <Skeleton className="h-28" />
          <Skeleton className="h-28 max-lg:hidden" />
        </div>
      ))}
    </div>
  )
}

function NewJobLink() {
  return (
    <Link to="/jobs/new" className={buttonClass()}>
      <Plus size={20} aria-hidden />
      New job
    </Link>
  )
}

function NoJobs({ isFiltered, hasCrews }: { isFiltered: boolean; hasCrews: boolean }) {
  const mayWrite = useMay('job:write')
  if (isFiltered) {
    return (
      <EmptyState title="No job fits">Try fewer words, another stage or another crew.</EmptyState>
    )
  }
  return mayWrite ? (
    <FirstSteps hasCrews={hasCrews} />
  ) : (
    <EmptyState title="No jobs for your crew">
      What your crew is booked on shows here, two weeks back and four ahead.
    </EmptyState>
  )
}

type StageListProps = { stage: JobStage; board: Board; more: (() => void) | null; busy: boolean }

function StageList({ stage, board, more, busy }: StageListProps) {
  return (
    <section>
      <h2 className="mb-2 text-lg font-extrabold">
        {jobStageNames[stage]}{' '}
        <span className="font-semibold tabular-nums text-ink-soft">{board.counts[stage]}</span>
      </h2>
      <ul className="grid gap-3 sm:grid-cols-2 lg:grid-cols-3 xl:grid-cols-4">
        {board.jobs.map((card) => (
          <li key={card.id}>
            <JobCard card={card} />
          </li>
        ))}
      </ul>
      {more ? (
        <Button kind="plain" className="mt-4 w-full sm:w-auto" busy={busy} onClick={more}>
          Show more
        </Button>
      ) : null}
    </section>
  )
}

type TableProps = {
  cards: JobCardData[]
  sort: string
  onSort: (sort: string) => void
  /** Not all jobs of every stage are there yet. */
  isPart: boolean
  more: (() => void) | null
  busy: boolean
}

function TableOfJobs({ isPart, more, busy, ...table }: TableProps) {
  return (
    <>
      {isPart ? (
        <p className="mb-2 text-ink-soft">
          The first jobs of each stage. Show more, or choose a stage, to sort through them all.
        </p>
      ) : null}
      <BoardTable {...table} />
      {more ? (
        <Button kind="plain" className="mt-4 w-full sm:w-auto" busy={busy} onClick={more}>
          Show more
        </Button>
      ) : null}
    </>
  )
}

/** Jobs by stage. */
export function BoardPage() {
  const { filter, view, sort, change, isFiltered } = useBoardAddress()
  const q = useSettled(filter.q, settleMs)
  const asked = { ...filter, q }
  const query = useInfiniteQuery(jobQueries.board(asked))
  const mayWrite = useMay('job:write')
  const first = query.data?.pages[0]

  const body = () => {
    if (query.isError && !first) {
      const message = failureText(query.error) ?? 'The board could not be loaded.'
      return <ErrorState message={message} onRetry={() => void query.refetch()} />
    }
    if (!first) return <BoardSkeleton />
    const jobs = query.data?.pages.flatMap((page) => page.jobs) ?? []
    if (jobs.length === 0)
      return <NoJobs isFiltered={isFiltered} hasCrews={first.crews.length > 0} />
    const { stage } = filter
    if (view === 'table')
      return (
        <TableOfJobs
          cards={stage ? jobs.filter((card) => card.stage === stage) : jobs}
          sort={sort}
          onSort={(next) => change({ sort: next })}
          isPart={stage === null && first.nextOffset !== null}
          more={query.hasNextPage ? () => void query.fetchNextPage() : null}
          busy={query.isFetchingNextPage}
        />
      )
    if (!stage)
      return <BoardColumns board={first} onShowStage={(next) => change({ stage: next })} />
    const ofStage = jobs.filter((card) => card.stage === stage)
    return (
      <StageList
        stage={stage}
        board={{ ...first, jobs: ofStage }}
        more={query.hasNextPage ? () => void query.fetchNextPage() : null}
        busy={query.isFetchingNextPage}
      />
    )
  }
  return (
    <>
      <PageHeader
        title="Board"
        actions={
          <>
            <Segmented
              label="Show as"
              options={boardViews}
              value={view}
              onChange={(next) => change({ view: next })}
            />
            {mayWrite ? <NewJobLink /> : null}
          </>
        }
      />
      <BoardFilters filter={filter} change={change} isFiltered={isFiltered} board={first} />
      <div aria-busy={query.isPlaceholderData}>{body()}</div>
    </>
  )
}
