import {
  bookingLandingsQuerySchema,
  jobLandingsQuerySchema,
  landingsSchema,
} from '../../shared/clashes/clash-schemas.ts'
import { clashListSchema } from '../../shared/clashes/clash-list-schemas.ts'
import { currentUser } from '../auth/current-user.ts'
import type { Db } from '../db/client.ts'
import { type Api, send } from '../http/api.ts'
import { parseInput } from '../http/parse-input.ts'
import { pathId } from '../http/path-id.ts'
import type { Clock } from '../lib/clock.ts'
import { createClashService } from './clash-service.ts'
import { createLandingService } from './landing-service.ts'

export function clashRoutes(api: Api, deps: { db: Db; clock: Clock }): void {
  const clashes = createClashService(deps)
  const landings = createLandingService(deps)

  api.route('get', '/api/clashes', 'calendar:read', (_req, res) => {
    send(res, clashListSchema, clashes.list(currentUser(res)))
  })

  api.route('get', '/api/bookings/:bookingId/landings', 'booking:write', (req, res) => {
    const id = pathId(req, 'bookingId', 'That booking')
    landings.requireBooking(id)
    const asked = parseInput(bookingLandingsQuerySchema, req.query)
    send(res, landingsSchema, landings.ofBooking(id, asked))
  })

  api.route('get', '/api/jobs/:jobId/landings', 'booking:write', (req, res) => {
    const id = pathId(req, 'jobId', 'That job')
    landings.requireJob(id)
    const asked = parseInput(jobLandingsQuerySchema, req.query)
    send(res, landingsSchema, landings.ofJob(id, asked))
  })
}
