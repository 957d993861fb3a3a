import { and, desc, eq, type SQL } from 'drizzle-orm'
import type { RevisionSummary } from '../../shared/revisions/revision-schemas.ts'
import { type RoofForm, roofFormSchema } from '../../shared/revisions/roof-form.ts'
import type { SizesTyped } from '../../shared/revisions/sizes-typed.ts'
import type { DbOrTx } from '../db/client.ts'
import { jobs, plateChecks, roofDrafts, roofRevisions } from '../db/tables/job-tables.ts'
import { people } from '../db/tables/people-tables.ts'

/** The newest issued roof of a job, without the roof itself; undefined before the first. */
export function latestIssue(db: DbOrTx, jobId: string) {
  return db
    .select({
      id: roofRevisions.id,
      sequence: roofRevisions.sequence,
      letter: roofRevisions.letter,
      inputHash: roofRevisions.inputHash,
    })
    .from(roofRevisions)
    .where(eq(roofRevisions.jobId, jobId))
    .orderBy(desc(roofRevisions.sequence))
    .limit(1)
    .get()
}

export type DraftRow = {
  form: RoofForm
  version: number
  updatedAt: Date
  sizesTyped: SizesTyped
}

/** Only forms that passed their schema are ever written; one from before a field was added gets it empty. */
export function readDraft(db: DbOrTx, jobId: string): DraftRow | undefined {
  const row = db.select().from(roofDrafts).where(eq(roofDrafts.jobId, jobId)).get()
  if (!row) return undefined
  const { version, updatedAt, sizesTyped } = row
  return { form: roofFormSchema.parse(row.form), version, updatedAt, sizesTyped }
}

/** Writes the draft over the version the writer had seen; null when it has moved on. */
export function writeDraft(
  db: DbOrTx,
  jobId: string,
  input: { form: RoofForm; version: number; sizesTyped: SizesTyped; now: Date },
): { version: number } | null {
  const { form, sizesTyped, now } = input
  const values = { form, sizesTyped, updatedAt: now, version: input.version + 1 }
  if (input.version === 0) {
    const made = db
      .insert(roofDrafts)
      .values({ jobId, ...values })
      .onConflictDoNothing()
      .returning({ version: roofDrafts.version })
      .get() as { version: number } | undefined
    return made ?? null
  }
  const written = db
    .update(roofDrafts)
    .set(values)
    .where(and(eq(roofDrafts.jobId, jobId), eq(roofDrafts.version, input.version)))
    .returning({ version: roofDrafts.version })
    .get() as { version: number } | undefined
  return written ?? null
}

const summaryColumns = {
  id: roofRevisions.id,
  letter: roofRevisions.letter,
  issuedAt: roofRevisions.issuedAt,
  issuedBy: people.name,
}

/** Newest first. */
export function listRevisions(db: DbOrTx, jobId: string): RevisionSummary[] {
  return db
    .select(summaryColumns)
    .from(roofRevisions)
    .innerJoin(people, eq(people.id, roofRevisions.issuedById))
    .where(eq(roofRevisions.jobId, jobId))
    .orderBy(desc(roofRevisions.sequence))
    .all()
    .map((row) => ({ ...row, issuedAt: row.issuedAt.toISOString() }))
}

/** A revision with its job, only where `visible` (a condition over `jobs`) lets it be seen. */
export function readRevision(db: DbOrTx, jobId: string, letter: string, visible: SQL) {
  return db
    .select({
      revision: roofRevisions,
      issuedBy: people.name,
      job: { id: jobs.id, number: jobs.number, title: jobs.title },
    })
    .from(roofRevisions)
    .innerJoin(jobs, eq(jobs.id, roofRevisions.jobId))
    .innerJoin(people, eq(people.id, roofRevisions.issuedById))
    .where(and(eq(roofRevisions.jobId, jobId), eq(roofRevisions.letter, letter), visible))
    .get()
}

export function hasPlateCheck(db: DbOrTx, revisionId: string): boolean {
  const found = db
    .select({ id: plateChecks.id })
    .from(plateChecks)
    .where(eq(plateChecks.revisionId, revisionId))
    .limit(1)
    .get()
  return found !== undefined
}
