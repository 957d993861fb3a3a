import { z } from 'zod'
import { daysBetween } from '../calendar/days.ts'
import { daySchema, idSchema } from '../http/fields.ts'
import type { RoofGlyphData, RoofGlyphLineKind } from '../drawing/roof-glyph.ts'
import { clashSchema } from '../clashes/clash-schemas.ts'
import { bookingStateSchema } from './booking-schemas.ts'

export const longestCalendarDays = 100

export const calendarQuerySchema = z
  .strictObject({ from: daySchema, to: daySchema })
  .refine(({ from, to }) => daysBetween(from, to) >= 0, {
    path: ['to'],
    message: 'The last day comes before the first.',
  })
  .refine(({ from, to }) => daysBetween(from, to) < longestCalendarDays, {
    path: ['to'],
    message: `Ask for at most ${longestCalendarDays} days at once.`,
  })

const lineKinds = ['ridge', 'hip', 'valley', 'broken-hip'] as const satisfies RoofGlyphLineKind[]
const glyphSchema: z.ZodType<RoofGlyphData, RoofGlyphData> = z.object({
  outline: z.array(z.tuple([z.number(), z.number()])),
  lines: z.array(z.tuple([z.number(), z.number(), z.number(), z.number(), z.enum(lineKinds)])),
})

export const calendarCrewSchema = z.object({
  id: z.string(),
  name: z.string(),
  letter: z.string(),
  colour: z.number(),
})
export type CalendarCrew = z.infer<typeof calendarCrewSchema>

export const calendarDaySchema = z.object({
  id: z.string(),
  day: z.string(),
  revisionLetter: z.string().nullable(),
  /** In a few words: 'Hips, creepers'; '' when nothing is planned. */
  holds: z.string(),
  plannedMinutes: z.number(),
  /** Minutes the crew is there: people rostered, less leave, by the firm's hours. */
  availableMinutes: z.number(),
  peopleThere: z.number(),
  /** Has a tick: it stays where it is. */
  worked: z.boolean(),
  flags: z.array(clashSchema),
})
export type CalendarDay = z.infer<typeof calendarDaySchema>

export const calendarBookingSchema = z.object({
  id: z.string(),
  version: z.number(),
  state: bookingStateSchema,
  /** 'HH:MM', the firm's own start where the booking names none. */
  startAt: z.string(),
  job: z.object({
    id: z.string(),
    number: z.string(),
    title: z.string(),
    siteAddress: z.string(),
  }),
  crew: calendarCrewSchema,
  glyph: glyphSchema.nullable(),
  firstDay: z.string(),
  lastDay: z.string(),
  dayCount: z.number(),
  /** Every day of the booking, those outside the span asked for too. */
  allDays: z.array(z.string()),
  /** Minutes of the job's work that no day has room for; over 0 the booking is too short. */
  shortMinutes: z.number(),
  /** Days ahead that hold nothing; over 0 the booking is too long. */
  emptyDays: z.number(),
  /** Why it shares a day with another job, on purpose; for the office. */
  clashReason: z.string().nullable(),
  days: z.array(calendarDaySchema),
})
export type CalendarBooking = z.infer<typeof calendarBookingSchema>

/** The hours a crew has on a day, booked or not. */
export const crewHoursSchema = z.object({
  crewId: z.string(),
  day: z.string(),
  availableMinutes: z.number(),
  peopleThere: z.number(),
})
export type CrewHoursOfDay = z.infer<typeof crewHoursSchema>

export const calendarSchema = z.object({
  from: z.string(),
  to: z.string(),
  today: z.string(),
  bookings: z.array(calendarBookingSchema),
  crews: z.array(calendarCrewSchema),
  /** Each crew on each day of the span; for those who see their own crew only, the days booked. */
  crewHours: z.array(crewHoursSchema),
  workingWeekdays: z.array(z.number()),
  closedDays: z.array(z.object({ day: z.string(), name: z.string() })),
})
export type Calendar = z.infer<typeof calendarSchema>

/** One booking with all its days and what each holds. */
export const bookingSchema = calendarBookingSchema.omit({ days: true }).extend({
  /** As typed; null where the firm's start holds. */
  ownStartAt: z.string().nullable(),
  gear: z.string(),
  cancelled: z.boolean(),
  days: z.array(
    calendarDaySchema.extend({
      tasks: z.array(
        z.object({ title: z.string(), quantity: z.number(), plannedMinutes: z.number() }),
      ),
    }),
  ),
})
export type Booking = z.infer<typeof bookingSchema>

/** `job` asks for that one too, booked already or not yet won. */
export const unbookedQuerySchema = z.strictObject({ job: idSchema.optional() })

export const unbookedJobSchema = z.object({
  id: z.string(),
  number: z.string(),
  title: z.string(),
  siteAddress: z.string(),
  acceptedOn: z.string().nullable(),
  wantedBy: z.string().nullable(),
  revisionLetter: z.string().nullable(),
  glyph: glyphSchema.nullable(),
  /** Minutes of one person for the whole frame; null while no roof is issued. */
  workMinutes: z.number().nullable(),
  /** Working days each crew would need at the strength it has today; null when nobody is in it. */
  crewDays: z.array(z.object({ crewId: z.string(), days: z.number().nullable() })),
})
export type UnbookedJob = z.infer<typeof unbookedJobSchema>

export const unbookedJobsSchema = z.object({
  jobs: z.array(unbookedJobSchema),
  /** The one asked for by id, when it is none of those. */
  asked: unbookedJobSchema.nullable(),
  crews: z.array(calendarCrewSchema),
})
