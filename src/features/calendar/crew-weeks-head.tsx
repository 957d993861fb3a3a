import type { Calendar } from '../../../shared/bookings/calendar-schemas.ts'
import { type Day, formatDay, isoWeekday } from '../../../shared/calendar/days.ts'
import { isWorked } from '../../../shared/calendar/working-days.ts'

type Props = { calendar: Calendar; days: readonly Day[]; columns: string; minWidth: string }

/** The days across the top; weeks stand apart by a line, days off by hatching. */
export function CrewWeeksHead({ calendar, days, columns, minWidth }: Props) {
  return (
    <div
      className="sticky top-0 z-20 grid shrink-0 border-b-2 border-ink-soft bg-sheet"
      style={{ gridTemplateColumns: columns, minWidth }}
    >
      <span className="sticky left-0 z-10 border-r-2 border-ink-soft bg-sheet px-2 py-1.5 text-sm font-semibold text-ink-soft">
        Crew
      </span>
      {days.map((day) => {
        const [weekday = '', date = '', month = ''] = formatDay(day).split(' ')
        const isToday = day === calendar.today
        const closed = calendar.closedDays.find((one) => one.day === day)
        const isOff = !isWorked(calendar, day)
        const edge = isoWeekday(day) === 1 ? 'border-l-2 border-ink-soft' : 'border-l border-rule'
        return (
          <span
            key={day}
            aria-current={isToday ? 'date' : undefined}
            className={`min-w-0 overflow-hidden px-0.5 py-1.5 text-center text-sm leading-tight ${edge} ${isOff ? 'day-off text-ink-soft' : 'font-semibold'} ${isToday ? 'font-extrabold text-clay shadow-[inset_0_3px_0_var(--color-clay)]' : ''}`}
          >
            <span className="block">{isOff ? weekday.slice(0, 2) : weekday}</span>
            <span className="block">
              {date}
              {isOff && !closed ? '' : <span className="max-sm:hidden"> {month}</span>}
            </span>
            {closed ? (
              <span className="mx-auto block max-h-28 overflow-hidden text-ellipsis whitespace-nowrap text-xs font-normal [writing-mode:vertical-rl]">
                {closed.name}
              </span>
            ) : null}
            {isToday ? <span className="block text-xs">today</span> : null}
          </span>
        )
      })}
    </div>
  )
}
