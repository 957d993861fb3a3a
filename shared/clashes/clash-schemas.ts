import { z } from 'zod'

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

/** Where a booking, or a job not booked yet, could be dropped, and what would stand in the way there. */
export const landingsSchema = z.object({
  landings: z.array(
    z.object({ crewId: z.string(), day: z.string(), clashes: z.array(clashSchema) }),
  ),
})
export type Landings = z.infer<typeof landingsSchema>
