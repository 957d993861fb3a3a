import { z } from 'zod'
import { changeBookingSchema, createBookingSchema } from './booking-schemas.ts'
import { bookingSchema } from './calendar-schemas.ts'
import { idSchema } from '../http/fields.ts'

export const mostChangesAtOnce = 200

/** One booking of several that change together; see `changeBookingSchema`. */
export const oneOfChangesSchema = changeBookingSchema.extend({
  bookingId: idSchema,
  /** true takes it off the calendar, false puts it back. */
  cancelled: z.boolean().optional(),
})
export type OneOfChanges = z.infer<typeof oneOfChangesSchema>

const isUnique = (ids: readonly string[]): boolean => new Set(ids).size === ids.length

/** All of it or nothing; clashes are looked for as it stands after all of it. */
export const bookingChangesSchema = z
  .strictObject({
    changes: z.array(oneOfChangesSchema).max(mostChangesAtOnce).default([]),
    create: z
      .array(
        createBookingSchema.refine((b) => b.days !== undefined, {
          path: ['days'],
          message: 'Pick the days.',
        }),
      )
      .max(mostChangesAtOnce)
      .default([]),
  })
  .refine((all) => all.changes.length + all.create.length > 0, {
    path: ['changes'],
    message: 'There is nothing to change.',
  })
  .refine(
    (all) =>
      isUnique([...all.changes.map((c) => c.bookingId), ...all.create.map((c) => c.clientId)]),
    { path: ['changes'], message: 'Change each booking once.' },
  )
export type BookingChanges = z.infer<typeof bookingChangesSchema>
export type BookingChangesToSend = z.input<typeof bookingChangesSchema>

/** In the order asked: those changed, then those made. */
export const changedBookingsSchema = z.object({ bookings: z.array(bookingSchema) })

/** `detail` of a 409 to a change made from an older version: both, so that a person can choose. */
export const staleBookingSchema = z.object({
  kind: z.literal('stale'),
  current: bookingSchema,
  sent: z.looseObject({ version: z.number() }),
})
export type StaleBooking = z.infer<typeof staleBookingSchema>
