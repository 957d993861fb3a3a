import { and, eq, ne, sql } from 'drizzle-orm'
import type { z } from 'zod'
import type {
  createPersonSchema,
  editPersonSchema,
  Person,
} from '../../shared/people/people-schemas.ts'
import type { CurrentUser } from '../auth/current-user.ts'
import { dropPasswordLinks } from '../auth/password-links.ts'
import type { DbOrTx } from '../db/client.ts'
import { people } from '../db/tables/people-tables.ts'
import { invalidField, staleVersion } from '../http/app-error.ts'
import { newId } from '../lib/ids.ts'
import { enqueueMail } from '../mail/outbox-store.ts'
import {
  changePeople,
  firmToday,
  type PeopleDeps,
  personView,
  requireCrew,
  requirePersonRow,
} from './people-change.ts'
import { moveToCrew } from './people-store.ts'

function refuseTakenEmail(tx: DbOrTx, email: string, exceptId: string): void {
  const taken = tx
    .select({ id: people.id })
    .from(people)
    .where(and(eq(people.email, email), ne(people.id, exceptId)))
    .get()
  if (taken) throw invalidField('email', 'Somebody else has this e-mail address.')
}

function invite(tx: DbOrTx, person: { id: string; name: string; email: string }, now: Date): void {
  enqueueMail(tx, {
    key: `invitation:${newId()}`,
    kind: 'invitation',
    personId: person.id,
    toName: person.name,
    toEmail: person.email,
    payload: {},
    now,
  })
}

/** Makes an account without a password and sends the link to choose one. */
export function addPerson(
  deps: PeopleDeps,
  user: CurrentUser,
  { crewId, ...fields }: z.output<typeof createPersonSchema>,
): Person {
  const id = newId()
  const now = deps.clock.now()
  changePeople(deps, user, { action: 'person added', entityId: id }, (tx) => {
    refuseTakenEmail(tx, fields.email, id)
    requireCrew(tx, crewId)
    tx.insert(people)
      .values({ id, ...fields, passwordHash: null, createdAt: now })
      .run()
    if (crewId) moveToCrew(tx, id, crewId, firmToday(deps))
    invite(tx, { id, ...fields }, now)
  })
  return personView(deps, id)
}

/** A change of role or access signs the person out everywhere. */
export function editPerson(
  deps: PeopleDeps,
  user: CurrentUser,
  id: string,
  { version, ...fields }: z.output<typeof editPersonSchema>,
): Person {
  changePeople(deps, user, { action: 'person changed', entityId: id }, (tx) => {
    const row = requirePersonRow(tx, id)
    if (row.version !== version) throw staleVersion(personView(deps, id))
    refuseTakenEmail(tx, fields.email, id)
    const accessChanged = row.active !== fields.active || row.role !== fields.role
    if (row.id === user.id && accessChanged) {
      throw invalidField(
        'role',
        'You cannot take away your own access. Ask somebody else in the office.',
      )
    }
    if (accessChanged || row.email !== fields.email) dropPasswordLinks(tx, id)
    tx.update(people)
      .set({
        ...fields,
        version: version + 1,
        ...(accessChanged ? { sessionEpoch: sql`${people.sessionEpoch} + 1` } : {}),
      })
      .where(eq(people.id, id))
      .run()
  })
  return personView(deps, id)
}

export function inviteAgain(deps: PeopleDeps, user: CurrentUser, id: string): void {
  changePeople(deps, user, { action: 'link sent again', entityId: id }, (tx) => {
    const row = requirePersonRow(tx, id)
    if (!row.active) throw invalidField('active', 'This person has no access. Give it back first.')
    invite(tx, row, deps.clock.now())
  })
}
