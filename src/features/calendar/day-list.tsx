import { Link, useSearchParams } from 'react-router-dom'
import type { Calendar } from '../../../shared/bookings/calendar-schemas.ts'
import { type Day, dayPlus, daysBetween, formatDay } from '../../../shared/calendar/days.ts'
import { whyNotWorked } from '../../../shared/calendar/working-days.ts'
import { EmptyState } from '../../ui/states.tsx'
import { BookingCell, cellClass } from './booking-cell.tsx'
import { type CalendarView, searchWith } from './calendar-address.ts'

type Props = { calendar: Calendar; view: CalendarView; mayEdit: boolean; from: Day; to: Day }

/** The calendar on a phone: one day under another, free working days named, quiet ones left out of a month. */
export function DayList({ calendar, view, mayEdit, from, to }: Props) {
  const [search] = useSearchParams()
  const days = Array.from({ length: daysBetween(from, to) + 1 }, (_, i) => dayPlus(from, i))
  const shown = days
    .map((day) => ({
      day,
      closed: whyNotWorked(calendar, day),
      booked: calendar.bookings.flatMap((booking) =>
        booking.days.filter((d) => d.day === day).map((d) => ({ booking, day: d })),
      ),
    }))
    .filter(({ booked, closed }) => booked.length > 0 || (view === 'week' && closed === null))
  if (shown.length === 0)
    return <EmptyState title="Nothing is booked here">Look at another week or month.</EmptyState>
  return (
    <ol className="space-y-4">
      {shown.map(({ day, closed, booked }) => (
        <li key={day}>
          <h3 className="mb-1 flex items-baseline gap-2 text-lg font-extrabold">
            <span className={day === calendar.today ? 'text-clay' : ''}>{formatDay(day)}</span>
            {day === calendar.today ? <span className="text-sm text-clay">today</span> : null}
            {closed ? <span className="text-sm font-normal text-ink-soft">{closed}</span> : null}
          </h3>
          {booked.length === 0 ? (
            <p className="text-ink-soft">
              Nothing booked.{' '}
              {mayEdit ? (
                <Link
                  className="inline-flex min-h-11 items-center font-semibold text-chalk underline"
                  to={`/calendar/book${searchWith(search, { day, job: null })}`}
                >
                  Book a crew
                </Link>
              ) : null}
            </p>
          ) : (
            <ul className="space-y-2">
              {booked.map(({ booking, day: bookedDay }) => (
                <li key={bookedDay.id}>
                  <Link
                    to={`/calendar/bookings/${booking.id}${searchWith(search, {})}`}
                    className={`${cellClass(booking.state)} p-3`}
                  >
                    <BookingCell booking={booking} day={bookedDay} />
                  </Link>
                </li>
              ))}
            </ul>
          )}
        </li>
      ))}
    </ol>
  )
}
