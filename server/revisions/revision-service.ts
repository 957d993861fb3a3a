import type { JobRoof, Revision } from '../../shared/revisions/revision-schemas.ts'
import { revisionLetter } from '../../shared/revisions/revision-letters.ts'
import type { RoofForm } from '../../shared/revisions/roof-form.ts'
import { sizesTypedAfter } from '../../shared/revisions/sizes-typed.ts'
import type { CurrentUser } from '../auth/current-user.ts'
import type { Db } from '../db/client.ts'
import { readFirm } from '../firm/firm-store.ts'
import { notFound, staleVersion } from '../http/app-error.ts'
import { writeAudit } from '../lib/audit.ts'
import type { Clock } from '../lib/clock.ts'
import { jobVisible } from '../lib/visibility.ts'
import { compareRevisions } from './compare-revisions.ts'
import type { Framer } from './framer.ts'
import { type IssueDeps, issueRevision } from './issue-revision.ts'
import {
  hasPlateCheck,
  latestIssue,
  listRevisions,
  readDraft,
  readRevision,
  writeDraft,
} from './revision-store.ts'
import { draftBody, formFirmOf, roofJobOf } from './roof-job.ts'

type RevisionDeps = { db: Db; clock: Clock }
export type RevisionService = ReturnType<typeof createRevisionService>

export function createRevisionService(deps: IssueDeps & { framer: Framer }) {
  return {
    readRoof: (user: CurrentUser, jobId: string) => readRoof(deps, user, jobId),
    saveDraft: (user: CurrentUser, jobId: string, input: { form: RoofForm; version: number }) =>
      saveDraft(deps, user, jobId, input),
    issue: (user: CurrentUser, jobId: string, version: number) =>
      issueRevision(deps, { user, jobId, version }),
    compare: (user: CurrentUser, jobId: string, letters: [string, string]) =>
      compareRevisions(deps, user, jobId, letters),
    readRevision: (user: CurrentUser, jobId: string, letter: string) =>
      wholeRevision(deps, user, jobId, letter),
  }
}

function readRoof(deps: RevisionDeps, user: CurrentUser, jobId: string): JobRoof {
  const { db } = deps
  const job = roofJobOf(db, user, jobId, deps.clock.now())
  const sequence = latestIssue(db, jobId)?.sequence ?? 0
  return {
    job,
    draft: draftBody(readDraft(db, jobId)),
    ...formFirmOf(db, job),
    revisions: listRevisions(db, jobId),
    nextLetter: revisionLetter(sequence + 1),
  }
}

export function saveDraft(
  deps: RevisionDeps,
  user: CurrentUser,
  jobId: string,
  input: { form: RoofForm; version: number },
) {
  const now = deps.clock.now()
  return deps.db.transaction((tx) => {
    roofJobOf(tx, user, jobId, now)
    const saver = { by: user.name, at: now.toISOString() }
    const sizesTyped = sizesTypedAfter(readDraft(tx, jobId) ?? null, input.form, saver)
    const written = writeDraft(tx, jobId, { ...input, sizesTyped, now })
    if (!written) throw staleVersion(draftBody(readDraft(tx, jobId)))
    writeAudit(tx, {
      at: now,
      personId: user.id,
      action: 'roof draft saved',
      entity: 'job',
      entityId: jobId,
      detail: { version: written.version },
    })
    return { version: written.version, updatedAt: now.toISOString(), sizesTyped }
  })
}

function wholeRevision(
  deps: RevisionDeps,
  user: CurrentUser,
  jobId: string,
  letter: string,
): Revision {
  const { db } = deps
  const visible = jobVisible(user, 'roof:read', readFirm(db), deps.clock.now())
  const found = readRevision(db, jobId, letter, visible)
  if (!found) throw notFound('That revision')
  const { revision, issuedBy, job } = found
  return {
    id: revision.id,
    letter: revision.letter,
    issuedAt: revision.issuedAt.toISOString(),
    issuedBy,
    job,
    roof: revision.roof,
    settings: revision.settings,
    spec: revision.spec,
    engineVersion: revision.engineVersion,
    sizesTyped: revision.sizesTyped,
    platesMeasured: hasPlateCheck(db, revision.id),
    latestLetter: latestIssue(db, jobId)?.letter ?? revision.letter,
  }
}
