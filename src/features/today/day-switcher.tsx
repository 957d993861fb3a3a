import { ChevronLeft, ChevronRight } from 'lucide-react'
import { formatDay } from '../../../shared/calendar/days.ts'
import type { DaySheets } from '../../../shared/day-sheets/day-sheet-schemas.ts'

type Props = { sheets: DaySheets; onDay: (day: string) => void }

const keyClass =
  'flex min-h-14 min-w-0 flex-1 items-center justify-center gap-1 rounded-md border border-ink-soft bg-sheet px-2 font-semibold disabled:opacity-40'

/** The booked days before and after, one tap away. */
export function DaySwitcher({ sheets, onDay }: Props) {
  const { day, today, previousDay, nextDay } = sheets
  return (
    <nav aria-label="Days" className="mb-4 flex flex-wrap items-stretch gap-2 print:hidden">
      <button
        type="button"
        disabled={previousDay === null}
        onClick={() => (previousDay ? onDay(previousDay) : undefined)}
        className={keyClass}
      >
        <ChevronLeft size={24} aria-hidden />
        <span>
          <span className="sr-only">Booked day before: </span>
          {previousDay ? formatDay(previousDay) : 'None before'}
        </span>
      </button>
      {day === today ? null : (
        <button type="button" onClick={() => onDay(today)} className={`${keyClass} sm:flex-none`}>
          Today
        </button>
      )}
      <button
        type="button"
        disabled={nextDay === null}
        onClick={() => (nextDay ? onDay(nextDay) : undefined)}
        className={keyClass}
      >
        <span>
          <span className="sr-only">Next booked day: </span>
          {nextDay ? formatDay(nextDay) : 'None after'}
        </span>
        <ChevronRight size={24} aria-hidden />
      </button>
    </nav>
  )
}

/** Any other day. */
export function AnyDay({ sheets, onDay }: Props) {
  return (
    <input
      type="date"
      aria-label="Any day"
      value={sheets.day}
      onChange={(event) => (event.target.value ? onDay(event.target.value) : undefined)}
      className="min-h-14 w-44 flex-1 rounded-md border border-ink-soft bg-sheet px-3 text-ink"
    />
  )
}
