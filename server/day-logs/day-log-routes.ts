import type { Response } from 'express'
import { z } from 'zod'
import { dayToCloseSchema, writeDayLogSchema } from '../../shared/day-logs/day-log-schemas.ts'
import { currentUser } from '../auth/current-user.ts'
import type { Viewer } from '../day-sheets/task-store.ts'
import type { Db } from '../db/client.ts'
import type { EventHub } from '../events/event-hub.ts'
import { readFirm } from '../firm/firm-store.ts'
import { type Api, send } from '../http/api.ts'
import { parseInput } from '../http/parse-input.ts'
import { pathId } from '../http/path-id.ts'
import type { Clock } from '../lib/clock.ts'
import { dayToClose, takeBackDayLog, writeDayLog } from './day-log-service.ts'

type Deps = { db: Db; clock: Clock; events: EventHub }

const versionQuerySchema = z.strictObject({ version: z.coerce.number().int().min(1) })

/** Closing a day: who turned up and for how long, what was done, what held it up. */
export function dayLogRoutes(api: Api, { db, clock, events }: Deps): void {
  const viewerOf = (res: Response): Viewer => ({
    user: currentUser(res),
    firm: readFirm(db),
    now: clock.now(),
  })
  // A day closed is a day worked: calendar and board show it too.
  const changed = () => {
    events.publish({ topic: 'calendar' })
    events.publish({ topic: 'day-sheet' })
  }

  api.route('get', '/api/day-sheets/:bookingDayId/log', 'day-log:read', (req, res) => {
    const id = pathId(req, 'bookingDayId', 'That day')
    send(res, dayToCloseSchema, dayToClose(db, viewerOf(res), id))
  })

  api.route('put', '/api/day-sheets/:bookingDayId/log', 'day-log:write', (req, res) => {
    const id = pathId(req, 'bookingDayId', 'That day')
    const day = writeDayLog(db, viewerOf(res), id, parseInput(writeDayLogSchema, req.body))
    changed()
    send(res, dayToCloseSchema, day)
  })

  api.route('delete', '/api/day-sheets/:bookingDayId/log', 'day-log:write', (req, res) => {
    const id = pathId(req, 'bookingDayId', 'That day')
    const day = takeBackDayLog(db, viewerOf(res), id, parseInput(versionQuerySchema, req.query))
    changed()
    send(res, dayToCloseSchema, day)
  })
}
