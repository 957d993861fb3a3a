import { and, asc, eq, type SQL } from 'drizzle-orm'
import type { Ticket } from '../../shared/people/ticket-schemas.ts'
import type { DbOrTx } from '../db/client.ts'
import { ticketPhotos, tickets } from '../db/tables/people-tables.ts'

export type OwnedTicket = { personId: string; ticket: Ticket }

/** Tickets with when their photo was added, never the photo; by what they are for, the newest first. */
export function readTickets(db: DbOrTx, whose?: SQL): OwnedTicket[] {
  return db
    .select({ ticket: tickets, addedAt: ticketPhotos.addedAt })
    .from(tickets)
    .leftJoin(ticketPhotos, eq(ticketPhotos.ticketId, tickets.id))
    .where(whose)
    .orderBy(asc(tickets.kind), asc(tickets.name), asc(tickets.expiresOn), asc(tickets.id))
    .all()
    .map(({ ticket: { personId, ...ticket }, addedAt }) => ({
      personId,
      ticket: { ...ticket, photoAt: addedAt?.toISOString() ?? null },
    }))
}

export const ticketsOf = (personId: string): SQL => eq(tickets.personId, personId)

type Owned = { personId: string; ticketId: string }

/** A ticket and whose it is, in one WHERE. */
export const ownedTicket = ({ personId, ticketId }: Owned): SQL | undefined =>
  and(eq(tickets.id, ticketId), eq(tickets.personId, personId))

export function readTicket(db: DbOrTx, owned: Owned): Ticket | null {
  return readTickets(db, ownedTicket(owned))[0]?.ticket ?? null
}

export type CardPhoto = { contentType: string; bytes: Buffer }

/** The photo of a ticket's card; null when there is none, or the ticket is somebody else's. */
export function readTicketPhoto(db: DbOrTx, owned: Owned): CardPhoto | null {
  const row = db
    .select({ contentType: ticketPhotos.contentType, bytes: ticketPhotos.bytes })
    .from(ticketPhotos)
    .innerJoin(tickets, eq(tickets.id, ticketPhotos.ticketId))
    .where(ownedTicket(owned))
    .get()
  return row ?? null
}
