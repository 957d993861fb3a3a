import { z } from 'zod'
import { daySchema, idSchema, textSchema } from '../http/fields.ts'
import { delayReasons } from './delay-reasons.ts'

const minutesPerDay = 24 * 60
/** A big crew's whole week; more is a slip of the thumb. */
const mostLostMinutes = 100 * 60

const personHoursSchema = z
  .strictObject({
    personId: idSchema,
    turnedUp: z.boolean(),
    /** On this job that day. */
    minutes: z
      .number({ error: 'Give the hours as a number.' })
      .int('Give hours to the minute.')
      .min(0, 'Hours are 0 or more.')
      .max(minutesPerDay, 'A day has 24 hours.'),
  })
  .refine(({ turnedUp, minutes }) => turnedUp || minutes === 0, {
    path: ['minutes'],
    message: 'Who did not turn up has no hours.',
  })

const delaySchema = z
  .strictObject({
    reason: z.enum(delayReasons, 'Say what the hours were lost to.'),
    note: textSchema(300),
    /** Of all people together. */
    lostMinutes: z
      .number({ error: 'Give the hours lost as a number.' })
      .int('Give hours to the minute.')
      .min(1, 'Give the hours lost, of everybody together.')
      .max(mostLostMinutes, 'Give the hours lost, 100 or less.'),
  })
  .refine(({ reason, note }) => reason !== 'other' || note !== '', {
    path: ['note'],
    message: 'Say what it was.',
  })

export const writeDayLogSchema = z.strictObject({
  /** Of the log this was made from; 0 for a day not closed yet. */
  version: z.number().int().min(0),
  /** The day it was put down for: a booked day may have been moved while the log waited on a phone. */
  day: daySchema.optional(),
  done: textSchema(1000),
  remarks: textSchema(1000),
  people: z
    .array(personHoursSchema)
    .max(60)
    .refine((all) => new Set(all.map((one) => one.personId)).size === all.length, {
      message: 'Each person stands once.',
    }),
  delays: z.array(delaySchema).max(20, 'Twenty delays are the most a day can have.'),
})
export type WriteDayLog = z.infer<typeof writeDayLogSchema>

export const loggedPersonSchema = z.object({
  personId: z.string(),
  name: z.string(),
  turnedUp: z.boolean(),
  minutes: z.number(),
})

export const dayLogSchema = z.object({
  version: z.number(),
  done: z.string(),
  remarks: z.string(),
  people: z.array(loggedPersonSchema),
  delays: z.array(
    z.object({ reason: z.enum(delayReasons), note: z.string(), lostMinutes: z.number() }),
  ),
  loggedBy: z.string(),
  loggedAt: z.string(),
})
export type DayLog = z.infer<typeof dayLogSchema>

/** Who may stand in the log: the roster, with what each is expected to have worked here. */
export const expectedPersonSchema = z.object({
  personId: z.string(),
  name: z.string(),
  onLeave: z.boolean(),
  minutes: z.number(),
})
export type ExpectedPerson = z.infer<typeof expectedPersonSchema>

/** A booked day as it is closed. */
export const dayToCloseSchema = z.object({
  bookingDayId: z.string(),
  day: z.string(),
  today: z.string(),
  job: z.object({ id: z.string(), number: z.string(), title: z.string() }),
  crew: z.object({ id: z.string(), name: z.string(), letter: z.string(), colour: z.number() }),
  plannedMinutes: z.number(),
  /** What the ticks say was done: 'Set out plates: 1 of 1', 'Cut common rafters R1: 12 of 24'. */
  ticked: z.array(z.object({ title: z.string(), doneCount: z.number(), quantity: z.number() })),
  roster: z.array(expectedPersonSchema),
  /** Others who can be put down; the office only. */
  others: z.array(expectedPersonSchema),
  log: dayLogSchema.nullable(),
  /** Why this person cannot write it now; null when that is open. */
  closedBecause: z.string().nullable(),
})
export type DayToClose = z.infer<typeof dayToCloseSchema>

/** What a day sheet says of its log. */
export const dayLogSummarySchema = z.object({
  loggedBy: z.string(),
  loggedAt: z.string(),
  minutes: z.number(),
  lostMinutes: z.number(),
})
export type DayLogSummary = z.infer<typeof dayLogSummarySchema>
