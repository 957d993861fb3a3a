import { z } from 'zod'
import type { RoofGlyphData } from '../drawing/roof-glyph.ts'
import { jobMissingKinds } from './job-missing.ts'
import { coverings } from './job-schemas.ts'
import { type JobStage, jobStages } from './job-stage.ts'

const glyphSchema = z.object({
  outline: z.array(z.tuple([z.number(), z.number()])),
  lines: z.array(
    z.tuple([
      z.number(),
      z.number(),
      z.number(),
      z.number(),
      z.enum(['ridge', 'hip', 'valley', 'broken-hip']),
    ]),
  ),
}) satisfies z.ZodType<RoofGlyphData>

const crewSchema = z.object({
  id: z.string(),
  name: z.string(),
  letter: z.string(),
  colour: z.number(),
})
export type JobCrew = z.infer<typeof crewSchema>

const bookingSchema = z.object({
  id: z.string(),
  state: z.enum(['pencilled', 'firm']),
  startsOn: z.string(),
  endsOn: z.string(),
  dayCount: z.number(),
  crew: crewSchema,
})
export type JobBooking = z.infer<typeof bookingSchema>

const revisionSchema = z.object({
  letter: z.string(),
  issuedAt: z.iso.datetime(),
  glyph: glyphSchema,
})

const missingSchema = z.array(z.enum(jobMissingKinds))

/** A card of the board. */
export const jobCardSchema = z.object({
  id: z.string(),
  number: z.string(),
  title: z.string(),
  siteAddress: z.string(),
  version: z.number(),
  stage: z.enum(jobStages),
  wantedBy: z.string().nullable(),
  /** Only for who may see prices. */
  priceCents: z.number().nullable().optional(),
  /** The days the office has set; only for who may see prices. */
  facts: z
    .object({
      priceSentOn: z.string().nullable(),
      acceptedOn: z.string().nullable(),
      completedOn: z.string().nullable(),
    })
    .optional(),
  glyph: glyphSchema.nullable(),
  latestLetter: z.string().nullable(),
  /** Only for who may write roofs. */
  hasDraft: z.boolean().optional(),
  nextBooking: bookingSchema.nullable(),
  missing: missingSchema,
})
export type JobCard = z.infer<typeof jobCardSchema>

export const boardSchema = z.object({
  jobs: z.array(jobCardSchema),
  /** Of the search and crew chosen, whatever the stage chosen. */
  counts: z.record(z.enum(jobStages), z.number()) satisfies z.ZodType<Record<JobStage, number>>,
  /** To choose from: every crew the person may see. */
  crews: z.array(crewSchema),
  nextOffset: z.number().nullable(),
})
export type Board = z.infer<typeof boardSchema>

/**
 * One job as its reader may see it: optional keys are not there at all for a role without the
 * permission (`price:read`, `customer:read`, `site-contact-phone:read`, `roof:write`, `job:write`).
 */
export const jobSchema = z.object({
  id: z.string(),
  version: z.number(),
  number: z.string(),
  title: z.string(),
  stage: z.enum(jobStages),
  missing: missingSchema,
  siteAddress: z.string(),
  accessNotes: z.string(),
  siteContactName: z.string(),
  siteContactPhone: z.string().optional(),
  customerName: z.string().optional(),
  customerPhone: z.string().optional(),
  customerEmail: z.string().optional(),
  covering: z.enum(coverings),
  wantedBy: z.string().nullable(),
  priceCents: z.number().nullable().optional(),
  priceSentOn: z.string().nullable().optional(),
  acceptedOn: z.string().nullable().optional(),
  completedOn: z.string().nullable(),
  notes: z.string().optional(),
  crewNotes: z.string(),
  /** Newest first. */
  revisions: z.array(revisionSchema),
  draft: z.object({ updatedAt: z.iso.datetime(), isIssued: z.boolean() }).nullable().optional(),
  arePlatesMeasured: z.boolean(),
  /** By first day. */
  bookings: z.array(bookingSchema),
  updatedAt: z.iso.datetime(),
})
export type JobView = z.infer<typeof jobSchema>

/** What a refused change carries: what is there now, and what was sent. */
export const jobConflictSchema = z.object({
  current: jobSchema,
  yours: z.record(z.string(), z.unknown()),
})
