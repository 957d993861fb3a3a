import { Minus, Plus } from 'lucide-react'

type Props = {
  /** What is counted, for a screen reader. */
  label: string
  count: number
  total: number
  /** Counted here but not yet on the server. */
  unsent: number
  onStep: (delta: 1 | -1) => void
  size?: 'site' | 'large'
}

const sizes = { site: 'h-14 w-14', large: 'h-20 w-20' }

/** Counts pieces up and down with two keys that a glove can hit. */
export function CountStepper({ label, count, total, unsent, onStep, size = 'site' }: Props) {
  const key = `flex shrink-0 items-center justify-center rounded-md border-2 disabled:opacity-40 ${sizes[size]}`
  return (
    <div role="group" aria-label={label} className="flex items-center gap-3">
      <button
        type="button"
        aria-label={`${label}: one back`}
        disabled={count <= 0}
        onClick={() => onStep(-1)}
        className={`${key} border-ink bg-sheet`}
      >
        <Minus size={32} aria-hidden />
      </button>
      <p className="min-w-24 text-center leading-tight" aria-live="polite">
        <span className="numeral text-[1.75rem]">{count}</span>{' '}
        <span className="text-base">of {total}</span>
        {unsent > 0 ? <span className="block text-sm font-semibold">not yet sent</span> : null}
      </p>
      <button
        type="button"
        aria-label={`${label}: one done`}
        disabled={count >= total}
        onClick={() => onStep(1)}
        className={`${key} border-leaf bg-leaf text-on-fill`}
      >
        <Plus size={32} aria-hidden />
      </button>
    </div>
  )
}
