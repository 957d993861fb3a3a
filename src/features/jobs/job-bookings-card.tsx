import { CalendarPlus, CalendarSearch, Clock } from 'lucide-react'
import { Link } from 'react-router-dom'
import type { JobBooking, JobView } from '../../../shared/jobs/job-views.ts'
import { CrewPennant } from '../../drawings/crew-pennant.tsx'
import { useMay, useSession } from '../../lib/session.ts'
import { Badge } from '../../ui/badge.tsx'
import { buttonClass } from '../../ui/button.tsx'
import { Card } from '../../ui/card.tsx'
import { bookingDaysText, dayText } from './day-words.ts'

function BookingRow({ booking }: { booking: JobBooking }) {
  const { crew } = booking
  const { today } = useSession().firm
  return (
    <li>
      <Link
        to={`/calendar/bookings/${booking.id}`}
        className="flex min-h-14 items-center gap-3 py-2 hover:underline"
      >
        <CrewPennant
          letter={crew.letter}
          colour={crew.colour}
          name={crew.name}
          className="h-8 w-10 text-lg"
        />
        <span className="min-w-0 flex-1">
          <span className="font-semibold text-chalk underline">
            {bookingDaysText(booking, today)}
          </span>
          <span className="block text-sm text-ink-soft">
            {crew.name}, {booking.dayCount} {booking.dayCount === 1 ? 'day' : 'days'}
          </span>
        </span>
        {booking.state === 'firm' ? <Badge kind="leaf">Firm</Badge> : <Badge>Pencilled</Badge>}
      </Link>
    </li>
  )
}

/** Which crew is on it, and when. */
export function JobBookingsCard({ job }: { job: JobView }) {
  const mayBook = useMay('booking:write')
  const mayReadHours = useMay('hours:read')
  const { today } = useSession().firm
  // Without a roof the roof comes first.
  const isWaiting = job.stage === 'won' && job.bookings.length === 0 && job.revisions.length > 0
  return (
    <Card>
      <div className="mb-2 flex flex-wrap items-center justify-between gap-3">
        <h2 className="text-lg font-extrabold">Bookings</h2>
        {mayBook ? (
          <div className="flex flex-wrap gap-2">
            {job.stage === 'complete' ? null : (
              <Link to={`/calendar/find-days?job=${job.id}`} className={buttonClass('plain')}>
                <CalendarSearch size={18} aria-hidden />
                Find days
              </Link>
            )}
            <Link
              to={`/calendar/book?job=${job.id}`}
              className={buttonClass(isWaiting ? 'primary' : 'plain')}
            >
              <CalendarPlus size={18} aria-hidden />
              Book a crew
            </Link>
          </div>
        ) : null}
      </div>
      {job.wantedBy ? (
        <p className="text-ink-soft">Wanted by {dayText(job.wantedBy, today)}</p>
      ) : null}
      {job.bookings.length > 0 ? (
        <ul className="divide-y divide-rule">
          {job.bookings.map((booking) => (
            <BookingRow key={booking.id} booking={booking} />
          ))}
        </ul>
      ) : (
        <p>No crew is booked on this job.</p>
      )}
      {mayReadHours && (job.bookings.length > 0 || job.stage === 'complete') ? (
        <Link
          to={`/jobs/${job.id}/hours`}
          className="mt-2 inline-flex min-h-11 items-center gap-2 font-semibold text-chalk underline"
        >
          <Clock size={18} aria-hidden />
          Hours, planned and logged
        </Link>
      ) : null}
    </Card>
  )
}
