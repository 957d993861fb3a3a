import type { CreateBooking } from '../../shared/bookings/booking-schemas.ts'
import type { Booking } from '../../shared/bookings/calendar-schemas.ts'
import type { Day } from '../../shared/calendar/days.ts'
import { workedDaysFrom } from '../../shared/calendar/working-days.ts'
import type { CurrentUser } from '../auth/current-user.ts'
import type { DbOrTx } from '../db/client.ts'
import { type Firm, readFirm } from '../firm/firm-store.ts'
import { AppError, invalidField } from '../http/app-error.ts'
import { requireRoof, settleClashes, sortedDays } from './booking-rules.ts'
import {
  type BookingRow,
  insertBooking,
  readBookingRow,
  readCrew,
  readJobToBook,
} from './booking-store.ts'
import { type BookingDeps, recordBooking, writeBooking } from './booking-write.ts'
import { daysNeeded } from './days-needed.ts'
import { readNewestRevisionId } from './job-plan-store.ts'
import { replanJob } from './replan.ts'

/** Books a crew for a job; the same `clientId` again gives the booking it made. */
export function createBooking(deps: BookingDeps, user: CurrentUser, input: CreateBooking): Booking {
  const made = readBookingRow(deps.db, input.clientId)
  if (made) return madeBefore(deps.calendar.readBooking(user, made.id), made, input)
  return writeBooking(deps, user, (tx) => {
    const now = deps.clock.now()
    const firm = readFirm(tx)
    const { crew, revisionId } = checkWhatIsBooked(tx, input)
    const days = daysToBook(tx, input, firm, now)
    const { crewTwice } = settleClashes(tx, {
      booking: { bookingId: input.clientId, crew, days },
      before: null,
      calendar: firm,
      said: input,
    })
    const row = {
      id: input.clientId,
      jobId: input.jobId,
      crewId: crew.id,
      state: input.state,
      startAt: input.startAt ?? null,
      gear: input.gear ?? '',
      clashReason: crewTwice ? (input.clashReason ?? null) : null,
      uid: input.clientId,
      createdAt: now,
      updatedAt: now,
    }
    insertBooking(tx, row, days, revisionId)
    replanJob(tx, input.jobId, now)
    const detail = { days, state: input.state }
    recordBooking(deps, tx, { user, action: 'booking.created', id: row.id, detail })
    return row.id
  })
}

function madeBefore(booking: Booking | null, row: BookingRow, input: CreateBooking): Booking {
  if (!booking || row.jobId !== input.jobId)
    throw new AppError('conflict', 'That booking was made already, for another job.')
  return booking
}

function checkWhatIsBooked(tx: DbOrTx, input: CreateBooking) {
  const job = readJobToBook(tx, input.jobId)
  if (!job) throw invalidField('jobId', 'There is no such job.')
  if (job.completedOn)
    throw invalidField('jobId', `${job.number} is marked complete. Reopen it first.`)
  const crew = readCrew(tx, input.crewId)
  if (!crew?.active) throw invalidField('crewId', 'There is no such crew.')
  const revisionId = readNewestRevisionId(tx, input.jobId)
  if (input.state === 'firm') requireRoof(revisionId)
  return { crew, revisionId }
}

function daysToBook(tx: DbOrTx, input: CreateBooking, firm: Firm, now: Date): Day[] {
  const { startsOn, workingDays, days } = input
  if (days) return sortedDays(days)
  if (!startsOn) throw invalidField('startsOn', 'Pick the first day.')
  const following =
    workingDays === undefined
      ? daysNeeded(tx, { jobId: input.jobId, crewId: input.crewId, startsOn, firm, now })
      : workedDaysFrom(firm, startsOn, workingDays)
  // The first day is meant as typed: on a day not worked it is for the clash check to ask.
  if (following.includes(startsOn)) return following
  return sortedDays([startsOn, ...following.slice(0, Math.max(0, following.length - 1))])
}
