import { type Day, dayPlus, isoWeekday } from './days.ts'

/** Which days a firm works: its weekdays, less the days it is closed. */
export type WorkingCalendar = {
  workingWeekdays: number[]
  closedDays: { day: Day; name: string }[]
}

const furthestDays = 400

/** The reason a day is not worked ('Saturday is not a working day', 'Show day'), or null when it is. */
export function whyNotWorked(calendar: WorkingCalendar, day: Day): string | null {
  const closed = calendar.closedDays.find((c) => c.day === day)
  if (closed) return closed.name
  return calendar.workingWeekdays.includes(isoWeekday(day)) ? null : 'Not a working weekday'
}

export function isWorked(calendar: WorkingCalendar, day: Day): boolean {
  return whyNotWorked(calendar, day) === null
}

/** The first worked day before `day`; null when none is found within a year. */
export function previousWorkedDay(calendar: WorkingCalendar, day: Day): Day | null {
  for (let back = 1; back <= furthestDays; back++) {
    const candidate = dayPlus(day, -back)
    if (isWorked(calendar, candidate)) return candidate
  }
  return null
}

/** `count` worked days from `day` on, `day` itself included when it is worked. */
export function workedDaysFrom(calendar: WorkingCalendar, day: Day, count: number): Day[] {
  const days: Day[] = []
  for (let ahead = 0; ahead <= furthestDays && days.length < count; ahead++) {
    const candidate = dayPlus(day, ahead)
    if (isWorked(calendar, candidate)) days.push(candidate)
  }
  return days
}
