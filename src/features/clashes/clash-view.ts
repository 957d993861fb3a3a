import type { ClashList, ListedClash } from '../../../shared/clashes/clash-list-schemas.ts'
import { type ClashCode, clashCodes } from '../../../shared/clashes/clash-schemas.ts'
import { worstFirst } from '../../../shared/clashes/grouped-clashes.ts'
import { groupBy } from '../../../shared/collections/group-by.ts'

export type ClashFilter = {
  q: string
  weight: ListedClash['weight'] | null
  what: ClashCode | null
  crew: string | null
}

export type ClashBookingView = ClashList['bookings'][number] & { clashes: ListedClash[] }

function hasWords({ job }: ClashBookingView, q: string): boolean {
  const text = `${job.number} ${job.title}`.toLowerCase()
  return q
    .toLowerCase()
    .split(/\s+/)
    .every((word) => text.includes(word))
}

/** Bookings with what stands in their way, in the order of the list, as far as the filter lets them through. */
export function clashBookings(list: ClashList, filter: ClashFilter): ClashBookingView[] {
  const asked = list.clashes.filter(
    (clash) =>
      (filter.weight === null || clash.weight === filter.weight) &&
      (filter.what === null || clash.code === filter.what),
  )
  const bookings = new Map(list.bookings.map((booking) => [booking.id, booking]))
  return [...groupBy(asked, (clash) => clash.bookingId)]
    .flatMap(([id, clashes]) => {
      const booking = bookings.get(id)
      return booking ? [{ ...booking, clashes: worstFirst(clashes) }] : []
    })
    .filter(
      (booking) =>
        (filter.crew === null || booking.crew.id === filter.crew) && hasWords(booking, filter.q),
    )
}

/** What there is to choose from. */
export function clashChoices(list: ClashList) {
  const crews = new Map(list.bookings.map(({ crew }) => [crew.id, crew]))
  return {
    codes: clashCodes.filter((code) => list.clashes.some((clash) => clash.code === code)),
    crews: [...crews.values()].sort((a, b) => (a.letter < b.letter ? -1 : 1)),
  }
}

/** '2 clashes, 1 caution'. */
export function countWords(list: Pick<ClashList, 'clashes'>): string {
  const clashes = list.clashes.filter((clash) => clash.weight === 'clash').length
  const cautions = list.clashes.length - clashes
  const clashWord = clashes === 1 ? '1 clash' : `${clashes} clashes`
  return `${clashWord}, ${cautions === 1 ? '1 caution' : `${cautions} cautions`}`
}
