import { z } from 'zod'
import { daySchema, lineSchema } from '../http/fields.ts'
import { milestoneKinds, milestoneStates } from './milestone-kinds.ts'

export const milestoneKindSchema = z.enum(milestoneKinds)
export const milestoneStateSchema = z.enum(milestoneStates)

/** One thing a job waits for; version 0 while nobody has said anything of it. */
export const milestoneSchema = z.object({
  kind: milestoneKindSchema,
  day: z.string().nullable(),
  state: milestoneStateSchema,
  /** Who is to bring it. */
  broughtBy: z.string(),
  note: z.string(),
  version: z.number(),
})
export type Milestone = z.infer<typeof milestoneSchema>

/** All kinds, in the order a site comes to them. */
export const jobMilestonesSchema = z.object({ milestones: z.array(milestoneSchema) })
export type JobMilestones = z.infer<typeof jobMilestonesSchema>

export const setMilestoneSchema = z.strictObject({
  /** 0: nobody had said anything of it. */
  version: z.number().int().min(0),
  day: daySchema.nullable().optional(),
  state: milestoneStateSchema.optional(),
  broughtBy: lineSchema(80).optional(),
  note: lineSchema(200).optional(),
})
export type SetMilestone = z.infer<typeof setMilestoneSchema>

/** `detail` of a 409: what is there now, and what was sent. */
export const milestoneConflictSchema = z.object({
  kind: z.literal('stale'),
  current: milestoneSchema,
  sent: setMilestoneSchema,
})
export type MilestoneConflict = z.infer<typeof milestoneConflictSchema>
