import { useState } from 'react'
import type { Booking } from '../../../shared/bookings/calendar-schemas.ts'
import { type Day, formatDay } from '../../../shared/calendar/days.ts'
import type { BookingValues } from './booking-fields.tsx'
import { useBookingMoves } from './booking-moves-context.ts'
import { type BookingSide, isIdle, nameOf, partOf, type StepPart, stepOf } from './booking-steps.ts'

type Draft = BookingValues & { days: string[] }

const draftOf = (booking: Booking): Draft => ({
  crewId: booking.crew.id,
  state: booking.state,
  startAt: booking.ownStartAt ?? '',
  gear: booking.gear,
  days: booking.allDays,
})

export type BookingEditProps = { booking: Booking; onClosed: () => void }

/** What the person is typing, what it began from, and what becomes of it. */
export function useBookingEdit({ booking, onClosed }: BookingEditProps) {
  const moves = useBookingMoves()
  // What the person began from: a change by somebody else meanwhile must not be written over.
  const [base, setBase] = useState(booking)
  const [draft, setDraft] = useState(draftOf(booking))
  const start = (from: Booking) => {
    setBase(from)
    setDraft(draftOf(from))
    setFailure(null)
  }
  const [failure, setFailure] = useState<unknown>(null)
  const send = (words: string, part: StepPart) => {
    if (moves.isPending) return
    setFailure(null)
    const step = stepOf(`${nameOf(base)} ${words}`, part)
    if (isIdle(step)) onClosed()
    else moves.make(step, { onDone: onClosed, onFailed: setFailure })
  }
  const make = (words: string, changes: Partial<BookingSide>) => send(words, partOf(base, changes))
  return {
    base,
    draft,
    setDraft,
    start,
    save: (changes: Partial<BookingSide>) => make('changed', changes),
    move: (move: { from: Day; to: Day }) =>
      send(`moved to ${formatDay(move.to)}`, { ...partOf(base, {}), move }),
    drop: () => make('cancelled', { cancelled: true }),
    bringBack: () => make('restored', { cancelled: false }),
    isPending: moves.isPending,
    failure,
  }
}

export const sideOfDraft = (draft: Draft): Partial<BookingSide> => ({
  crewId: draft.crewId,
  days: draft.days,
  state: draft.state,
  startAt: draft.startAt === '' ? null : draft.startAt,
  gear: draft.gear.trim(),
})
