import { eq } from 'drizzle-orm'
import type { z } from 'zod'
import type {
  addTicketSchema,
  editTicketSchema,
  Ticket,
} from '../../shared/people/ticket-schemas.ts'
import type { CurrentUser } from '../auth/current-user.ts'
import type { DbOrTx } from '../db/client.ts'
import { ticketPhotos, tickets } from '../db/tables/people-tables.ts'
import { notFound, staleVersion } from '../http/app-error.ts'
import { newId } from '../lib/ids.ts'
import { cleanPhoto } from '../lib/clean-photo.ts'
import { changePeople, type PeopleDeps, requirePersonRow } from './people-change.ts'
import { ownedTicket, readTicket, readTicketPhoto, type CardPhoto } from './ticket-store.ts'

type Owned = { personId: string; ticketId: string }

/** @throws AppError 404 when there is no such ticket of that person. */
function requireTicket(db: DbOrTx, owned: Owned): Ticket {
  const ticket = readTicket(db, owned)
  if (!ticket) throw notFound('That ticket')
  return ticket
}

const changed = (action: string, { personId }: { personId: string }) => ({
  action,
  entityId: personId,
  hoursStay: true,
})

export function addTicket(
  deps: PeopleDeps,
  user: CurrentUser,
  personId: string,
  input: z.output<typeof addTicketSchema>,
): Ticket {
  const ticketId = newId()
  changePeople(deps, user, changed('ticket added', { personId }), (tx) => {
    requirePersonRow(tx, personId)
    tx.insert(tickets)
      .values({ id: ticketId, personId, ...input })
      .run()
  })
  return requireTicket(deps.db, { personId, ticketId })
}

export function editTicket(
  deps: PeopleDeps,
  user: CurrentUser,
  owned: Owned,
  { version, ...fields }: z.output<typeof editTicketSchema>,
): Ticket {
  changePeople(deps, user, changed('ticket changed', owned), (tx) => {
    const ticket = requireTicket(tx, owned)
    if (ticket.version !== version) throw staleVersion(ticket)
    tx.update(tickets)
      .set({ ...fields, version: version + 1 })
      .where(ownedTicket(owned))
      .run()
  })
  return requireTicket(deps.db, owned)
}

/** Its photo goes with it. */
export function dropTicket(deps: PeopleDeps, user: CurrentUser, owned: Owned): void {
  changePeople(deps, user, changed('ticket removed', owned), (tx) => {
    if (tx.delete(tickets).where(ownedTicket(owned)).run().changes === 0)
      throw notFound('That ticket')
  })
}

/** Takes the place of the one there was. Made clean before the transaction, which stays short. */
export async function setTicketPhoto(
  deps: PeopleDeps,
  user: CurrentUser,
  owned: Owned,
  sent: Buffer,
): Promise<Ticket> {
  requireTicket(deps.db, owned)
  const photo = await cleanPhoto(sent)
  changePeople(deps, user, changed('ticket photo added', owned), (tx) => {
    const { id: ticketId } = requireTicket(tx, owned)
    const row = { ...photo, addedAt: deps.clock.now() }
    tx.insert(ticketPhotos)
      .values({ ticketId, ...row })
      .onConflictDoUpdate({ target: ticketPhotos.ticketId, set: row })
      .run()
  })
  return requireTicket(deps.db, owned)
}

export function dropTicketPhoto(deps: PeopleDeps, user: CurrentUser, owned: Owned): Ticket {
  changePeople(deps, user, changed('ticket photo removed', owned), (tx) => {
    const { id } = requireTicket(tx, owned)
    const gone = tx.delete(ticketPhotos).where(eq(ticketPhotos.ticketId, id)).run()
    if (gone.changes === 0) throw notFound('That photo')
  })
  return requireTicket(deps.db, owned)
}

/** @throws AppError 404 when there is none, or it is not that person's. */
export function ticketPhoto(db: DbOrTx, owned: Owned): CardPhoto {
  const photo = readTicketPhoto(db, owned)
  if (!photo) throw notFound('That photo')
  return photo
}
