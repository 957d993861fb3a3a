import { eq } from 'drizzle-orm'
import { localDayOf } from '../../shared/calendar/local-time.ts'
import type { Person } from '../../shared/people/people-schemas.ts'
import type { CurrentUser } from '../auth/current-user.ts'
import type { Db, DbOrTx } from '../db/client.ts'
import { crews, people } from '../db/tables/people-tables.ts'
import type { EventHub } from '../events/event-hub.ts'
import { readFirm } from '../firm/firm-store.ts'
import { invalidField, notFound } from '../http/app-error.ts'
import { writeAudit } from '../lib/audit.ts'
import type { Clock } from '../lib/clock.ts'
import { listPeople } from './people-store.ts'

export type PeopleDeps = {
  db: Db
  clock: Clock
  events: EventHub
  /** Who is in a crew decides how much a day holds. */
  replanUpcoming: (tx: DbOrTx, now: Date) => void
}

export function firmToday({ db, clock }: Pick<PeopleDeps, 'db' | 'clock'>): string {
  return localDayOf(clock.now(), readFirm(db).timeZone)
}

/**
 * One change: its rows, its audit line and, where hours change, the plans, all or nothing. `hoursStay`
 * says that it leaves everybody's hours as they are.
 */
export function changePeople(
  deps: PeopleDeps,
  user: CurrentUser,
  { action, entityId, hoursStay }: { action: string; entityId: string; hoursStay?: boolean },
  work: (tx: DbOrTx) => void,
): void {
  const now = deps.clock.now()
  deps.db.transaction((tx) => {
    work(tx)
    writeAudit(tx, { at: now, personId: user.id, action, entity: 'people', entityId })
    if (!hoursStay) deps.replanUpcoming(tx, now)
  })
  deps.events.publish({ topic: 'people' })
}

export function requireCrew(tx: DbOrTx, crewId: string | null): void {
  if (crewId === null) return
  const crew = tx.select({ active: crews.active }).from(crews).where(eq(crews.id, crewId)).get()
  if (!crew?.active) throw invalidField('crewId', 'That crew is not in use. Choose another.')
}

export function requirePersonRow(tx: DbOrTx, id: string): typeof people.$inferSelect {
  const row = tx.select().from(people).where(eq(people.id, id)).get()
  if (!row) throw notFound('That person')
  return row
}

export function personView(deps: PeopleDeps, id: string): Person {
  const person = listPeople(deps.db, firmToday(deps), deps.clock.now()).find((p) => p.id === id)
  if (!person) throw notFound('That person')
  return person
}
