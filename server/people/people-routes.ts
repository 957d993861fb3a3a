import type { Request } from 'express'
import { z } from 'zod'
import { doneSchema } from '../../shared/auth/auth-schemas.ts'
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
import { parseInput } from '../http/parse-input.ts'
import { pathId } from '../http/path-id.ts'
import { addCrew, addLeave, dropLeave, editCrew, listCrews, movePerson } from './crew-service.ts'
import { firmToday, type PeopleDeps } from './people-change.ts'
import { addPerson, editPerson, inviteAgain } from './people-service.ts'
import { listPeople } from './people-store.ts'

const personIdOf = (req: Request) => pathId(req, 'id', 'That person')
const crewIdOf = (req: Request) => pathId(req, 'id', 'That crew')

export function peopleRoutes(api: Api, deps: PeopleDeps): void {
  api.route('get', '/api/people', 'person:read', (_req, res) => {
    send(res, peopleListSchema, { people: listPeople(deps.db, firmToday(deps)) })
  })
  api.route('post', '/api/people', 'person:write', (req, res) => {
    send(
      res,
      personSchema,
      addPerson(deps, currentUser(res), parseInput(createPersonSchema, req.body)),
      201,
    )
  })
  api.route('patch', '/api/people/:id', 'person:write', (req, res) => {
    send(
      res,
      personSchema,
      editPerson(deps, currentUser(res), personIdOf(req), parseInput(editPersonSchema, req.body)),
    )
  })
  api.route('post', '/api/people/:id/invitation', 'person:write', (req, res) => {
    parseInput(z.strictObject({}), req.body)
    inviteAgain(deps, currentUser(res), personIdOf(req))
    send(res, doneSchema, { done: true }, 202)
  })
  api.route('put', '/api/people/:id/crew', 'crew:write', (req, res) => {
    send(
      res,
      personSchema,
      movePerson(deps, currentUser(res), personIdOf(req), parseInput(moveCrewSchema, req.body)),
    )
  })
  api.route('post', '/api/people/:id/leave', 'person:write', (req, res) => {
    send(
      res,
      personSchema,
      addLeave(deps, currentUser(res), personIdOf(req), parseInput(addLeaveSchema, req.body)),
      201,
    )
  })
  api.route('delete', '/api/people/:id/leave/:leaveId', 'person:write', (req, res) => {
    send(
      res,
      personSchema,
      dropLeave(deps, currentUser(res), personIdOf(req), pathId(req, 'leaveId', 'That leave')),
    )
  })
  api.route('get', '/api/crews', 'crew:read', (_req, res) => {
    send(res, crewListSchema, { crews: listCrews(deps, currentUser(res)) })
  })
  api.route('post', '/api/crews', 'crew:write', (req, res) => {
    addCrew(deps, currentUser(res), parseInput(crewInputSchema, req.body))
    send(res, doneSchema, { done: true }, 201)
  })
  api.route('put', '/api/crews/:id', 'crew:write', (req, res) => {
    editCrew(deps, currentUser(res), crewIdOf(req), parseInput(crewInputSchema, req.body))
    send(res, doneSchema, { done: true })
  })
}
