import type {
  Calendar,
  CalendarBooking,
  UnbookedJob,
} from '../../../shared/bookings/calendar-schemas.ts'
import type { Clash, Landings } from '../../../shared/clashes/clash-schemas.ts'
import { heldMove, type Place, pulledDays } from '../../../shared/bookings/booking-places.ts'
import { movedDays } from '../../../shared/bookings/move-days.ts'
import { type Day, formatDay } from '../../../shared/calendar/days.ts'
import { whyNotWorked, workedDaysFrom } from '../../../shared/calendar/working-days.ts'
import { nameOf } from './booking-steps.ts'
import type { Bar } from './crew-weeks-layout.ts'

/** What is in hand: a bar by one of its days or ends, or a job not booked yet. */
export type Drag =
  | { kind: 'move'; bar: Bar; heldDay: Day }
  | { kind: 'pull'; bar: Bar; end: 'first' | 'last' }
  | { kind: 'job'; job: UnbookedJob }

export type Cell = { crewId: string; day: Day }

/** Where it would land: the days, and what would stand in the way there. */
export type Landing = {
  crewId: string
  days: Day[]
  /** Days that it does not have now. */
  clashes: Pick<Clash, 'weight' | 'text'>[]
  /** It would stay as it is. */
  isIdle: boolean
  /** A drop here does nothing. */
  cannot?: boolean
  move: { from: Day; to: Day } | null
}

export const placeOf = (booking: CalendarBooking): Place => ({
  crewId: booking.crew.id,
  days: booking.allDays,
  worked: new Set(booking.days.filter((d) => d.worked).map((d) => d.day)),
})

/** What the calendar itself knows to stand in the way; the server knows more. */
function clashesHere(
  calendar: Calendar,
  put: { bookingId: string | null; crewId: string; days: readonly Day[]; before: readonly Day[] },
): Landing['clashes'] {
  const crew = calendar.crews.find((one) => one.id === put.crewId)
  const others = calendar.bookings.filter(
    (other) => other.crew.id === put.crewId && other.id !== put.bookingId,
  )
  return put.days.flatMap((day): Landing['clashes'] => {
    const closed = put.before.includes(day) ? null : whyNotWorked(calendar, day)
    return [
      ...others
        .filter((other) => other.allDays.includes(day))
        .map((other) => ({
          weight: 'clash' as const,
          text: `${formatDay(day)}: ${crew?.name ?? 'The crew'} is on ${nameOf(other)}.`,
        })),
      ...(closed ? [{ weight: 'clash' as const, text: `${formatDay(day)}: ${closed}.` }] : []),
    ]
  })
}

function daysOfJob(calendar: Calendar, job: UnbookedJob, cell: Cell): Day[] {
  const count = job.crewDays.find((one) => one.crewId === cell.crewId)?.days ?? 1
  const following = workedDaysFrom(calendar, cell.day, count)
  if (following.includes(cell.day)) return following
  return [cell.day, ...following.slice(0, Math.max(0, count - 1))]
}

/** Where the thing in hand would land on a cell; `known` is what the server said before the drag. */
export function landingOf(
  calendar: Calendar,
  drag: Drag,
  cell: Cell,
  known: Landings | undefined,
): Landing | null {
  if (drag.kind === 'job') {
    const days = daysOfJob(calendar, drag.job, cell)
    const own = { bookingId: null, crewId: cell.crewId, days, before: [] }
    const landing = { crewId: cell.crewId, days, isIdle: false, move: null, clashes: [] }
    if (cell.day < calendar.today) return stays(landing, `${formatDay(cell.day)} has gone by.`)
    return { ...landing, clashes: knownAt(known, cell) ?? clashesHere(calendar, own) }
  }
  const { booking, stretch } = drag.bar
  const place = placeOf(booking)
  if (drag.kind === 'pull') {
    const days = pulledDays(calendar, place, { stretch, end: drag.end, to: cell.day })
    return landed(calendar, booking, { crewId: booking.crew.id, days, move: null })
  }
  const move = heldMove(calendar, place, { stretch, day: drag.heldDay, to: cell.day })
  if (!move) return null
  const days = movedDays(calendar, place.days, place.worked, move)
  const landing = landed(calendar, booking, { crewId: cell.crewId, days, move })
  if (landing.isIdle) return landing
  if (cell.crewId !== booking.crew.id && place.worked.size > 0)
    return stays(
      landing,
      `${booking.crew.name} has worked days of it: only the days ahead move, and to no other crew.`,
    )
  if (move.to < calendar.today) return stays(landing, `${formatDay(move.to)} has gone by.`)
  const clashes = knownAt(known, { crewId: cell.crewId, day: move.to })
  return clashes ? { ...landing, clashes } : landing
}

const stays = (landing: Landing, text: string): Landing => ({
  ...landing,
  cannot: true,
  clashes: [{ weight: 'clash', text }],
})

function landed(
  calendar: Calendar,
  booking: CalendarBooking,
  put: { crewId: string; days: Day[]; move: Landing['move'] },
): Landing {
  const before = booking.allDays
  const isSameCrew = put.crewId === booking.crew.id
  const isIdle = isSameCrew && put.days.join() === before.join()
  const fresh = isSameCrew ? put.days.filter((day) => !before.includes(day)) : put.days
  const own = { bookingId: booking.id, crewId: put.crewId, days: fresh, before }
  return { ...put, isIdle, clashes: isIdle ? [] : clashesHere(calendar, own) }
}

function knownAt(known: Landings | undefined, cell: Cell): Landing['clashes'] | null {
  const there = known?.landings.find((one) => one.crewId === cell.crewId && one.day === cell.day)
  return there ? there.clashes : null
}

export type LandingWeight = 'free' | 'caution' | 'clash'

export function weightOf(landing: Landing): LandingWeight {
  if (landing.clashes.some((clash) => clash.weight === 'clash')) return 'clash'
  return landing.clashes.length > 0 ? 'caution' : 'free'
}

/** 'Thu 3 Dec to Tue 8 Dec, 3 days'. */
export function daysInWords(days: readonly Day[]): string {
  const [first, last] = [days[0], days[days.length - 1]]
  if (first === undefined || last === undefined) return ''
  if (first === last) return formatDay(first)
  return `${formatDay(first)} to ${formatDay(last)}, ${days.length} days`
}
