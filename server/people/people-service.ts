import { and, eq, ne, sql } from 'drizzle-orm'
import type { z } from 'zod'
import type {
  createPersonSchema,
  editPersonSchema,
  Person,
  PersonDetail,
  personHoursSchema,
} from '../../shared/people/people-schemas.ts'
import type { CurrentUser } from '../auth/current-user.ts'
import { dropPasswordLinks } from '../auth/password-links.ts'
import type { DbOrTx } from '../db/client.ts'
import { people } from '../db/tables/people-tables.ts'
import { readFirm } from '../firm/firm-store.ts'
import { AppError, invalidField, notFound, staleVersion } from '../http/app-error.ts'
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
import { moveToCrew } from './crew-moves.ts'
import { readPersonDetail } from './people-store.ts'
import { invitationKeys, readSignInLinks } from './sign-in-links.ts'

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
    key: `${invitationKeys.from}${newId()}`,
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

/** Own ordinary hours of the week; null: the firm's. */
export function setHours(
  deps: PeopleDeps,
  user: CurrentUser,
  id: string,
  { version, weekHours }: z.output<typeof personHoursSchema>,
): PersonDetail {
  changePeople(deps, user, { action: 'hours changed', entityId: id }, (tx) => {
    const row = requirePersonRow(tx, id)
    if (row.version !== version) throw staleVersion(personView(deps, id))
    tx.update(people)
      .set({ weekHours, version: version + 1 })
      .where(eq(people.id, id))
      .run()
  })
  return personDetail(deps, id)
}

export function personDetail(deps: PeopleDeps, id: string): PersonDetail {
  const at = { id, today: firmToday(deps), now: deps.clock.now(), firm: readFirm(deps.db) }
  const detail = readPersonDetail(deps.db, at)
  if (!detail) throw notFound('That person')
  return detail
}

/** Sends a link once more; one on its way already is enough. */
export function inviteAgain(deps: PeopleDeps, user: CurrentUser, id: string): void {
  const now = deps.clock.now()
  const change = { action: 'link sent again', entityId: id, hoursStay: true }
  changePeople(deps, user, change, (tx) => {
    const row = requirePersonRow(tx, id)
    if (!row.active) throw invalidField('active', 'This person has no access. Give it back first.')
    if (readSignInLinks(tx, now)(id).state === 'waiting')
      throw new AppError('conflict', 'A link is on its way already. Messages says how it stands.')
    invite(tx, row, now)
  })
}
