import type { Request } from 'express'
import { z } from 'zod'
import {
  boardQuerySchema,
  changeJobSchema,
  createJobSchema,
  jobFactNames,
  setFactSchema,
} from '../../shared/jobs/job-schemas.ts'
import { boardSchema, jobSchema } from '../../shared/jobs/job-views.ts'
import { currentUser } from '../auth/current-user.ts'
import { type Api, send } from '../http/api.ts'
import { parseInput } from '../http/parse-input.ts'
import { pathId, pathPart } from '../http/path-id.ts'
import { createJobService, type JobDeps } from './job-service.ts'

const jobIdOf = (req: Request) => pathId(req, 'jobId', 'This job')

export function jobRoutes(api: Api, deps: JobDeps): void {
  const jobs = createJobService(deps)

  api.route('get', '/api/jobs', 'board:read', (req, res) => {
    send(res, boardSchema, jobs.board(currentUser(res), parseInput(boardQuerySchema, req.query)))
  })

  api.route('post', '/api/jobs', 'job:write', (req, res) => {
    const input = parseInput(createJobSchema, req.body)
    send(res, jobSchema, jobs.create(currentUser(res), input), 201)
  })

  api.route('get', '/api/jobs/:jobId', 'job:read', (req, res) => {
    send(res, jobSchema, jobs.read(currentUser(res), jobIdOf(req)))
  })

  api.route('patch', '/api/jobs/:jobId', 'job:write', (req, res) => {
    const jobId = jobIdOf(req)
    const input = parseInput(changeJobSchema, req.body)
    send(res, jobSchema, jobs.change(currentUser(res), jobId, input))
  })

  api.route('put', '/api/jobs/:jobId/facts/:fact', 'job:write', (req, res) => {
    const jobId = jobIdOf(req)
    const fact = pathPart(req, 'fact', z.enum(jobFactNames), 'This')
    const input = parseInput(setFactSchema, req.body)
    send(res, jobSchema, jobs.setFact(currentUser(res), jobId, fact, input))
  })
}
