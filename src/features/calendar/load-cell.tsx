import { memo } from 'react'
import { formatDay } from '../../../shared/calendar/days.ts'
import { formatLoad } from '../../../shared/labour/format-hours.ts'
import type { Load } from './crew-weeks-layout.ts'

type Props = { day: string; load: Load | undefined; isOff: boolean }

const hours = (minutes: number): string => String(Math.round(minutes / 6) / 10)

/** A crew's planned hours against the hours it has, on one day. */
export const LoadCell = memo(function LoadCell({ day, load, isOff }: Props) {
  if (!load || (isOff && !load.isBooked)) return null
  const { plannedMinutes, availableMinutes, isBooked } = load
  const isOver = plannedMinutes > availableMinutes
  const share = availableMinutes > 0 ? plannedMinutes / availableMinutes : isOver ? 1 : 0
  const nobody = availableMinutes === 0
  return (
    <span className="block px-1 pb-1 text-xs leading-tight">
      <span
        aria-hidden
        className="mb-0.5 block h-2 overflow-hidden rounded-sm border border-ink-soft bg-sheet"
      >
        <span
          className={`block h-full ${isOver ? 'load-over' : 'bg-ink-soft'}`}
          style={{ width: `${Math.min(100, Math.round(share * 100))}%` }}
        />
      </span>
      <span className="sr-only">
        {formatDay(day)}: {nobody ? 'nobody there' : formatLoad(plannedMinutes, availableMinutes)}
        {isOver ? ', more than there is' : ''}
      </span>
      <span
        aria-hidden
        className={`block text-center tabular-nums ${isOver ? 'font-extrabold text-stop' : nobody ? 'font-semibold text-ochre' : isBooked ? '' : 'text-ink-soft'}`}
      >
        {nobody
          ? 'nobody'
          : isBooked
            ? `${hours(plannedMinutes)}/${hours(availableMinutes)}`
            : `${hours(availableMinutes)} free`}
      </span>
    </span>
  )
})
