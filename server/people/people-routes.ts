import type { Request } from 'express'
import { z } from 'zod'
import { doneSchema } from '../../shared/auth/auth-schemas.ts'
import { addLeaveSchema } from '../../shared/people/leave-schemas.ts'
import {
  addLoanSchema,
  createPersonSchema,
  crewInputSchema,
  crewListSchema,
  crewPeopleSchema,
  editPersonSchema,
  loanSchema,
  moveCrewSchema,
  peopleListSchema,
  personDetailSchema,
  personHoursSchema,
  personSchema,
} from '../../shared/people/people-schemas.ts'
import { currentUser } from '../auth/current-user.ts'
import { type Api, send } from '../http/api.ts'
import { parseInput } from '../http/parse-input.ts'
import { pathId } from '../http/path-id.ts'
import { addCrew, crewPeople, editCrew, listCrews, movePerson } from './crew-service.ts'
import { addLeave, dropLeave } from './leave-service.ts'
import { addLoan, dropLoan } from './loan-service.ts'
import { firmToday, type PeopleDeps } from './people-change.ts'
import { addPerson, editPerson, inviteAgain, personDetail, setHours } from './people-service.ts'
import { listPeople } from './people-store.ts'

const personIdOf = (req: Request) => pathId(req, 'id', 'That person')
const crewIdOf = (req: Request) => pathId(req, 'id', 'That crew')

export function peopleRoutes(api: Api, deps: PeopleDeps): void {
  personRoutes(api, deps)
  awayRoutes(api, deps)
  crewRoutes(api, deps)
}

function personRoutes(api: Api, deps: PeopleDeps): void {
  api.route('get', '/api/people', 'person:read', (_req, res) => {
    const people = listPeople(deps.db, firmToday(deps), deps.clock.now())
    send(res, peopleListSchema, { people })
  })
  api.route('get', '/api/people/:id', 'person:read', (req, res) => {
    send(res, personDetailSchema, personDetail(deps, personIdOf(req)))
  })
  api.route('post', '/api/people', 'person:write', (req, res) => {
    const input = parseInput(createPersonSchema, req.body)
    send(res, personSchema, addPerson(deps, currentUser(res), input), 201)
  })
  api.route('patch', '/api/people/:id', 'person:write', (req, res) => {
    const id = personIdOf(req)
    const input = parseInput(editPersonSchema, req.body)
    send(res, personSchema, editPerson(deps, currentUser(res), id, input))
  })
  api.route('put', '/api/people/:id/hours', 'person:write', (req, res) => {
    const id = personIdOf(req)
    const input = parseInput(personHoursSchema, req.body)
    send(res, personDetailSchema, setHours(deps, currentUser(res), id, input))
  })
  api.route('post', '/api/people/:id/invitation', 'person:write', (req, res) => {
    parseInput(z.strictObject({}), req.body)
    inviteAgain(deps, currentUser(res), personIdOf(req))
    send(res, doneSchema, { done: true }, 202)
  })
}

/** Leave, and days with another crew. */
function awayRoutes(api: Api, deps: PeopleDeps): void {
  api.route('post', '/api/people/:id/leave', 'person:write', (req, res) => {
    const id = personIdOf(req)
    const input = parseInput(addLeaveSchema, req.body)
    send(res, personSchema, addLeave(deps, currentUser(res), id, input), 201)
  })
  api.route('delete', '/api/people/:id/leave/:leaveId', 'person:write', (req, res) => {
    const leaveId = pathId(req, 'leaveId', 'That leave')
    send(res, personSchema, dropLeave(deps, currentUser(res), personIdOf(req), leaveId))
  })
  api.route('post', '/api/people/:id/loans', 'crew:write', (req, res) => {
    const id = personIdOf(req)
    const input = parseInput(addLoanSchema, req.body)
    send(res, loanSchema, addLoan(deps, currentUser(res), id, input), 201)
  })
  api.route('delete', '/api/people/:id/loans/:loanId', 'crew:write', (req, res) => {
    const loanId = pathId(req, 'loanId', 'That day')
    dropLoan(deps, currentUser(res), personIdOf(req), loanId)
    send(res, doneSchema, { done: true })
  })
}

function crewRoutes(api: Api, deps: PeopleDeps): void {
  api.route('put', '/api/people/:id/crew', 'crew:write', (req, res) => {
    const id = personIdOf(req)
    const input = parseInput(moveCrewSchema, req.body)
    send(res, personSchema, movePerson(deps, currentUser(res), id, input))
  })
  api.route('get', '/api/crews', 'crew:read', (_req, res) => {
    send(res, crewListSchema, { crews: listCrews(deps, currentUser(res)) })
  })
  api.route('get', '/api/crews/:id/people', 'person:read', (req, res) => {
    send(res, crewPeopleSchema, crewPeople(deps, crewIdOf(req)))
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
