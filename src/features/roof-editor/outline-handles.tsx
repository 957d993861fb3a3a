import type { KeyboardEvent } from 'react'
import { pointAlong, segmentLength } from '../../../shared/drawing/drawing-geometry.ts'
import { edgeOutward } from '../../../shared/drawing/overhang-outline.ts'
import type { PlanView } from '../../../shared/drawing/plan-view.ts'
import { textWidthPx } from '../../../shared/drawing/text-size.ts'
import type { Roof } from '../../../shared/roof/roof-types.ts'
import type { LengthUnits } from '../../../shared/units/format-length.ts'
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
export function OutlineHandles({ roof, view, units, picked, actions }: Props) {
  const isPicked = (kind: OutlinePart['kind'], index: number) =>
    picked?.kind === kind && picked.index === index
  return (
    <>
      <g>
        {roof.outline.map((_, index) => (
          <EdgeHandle
            key={index}
            index={index}
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
}

type HandleProps = Omit<Props, 'picked'> & { index: number; isPicked: boolean }

const fingerPx = 30

function EdgeHandle({ roof, view, units, index, isPicked, actions }: HandleProps) {
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
      <EdgeChip roof={roof} view={view} index={index} />
    </g>
  )
}

const chipSizePx = 12
const chipOffPx = 15

/** Its pitch, or that it is a gable, inside the plate. */
function EdgeChip({ roof, view, index }: Pick<HandleProps, 'roof' | 'view' | 'index'>) {
  const edge = roof.edges[index]
  const line = edgeLine(roof, view, index)
  if (!edge) return null
  const pitch = edge.finish === 'eave' && Number.isFinite(edge.pitchDeg) ? `${edge.pitchDeg}°` : ''
  const text = edge.finish === 'gable' ? 'Gable' : pitch
  const widthPx = textWidthPx(text, chipSizePx) + 8
  if (text === '' || segmentLength(line) < widthPx + 12) return null
  const outward = edgeOutward(roof.outline, index)
  const middle = pointAlong(line, 0.5)
  const reachPx = chipOffPx + (Math.abs(outward.x) * widthPx) / 2
  const at = { x: middle.x - outward.x * reachPx, y: middle.y + outward.y * reachPx }
  return (
    <g aria-hidden="true" transform={`translate(${at.x} ${at.y})`}>
      <rect
        x={-widthPx / 2}
        y={-9}
        width={widthPx}
        height={18}
        rx={4}
        className="fill-sheet stroke-rule"
      />
      <text
        dy="0.35em"
        textAnchor="middle"
        fontSize={chipSizePx}
        className={`tabular-nums ${edge.finish === 'gable' ? 'fill-ink font-extrabold' : 'fill-chalk font-semibold'}`}
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
      style={{ touchAction: 'none' }}
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

export function edgeLine({ outline }: Pick<Roof, 'outline'>, view: PlanView, edge: number) {
  const from = outline[edge] ?? { x: 0, y: 0 }
  const to = outline[(edge + 1) % outline.length] ?? from
  return { from: view.place(from), to: view.place(to) }
}
