import type { BookingChangesToSend } from '../../../shared/bookings/booking-changes.ts'
import type { Booking } from '../../../shared/bookings/calendar-schemas.ts'
import { type BookingStep, changeTo, saidOn, type StepPart } from './booking-steps.ts'
import type { OnPurpose } from './clash-answer.tsx'

export type Direction = 'on' | 'back'

/** What to send for a step; without `said`, what was said on purpose on the side it goes to. */
export function bodyOf(
  step: BookingStep,
  direction: Direction,
  given: { versionOf: (part: StepPart) => number; said: OnPurpose | null },
): BookingChangesToSend {
  const { versionOf, said } = given
  const isToMake = (part: StepPart): boolean => direction === 'on' && part.create !== undefined
  return {
    changes: step.parts
      .filter((part) => !isToMake(part))
      .map((part) => {
        const side = direction === 'on' ? part.after : part.before
        return changeTo(part, direction, { version: versionOf(part), said: said ?? saidOn(side) })
      }),
    create: step.parts.flatMap((part) =>
      isToMake(part) && part.create ? [{ ...part.create, ...said }] : [],
    ),
  }
}

/** A step as it stands once the server has answered. */
export function settledStep(
  step: BookingStep,
  bookings: readonly Booking[],
  direction: Direction,
): BookingStep {
  if (direction === 'back') return step
  const parts = step.parts.map((part): StepPart => {
    const answer = bookings.find((booking) => booking.id === part.id)
    const { id, name, version, before, after } = part
    const made = { id, name, version, before }
    if (!answer) return { ...made, after }
    const { clashReason, allDays: days } = answer
    return { ...made, after: { ...after, clashReason, days } }
  })
  return { ...step, parts }
}
