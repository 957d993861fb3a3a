import { useLayoutEffect, useMemo, useState, type RefObject } from 'react'
import { planDrawing, type PlanDrawing } from '../../shared/drawing/plan-drawing.ts'
import type { FrameSpec, Roof, RoofProblem } from '../../shared/roof/roof-types.ts'
import type { LengthUnits } from '../../shared/units/format-length.ts'
import { PlanLegend, type LegendWords } from './plan-legend.tsx'
import type { MemberState } from './plan-member-shape.tsx'
import { PlanGround, PlanMeasures, PlanProblems } from './plan-surround.tsx'
import { PlanTimbers } from './plan-timbers.tsx'
import { useWidth } from './use-width.ts'
import { ZoomButtons, zoomSteps } from './zoom-buttons.tsx'

type Props = {
  roof: Roof
  /** Null while the roof cannot be framed: plates, dimensions and problems still show. */
  spec: FrameSpec | null
  mode?: 'edit' | 'read'
  due?: ReadonlySet<string>
  done?: ReadonlySet<string>
  selected?: string | null
  problems?: readonly RoofProblem[]
  units?: LengthUnits
  /** What the drawing is of, for a screen reader. */
  label?: string
  legendWords?: LegendWords
  maxHeightPx?: number
  onPick?: (mark: string) => void
}

const noMarks: ReadonlySet<string> = new Set()
const noProblems: readonly RoofProblem[] = []
const pageWidthPx = 720
const dayWords: LegendWords = { due: 'Due today', done: 'Done', rest: 'The rest' }

/** The roof from above: plates, roof lines, every timber with its mark, and what is due and done. */
export function RoofPlan(props: Props) {
  const { roof, spec, mode = 'read', units = 'mm', selected = null, onPick } = props
  const { due = noMarks, done = noMarks, problems = noProblems, maxHeightPx } = props
  const [boxRef, boxWidthPx] = useWidth<HTMLDivElement>(pageWidthPx)
  const [zoom, setZoom] = useState<number>(zoomSteps[0])
  const widthPx = Math.max(boxWidthPx, 200) * zoom
  const drawing = useMemo(
    () =>
      planDrawing(roof, spec, {
        widthPx,
        maxHeightPx: (maxHeightPx ?? Math.max(boxWidthPx, 420)) * zoom,
        mode,
        units,
        problems,
        firstMarks: new Set([...(selected ? [selected] : []), ...due]),
      }),
    [roof, spec, widthPx, boxWidthPx, zoom, maxHeightPx, mode, units, problems, selected, due],
  )
  useCentreOnZoom(boxRef, zoom, drawing, selected)
  const showsDay = props.due !== undefined || props.done !== undefined
  const stateOf = (mark: string): MemberState => {
    if (!showsDay) return 'plain'
    if (done.has(mark)) return 'done'
    return due.has(mark) ? 'due' : 'rest'
  }
  return (
    <figure className="m-0 flex min-w-0 flex-col gap-2">
      <div ref={boxRef} className="max-w-full overflow-auto print:overflow-visible">
        {drawing ? (
          <PlanSvg
            drawing={drawing}
            label={props.label ?? 'Roof plan'}
            zoom={zoom}
            showsRoofLines={!showsDay}
            stateOf={stateOf}
            selected={selected}
            onPick={onPick}
          />
        ) : (
          <p className="p-4 text-ink-soft">The plan is drawn here as its sizes are typed.</p>
        )}
      </div>
      {drawing ? (
        <figcaption className="flex flex-wrap items-center justify-between gap-2">
          <PlanLegend
            scaleBar={drawing.scaleBar}
            words={showsDay ? (props.legendWords ?? dayWords) : null}
            hiddenCount={drawing.hiddenMarks.length}
          />
          <ZoomButtons zoom={zoom} onZoom={setZoom} />
        </figcaption>
      ) : null}
    </figure>
  )
}

type SvgProps = {
  drawing: PlanDrawing
  label: string
  zoom: number
  showsRoofLines: boolean
  stateOf: (mark: string) => MemberState
  selected: string | null
  onPick: ((mark: string) => void) | undefined
}

function PlanSvg(props: SvgProps) {
  const { drawing, label, zoom, showsRoofLines, stateOf, selected, onPick } = props
  const { widthPx, heightPx } = drawing.view
  return (
    <svg
      viewBox={`0 0 ${widthPx} ${heightPx}`}
      style={{ width: `${zoom * 100}%` }}
      role={onPick ? 'group' : 'img'}
      aria-label={label}
      className="block h-auto max-w-none font-sans print:w-full!"
    >
      <PlanGround drawing={drawing} showsRoofLines={showsRoofLines} />
      <PlanTimbers drawing={drawing} stateOf={stateOf} selected={selected} onPick={onPick} />
      <PlanMeasures drawing={drawing} />
      <PlanProblems drawing={drawing} />
    </svg>
  )
}

/** Drawn larger, the picked timber (or the middle of the roof) stays in sight. */
function useCentreOnZoom(
  boxRef: RefObject<HTMLDivElement | null>,
  zoom: number,
  drawing: PlanDrawing | null,
  selected: string | null,
): void {
  const picked = drawing?.members.find((member) => member.mark === selected)?.centre
  const share = picked && drawing ? (picked.from.x + picked.to.x) / 2 / drawing.view.widthPx : 0.5
  useLayoutEffect(() => {
    const box = boxRef.current
    if (box) box.scrollLeft = share * box.scrollWidth - box.clientWidth / 2
  }, [boxRef, zoom, share])
}
