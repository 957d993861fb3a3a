import { type Segment, svgPoints } from '../../shared/drawing/drawing-geometry.ts'
import type { PlanDimension } from '../../shared/drawing/plan-dimensions.ts'
import type { PlanDrawing } from '../../shared/drawing/plan-drawing.ts'

const lineKindClasses: Record<string, string> = {
  ridge: 'stroke-ink [stroke-width:2]',
  hip: 'stroke-ink [stroke-width:1.5]',
  'broken-hip': 'stroke-ink [stroke-width:1.5]',
  valley: 'stroke-ink [stroke-width:1.5] [stroke-dasharray:8_3]',
}

type GroundProps = { drawing: PlanDrawing; showsRoofLines: boolean }

/** What the timbers stand on: plates, the line of the tails, and the lines of the roof. */
export function PlanGround({ drawing, showsRoofLines }: GroundProps) {
  return (
    <g>
      <polygon
        points={svgPoints(drawing.tails)}
        className="fill-sheet stroke-ink-soft [stroke-width:1] [stroke-dasharray:5_4]"
      />
      <polygon
        points={svgPoints(drawing.plateInner)}
        className="fill-none stroke-ink-soft [stroke-width:0.75]"
      />
      <polygon
        points={svgPoints(drawing.plateOuter)}
        strokeLinejoin="round"
        className="fill-none stroke-ink [stroke-width:1.5]"
      />
      {(showsRoofLines ? drawing.roofLines : []).map(({ kind, segment }, i) => (
        <line
          key={i}
          x1={segment.from.x}
          y1={segment.from.y}
          x2={segment.to.x}
          y2={segment.to.y}
          className={lineKindClasses[kind]}
        />
      ))}
    </g>
  )
}

/** Lengths of the plates, corner numbers, and the scale. */
export function PlanMeasures({ drawing }: { drawing: PlanDrawing }) {
  return (
    <g aria-hidden="true">
      {drawing.dimensions.map((dimension) => (
        <Dimension key={dimension.edge} dimension={dimension} />
      ))}
      {drawing.corners.map(({ corner, at, radiusPx, leader }) => (
        <g key={corner}>
          {leader ? <FineLine line={leader} /> : null}
          <circle
            cx={at.x}
            cy={at.y}
            r={radiusPx}
            className="fill-sheet stroke-ink [stroke-width:1]"
          />
          <text
            x={at.x}
            y={at.y}
            dy="0.35em"
            textAnchor="middle"
            className="fill-ink text-[11px] font-extrabold"
          >
            {corner + 1}
          </text>
        </g>
      ))}
    </g>
  )
}

/** From a word to what it names, with a dot at that end. */
export function FineLine({ line }: { line: Segment }) {
  return (
    <g className="pointer-events-none">
      <line
        x1={line.from.x}
        y1={line.from.y}
        x2={line.to.x}
        y2={line.to.y}
        className="stroke-ink-soft [stroke-width:0.75]"
      />
      <circle cx={line.to.x} cy={line.to.y} r={1.75} className="fill-ink-soft stroke-none" />
    </g>
  )
}

function Dimension({ dimension: { line, ticks, label } }: { dimension: PlanDimension }) {
  return (
    <g className="stroke-ink-soft [stroke-width:1]">
      {[line, ...ticks].map((part, i) => (
        <line key={i} x1={part.from.x} y1={part.from.y} x2={part.to.x} y2={part.to.y} />
      ))}
      {label?.leader ? <FineLine line={label.leader} /> : null}
      {label ? (
        <text
          transform={`translate(${label.centre.x} ${label.centre.y}) rotate(${label.angleDeg})`}
          dy="0.35em"
          textAnchor="middle"
          fontSize={label.sizePx}
          className="fill-ink stroke-sheet font-semibold tabular-nums [stroke-width:3] [paint-order:stroke] [stroke-linejoin:round]"
        >
          {label.text}
        </text>
      ) : null}
    </g>
  )
}

/** What is wrong, where it is wrong. */
export function PlanProblems({ drawing }: { drawing: PlanDrawing }) {
  return (
    <g>
      {drawing.problems.map(({ problem, at, edge }, i) => (
        <g key={i} role="img" aria-label={problem.message}>
          <title>{problem.message}</title>
          {edge ? (
            <line
              x1={edge.from.x}
              y1={edge.from.y}
              x2={edge.to.x}
              y2={edge.to.y}
              className="stroke-stop [stroke-width:4] [stroke-dasharray:7_4]"
            />
          ) : null}
          <path
            d={`M${at.x} ${at.y - 12}l12 21h-24z`}
            strokeLinejoin="round"
            className="fill-stop stroke-sheet [stroke-width:1.5]"
          />
          <text
            x={at.x}
            y={at.y + 6}
            textAnchor="middle"
            className="fill-sheet text-[13px] font-extrabold"
          >
            !
          </text>
        </g>
      ))}
    </g>
  )
}
