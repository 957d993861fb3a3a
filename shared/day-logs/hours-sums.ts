import { groupBy } from '../collections/group-by.ts'
import type { DelayReason } from './delay-reasons.ts'
import { loggedMinutes, lostMinutes } from './day-log-rules.ts'
import type { JobDayHours } from './hours-schemas.ts'

export type HoursSum = {
  plannedMinutes: number
  doneMinutes: number
  loggedMinutes: number
  lostMinutes: number
  /** The logged minutes of days on which something was ticked, less those lost: what stands against `doneMinutes`. */
  workedMinutes: number
  closedDays: number
}

/** Minutes of some days together; a day not closed counts as planned and done only. */
export function hoursSum(days: readonly JobDayHours[]): HoursSum {
  const sum: HoursSum = {
    plannedMinutes: 0,
    doneMinutes: 0,
    loggedMinutes: 0,
    lostMinutes: 0,
    workedMinutes: 0,
    closedDays: 0,
  }
  for (const { plannedMinutes, doneMinutes, log } of days) {
    sum.plannedMinutes += plannedMinutes
    if (!log) continue
    const [logged, lost] = [loggedMinutes(log), lostMinutes(log)]
    sum.closedDays += 1
    sum.doneMinutes += doneMinutes
    sum.loggedMinutes += logged
    sum.lostMinutes += lost
    if (doneMinutes > 0) sum.workedMinutes += Math.max(0, logged - lost)
  }
  return sum
}

/** How long the work took against its plan, 1 being as planned; null while nothing closed has been ticked. */
export function hoursRatio({ doneMinutes, workedMinutes }: HoursSum): number | null {
  return doneMinutes > 0 && workedMinutes > 0 ? workedMinutes / doneMinutes : null
}

/** The days of each crew, in the order in which the crews came. */
export function daysByCrew(days: readonly JobDayHours[]) {
  return [...groupBy(days, (day) => day.crew.id).values()].flatMap((own) =>
    own[0] ? [{ crew: own[0].crew, days: own }] : [],
  )
}

export type LostTime = {
  bookingDayId: string
  day: string
  crewName: string
  reason: DelayReason
  note: string
  lostMinutes: number
  /** The day's remarks. */
  remarks: string
}

/** Every delay of a job, by day. */
export function lostTimeOf(days: readonly JobDayHours[]): LostTime[] {
  return days.flatMap(({ bookingDayId, day, crew, log }) =>
    (log?.delays ?? []).map(({ reason, note, lostMinutes: minutes }) => ({
      bookingDayId,
      day,
      crewName: crew.name,
      reason,
      note,
      lostMinutes: minutes,
      remarks: log?.remarks ?? '',
    })),
  )
}

/** Hours as wages take them: 465 → 7.75. */
export function decimalHours(minutes: number): number {
  return Math.round((minutes / 60) * 100) / 100
}
