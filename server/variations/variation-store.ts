import { and, asc, eq, max } from 'drizzle-orm'
import type { Variation } from '../../shared/variations/variation-schemas.ts'
import type { DbOrTx } from '../db/client.ts'
import { people } from '../db/tables/people-tables.ts'
import { variations } from '../db/tables/variation-tables.ts'

export type VariationRow = typeof variations.$inferSelect

/** In the order they came. */
export function readVariations(db: DbOrTx, jobId: string): Variation[] {
  return db
    .select({
      id: variations.id,
      sequence: variations.sequence,
      reason: variations.reason,
      priceCents: variations.priceCents,
      askedOn: variations.askedOn,
      agreedOn: variations.agreedOn,
      agreedBy: variations.agreedBy,
      withdrawnOn: variations.withdrawnOn,
      createdBy: people.name,
      version: variations.version,
    })
    .from(variations)
    .innerJoin(people, eq(people.id, variations.createdById))
    .where(eq(variations.jobId, jobId))
    .orderBy(asc(variations.sequence))
    .all()
}

export function readVariationRow(db: DbOrTx, jobId: string, id: string): VariationRow | undefined {
  return db
    .select()
    .from(variations)
    .where(and(eq(variations.id, id), eq(variations.jobId, jobId)))
    .get()
}

/** The job an id is taken by; undefined while nobody has it. */
export function readJobOfVariation(db: DbOrTx, id: string): string | undefined {
  return db.select({ jobId: variations.jobId }).from(variations).where(eq(variations.id, id)).get()
    ?.jobId
}

export function nextSequence(db: DbOrTx, jobId: string): number {
  const last = db
    .select({ last: max(variations.sequence) })
    .from(variations)
    .where(eq(variations.jobId, jobId))
    .get()
  return (last?.last ?? 0) + 1
}

export function insertVariation(tx: DbOrTx, row: typeof variations.$inferInsert): void {
  tx.insert(variations).values(row).run()
}

export function updateVariation(
  tx: DbOrTx,
  row: VariationRow,
  change: Partial<VariationRow>,
): void {
  tx.update(variations)
    .set({ ...change, version: row.version + 1 })
    .where(and(eq(variations.id, row.id), eq(variations.version, row.version)))
    .run()
}
