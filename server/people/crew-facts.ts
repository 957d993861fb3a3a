import { and, asc, eq, gte, isNull, lte, or } from 'drizzle-orm'
import type { Role } from '../../shared/auth/roles.ts'
import type { Day } from '../../shared/calendar/days.ts'
import { type FirmHours, ordinaryMinutes } from '../../shared/calendar/ordinary-hours.ts'
import { groupBy } from '../../shared/collections/group-by.ts'
import { isAwayOn, type LeaveSpan } from '../../shared/people/leave-days.ts'
import type { LeaveKind } from '../../shared/people/leave-kinds.ts'
import type { TicketKind } from '../../shared/people/ticket-kinds.ts'
import type { DbOrTx } from '../db/client.ts'
import { crewLoans, crewMembers, leave, people, tickets } from '../db/tables/people-tables.ts'
import { readFirm } from '../firm/firm-store.ts'

export type CrewPerson = { id: string; name: string; role: Role }
export type AwayPerson = { id: string; name: string; kind: LeaveKind }
export type LentPerson = { id: string; name: string; toCrewId: string }
export type TicketFact = { kind: TicketKind; expiresOn: Day | null }

export type CrewDayFacts = {
  /** Who counts for the crew that day and is not away: its members and those borrowed, by name. */
  there: CrewPerson[]
  /** Who would count for the crew but is away. */
  away: AwayPerson[]
  /** The crew's own people whom another crew has borrowed that day. */
  lent: LentPerson[]
  /** Ordinary minutes of those there. */
  minutes: number
}

export type CrewFacts = {
  /** For a day of the span that was asked for. */
  on(crewId: string, day: Day): CrewDayFacts
  ticketsOf(personId: string): TicketFact[]
}

type Span = { from: Day; to: Day }
type PersonRow = CrewPerson & { weekHours: number[] | null }
type LeaveRow = LeaveSpan & { personId: string; kind: LeaveKind }

/**
 * Who of each crew is there on each day of a span, and which tickets they hold: five queries, however many
 * crews and days. The same rule as a WHERE is `countsForCrew`; a test holds the two together.
 */
export function readCrewFacts(db: DbOrTx, span: Span, firm: FirmHours = readFirm(db)): CrewFacts {
  const everybody = readActivePeople(db)
  const membersOf = groupBy(readMembers(db, span), (row) => row.crewId)
  const loans = readLoans(db, span)
  const loansInto = groupBy(loans, (row) => `${row.crewId} ${row.day}`)
  const lentTo = new Map(loans.map((row) => [`${row.personId} ${row.day}`, row.crewId]))
  const leavesOf = groupBy(readLeaves(db, span), (row) => row.personId)
  let ticketsByPerson: ReturnType<typeof readTickets> | null = null
  const known = new Map<string, CrewDayFacts>()

  const inName = (ids: Iterable<string>): PersonRow[] =>
    [...new Set(ids)]
      .flatMap((id) => everybody.get(id) ?? [])
      .sort((a, b) => (a.name < b.name ? -1 : a.name > b.name ? 1 : 0))

  function work(crewId: string, day: Day): CrewDayFacts {
    const members = (membersOf.get(crewId) ?? [])
      .filter((row) => row.startsOn <= day && (row.endsOn ?? day) >= day)
      .map((row) => row.personId)
    const stay = members.filter((id) => !lentTo.has(`${id} ${day}`))
    const borrowed = (loansInto.get(`${crewId} ${day}`) ?? []).map((row) => row.personId)
    const facts: CrewDayFacts = { there: [], away: [], lent: [], minutes: 0 }
    for (const { id, name, role, weekHours } of inName([...stay, ...borrowed])) {
      const gone = (leavesOf.get(id) ?? []).find((row) => isAwayOn(row, day))
      if (gone) {
        facts.away.push({ id, name, kind: gone.kind })
      } else {
        facts.there.push({ id, name, role })
        facts.minutes += ordinaryMinutes(firm, { weekHours }, day)
      }
    }
    for (const { id, name } of inName(members)) {
      const toCrewId = lentTo.get(`${id} ${day}`)
      if (toCrewId !== undefined && toCrewId !== crewId) facts.lent.push({ id, name, toCrewId })
    }
    return facts
  }

  return {
    on(crewId, day) {
      const key = `${crewId} ${day}`
      const facts = known.get(key) ?? work(crewId, day)
      known.set(key, facts)
      return facts
    },
    ticketsOf(personId) {
      ticketsByPerson ??= readTickets(db)
      return ticketsByPerson.get(personId) ?? []
    },
  }
}

function readActivePeople(db: DbOrTx): Map<string, PersonRow> {
  const rows = db
    .select({ id: people.id, name: people.name, role: people.role, weekHours: people.weekHours })
    .from(people)
    .where(eq(people.active, true))
    .all()
  return new Map(rows.map((row) => [row.id, row]))
}

function readMembers(db: DbOrTx, { from, to }: Span) {
  return db
    .select({
      crewId: crewMembers.crewId,
      personId: crewMembers.personId,
      startsOn: crewMembers.startsOn,
      endsOn: crewMembers.endsOn,
    })
    .from(crewMembers)
    .where(
      and(
        lte(crewMembers.startsOn, to),
        or(isNull(crewMembers.endsOn), gte(crewMembers.endsOn, from)),
      ),
    )
    .all()
}

function readLoans(db: DbOrTx, { from, to }: Span) {
  return db
    .select({ crewId: crewLoans.crewId, personId: crewLoans.personId, day: crewLoans.day })
    .from(crewLoans)
    .where(and(gte(crewLoans.day, from), lte(crewLoans.day, to)))
    .all()
}

function readLeaves(db: DbOrTx, { from, to }: Span): LeaveRow[] {
  return db
    .select({
      personId: leave.personId,
      startsOn: leave.startsOn,
      endsOn: leave.endsOn,
      weekdays: leave.weekdays,
      kind: leave.kind,
    })
    .from(leave)
    .where(and(lte(leave.startsOn, to), gte(leave.endsOn, from)))
    .orderBy(asc(leave.startsOn), asc(leave.id))
    .all()
}

/** Read when first asked for: hours and rosters need none. */
function readTickets(db: DbOrTx): Map<string, TicketFact[]> {
  const rows = db
    .select({ personId: tickets.personId, kind: tickets.kind, expiresOn: tickets.expiresOn })
    .from(tickets)
    .orderBy(asc(tickets.kind), asc(tickets.expiresOn))
    .all()
  const byPerson = new Map<string, TicketFact[]>()
  for (const { personId, ...ticket } of rows) {
    byPerson.set(personId, [...(byPerson.get(personId) ?? []), ticket])
  }
  return byPerson
}
