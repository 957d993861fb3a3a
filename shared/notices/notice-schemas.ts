import { z } from 'zod'
import { daySchema, idSchema } from '../http/fields.ts'

const notToldDaySchema = z.object({
  day: z.string(),
  /** Never told of this day before. */
  isNew: z.boolean(),
  /** The net change against what was told, a sentence each. */
  changes: z.array(z.string()),
  /** When it goes by itself, by the firm's hold; null: only by *Tell them* or with its reminder. */
  goesAt: z.iso.datetime().nullable(),
  /** A mail that tells it waits in the outbox. */
  isOnItsWay: z.boolean(),
})

const notToldPersonSchema = z.object({
  id: z.string(),
  name: z.string(),
  role: z.string(),
  days: z.array(notToldDaySchema),
  /** For the phone's own messages; null without a phone. */
  textIt: z.object({ phone: z.string(), words: z.string() }).nullable(),
  /** The person cannot be mailed: no address. */
  hasNoEmail: z.boolean(),
})
export type NotToldPerson = z.infer<typeof notToldPersonSchema>

export const notYetToldSchema = z.object({
  people: z.array(notToldPersonSchema),
  holdMinutes: z.number(),
})
export type NotYetTold = z.infer<typeof notYetToldSchema>

const mostPeople = 300
const mostDays = 400

/** Whom to tell, and of which days, as the office saw them. */
export const tellThemSchema = z.strictObject({
  people: z
    .array(
      z.strictObject({
        id: idSchema,
        days: z.array(daySchema).min(1, 'Choose a day to tell of.').max(mostDays),
      }),
    )
    .min(1, 'Choose somebody to tell.')
    .max(mostPeople, `Tell at most ${mostPeople} people at once.`),
})
export type TellThem = z.infer<typeof tellThemSchema>

export const toldThemSchema = z.object({
  /** Mails that now wait and did not before. */
  mails: z.number(),
})
