/** Tickets to work that the firm keeps; 'other' is called by its name. */
export const ticketKinds = [
  'working-at-heights',
  'construction-induction',
  'first-aid',
  'elevated-platform',
  'driver-licence',
  'trade-licence',
  'other',
] as const
export type TicketKind = (typeof ticketKinds)[number]
