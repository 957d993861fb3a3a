import type { OneOfChanges } from '../../../shared/bookings/booking-changes.ts'
import type { BookingState, CreateBooking } from '../../../shared/bookings/booking-schemas.ts'
import type { Booking, CalendarBooking } from '../../../shared/bookings/calendar-schemas.ts'
import { type Day, formatDay } from '../../../shared/calendar/days.ts'
import type { OnPurpose } from './clash-answer.tsx'

/** How a booking stands before or after a step; start and gear only where the step is about them. */
export type BookingSide = {
  crewId: string
  days: readonly Day[]
  state: BookingState
  cancelled: boolean
  clashReason: string | null
  startAt?: string | null
  gear?: string
}

export type StepPart = {
  id: string
  /** 'QR-107 Surgery'. */
  name: string
  version: number
  before: BookingSide
  after: BookingSide
  /** Set until the booking has been made. */
  create?: CreateBooking
  /** Instead of the days on the way on: the server, which knows every day off, lays them. */
  move?: { from: Day; to: Day }
}

/** Something done to one or more bookings at once, in a sentence, with both its sides. */
export type BookingStep = { id: string; words: string; parts: StepPart[] }

export const nameOf = (booking: Pick<CalendarBooking, 'job'>): string =>
  `${booking.job.number} ${booking.job.title}`

export function sideOf(booking: CalendarBooking | Booking): BookingSide {
  return {
    crewId: booking.crew.id,
    days: booking.allDays,
    state: booking.state,
    cancelled: 'cancelled' in booking && booking.cancelled,
    clashReason: booking.clashReason,
    ...('gear' in booking ? { startAt: booking.ownStartAt, gear: booking.gear } : {}),
  }
}

/** A part that changes a booking as it is shown. */
export function partOf(
  booking: CalendarBooking | Booking,
  changes: Partial<BookingSide>,
): StepPart {
  const before = sideOf(booking)
  const { id, version } = booking
  return { id, name: nameOf(booking), version, before, after: { ...before, ...changes } }
}

export const stepOf = (words: string, ...parts: StepPart[]): BookingStep => ({
  id: crypto.randomUUID(),
  words,
  parts,
})

const isSame = (a: unknown, b: unknown): boolean => JSON.stringify(a) === JSON.stringify(b)

const sent = ['crewId', 'days', 'state', 'cancelled', 'startAt', 'gear'] as const

/** What of a booking differs from one side to the other: only that is sent. */
export function differenceOf(
  from: BookingSide,
  to: BookingSide,
): Partial<Omit<BookingSide, 'clashReason'>> {
  return Object.fromEntries(
    sent.filter((key) => !isSame(from[key], to[key])).map((key) => [key, to[key]]),
  )
}

/** Nothing would change. */
export const isIdle = (step: BookingStep): boolean =>
  step.parts.every(
    (part) =>
      !part.create && !part.move && Object.keys(differenceOf(part.before, part.after)).length === 0,
  )

/**
 * What to send to take a booking from one side to the other. Going back to how it stood, what was settled
 * on purpose then is settled again.
 */
export function changeTo(
  part: StepPart,
  direction: 'on' | 'back',
  given: { version: number; said: OnPurpose },
): OneOfChanges {
  const [from, to] = direction === 'on' ? [part.before, part.after] : [part.after, part.before]
  const { days, ...rest } = differenceOf(from, to)
  return {
    bookingId: part.id,
    version: given.version,
    ...rest,
    ...daysToSend(direction === 'on' ? part.move : undefined, days),
    ...given.said,
  }
}

function daysToSend(move: StepPart['move'], days: readonly Day[] | undefined) {
  if (move) return { move }
  return days ? { days: [...days] } : {}
}

/** What was said on purpose on the side that a step goes to. */
export const saidOn = (side: BookingSide): OnPurpose => ({
  evenIfNotWorked: true,
  ...(side.clashReason === null ? {} : { clashReason: side.clashReason }),
})

/** The same change made on top of what somebody else made of the booking meanwhile. */
export function rebased(step: BookingStep, current: Booking): BookingStep {
  return {
    ...step,
    parts: step.parts.map((part) => {
      if (part.id !== current.id) return part
      const before = sideOf(current)
      const mine = differenceOf(part.before, part.after)
      const back = current.cancelled && mine.cancelled === undefined ? { cancelled: false } : {}
      const after = { ...before, ...back, ...mine }
      return { ...part, version: current.version, before, after }
    }),
  }
}

/** A booking just made, as a step that can be taken back. */
export function bookedStep(booking: Booking): BookingStep {
  const { dayCount, crew, firstDay } = booking
  const days = dayCount === 1 ? '1 day' : `${dayCount} days`
  const part = partOf(booking, {})
  return stepOf(`Booked: ${crew.name}, ${days} from ${formatDay(firstDay)}`, {
    ...part,
    before: { ...part.before, cancelled: true },
  })
}
