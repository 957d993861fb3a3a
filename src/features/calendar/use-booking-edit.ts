import { useState } from 'react'
import type { Booking } from '../../../shared/bookings/calendar-schemas.ts'
import { useToast } from '../../ui/toast.tsx'
import type { BookingValues } from './booking-fields.tsx'
import {
  type ChangeInput,
  useCancelBooking,
  useChangeBooking,
  useRestoreBooking,
} from './calendar-queries.ts'
import type { OnPurpose } from './clash-answer.tsx'
import { daysBackTo } from './days-back.ts'
import { useUndoing } from './use-undoing.ts'

type Draft = BookingValues & { days: string[] }
export type BookingChange = Omit<ChangeInput, 'id' | 'version'>

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
  const toast = useToast()
  const undoing = useUndoing()
  const change = useChangeBooking()
  const cancel = useCancelBooking()
  const restore = useRestoreBooking()
  // What the person began from: a change by somebody else meanwhile must not be written over.
  const [base, setBase] = useState(booking)
  const [draft, setDraft] = useState(draftOf(booking))
  const start = (from: Booking) => {
    setBase(from)
    setDraft(draftOf(from))
    change.reset()
  }
  const send = (input: BookingChange) => {
    if (change.isPending) return
    change.mutate(
      { id: base.id, version: base.version, ...input },
      {
        onSuccess: (after) => {
          const back = { id: after.id, version: after.version, ...inputBackTo(base) }
          toast('Booking changed.', { undo: undoing(() => change.mutateAsync(back)) })
          onClosed()
        },
      },
    )
  }
  const drop = () =>
    cancel.mutate(
      { id: base.id, version: base.version },
      {
        onSuccess: (after) => {
          const back = { id: after.id, version: after.version }
          toast('Booking cancelled.', { undo: undoing(() => restore.mutateAsync(back)) })
          onClosed()
        },
      },
    )
  const bringBack = (said: OnPurpose = {}) =>
    restore.mutate(
      { id: booking.id, version: booking.version, ...said },
      {
        onSuccess: (after) => {
          toast('Booking restored.')
          start(after)
        },
      },
    )
  return { base, draft, setDraft, start, send, drop, bringBack, change, cancel, restore }
}

export const inputOf = (draft: Draft) => ({
  crewId: draft.crewId,
  days: draft.days,
  state: draft.state,
  startAt: draft.startAt === '' ? null : draft.startAt,
  gear: draft.gear,
})

const inputBackTo = (before: Booking): BookingChange => ({
  ...inputOf(draftOf(before)),
  ...daysBackTo(before),
})
