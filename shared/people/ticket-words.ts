import { type Day, dayPlus, formatDayWithYear } from '../calendar/days.ts'
import type { TicketKind } from './ticket-kinds.ts'

export const ticketKindNames: Record<TicketKind, string> = {
  'working-at-heights': 'Working at heights',
  'construction-induction': 'Construction induction',
  'first-aid': 'First aid',
  'elevated-platform': 'Elevated work platform',
  'driver-licence': 'Driver licence',
  'trade-licence': 'Trade licence',
  other: 'Other ticket',
}

/** What a ticket is called on screen: its kind, with its own name where it has one. */
export function ticketTitle({ kind, name }: { kind: TicketKind; name: string }): string {
  if (name === '') return ticketKindNames[kind]
  return kind === 'other' ? name : `${ticketKindNames[kind]}, ${name}`
}

/** How long before its last day a ticket is said to lapse soon: common practice, no source. */
export const lapsingDays = 30

export type TicketState = 'lapsed' | 'lapsing' | 'holds'

/** `expiresOn` is the last day it holds; null: it does not lapse. */
export function ticketState({ expiresOn }: { expiresOn: Day | null }, today: Day): TicketState {
  if (expiresOn === null) return 'holds'
  if (expiresOn < today) return 'lapsed'
  return expiresOn <= dayPlus(today, lapsingDays) ? 'lapsing' : 'holds'
}

type HeldTicket = { kind: TicketKind; name: string; expiresOn: Day | null }

/**
 * Tickets lapsed, or lapsing soon, that no other ticket for the same thing outlasts: a renewed one makes
 * its older one forgotten.
 */
export function ticketsToRenew<Held extends HeldTicket>(
  tickets: readonly Held[],
  today: Day,
): Held[] {
  const lasts = (ticket: HeldTicket) => ticket.expiresOn ?? '9999'
  const forSame = (a: HeldTicket, b: HeldTicket) =>
    a.kind === b.kind && a.name.toLowerCase() === b.name.toLowerCase()
  return tickets.filter(
    (ticket) =>
      ticketState(ticket, today) !== 'holds' &&
      !tickets.some((other) => forSame(ticket, other) && lasts(other) > lasts(ticket)),
  )
}

/** 'Lapsed after Thu 4 Dec 2025', 'Last day Thu 4 Dec 2025', 'Does not lapse'. */
export function ticketStateText(ticket: { expiresOn: Day | null }, today: Day): string {
  if (ticket.expiresOn === null) return 'Does not lapse'
  const last = formatDayWithYear(ticket.expiresOn)
  return ticketState(ticket, today) === 'lapsed' ? `Lapsed after ${last}` : `Last day ${last}`
}
