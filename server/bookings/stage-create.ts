import type { CreateBooking } from '../../shared/bookings/booking-schemas.ts'
import type { Day } from '../../shared/calendar/days.ts'
import { workedDaysFrom } from '../../shared/calendar/working-days.ts'
import type { DbOrTx } from '../db/client.ts'
import type { Firm } from '../firm/firm-store.ts'
import { AppError, invalidField } from '../http/app-error.ts'
import { requireRoof, sortedDays } from './booking-rules.ts'
import { insertBooking, readBookingRow, readCrew, readJobToBook } from './booking-store.ts'
import { recordBooking } from './booking-write.ts'
import { placeRow } from './change-rules.ts'
import { daysNeeded } from './days-needed.ts'
import { readNewestRevisionId } from './job-plan-store.ts'
import type { Staged, StageGiven } from './staged.ts'

/**
 * The same `clientId` again stages nothing: the booking it made is there.
 *
 * @throws AppError 400 at the field at fault, 409 when the id was used for another job.
 */
export function stageCreate(tx: DbOrTx, given: StageGiven, input: CreateBooking): Staged {
  const { clientId: id, jobId } = input
  const staged = { bookingId: id, jobId }
  const made = readBookingRow(tx, id)
  if (made && made.jobId !== jobId)
    throw new AppError('conflict', 'That booking was made already, for another job.')
  if (made) return { ...staged, check: null, settle: () => false }
  const { now } = given
  const { crew, revisionId } = checkWhatIsBooked(tx, input)
  const days = daysToBook(tx, input, given.firm, now)
  const row = {
    id,
    jobId,
    crewId: crew.id,
    state: input.state,
    startAt: input.startAt ?? null,
    gear: input.gear ?? '',
    uid: id,
    createdAt: now,
    updatedAt: now,
  }
  insertBooking(tx, row, days, revisionId)
  return {
    ...staged,
    check: { booking: { bookingId: id, crew, days }, before: null, said: input },
    settle(crewTwice) {
      placeRow(tx, id, { clashReason: crewTwice ? (input.clashReason ?? null) : null })
      const detail = { days, state: input.state }
      recordBooking(given.deps, tx, { user: given.user, action: 'booking.created', id, detail })
      return true
    },
  }
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
