import { and, eq, gte, isNull, lte, or } from 'drizzle-orm'
import type { Day } from '../../shared/calendar/days.ts'
import type { DbOrTx } from '../db/client.ts'
import { crewMembers, leave, people } from '../db/tables/people-tables.ts'

export type CrewDay = {
  /** Ids of the people rostered and not away. */
  thereIds: string[]
  /** Names of those rostered but away. */
  away: string[]
  minutes: number
}

export type CrewHours = { on(crewId: string, day: Day): CrewDay }

/**
 * Who of each crew is there on each day of a span, and the minutes that makes: two queries, however many
 * crews and days. One crew on one day is `rosterOf`; the two agree.
 */
export function readCrewHours(
  db: DbOrTx,
  span: { from: Day; to: Day },
  firm: { hoursPerDay: number },
): CrewHours {
  const members = db
    .select({
      crewId: crewMembers.crewId,
      personId: people.id,
      name: people.name,
      startsOn: crewMembers.startsOn,
      endsOn: crewMembers.endsOn,
    })
    .from(crewMembers)
    .innerJoin(people, and(eq(people.id, crewMembers.personId), eq(people.active, true)))
    .where(
      and(
        lte(crewMembers.startsOn, span.to),
        or(isNull(crewMembers.endsOn), gte(crewMembers.endsOn, span.from)),
      ),
    )
    .orderBy(people.name)
    .all()
  const leaves = db
    .select()
    .from(leave)
    .where(and(lte(leave.startsOn, span.to), gte(leave.endsOn, span.from)))
    .all()
  const isAway = (personId: string, day: Day): boolean =>
    leaves.some((l) => l.personId === personId && l.startsOn <= day && l.endsOn >= day)
  return {
    on(crewId, day) {
      const rostered = new Map(
        members
          .filter((m) => m.crewId === crewId && m.startsOn <= day && (m.endsOn ?? day) >= day)
          .map((m) => [m.personId, m.name]),
      )
      const thereIds = [...rostered.keys()].filter((id) => !isAway(id, day))
      const away = [...rostered].filter(([id]) => isAway(id, day)).map(([, name]) => name)
      return { thereIds, away, minutes: Math.round(thereIds.length * firm.hoursPerDay * 60) }
    },
  }
}
