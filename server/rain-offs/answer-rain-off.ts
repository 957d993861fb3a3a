import { formatDay } from '../../shared/calendar/days.ts'
import type { AskRainOff, SettleRainOff } from '../../shared/rain-offs/rain-off-schemas.ts'
import type { CurrentUser } from '../auth/current-user.ts'
import type { BookingDeps } from '../bookings/booking-write.ts'
import type { DbOrTx } from '../db/client.ts'
import { AppError, notFound } from '../http/app-error.ts'
import { writeAudit } from '../lib/audit.ts'
import { checkCrewAndDay } from './make-rain-off.ts'
import {
  insertRainOff,
  readAskedAlready,
  readRainOff,
  type RainOffRecord,
  updateRainOff,
} from './rain-off-store.ts'
import { readViewer } from './rain-off-viewer.ts'

type Deps = Pick<BookingDeps, 'db' | 'clock' | 'events'>

/** Asked for on site; the office is shown it at once. @throws AppError 404, 400, or 409 when asked already. */
export function askRainOff(deps: Deps, user: CurrentUser, input: AskRainOff): void {
  deps.db.transaction((tx) => {
    if (readRainOff(tx, input.clientId)) return
    const { today, now, crews } = readViewer(tx, user, deps.clock.now(), input.fromDay)
    if (!crews.some((crew) => crew.id === input.crewId)) throw notFound('That crew')
    checkCrewAndDay(tx, input, today)
    const already = readAskedAlready(tx, input.crewId, input.fromDay)
    if (already)
      throw new AppError(
        'conflict',
        `${already.askedBy ?? 'Somebody'} has asked for ${formatDay(input.fromDay)} already. The office has it.`,
      )
    const { clientId: id, ...asked } = input
    insertRainOff(tx, { id, ...asked, state: 'asked', askedById: user.id, askedAt: now })
    const audit = { at: now, personId: user.id, entity: 'rain-off', entityId: id }
    writeAudit(tx, { ...audit, action: 'rain-off.asked', detail: asked })
  })
  deps.events.publish({ topic: 'calendar' })
}

/** Null: it is so already. */
type Change = (row: RainOffRecord, tx: DbOrTx, now: Date) => Partial<RainOffRecord> | null

function answer(
  deps: Deps,
  user: CurrentUser,
  id: string,
  input: SettleRainOff,
  change: Change,
): void {
  deps.db.transaction((tx) => {
    const row = readRainOff(tx, id)
    if (!row) throw notFound('That rain-off')
    const now = deps.clock.now()
    const changes = change(row, tx, now)
    if (changes === null) return
    if (row.version !== input.version)
      throw new AppError('conflict', 'Somebody else has answered this already. Look again.')
    updateRainOff(tx, row, changes)
    const audit = { at: now, personId: user.id, entity: 'rain-off', entityId: id }
    writeAudit(tx, { ...audit, action: `rain-off.${changes.state ?? row.state}` })
  })
  deps.events.publish({ topic: 'calendar' })
}

/** By who asked, while it waits; another's is as if it were not there. */
export function withdrawRainOff(
  deps: Deps,
  user: CurrentUser,
  id: string,
  input: SettleRainOff,
): void {
  answer(deps, user, id, input, (row, _tx, now) => {
    if (row.askedById !== user.id) throw notFound('That rain-off')
    if (row.state === 'declined') return null
    if (row.state !== 'asked')
      throw new AppError('conflict', 'The office has answered this already. Ring them.')
    return { state: 'declined', settledById: user.id, settledAt: now }
  })
}

export function declineRainOff(
  deps: Deps,
  user: CurrentUser,
  id: string,
  input: SettleRainOff,
): void {
  answer(deps, user, id, input, (row, _tx, now) => {
    if (row.state === 'declined') return null
    if (row.state !== 'asked')
      throw new AppError('conflict', 'This rain-off has been made. Undo it instead.')
    return { state: 'declined', settledById: user.id, settledAt: now }
  })
}

/** Takes a no back: it waits for an answer again. */
export function reopenRainOff(
  deps: Deps,
  user: CurrentUser,
  id: string,
  input: SettleRainOff,
): void {
  answer(deps, user, id, input, (row, tx) => {
    if (row.state === 'asked') return null
    if (row.state !== 'declined')
      throw new AppError('conflict', 'Only one that was declined can be opened again.')
    if (readAskedAlready(tx, row.crewId, row.fromDay))
      throw new AppError('conflict', 'The same day has been asked for again meanwhile.')
    return { state: 'asked', settledById: null, settledAt: null }
  })
}
