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

export const addLeaveSchema = z
  .strictObject({
    startsOn: daySchema,
    endsOn: daySchema,
    reason: lineSchema(120),
  })
  .refine((leave) => leave.endsOn >= leave.startsOn, {
    path: ['endsOn'],
    message: 'The last day is before the first.',
  })

export const crewInputSchema = z.strictObject({
  name: lineSchema(40, { required: 'Give the crew a name.' }),
  letter: z
    .string()
    .trim()
    .toUpperCase()
    .regex(/^[A-Z]$/, 'One letter, for the pennant.'),
  colour: z.number().int().min(1).max(6),
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

export const leaveSchema = z.object({
  id: z.string(),
  startsOn: z.string(),
  endsOn: z.string(),
  reason: z.string(),
})

export const personSchema = z.object({
  id: z.string(),
  name: z.string(),
  email: z.string(),
  phone: z.string(),
  role: roleSchema,
  active: z.boolean(),
  /** Has not yet chosen a password. */
  invited: z.boolean(),
  /** The crew today, and the next move when one is set. */
  crewId: z.string().nullable(),
  nextMove: z.object({ crewId: z.string().nullable(), from: z.string() }).nullable(),
  /** Today's and coming leave. */
  leave: z.array(leaveSchema),
  version: z.number(),
})
export type Person = z.infer<typeof personSchema>

export const peopleListSchema = z.object({ people: z.array(personSchema) })
