import { useState } from 'react'
import type { CalendarBooking } from '../../../shared/bookings/calendar-schemas.ts'
import { type Day, formatDay } from '../../../shared/calendar/days.ts'
import { useToast } from '../../ui/toast.tsx'
import { conflictOf, useChangeBooking } from './calendar-queries.ts'
import type { OnPurpose } from './clash-answer.tsx'
import { daysBackTo } from './days-back.ts'
import { useUndoing } from './use-undoing.ts'

type Asked = { booking: CalendarBooking; move: { from: Day; to: Day } }

/** A dragged day: moved at once, put back when refused, taken back by Undo. */
export function useMoveBooking() {
  const toast = useToast()
  const undoing = useUndoing()
  const change = useChangeBooking()
  const [asked, setAsked] = useState<Asked | null>(null)

  const undo = (before: CalendarBooking, version: number) =>
    undoing(() => change.mutateAsync({ id: before.id, version, ...daysBackTo(before) }))

  const send = ({ booking, move }: Asked, said: OnPurpose = {}) => {
    if (change.isPending) return
    change.mutate(
      { id: booking.id, version: booking.version, move, ...said },
      {
        onSuccess: (after) => {
          setAsked(null)
          toast(`${booking.job.title} moved to ${formatDay(move.to)}.`, {
            undo: undo(booking, after.version),
          })
        },
        onError: (error) => {
          if (conflictOf(error)) setAsked({ booking, move })
          else toast(error.message, { kind: 'stop' })
        },
      },
    )
  }

  return {
    move: (booking: CalendarBooking, move: Asked['move']) => send({ booking, move }),
    answer: (said: OnPurpose) => (asked ? send(asked, said) : undefined),
    giveUp: () => {
      setAsked(null)
      change.reset()
    },
    conflict: asked ? conflictOf(change.error) : null,
    isPending: change.isPending,
  }
}
