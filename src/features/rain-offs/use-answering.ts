import { formatDay } from '../../../shared/calendar/days.ts'
import type { RainOffRow } from '../../../shared/rain-offs/rain-off-schemas.ts'
import { useToast } from '../../ui/toast.tsx'
import { useAnswerRainOff } from './rain-off-queries.ts'

/** Undoing, declining, taking back; a refusal is told in a toast, since the screen may have gone. */
export function useAnswering() {
  const toast = useToast()
  const { mutateAsync, isPending } = useAnswerRainOff()

  const send = (
    { id, version }: { id: string; version: number },
    answer: Parameters<typeof mutateAsync>[0]['answer'],
    onDone: (after: RainOffRow | undefined) => void,
  ): void => {
    mutateAsync({ id, version, answer }).then(
      ({ rainOffs }) => onDone(rainOffs.find((one) => one.id === id)),
      (error: unknown) => {
        const message = error instanceof Error ? error.message : 'That could not be done.'
        toast(message, { kind: 'stop' })
      },
    )
  }

  return {
    isPending,
    undo: (row: RainOffRow) =>
      send(row, 'undo', () => toast(`${row.crew.name}: every booking is back where it was.`)),
    decline: (row: RainOffRow, onDone: () => void) =>
      send(row, 'decline', (after) => {
        toast(`Declined: ${row.crew.name}, ${formatDay(row.fromDay)}.`, {
          ...(after ? { undo: () => send(after, 'reopen', () => undefined) } : {}),
        })
        onDone()
      }),
    withdraw: (row: RainOffRow) =>
      send(row, 'withdraw', () => toast('Taken back. The office is not asked any more.')),
  }
}
