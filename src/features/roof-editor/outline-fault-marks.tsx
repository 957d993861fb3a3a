import { pointAlong } from '../../../shared/drawing/drawing-geometry.ts'
import type { PlanView } from '../../../shared/drawing/plan-view.ts'
import { outlineCrossings } from '../../../shared/outline/outline-geometry.ts'
import type { Point2, Roof } from '../../../shared/roof/roof-types.ts'
import { edgeLine } from './outline-chips.ts'
import type { OutlineFault } from './outline-faults.ts'

type Props = { roof: Roof; view: PlanView; faults: readonly OutlineFault[] }

/** What is wrong, where it is wrong, with the number it has in the list. */
export function OutlineFaultMarks({ roof, view, faults }: Props) {
  return (
    <g>
      {faults.map((fault) =>
        fault.at ? <FaultMark key={fault.message} roof={roof} view={view} fault={fault} /> : null,
      )}
    </g>
  )
}

function FaultMark({ roof, view, fault }: { roof: Roof; view: PlanView; fault: OutlineFault }) {
  const at = placeOf(fault, roof, view)
  if (!at) return null
  return (
    <g role="img" aria-label={`${fault.number}: ${fault.message}`} className="pointer-events-none">
      {edgesOf(fault).map((edge) => {
        const { from, to } = edgeLine(roof, view, edge)
        return (
          <line
            key={edge}
            x1={from.x}
            y1={from.y}
            x2={to.x}
            y2={to.y}
            className="stroke-stop [stroke-dasharray:7_4] [stroke-width:4]"
          />
        )
      })}
      {fault.at?.kind === 'corner' ? (
        <circle
          cx={at.corner.x}
          cy={at.corner.y}
          r={15}
          className="fill-none stroke-stop [stroke-width:3]"
        />
      ) : null}
      <path
        d={`M${at.mark.x} ${at.mark.y - 15}l15 26h-30z`}
        strokeLinejoin="round"
        className="fill-stop stroke-sheet [stroke-width:1.5]"
      />
      <text
        x={at.mark.x}
        y={at.mark.y + 8}
        textAnchor="middle"
        className="fill-sheet text-[14px] font-extrabold"
      >
        {fault.number}
      </text>
    </g>
  )
}

function edgesOf({ at }: OutlineFault): number[] {
  if (at?.kind === 'edge') return [at.index]
  return at?.kind === 'crossing' ? at.edges : []
}

/** Where the number stands: on its edge, inside its corner, at the crossing. */
function placeOf({ at }: OutlineFault, roof: Roof, view: PlanView) {
  if (!at) return null
  if (at.kind === 'crossing') {
    const [i, j] = at.edges
    const found = outlineCrossings(roof.outline).find(
      ({ edges }) => edges[0] === i && edges[1] === j,
    )
    const place = found ? view.place(found.at) : null
    return place && { mark: place, corner: place }
  }
  if (at.kind === 'edge') {
    const place = pointAlong(edgeLine(roof, view, at.index), 0.32)
    return { mark: place, corner: place }
  }
  const corner = roof.outline[at.index]
  if (!corner) return null
  const place = view.place(corner)
  const way = inwardOf(roof.outline, at.index)
  return { mark: { x: place.x + way.x * 34, y: place.y - way.y * 34 }, corner: place }
}

/** From a corner towards the middle of its neighbours; y up. */
function inwardOf(outline: readonly Point2[], corner: number): Point2 {
  const count = outline.length
  const [own, before, after] = [
    outline[corner],
    outline[(corner + count - 1) % count],
    outline[(corner + 1) % count],
  ]
  if (!own || !before || !after) return { x: 0, y: 0 }
  const unit = (to: Point2) => {
    const length = Math.hypot(to.x - own.x, to.y - own.y) || 1
    return { x: (to.x - own.x) / length, y: (to.y - own.y) / length }
  }
  const [a, b] = [unit(before), unit(after)]
  const sum = { x: a.x + b.x, y: a.y + b.y }
  const length = Math.hypot(sum.x, sum.y)
  return length < 0.05 ? { x: -a.y, y: a.x } : { x: sum.x / length, y: sum.y / length }
}
