import { type SQL, sql } from 'drizzle-orm'
import {
  ownCrewWindow,
  type Permission,
  permissionScope,
  rosteredDaysAfter,
} from '../../shared/auth/permissions.ts'
import { type Day, dayPlus } from '../../shared/calendar/days.ts'
import { localDayOf, localTimeOf } from '../../shared/calendar/local-time.ts'
import { workedDaysFrom } from '../../shared/calendar/working-days.ts'
import type { CurrentUser } from '../auth/current-user.ts'
import { bookingDays, bookings } from '../db/tables/booking-tables.ts'
import { jobs } from '../db/tables/job-tables.ts'
import type { Firm } from '../firm/firm-store.ts'
import { countsForCrew } from '../people/counts-for-crew.ts'

/** The last day an apprentice may see: the next worked day once its reminder has gone, today before. */
export function lastRemindedDay(firm: Firm, now: Date): Day {
  const today = localDayOf(now, firm.timeZone)
  if (localTimeOf(now, firm.timeZone) < firm.reminderAt) return today
  return workedDaysFrom(firm, dayPlus(today, 1), 1)[0] ?? today
}

/** The user counts for the booking's crew that day: borrowed by it, or its member and not borrowed by another. */
const memberThatDay = (user: CurrentUser) =>
  countsForCrew(user.id, bookings.crewId, bookingDays.day)

/**
 * The condition under which a user may see a booking day under a permission; goes into the WHERE of a
 * query over `booking_days` joined with `bookings`. Cancelled bookings are for the caller to leave out.
 */
export function bookingDayVisible(
  user: CurrentUser,
  permission: Permission,
  firm: Firm,
  now: Date,
): SQL {
  const scope = permissionScope(user.role, permission)
  const today = localDayOf(now, firm.timeZone)
  if (scope === 'all') return sql`1 = 1`
  if (scope === 'own-crew') {
    const from = dayPlus(today, -ownCrewWindow.daysBack)
    const to = dayPlus(today, ownCrewWindow.daysAhead)
    return sql`(${bookingDays.day} between ${from} and ${to} and ${memberThatDay(user)})`
  }
  if (scope === 'rostered' || scope === 'own') {
    const from = dayPlus(today, -rosteredDaysAfter)
    const to = lastRemindedDay(firm, now)
    return sql`(${bookings.state} = 'firm' and ${bookingDays.day} between ${from} and ${to} and ${memberThatDay(user)})`
  }
  return sql`1 = 0`
}

/** The same for a job, for a query over `jobs`: visible through any of its booking days that stand. */
export function jobVisible(user: CurrentUser, permission: Permission, firm: Firm, now: Date): SQL {
  if (permissionScope(user.role, permission) === 'all') return sql`1 = 1`
  return sql`exists (
    select 1 from ${bookingDays} join ${bookings} on ${bookings.id} = ${bookingDays.bookingId}
    where ${bookings.jobId} = ${jobs.id} and ${bookings.cancelledAt} is null
      and ${bookingDayVisible(user, permission, firm, now)})`
}
