import { carryOver } from '../../shared/day-plan/carry-over.ts'
import type { DbOrTx } from '../db/client.ts'
import { donePieces } from './job-plan.ts'
import { readJobDays, readJobTasks, readSpecs } from './job-plan-store.ts'

/** Pieces ticked as cut to any other revision of the job that this one has no place for. */
export function cutButUnusedIn(
  db: DbOrTx,
  jobId: string,
  revisionId: string,
): { revisionId: string; marks: string[] }[] {
  const revisionOf = new Map(readJobDays(db, jobId).map((row) => [row.id, row.revisionId]))
  const tasks = readJobTasks(db, jobId).filter((task) => task.tickSum > 0)
  const worked = tasks.map((task) => revisionOf.get(task.bookingDayId) ?? null)
  const others = [...new Set(worked)].filter((id) => id !== null && id !== revisionId)
  if (others.length === 0) return []
  const specs = readSpecs(db, [revisionId, ...others.filter((id) => id !== null)])
  const next = specs.get(revisionId)
  return [...specs].flatMap(([id, previous]) => {
    if (id === revisionId || !next) return []
    const own = tasks.filter((task) => revisionOf.get(task.bookingDayId) === id)
    const marks = carryOver(
      previous,
      next,
      donePieces(own, (task) => task.tickSum),
    ).cutButUnused
    return marks.length > 0 ? [{ revisionId: id, marks }] : []
  })
}
