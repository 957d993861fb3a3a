import type { Request, Response } from 'express'
import {
  askRainOffSchema,
  makeRainOffSchema,
  previewQuerySchema,
  rainOffListSchema,
  rainOffPreviewSchema,
  settleRainOffSchema,
} from '../../shared/rain-offs/rain-off-schemas.ts'
import { currentUser } from '../auth/current-user.ts'
import { createCalendarService } from '../bookings/calendar-service.ts'
import type { Db } from '../db/client.ts'
import type { EventHub } from '../events/event-hub.ts'
import { type Api, send } from '../http/api.ts'
import { parseInput } from '../http/parse-input.ts'
import { pathId } from '../http/path-id.ts'
import type { Clock } from '../lib/clock.ts'
import { createRainOffService } from './rain-off-service.ts'

export function rainOffRoutes(api: Api, deps: { db: Db; clock: Clock; events: EventHub }): void {
  const rainOffs = createRainOffService({ ...deps, calendar: createCalendarService(deps) })
  const idOf = (req: Request): string => pathId(req, 'rainOffId', 'That rain-off')
  // Every change answers with the list as it then is, so that no screen waits for the news of it.
  const sendList = (res: Response, status = 200): void =>
    send(res, rainOffListSchema, rainOffs.list(currentUser(res)), status)

  api.route('get', '/api/rain-offs', 'rain-off:ask', (_req, res) => sendList(res))

  api.route('post', '/api/rain-offs/asked', 'rain-off:ask', (req, res) => {
    rainOffs.ask(currentUser(res), parseInput(askRainOffSchema, req.body))
    sendList(res, 201)
  })

  api.route('post', '/api/rain-offs/:rainOffId/withdraw', 'rain-off:ask', (req, res) => {
    const input = parseInput(settleRainOffSchema, req.body)
    rainOffs.withdraw(currentUser(res), idOf(req), input)
    sendList(res)
  })

  api.route('get', '/api/rain-offs/preview', 'rain-off:write', (req, res) => {
    const query = parseInput(previewQuerySchema, req.query)
    send(res, rainOffPreviewSchema, rainOffs.preview(query))
  })

  api.route('post', '/api/rain-offs', 'rain-off:write', (req, res) => {
    rainOffs.make(currentUser(res), parseInput(makeRainOffSchema, req.body))
    sendList(res, 201)
  })

  api.route('post', '/api/rain-offs/:rainOffId/decline', 'rain-off:write', (req, res) => {
    const input = parseInput(settleRainOffSchema, req.body)
    rainOffs.decline(currentUser(res), idOf(req), input)
    sendList(res)
  })

  api.route('post', '/api/rain-offs/:rainOffId/reopen', 'rain-off:write', (req, res) => {
    const input = parseInput(settleRainOffSchema, req.body)
    rainOffs.reopen(currentUser(res), idOf(req), input)
    sendList(res)
  })

  api.route('post', '/api/rain-offs/:rainOffId/undo', 'rain-off:write', (req, res) => {
    const input = parseInput(settleRainOffSchema, req.body)
    rainOffs.undo(currentUser(res), idOf(req), input)
    sendList(res)
  })
}
