import { z } from 'zod'
import { roleSchema } from '../auth/roles.ts'
import {
  daySchema,
  emailSchema,
  idSchema,
  phoneSchema,
  lineSchema,
  versionSchema,
} from '../http/fields.ts'
import { leaveSchema } from './leave-schemas.ts'
import { ticketSchema } from './ticket-schemas.ts'

const personFields = {
  name: lineSchema(80, { required: 'Give the name people know them by.' }),
  email: emailSchema,
  phone: phoneSchema,
  role: roleSchema,
}

export const createPersonSchema = z.strictObject({
  ...personFields,
  crewId: idSchema.nullable(),
})

export const editPersonSchema = z.strictObject({
  ...personFields,
  active: z.boolean(),
  version: versionSchema,
})

export const moveCrewSchema = z.strictObject({
  /** Null: in no crew from that day on. */
  crewId: idSchema.nullable(),
  from: daySchema,
})

/** Monday to Sunday; null: the firm's. */
const weekHoursSchema = z
  .array(
    z
      .number('Give the hours as a number, 0 for none.')
      .min(0, 'Give hours from 0 to 14.')
      .max(14, 'Give hours from 0 to 14.'),
  )
  .length(7)
  .nullable()

export const personHoursSchema = z.strictObject({
  weekHours: weekHoursSchema,
  version: versionSchema,
})

export const addLoanSchema = z.strictObject({
  /** The crew that borrows. */
  crewId: idSchema,
  day: daySchema,
  note: lineSchema(120),
})

export const crewInputSchema = z.strictObject({
  name: lineSchema(40, { required: 'Give the crew a name.' }),
  letter: z
    .string()
    .trim()
    .toUpperCase()
    .regex(/^[A-Z]$/, 'One letter, for the pennant.'),
  colour: z.number().int().min(1).max(6),
  /** False: stood down, no longer to choose. */
  active: z.boolean().default(true),
})

export const crewSchema = z.object({
  id: z.string(),
  name: z.string(),
  letter: z.string(),
  colour: z.number(),
  active: z.boolean(),
})
export type Crew = z.infer<typeof crewSchema>

export const crewListSchema = z.object({ crews: z.array(crewSchema) })

/** How the link to sign in stands: never sent, on its way, stuck, good until a day, or no longer good. */
export const signInLinkSchema = z.object({
  state: z.enum(['none', 'waiting', 'failed', 'works', 'ended']),
  sentAt: z.iso.datetime().nullable(),
  worksUntil: z.iso.datetime().nullable(),
})
export type SignInLink = z.infer<typeof signInLinkSchema>

export const personSchema = z.object({
  id: z.string(),
  name: z.string(),
  email: z.string(),
  phone: z.string(),
  role: roleSchema,
  active: z.boolean(),
  /** Has not yet chosen a password. */
  invited: z.boolean(),
  link: signInLinkSchema,
  /** The own crew today, and the next move when one is set. */
  crewId: z.string().nullable(),
  nextMove: z.object({ crewId: z.string().nullable(), from: z.string() }).nullable(),
  /** The crew that has borrowed the person today. */
  lentToId: z.string().nullable(),
  /** Today's and coming leave. */
  leave: z.array(leaveSchema),
  tickets: z.array(ticketSchema),
  version: z.number(),
})
export type Person = z.infer<typeof personSchema>

export const peopleListSchema = z.object({ people: z.array(personSchema) })

export const loanSchema = z.object({
  id: z.string(),
  crewId: z.string(),
  day: z.string(),
  note: z.string(),
})
export type Loan = z.infer<typeof loanSchema>

/** What the office sees of one person beside the list. */
export const personDetailSchema = personSchema.extend({
  weekHours: z.array(z.number()).nullable(),
  firmWeekHours: z.array(z.number()),
  /** The newest first. */
  memberships: z.array(
    z.object({
      id: z.string(),
      crewId: z.string(),
      startsOn: z.string(),
      endsOn: z.string().nullable(),
    }),
  ),
  /** Today's and coming days with another crew. */
  loans: z.array(loanSchema),
})
export type PersonDetail = z.infer<typeof personDetailSchema>

/** Who is, will be and was in a crew, and whom it borrows; the newest first. */
export const crewPeopleSchema = z.object({
  members: z.array(
    z.object({
      id: z.string(),
      personId: z.string(),
      name: z.string(),
      role: roleSchema,
      startsOn: z.string(),
      endsOn: z.string().nullable(),
    }),
  ),
  loans: z.array(
    z.object({
      id: z.string(),
      personId: z.string(),
      name: z.string(),
      day: z.string(),
      note: z.string(),
    }),
  ),
})
export type CrewPeople = z.infer<typeof crewPeopleSchema>
