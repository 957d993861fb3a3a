import { z } from 'zod'
import { bookingStateSchema } from '../bookings/booking-schemas.ts'
import { calendarCrewSchema } from '../bookings/calendar-schemas.ts'
import { bookingClashSchema } from './clash-schemas.ts'

/** The same thing of several days of a booking is one line. */
export const listedClashSchema = bookingClashSchema
  .omit({ day: true })
  .extend({ days: z.array(z.string()) })
export type ListedClash = z.infer<typeof listedClashSchema>

/** What stands in the way from today on, with the bookings it is of. */
export const clashListSchema = z.object({
  today: z.string(),
  clashes: z.array(listedClashSchema),
  bookings: z.array(
    z.object({
      id: z.string(),
      state: bookingStateSchema,
      job: z.object({ id: z.string(), number: z.string(), title: z.string() }),
      crew: calendarCrewSchema,
    }),
  ),
})
export type ClashList = z.infer<typeof clashListSchema>
