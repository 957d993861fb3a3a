import type { Request } from 'express'
import { z } from 'zod'
import { doneSchema } from '../../shared/auth/auth-schemas.ts'
import { idSchema } from '../../shared/http/fields.ts'
import {
  addLeaveSchema,
  createPersonSchema,
  crewInputSchema,
  crewListSchema,
  editPersonSchema,
  moveCrewSchema,
  peopleListSchema,
  personSchema,
} from '../../shared/people/people-schemas.ts'
import { currentUser } from '../auth/current-user.ts'
import { type Api, send } from '../http/api.ts'
import { notFound } from '../http/app-error.ts'
import { parseInput } from '../http/parse-input.ts'
import type { PeopleService } from './people-service.ts'

/** An id in the path that is no id is a row that is not there. */
function idIn(req: Request, name: string): string {
  const parsed = idSchema.safeParse(req.params[name])
  if (!parsed.success) throw notFound()
  return parsed.data
}

export function peopleRoutes(api: Api, people: PeopleService): void {
  api.route('get', '/api/people', 'person:read', (_req, res) => {
    send(res, peopleListSchema, { people: people.list() })
  })
  api.route('post', '/api/people', 'person:write', (req, res) => {
    send(
      res,
      personSchema,
      people.create(currentUser(res), parseInput(createPersonSchema, req.body)),
      201,
    )
  })
  api.route('patch', '/api/people/:id', 'person:write', (req, res) => {
    send(
      res,
      personSchema,
      people.edit(currentUser(res), idIn(req, 'id'), parseInput(editPersonSchema, req.body)),
    )
  })
  api.route('post', '/api/people/:id/invitation', 'person:write', (req, res) => {
    parseInput(z.strictObject({}), req.body)
    people.inviteAgain(currentUser(res), idIn(req, 'id'))
    send(res, doneSchema, { done: true }, 202)
  })
  api.route('put', '/api/people/:id/crew', 'crew:write', (req, res) => {
    send(
      res,
      personSchema,
      people.move(currentUser(res), idIn(req, 'id'), parseInput(moveCrewSchema, req.body)),
    )
  })
  api.route('post', '/api/people/:id/leave', 'person:write', (req, res) => {
    send(
      res,
      personSchema,
      people.addLeave(currentUser(res), idIn(req, 'id'), parseInput(addLeaveSchema, req.body)),
      201,
    )
  })
  api.route('delete', '/api/people/:id/leave/:leaveId', 'person:write', (req, res) => {
    send(
      res,
      personSchema,
      people.dropLeave(currentUser(res), idIn(req, 'id'), idIn(req, 'leaveId')),
    )
  })
  api.route('get', '/api/crews', 'crew:read', (_req, res) => {
    send(res, crewListSchema, { crews: people.crews(currentUser(res)) })
  })
  api.route('post', '/api/crews', 'crew:write', (req, res) => {
    people.addCrew(currentUser(res), parseInput(crewInputSchema, req.body))
    send(res, doneSchema, { done: true }, 201)
  })
  api.route('put', '/api/crews/:id', 'crew:write', (req, res) => {
    people.editCrew(currentUser(res), idIn(req, 'id'), parseInput(crewInputSchema, req.body))
    send(res, doneSchema, { done: true })
  })
}
