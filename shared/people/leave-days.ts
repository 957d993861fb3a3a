import { type Day, dayPlus, isoWeekday } from '../calendar/days.ts'

/** Days away: a span, both ends in; with `weekdays` (1 = Monday) only those of it. */
export type LeaveSpan = { startsOn: Day; endsOn: Day; weekdays: readonly number[] | null }

export function isAwayOn(leave: LeaveSpan, day: Day): boolean {
  if (day < leave.startsOn || day > leave.endsOn) return false
  return leave.weekdays === null || leave.weekdays.includes(isoWeekday(day))
}

const daysInWeek = 7

/** The first day away from `from` on; null when none is left. */
export function nextAwayDay(leave: LeaveSpan, from: Day): Day | null {
  const first = from > leave.startsOn ? from : leave.startsOn
  for (let ahead = 0; ahead < daysInWeek; ahead++) {
    const day = dayPlus(first, ahead)
    if (isAwayOn(leave, day)) return day
  }
  return null
}
