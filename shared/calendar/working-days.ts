import { type Day, dayPlus, isoWeekday } from './days.ts'

/** Which days a firm works: its weekdays, less the days it is closed. */
export type WorkingCalendar = {
  workingWeekdays: number[]
  closedDays: { day: Day; name: string }[]
}

const furthestDays = 400

type ClosedDays = WorkingCalendar['closedDays']
const namesOf = new WeakMap<ClosedDays, ReadonlyMap<Day, string>>()

/** Looked up once a list, which nobody changes: where a job could land asks of thousands of days. */
function closedNames(closedDays: ClosedDays): ReadonlyMap<Day, string> {
  const known = namesOf.get(closedDays)
  if (known) return known
  // The first name given to a day is the one said.
  const made = new Map([...closedDays].reverse().map(({ day, name }) => [day, name]))
  namesOf.set(closedDays, made)
  return made
}

/** The reason a day is not worked ('Saturday is not a working day', 'Show day'), or null when it is. */
export function whyNotWorked(calendar: WorkingCalendar, day: Day): string | null {
  const closed = closedNames(calendar.closedDays).get(day)
  if (closed !== undefined) return closed
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
