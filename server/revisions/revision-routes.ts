import type { Request } from 'express'
import { z } from 'zod'
import { comparisonSchema } from '../../shared/revisions/comparison-schemas.ts'
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
import { parseInput } from '../http/parse-input.ts'
import { pathId, pathPart } from '../http/path-id.ts'
import type { RevisionService } from './revision-service.ts'

const letterSchema = z.string().regex(/^[A-Z]{1,3}$/)

const jobIdOf = (req: Request) => pathId(req, 'jobId', 'That job')

export function revisionRoutes(api: Api, revisions: RevisionService): void {
  api.route('get', '/api/jobs/:jobId/roof', 'roof:write', (req, res) => {
    send(res, jobRoofSchema, revisions.readRoof(currentUser(res), jobIdOf(req)))
  })

  api.route('put', '/api/jobs/:jobId/roof', 'roof:write', (req, res) => {
    const jobId = jobIdOf(req)
    const input = parseInput(saveDraftSchema, req.body)
    send(res, savedDraftSchema, revisions.saveDraft(currentUser(res), jobId, input))
  })

  api.route('post', '/api/jobs/:jobId/revisions', 'roof:write', async (req, res) => {
    const jobId = jobIdOf(req)
    const { version } = parseInput(issueRevisionSchema, req.body)
    const answer = await revisions.issue(currentUser(res), jobId, version)
    send(res, issuedSchema, answer, answer.issued ? 201 : 200)
  })

  api.route('get', '/api/jobs/:jobId/revisions/:letter', 'roof:read', (req, res) => {
    const jobId = jobIdOf(req)
    const letter = pathPart(req, 'letter', letterSchema, 'That revision')
    send(res, revisionSchema, revisions.readRevision(currentUser(res), jobId, letter))
  })

  api.route('get', '/api/jobs/:jobId/revisions/:letter/against/:other', 'roof:read', (req, res) => {
    const jobId = jobIdOf(req)
    const letter = pathPart(req, 'letter', letterSchema, 'That revision')
    const other = pathPart(req, 'other', letterSchema, 'That revision')
    send(res, comparisonSchema, revisions.compare(currentUser(res), jobId, [letter, other]))
  })
}
