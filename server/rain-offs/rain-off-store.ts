import { and, desc, eq, gte, inArray, or, type SQL } from 'drizzle-orm'
import { alias } from 'drizzle-orm/sqlite-core'
import type { DbOrTx } from '../db/client.ts'
import { crews, people } from '../db/tables/people-tables.ts'
import { rainOffs } from '../db/tables/rain-off-tables.ts'

export type RainOffRecord = typeof rainOffs.$inferSelect

export function readRainOff(db: DbOrTx, id: string): RainOffRecord | null {
  return db.select().from(rainOffs).where(eq(rainOffs.id, id)).get() ?? null
}

export function insertRainOff(tx: DbOrTx, row: typeof rainOffs.$inferInsert): void {
  tx.insert(rainOffs).values(row).run()
}

export function updateRainOff(
  tx: DbOrTx,
  row: RainOffRecord,
  changes: Partial<RainOffRecord>,
): void {
  tx.update(rainOffs)
    .set({ ...changes, version: row.version + 1 })
    .where(eq(rainOffs.id, row.id))
    .run()
}

const mostListed = 60

/** Those asked for and those settled since an instant, with crew and names; newest first. */
export function listRainOffs(db: DbOrTx, input: { settledSince: Date; visible: SQL | undefined }) {
  const askers = alias(people, 'askers')
  const settlers = alias(people, 'settlers')
  return db
    .select({
      row: rainOffs,
      crew: { id: crews.id, name: crews.name, letter: crews.letter, colour: crews.colour },
      askedBy: askers.name,
      settledBy: settlers.name,
    })
    .from(rainOffs)
    .innerJoin(crews, eq(crews.id, rainOffs.crewId))
    .leftJoin(askers, eq(askers.id, rainOffs.askedById))
    .leftJoin(settlers, eq(settlers.id, rainOffs.settledById))
    .where(
      and(
        or(eq(rainOffs.state, 'asked'), gte(rainOffs.settledAt, input.settledSince)),
        input.visible,
      ),
    )
    .orderBy(desc(rainOffs.fromDay), desc(rainOffs.askedAt), desc(rainOffs.id))
    .limit(mostListed)
    .all()
}

export type ListedRainOff = ReturnType<typeof listRainOffs>[number]

/** Those of some crews, or asked for by this person. */
export const ofCrewsOrAskedBy = (crewIds: readonly string[], personId: string): SQL | undefined =>
  or(inArray(rainOffs.crewId, [...crewIds]), eq(rainOffs.askedById, personId))

/** One that waits for an answer for the same crew and day. */
export function readAskedAlready(db: DbOrTx, crewId: string, fromDay: string) {
  return db
    .select({ id: rainOffs.id, askedBy: people.name })
    .from(rainOffs)
    .leftJoin(people, eq(people.id, rainOffs.askedById))
    .where(
      and(eq(rainOffs.state, 'asked'), eq(rainOffs.crewId, crewId), eq(rainOffs.fromDay, fromDay)),
    )
    .get()
}
