import type { Scope } from '../auth/permissions.ts'
import { type Day, formatDay } from '../calendar/days.ts'
import type { WriteDayLog } from './day-log-schemas.ts'

/**
 * Why a day cannot be closed, or its log changed, now; null when it can. Nobody closes a day ahead. Who
 * leads the crew writes a log that is missing and corrects it until the end of the day it was written on;
 * the office corrects any.
 */
export function whyLogShut(
  scope: Scope | null,
  { day, today, loggedOn }: { day: Day; today: Day; loggedOn: Day | null },
): string | null {
  if (day > today) return `${formatDay(day)} is still ahead. Close it when it is over.`
  if (scope === 'all') return null
  if (scope === null) return 'Who leads the crew closes the day.'
  if (loggedOn !== null && loggedOn !== today)
    return `Closed on ${formatDay(loggedOn)}. Ask the office to correct it.`
  return null
}

const quarterMinutes = 15

/**
 * Minutes to put down for a person on one of a day's sheets: what is left of the ordinary day after the
 * hours logged on other jobs, shared evenly among the sheets not closed yet, to the quarter hour.
 */
export function expectedMinutes(input: {
  ordinaryMinutes: number
  loggedElsewhereMinutes: number
  openSheets: number
}): number {
  const left = Math.max(0, input.ordinaryMinutes - input.loggedElsewhereMinutes)
  if (input.openSheets <= 1) return left
  return Math.round(left / input.openSheets / quarterMinutes) * quarterMinutes
}

/** Person-minutes of a log. */
export function loggedMinutes(log: Pick<WriteDayLog, 'people'>): number {
  return log.people.reduce((sum, person) => sum + person.minutes, 0)
}

export function lostMinutes(log: Pick<WriteDayLog, 'delays'>): number {
  return log.delays.reduce((sum, delay) => sum + delay.lostMinutes, 0)
}
