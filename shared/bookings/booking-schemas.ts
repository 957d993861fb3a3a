import { z } from 'zod'
import { daySchema, idSchema, textSchema, timeOfDaySchema, versionSchema } from '../http/fields.ts'

export const bookingStates = ['pencilled', 'firm'] as const
export const bookingStateSchema = z.enum(bookingStates)
export type BookingState = z.infer<typeof bookingStateSchema>

export const longestBookingDays = 60

const daysSchema = z
  .array(daySchema)
  .min(1, 'A booking needs at least one day.')
  .max(longestBookingDays, `Keep a booking to ${longestBookingDays} days.`)

/** Said on purpose, after a refusal named what stands in the way. */
const onPurpose = {
  /** Why one crew is booked twice on a day. */
  clashReason: textSchema(200, { required: 'Say why both are booked.' }).optional(),
  /** Book days the firm does not work. */
  evenIfNotWorked: z.boolean().optional(),
}

const startAtSchema = timeOfDaySchema.nullable()
const gearSchema = textSchema(500)

export const createBookingSchema = z
  .strictObject({
    /** Made by the screen, so that a second press books nothing twice. */
    clientId: idSchema,
    jobId: idSchema,
    crewId: idSchema,
    /** The first day; working days follow it. */
    startsOn: daySchema.optional(),
    /** As many as the work needs when left out. */
    workingDays: z
      .number()
      .int('Give whole days.')
      .min(1, 'A booking needs at least one day.')
      .max(longestBookingDays, `Keep a booking to ${longestBookingDays} days.`)
      .optional(),
    /** Instead of a start and a number: the very days. */
    days: daysSchema.optional(),
    state: bookingStateSchema,
    startAt: startAtSchema.optional(),
    gear: gearSchema.optional(),
    ...onPurpose,
  })
  .refine((b) => b.startsOn !== undefined || b.days !== undefined, {
    path: ['startsOn'],
    message: 'Pick the first day.',
  })
export type CreateBooking = z.infer<typeof createBookingSchema>

export const changeBookingSchema = z.strictObject({
  version: versionSchema,
  crewId: idSchema.optional(),
  /** This day and the booking's days after it go to `to` and the working days after it. */
  move: z.strictObject({ from: daySchema, to: daySchema }).optional(),
  /** All days the booking is to have. */
  days: daysSchema.optional(),
  state: bookingStateSchema.optional(),
  startAt: startAtSchema.optional(),
  gear: gearSchema.optional(),
  ...onPurpose,
})
export type ChangeBooking = z.infer<typeof changeBookingSchema>

export const cancelBookingSchema = z.strictObject({ version: versionSchema })
export const restoreBookingSchema = z.strictObject({ version: versionSchema, ...onPurpose })
export type RestoreBooking = z.infer<typeof restoreBookingSchema>

/** `detail` of a 409 that can be answered by saying so on purpose. */
export const bookingConflictSchema = z.object({
  kind: z.literal('clash'),
  clashes: z.array(
    z.object({ code: z.enum(['crew-twice', 'day-not-worked']), day: z.string(), text: z.string() }),
  ),
})
export type BookingConflict = z.infer<typeof bookingConflictSchema>
