import { z } from 'zod'
import { lineChangeKinds } from './compare-specs.ts'
import { memberRoleSchema } from './frame-spec-schema.ts'
import { revisionSummarySchema } from './revision-schemas.ts'

const sideSchema = z.object({
  mark: z.string(),
  section: z.object({ thicknessMm: z.number(), depthMm: z.number() }),
  cutLengthMm: z.number(),
  quantity: z.number(),
})

/** Two issued roofs of a job, line by line of the cut list. */
export const comparisonSchema = z.object({
  job: z.object({ id: z.string(), number: z.string(), title: z.string() }),
  before: revisionSummarySchema,
  after: revisionSummarySchema,
  /** Letters of all revisions, newest first. */
  letters: z.array(z.string()),
  /** To the newer of the two. */
  platesMeasured: z.boolean(),
  lines: z.array(
    z.object({
      kind: z.enum(lineChangeKinds),
      role: memberRoleSchema,
      before: sideSchema.nullable(),
      after: sideSchema.nullable(),
      byMm: z.number(),
    }),
  ),
  /** Pieces cut already, to whichever revision, that the newer of the two has no place for. */
  cutButUnused: z.array(z.object({ letter: z.string(), marks: z.array(z.string()) })),
})
export type Comparison = z.infer<typeof comparisonSchema>
