import type { CreateBooking } from '../../shared/bookings/booking-schemas.ts'
import type { CurrentUser } from '../auth/current-user.ts'
import type { DbOrTx } from '../db/client.ts'
import { readFirm } from '../firm/firm-store.ts'
import { findClashesOf, refuseClashes } from './booking-rules.ts'
import type { BookingDeps } from './booking-write.ts'
import { replanJob } from './replan.ts'
import { stageChange } from './stage-change.ts'
import { stageCreate } from './stage-create.ts'
import type { BookingChange, Staged } from './staged.ts'

export type ChangesToApply = {
  changes: readonly (BookingChange & { bookingId: string })[]
  create: readonly CreateBooking[]
}

/**
 * Changes and makes bookings in the caller's transaction: all, or it throws and the caller's transaction
 * goes back. Each is held against its version; clashes are looked for as it stands after all of them, so
 * that two bookings may change places. Jobs touched are planned again, once each. The caller publishes
 * `calendar` when it has committed.
 *
 * @returns the bookings' ids, those changed before those made.
 * @throws AppError 400, 404, or 409 (`kind: 'stale'` with both versions, `kind: 'clash'` with all clashes).
 */
export function applyBookingChanges(
  tx: DbOrTx,
  deps: BookingDeps,
  user: CurrentUser,
  input: ChangesToApply,
): string[] {
  const firm = readFirm(tx)
  const now = deps.clock.now()
  const given = { deps, user, firm, now }
  const staged: Staged[] = [
    ...input.changes.map((one) => stageChange(tx, given, one.bookingId, one)),
    ...input.create.map((one) => stageCreate(tx, given, one)),
  ]
  const looked = staged.map(({ check }) =>
    check ? findClashesOf(tx, { ...check, calendar: firm }) : { asked: [], crewTwice: false },
  )
  refuseClashes(looked.flatMap((one) => one.asked))
  const touched = staged.filter((one, i) => one.settle(looked[i]?.crewTwice ?? false))
  for (const jobId of new Set(touched.map((one) => one.jobId))) replanJob(tx, jobId, now)
  return staged.map((one) => one.bookingId)
}

/** One change in the caller's transaction; see `applyBookingChanges`. */
export function applyBookingChange(
  tx: DbOrTx,
  deps: BookingDeps,
  user: CurrentUser,
  id: string,
  input: BookingChange,
): void {
  applyBookingChanges(tx, deps, user, { changes: [{ ...input, bookingId: id }], create: [] })
}
