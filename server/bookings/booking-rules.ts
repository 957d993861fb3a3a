import type { BookingConflict } from '../../shared/bookings/booking-schemas.ts'
import { type Day, formatDay } from '../../shared/calendar/days.ts'
import { type WorkingCalendar, whyNotWorked } from '../../shared/calendar/working-days.ts'
import type { DbOrTx } from '../db/client.ts'
import { AppError, invalidField } from '../http/app-error.ts'
import { readCrewDays } from './calendar-store.ts'

export type OnPurpose = { clashReason?: string | undefined; evenIfNotWorked?: boolean | undefined }
type Clash = BookingConflict['clashes'][number]

/** How a booking stood before the change, so that what was settled then is not asked again. */
export type Before = { crewId: string; days: readonly Day[] } | null

export type CrewAndDays = {
  bookingId: string
  crew: { id: string; name: string }
  days: readonly Day[]
}

function crewClashes(tx: DbOrTx, booking: CrewAndDays): Clash[] {
  const sorted = [...booking.days].sort()
  const [first, last] = [sorted[0], sorted[sorted.length - 1]]
  if (!first || !last) return []
  return readCrewDays(tx, [booking.crew.id], { from: first, to: last })
    .filter((other) => other.bookingId !== booking.bookingId && booking.days.includes(other.day))
    .map(({ day, jobNumber, jobTitle }) => ({
      code: 'crew-twice' as const,
      day,
      text: `${formatDay(day)}: ${booking.crew.name} is on ${jobNumber} ${jobTitle}.`,
    }))
}

function closedDayClashes(calendar: WorkingCalendar, days: readonly Day[]): Clash[] {
  return days.flatMap((day) => {
    const why = whyNotWorked(calendar, day)
    return why ? [{ code: 'day-not-worked' as const, day, text: `${formatDay(day)}: ${why}.` }] : []
  })
}

/**
 * A crew booked twice on a day and days not worked, less what was said on purpose. What stood that way
 * before the change is not asked again.
 *
 * @returns what is to be asked, and whether the crew is booked twice on any of the days, asked or not.
 */
export function findClashesOf(
  tx: DbOrTx,
  input: { booking: CrewAndDays; before: Before; calendar: WorkingCalendar; said: OnPurpose },
): { asked: Clash[]; crewTwice: boolean } {
  const { booking, before, calendar, said } = input
  const twice = crewClashes(tx, booking)
  const settled = (clash: Clash): boolean => before?.days.includes(clash.day) ?? false
  const asked = [
    ...(said.clashReason === undefined
      ? twice.filter((clash) => before?.crewId !== booking.crew.id || !settled(clash))
      : []),
    ...(said.evenIfNotWorked === true
      ? []
      : closedDayClashes(calendar, booking.days).filter((clash) => !settled(clash))),
  ]
  return { asked, crewTwice: twice.length > 0 }
}

/** @throws AppError 409 whose detail is a `BookingConflict`, when there is anything to be asked. */
export function refuseClashes(asked: readonly Clash[]): void {
  if (asked.length === 0) return
  const clashes = asked.filter((clash, i) => asked.findIndex((c) => c.text === clash.text) === i)
  const detail: BookingConflict = { kind: 'clash', clashes }
  throw new AppError('conflict', conflictWords(clashes), { detail })
}

function conflictWords(clashes: readonly Clash[]): string {
  const what = clashes.map((clash) => clash.text).join(' ')
  const out = clashes.some((clash) => clash.code === 'crew-twice')
    ? 'Pick other days or another crew, or book both on purpose and say why.'
    : 'Pick other days, or say that they will be worked.'
  return `${what} ${out}`
}

export const sortedDays = (days: readonly Day[]): Day[] => [...new Set(days)].sort()

/** @throws AppError 400 when a job without an issued roof is to be booked firm. */
export function requireRoof(revisionId: string | null): void {
  if (revisionId === null)
    throw invalidField('state', 'No roof issued yet: the days can only be pencilled.')
}
