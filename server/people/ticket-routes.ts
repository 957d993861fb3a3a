import type { Request, Response } from 'express'
import { doneSchema } from '../../shared/auth/auth-schemas.ts'
import {
  addTicketSchema,
  editTicketSchema,
  ticketListSchema,
  ticketSchema,
} from '../../shared/people/ticket-schemas.ts'
import { currentUser } from '../auth/current-user.ts'
import { type Api, send } from '../http/api.ts'
import { parseInput } from '../http/parse-input.ts'
import { pathId } from '../http/path-id.ts'
import { photoOf, receivePhoto } from '../http/receive-photo.ts'
import type { PeopleDeps } from './people-change.ts'
import {
  addTicket,
  dropTicket,
  dropTicketPhoto,
  editTicket,
  setTicketPhoto,
  ticketPhoto,
} from './ticket-service.ts'
import { type CardPhoto, readTickets, ticketsOf } from './ticket-store.ts'

const ofPerson = (req: Request) => ({
  personId: pathId(req, 'id', 'That person'),
  ticketId: pathId(req, 'ticketId', 'That ticket'),
})

function sendPhoto(res: Response, { contentType, bytes }: CardPhoto): void {
  res.setHeader('Content-Disposition', 'inline; filename="ticket.jpg"')
  res.type(contentType).send(bytes)
}

/** Tickets for the office, and each person's own. */
export function ticketRoutes(api: Api, deps: PeopleDeps): void {
  api.route('post', '/api/people/:id/tickets', 'person:write', (req, res) => {
    const personId = pathId(req, 'id', 'That person')
    const input = parseInput(addTicketSchema, req.body)
    send(res, ticketSchema, addTicket(deps, currentUser(res), personId, input), 201)
  })
  api.route('put', '/api/people/:id/tickets/:ticketId', 'person:write', (req, res) => {
    const owned = ofPerson(req)
    const input = parseInput(editTicketSchema, req.body)
    send(res, ticketSchema, editTicket(deps, currentUser(res), owned, input))
  })
  api.route('delete', '/api/people/:id/tickets/:ticketId', 'person:write', (req, res) => {
    dropTicket(deps, currentUser(res), ofPerson(req))
    send(res, doneSchema, { done: true })
  })

  const photoPath = '/api/people/:id/tickets/:ticketId/photo'
  api.route('get', photoPath, 'person:read', (req, res) => {
    sendPhoto(res, ticketPhoto(deps.db, ofPerson(req)))
  })
  api.route('put', photoPath, 'person:write', receivePhoto(), async (req, res) => {
    const owned = ofPerson(req)
    send(res, ticketSchema, await setTicketPhoto(deps, currentUser(res), owned, photoOf(req)))
  })
  api.route('delete', photoPath, 'person:write', (req, res) => {
    send(res, ticketSchema, dropTicketPhoto(deps, currentUser(res), ofPerson(req)))
  })

  api.route('get', '/api/account/tickets', 'account:own', (_req, res) => {
    const own = readTickets(deps.db, ticketsOf(currentUser(res).id))
    send(res, ticketListSchema, { tickets: own.map((found) => found.ticket) })
  })
  api.route('get', '/api/account/tickets/:ticketId/photo', 'account:own', (req, res) => {
    const ticketId = pathId(req, 'ticketId', 'That ticket')
    sendPhoto(res, ticketPhoto(deps.db, { personId: currentUser(res).id, ticketId }))
  })
}
