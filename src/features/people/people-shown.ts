import { isAwayOn } from '../../../shared/people/leave-days.ts'
import type { Person } from '../../../shared/people/people-schemas.ts'
import { ticketsToRenew } from '../../../shared/people/ticket-words.ts'

/** Which of all people a list shows; the key stands in the address. */
export const shownKinds = {
  all: 'Everybody',
  tickets: 'Tickets to renew',
  away: 'Away today',
  link: 'Not signed in yet',
  'no-access': 'No access',
} as const
export type ShownKind = keyof typeof shownKinds

export function isShownKind(text: string | null): text is ShownKind {
  return text !== null && Object.hasOwn(shownKinds, text)
}

export function isAwayToday(person: Person, today: string): boolean {
  return person.leave.some((leave) => isAwayOn(leave, today))
}

export function isShown(person: Person, kind: ShownKind, today: string): boolean {
  switch (kind) {
    case 'all':
      return true
    case 'tickets':
      return person.active && ticketsToRenew(person.tickets, today).length > 0
    case 'away':
      return person.active && isAwayToday(person, today)
    case 'link':
      return person.active && person.invited
    case 'no-access':
      return !person.active
  }
}

/** Who is there with a crew today: its own less those lent out, those borrowed, nobody away. */
export function thereToday(people: readonly Person[], crewId: string, today: string): Person[] {
  return people.filter(
    (person) =>
      person.active && (person.lentToId ?? person.crewId) === crewId && !isAwayToday(person, today),
  )
}
