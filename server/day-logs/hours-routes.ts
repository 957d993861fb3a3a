import type { Response } from 'express'
import {
  jobHoursSchema,
  weekHoursSchema,
  weekQuerySchema,
} from '../../shared/day-logs/hours-schemas.ts'
import { currentUser } from '../auth/current-user.ts'
import type { Viewer } from '../day-sheets/task-store.ts'
import type { Db } from '../db/client.ts'
import { readFirm } from '../firm/firm-store.ts'
import { type Api, send } from '../http/api.ts'
import { parseInput } from '../http/parse-input.ts'
import { pathId } from '../http/path-id.ts'
import type { Clock } from '../lib/clock.ts'
import { weekHoursCsv } from './hours-csv.ts'
import { jobHours, weekHours } from './hours-service.ts'

/** Hours as the office reads them: of a job against its plan, of a week for the wages. */
export function hoursRoutes(api: Api, { db, clock }: { db: Db; clock: Clock }): void {
  const viewerOf = (res: Response): Viewer => ({
    user: currentUser(res),
    firm: readFirm(db),
    now: clock.now(),
  })

  api.route('get', '/api/jobs/:jobId/hours', 'hours:read', (req, res) => {
    send(res, jobHoursSchema, jobHours(db, viewerOf(res), pathId(req, 'jobId', 'That job')))
  })

  api.route('get', '/api/hours', 'hours:read', (req, res) => {
    const { week } = parseInput(weekQuerySchema, req.query)
    send(res, weekHoursSchema, weekHours(db, viewerOf(res), week))
  })

  api.route('get', '/api/hours.csv', 'hours:read', (req, res) => {
    const { week } = parseInput(weekQuerySchema, req.query)
    const hours = weekHoursSchema.parse(weekHours(db, viewerOf(res), week))
    res.attachment(`hours-${hours.days[0] ?? hours.today}.csv`)
    res.type('text/csv; charset=utf-8').send(weekHoursCsv(hours))
  })
}
