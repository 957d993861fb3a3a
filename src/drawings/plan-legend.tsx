import type { PlanScaleBar } from '../../shared/drawing/plan-dimensions.ts'

export type LegendWords = { due: string; done: string; rest: string }

const samples = {
  due: 'stroke-clay [stroke-width:4]',
  done: 'stroke-leaf [stroke-width:2.5] [stroke-dasharray:6_3]',
  rest: 'stroke-ink-soft [stroke-width:1.25]',
} as const

type Props = {
  scaleBar: PlanScaleBar
  /** Null where no day is shown. */
  words: LegendWords | null
  hiddenCount: number
  /** Draws it as large as all marks need; null where that is no help. */
  onWriteAll?: (() => void) | null
}

/** The scale, what heavy, dashed and thin lines mean, and whether marks were left out. */
export function PlanLegend({ scaleBar, words, hiddenCount, onWriteAll }: Props) {
  const lengthPx = scaleBar.segment.to.x
  return (
    <div className="flex flex-wrap items-center gap-x-5 gap-y-1 text-sm">
      <span className="inline-flex items-center gap-2">
        <svg width={lengthPx + 2} height={10} aria-hidden="true" className="shrink-0">
          <path
            d={`M1 1v8M1 5h${lengthPx}M${lengthPx + 1} 1v8`}
            className="fill-none stroke-ink [stroke-width:1.5]"
          />
        </svg>
        {scaleBar.text}
      </span>
      {words
        ? (['due', 'done', 'rest'] as const).map((state) => (
            <span key={state} className="inline-flex items-center gap-2 text-ink">
              <svg width={30} height={10} aria-hidden="true" className="shrink-0">
                <line x1={1} y1={5} x2={29} y2={5} className={samples[state]} />
              </svg>
              {words[state]}
            </span>
          ))
        : null}
      {hiddenCount > 0 ? (
        <span className="flex flex-wrap items-center gap-x-2 print:hidden">
          {hiddenCount === 1 ? '1 mark' : `${hiddenCount} marks`} not written: pick the timber, or
          {onWriteAll ? (
            <button
              type="button"
              onClick={onWriteAll}
              className="min-h-11 font-semibold text-chalk underline"
            >
              draw it large enough for all
            </button>
          ) : (
            ' draw it larger.'
          )}
        </span>
      ) : null}
    </div>
  )
}
