import { and, asc, eq, gte, isNull, lte, or } from 'drizzle-orm'
import { groupBy } from '../../shared/collections/group-by.ts'
import { type Day, dayPlus } from '../../shared/calendar/days.ts'
import type { Person } from '../../shared/people/people-schemas.ts'
import type { DbOrTx } from '../db/client.ts'
import { crewMembers, leave, people } from '../db/tables/people-tables.ts'
import { newId } from '../lib/ids.ts'

type PersonRow = typeof people.$inferSelect

function personView(
  row: PersonRow,
  memberships: (typeof crewMembers.$inferSelect)[],
  leaves: (typeof leave.$inferSelect)[],
  today: Day,
): Person {
  const now = memberships.find(
    (m) => m.startsOn <= today && (m.endsOn === null || m.endsOn >= today),
  )
  const next = memberships.find((m) => m.startsOn > today)
  const leaving = now?.endsOn && !next ? { crewId: null, from: dayPlus(now.endsOn, 1) } : null
  return {
    id: row.id,
    name: row.name,
    email: row.email,
    phone: row.phone,
    role: row.role,
    active: row.active,
    invited: row.passwordHash === null,
    crewId: now?.crewId ?? null,
    nextMove: next ? { crewId: next.crewId, from: next.startsOn } : leaving,
    leave: leaves.map(({ id, startsOn, endsOn, reason }) => ({ id, startsOn, endsOn, reason })),
    version: row.version,
  }
}

/** Everybody, by name; three queries whatever their number. */
export function listPeople(db: DbOrTx, today: Day): Person[] {
  const memberships = db
    .select()
    .from(crewMembers)
    .where(or(isNull(crewMembers.endsOn), gte(crewMembers.endsOn, today)))
    .orderBy(asc(crewMembers.startsOn))
    .all()
  const leaves = db
    .select()
    .from(leave)
    .where(gte(leave.endsOn, today))
    .orderBy(asc(leave.startsOn))
    .all()
  const membershipsOf = groupBy(memberships, (row) => row.personId)
  const leavesOf = groupBy(leaves, (row) => row.personId)
  return db
    .select()
    .from(people)
    .orderBy(asc(people.name))
    .all()
    .map((row) =>
      personView(row, membershipsOf.get(row.id) ?? [], leavesOf.get(row.id) ?? [], today),
    )
}

/**
 * From `from` on the person is in `crewId` (null: in none). What was before stays as it was, what was
 * planned after is taken back.
 */
export function moveToCrew(db: DbOrTx, personId: string, crewId: string | null, from: Day): void {
  db.delete(crewMembers)
    .where(and(eq(crewMembers.personId, personId), gte(crewMembers.startsOn, from)))
    .run()
  db.update(crewMembers)
    .set({ endsOn: dayPlus(from, -1) })
    .where(
      and(
        eq(crewMembers.personId, personId),
        lte(crewMembers.startsOn, from),
        or(isNull(crewMembers.endsOn), gte(crewMembers.endsOn, from)),
      ),
    )
    .run()
  if (crewId) {
    db.insert(crewMembers)
      .values({ id: newId(), crewId, personId, startsOn: from, endsOn: null })
      .run()
  }
}
