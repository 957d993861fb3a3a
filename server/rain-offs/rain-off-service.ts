import type { z } from 'zod'
import type {
  AskRainOff,
  MakeRainOff,
  PreviewQuery,
  rainOffListSchema,
  RainOffRow,
  SettleRainOff,
} from '../../shared/rain-offs/rain-off-schemas.ts'
import type { CurrentUser } from '../auth/current-user.ts'
import type { BookingDeps } from '../bookings/booking-write.ts'
import { askRainOff, declineRainOff, reopenRainOff, withdrawRainOff } from './answer-rain-off.ts'
import { makeRainOff } from './make-rain-off.ts'
import { previewRainOff } from './preview-rain-off.ts'
import { type ListedRainOff, listRainOffs, ofCrewsOrAskedBy } from './rain-off-store.ts'
import { readViewer, type RainOffViewer } from './rain-off-viewer.ts'
import { canUndo, undoRainOff } from './undo-rain-off.ts'

const shownDaysBack = 14

function rowOf(
  { row, crew, askedBy, settledBy }: ListedRainOff,
  seen: RainOffViewer,
  userId: string,
) {
  const { id, version, state, fromDay, workingDays, reason } = row
  return {
    id,
    version,
    state,
    crew,
    fromDay,
    workingDays,
    reason,
    askedBy,
    askedAt: row.askedAt?.toISOString() ?? null,
    settledBy,
    settledAt: row.settledAt?.toISOString() ?? null,
    takenBack: state === 'declined' && row.settledById === row.askedById,
    isMine: row.askedById === userId,
    movedBookings: row.moved.length,
    canUndo: seen.isOffice && canUndo(row, seen.firm, seen.now),
  } satisfies RainOffRow
}

export function createRainOffService(deps: BookingDeps) {
  const { db, clock } = deps
  return {
    list(user: CurrentUser): z.input<typeof rainOffListSchema> {
      const seen = readViewer(db, user, clock.now())
      const settledSince = new Date(seen.now.getTime() - shownDaysBack * 86_400_000)
      const crewIds = seen.crews.map((crew) => crew.id)
      const visible = seen.isOffice ? undefined : ofCrewsOrAskedBy(crewIds, user.id)
      const rows = listRainOffs(db, { settledSince, visible })
      return {
        today: seen.today,
        rainOffs: rows.map((row) => rowOf(row, seen, user.id)),
        crews: seen.crews,
      }
    },
    preview: (query: PreviewQuery) => previewRainOff(db, query, clock.now()),
    ask: (user: CurrentUser, input: AskRainOff) => askRainOff(deps, user, input),
    withdraw: (user: CurrentUser, id: string, input: SettleRainOff) =>
      withdrawRainOff(deps, user, id, input),
    decline: (user: CurrentUser, id: string, input: SettleRainOff) =>
      declineRainOff(deps, user, id, input),
    reopen: (user: CurrentUser, id: string, input: SettleRainOff) =>
      reopenRainOff(deps, user, id, input),
    make: (user: CurrentUser, input: MakeRainOff): string => makeRainOff(deps, user, input),
    undo: (user: CurrentUser, id: string, input: SettleRainOff): void =>
      undoRainOff(deps, user, id, input),
  }
}
