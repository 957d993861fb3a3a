import {
  changeVariationSchema,
  createVariationSchema,
  jobVariationsSchema,
} from '../../shared/variations/variation-schemas.ts'
import { currentUser } from '../auth/current-user.ts'
import { type Api, send } from '../http/api.ts'
import { parseInput } from '../http/parse-input.ts'
import { pathId } from '../http/path-id.ts'
import { createVariationService, type VariationDeps } from './variation-service.ts'

export function variationRoutes(api: Api, deps: VariationDeps): void {
  const variations = createVariationService(deps)

  api.route('get', '/api/jobs/:jobId/variations', 'price:read', (req, res) => {
    const jobId = pathId(req, 'jobId', 'This job')
    send(res, jobVariationsSchema, variations.read(currentUser(res), jobId))
  })

  api.route('post', '/api/jobs/:jobId/variations', 'variation:write', (req, res) => {
    const jobId = pathId(req, 'jobId', 'This job')
    const input = parseInput(createVariationSchema, req.body)
    send(res, jobVariationsSchema, variations.create(currentUser(res), jobId, input), 201)
  })

  api.route('patch', '/api/jobs/:jobId/variations/:id', 'variation:write', (req, res) => {
    const jobId = pathId(req, 'jobId', 'This job')
    const id = pathId(req, 'id', 'This variation')
    const input = parseInput(changeVariationSchema, req.body)
    send(res, jobVariationsSchema, variations.change(currentUser(res), jobId, id, input))
  })
}
