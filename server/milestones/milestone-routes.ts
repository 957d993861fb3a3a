import {
  jobMilestonesSchema,
  milestoneKindSchema,
  setMilestoneSchema,
} from '../../shared/milestones/milestone-schemas.ts'
import { currentUser } from '../auth/current-user.ts'
import { type Api, send } from '../http/api.ts'
import { parseInput } from '../http/parse-input.ts'
import { pathId, pathPart } from '../http/path-id.ts'
import { createMilestoneService, type MilestoneDeps } from './milestone-service.ts'

export function milestoneRoutes(api: Api, deps: MilestoneDeps): void {
  const milestones = createMilestoneService(deps)

  api.route('get', '/api/jobs/:jobId/milestones', 'job:read', (req, res) => {
    const jobId = pathId(req, 'jobId', 'This job')
    send(res, jobMilestonesSchema, milestones.read(currentUser(res), jobId))
  })

  api.route('put', '/api/jobs/:jobId/milestones/:kind', 'milestone:write', (req, res) => {
    const jobId = pathId(req, 'jobId', 'This job')
    const kind = pathPart(req, 'kind', milestoneKindSchema, 'This')
    const input = parseInput(setMilestoneSchema, req.body)
    send(res, jobMilestonesSchema, milestones.set(currentUser(res), { jobId, kind }, input))
  })
}
