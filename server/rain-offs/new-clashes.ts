import type { Day } from '../../shared/calendar/days.ts'
import type { ClashBooking, ClashDay } from '../../shared/clashes/clash-facts.ts'
import type { BookingClash, Clash } from '../../shared/clashes/clash-schemas.ts'
import { findClashes } from '../../shared/clashes/find-clashes.ts'
import { groupBy } from '../../shared/collections/group-by.ts'
import type { BookingMove } from '../../shared/planning/rain-off.ts'
import { readClashFacts } from '../clashes/read-clashes.ts'
import type { DbOrTx } from '../db/client.ts'
import type { Firm } from '../firm/firm-store.ts'
import type { PlannedRainOff } from './plan-rain-off.ts'

/** The booking on its new days; nobody has been told of those. */
function afterMove(booking: ClashBooking, move: BookingMove | undefined): ClashBooking {
  if (!move) return booking
  const newest = booking.job.newestRevision
  const from = new Map([...move.moved, ...move.added].map((one) => [one.to, one.from]))
  const dayAt = (day: Day): ClashDay => {
    const stood = booking.days.find((one) => one.day === (from.get(day) ?? day))
    const kept = booking.days.find((one) => one.day === day)
    if (kept && !from.has(day)) return kept
    return { day, worked: false, revision: stood?.revision ?? newest, toldLetters: [] }
  }
  return { ...booking, days: move.daysAfter.map(dayAt) }
}

const sameClash = ({ bookingId, code, text }: BookingClash): string =>
  `${bookingId} ${code} ${text}`

/** What would stand in the way after a rain-off and does not now, by booking. */
export function newClashes(
  db: DbOrTx,
  input: { plan: PlannedRainOff; firm: Firm; today: Day },
): Map<string, Clash[]> {
  const { plan, firm, today } = input
  const days = plan.moves.flatMap((move) => [...move.daysBefore, ...move.daysAfter]).sort()
  const [from, to] = [days[0], days[days.length - 1]]
  if (from === undefined || to === undefined) return new Map()
  const facts = readClashFacts(db, { from, to }, { firm, today, reader: 'office' })
  const moveOf = new Map(plan.moves.map((move) => [move.bookingId, move]))
  const before = new Set(findClashes(facts).map(sameClash))
  const moved = facts.bookings.map((booking) => afterMove(booking, moveOf.get(booking.id)))
  const found = findClashes({ ...facts, bookings: moved })
    .filter((clash) => moveOf.has(clash.bookingId) && !before.has(sameClash(clash)))
    // One that holds for several days is said once, for the first of them.
    .filter((clash, i, all) => all.findIndex((one) => sameClash(one) === sameClash(clash)) === i)
  return groupBy(found, (clash) => clash.bookingId)
}
