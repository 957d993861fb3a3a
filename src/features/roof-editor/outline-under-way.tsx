import { pointAlong, svgPoints } from '../../../shared/drawing/drawing-geometry.ts'
import type { PlanView } from '../../../shared/drawing/plan-view.ts'
import { textWidthPx } from '../../../shared/drawing/text-size.ts'
import { edgeLengthMm, outlineCrossings } from '../../../shared/outline/outline-geometry.ts'
import type { Point2 } from '../../../shared/roof/roof-types.ts'
import { formatLength, type LengthUnits } from '../../../shared/units/format-length.ts'
import { angleWords } from './outline-words.ts'
import type { CornerDrag } from './use-corner-drag.ts'

type Props = { outline: readonly Point2[]; drag: CornerDrag; view: PlanView; units: LengthUnits }

/** The outline while a corner is under way: its two sides with their lengths, and what it is in line with. */
export function OutlineUnderWay({ outline, drag, view, units }: Props) {
  const { corner } = drag
  const count = outline.length
  const before = (corner + count - 1) % count
  const at = view.place(drag.at)
  return (
    <g aria-hidden="true" className="pointer-events-none">
      {drag.guides.map(({ from }, i) => {
        const start = view.place(from)
        return (
          <line
            key={i}
            x1={start.x}
            y1={start.y}
            x2={at.x}
            y2={at.y}
            className="stroke-clay [stroke-dasharray:3_4] [stroke-width:1.5]"
          />
        )
      })}
      <polygon
        points={svgPoints(outline.map(view.place))}
        strokeLinejoin="round"
        className="fill-none stroke-chalk [stroke-width:2.5]"
      />
      {outlineCrossings(outline).map(({ at: crossing }, i) => {
        const place = view.place(crossing)
        return (
          <path
            key={i}
            d={`M${place.x - 8} ${place.y - 8}l16 16m0 -16l-16 16`}
            className="stroke-stop [stroke-width:4]"
          />
        )
      })}
      {[before, corner].map((edge) => (
        <LengthChip key={edge} {...{ outline, view, units, edge }} />
      ))}
      <Chip at={{ x: at.x, y: at.y - 34 }} text={angleWords(outline, corner)} />
      <rect
        x={at.x - 7}
        y={at.y - 7}
        width={14}
        height={14}
        rx={2}
        className="fill-clay stroke-sheet [stroke-width:1.5]"
      />
    </g>
  )
}

type LengthProps = Pick<Props, 'outline' | 'view' | 'units'> & { edge: number }

function LengthChip({ outline, view, units, edge }: LengthProps) {
  const [from, to] = [outline[edge], outline[(edge + 1) % outline.length]]
  if (!from || !to) return null
  const middle = pointAlong({ from: view.place(from), to: view.place(to) }, 0.5)
  return <Chip at={middle} text={formatLength(edgeLengthMm(outline, edge), units)} isStrong />
}

const sizePx = 15

function Chip({ at, text, isStrong }: { at: Point2; text: string; isStrong?: boolean }) {
  const widthPx = textWidthPx(text, sizePx) + 10
  return (
    <g transform={`translate(${at.x} ${at.y})`}>
      <rect
        x={-widthPx / 2}
        y={-12}
        width={widthPx}
        height={24}
        rx={4}
        className={`fill-sheet ${isStrong ? 'stroke-chalk' : 'stroke-rule'}`}
      />
      <text
        dy="0.35em"
        textAnchor="middle"
        fontSize={sizePx}
        className="fill-ink font-extrabold tabular-nums"
      >
        {text}
      </text>
    </g>
  )
}
