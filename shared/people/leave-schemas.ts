import { z } from 'zod'
import { daySchema, lineSchema } from '../http/fields.ts'
import { nextAwayDay } from './leave-days.ts'
import { leaveKinds } from './leave-kinds.ts'

const weekdaysSchema = z
  .array(z.number().int().min(1).max(7))
  .min(1, 'Pick at least one weekday, or every day.')
  .max(7)
  .transform((weekdays) => [...new Set(weekdays)].sort())

export const addLeaveSchema = z
  .strictObject({
    startsOn: daySchema,
    endsOn: daySchema,
    kind: z.enum(leaveKinds).default('leave'),
    /** ISO weekdays within the span; null: every day of it. */
    weekdays: weekdaysSchema.nullable().default(null),
    reason: lineSchema(120),
  })
  .refine((leave) => leave.endsOn >= leave.startsOn, {
    path: ['endsOn'],
    message: 'The last day is before the first.',
  })
  .refine((leave) => leave.endsOn < leave.startsOn || nextAwayDay(leave, leave.startsOn) !== null, {
    path: ['weekdays'],
    message: 'None of these weekdays lies between the two days.',
  })

export const leaveSchema = z.object({
  id: z.string(),
  startsOn: z.string(),
  endsOn: z.string(),
  kind: z.enum(leaveKinds),
  weekdays: z.array(z.number()).nullable(),
  reason: z.string(),
})
export type Leave = z.infer<typeof leaveSchema>
