import { and, eq } from 'drizzle-orm'
import { jobRoofSettings } from '../../shared/revisions/coverings.ts'
import type { FormFirm } from '../../shared/revisions/roof-of-form.ts'
import type { CurrentUser } from '../auth/current-user.ts'
import type { DbOrTx } from '../db/client.ts'
import { jobs } from '../db/tables/job-tables.ts'
import { readFirm } from '../firm/firm-store.ts'
import { notFound } from '../http/app-error.ts'
import { jobVisible } from '../lib/visibility.ts'
import type { DraftRow } from './revision-store.ts'

/** The job whose roof somebody may write. @throws AppError 404. */
export function roofJobOf(db: DbOrTx, user: CurrentUser, jobId: string, now: Date) {
  const visible = jobVisible(user, 'roof:write', readFirm(db), now)
  const job = db
    .select({ id: jobs.id, number: jobs.number, title: jobs.title, covering: jobs.covering })
    .from(jobs)
    .where(and(eq(jobs.id, jobId), visible))
    .get()
  if (!job) throw notFound('That job')
  return job
}

type RoofJob = ReturnType<typeof roofJobOf>

/** What the firm and the job bring to a typed roof. */
export function formFirmOf(db: DbOrTx, job: RoofJob): FormFirm {
  const { brickOffsetMm, roofSettings } = readFirm(db)
  return { brickOffsetMm, settings: jobRoofSettings(roofSettings, job.covering) }
}

export const draftBody = (draft: DraftRow | undefined) =>
  draft ? { ...draft, updatedAt: draft.updatedAt.toISOString() } : null
