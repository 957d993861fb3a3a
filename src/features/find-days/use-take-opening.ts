import { formatDay } from '../../../shared/calendar/days.ts'
import type { OpeningFound } from '../../../shared/find-days/find-days-schemas.ts'
import { useToast } from '../../ui/toast.tsx'
import { useChangeBookings } from './find-days-queries.ts'

/** Pencils a job in on an opening; what gives way moves with it, and back with Undo. */
export function useTakeOpening(jobId: string, onTaken: (firstDay: string) => void) {
  const toast = useToast()
  const change = useChangeBookings()

  const undo = (opening: OpeningFound, after: readonly { id: string; version: number }[]) => () => {
    const versionOf = (id: string): number => after.find((one) => one.id === id)?.version ?? 1
    const made = after.find((one) => !opening.moves.some((move) => move.bookingId === one.id))
    change
      .mutateAsync({
        changes: [
          ...(made ? [{ bookingId: made.id, version: made.version, cancelled: true }] : []),
          ...opening.moves.map(({ bookingId, daysBefore }) => ({
            bookingId,
            version: versionOf(bookingId),
            days: daysBefore,
            evenIfNotWorked: true,
          })),
        ],
      })
      .then(
        () => toast('Taken back: the calendar stands as before.'),
        (error: unknown) => {
          const message = error instanceof Error ? error.message : 'That could not be taken back.'
          toast(message, { kind: 'stop' })
        },
      )
  }

  const take = (opening: OpeningFound) => {
    if (change.isPending) return
    const { crew, days, moves } = opening
    change.mutate(
      {
        changes: moves.map(({ bookingId, version, daysAfter }) => ({
          bookingId,
          version,
          days: daysAfter,
        })),
        create: [
          { clientId: crypto.randomUUID(), jobId, crewId: crew.id, days, state: 'pencilled' },
        ],
      },
      {
        onSuccess: ({ bookings }) => {
          const first = days[0] ?? ''
          toast(`Pencilled in: ${crew.name} from ${formatDay(first)}.`, {
            undo: undo(opening, bookings),
          })
          onTaken(first)
        },
      },
    )
  }
  return { take, error: change.error, isPending: change.isPending }
}
