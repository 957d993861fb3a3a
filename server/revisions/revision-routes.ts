import type { Request } from 'express'
import { z } from 'zod'
import {
  issuedSchema,
  issueRevisionSchema,
  jobRoofSchema,
  revisionSchema,
  saveDraftSchema,
  savedDraftSchema,
} from '../../shared/revisions/revision-schemas.ts'
import { currentUser } from '../auth/current-user.ts'
import { type Api, send } from '../http/api.ts'
import { notFound } from '../http/app-error.ts'
import { parseInput } from '../http/parse-input.ts'
import type { RevisionService } from './revision-service.ts'

const jobIdSchema = z.uuid()
const letterSchema = z.string().regex(/^[A-Z]{1,3}$/)

/** An address that cannot name a row is a missing row. */
function param<Schema extends z.ZodType>(req: Request, name: string, schema: Schema, what: string) {
  const parsed = schema.safeParse(req.params[name])
  if (!parsed.success) throw notFound(what)
  return parsed.data
}

const jobIdOf = (req: Request) => param(req, 'jobId', jobIdSchema, 'That job')

export function revisionRoutes(api: Api, revisions: RevisionService): void {
  api.route('get', '/api/jobs/:jobId/roof', 'roof:write', (req, res) => {
    send(res, jobRoofSchema, revisions.readRoof(currentUser(res), jobIdOf(req)))
  })

  api.route('put', '/api/jobs/:jobId/roof', 'roof:write', (req, res) => {
    const jobId = jobIdOf(req)
    const input = parseInput(saveDraftSchema, req.body)
    send(res, savedDraftSchema, revisions.saveDraft(currentUser(res), jobId, input))
  })

  api.route('post', '/api/jobs/:jobId/revisions', 'roof:write', (req, res) => {
    const jobId = jobIdOf(req)
    const { version } = parseInput(issueRevisionSchema, req.body)
    const answer = revisions.issue(currentUser(res), jobId, version)
    send(res, issuedSchema, answer, answer.issued ? 201 : 200)
  })

  api.route('get', '/api/jobs/:jobId/revisions/:letter', 'roof:read', (req, res) => {
    const jobId = jobIdOf(req)
    const letter = param(req, 'letter', letterSchema, 'That revision')
    send(res, revisionSchema, revisions.readRevision(currentUser(res), jobId, letter))
  })
}
