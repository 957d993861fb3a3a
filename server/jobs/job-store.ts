import { and, eq, inArray, ne, type SQL, sql } from 'drizzle-orm'
import type { Permission } from '../../shared/auth/permissions.ts'
import type { DbOrTx } from '../db/client.ts'
import { jobs } from '../db/tables/job-tables.ts'
import { jobVisible } from '../lib/visibility.ts'
import type { Viewer } from './job-board-store.ts'

export type JobRow = typeof jobs.$inferSelect
export type NewJobRow = typeof jobs.$inferInsert
export type JobColumns = Partial<Omit<NewJobRow, 'id' | 'createdAt' | 'updatedAt' | 'version'>>

/** The row together with the right to see it; undefined for a missing and for a foreign one alike. */
export function findJob(
  db: DbOrTx,
  viewer: Viewer,
  permission: Permission,
  jobId: string,
): JobRow | undefined {
  const visible = jobVisible(viewer.user, permission, viewer.firm, viewer.now)
  return db
    .select()
    .from(jobs)
    .where(and(eq(jobs.id, jobId), visible))
    .get()
}

export function jobsById(db: DbOrTx, ids: string[]): Map<string, JobRow> {
  const rows = db.select().from(jobs).where(inArray(jobs.id, ids)).all()
  return new Map(rows.map((row) => [row.id, row]))
}

export function insertJob(db: DbOrTx, row: NewJobRow): void {
  db.insert(jobs).values(row).run()
}

/** False when the version has moved on, and then nothing is written. */
export function updateJob(
  db: DbOrTx,
  jobId: string,
  version: number,
  columns: JobColumns,
  now: Date,
): boolean {
  const result = db
    .update(jobs)
    .set({ ...columns, updatedAt: now, version: version + 1 })
    .where(and(eq(jobs.id, jobId), eq(jobs.version, version)))
    .run()
  return result.changes === 1
}

const sameText = (column: typeof jobs.number, text: string): SQL =>
  sql`lower(${column}) = lower(${text})`

export function isNumberTaken(db: DbOrTx, number: string, byOtherThan: string): boolean {
  const found = db
    .select({ id: jobs.id })
    .from(jobs)
    .where(and(sameText(jobs.number, number), ne(jobs.id, byOtherThan)))
    .get()
  return found !== undefined
}

const firstNumber = 101

/** The next free number of the firm's own row: 'QR-105' after 'QR-104' for a firm of those initials. */
export function nextJobNumber(db: DbOrTx, firmName: string): string {
  const initials = firmName
    .split(/\s+/)
    .map((word) => word.charAt(0))
    .filter((letter) => /\p{L}/u.test(letter))
    .slice(0, 2)
    .join('')
    .toUpperCase()
  const prefix = `${initials || 'J'}-`
  const row = db.get<{ highest: number | null }>(sql`
    select max(cast(substr(number, ${prefix.length + 1}) as integer)) as highest from jobs
    where substr(number, 1, ${prefix.length}) = ${prefix}
      and length(number) between ${prefix.length + 1} and ${prefix.length + 9}
      and substr(number, ${prefix.length + 1}) not glob '*[^0-9]*'`)
  return `${prefix}${Math.max(firstNumber, (row.highest ?? 0) + 1)}`
}
