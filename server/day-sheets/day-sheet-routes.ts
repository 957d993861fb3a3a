import type { Response } from 'express'
import { z } from 'zod'
import {
  dayRoofSchema,
  daySheetsQuerySchema,
  daySheetsSchema,
} from '../../shared/day-sheets/day-sheet-schemas.ts'
import {
  latestPlateCheckSchema,
  newPlateCheckSchema,
  plateCheckSchema,
} from '../../shared/day-sheets/plate-check.ts'
import {
  changeTaskSchema,
  myTasksSchema,
  newTickSchema,
  raiseHandSchema,
  taskAnswerSchema,
  taskDetailSchema,
} from '../../shared/day-sheets/task-schemas.ts'
import { daySchema } from '../../shared/http/fields.ts'
import { currentUser } from '../auth/current-user.ts'
import type { Db } from '../db/client.ts'
import type { EventHub } from '../events/event-hub.ts'
import { readFirm } from '../firm/firm-store.ts'
import { type Api, send } from '../http/api.ts'
import { parseInput } from '../http/parse-input.ts'
import { pathId } from '../http/path-id.ts'
import type { Clock } from '../lib/clock.ts'
import { keptIssuedRoofs } from '../revisions/issued-roofs.ts'
import { dayRoofFor, daySheetsFor, myTasksFor, taskDetailFor } from './day-sheet-service.ts'
import { latestComparison, recordPlateCheck } from './plate-check-service.ts'
import { addTick, changeTask, raiseHand } from './task-service.ts'
import type { Viewer } from './task-store.ts'

type Deps = { db: Db; clock: Clock; events: EventHub }

const myTasksQuerySchema = z.strictObject({ day: daySchema.optional() })

/** Day sheets, tasks, ticks and plate checks. */
export function daySheetRoutes(api: Api, { db, clock, events }: Deps): void {
  const viewerOf = (res: Response): Viewer => ({
    user: currentUser(res),
    firm: readFirm(db),
    now: clock.now(),
  })
  const source = { db, readRoofs: keptIssuedRoofs() }
  const changed = () => events.publish({ topic: 'day-sheet' })

  api.route('get', '/api/day-sheets', 'day-sheet:read', (req, res) => {
    const query = parseInput(daySheetsQuerySchema, req.query)
    send(res, daySheetsSchema, daySheetsFor(source, viewerOf(res), query))
  })

  api.route('get', '/api/day-sheets/:bookingDayId/spec', 'roof:read', (req, res) => {
    const id = pathId(req, 'bookingDayId', 'That roof')
    send(res, dayRoofSchema, dayRoofFor(source, viewerOf(res), id))
  })

  api.route('get', '/api/my-tasks', 'task:read', (req, res) => {
    const { day } = parseInput(myTasksQuerySchema, req.query)
    send(res, myTasksSchema, myTasksFor(db, viewerOf(res), day))
  })

  api.route('get', '/api/tasks/:taskId', 'task:read', (req, res) => {
    const id = pathId(req, 'taskId', 'That task')
    send(res, taskDetailSchema, taskDetailFor(source, viewerOf(res), id))
  })

  api.route('patch', '/api/tasks/:taskId', 'day-sheet:write', (req, res) => {
    const id = pathId(req, 'taskId', 'That task')
    const task = changeTask(db, viewerOf(res), id, parseInput(changeTaskSchema, req.body))
    changed()
    send(res, taskAnswerSchema, { task })
  })

  api.route('post', '/api/tasks/:taskId/ticks', 'task:tick', (req, res) => {
    const id = pathId(req, 'taskId', 'That task')
    const task = addTick(db, viewerOf(res), id, parseInput(newTickSchema, req.body))
    changed()
    send(res, taskAnswerSchema, { task })
  })

  api.route('post', '/api/tasks/:taskId/hand', 'task:tick', (req, res) => {
    const id = pathId(req, 'taskId', 'That task')
    const { raised } = parseInput(raiseHandSchema, req.body)
    const task = raiseHand(db, viewerOf(res), id, raised)
    changed()
    send(res, taskAnswerSchema, { task })
  })

  api.route('get', '/api/jobs/:jobId/plate-checks/:letter', 'plate-check:write', (req, res) => {
    const jobId = pathId(req, 'jobId', 'That job')
    const letter = String(req.params['letter'])
    send(res, latestPlateCheckSchema, {
      check: latestComparison(db, viewerOf(res), jobId, letter),
    })
  })

  api.route('post', '/api/jobs/:jobId/plate-checks', 'plate-check:write', (req, res) => {
    const jobId = pathId(req, 'jobId', 'That job')
    const input = parseInput(newPlateCheckSchema, req.body)
    const check = recordPlateCheck(db, viewerOf(res), jobId, input)
    changed()
    send(res, plateCheckSchema, check, 201)
  })
}
