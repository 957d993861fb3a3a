import type { Day } from '../calendar/days.ts'
import type { TicketKind } from '../people/ticket-kinds.ts'
import type { ClashPerson, ClashTicket } from './clash-facts.ts'

/** Common practice, no source: without these two nobody goes onto the frame. */
const neededOnEveryRoof: readonly TicketKind[] = ['working-at-heights', 'construction-induction']

export function holdsOn(ticket: ClashTicket, day: Day): boolean {
  return ticket.expiresOn === null || ticket.expiresOn >= day
}

/** Whether a person holds a kind of ticket on a day. */
export function isTicketed(tickets: readonly ClashTicket[], kind: TicketKind, day: Day): boolean {
  return tickets.some((ticket) => ticket.kind === kind && holdsOn(ticket, day))
}

/** Somebody an apprentice may work beside: a leading hand, or who holds a trade licence that day. */
export function isTradesperson(
  person: ClashPerson,
  tickets: readonly ClashTicket[],
  day: Day,
): boolean {
  return person.role === 'leading-hand' || isTicketed(tickets, 'trade-licence', day)
}

export type LapsedTicket = { kind: TicketKind; expiresOn: Day; isNeeded: boolean }

/**
 * Kinds of ticket a person holds none of any more on a day, with the last day one held. A renewed ticket
 * makes its older one forgotten; those kept as 'other' are each for something else.
 */
export function lapsedTickets(tickets: readonly ClashTicket[], day: Day): LapsedTicket[] {
  const lapsed = new Map<string, LapsedTicket>()
  for (const ticket of tickets) {
    const { kind, expiresOn } = ticket
    if (expiresOn === null || holdsOn(ticket, day)) continue
    if (kind !== 'other' && isTicketed(tickets, kind, day)) continue
    const key = kind === 'other' ? `other ${expiresOn}` : kind
    const known = lapsed.get(key)
    if (known && known.expiresOn >= expiresOn) continue
    lapsed.set(key, { kind, expiresOn, isNeeded: neededOnEveryRoof.includes(kind) })
  }
  return [...lapsed.values()]
}
