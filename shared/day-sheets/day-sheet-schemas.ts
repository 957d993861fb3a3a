import { z } from 'zod'
import type { FrameSpec, Roof } from '../roof/roof-types.ts'
import { dayLogSummarySchema } from '../day-logs/day-log-schemas.ts'
import { daySchema, idSchema } from '../http/fields.ts'
import { dayTaskSchema } from './task-schemas.ts'

export const daySheetsQuerySchema = z.strictObject({
  day: daySchema.optional(),
  crewId: idSchema.optional(),
})

export const crewRefSchema = z.object({
  id: z.string(),
  name: z.string(),
  letter: z.string(),
  colour: z.number(),
})
export type CrewRef = z.infer<typeof crewRefSchema>

const plateStateSchema = z.object({
  takenAt: z.string(),
  takenBy: z.string(),
  note: z.string(),
  /** Lengths more than the tolerance off plan. */
  differing: z.number(),
})

export const daySheetSchema = z.object({
  bookingDayId: z.string(),
  bookingId: z.string(),
  day: z.string(),
  state: z.enum(['pencilled', 'firm']),
  /** This is the how manieth day of how many of its booking, 1 first. */
  dayNumber: z.number(),
  dayCount: z.number(),
  startAt: z.string(),
  gear: z.string(),
  job: z.object({
    id: z.string(),
    number: z.string(),
    title: z.string(),
    siteAddress: z.string(),
    mapUrl: z.string().nullable(),
    accessNotes: z.string(),
    crewNotes: z.string(),
    siteContactName: z.string(),
    /** Absent for a role that may not see it. */
    siteContactPhone: z.string().optional(),
  }),
  roster: z.array(z.object({ id: z.string(), name: z.string(), onLeave: z.boolean() })),
  revision: z.object({ id: z.string(), letter: z.string() }).nullable(),
  /** The latest check of sides and diagonals for the revision; null while lengths are from plan. */
  plates: plateStateSchema.nullable(),
  minutesPlanned: z.number(),
  minutesThere: z.number(),
  /** The day's log once it is closed. */
  log: dayLogSummarySchema.nullable(),
  tasks: z.array(dayTaskSchema),
  /** Unfinished on earlier days of this booking. */
  leftOver: z.array(dayTaskSchema),
  /** What is not as it was on the booking's day before, in words. */
  changes: z.array(z.string()),
  cautions: z.array(
    z.object({ members: z.array(z.string()), text: z.string(), remedy: z.string() }),
  ),
  /** Marks for the plan drawing. */
  dueMarks: z.array(z.string()),
  doneMarks: z.array(z.string()),
})
export type DaySheet = z.infer<typeof daySheetSchema>

export const daySheetsSchema = z.object({
  day: z.string(),
  today: z.string(),
  crew: crewRefSchema.nullable(),
  /** Crews this person may look at on that day. */
  crews: z.array(crewRefSchema),
  previousDay: z.string().nullable(),
  nextDay: z.string().nullable(),
  sheets: z.array(daySheetSchema),
})
export type DaySheets = z.infer<typeof daySheetsSchema>

const isObject = (value: unknown) => typeof value === 'object' && value !== null

/** A stored revision never changes, so a screen may keep this for good. */
export const dayRoofSchema = z.object({
  jobId: z.string(),
  letter: z.string(),
  roof: z.custom<Roof>(isObject),
  spec: z.custom<FrameSpec>(isObject),
  marking: z.object({
    units: z.enum(['mm', 'feet-inches']),
    roundMm: z.number(),
    roundDeg: z.number(),
    sawMaxTiltDeg: z.number(),
  }),
})
export type DayRoof = z.infer<typeof dayRoofSchema>
