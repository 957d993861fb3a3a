import { longestBookingDays } from '../../shared/bookings/booking-schemas.ts'
import type { Day } from '../../shared/calendar/days.ts'
import { localDayOf } from '../../shared/calendar/local-time.ts'
import { workedDaysFrom } from '../../shared/calendar/working-days.ts'
import type { DbOrTx } from '../db/client.ts'
import type { Firm } from '../firm/firm-store.ts'
import { readCrewHours } from './crew-hours.ts'
import { planJob } from './job-plan.ts'
import {
  type JobDay,
  readJobDays,
  readJobTasks,
  readNewestRevisionId,
  readSpecs,
} from './job-plan-store.ts'

/**
 * The working days from `startsOn` that a crew needs for what the job's other bookings leave over. One day
 * when there is no roof to go by or nobody in the crew.
 */
export function daysNeeded(
  tx: DbOrTx,
  input: { jobId: string; crewId: string; startsOn: Day; firm: Firm; now: Date },
): Day[] {
  const { jobId, crewId, startsOn, firm, now } = input
  const candidates = workedDaysFrom(firm, startsOn, longestBookingDays)
  const firstOnly = candidates.slice(0, 1)
  const revisionId = readNewestRevisionId(tx, jobId)
  const last = candidates[candidates.length - 1]
  if (revisionId === null || !last) return firstOnly
  const booked = readJobDays(tx, jobId)
  const asked = candidates.map((day): JobDay => ({
    id: `asked ${day}`,
    bookingId: 'asked',
    crewId,
    day,
    revisionId,
    cancelled: false,
    logged: false,
  }))
  const days = [...booked, ...asked].sort((a, b) => (a.day < b.day ? -1 : a.day > b.day ? 1 : 0))
  const today = localDayOf(now, firm.timeZone)
  const from = days[0]?.day ?? startsOn
  const to = days[days.length - 1]?.day ?? last
  const { plan, days: planned } = planJob({
    days: days.filter((d) => d.bookingId !== 'asked' || d.day >= startsOn),
    tasks: readJobTasks(tx, jobId),
    revisionId,
    specs: readSpecs(tx, [...new Set([revisionId, ...booked.flatMap((d) => d.revisionId ?? [])])]),
    rates: firm.labourRates,
    hours: readCrewHours(tx, { from, to }, firm),
    // A booking typed in after the fact is counted from its own first day.
    today: startsOn < today ? startsOn : today,
  })
  if (plan.shortMinutes > 0) return firstOnly
  const used = planned.flatMap(({ row }, i) =>
    row.bookingId === 'asked' && (plan.days[i]?.tasks.length ?? 0) > 0 ? [row.day] : [],
  )
  const lastUsed = used[used.length - 1]
  return lastUsed === undefined ? firstOnly : candidates.filter((day) => day <= lastUsed)
}
