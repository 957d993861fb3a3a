import { groupBy } from '../collections/group-by.ts'
import type { ListedClash } from './clash-list-schemas.ts'
import type { BookingClash } from './clash-schemas.ts'

/** One line for the same thing said of several days of a booking; by first day, the worse first. */
export function groupedClashes(found: readonly BookingClash[]): ListedClash[] {
  const same = groupBy(found, (one) =>
    [one.bookingId, one.code, one.weight, one.text, one.wayOut].join('\n'),
  )
  const listed = [...same.values()].flatMap((ones): ListedClash[] => {
    const [first] = ones
    if (!first) return []
    const { bookingId, code, weight, text, wayOut } = first
    const days = ones.map((one) => one.day).sort()
    return [{ bookingId, code, weight, days, text, wayOut }]
  })
  const place = ({ weight, days }: ListedClash): string =>
    `${days[0]} ${weight === 'clash' ? 0 : 1}`
  return listed.sort((a, b) => (place(a) < place(b) ? -1 : place(a) > place(b) ? 1 : 0))
}

/** Of one booking: all that must be settled before what may stand. */
export function worstFirst(listed: readonly ListedClash[]): ListedClash[] {
  return [...listed].sort((a, b) => Number(b.weight === 'clash') - Number(a.weight === 'clash'))
}
