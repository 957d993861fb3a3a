import { useQuery } from '@tanstack/react-query'
import { Link } from 'react-router-dom'
import type { UnbookedJob } from '../../../shared/bookings/calendar-schemas.ts'
import { formatDay } from '../../../shared/calendar/days.ts'
import type { Openings } from '../../../shared/find-days/find-days-schemas.ts'
import { formatHours } from '../../../shared/labour/format-hours.ts'
import { workAtHeight } from '../../../shared/marking/marking-card.ts'
import { ApiFailure } from '../../lib/api-client.ts'
import { issueAt } from '../../lib/failure-text.ts'
import { buttonClass } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { Field } from '../../ui/field.tsx'
import { FormFailure } from '../../ui/form-failure.tsx'
import { Select, TextInput } from '../../ui/inputs.tsx'
import { PageSkeleton, Skeleton } from '../../ui/skeleton.tsx'
import { EmptyState, ErrorState, Note } from '../../ui/states.tsx'
import { findDaysQueries } from './find-days-queries.ts'
import { OpeningCard } from './opening-card.tsx'
import { useFindDaysAddress } from './use-find-days-address.ts'
import { useTakeOpening } from './use-take-opening.ts'

type Address = ReturnType<typeof useFindDaysAddress>

function workText({ workMinutes, dayCount }: Openings): string {
  const count = dayCount === 1 ? '1 working day is' : `${dayCount} working days are`
  if (workMinutes === null) return `No roof issued yet: ${count} looked for.`
  if (dayCount !== null) return `${formatHours(workMinutes)} of work; ${count} looked for.`
  if (workMinutes === 0) return 'All of its work has days already; these would be more.'
  return `${formatHours(workMinutes)} of work to place.`
}

function Waits({ found }: { found: Openings }) {
  if (found.waits.length === 0) return null
  const isLater = found.waits.some((wait) => wait.isDated)
  return (
    <Note
      kind="caution"
      title={isLater ? `Not before ${formatDay(found.earliest)}` : 'Nobody has said when'}
    >
      <ul>
        {found.waits.map(({ text }) => (
          <li key={text}>{text}</li>
        ))}
      </ul>
    </Note>
  )
}

function OpeningList({ found, address }: { found: Openings; address: Address }) {
  const { take, error, isPending } = useTakeOpening(found.job.id, (day) => address.close(day))
  if (found.openings.length === 0)
    return (
      <EmptyState title={`No room until ${formatDay(found.latest)}`}>
        No crew has enough days in a row that nothing firm stands in. Move a booking, put people in
        a crew, or look for fewer days.
      </EmptyState>
    )
  return (
    <div className="space-y-3">
      <ol className="space-y-3">
        {found.openings.map((opening, i) => (
          <OpeningCard
            key={`${opening.crew.id} ${opening.days.join()}`}
            opening={opening}
            isFirst={i === 0}
            busy={isPending}
            onTake={() => take(opening)}
          />
        ))}
      </ol>
      <FormFailure error={error} />
    </div>
  )
}

function Found({ jobId, address }: { jobId: string; address: Address }) {
  const query = useQuery(findDaysQueries.openings(jobId, address.from, address.days))
  const { error } = query
  const isAtField = error instanceof ApiFailure && error.error.issues.length > 0
  const found = error ? undefined : query.data
  return (
    <div className="space-y-4">
      <div className="grid gap-4 sm:grid-cols-2">
        <Field label="Not before" error={issueAt(error, 'from')}>
          <TextInput
            type="date"
            value={address.from || (found?.earliest ?? '')}
            onChange={(e) => address.set({ from: e.target.value })}
          />
        </Field>
        <Field
          label="Working days"
          hint="Empty: as many as the work needs."
          error={issueAt(error, 'days')}
        >
          <TextInput
            type="number"
            inputMode="numeric"
            min={1}
            max={60}
            value={address.days}
            onChange={(e) => address.set({ days: e.target.value })}
          />
        </Field>
      </div>
      {error && !isAtField ? (
        <ErrorState message={error.message} onRetry={() => void query.refetch()} />
      ) : null}
      {!error && !found ? <Skeleton className="h-64" /> : null}
      {found ? (
        <div aria-busy={query.isPlaceholderData} className="space-y-4">
          <p aria-live="polite">
            {workText(found)}
            {found.job.wantedBy ? ` Wanted by ${formatDay(found.job.wantedBy)}.` : ''}
          </p>
          <Waits found={found} />
          <OpeningList found={found} address={address} />
          <Note kind="stop" title="Working at height">
            <p>{workAtHeight}</p>
          </Note>
        </div>
      ) : null}
    </div>
  )
}

function JobField(props: { jobs: readonly UnbookedJob[]; jobId: string; address: Address }) {
  const { jobs, jobId, address } = props
  return (
    <Field label="Job">
      <Select value={jobId} onChange={(e) => address.set({ job: e.target.value, days: '' })}>
        {jobs.map((job) => (
          <option key={job.id} value={job.id}>
            {job.number} {job.title}
          </option>
        ))}
      </Select>
    </Field>
  )
}

/** Behind /calendar/find-days?job=…: the three best openings for a job. */
export function FindDaysPanel() {
  const address = useFindDaysAddress()
  const { data, error, refetch } = useQuery(findDaysQueries.jobs(address.jobId))
  const jobs = data ? [...(data.asked ? [data.asked] : []), ...data.jobs] : []
  const jobId = jobs.some((job) => job.id === address.jobId) ? address.jobId : (jobs[0]?.id ?? '')
  return (
    <Dialog open place="panel" title="Find days" onClose={() => address.close()}>
      {error ? (
        <ErrorState message={error.message} onRetry={() => void refetch()} />
      ) : !data ? (
        <PageSkeleton />
      ) : jobs.length === 0 ? (
        <EmptyState
          title="Nothing is waiting for a crew"
          action={
            <Link to="/board" className={buttonClass('plain')}>
              Go to the board
            </Link>
          }
        >
          Open a job and press Find days there.
        </EmptyState>
      ) : (
        <div className="space-y-4">
          <JobField jobs={jobs} jobId={jobId} address={address} />
          <Found key={jobId} jobId={jobId} address={address} />
        </div>
      )}
    </Dialog>
  )
}
