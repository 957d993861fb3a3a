import { openingsQuerySchema, openingsSchema } from '../../shared/find-days/find-days-schemas.ts'
import type { Db } from '../db/client.ts'
import { type Api, send } from '../http/api.ts'
import { parseInput } from '../http/parse-input.ts'
import { pathId } from '../http/path-id.ts'
import type { Clock } from '../lib/clock.ts'
import { createFindDaysService } from './find-days-service.ts'

export function findDaysRoutes(api: Api, deps: { db: Db; clock: Clock }): void {
  const finder = createFindDaysService(deps)
  api.route('get', '/api/jobs/:jobId/openings', 'booking:write', (req, res) => {
    const id = pathId(req, 'jobId', 'That job')
    finder.requireJob(id)
    send(res, openingsSchema, finder.find(id, parseInput(openingsQuerySchema, req.query)))
  })
}
