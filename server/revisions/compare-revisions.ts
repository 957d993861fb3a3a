import { compareSpecs } from '../../shared/revisions/compare-specs.ts'
import type { Comparison } from '../../shared/revisions/comparison-schemas.ts'
import type { CurrentUser } from '../auth/current-user.ts'
import { cutButUnusedIn } from '../bookings/cut-but-unused.ts'
import type { Db } from '../db/client.ts'
import { readFirm } from '../firm/firm-store.ts'
import { notFound } from '../http/app-error.ts'
import type { Clock } from '../lib/clock.ts'
import { jobVisible } from '../lib/visibility.ts'
import { hasPlateCheck, listRevisions, readRevision } from './revision-store.ts'

/** Two revisions of a job line by line, the older first whichever way round they are asked for. */
export function compareRevisions(
  { db, clock }: { db: Db; clock: Clock },
  user: CurrentUser,
  jobId: string,
  letters: [string, string],
): Comparison {
  const visible = jobVisible(user, 'roof:read', readFirm(db), clock.now())
  const found = letters.map((letter) => {
    const one = readRevision(db, jobId, letter, visible)
    if (!one) throw notFound(`Revision ${letter}`)
    return one
  })
  const [older, newer] = found.sort((a, b) => a.revision.sequence - b.revision.sequence)
  if (!older || !newer) throw notFound('That revision')
  const listed = listRevisions(db, jobId)
  const summaryOf = (id: string) => {
    const summary = listed.find((one) => one.id === id)
    if (!summary) throw notFound('That revision')
    return summary
  }
  return {
    job: newer.job,
    before: summaryOf(older.revision.id),
    after: summaryOf(newer.revision.id),
    letters: listed.map((one) => one.letter),
    platesMeasured: hasPlateCheck(db, newer.revision.id),
    lines: compareSpecs(older.revision.spec, newer.revision.spec, {
      sameLengthMm: newer.revision.settings.roundMm,
    }),
    cutButUnused: cutButUnusedIn(db, jobId, newer.revision.id).map(({ revisionId, marks }) => ({
      letter: summaryOf(revisionId).letter,
      marks,
    })),
  }
}
