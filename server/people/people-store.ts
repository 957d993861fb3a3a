import { and, asc, desc, eq, gte, isNull, or } from 'drizzle-orm'
import { type Day, dayPlus, isoWeekday } from '../../shared/calendar/days.ts'
import { type FirmHours, firmHoursOn } from '../../shared/calendar/ordinary-hours.ts'
import { groupBy } from '../../shared/collections/group-by.ts'
import type { CrewPeople, Person, PersonDetail } from '../../shared/people/people-schemas.ts'
import type { DbOrTx } from '../db/client.ts'
import { crewLoans, crewMembers, leave, people } from '../db/tables/people-tables.ts'
import { readSignInLinks } from './sign-in-links.ts'
import { readTickets } from './ticket-store.ts'

type Membership = typeof crewMembers.$inferSelect

function crewFrom(memberships: readonly Membership[], today: Day) {
  const now = memberships.find(
    (m) => m.startsOn <= today && (m.endsOn === null || m.endsOn >= today),
  )
  const next = memberships.find((m) => m.startsOn > today)
  const leaving = now?.endsOn && !next ? { crewId: null, from: dayPlus(now.endsOn, 1) } : null
  return {
    crewId: now?.crewId ?? null,
    nextMove: next ? { crewId: next.crewId, from: next.startsOn } : leaving,
  }
}

/** Everybody, by name; the same few queries whatever their number. */
export function listPeople(db: DbOrTx, today: Day, now: Date): Person[] {
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
    .orderBy(asc(leave.startsOn), asc(leave.id))
    .all()
  const lent = db.select().from(crewLoans).where(eq(crewLoans.day, today)).all()
  const membershipsOf = groupBy(memberships, (row) => row.personId)
  const leavesOf = groupBy(leaves, (row) => row.personId)
  const ticketsOf = groupBy(readTickets(db), (row) => row.personId)
  const lentTo = new Map(lent.map((row) => [row.personId, row.crewId]))
  const linkOf = readSignInLinks(db, now)
  return db
    .select()
    .from(people)
    .orderBy(asc(people.name))
    .all()
    .map((row) => ({
      id: row.id,
      name: row.name,
      email: row.email,
      phone: row.phone,
      role: row.role,
      active: row.active,
      version: row.version,
      invited: row.passwordHash === null,
      link: linkOf(row.id),
      ...crewFrom(membershipsOf.get(row.id) ?? [], today),
      lentToId: lentTo.get(row.id) ?? null,
      leave: leavesOf.get(row.id) ?? [],
      tickets: (ticketsOf.get(row.id) ?? []).map((found) => found.ticket),
    }))
}

/** What the office sees of one person; null when there is none. */
export function readPersonDetail(
  db: DbOrTx,
  { id, today, now, firm }: { id: string; today: Day; now: Date; firm: FirmHours },
): PersonDetail | null {
  const person = listPeople(db, today, now).find((one) => one.id === id)
  const row = db.select({ weekHours: people.weekHours }).from(people).where(eq(people.id, id)).get()
  if (!person || !row) return null
  const memberships = db
    .select()
    .from(crewMembers)
    .where(eq(crewMembers.personId, id))
    .orderBy(desc(crewMembers.startsOn))
    .all()
  const loans = db
    .select()
    .from(crewLoans)
    .where(and(eq(crewLoans.personId, id), gte(crewLoans.day, today)))
    .orderBy(asc(crewLoans.day))
    .all()
  return { ...person, ...row, firmWeekHours: firmWeekHours(firm, today), memberships, loans }
}

/** Monday to Sunday; none on a weekday the firm does not work. */
function firmWeekHours(firm: FirmHours, today: Day): number[] {
  const monday = dayPlus(today, 1 - isoWeekday(today))
  return [0, 1, 2, 3, 4, 5, 6].map((ahead) =>
    firm.workingWeekdays.includes(ahead + 1) ? firmHoursOn(firm, dayPlus(monday, ahead)) : 0,
  )
}

/** Who is, will be and was in a crew, and whom it borrows from `today` on. */
export function readCrewPeople(db: DbOrTx, crewId: string, today: Day): CrewPeople {
  const members = db
    .select({
      id: crewMembers.id,
      personId: people.id,
      name: people.name,
      role: people.role,
      startsOn: crewMembers.startsOn,
      endsOn: crewMembers.endsOn,
    })
    .from(crewMembers)
    .innerJoin(people, eq(people.id, crewMembers.personId))
    .where(eq(crewMembers.crewId, crewId))
    .orderBy(desc(crewMembers.startsOn), asc(people.name))
    .all()
  const loans = db
    .select({
      id: crewLoans.id,
      personId: people.id,
      name: people.name,
      day: crewLoans.day,
      note: crewLoans.note,
    })
    .from(crewLoans)
    .innerJoin(people, eq(people.id, crewLoans.personId))
    .where(and(eq(crewLoans.crewId, crewId), gte(crewLoans.day, today)))
    .orderBy(asc(crewLoans.day), asc(people.name))
    .all()
  return { members, loans }
}
