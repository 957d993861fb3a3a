import type { Day } from '../calendar/days.ts'
import { type WorkingCalendar, workedDaysFrom } from '../calendar/working-days.ts'

/**
 * A booking's days after the day `from` and those after it go to `to` and the working days after that.
 * Days worked stay, and so do the days before `from`. `to` is taken as it is, worked by the firm or not.
 */
export function movedDays(
  calendar: WorkingCalendar,
  days: readonly Day[],
  worked: ReadonlySet<Day>,
  move: { from: Day; to: Day },
): Day[] {
  const moving = days.filter((day) => day >= move.from && !worked.has(day))
  const staying = days.filter((day) => !moving.includes(day))
  const candidates = [
    move.to,
    ...workedDaysFrom(calendar, move.to, days.length + moving.length + 1).filter(
      (day) => day !== move.to,
    ),
  ]
  const free = candidates.filter((day) => !staying.includes(day)).slice(0, moving.length)
  return [...staying, ...free].sort()
}
