import { memo, type RefObject, useCallback, useEffect, useMemo, useRef, useState } from 'react'
import { type PlanDrawing, planDrawing } from '../../../shared/drawing/plan-drawing.ts'
import type { FrameSpec, Roof } from '../../../shared/roof/roof-types.ts'
import type { LengthUnits } from '../../../shared/units/format-length.ts'
import { PlanLegend } from '../../drawings/plan-legend.tsx'
import { PlanGround, PlanMeasures } from '../../drawings/plan-surround.tsx'
import { usePlanWindow, useRested } from '../../drawings/use-plan-zoom.ts'
import { useWidth } from '../../drawings/use-width.ts'
import { ZoomButtons } from '../../drawings/zoom-buttons.tsx'
import { OutlineFaultMarks } from './outline-fault-marks.tsx'
import type { OutlineFault } from './outline-faults.ts'
import { type HandleActions, OutlineHandles, type OutlinePart } from './outline-handles.tsx'
import { OutlineUnderWay } from './outline-under-way.tsx'
import { cornerWords, snapWords } from './outline-words.ts'
import { type CornerDrag, useCornerDrag } from './use-corner-drag.ts'
import type { OutlineActions } from './use-outline-actions.ts'

type Props = {
  roof: Roof
  /** For the lines of the roof; null while it cannot be framed. */
  spec: FrameSpec | null
  faults: readonly OutlineFault[]
  units: LengthUnits
  gridMm: number
  maxHeightPx: number
  picked: OutlinePart | null
  actions: OutlineActions
  /** With the handle it was picked by, to stand beside. */
  onPick: (part: OutlinePart, handle: Element | null) => void
}

const pageWidthPx = 720
const noMarks: ReadonlySet<string> = new Set()
const largestZoom = 8

/** The plan as an outline to change: corners to drag, edges to tap, what is wrong marked on it. */
export function OutlineDrawing(props: Props) {
  const { roof, units, gridMm, maxHeightPx, picked, faults, actions, onPick } = props
  const [boxRef, boxWidthPx] = useWidth<HTMLDivElement>(pageWidthPx)
  const svgRef = useRef<SVGSVGElement>(null)
  const [zoom, setZoom] = useState(1)
  const [moved, setMoved] = useState<number | null>(null)
  const drawing = useOutlinePlan(props, boxWidthPx, useRested(zoom))
  const { view } = drawing
  const zoomTo = usePlanWindow(boxRef, view, { zoom, setZoom, maxZoom: largestZoom })
  const focusCorner = useFocusAfter(svgRef, roof)
  const handles = useMemo((): HandleActions => {
    return {
      onPick: (part) =>
        onPick(part, svgRef.current?.querySelector(`[data-${part.kind}="${part.index}"]`) ?? null),
      onNudge: (corner, byMm) => {
        setMoved(corner)
        actions.nudge(corner, byMm)
      },
      onTakeOut: (corner) => {
        if (actions.takeOut(corner)) focusCorner(Math.max(corner - 1, 0))
      },
      onAddOn: (edge) => {
        if (actions.addOn(edge)) focusCorner(edge + 1)
      },
    }
  }, [actions, focusCorner, onPick])
  const drag = useCornerDrag(svgRef, {
    view,
    outline: roof.outline,
    gridMm,
    onDrop: (corner, at) => {
      setMoved(corner)
      actions.drop(corner, at)
    },
    onTap: (index) => handles.onPick({ kind: 'corner', index }),
  })
  const underWay = drag ? roof.outline.with(drag.corner, drag.at) : null
  return (
    <figure className="m-0 flex min-w-0 flex-col gap-2">
      <p
        role="status"
        aria-live={drag ? 'off' : 'polite'}
        className="flex min-h-11 items-center text-sm font-semibold tabular-nums"
      >
        {sayWhere(drag, underWay ?? roof.outline, moved, units)}
      </p>
      <div
        ref={boxRef}
        style={{ maxHeight: maxHeightPx }}
        className={`max-w-full overflow-auto ${zoom > 1 ? 'cursor-grab rounded-md border border-rule' : ''}`}
      >
        <div style={{ width: `${zoom * 100}%` }}>
          <svg
            ref={svgRef}
            viewBox={`0 0 ${view.widthPx} ${view.heightPx}`}
            role="group"
            aria-label="Outline of the plates: edges and corners"
            className="block h-auto w-full max-w-none font-sans select-none"
          >
            <OutlineGround drawing={drawing} isFaint={drag !== null} />
            <g className={drag ? 'invisible' : undefined}>
              <OutlineHandles {...{ roof, view, units, picked }} actions={handles} />
              <OutlineFaultMarks {...{ roof, view, faults }} />
            </g>
            {drag && underWay ? (
              <OutlineUnderWay outline={underWay} {...{ drag, view, units }} />
            ) : null}
          </svg>
        </div>
      </div>
      <figcaption className="flex flex-wrap items-center justify-between gap-2">
        <PlanLegend scaleBar={drawing.scaleBar} words={null} hiddenCount={0} onWriteAll={null} />
        <ZoomButtons zoom={zoom} maxZoom={largestZoom} onZoom={zoomTo} />
      </figcaption>
    </figure>
  )
}

/** Plates, tails, roof lines and dimensions; no timbers, so that the outline is easy to take hold of. */
function useOutlinePlan(props: Props, boxWidthPx: number, zoom: number): PlanDrawing {
  const { roof, spec, maxHeightPx, units } = props
  return useMemo(() => {
    const drawing = planDrawing(roof, spec && { ...spec, members: [], cutLines: [] }, {
      widthPx: Math.max(boxWidthPx, 200) * zoom,
      maxHeightPx: maxHeightPx * zoom,
      mode: 'edit',
      units,
      problems: [],
      firstMarks: noMarks,
    })
    if (!drawing) throw new Error('An outline is drawn only where every corner can be read.')
    return drawing
  }, [roof, spec, boxWidthPx, maxHeightPx, zoom, units])
}

const OutlineGround = memo(function OutlineGround(props: {
  drawing: PlanDrawing
  isFaint: boolean
}) {
  return (
    <g className={props.isFaint ? 'opacity-35' : undefined}>
      <PlanGround drawing={props.drawing} showsRoofLines />
      <PlanMeasures drawing={props.drawing} />
    </g>
  )
})

function sayWhere(
  drag: CornerDrag | null,
  outline: Roof['outline'],
  moved: number | null,
  units: LengthUnits,
): string {
  if (drag) {
    const snaps = drag.guides.map(({ why }) => snapWords(why))
    return [cornerWords(outline, drag.corner, units), ...snaps].join(', ')
  }
  if (moved !== null && moved < outline.length) return cornerWords(outline, moved, units)
  return 'Drag a corner, or tap an edge for its pitch or a gable.'
}

/** Once the outline has followed a corner added or taken out, the cursor stands on a corner again. */
function useFocusAfter(svgRef: RefObject<SVGSVGElement | null>, roof: Roof) {
  const nextRef = useRef<number | null>(null)
  useEffect(() => {
    if (nextRef.current === null) return
    svgRef.current?.querySelector<SVGElement>(`[data-corner="${nextRef.current}"]`)?.focus()
    nextRef.current = null
  }, [svgRef, roof.outline.length])
  return useCallback((corner: number) => {
    nextRef.current = corner
  }, [])
}
