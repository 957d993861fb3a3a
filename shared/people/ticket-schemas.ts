import { z } from 'zod'
import { daySchema, lineSchema, versionSchema } from '../http/fields.ts'
import { ticketKinds } from './ticket-kinds.ts'

const ticketFields = {
  kind: z.enum(ticketKinds, 'Pick what the ticket is for.'),
  name: lineSchema(60),
  number: lineSchema(40),
  /** The last day it holds; null: it does not lapse. */
  expiresOn: daySchema.nullable(),
}

const isNamed = (ticket: { kind: string; name: string }) =>
  ticket.kind !== 'other' || ticket.name !== ''
const unnamed = { path: ['name'], message: 'Say what the ticket is for.' }

export const addTicketSchema = z.strictObject(ticketFields).refine(isNamed, unnamed)
export const editTicketSchema = z
  .strictObject({ ...ticketFields, version: versionSchema })
  .refine(isNamed, unnamed)

/** A ticket as its owner and the office see it. */
export const ticketSchema = z.object({
  id: z.string(),
  kind: z.enum(ticketKinds),
  name: z.string(),
  number: z.string(),
  expiresOn: z.string().nullable(),
  /** When the photo of its card was added; null: there is none. */
  photoAt: z.iso.datetime().nullable(),
  version: z.number(),
})
export type Ticket = z.infer<typeof ticketSchema>

export const ticketListSchema = z.object({ tickets: z.array(ticketSchema) })
