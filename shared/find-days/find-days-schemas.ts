import { z } from 'zod'
import { longestBookingDays } from '../bookings/booking-schemas.ts'
import { calendarCrewSchema } from '../bookings/calendar-schemas.ts'
import { clashSchema } from '../clashes/clash-schemas.ts'
import { daySchema } from '../http/fields.ts'

export const openingsQuerySchema = z.strictObject({
  /** Not before this day; the next working day when left out. */
  from: daySchema.optional(),
  /** So many working days, instead of as many as the work needs. */
  days: z.coerce
    .number()
    .int('Give whole days.')
    .min(1, 'A booking needs at least one day.')
    .max(longestBookingDays, `Keep a booking to ${longestBookingDays} days.`)
    .optional(),
})
export type OpeningsQuery = z.infer<typeof openingsQuerySchema>

export const openingSchema = z.object({
  crew: calendarCrewSchema,
  days: z.array(z.string()),
  passedOver: z.array(z.string()),
  /** Pencilled bookings that give way, with all their days before and after. */
  moves: z.array(
    z.object({
      bookingId: z.string(),
      version: z.number(),
      job: z.object({ id: z.string(), number: z.string(), title: z.string() }),
      daysBefore: z.array(z.string()),
      daysAfter: z.array(z.string()),
    }),
  ),
  /** Why this one, in a sentence or two. */
  why: z.string(),
  /** What may stand but should be known, on its days. */
  cautions: z.array(clashSchema),
})
export type OpeningFound = z.infer<typeof openingSchema>

export const openingsSchema = z.object({
  job: z.object({
    id: z.string(),
    number: z.string(),
    title: z.string(),
    wantedBy: z.string().nullable(),
  }),
  /** Minutes of one person that no booked day has room for; null while no roof is issued. */
  workMinutes: z.number().nullable(),
  /** How many days were looked for, when that was said; one when there is no roof to go by. */
  dayCount: z.number().nullable(),
  /** The first day that may be taken, and the last that was looked at. */
  earliest: z.string(),
  latest: z.string(),
  /** What the first day waits for. */
  waits: z.array(z.object({ text: z.string(), isDated: z.boolean() })),
  openings: z.array(openingSchema),
})
export type Openings = z.infer<typeof openingsSchema>
