import { svgPoints, type Segment } from '../../shared/drawing/drawing-geometry.ts'
import type { TimberDrawing } from '../../shared/drawing/timber-drawing.ts'
import { timberTextPx, type TimberCallout } from '../../shared/drawing/timber-texts.ts'
import type { TimberDimension } from '../../shared/drawing/timber-texts.ts'

type Props = { drawing: TimberDrawing; label: string }

export function TimberSvg({ drawing, label }: Props) {
  const { widthPx, heightPx } = drawing
  return (
    <svg
      viewBox={`0 0 ${widthPx} ${heightPx}`}
      role="img"
      aria-label={label}
      fontSize={timberTextPx}
      className="block h-auto w-full bg-sheet font-sans"
    >
      {[...drawing.topPieces, ...drawing.sidePieces].map((piece, i) => (
        <polygon
          key={i}
          points={svgPoints(piece)}
          strokeLinejoin="round"
          className="fill-paper stroke-ink [stroke-width:1.75]"
        />
      ))}
      {drawing.lines.map((line, i) => (
        <Line
          key={i}
          line={line}
          className={
            line.isHidden
              ? 'stroke-ink-soft [stroke-width:1] [stroke-dasharray:4_3]'
              : 'stroke-ink [stroke-width:1.75]'
          }
        />
      ))}
      {drawing.fineLines.map((line, i) => (
        <Line key={i} line={line} className="stroke-ink-soft [stroke-width:1]" />
      ))}
      {drawing.setOutLines.map((line, i) => (
        <Line
          key={i}
          line={line}
          className="stroke-chalk [stroke-width:1.75] [stroke-dasharray:9_3_2_3]"
        />
      ))}
      {drawing.dimensions.map((dimension, i) => (
        <DimensionLine key={i} dimension={dimension} />
      ))}
      {drawing.dimensions.map((dimension, i) => (
        <DimensionText key={i} dimension={dimension} />
      ))}
      {drawing.callouts.map((callout, i) => (
        <Callout key={i} callout={callout} />
      ))}
      {drawing.points.map(({ at, isLong }, i) => (
        <circle
          key={i}
          cx={at.x}
          cy={at.y}
          r={4}
          className={`stroke-clay [stroke-width:2] ${isLong ? 'fill-clay' : 'fill-sheet'}`}
        />
      ))}
      {drawing.letters.map(({ letter, at }, i) => (
        <Letter key={i} letter={letter} x={at.x} y={at.y} />
      ))}
      {drawing.texts.map(({ text, x, baselineY }) => (
        <text key={text} x={x} y={baselineY} className="fill-ink">
          {text}
        </text>
      ))}
    </svg>
  )
}

function Line({ line, className }: { line: Segment; className: string }) {
  return (
    <line
      x1={line.from.x}
      y1={line.from.y}
      x2={line.to.x}
      y2={line.to.y}
      strokeLinecap="round"
      className={className}
    />
  )
}

const haloClasses = 'stroke-sheet [stroke-width:4] [paint-order:stroke] [stroke-linejoin:round]'

/** Arrowheads at both ends, fine lines to what is measured. */
function DimensionLine({ dimension }: { dimension: TimberDimension }) {
  const { fromX, toX, lineY, fromY, toY } = dimension
  const way = toX >= fromX ? 1 : -1
  const arrow = (x: number, side: number) => `M${x} ${lineY}l${5 * side} -3v6z`
  const beyond = lineY < fromY ? -3 : 3
  return (
    <g className="stroke-ink-soft [stroke-width:1]">
      <path
        d={`M${fromX} ${fromY}V${lineY + beyond}M${toX} ${toY}V${lineY + beyond}`}
        className="opacity-60"
      />
      <path d={`M${fromX} ${lineY}H${toX}`} />
      <path d={arrow(fromX, way) + arrow(toX, -way)} className="fill-ink-soft stroke-none" />
    </g>
  )
}

/** Over its line, and over any other line that passes. */
function DimensionText({ dimension }: { dimension: TimberDimension }) {
  const { text, textX, lineY, isMain } = dimension
  return (
    <text
      x={textX}
      y={lineY - 4}
      textAnchor="middle"
      className={`fill-ink tabular-nums ${haloClasses} ${isMain ? 'font-extrabold' : 'font-semibold'}`}
    >
      {text}
    </text>
  )
}

function Callout({ callout }: { callout: TimberCallout }) {
  const { text, letter, x, baselineY, widthPx, leader } = callout
  const letterX = x - widthPx / 2 + 9
  return (
    <g>
      <Line line={leader} className="stroke-ink-soft [stroke-width:0.75]" />
      {letter ? <Letter letter={letter} x={letterX} y={baselineY - 4.5} /> : null}
      <text
        x={letter ? letterX + 12 : x}
        y={baselineY}
        textAnchor={letter ? 'start' : 'middle'}
        className={`fill-ink ${haloClasses}`}
      >
        {text}
      </text>
    </g>
  )
}

function Letter({ letter, x, y }: { letter: string; x: number; y: number }) {
  return (
    <g>
      <circle cx={x} cy={y} r={8.5} className="fill-sheet stroke-ink [stroke-width:1]" />
      <text
        x={x}
        y={y}
        dy="0.35em"
        textAnchor="middle"
        className="fill-ink text-[12px] font-extrabold"
      >
        {letter}
      </text>
    </g>
  )
}
