import { eq } from 'drizzle-orm'
import { rainOffReach, type MakeRainOff } from '../../shared/rain-offs/rain-off-schemas.ts'
import { type Day, dayPlus } from '../../shared/calendar/days.ts'
import { localDayOf } from '../../shared/calendar/local-time.ts'
import type { BookingMove } from '../../shared/planning/rain-off.ts'
import type { CurrentUser } from '../auth/current-user.ts'
import { applyBookingChanges } from '../bookings/apply-changes.ts'
import { readBookingRow, readCrew } from '../bookings/booking-store.ts'
import type { BookingDeps } from '../bookings/booking-write.ts'
import { readCrewDays } from '../bookings/calendar-store.ts'
import type { DbOrTx } from '../db/client.ts'
import { bookings } from '../db/tables/booking-tables.ts'
import type { MovedBooking } from '../db/tables/rain-off-tables.ts'
import { readFirm } from '../firm/firm-store.ts'
import { AppError, invalidField } from '../http/app-error.ts'
import { writeAudit } from '../lib/audit.ts'
import { readHeldTasks } from './held-tasks.ts'
import { type PlannedRainOff, planRainOff } from './plan-rain-off.ts'
import { insertRainOff, readRainOff, updateRainOff } from './rain-off-store.ts'

/** Two jobs on one day keep whatever was said of it; the words themselves are put back afterwards. */
const sharedAsBefore = 'Moved together'

/** @throws AppError 400 when the day is out of reach or the crew is not there. */
export function checkCrewAndDay(
  tx: DbOrTx,
  input: { crewId: string; fromDay: Day },
  today: Day,
): void {
  if (!readCrew(tx, input.crewId)?.active) throw invalidField('crewId', 'There is no such crew.')
  const { daysBack, daysAhead } = rainOffReach
  if (input.fromDay < dayPlus(today, -daysBack) || input.fromDay > dayPlus(today, daysAhead))
    throw invalidField(
      'fromDay',
      `Pick a day from ${daysBack} days ago to ${daysAhead} days ahead.`,
    )
}

/**
 * Moves a crew's bookings in one transaction; what has changed since the person looked is refused.
 *
 * @returns the rain-off's id; the same `clientId` again moves nothing and gives the one it made.
 */
export function makeRainOff(deps: BookingDeps, user: CurrentUser, input: MakeRainOff): string {
  const id = deps.db.transaction((tx) => {
    const id = input.asked?.id ?? input.clientId
    if (!input.asked && isMadeAlready(tx, input)) return id
    const now = deps.clock.now()
    const firm = readFirm(tx)
    const today = localDayOf(now, firm.timeZone)
    checkCrewAndDay(tx, input, today)
    const plan = planRainOff(tx, input, { firm, today })
    if (plan.moves.length === 0)
      throw new AppError('conflict', 'The crew has nothing booked from that day on to move.')
    requireSeen(plan, input.seen)
    const before = plan.moves.map((move) => stateBefore(tx, move, plan))
    moveAll(tx, deps, user, plan)
    const moved = before.map((one) => withVersionAfter(tx, one))
    const row = {
      id,
      crewId: input.crewId,
      fromDay: input.fromDay,
      workingDays: input.workingDays,
      state: 'made' as const,
      settledById: user.id,
      settledAt: now,
      moved,
    }
    if (input.asked) settleAsked(tx, input.asked, row)
    else insertRainOff(tx, { ...row, reason: input.reason })
    writeAudit(tx, {
      at: now,
      personId: user.id,
      action: 'rain-off.made',
      entity: 'rain-off',
      entityId: id,
      detail: { crewId: input.crewId, fromDay: input.fromDay, workingDays: input.workingDays },
    })
    return id
  })
  deps.events.publish({ topic: 'calendar' })
  return id
}

/** @throws AppError 409 when the id stands for another rain-off, or for one undone since. */
function isMadeAlready(tx: DbOrTx, input: MakeRainOff): boolean {
  const made = readRainOff(tx, input.clientId)
  if (!made) return false
  const isSame =
    made.state === 'made' &&
    made.crewId === input.crewId &&
    made.fromDay === input.fromDay &&
    made.workingDays === input.workingDays
  if (isSame) return true
  throw new AppError(
    'conflict',
    'The rain-off you pressed before was made after all. Look at the calendar; undo it before you make another.',
  )
}

function requireSeen(plan: PlannedRainOff, seen: MakeRainOff['seen']): void {
  const key = (move: { bookingId: string; daysAfter: readonly Day[] }, version?: number): string =>
    `${move.bookingId} ${version} ${move.daysAfter.join()}`
  const now = plan.moves.map((move) => key(move, plan.rowOf(move.bookingId)?.version)).sort()
  const shown = seen.map((move) => key(move, move.version)).sort()
  if (now.join('|') === shown.join('|')) return
  throw new AppError(
    'conflict',
    'The calendar has changed since you looked. What would move now is shown; look at it, then move.',
    { detail: { kind: 'calendar-changed' } },
  )
}

type Before = Omit<MovedBooking, 'versionAfter'>

function stateBefore(tx: DbOrTx, move: BookingMove, plan: PlannedRainOff): Before {
  const row = plan.rowOf(move.bookingId)
  const movedIds = new Set(plan.moves.map((one) => one.bookingId))
  const left = move.daysBefore.filter((day) => !move.daysAfter.includes(day))
  const [first, last] = [left[0], left[left.length - 1]]
  const booking = readBookingRow(tx, move.bookingId)
  const met =
    booking && first !== undefined && last !== undefined
      ? readCrewDays(tx, [booking.crewId], { from: first, to: last })
          .filter((other) => left.includes(other.day) && !movedIds.has(other.bookingId))
          .map((other) => other.bookingId)
      : []
  const firstOfJob = plan.moves.find((one) => plan.rowOf(one.bookingId)?.job.id === row?.job.id)
  return {
    bookingId: move.bookingId,
    daysBefore: move.daysBefore,
    daysAfter: move.daysAfter,
    clashReasonBefore: row?.clashReason ?? null,
    metBefore: [...new Set(met)],
    tasksHeld: row && firstOfJob === move ? readHeldTasks(tx, row.job.id) : [],
  }
}

function moveAll(tx: DbOrTx, deps: BookingDeps, user: CurrentUser, plan: PlannedRainOff): void {
  applyBookingChanges(tx, deps, user, {
    changes: plan.moves.map((move) => ({
      bookingId: move.bookingId,
      version: plan.rowOf(move.bookingId)?.version ?? 0,
      days: move.daysAfter,
      clashReason: plan.rowOf(move.bookingId)?.clashReason ?? sharedAsBefore,
      evenIfNotWorked: true,
    })),
    create: [],
  })
  for (const move of plan.moves)
    keepClashReason(tx, move.bookingId, plan.rowOf(move.bookingId)?.clashReason ?? null)
}

export function keepClashReason(tx: DbOrTx, bookingId: string, clashReason: string | null): void {
  tx.update(bookings).set({ clashReason }).where(eq(bookings.id, bookingId)).run()
}

function withVersionAfter(tx: DbOrTx, before: Before): MovedBooking {
  const row = readBookingRow(tx, before.bookingId)
  if (!row) throw new Error('A booking went while it was being moved.')
  return { ...before, versionAfter: row.version }
}

function settleAsked(
  tx: DbOrTx,
  asked: { id: string; version: number },
  made: Parameters<typeof updateRainOff>[2],
): void {
  const row = readRainOff(tx, asked.id)
  if (row?.state !== 'asked' || row.version !== asked.version)
    throw new AppError('conflict', 'Somebody else has answered this already. Look again.')
  if (row.crewId !== made.crewId)
    throw invalidField('crewId', 'Another crew asked for this. Make it for that crew.')
  updateRainOff(tx, row, made)
}
