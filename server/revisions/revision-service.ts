import { createHash } from 'node:crypto'
import { and, eq } from 'drizzle-orm'
import { roofGlyphOf } from '../../shared/drawing/roof-glyph.ts'
import { jobRoofSettings } from '../../shared/revisions/coverings.ts'
import { revisionLetter } from '../../shared/revisions/revision-letters.ts'
import type { Issued, JobRoof, Revision } from '../../shared/revisions/revision-schemas.ts'
import type { RoofForm } from '../../shared/revisions/roof-form.ts'
import { type FormFirm, roofOfForm } from '../../shared/revisions/roof-of-form.ts'
import { frameRoof } from '../../shared/roof/frame-roof.ts'
import { engineVersion } from '../../shared/roof/roof-settings.ts'
import type { Roof, RoofSettings } from '../../shared/roof/roof-types.ts'
import type { CurrentUser } from '../auth/current-user.ts'
import type { Db, DbOrTx } from '../db/client.ts'
import { jobs, roofRevisions } from '../db/tables/job-tables.ts'
import type { EventHub } from '../events/event-hub.ts'
import { readFirm } from '../firm/firm-store.ts'
import { AppError, notFound, staleVersion } from '../http/app-error.ts'
import { writeAudit } from '../lib/audit.ts'
import type { Clock } from '../lib/clock.ts'
import { newId } from '../lib/ids.ts'
import { jobVisible } from '../lib/visibility.ts'
import { canonicalJson } from './canonical-json.ts'
import {
  type DraftRow,
  hasPlateCheck,
  latestRevision,
  listRevisions,
  readDraft,
  readRevision,
  writeDraft,
} from './revision-store.ts'

export type RevisionDeps = {
  db: Db
  clock: Clock
  events: EventHub
  /** Gives the new revision to the booking days not worked yet, within the same transaction. */
  takeRevision: (tx: DbOrTx, jobId: string, revisionId: string, now: Date) => void
}
export type RevisionService = ReturnType<typeof createRevisionService>

export function createRevisionService(deps: RevisionDeps) {
  return {
    readRoof: (user: CurrentUser, jobId: string) => readRoof(deps, user, jobId),
    saveDraft: (user: CurrentUser, jobId: string, input: { form: RoofForm; version: number }) =>
      saveDraft(deps, user, jobId, input),
    issue: (user: CurrentUser, jobId: string, version: number) => issue(deps, user, jobId, version),
    readRevision: (user: CurrentUser, jobId: string, letter: string) =>
      wholeRevision(deps, user, jobId, letter),
  }
}

function jobOf(db: DbOrTx, deps: RevisionDeps, user: CurrentUser, jobId: string) {
  const visible = jobVisible(user, 'roof:write', readFirm(db), deps.clock.now())
  const job = db
    .select({ id: jobs.id, number: jobs.number, title: jobs.title, covering: jobs.covering })
    .from(jobs)
    .where(and(eq(jobs.id, jobId), visible))
    .get()
  if (!job) throw notFound('That job')
  return job
}

type Job = ReturnType<typeof jobOf>

function formFirmOf(db: DbOrTx, job: Job): FormFirm {
  const { brickOffsetMm, roofSettings } = readFirm(db)
  return { brickOffsetMm, settings: jobRoofSettings(roofSettings, job.covering) }
}

const draftBody = (draft: DraftRow | undefined) =>
  draft ? { ...draft, updatedAt: draft.updatedAt.toISOString() } : null

function readRoof(deps: RevisionDeps, user: CurrentUser, jobId: string): JobRoof {
  const { db } = deps
  const job = jobOf(db, deps, user, jobId)
  const sequence = latestRevision(db, jobId)?.sequence ?? 0
  return {
    job,
    draft: draftBody(readDraft(db, jobId)),
    ...formFirmOf(db, job),
    revisions: listRevisions(db, jobId),
    nextLetter: revisionLetter(sequence + 1),
  }
}

function saveDraft(
  deps: RevisionDeps,
  user: CurrentUser,
  jobId: string,
  input: { form: RoofForm; version: number },
) {
  const now = deps.clock.now()
  return deps.db.transaction((tx) => {
    jobOf(tx, deps, user, jobId)
    const written = writeDraft(tx, jobId, { ...input, now })
    if (!written) throw staleVersion(draftBody(readDraft(tx, jobId)))
    writeAudit(tx, {
      at: now,
      personId: user.id,
      action: 'roof draft saved',
      entity: 'job',
      entityId: jobId,
      detail: { version: written.version },
    })
    return { version: written.version, updatedAt: now.toISOString() }
  })
}

function issue(deps: RevisionDeps, user: CurrentUser, jobId: string, version: number): Issued {
  const now = deps.clock.now()
  const answer = deps.db.transaction((tx): Issued => {
    const job = jobOf(tx, deps, user, jobId)
    const draft = readDraft(tx, jobId)
    if (!draft || draft.version !== version) throw staleVersion(draftBody(draft))
    const firm = formFirmOf(tx, job)
    const roof = readRoofOrRefuse(draft.form, firm)
    const inputHash = hashOf(roof, firm.settings)
    const latest = latestRevision(tx, jobId)
    if (latest?.inputHash === inputHash) {
      return { issued: false, revision: summaryOf(tx, jobId, latest.letter) }
    }
    const sequence = (latest?.sequence ?? 0) + 1
    const row = { ...framed(roof, firm.settings), id: newId(), letter: revisionLetter(sequence) }
    tx.insert(roofRevisions)
      .values({ ...row, jobId, sequence, inputHash, issuedAt: now, issuedById: user.id })
      .run()
    deps.takeRevision(tx, jobId, row.id, now)
    writeAudit(tx, {
      at: now,
      personId: user.id,
      action: 'roof issued',
      entity: 'roof revision',
      entityId: row.id,
      detail: { jobId, letter: row.letter },
    })
    return { issued: true, revision: summaryOf(tx, jobId, row.letter) }
  })
  if (answer.issued) deps.events.publish({ topic: 'roof' })
  return answer
}

function readRoofOrRefuse(form: RoofForm, firm: FormFirm): Roof {
  const reading = roofOfForm(form, firm)
  if (reading.problems === null) return reading.roof
  throw new AppError('invalid_input', 'This roof cannot be framed yet. Put these right first.', {
    issues: reading.problems,
  })
}

function framed(roof: Roof, settings: RoofSettings) {
  const spec = frameRoof(roof, settings)
  return { roof, settings, spec, glyph: roofGlyphOf(spec, roof), engineVersion }
}

function hashOf(roof: Roof, settings: RoofSettings): string {
  return createHash('sha256').update(canonicalJson({ roof, settings, engineVersion })).digest('hex')
}

function summaryOf(db: DbOrTx, jobId: string, letter: string) {
  const found = listRevisions(db, jobId).find((revision) => revision.letter === letter)
  if (!found) throw new Error('An issued revision could not be read back.')
  return found
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
    platesMeasured: hasPlateCheck(db, revision.id),
    latestLetter: latestRevision(db, jobId)?.letter ?? revision.letter,
  }
}
