import { Minus, Plus } from 'lucide-react'
import { formatQuarters } from '../../../shared/labour/format-hours.ts'

type Props = {
  /** Whose or what hours, for a screen reader. */
  label: string
  minutes: number
  stepMinutes: number
  leastMinutes?: number
  mostMinutes: number
  onChange: (minutes: number) => void
}

const keyClass =
  'flex h-14 w-14 shrink-0 items-center justify-center rounded-md border-2 border-ink bg-sheet disabled:opacity-40'

/** Hours up and down with two keys that a glove can hit. */
export function HoursStepper(props: Props) {
  const { label, minutes, stepMinutes, leastMinutes = 0, mostMinutes, onChange } = props
  const to = (next: number) => onChange(Math.min(mostMinutes, Math.max(leastMinutes, next)))
  return (
    <div role="group" aria-label={label} className="flex shrink-0 items-center gap-1 sm:gap-2">
      <button
        type="button"
        aria-label={`${label}: less`}
        disabled={minutes <= leastMinutes}
        onClick={() => to(minutes - stepMinutes)}
        className={keyClass}
      >
        <Minus size={28} aria-hidden />
      </button>
      <p className="numeral w-16 text-center sm:w-20 text-[1.75rem]" aria-live="polite">
        {formatQuarters(minutes).replace(' h', '')}
        <span className="text-base font-semibold"> h</span>
      </p>
      <button
        type="button"
        aria-label={`${label}: more`}
        disabled={minutes >= mostMinutes}
        onClick={() => to(minutes + stepMinutes)}
        className={keyClass}
      >
        <Plus size={28} aria-hidden />
      </button>
    </div>
  )
}
