import { and, asc, eq, gte, lte, sql } from 'drizzle-orm'
import type { Role } from '../../shared/auth/roles.ts'
import type { Day } from '../../shared/calendar/days.ts'
import { isAwayOn } from '../../shared/people/leave-days.ts'
import type { DbOrTx } from '../db/client.ts'
import { crews, leave, people } from '../db/tables/people-tables.ts'
import { countsForCrew } from './counts-for-crew.ts'

export type RosteredPerson = {
  id: string
  name: string
  email: string
  phone: string
  role: Role
  /** Own ordinary hours Monday to Sunday; null: the firm's. */
  weekHours: number[] | null
  onLeave: boolean
}

/** Active people who count for a crew on a day, borrowed ones too, those on leave marked; by name. */
export function rosterOf(db: DbOrTx, crewId: string, day: Day): RosteredPerson[] {
  const rows = db
    .select({
      id: people.id,
      name: people.name,
      email: people.email,
      phone: people.phone,
      role: people.role,
      weekHours: people.weekHours,
      leave: { startsOn: leave.startsOn, endsOn: leave.endsOn, weekdays: leave.weekdays },
    })
    .from(people)
    .leftJoin(
      leave,
      and(eq(leave.personId, people.id), lte(leave.startsOn, day), gte(leave.endsOn, day)),
    )
    .where(and(eq(people.active, true), countsForCrew(people.id, crewId, day)))
    .orderBy(asc(people.name))
    .all()
  const byId = new Map<string, RosteredPerson>()
  for (const { leave: span, ...person } of rows) {
    const onLeave = byId.get(person.id)?.onLeave === true || (span !== null && isAwayOn(span, day))
    byId.set(person.id, { ...person, onLeave })
  }
  return [...byId.values()]
}

/** Crews a person counts for on a day: the one that has borrowed the person, else the own. */
export function crewIdsOf(db: DbOrTx, personId: string, day: Day): string[] {
  return db
    .select({ crewId: crews.id })
    .from(crews)
    .where(sql`${countsForCrew(personId, crews.id, day)}`)
    .all()
    .map((row) => row.crewId)
}
