import { type SQL, type SQLWrapper, sql } from 'drizzle-orm'

/**
 * Whether a person counts for a crew on a day, as a condition: the crew that has borrowed the person that
 * day, else the one whose member the person is. `readCrewFacts` says the same over a span.
 */
export function countsForCrew(
  personId: string | SQLWrapper,
  crewId: string | SQLWrapper,
  day: string | SQLWrapper,
): SQL {
  return sql`coalesce(
    (select cl.crew_id = ${crewId} from crew_loans cl where cl.person_id = ${personId} and cl.day = ${day}),
    exists (select 1 from crew_members cm
      where cm.crew_id = ${crewId} and cm.person_id = ${personId}
        and cm.starts_on <= ${day} and (cm.ends_on is null or cm.ends_on >= ${day})))`
}
