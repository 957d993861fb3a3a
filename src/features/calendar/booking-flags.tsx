import type { Booking, CalendarBooking } from '../../../shared/bookings/calendar-schemas.ts'
import type { Clash } from '../../../shared/clashes/clash-schemas.ts'
import { clashShortWords } from '../../../shared/clashes/clash-words.ts'
import { daysInWords } from '../../../shared/clashes/days-in-words.ts'
import { groupedClashes, worstFirst } from '../../../shared/clashes/grouped-clashes.ts'
import { formatHours } from '../../../shared/labour/format-hours.ts'
import { FlagItem, FlagLine } from '../../ui/flag-line.tsx'

/** What is amiss with a day in a word or two each; the panel has the whole sentence. */
export function DayFlagLines({ flags }: { flags: readonly Clash[] }) {
  // The booking's length has words of its own beside these.
  return flags
    .filter((flag) => flag.code !== 'too-short')
    .map((flag) => (
      <FlagLine key={`${flag.code} ${flag.text}`} weight={flag.weight}>
        {clashShortWords[flag.code]}
      </FlagLine>
    ))
}

/** Too short, too long, or null. */
export function lengthWords(
  booking: Pick<CalendarBooking, 'shortMinutes' | 'emptyDays'>,
): string | null {
  if (booking.shortMinutes > 0) return `Too short by ${formatHours(booking.shortMinutes)}`
  if (booking.emptyDays === 0) return null
  return `Too long by ${booking.emptyDays} ${booking.emptyDays === 1 ? 'day' : 'days'}`
}

/** What stands in the way of a booking in whole sentences, the same thing of several days once. */
export function BookingClashes({ booking }: { booking: Booking }) {
  const flags = booking.days.flatMap((day) => day.flags)
  // Its length stands at the head.
  const listed = groupedClashes(
    flags
      .filter((flag) => flag.code !== 'too-short')
      .map((flag) => ({ ...flag, bookingId: booking.id })),
  )
  if (listed.length === 0) return null
  return (
    <section aria-labelledby="booking-clashes">
      <h3 id="booking-clashes" className="text-lg font-extrabold">
        What stands in the way
      </h3>
      <ul className="divide-y divide-rule">
        {worstFirst(listed).map((clash) => (
          <FlagItem
            key={`${clash.code} ${clash.weight} ${clash.text}`}
            weight={clash.weight}
            when={daysInWords(clash.days)}
            text={clash.text}
            wayOut={clash.wayOut}
          />
        ))}
      </ul>
    </section>
  )
}
