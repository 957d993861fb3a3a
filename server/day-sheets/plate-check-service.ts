import { and, desc, eq } from 'drizzle-orm'
import {
  comparePlates,
  isDiagonal,
  type NewPlateCheck,
  type PlateCheckAnswer,
} from '../../shared/day-sheets/plate-check.ts'
import type { Db, DbOrTx } from '../db/client.ts'
import { jobs, plateChecks, roofRevisions } from '../db/tables/job-tables.ts'
import { people } from '../db/tables/people-tables.ts'
import { AppError, type FieldIssue, invalidField, notFound } from '../http/app-error.ts'
import { writeAudit } from '../lib/audit.ts'
import { jobVisible } from '../lib/visibility.ts'
import type { Viewer } from './task-store.ts'

type RevisionRow = typeof roofRevisions.$inferSelect

function measuredIssues(cornerCount: number, check: NewPlateCheck): FieldIssue[] {
  const sides =
    check.sidesMm.length === cornerCount
      ? []
      : [
          {
            path: 'sidesMm',
            message: `This plan has ${cornerCount} sides; ${check.sidesMm.length} were given.`,
          },
        ]
  const none =
    cornerCount > 3 && check.diagonals.length === 0
      ? [
          {
            path: 'diagonals',
            message: 'Measure at least one diagonal: sides alone do not say that it is square.',
          },
        ]
      : []
  const wrong = check.diagonals.flatMap((diagonal, i) =>
    isDiagonal(cornerCount, diagonal)
      ? []
      : [
          {
            path: `diagonals.${i}`,
            message: `Corner ${diagonal.from + 1} to corner ${diagonal.to + 1} is no diagonal of this plan.`,
          },
        ],
  )
  return [...sides, ...none, ...wrong]
}

function findRevision(
  db: DbOrTx,
  viewer: Viewer,
  jobId: string,
  letter: string,
): RevisionRow | undefined {
  const visible = jobVisible(viewer.user, 'plate-check:write', viewer.firm, viewer.now)
  const job = db
    .select({ id: jobs.id })
    .from(jobs)
    .where(and(eq(jobs.id, jobId), visible))
    .get()
  if (!job) throw notFound('That job')
  return db
    .select()
    .from(roofRevisions)
    .where(and(eq(roofRevisions.jobId, jobId), eq(roofRevisions.letter, letter)))
    .get()
}

function answerOf(db: DbOrTx, revision: RevisionRow, checkId: string): PlateCheckAnswer {
  const row = db
    .select({ check: plateChecks, takenBy: people.name })
    .from(plateChecks)
    .innerJoin(people, eq(people.id, plateChecks.takenById))
    .where(eq(plateChecks.id, checkId))
    .get()
  if (!row) throw new Error('A plate check was gone within its own transaction.')
  return {
    id: row.check.id,
    letter: revision.letter,
    takenAt: row.check.takenAt.toISOString(),
    takenBy: row.takenBy,
    note: row.check.note,
    comparison: comparePlates(revision.roof.outline, row.check),
  }
}

/** Records sides and diagonals as measured, and says where they differ from plan. */
export function recordPlateCheck(
  db: Db,
  viewer: Viewer,
  jobId: string,
  input: NewPlateCheck,
): PlateCheckAnswer {
  const { user, now } = viewer
  return db.transaction((tx) => {
    const revision = findRevision(tx, viewer, jobId, input.letter)
    if (!revision) throw invalidField('letter', `This job has no revision ${input.letter}.`)
    const issues = measuredIssues(revision.roof.outline.length, input)
    if (issues.length > 0)
      throw new AppError('invalid_input', 'Some fields need another look.', { issues })
    const known = tx.select().from(plateChecks).where(eq(plateChecks.id, input.id)).get()
    if (known) {
      if (known.revisionId !== revision.id || known.takenById !== user.id)
        throw new AppError('conflict', 'That check was already recorded for something else.')
      return answerOf(tx, revision, known.id)
    }
    tx.insert(plateChecks)
      .values({
        id: input.id,
        jobId,
        revisionId: revision.id,
        sidesMm: input.sidesMm,
        diagonals: input.diagonals,
        note: input.note,
        takenById: user.id,
        takenAt: now,
      })
      .run()
    writeAudit(tx, {
      at: now,
      personId: user.id,
      action: 'plate-check.record',
      entity: 'job',
      entityId: jobId,
      detail: { letter: revision.letter, checkId: input.id },
    })
    return answerOf(tx, revision, input.id)
  })
}

/** The latest check of a revision, with what was measured beside the plan; null before the first. */
export function latestComparison(
  db: DbOrTx,
  viewer: Viewer,
  jobId: string,
  letter: string,
): PlateCheckAnswer | null {
  const revision = findRevision(db, viewer, jobId, letter)
  if (!revision) throw notFound('That revision')
  const latest = db
    .select({ id: plateChecks.id })
    .from(plateChecks)
    .where(eq(plateChecks.revisionId, revision.id))
    .orderBy(desc(plateChecks.takenAt))
    .limit(1)
    .get()
  return latest ? answerOf(db, revision, latest.id) : null
}
