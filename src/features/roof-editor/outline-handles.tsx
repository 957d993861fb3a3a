import { type KeyboardEvent, memo } from 'react'
import type { PlanView } from '../../../shared/drawing/plan-view.ts'
import type { Roof } from '../../../shared/roof/roof-types.ts'
import type { LengthUnits } from '../../../shared/units/format-length.ts'
import { edgeChips, edgeLine, type PlanChip } from './outline-chips.ts'
import { cornerWords, edgeWords } from './outline-words.ts'

/** What can be picked on an outline: a plate edge or a corner, counted from 0. */
export type OutlinePart = { kind: 'edge' | 'corner'; index: number }

export type HandleActions = {
  onPick: (part: OutlinePart) => void
  /** Arrow keys: to the right and up, mm. */
  onNudge: (corner: number, byMm: { x: number; y: number }) => void
  onTakeOut: (corner: number) => void
  onAddOn: (edge: number) => void
}

type Props = {
  roof: Roof
  view: PlanView
  units: LengthUnits
  picked: OutlinePart | null
  actions: HandleActions
}

/** The edges to tap and the corners to drag, all of them in reach of the Tab key. */
export const OutlineHandles = memo(function OutlineHandles(props: Props) {
  const { roof, view, units, picked, actions } = props
  const isPicked = (kind: OutlinePart['kind'], index: number) =>
    picked?.kind === kind && picked.index === index
  const chips = edgeChips(roof, view)
  return (
    <>
      <g>
        {roof.outline.map((_, index) => (
          <EdgeHandle
            key={index}
            index={index}
            chip={chips.find(({ edge }) => edge === index)}
            {...{ roof, view, units, actions }}
            isPicked={isPicked('edge', index)}
          />
        ))}
      </g>
      <g>
        {roof.outline.map((_, index) => (
          <CornerHandle
            key={index}
            index={index}
            {...{ roof, view, units, actions }}
            isPicked={isPicked('corner', index)}
          />
        ))}
      </g>
    </>
  )
})

type HandleProps = Omit<Props, 'picked'> & { index: number; isPicked: boolean }

const fingerPx = 30

type EdgeProps = HandleProps & { chip: PlanChip | undefined }

function EdgeHandle({ roof, view, units, index, isPicked, actions, chip }: EdgeProps) {
  const line = edgeLine(roof, view, index)
  const onKeyDown = (event: KeyboardEvent) => {
    if (event.key === 'Enter' || event.key === ' ') actions.onPick({ kind: 'edge', index })
    else if (event.key === 'Insert') actions.onAddOn(index)
    else return
    event.preventDefault()
  }
  const ends = { x1: line.from.x, y1: line.from.y, x2: line.to.x, y2: line.to.y }
  return (
    <g
      role="button"
      tabIndex={0}
      data-edge={index}
      aria-label={edgeWords(roof, index, units)}
      aria-pressed={isPicked}
      onClick={() => actions.onPick({ kind: 'edge', index })}
      onKeyDown={onKeyDown}
      className="group cursor-pointer outline-none"
    >
      <line {...ends} strokeWidth={fingerPx} className="stroke-transparent" />
      <line
        {...ends}
        strokeLinecap="round"
        className={`[stroke-width:6] group-focus-visible:stroke-chalk ${isPicked ? 'stroke-chalk' : 'stroke-transparent group-hover:stroke-rule'}`}
      />
      <EdgeChip chip={chip} />
    </g>
  )
}

/** Its pitch, or that it is a gable, inside the plate. */
function EdgeChip({ chip }: { chip: PlanChip | undefined }) {
  if (!chip) return null
  const { centre, widthPx, heightPx, text, sizePx } = chip
  return (
    <g aria-hidden="true" transform={`translate(${centre.x} ${centre.y})`}>
      <rect
        x={-widthPx / 2}
        y={-heightPx / 2}
        width={widthPx}
        height={heightPx}
        rx={4}
        className="fill-sheet stroke-rule"
      />
      <text
        dy="0.35em"
        textAnchor="middle"
        fontSize={sizePx}
        className={`tabular-nums ${chip.isStrong ? 'fill-ink font-extrabold' : 'fill-chalk font-semibold'}`}
      >
        {text}
      </text>
    </g>
  )
}

const arrowWays: Record<string, { x: number; y: number }> = {
  ArrowRight: { x: 1, y: 0 },
  ArrowLeft: { x: -1, y: 0 },
  ArrowUp: { x: 0, y: 1 },
  ArrowDown: { x: 0, y: -1 },
}

/** 100 mm at a key, 10 with Shift, 1 with Ctrl or Alt. */
function stepMm(event: KeyboardEvent): number {
  if (event.ctrlKey || event.altKey) return 1
  return event.shiftKey ? 10 : 100
}

function CornerHandle({ roof, view, units, index, isPicked, actions }: HandleProps) {
  const corner = roof.outline[index]
  if (!corner) return null
  const at = view.place(corner)
  const onKeyDown = (event: KeyboardEvent) => {
    const way = arrowWays[event.key]
    const by = stepMm(event)
    if (way) actions.onNudge(index, { x: way.x * by, y: way.y * by })
    else if (event.key === 'Enter' || event.key === ' ') actions.onPick({ kind: 'corner', index })
    else if (event.key === 'Delete' || event.key === 'Backspace') actions.onTakeOut(index)
    else return
    event.preventDefault()
  }
  return (
    <g
      role="button"
      tabIndex={0}
      data-corner={index}
      aria-label={`${cornerWords(roof.outline, index, units)}. Arrow keys move it`}
      aria-pressed={isPicked}
      // A finger's tap comes by the drag; this one is a screen reader's.
      onClick={(event) => {
        if (event.detail === 0) actions.onPick({ kind: 'corner', index })
      }}
      onKeyDown={onKeyDown}
      className="group cursor-move outline-none"
    >
      <circle cx={at.x} cy={at.y} r={22} className="fill-transparent" />
      <circle
        cx={at.x}
        cy={at.y}
        r={12}
        className="fill-transparent stroke-transparent [stroke-width:3] group-hover:fill-rule group-focus-visible:stroke-chalk"
      />
      <rect
        x={at.x - 6}
        y={at.y - 6}
        width={12}
        height={12}
        rx={2}
        className={`stroke-sheet [stroke-width:1.5] ${isPicked ? 'fill-clay' : 'fill-chalk'}`}
      />
    </g>
  )
}
