import { and, eq } from 'drizzle-orm'
import { type MilestoneKind, milestoneKinds } from '../../shared/milestones/milestone-kinds.ts'
import { blankMilestone } from '../../shared/milestones/milestone-rules.ts'
import type { Milestone } from '../../shared/milestones/milestone-schemas.ts'
import type { DbOrTx } from '../db/client.ts'
import { milestones } from '../db/tables/milestone-tables.ts'
import { newId } from '../lib/ids.ts'

type MilestoneRow = typeof milestones.$inferSelect

function milestoneOf(row: MilestoneRow): Milestone {
  const { kind, day, state, broughtBy, note, version } = row
  return { kind, day, state, broughtBy, note, version }
}

/** All kinds, in the order a site comes to them; those nobody has said anything of are blank. */
export function readMilestones(db: DbOrTx, jobId: string): Milestone[] {
  const rows = db.select().from(milestones).where(eq(milestones.jobId, jobId)).all()
  return milestoneKinds.map((kind) => {
    const row = rows.find((one) => one.kind === kind)
    return row ? milestoneOf(row) : blankMilestone(kind)
  })
}

export function readMilestone(db: DbOrTx, jobId: string, kind: MilestoneKind): Milestone {
  const row = db
    .select()
    .from(milestones)
    .where(and(eq(milestones.jobId, jobId), eq(milestones.kind, kind)))
    .get()
  return row ? milestoneOf(row) : blankMilestone(kind)
}

/** Writes a milestone as it is to be; its version goes up. */
export function writeMilestone(
  tx: DbOrTx,
  jobId: string,
  { version, ...milestone }: Milestone,
  now: Date,
): void {
  const values = { ...milestone, updatedAt: now, version: version + 1 }
  tx.insert(milestones)
    .values({ id: newId(), jobId, ...values })
    .onConflictDoUpdate({ target: [milestones.jobId, milestones.kind], set: values })
    .run()
}
