import { and, asc, eq, gte, isNull, lte, or } from 'drizzle-orm'
import type { Day } from '../../shared/calendar/days.ts'
import type { DbOrTx } from '../db/client.ts'
import { crewMembers, leave, people } from '../db/tables/people-tables.ts'

const memberOn = (day: Day) =>
  and(lte(crewMembers.startsOn, day), or(isNull(crewMembers.endsOn), gte(crewMembers.endsOn, day)))

export type RosteredPerson = {
  id: string
  name: string
  email: string
  phone: string
  role: 'office' | 'leading-hand' | 'apprentice'
  onLeave: boolean
}

/** Active members of a crew on a day, those on leave marked; by name. */
export function rosterOf(db: DbOrTx, crewId: string, day: Day): RosteredPerson[] {
  const rows = db
    .selectDistinct({
      id: people.id,
      name: people.name,
      email: people.email,
      phone: people.phone,
      role: people.role,
      leaveId: leave.id,
    })
    .from(crewMembers)
    .innerJoin(people, and(eq(people.id, crewMembers.personId), eq(people.active, true)))
    .leftJoin(
      leave,
      and(eq(leave.personId, people.id), lte(leave.startsOn, day), gte(leave.endsOn, day)),
    )
    .where(and(eq(crewMembers.crewId, crewId), memberOn(day)))
    .orderBy(asc(people.name))
    .all()
  const byId = new Map<string, RosteredPerson>()
  for (const { leaveId, ...person } of rows)
    byId.set(person.id, { ...person, onLeave: leaveId !== null })
  return [...byId.values()]
}

/** Crews a person belongs to on a day. */
export function crewIdsOf(db: DbOrTx, personId: string, day: Day): string[] {
  return db
    .selectDistinct({ crewId: crewMembers.crewId })
    .from(crewMembers)
    .where(and(eq(crewMembers.personId, personId), memberOn(day)))
    .all()
    .map((row) => row.crewId)
}
