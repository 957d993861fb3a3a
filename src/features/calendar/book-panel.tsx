import { useQuery } from '@tanstack/react-query'
import { Link, useNavigate, useSearchParams } from 'react-router-dom'
import { buttonClass } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { PageSkeleton } from '../../ui/skeleton.tsx'
import { EmptyState, ErrorState } from '../../ui/states.tsx'
import { useSession } from '../../lib/session.ts'
import { BookForm } from './book-form.tsx'
import { searchWith } from './calendar-address.ts'
import { calendarQueries } from './calendar-queries.ts'

const linkTo = (to: string, words: string) => (
  <Link to={to} className={buttonClass('plain')}>
    {words}
  </Link>
)

/** The form behind /calendar/book?job=…&day=…, whether a job was dragged there or picked by hand. */
export function BookPanel() {
  const navigate = useNavigate()
  const [search] = useSearchParams()
  const { firm } = useSession()
  const jobId = search.get('job') ?? ''
  const { data, error, refetch } = useQuery(calendarQueries.unbooked(jobId))
  const close = () => void navigate(`/calendar${searchWith(search, { job: null, day: null })}`)
  const jobs = data ? [...(data.asked ? [data.asked] : []), ...data.jobs] : []
  return (
    <Dialog open place="panel" title="Book a crew" onClose={close}>
      {error ? (
        <ErrorState message={error.message} onRetry={() => void refetch()} />
      ) : !data ? (
        <PageSkeleton />
      ) : jobs.length === 0 ? (
        <EmptyState
          title="Nothing is waiting for a crew"
          action={linkTo('/board', 'Go to the board')}
        >
          Open a job and press Accepted today; then it can be booked.
        </EmptyState>
      ) : data.crews.length === 0 ? (
        <EmptyState title="There is no crew yet" action={linkTo('/people', 'Go to People')}>
          Add a crew and who is in it first.
        </EmptyState>
      ) : (
        <BookForm
          key={jobId}
          jobs={jobs}
          crews={data.crews}
          jobId={jobId}
          day={search.get('day') ?? firm.today}
          onDone={close}
        />
      )}
    </Dialog>
  )
}
