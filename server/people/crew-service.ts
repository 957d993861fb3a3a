import { and, asc, eq, gte, inArray, isNull, ne, or } from 'drizzle-orm'
import type { z } from 'zod'
import type { Day } from '../../shared/calendar/days.ts'
import { permissionScope } from '../../shared/auth/permissions.ts'
import type {
  Crew,
  CrewPeople,
  crewInputSchema,
  moveCrewSchema,
  Person,
} from '../../shared/people/people-schemas.ts'
import type { CurrentUser } from '../auth/current-user.ts'
import type { DbOrTx } from '../db/client.ts'
import { bookingDays, bookings } from '../db/tables/booking-tables.ts'
import { crewLoans, crewMembers, crews } from '../db/tables/people-tables.ts'
import { invalidField, notFound } from '../http/app-error.ts'
import { newId } from '../lib/ids.ts'
import {
  changePeople,
  firmToday,
  type PeopleDeps,
  personView,
  requireCrew,
  requirePersonRow,
} from './people-change.ts'
import { moveToCrew } from './crew-moves.ts'
import { readCrewPeople } from './people-store.ts'
import { crewIdsOf } from './roster.ts'

type CrewInput = z.output<typeof crewInputSchema>

export function movePerson(
  deps: PeopleDeps,
  user: CurrentUser,
  id: string,
  { crewId, from }: z.output<typeof moveCrewSchema>,
): Person {
  changePeople(deps, user, { action: 'crew changed', entityId: id }, (tx) => {
    requirePersonRow(tx, id)
    requireCrew(tx, crewId)
    if (from < firmToday(deps)) {
      throw invalidField('from', 'A move starts today or later: days past stay as they were.')
    }
    moveToCrew(tx, id, crewId, from)
  })
  return personView(deps, id)
}

/** The office sees every crew, a leading hand the own one. */
export function listCrews(deps: PeopleDeps, user: CurrentUser): Crew[] {
  const all = permissionScope(user.role, 'crew:read') === 'all'
  const own = all ? null : crewIdsOf(deps.db, user.id, firmToday(deps))
  return deps.db
    .select()
    .from(crews)
    .where(own ? inArray(crews.id, own) : undefined)
    .orderBy(asc(crews.letter))
    .all()
}

/** Who is, will be and was in a crew. */
export function crewPeople(deps: PeopleDeps, id: string): CrewPeople {
  const crew = deps.db.select({ id: crews.id }).from(crews).where(eq(crews.id, id)).get()
  if (!crew) throw notFound('That crew')
  return readCrewPeople(deps.db, id, firmToday(deps))
}

function refuseTakenLetter(tx: DbOrTx, letter: string, exceptId: string): void {
  const taken = tx
    .select({ id: crews.id })
    .from(crews)
    .where(and(eq(crews.letter, letter), ne(crews.id, exceptId)))
    .get()
  if (taken) throw invalidField('letter', 'Another crew has this letter.')
}

export function addCrew(deps: PeopleDeps, user: CurrentUser, input: CrewInput): void {
  const id = newId()
  changePeople(deps, user, { action: 'crew added', entityId: id }, (tx) => {
    refuseTakenLetter(tx, input.letter, id)
    tx.insert(crews)
      .values({ id, ...input })
      .run()
  })
}

/** A crew is stood down once nobody is in it and nothing is booked for it from today on. */
function refuseInUse(tx: DbOrTx, crewId: string, today: Day): void {
  const stays = or(isNull(crewMembers.endsOn), gte(crewMembers.endsOn, today))
  const member = tx
    .select({ id: crewMembers.id })
    .from(crewMembers)
    .where(and(eq(crewMembers.crewId, crewId), stays))
    .get()
  if (member) throw invalidField('active', 'People are in it still. Move them first.')
  const lent = tx
    .select({ id: crewLoans.id })
    .from(crewLoans)
    .where(and(eq(crewLoans.crewId, crewId), gte(crewLoans.day, today)))
    .get()
  if (lent) throw invalidField('active', 'It borrows somebody still. Take that day back first.')
  const booked = tx
    .select({ id: bookingDays.id })
    .from(bookingDays)
    .innerJoin(bookings, eq(bookings.id, bookingDays.bookingId))
    .where(
      and(eq(bookings.crewId, crewId), isNull(bookings.cancelledAt), gte(bookingDays.day, today)),
    )
    .get()
  if (booked) throw invalidField('active', 'It has days booked still. Give them to another crew.')
}

export function editCrew(deps: PeopleDeps, user: CurrentUser, id: string, input: CrewInput): void {
  changePeople(deps, user, { action: 'crew changed', entityId: id }, (tx) => {
    refuseTakenLetter(tx, input.letter, id)
    if (!input.active) refuseInUse(tx, id, firmToday(deps))
    if (tx.update(crews).set(input).where(eq(crews.id, id)).run().changes === 0)
      throw notFound('That crew')
  })
}
