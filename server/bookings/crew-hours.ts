import type { Day } from '../../shared/calendar/days.ts'
import type { FirmHours } from '../../shared/calendar/ordinary-hours.ts'
import type { DbOrTx } from '../db/client.ts'
import { readCrewFacts } from '../people/crew-facts.ts'

export type CrewDay = {
  /** Ids of the people rostered and not away. */
  thereIds: string[]
  /** Names of those rostered but away. */
  away: string[]
  minutes: number
}

export type CrewHours = { on(crewId: string, day: Day): CrewDay }

/**
 * Who of each crew is there on each day of a span, and the minutes that makes: a few queries, however many
 * crews and days. One crew on one day is `rosterOf`; the two agree.
 */
export function readCrewHours(
  db: DbOrTx,
  span: { from: Day; to: Day },
  firm: FirmHours,
): CrewHours {
  const facts = readCrewFacts(db, span, firm)
  return {
    on(crewId, day) {
      const { there, away, minutes } = facts.on(crewId, day)
      return {
        thereIds: there.map((person) => person.id),
        away: away.map((person) => person.name),
        minutes,
      }
    },
  }
}
