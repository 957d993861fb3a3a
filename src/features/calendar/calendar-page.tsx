import { useQuery } from '@tanstack/react-query'
import { ChevronLeft, ChevronRight, Plus } from 'lucide-react'
import type { ReactNode } from 'react'
import { Link, Outlet, useNavigate, useSearchParams } from 'react-router-dom'
import { useMay } from '../../lib/session.ts'
import { Button, buttonClass } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { PageHeader } from '../../ui/page-header.tsx'
import { Segmented } from '../../ui/segmented.tsx'
import { Skeleton } from '../../ui/skeleton.tsx'
import { ErrorState } from '../../ui/states.tsx'
import {
  type CalendarView,
  searchWith,
  stepOf,
  titleOf,
  useCalendarAddress,
} from './calendar-address.ts'
import { CalendarGrid } from './calendar-grid.tsx'
import { calendarQueries } from './calendar-queries.ts'
import { ClashAnswer } from './clash-answer.tsx'
import { DayList } from './day-list.tsx'
import { UnbookedList } from './unbooked-list.tsx'
import { useMoveBooking } from './use-move-booking.ts'
import { useNarrow } from './use-narrow.ts'

const views: readonly { value: CalendarView; label: string }[] = [
  { value: 'month', label: 'Month' },
  { value: 'week', label: 'Week' },
]

type Address = ReturnType<typeof useCalendarAddress>

function Toolbar({ address }: { address: Address }) {
  const { view, on, today, go } = address
  const step = (direction: -1 | 1) => go({ on: stepOf(view, on, direction) })
  return (
    <div className="mb-3 flex flex-wrap items-center gap-2">
      <Button
        kind="plain"
        className="w-11 px-0!"
        aria-label={`The ${view} before`}
        onClick={() => step(-1)}
      >
        <ChevronLeft size={20} aria-hidden />
      </Button>
      <Button kind="plain" onClick={() => go({ on: today })}>
        Today
      </Button>
      <Button
        kind="plain"
        className="w-11 px-0!"
        aria-label={`The ${view} after`}
        onClick={() => step(1)}
      >
        <ChevronRight size={20} aria-hidden />
      </Button>
      <Segmented
        label="Show"
        options={views}
        value={view}
        onChange={(next) => go({ view: next })}
      />
      <h2 aria-live="polite" className="w-full text-xl font-extrabold sm:ml-2 sm:w-auto">
        {titleOf(view, on)}
      </h2>
    </div>
  )
}

function Unbooked({ isNarrow }: { isNarrow: boolean }) {
  const { data, error, refetch } = useQuery(calendarQueries.unbooked())
  const jobs = data?.jobs ?? []
  const body = error ? (
    <ErrorState message={error.message} onRetry={() => void refetch()} />
  ) : !data ? (
    <Skeleton className="h-24" />
  ) : jobs.length === 0 ? (
    <p className="text-ink-soft">None waiting. A job comes here once its price is accepted.</p>
  ) : (
    <UnbookedList jobs={jobs} crews={data.crews} mayDrag={!isNarrow} />
  )
  if (isNarrow)
    return (
      <details className="mb-4 rounded-md border border-rule bg-sheet px-3">
        <summary className="min-h-11 content-center font-semibold">
          Won, not booked ({jobs.length})
        </summary>
        <div className="pb-3">{body}</div>
      </details>
    )
  return (
    <section aria-labelledby="unbooked" className="xl:sticky xl:top-4 xl:self-start">
      <h2 id="unbooked" className="text-lg font-extrabold">
        Won, not booked
      </h2>
      {jobs.length > 0 ? (
        <p className="mb-2 text-sm text-ink-soft">Drag one onto its first day, or press Book.</p>
      ) : null}
      {body}
    </section>
  )
}

type Props = {
  /** What other features count beside it. */
  waiting?: ReactNode
  /** What other features say above it. */
  above?: ReactNode
}

/** The wall planner: who is on which roof, day by day. */
export function CalendarPage({ waiting, above }: Props) {
  const isNarrow = useNarrow()
  const mayEdit = useMay('booking:write')
  const navigate = useNavigate()
  const [search] = useSearchParams()
  const address = useCalendarAddress(isNarrow)
  const { view, on, span } = address
  const { data: calendar, error, refetch } = useQuery(calendarQueries.span(span))
  const mover = useMoveBooking()
  const open = (id: string) => void navigate(`/calendar/bookings/${id}${searchWith(search, {})}`)
  const bookOn = (job: string, day: string) =>
    void navigate(`/calendar/book${searchWith(search, { job, day, view, on })}`)
  return (
    <>
      <PageHeader
        title="Calendar"
        actions={
          <>
            {waiting}
            {mayEdit ? (
              <Link className={buttonClass()} to={`/calendar/book${searchWith(search, {})}`}>
                <Plus size={20} aria-hidden />
                Book a crew
              </Link>
            ) : null}
          </>
        }
      />
      {above}
      <div
        className={mayEdit && !isNarrow ? 'gap-5 xl:grid xl:grid-cols-[minmax(0,1fr)_17rem]' : ''}
      >
        <div className="min-w-0">
          <Toolbar address={address} />
          {mayEdit && isNarrow ? <Unbooked isNarrow /> : null}
          {error ? (
            <ErrorState message={error.message} onRetry={() => void refetch()} />
          ) : !calendar ? (
            <Skeleton className="h-96" />
          ) : isNarrow ? (
            <DayList calendar={calendar} view={view} mayEdit={mayEdit} {...span} />
          ) : (
            <CalendarGrid
              calendar={calendar}
              view={view}
              on={on}
              mayEdit={mayEdit}
              onOpen={open}
              onMove={mover.move}
              onDropJob={bookOn}
            />
          )}
        </div>
        {mayEdit && !isNarrow ? <Unbooked isNarrow={false} /> : null}
      </div>
      <Dialog open={mover.conflict !== null} onClose={mover.giveUp} title="This day is not free">
        {mover.conflict ? (
          <ClashAnswer
            conflict={mover.conflict}
            busy={mover.isPending}
            onAnswer={mover.answer}
            onBack={mover.giveUp}
          />
        ) : null}
      </Dialog>
      <Outlet />
    </>
  )
}
