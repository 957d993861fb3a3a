import { z } from 'zod'
import { daysBetween } from '../calendar/days.ts'
import { daySchema } from '../http/fields.ts'

/** What can stand in the way of a booked day; the order is the order of weight. */
export const clashCodes = [
  'crew-twice',
  'nobody-there',
  'apprentice-alone',
  'ticket-lapsed',
  'before-frames',
  'before-edge-protection',
  'before-timber',
  'too-short',
  'no-roof',
  'roof-revised',
  'on-leave',
  'day-not-worked',
  'crew-twice-on-purpose',
] as const
export type ClashCode = (typeof clashCodes)[number]

/** Something the office should know of a booked day: what, and a way out. */
export const clashSchema = z.object({
  code: z.enum(clashCodes),
  /** A clash must be settled; a caution may stand. */
  weight: z.enum(['clash', 'caution']),
  day: z.string(),
  text: z.string(),
  wayOut: z.string(),
})
export type Clash = z.infer<typeof clashSchema>

/** The same with the booking it stands in the way of. */
export const bookingClashSchema = clashSchema.extend({ bookingId: z.string() })
export type BookingClash = z.infer<typeof bookingClashSchema>

const longestLandingDays = 100

const landingSpan = { from: daySchema, to: daySchema }
const isSpan = ({ from, to }: { from: string; to: string }): boolean =>
  daysBetween(from, to) >= 0 && daysBetween(from, to) < longestLandingDays
const notASpan = {
  path: ['to'],
  message: `Ask for 1 to ${longestLandingDays} days, the first day first.`,
}

/** `day`: the day of the booking taken hold of; it and the days after it move, as `movedDays` says. */
export const bookingLandingsQuerySchema = z
  .strictObject({ ...landingSpan, day: daySchema })
  .refine(isSpan, notASpan)
export const jobLandingsQuerySchema = z.strictObject(landingSpan).refine(isSpan, notASpan)

/**
 * Where a booking, or a job not booked yet, could be dropped, and what would stand in the way there. A crew
 * and day not listed cannot be: a day before today, or another crew once a day has been worked.
 */
export const landingsSchema = z.object({
  landings: z.array(
    z.object({ crewId: z.string(), day: z.string(), clashes: z.array(clashSchema) }),
  ),
})
export type Landings = z.infer<typeof landingsSchema>
