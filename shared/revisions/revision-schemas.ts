import { z } from 'zod'
import { coverings } from '../jobs/job-schemas.ts'
import { frameSpecSchema, roofSchema, roofSettingsSchema } from './frame-spec-schema.ts'
import { roofFormSchema } from './roof-form.ts'
import { sizesTypedSchema } from './sizes-typed.ts'

export const revisionSummarySchema = z.object({
  id: z.string(),
  letter: z.string(),
  issuedAt: z.string(),
  issuedBy: z.string(),
})
export type RevisionSummary = z.infer<typeof revisionSummarySchema>

const draftSchema = z.object({
  form: roofFormSchema,
  version: z.number(),
  updatedAt: z.string(),
  /** Who typed each size; the server says so, from who was signed in. */
  sizesTyped: sizesTypedSchema,
})
export type RoofDraft = z.infer<typeof draftSchema>

/** What the editor opens with. */
export const jobRoofSchema = z.object({
  job: z.object({
    id: z.string(),
    number: z.string(),
    title: z.string(),
    covering: z.enum(coverings),
  }),
  /** Null until something was typed. */
  draft: draftSchema.nullable(),
  brickOffsetMm: z.number(),
  settings: roofSettingsSchema,
  /** Newest first. */
  revisions: z.array(revisionSummarySchema),
  /** What an issue now would be. */
  nextLetter: z.string(),
})
export type JobRoof = z.infer<typeof jobRoofSchema>

/** `version` is the draft's as last seen; 0 when there was none. */
export const saveDraftSchema = z.strictObject({
  form: roofFormSchema,
  version: z.number().int().min(0),
})
export const savedDraftSchema = z.object({
  version: z.number(),
  updatedAt: z.string(),
  sizesTyped: sizesTypedSchema,
})

/** In a conflict's detail: what somebody else saved. */
export const staleDraftSchema = z.object({ current: draftSchema.nullable() })

export const issueRevisionSchema = z.strictObject({ version: z.number().int().min(1) })
export const issuedSchema = z.object({
  /** False: the roof is the same as the revision named, so none was made. */
  issued: z.boolean(),
  revision: revisionSummarySchema,
  /** Pieces cut already that the new roof has no place for, with the letter they were cut to. */
  cutButUnused: z.array(z.object({ letter: z.string(), marks: z.array(z.string()) })),
})
export type Issued = z.infer<typeof issuedSchema>

/** An issued roof whole, for the spec page. */
export const revisionSchema = revisionSummarySchema.extend({
  job: z.object({ id: z.string(), number: z.string(), title: z.string() }),
  roof: roofSchema,
  settings: roofSettingsSchema,
  spec: frameSpecSchema,
  engineVersion: z.string(),
  sizesTyped: sizesTypedSchema,
  /** False until a check of sides and diagonals stands against this revision. */
  platesMeasured: z.boolean(),
  /** Letter of the job's newest revision. */
  latestLetter: z.string(),
})
export type Revision = z.infer<typeof revisionSchema>
