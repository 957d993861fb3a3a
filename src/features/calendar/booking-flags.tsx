import { OctagonAlert, TriangleAlert } from 'lucide-react'
import type { CalendarBooking, DayFlag } from '../../../shared/bookings/calendar-schemas.ts'
import { formatHours } from '../../../shared/labour/format-hours.ts'

const shortWords: Record<DayFlag['code'], string> = {
  'crew-twice': 'Crew booked twice',
  'crew-twice-on-purpose': 'Two jobs, on purpose',
  'day-not-worked': 'Day not worked',
  'nobody-there': 'Nobody there',
  'on-leave': 'On leave',
  'no-roof': 'No roof issued yet',
}

export function FlagLine({ weight, children }: { weight: DayFlag['weight']; children: string }) {
  const Icon = weight === 'clash' ? OctagonAlert : TriangleAlert
  return (
    <span
      className={`flex items-start gap-1 font-semibold ${weight === 'clash' ? 'text-stop' : 'text-ochre'}`}
    >
      <Icon size={14} aria-hidden className="mt-0.5 shrink-0" />
      <span className="min-w-0">{children}</span>
    </span>
  )
}

/** What is amiss with a day in a word or two each; the panel has the whole sentence. */
export function DayFlagLines({ flags }: { flags: readonly DayFlag[] }) {
  return flags.map((flag) => (
    <FlagLine key={flag.code} weight={flag.weight}>
      {shortWords[flag.code]}
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
