import { inArray } from 'drizzle-orm'
import type { DbOrTx } from '../db/client.ts'
import { roofRevisions } from '../db/tables/job-tables.ts'

export type IssuedRoof = typeof roofRevisions.$inferSelect

/** Whole revisions by id; the right to see them is for the caller. */
export type ReadIssuedRoofs = (db: DbOrTx, ids: readonly string[]) => Map<string, IssuedRoof>

export const readIssuedRoofs: ReadIssuedRoofs = (db, ids) => {
  if (ids.length === 0) return new Map()
  const rows = db
    .select()
    .from(roofRevisions)
    .where(inArray(roofRevisions.id, [...ids]))
    .all()
  return new Map(rows.map((row) => [row.id, row]))
}

/** As many roofs as a firm works on in a week or two; a large one takes some megabytes. */
const mostKept = 24

/**
 * The same, kept once read: a revision never changes, and reading its spec is most of what a day sheet
 * costs. Those not asked for longest go. What is kept is frozen, since requests share it.
 */
export function keptIssuedRoofs(most = mostKept): ReadIssuedRoofs {
  const kept = new Map<string, IssuedRoof>()
  return (db, ids) => {
    const wanted = [...new Set(ids)]
    const missing = wanted.filter((id) => !kept.has(id))
    const read = readIssuedRoofs(db, missing)
    const found = new Map<string, IssuedRoof>()
    for (const id of wanted) {
      const roof = kept.get(id) ?? deepFrozen(read.get(id))
      if (!roof) continue
      found.set(id, roof)
      // Taken out and put in again: the map's order is the order of last use.
      kept.delete(id)
      kept.set(id, roof)
    }
    for (const id of [...kept.keys()].slice(0, Math.max(0, kept.size - most))) kept.delete(id)
    return found
  }
}

function deepFrozen<T>(value: T): T {
  if (typeof value !== 'object' || value === null || value instanceof Date) return value
  for (const part of Object.values(value)) deepFrozen(part)
  return Object.freeze(value)
}
