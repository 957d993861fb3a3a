import type { Day } from '../../shared/calendar/days.ts'
import type { CrewHours } from '../bookings/crew-hours.ts'
import { planJob } from '../bookings/job-plan.ts'
import {
  type JobDay,
  readJobDays,
  readJobTasks,
  readNewestRevisionId,
  readSpecs,
} from '../bookings/job-plan-store.ts'
import type { DbOrTx } from '../db/client.ts'
import type { Firm } from '../firm/firm-store.ts'

export type WorkFit = {
  /** Minutes of one person that the days booked so far have no room for. */
  leftMinutes: number
  /** Whether those days of a crew hold what is left, planned as they would be once booked. */
  isEnough(crewId: string, days: readonly Day[]): boolean
}

const byDay = (a: JobDay, b: JobDay): number => (a.day < b.day ? -1 : a.day > b.day ? 1 : 0)

/** How a job's work fills days; null while no roof is issued. */
export function readWorkFit(
  db: DbOrTx,
  input: { jobId: string; firm: Firm; today: Day; hours: CrewHours },
): WorkFit | null {
  const { jobId, firm, today, hours } = input
  const revisionId = readNewestRevisionId(db, jobId)
  if (revisionId === null) return null
  const booked = readJobDays(db, jobId)
  const revisionIds = [...new Set([revisionId, ...booked.flatMap((d) => d.revisionId ?? [])])]
  const given = {
    tasks: readJobTasks(db, jobId),
    revisionId,
    specs: readSpecs(db, revisionIds),
    rates: firm.labourRates,
    hours,
    today,
  }
  const shortMinutes = (asked: readonly JobDay[]): number =>
    planJob({ ...given, days: [...booked, ...asked].sort(byDay) }).plan.shortMinutes
  const asDay = (crewId: string, day: Day): JobDay => ({
    id: `asked ${day}`,
    bookingId: 'asked',
    crewId,
    day,
    revisionId,
    cancelled: false,
    logged: false,
  })
  const leftMinutes = shortMinutes([])
  const known = new Map<string, boolean>()
  return {
    leftMinutes,
    isEnough(crewId, days) {
      const there = days.reduce((sum, day) => sum + hours.on(crewId, day).minutes, 0)
      // Too few hours need no plan to say so.
      if (there < leftMinutes) return false
      const key = `${crewId} ${days.join()}`
      const isEnough = known.get(key) ?? shortMinutes(days.map((day) => asDay(crewId, day))) <= 0
      known.set(key, isEnough)
      return isEnough
    },
  }
}
