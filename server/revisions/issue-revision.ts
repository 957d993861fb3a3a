import { revisionLetter } from '../../shared/revisions/revision-letters.ts'
import type { Issued } from '../../shared/revisions/revision-schemas.ts'
import type { CurrentUser } from '../auth/current-user.ts'
import type { RevisionTaken } from '../bookings/replan.ts'
import type { Db, DbOrTx } from '../db/client.ts'
import { roofRevisions } from '../db/tables/job-tables.ts'
import type { EventHub } from '../events/event-hub.ts'
import { AppError, staleVersion } from '../http/app-error.ts'
import { writeAudit } from '../lib/audit.ts'
import type { Clock } from '../lib/clock.ts'
import { newId } from '../lib/ids.ts'
import { canonicalJson } from './canonical-json.ts'
import type { Framer } from './framer.ts'
import {
  type PreparedRevision,
  prepareRevision,
  type RevisionQuestion,
} from './prepare-revision.ts'
import { latestIssue, listRevisions, readDraft } from './revision-store.ts'
import { draftBody, formFirmOf, roofJobOf } from './roof-job.ts'

export type IssueDeps = {
  db: Db
  clock: Clock
  events: EventHub
  /** Gives the new revision to the booking days not worked yet, within the same transaction. */
  takeRevision: (tx: DbOrTx, jobId: string, revisionId: string, now: Date) => RevisionTaken
}

type Wanted = { user: CurrentUser; jobId: string; version: number }

/** Framed first, beside the requests; then written, if nothing it rests on has changed meanwhile. */
export async function issueRevision(
  deps: IssueDeps & { framer: Framer },
  wanted: Wanted,
): Promise<Issued> {
  const question = questionOf(deps, wanted)
  const prepared = await deps.framer.prepare(question)
  return write(deps, wanted, question, prepared)
}

/** The same without a thread, for a caller inside a transaction of its own. */
export function issueAtOnce(deps: IssueDeps, wanted: Wanted): Issued {
  const question = questionOf(deps, wanted)
  return write(deps, wanted, question, prepareRevision(question))
}

/** The draft as the person saw it, and what it is read with. */
function questionOf(deps: IssueDeps, { user, jobId, version }: Wanted): RevisionQuestion {
  const { db, clock } = deps
  const job = roofJobOf(db, user, jobId, clock.now())
  const draft = readDraft(db, jobId)
  if (!draft || draft.version !== version) throw staleVersion(draftBody(draft))
  const latestHash = latestIssue(db, jobId)?.inputHash ?? null
  return { form: draft.form, firm: formFirmOf(db, job), latestHash }
}

/** @throws AppError 409 when draft, firm or job is no longer what was framed. */
function refuseIfChanged(
  tx: DbOrTx,
  { user, jobId, version }: Wanted,
  question: RevisionQuestion,
  now: Date,
): void {
  const job = roofJobOf(tx, user, jobId, now)
  const draft = readDraft(tx, jobId)
  const isSame = canonicalJson(formFirmOf(tx, job)) === canonicalJson(question.firm)
  if (draft?.version === version && isSame) return
  const what = isSame ? 'The roof was' : 'The firm’s settings or the job’s covering were'
  throw new AppError(
    'conflict',
    `${what} changed while the roof was being framed, so it was not issued. Look at it, then issue it again.`,
    { detail: { current: draftBody(draft) } },
  )
}

function write(
  deps: IssueDeps,
  wanted: Wanted,
  question: RevisionQuestion,
  prepared: PreparedRevision,
): Issued {
  if (prepared.kind === 'refused') {
    throw new AppError('invalid_input', 'This roof cannot be framed yet. Put these right first.', {
      issues: prepared.problems,
    })
  }
  const { user, jobId } = wanted
  const now = deps.clock.now()
  const answer = deps.db.transaction((tx): Issued => {
    refuseIfChanged(tx, wanted, question, now)
    const latest = latestIssue(tx, jobId)
    const framed = prepared.kind === 'framed' ? prepared.framed : null
    if (latest && latest.inputHash === (framed?.inputHash ?? question.latestHash)) {
      return { issued: false, revision: summaryOf(tx, jobId, latest.letter), cutButUnused: [] }
    }
    if (!framed) throw new Error('Nothing was framed, and no revision is the same.')
    const sequence = (latest?.sequence ?? 0) + 1
    const sizesTyped = readDraft(tx, jobId)?.sizesTyped ?? {}
    const row = { ...framed, sizesTyped, id: newId(), letter: revisionLetter(sequence) }
    tx.insert(roofRevisions)
      .values({ ...row, jobId, sequence, issuedAt: now, issuedById: user.id })
      .run()
    const cutButUnused = lettered(tx, jobId, deps.takeRevision(tx, jobId, row.id, now))
    writeAudit(tx, {
      at: now,
      personId: user.id,
      action: 'roof issued',
      entity: 'roof revision',
      entityId: row.id,
      detail: { jobId, letter: row.letter, cutButUnused },
    })
    return { issued: true, revision: summaryOf(tx, jobId, row.letter), cutButUnused }
  })
  if (answer.issued) deps.events.publish({ topic: 'roof' })
  return answer
}

/** Pieces cut to an older revision that the new one has no place for, by that revision's letter. */
function lettered(tx: DbOrTx, jobId: string, taken: RevisionTaken): Issued['cutButUnused'] {
  const revisions = listRevisions(tx, jobId)
  return taken.cutButUnused.map(({ revisionId, marks }) => ({
    letter: revisions.find((one) => one.id === revisionId)?.letter ?? '',
    marks,
  }))
}

function summaryOf(db: DbOrTx, jobId: string, letter: string) {
  const found = listRevisions(db, jobId).find((revision) => revision.letter === letter)
  if (!found) throw new Error('An issued revision could not be read back.')
  return found
}
