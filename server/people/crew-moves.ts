import { and, eq, gte, isNull, lte, or } from 'drizzle-orm'
import { type Day, dayPlus } from '../../shared/calendar/days.ts'
import type { DbOrTx } from '../db/client.ts'
import { crewMembers } from '../db/tables/people-tables.ts'
import { newId } from '../lib/ids.ts'

/**
 * From `from` on the person is in `crewId` (null: in none). What was before stays as it was, what was
 * planned after is taken back. Staying in a crew goes on with the membership there is.
 */
export function moveToCrew(db: DbOrTx, personId: string, crewId: string | null, from: Day): void {
  db.delete(crewMembers)
    .where(and(eq(crewMembers.personId, personId), gte(crewMembers.startsOn, from)))
    .run()
  const dayBefore = dayPlus(from, -1)
  db.update(crewMembers)
    .set({ endsOn: dayBefore })
    .where(
      and(
        eq(crewMembers.personId, personId),
        lte(crewMembers.startsOn, from),
        or(isNull(crewMembers.endsOn), gte(crewMembers.endsOn, from)),
      ),
    )
    .run()
  if (!crewId) return
  const went = db
    .update(crewMembers)
    .set({ endsOn: null })
    .where(
      and(
        eq(crewMembers.personId, personId),
        eq(crewMembers.crewId, crewId),
        eq(crewMembers.endsOn, dayBefore),
      ),
    )
    .run()
  if (went.changes === 0) {
    db.insert(crewMembers)
      .values({ id: newId(), crewId, personId, startsOn: from, endsOn: null })
      .run()
  }
}
