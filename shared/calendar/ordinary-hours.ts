import { type Day, isoWeekday } from './days.ts'

/** What a firm ordinarily works: `weekHours` is Monday to Sunday, null for `hoursPerDay` on each working weekday. */
export type FirmHours = {
  hoursPerDay: number
  workingWeekdays: number[]
  weekHours: number[] | null
}

/** The hours of one day's work for the firm on that weekday; on a weekday it does not work, a usual day. */
export function firmHoursOn(firm: FirmHours, day: Day): number {
  const weekday = isoWeekday(day)
  if (!firm.workingWeekdays.includes(weekday)) return firm.hoursPerDay
  return firm.weekHours?.[weekday - 1] ?? firm.hoursPerDay
}

/**
 * Minutes a person ordinarily works on a day the crew is there: the person's own hours of that weekday, else
 * the firm's. A day booked on a weekday the firm does not work (a Saturday worked all the same) counts as a
 * usual day, unless the person's own hours say otherwise. Leave, holidays and closures are asked elsewhere.
 */
export function ordinaryMinutes(
  firm: FirmHours,
  person: { weekHours: number[] | null },
  day: Day,
): number {
  const weekday = isoWeekday(day)
  const own = person.weekHours?.[weekday - 1]
  const isFirmDay = firm.workingWeekdays.includes(weekday)
  const hours = own !== undefined && (isFirmDay || own > 0) ? own : firmHoursOn(firm, day)
  return Math.round(hours * 60)
}
