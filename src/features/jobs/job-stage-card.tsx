import { Check } from 'lucide-react'
import type { JobFactName } from '../../../shared/jobs/job-schemas.ts'
import { jobStageNames, jobStages, stageReached } from '../../../shared/jobs/job-stage.ts'
import type { JobView } from '../../../shared/jobs/job-views.ts'
import { formatPrice } from '../../../shared/jobs/price-text.ts'
import { failureText } from '../../lib/failure-text.ts'
import { useMay, useSession } from '../../lib/session.ts'
import { Button } from '../../ui/button.tsx'
import { Card } from '../../ui/card.tsx'
import { useToast } from '../../ui/toast.tsx'
import { dayText } from './day-words.ts'
import { useSetFact } from './job-queries.ts'

const facts: { name: JobFactName; done: string; press: string; said: string }[] = [
  { name: 'priceSentOn', done: 'Price sent', press: 'Price sent today', said: 'Price sent today' },
  { name: 'acceptedOn', done: 'Accepted', press: 'Accepted today', said: 'Accepted today' },
  { name: 'completedOn', done: 'Complete', press: 'Mark complete', said: 'Marked complete' },
]

/** The way a job goes, and how far this one has come. */
function StageTrack({ job }: { job: JobView }) {
  return (
    <ol className="flex gap-1" aria-label="Stages">
      {jobStages.map((stage) => {
        const isHere = stage === job.stage
        const fill = stageReached(job.stage, stage) ? 'bg-clay' : 'bg-rule'
        return (
          <li key={stage} aria-current={isHere ? 'step' : undefined} className="min-w-0 flex-1">
            <span aria-hidden className={`block h-2 rounded-sm ${fill}`} />
            <span
              className={`mt-1 text-sm max-sm:sr-only ${isHere ? 'font-extrabold' : 'text-ink-soft'}`}
            >
              {jobStageNames[stage]}
            </span>
          </li>
        )
      })}
    </ol>
  )
}

/** One press sets a fact to today; the toast takes it back while the job has not changed again. */
function usePressFact(job: JobView) {
  const setFact = useSetFact(job.id)
  const toast = useToast()
  const { today } = useSession().firm
  const stop = (error: unknown) =>
    toast(failureText(error) ?? 'That was not saved. Try again.', { kind: 'stop' })
  const press = (fact: JobFactName, said: string) => {
    if (setFact.isPending) return
    const before = job[fact] ?? null
    setFact.mutate(
      { fact, on: today, version: job.version },
      {
        onSuccess: ({ version }) =>
          toast(said, {
            undo: () => setFact.mutate({ fact, on: before, version }, { onError: stop }),
          }),
        onError: stop,
      },
    )
  }
  return { press, busy: setFact.isPending }
}

function Facts({ job }: { job: JobView }) {
  const { press, busy } = usePressFact(job)
  const { today } = useSession().firm
  return (
    <ul className="mt-4 divide-y divide-rule border-y border-rule">
      <li className="flex min-h-12 flex-wrap items-center justify-between gap-2">
        <span>Price</span>
        <span className="font-semibold tabular-nums">
          {typeof job.priceCents === 'number' ? formatPrice(job.priceCents) : 'None yet'}
        </span>
      </li>
      {facts.map(({ name, done, press: label, said }) => {
        const day = job[name]
        return (
          <li key={name} className="flex min-h-14 flex-wrap items-center justify-between gap-2">
            <span className="flex items-center gap-2">
              {day ? <Check size={18} aria-hidden className="text-leaf" /> : null}
              {done}
            </span>
            {day ? (
              <span className="font-semibold">{dayText(day, today)}</span>
            ) : (
              <Button kind="plain" busy={busy} onClick={() => press(name, said)}>
                {label}
              </Button>
            )}
          </li>
        )
      })}
    </ul>
  )
}

/** Where the job stands, and the facts the office sets. */
export function JobStageCard({ job }: { job: JobView }) {
  const mayWrite = useMay('job:write')
  const { today } = useSession().firm
  return (
    <Card>
      <h2 className="mb-3 text-lg font-extrabold">Where it stands</h2>
      <StageTrack job={job} />
      {mayWrite ? <Facts job={job} /> : null}
      {!mayWrite && job.completedOn ? (
        <p className="mt-3">Complete since {dayText(job.completedOn, today)}</p>
      ) : null}
    </Card>
  )
}
