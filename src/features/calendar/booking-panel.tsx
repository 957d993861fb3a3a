import { useQuery } from '@tanstack/react-query'
import { Link, useNavigate, useParams, useSearchParams } from 'react-router-dom'
import type { Booking } from '../../../shared/bookings/calendar-schemas.ts'
import { formatDay } from '../../../shared/calendar/days.ts'
import { formatLoad } from '../../../shared/labour/format-hours.ts'
import { CrewPennant } from '../../drawings/crew-pennant.tsx'
import { RoofGlyph } from '../../drawings/roof-glyph.tsx'
import { useMay } from '../../lib/session.ts'
import { Dialog } from '../../ui/dialog.tsx'
import { PageSkeleton } from '../../ui/skeleton.tsx'
import { ErrorState, Note } from '../../ui/states.tsx'
import { StateMark } from './booking-cell.tsx'
import { BookingEditor } from './booking-editor.tsx'
import { BookingClashes, DayFlagLines, lengthWords } from './booking-flags.tsx'
import { searchWith } from './calendar-address.ts'
import { calendarQueries } from './calendar-queries.ts'

function Head({ booking }: { booking: Booking }) {
  const length = lengthWords(booking)
  return (
    <div className="space-y-2">
      <div className="flex flex-wrap items-center gap-3">
        {booking.glyph ? <RoofGlyph glyph={booking.glyph} sizePx={56} /> : null}
        <div className="min-w-0 space-y-1">
          <p className="flex flex-wrap items-center gap-2">
            <CrewPennant {...booking.crew} />
            <span className="font-semibold">{booking.crew.name}</span>
            <StateMark state={booking.state} />
          </p>
          <p className="text-ink-soft">{booking.job.siteAddress || 'No site address yet'}</p>
          <p>Start {booking.startAt}</p>
        </div>
      </div>
      <p>
        <Link
          to={`/jobs/${booking.job.id}`}
          className="inline-flex min-h-11 items-center font-semibold text-chalk underline"
        >
          Open job {booking.job.number}
        </Link>
      </p>
      {length ? (
        <Note kind="caution" title={length}>
          {booking.shortMinutes > 0
            ? 'Add a day, or put more people in the crew.'
            : 'Take the days that hold nothing off the booking.'}
        </Note>
      ) : null}
      {booking.clashReason ? (
        <Note title="Two jobs on one day, on purpose">{booking.clashReason}</Note>
      ) : null}
    </div>
  )
}

function Days({ booking }: { booking: Booking }) {
  return (
    <section aria-labelledby="booking-days">
      <h3 id="booking-days" className="mb-2 text-lg font-extrabold">
        What each day holds
      </h3>
      <ol className="space-y-2">
        {booking.days.map((day) => (
          <li key={day.id} className="rounded-md border border-rule p-3">
            <p className="flex flex-wrap items-baseline justify-between gap-x-3">
              <span className="font-semibold">{formatDay(day.day)}</span>
              <span className="text-sm">
                {day.revisionLetter ? `Roof ${day.revisionLetter} · ` : ''}
                {formatLoad(day.plannedMinutes, day.availableMinutes)}
                {day.worked ? ' · worked' : ''}
              </span>
            </p>
            <div className="text-sm">
              <DayFlagLines flags={day.flags} />
            </div>
            {day.tasks.length > 0 ? (
              <details className="mt-1">
                <summary className="min-h-11 content-center">{day.holds}</summary>
                <ul className="list-disc pl-5 text-sm">
                  {day.tasks.map((task, i) => (
                    <li key={i}>
                      {task.title}
                      {task.quantity > 1 ? ` × ${task.quantity}` : ''}
                    </li>
                  ))}
                </ul>
              </details>
            ) : day.revisionLetter ? (
              <p className="mt-1 text-ink-soft">Nothing left to do on this day.</p>
            ) : null}
          </li>
        ))}
      </ol>
    </section>
  )
}

/** One booking beside the calendar: what its days hold and, for the office, everything that can change. */
export function BookingPanel() {
  const { bookingId = '' } = useParams()
  const [search] = useSearchParams()
  const navigate = useNavigate()
  const mayEdit = useMay('booking:write')
  const { data: booking, error, refetch } = useQuery(calendarQueries.booking(bookingId))
  const close = () => void navigate(`/calendar${searchWith(search, { job: null, day: null })}`)
  return (
    <Dialog open place="panel" title={booking?.job.title ?? 'Booking'} onClose={close}>
      {error ? (
        <ErrorState message={error.message} onRetry={() => void refetch()} />
      ) : !booking ? (
        <PageSkeleton />
      ) : (
        <div className="space-y-6">
          {booking.cancelled ? <Note kind="stop" title="This booking is cancelled" /> : null}
          <Head booking={booking} />
          <BookingClashes booking={booking} />
          <Days booking={booking} />
          {mayEdit ? (
            <BookingEditor booking={booking} onClosed={close} />
          ) : booking.gear ? (
            <p>
              <span className="font-semibold">Gear to bring:</span> {booking.gear}
            </p>
          ) : null}
        </div>
      )}
    </Dialog>
  )
}
