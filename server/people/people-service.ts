import { and, asc, eq, inArray, ne, sql } from 'drizzle-orm'
import type { z } from 'zod'
import { permissionScope } from '../../shared/auth/permissions.ts'
import { localDayOf } from '../../shared/calendar/local-time.ts'
import type {
  addLeaveSchema,
  createPersonSchema,
  Crew,
  crewInputSchema,
  editPersonSchema,
  moveCrewSchema,
} from '../../shared/people/people-schemas.ts'
import type { CurrentUser } from '../auth/current-user.ts'
import type { Db, DbOrTx } from '../db/client.ts'
import { crews, leave, people } from '../db/tables/people-tables.ts'
import type { EventHub } from '../events/event-hub.ts'
import { readFirm } from '../firm/firm-store.ts'
import { invalidField, notFound, staleVersion } from '../http/app-error.ts'
import { writeAudit } from '../lib/audit.ts'
import type { Clock } from '../lib/clock.ts'
import { newId } from '../lib/ids.ts'
import { enqueueMail } from '../mail/outbox-store.ts'
import { listPeople, moveToCrew } from './people-store.ts'
import { crewIdsOf } from './roster.ts'

type Deps = {
  db: Db
  clock: Clock
  events: EventHub
  /** Who is in a crew decides how much a day holds. */
  replanUpcoming: (tx: DbOrTx, now: Date) => void
}

export type PeopleService = ReturnType<typeof createPeopleService>

export function createPeopleService(deps: Deps) {
  const { db, clock, events } = deps
  const today = () => localDayOf(clock.now(), readFirm(db).timeZone)

  /** One change: its rows, its audit line and, where hours change, the plans, all or nothing. */
  function change<T>(
    user: CurrentUser,
    action: string,
    entityId: string,
    work: (tx: DbOrTx) => T,
  ): T {
    const now = clock.now()
    const result = db.transaction((tx) => {
      const made = work(tx)
      writeAudit(tx, { at: now, personId: user.id, action, entity: 'people', entityId })
      deps.replanUpcoming(tx, now)
      return made
    })
    events.publish({ topic: 'people' })
    return result
  }

  function refuseTakenEmail(tx: DbOrTx, email: string, exceptId: string): void {
    const taken = tx
      .select({ id: people.id })
      .from(people)
      .where(and(eq(people.email, email), ne(people.id, exceptId)))
      .get()
    if (taken) throw invalidField('email', 'Somebody else has this e-mail address.')
  }

  function requireCrew(tx: DbOrTx, crewId: string | null): void {
    if (crewId && !tx.select({ id: crews.id }).from(crews).where(eq(crews.id, crewId)).get()) {
      throw invalidField('crewId', 'That crew is no longer there. Choose another.')
    }
  }

  function invite(tx: DbOrTx, person: { id: string; name: string; email: string }): void {
    enqueueMail(tx, {
      key: `invitation:${newId()}`,
      kind: 'invitation',
      personId: person.id,
      toName: person.name,
      toEmail: person.email,
      payload: {},
      now: clock.now(),
    })
  }

  function personOr404(tx: DbOrTx, id: string) {
    const row = tx.select().from(people).where(eq(people.id, id)).get()
    if (!row) throw notFound('That person')
    return row
  }

  const find = (id: string) => {
    const person = listPeople(db, today()).find((one) => one.id === id)
    if (!person) throw notFound('That person')
    return person
  }

  return {
    list: () => listPeople(db, today()),

    create(user: CurrentUser, input: z.output<typeof createPersonSchema>) {
      const id = newId()
      const { crewId, ...fields } = input
      change(user, 'person added', id, (tx) => {
        refuseTakenEmail(tx, fields.email, id)
        requireCrew(tx, crewId)
        tx.insert(people)
          .values({ id, ...fields, passwordHash: null, createdAt: clock.now() })
          .run()
        if (crewId) moveToCrew(tx, id, crewId, today())
        invite(tx, { id, ...fields })
      })
      return find(id)
    },

    edit(user: CurrentUser, id: string, input: z.output<typeof editPersonSchema>) {
      const { version, ...fields } = input
      change(user, 'person changed', id, (tx) => {
        const row = personOr404(tx, id)
        if (row.version !== version) throw staleVersion(find(id))
        refuseTakenEmail(tx, fields.email, id)
        if (row.id === user.id && (!fields.active || fields.role !== row.role)) {
          throw invalidField(
            'role',
            'You cannot take away your own access. Ask somebody else in the office.',
          )
        }
        const accessChanged = row.active !== fields.active || row.role !== fields.role
        tx.update(people)
          .set({
            ...fields,
            version: version + 1,
            ...(accessChanged ? { sessionEpoch: sql`${people.sessionEpoch} + 1` } : {}),
          })
          .where(eq(people.id, id))
          .run()
      })
      return find(id)
    },

    inviteAgain(user: CurrentUser, id: string) {
      change(user, 'link sent again', id, (tx) => {
        const row = personOr404(tx, id)
        if (!row.active)
          throw invalidField('active', 'This person has no access. Give it back first.')
        invite(tx, row)
      })
    },

    move(user: CurrentUser, id: string, input: z.output<typeof moveCrewSchema>) {
      change(user, 'crew changed', id, (tx) => {
        personOr404(tx, id)
        requireCrew(tx, input.crewId)
        if (input.from < today())
          throw invalidField('from', 'A move starts today or later: days past stay as they were.')
        moveToCrew(tx, id, input.crewId, input.from)
      })
      return find(id)
    },

    addLeave(user: CurrentUser, id: string, input: z.output<typeof addLeaveSchema>) {
      change(user, 'leave added', id, (tx) => {
        personOr404(tx, id)
        tx.insert(leave)
          .values({ id: newId(), personId: id, ...input })
          .run()
      })
      return find(id)
    },

    dropLeave(user: CurrentUser, personId: string, leaveId: string) {
      change(user, 'leave taken back', personId, (tx) => {
        const gone = tx
          .delete(leave)
          .where(and(eq(leave.id, leaveId), eq(leave.personId, personId)))
          .run()
        if (gone.changes === 0) throw notFound('That leave')
      })
      return find(personId)
    },

    crews(user: CurrentUser): Crew[] {
      const all = permissionScope(user.role, 'crew:read') === 'all'
      const own = all ? null : crewIdsOf(db, user.id, today())
      return db
        .select()
        .from(crews)
        .where(own ? inArray(crews.id, own) : undefined)
        .orderBy(asc(crews.letter))
        .all()
    },

    addCrew(user: CurrentUser, input: z.output<typeof crewInputSchema>) {
      const id = newId()
      change(user, 'crew added', id, (tx) => {
        const taken = tx
          .select({ id: crews.id })
          .from(crews)
          .where(eq(crews.letter, input.letter))
          .get()
        if (taken) throw invalidField('letter', 'Another crew has this letter.')
        tx.insert(crews)
          .values({ id, ...input })
          .run()
      })
    },

    editCrew(user: CurrentUser, id: string, input: z.output<typeof crewInputSchema>) {
      change(user, 'crew changed', id, (tx) => {
        const taken = tx
          .select({ id: crews.id })
          .from(crews)
          .where(and(eq(crews.letter, input.letter), ne(crews.id, id)))
          .get()
        if (taken) throw invalidField('letter', 'Another crew has this letter.')
        if (tx.update(crews).set(input).where(eq(crews.id, id)).run().changes === 0)
          throw notFound('That crew')
      })
    },
  }
}
