import { memo, useCallback, useEffect, useMemo, useRef, useState } from 'react'
import {
  planDrawing,
  type PlanDrawing,
  type PlanDrawingOptions,
} from '../../shared/drawing/plan-drawing.ts'
import { type PlanLayer, planLayersIn } from '../../shared/drawing/plan-layers.ts'
import type { FrameSpec, Roof, RoofProblem } from '../../shared/roof/roof-types.ts'
import type { LengthUnits } from '../../shared/units/format-length.ts'
import { usePrinting } from '../lib/use-printing.ts'
import { PlanLayerKeys } from './plan-layer-keys.tsx'
import { PlanLegend, type LegendWords } from './plan-legend.tsx'
import type { MemberState } from './plan-member-shape.tsx'
import { PlanGround, PlanMeasures, PlanProblems } from './plan-surround.tsx'
import { PlanTimbers } from './plan-timbers.tsx'
import { type LayOutPlan, useLaidPlan } from './use-laid-plan.ts'
import { usePlanWindow, useRested } from './use-plan-zoom.ts'
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
  problems?: readonly RoofProblem[] | undefined
  units?: LengthUnits
  /** What the drawing is of, for a screen reader. */
  label?: string
  legendWords?: LegendWords
  maxHeightPx?: number
  /** Given where the roof changes as somebody types: no key waits for the words on the plan. */
  layOut?: LayOutPlan | undefined
  onPick?: (mark: string) => void
}

const noMarks: ReadonlySet<string> = new Set()
const noProblems: readonly RoofProblem[] = []
const noLayers: ReadonlySet<PlanLayer> = new Set()
const pageWidthPx = 720
/** Drawn no larger than this, px a millimetre of roof: a rafter as thick as a thumb's half. */
const largestScale = 0.2
/** The rule round the window, which stays when nothing is drawn larger so that nothing jumps. */
const frameRulePx = 1
const paperSteps = [1, 1.25, 1.5, 1.8]
const dayWords: LegendWords = { due: 'Due today', done: 'Done', rest: 'The rest' }

/** The roof from above: plates, roof lines, every timber with its mark, and what is due and done. */
export function RoofPlan(props: Props) {
  const { spec, selected = null, onPick } = props
  const { due = noMarks, done = noMarks } = props
  const [boxRef, boxWidthPx] = useWidth<HTMLDivElement>(pageWidthPx)
  const [hiddenLayers, setHiddenLayers] = useState(noLayers)
  const [zoom, setZoom] = useState<number>(1)
  const laidOutZoom = useRested(zoom)
  const heightPx = props.maxHeightPx ?? Math.max(boxWidthPx, 420)
  const room = { widthPx: Math.max(boxWidthPx, 200), heightPx, hiddenLayers }
  const { draw, drawing } = useDrawing(props, room, laidOutZoom)
  const maxZoom = largestZoom(drawing, laidOutZoom)
  const zoomTo = usePlanWindow(boxRef, drawing?.view ?? null, { zoom, setZoom, maxZoom })
  useBringIntoSight(spec, selected, zoom, zoomTo)
  const showsDay = props.due !== undefined || props.done !== undefined
  const stateOf = useCallback(
    (mark: string): MemberState => {
      if (!showsDay) return 'plain'
      if (done.has(mark)) return 'done'
      return due.has(mark) ? 'due' : 'rest'
    },
    [showsDay, due, done],
  )
  const layers = useMemo(() => planLayersIn(spec?.members ?? []), [spec])
  const onWriteAll = () => {
    const enough = zoomSteps.find((step) => step > zoom && isAllWritten(draw(step)))
    zoomTo(Math.min(enough ?? maxZoom, maxZoom))
  }
  return (
    <figure className="m-0 flex min-w-0 flex-col gap-2">
      <PlanLayerKeys layers={layers} hidden={hiddenLayers} onChange={setHiddenLayers} />
      <div
        ref={boxRef}
        tabIndex={zoom > 1 ? 0 : undefined}
        role={zoom > 1 ? 'group' : undefined}
        aria-label={zoom > 1 ? 'Plan drawn larger: scroll to see the rest' : undefined}
        style={{ maxHeight: heightPx + 2 * frameRulePx }}
        className={`max-w-full overflow-auto rounded-md border print:max-h-none! print:overflow-visible print:border-0 ${zoom > 1 ? 'cursor-grab border-rule' : 'border-transparent'}`}
      >
        {drawing ? (
          <div style={{ width: `${zoom * 100}%` }} className="print:w-full!">
            <PlanSvg
              drawing={drawing}
              label={props.label ?? 'Roof plan'}
              showsRoofLines={!showsDay}
              stateOf={stateOf}
              selected={selected}
              onPick={onPick}
            />
          </div>
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
            onWriteAll={maxZoom > zoom + 0.01 ? onWriteAll : null}
          />
          <ZoomButtons zoom={zoom} maxZoom={maxZoom} onZoom={zoomTo} />
        </figcaption>
      ) : null}
    </figure>
  )
}

type Room = { widthPx: number; heightPx: number; hiddenLayers: ReadonlySet<PlanLayer> }

/** The drawing as it is laid out now, and at any other size. */
function useDrawing(props: Props, room: Room, zoom: number) {
  const { roof, spec, layOut } = props
  const optionsAt = useOptions(props, room)
  const options = useMemo(() => optionsAt(zoom), [optionsAt, zoom])
  const draw = useCallback(
    (size: number) => planDrawing(roof, spec, optionsAt(size)),
    [roof, spec, optionsAt],
  )
  const drawNow = useCallback(() => draw(zoom), [draw, zoom])
  const drawBare = useCallback(() => planDrawing(roof, null, options), [roof, options])
  const laid = useLaidPlan({ draw: drawNow, drawBare, layOut, options })
  const isPrinting = usePrinting()
  const forPaper = useMemo(() => (isPrinting ? drawForPaper(draw) : null), [isPrinting, draw])
  return { draw, drawing: forPaper ?? laid }
}

function useOptions(props: Props, room: Room): (zoom: number) => PlanDrawingOptions {
  const { mode = 'read', units = 'mm', selected = null } = props
  const { due = noMarks, problems = noProblems } = props
  const { widthPx, heightPx, hiddenLayers } = room
  return useCallback(
    (zoom) => ({
      widthPx: widthPx * zoom,
      maxHeightPx: heightPx * zoom,
      mode,
      units,
      problems,
      firstMarks: new Set([...(selected ? [selected] : []), ...due]),
      hiddenLayers,
    }),
    [widthPx, heightPx, mode, units, problems, selected, due, hiddenLayers],
  )
}

/** Paper is not drawn larger by hand: its words are set as small as all of them need, within reason. */
function drawForPaper(draw: (zoom: number) => PlanDrawing | null): PlanDrawing | null {
  const enough = paperSteps.find((step) => isAllWritten(draw(step))) ?? paperSteps.at(-1) ?? 1
  return draw(enough)
}

function isAllWritten(drawing: PlanDrawing | null): boolean {
  return drawing !== null && drawing.hiddenMarks.length === 0
}

function largestZoom(drawing: PlanDrawing | null, laidOutZoom: number): number {
  if (!drawing) return 1
  const fitted = drawing.view.pxPerMm / laidOutZoom
  return Math.min(Math.max(largestScale / fitted, 3), zoomSteps.at(-1) ?? 1)
}

/** In a plan drawn larger, a timber picked elsewhere comes into the middle. */
function useBringIntoSight(
  spec: FrameSpec | null,
  selected: string | null,
  zoom: number,
  zoomTo: ReturnType<typeof usePlanWindow>,
): void {
  const seen = useRef(selected)
  useEffect(() => {
    if (seen.current === selected) return
    seen.current = selected
    const axis = spec?.members.find((member) => member.mark === selected)?.axis
    if (!axis || zoom <= 1) return
    zoomTo(zoom, { x: (axis.from.x + axis.to.x) / 2, y: (axis.from.y + axis.to.y) / 2 })
  }, [spec, selected, zoom, zoomTo])
}

type SvgProps = {
  drawing: PlanDrawing
  label: string
  showsRoofLines: boolean
  stateOf: (mark: string) => MemberState
  selected: string | null
  onPick: ((mark: string) => void) | undefined
}

const PlanSvg = memo(function PlanSvg(props: SvgProps) {
  const { drawing, label, showsRoofLines, stateOf, selected, onPick } = props
  const { widthPx, heightPx } = drawing.view
  return (
    <svg
      viewBox={`0 0 ${widthPx} ${heightPx}`}
      role={onPick ? 'group' : 'img'}
      aria-label={label}
      className="block h-auto w-full max-w-none font-sans select-none"
    >
      <PlanGround drawing={drawing} showsRoofLines={showsRoofLines} />
      <PlanTimbers drawing={drawing} stateOf={stateOf} selected={selected} onPick={onPick} />
      <PlanMeasures drawing={drawing} />
      <PlanProblems drawing={drawing} />
    </svg>
  )
})
