import { z } from 'zod'
import { bookingStateSchema } from '../bookings/booking-schemas.ts'
import { calendarCrewSchema } from '../bookings/calendar-schemas.ts'
import { clashSchema } from '../clashes/clash-schemas.ts'
import { daySchema, idSchema, lineSchema, versionSchema } from '../http/fields.ts'
import { milestoneKinds, milestoneStates } from '../milestones/milestone-kinds.ts'

export const mostRainOffDays = 20
/** How long ago a day lost may be, and how far ahead. */
export const rainOffReach = { daysBack: 7, daysAhead: 60 } as const

const workingDaysSchema = z
  .number()
  .int('Give whole days.')
  .min(1, 'At least one working day.')
  .max(mostRainOffDays, `Move by at most ${mostRainOffDays} working days at once.`)
const reasonSchema = lineSchema(200)

export const rainOffStates = ['asked', 'made', 'declined', 'undone'] as const

export const rainOffSchema = z.object({
  id: z.string(),
  version: z.number(),
  state: z.enum(rainOffStates),
  crew: calendarCrewSchema,
  fromDay: z.string(),
  workingDays: z.number(),
  reason: z.string(),
  /** Null when the office made it unasked. */
  askedBy: z.string().nullable(),
  askedAt: z.string().nullable(),
  /** Who made, declined or undid it. */
  settledBy: z.string().nullable(),
  settledAt: z.string().nullable(),
  /** The asker took it back. */
  takenBack: z.boolean(),
  isMine: z.boolean(),
  movedBookings: z.number(),
  /** Made today, by the firm's own day. */
  canUndo: z.boolean(),
})
export type RainOffRow = z.infer<typeof rainOffSchema>

export const rainOffListSchema = z.object({
  today: z.string(),
  /** Newest first: all that are asked for, and what was settled lately. */
  rainOffs: z.array(rainOffSchema),
  /** The crews that the person may ask or make one for. */
  crews: z.array(calendarCrewSchema),
})
export type RainOffList = z.infer<typeof rainOffListSchema>

export const askRainOffSchema = z.strictObject({
  /** Made by the screen, so that a second press asks nothing twice. */
  clientId: idSchema,
  crewId: idSchema,
  fromDay: daySchema,
  workingDays: workingDaysSchema,
  reason: reasonSchema.default(''),
})
export type AskRainOff = z.infer<typeof askRainOffSchema>

export const previewQuerySchema = z.strictObject({
  crew: idSchema,
  day: daySchema,
  days: z.coerce.number().pipe(workingDaysSchema),
  free: z.enum(['keep', 'use']).default('keep'),
})
export type PreviewQuery = z.infer<typeof previewQuerySchema>

const dayMoveSchema = z.object({ from: z.string(), to: z.string() })

export const rainOffPreviewSchema = z.object({
  crew: calendarCrewSchema,
  lostDays: z.array(z.string()),
  moves: z.array(
    z.object({
      bookingId: z.string(),
      version: z.number(),
      state: bookingStateSchema,
      job: z.object({ id: z.string(), number: z.string(), title: z.string() }),
      customerName: z.string(),
      wantedBy: z.string().nullable(),
      daysBefore: z.array(z.string()),
      daysAfter: z.array(z.string()),
      moved: z.array(dayMoveSchema),
      /** A day started and then lost stays; what it left undone gets a day more. */
      added: z.array(dayMoveSchema),
      /** Deliveries and other trades with a day, not done yet. */
      milestones: z.array(
        z.object({
          kind: z.enum(milestoneKinds),
          state: z.enum(milestoneStates),
          day: z.string(),
          broughtBy: z.string(),
        }),
      ),
      /** Other crews on the same job, whose days stay. */
      otherCrews: z.array(z.object({ crew: z.string(), days: z.array(z.string()) })),
      /** What would stand in the way on the new days and does not now. */
      clashes: z.array(clashSchema),
    }),
  ),
  /** Days from the first one lost on that stay, since work on them has begun. */
  stays: z.array(z.object({ bookingId: z.string(), job: z.string(), day: z.string() })),
})
export type RainOffPreview = z.infer<typeof rainOffPreviewSchema>
export type PreviewMove = RainOffPreview['moves'][number]

export const makeRainOffSchema = z.strictObject({
  clientId: idSchema,
  /** The one that was asked for, when it answers one. */
  asked: z.strictObject({ id: idSchema, version: versionSchema }).optional(),
  crewId: idSchema,
  fromDay: daySchema,
  workingDays: workingDaysSchema,
  useFreeDays: z.boolean(),
  reason: reasonSchema.default(''),
  /** What the person saw, so that nothing moves that was not shown. */
  seen: z
    .array(
      z.strictObject({
        bookingId: idSchema,
        version: versionSchema,
        daysAfter: z.array(daySchema).max(200),
      }),
    )
    .max(500),
})
export type MakeRainOff = z.infer<typeof makeRainOffSchema>

export const settleRainOffSchema = z.strictObject({ version: versionSchema })
export type SettleRainOff = z.infer<typeof settleRainOffSchema>

/** `detail` of a 409 to an undo: the bookings that have moved on since. */
export const movedOnSchema = z.object({
  kind: z.literal('moved-on'),
  bookings: z.array(z.object({ bookingId: z.string(), job: z.string(), why: z.string() })),
})
export type MovedOn = z.infer<typeof movedOnSchema>
