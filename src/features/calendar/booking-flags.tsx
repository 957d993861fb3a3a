import { OctagonAlert, TriangleAlert } from 'lucide-react'
import type { CalendarBooking } from '../../../shared/bookings/calendar-schemas.ts'
import type { Clash } from '../../../shared/clashes/clash-schemas.ts'
import { clashShortWords } from '../../../shared/clashes/clash-words.ts'
import { formatHours } from '../../../shared/labour/format-hours.ts'

export function FlagLine({ weight, children }: { weight: Clash['weight']; children: string }) {
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
