import { BadgeCheck, Pencil } from 'lucide-react'
import type { BookingState } from '../../../shared/bookings/booking-schemas.ts'
import type { CalendarBooking, CalendarDay } from '../../../shared/bookings/calendar-schemas.ts'
import { formatLoad } from '../../../shared/labour/format-hours.ts'
import { CrewPennant } from '../../drawings/crew-pennant.tsx'
import { RoofGlyph } from '../../drawings/roof-glyph.tsx'
import { FlagLine } from '../../ui/flag-line.tsx'
import { DayFlagLines, lengthWords } from './booking-flags.tsx'

/** Pencilled or firm, by word, icon and border. */
export function StateMark({ state }: { state: BookingState }) {
  const Icon = state === 'firm' ? BadgeCheck : Pencil
  return (
    <span className="inline-flex items-center gap-1 text-ink-soft">
      <Icon size={14} aria-hidden />
      {state}
    </span>
  )
}

function LoadBar({ planned, there }: { planned: number; there: number }) {
  const percent = there > 0 ? Math.min(100, Math.round((planned / there) * 100)) : 0
  return (
    <span aria-hidden className="block h-1.5 rounded-sm border border-ink-soft">
      <span className="block h-full bg-ink-soft" style={{ width: `${percent}%` }} />
    </span>
  )
}

export function cellClass(state: BookingState): string {
  const border = state === 'firm' ? 'border-solid border-ink' : 'border-dashed border-ink-soft'
  return `block rounded-md border-2 bg-sheet text-left leading-snug text-ink ${border}`
}

/** One day of a booking: the roof's shape, whose it is, what the day holds, and its hours. */
export function BookingCell({ booking, day }: { booking: CalendarBooking; day: CalendarDay }) {
  const length = day.day === booking.lastDay ? lengthWords(booking) : null
  return (
    <span className="block space-y-1">
      <span className="flex flex-wrap items-center gap-x-1.5">
        {booking.glyph ? <RoofGlyph glyph={booking.glyph} sizePx={30} /> : null}
        <CrewPennant {...booking.crew} />
        <StateMark state={booking.state} />
      </span>
      <span className="block font-semibold [overflow-wrap:anywhere]">{booking.job.title}</span>
      {day.holds ? <span className="block">{day.holds}</span> : null}
      {day.plannedMinutes > 0 ? (
        <span className="block">
          <LoadBar planned={day.plannedMinutes} there={day.availableMinutes} />
          {formatLoad(day.plannedMinutes, day.availableMinutes)}
          {day.worked ? ', worked' : ''}
        </span>
      ) : null}
      <DayFlagLines flags={day.flags} />
      {length ? <FlagLine weight="caution">{length}</FlagLine> : null}
    </span>
  )
}
