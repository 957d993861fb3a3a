import { z } from 'zod'
import { daySchema } from '../http/fields.ts'
import { dayLogSchema } from './day-log-schemas.ts'

const crewSchema = z.object({
  id: z.string(),
  name: z.string(),
  letter: z.string(),
  colour: z.number(),
})
const jobSchema = z.object({ id: z.string(), number: z.string(), title: z.string() })

/** One booked day of a job, as planned and as it was. */
export const jobDayHoursSchema = z.object({
  bookingDayId: z.string(),
  day: z.string(),
  crew: crewSchema,
  /** Of what the day holds. */
  plannedMinutes: z.number(),
  /** Of what was ticked on it: the plan's minutes for the work that was done. */
  doneMinutes: z.number(),
  log: dayLogSchema.nullable(),
})
export type JobDayHours = z.infer<typeof jobDayHoursSchema>

export const jobHoursSchema = z.object({
  firm: z.object({ name: z.string(), phone: z.string() }),
  job: jobSchema.extend({ siteAddress: z.string(), customerName: z.string() }),
  today: z.string(),
  /** The whole roof by the firm's rates; null before a roof is issued. */
  roofMinutes: z.number().nullable(),
  days: z.array(jobDayHoursSchema),
})
export type JobHours = z.infer<typeof jobHoursSchema>

export const weekQuerySchema = z.strictObject({ week: daySchema.optional() })

export const weekHoursSchema = z.object({
  /** Monday to Sunday. */
  days: z.array(z.string()),
  today: z.string(),
  people: z.array(
    z.object({ personId: z.string(), name: z.string(), minutes: z.array(z.number()) }),
  ),
  /** Days past that nobody has closed: their hours are missing above. */
  open: z.array(
    z.object({ bookingDayId: z.string(), day: z.string(), job: jobSchema, crew: crewSchema }),
  ),
})
export type WeekHours = z.infer<typeof weekHoursSchema>
