import { svgPoints } from '../../../shared/drawing/drawing-geometry.ts'
import { laidOutline, laidPoint, type WingLie } from '../../../shared/outline/wing-outlines.ts'
import type { RoofForm } from '../../../shared/revisions/roof-form.ts'
import type { WingShape } from '../../../shared/revisions/wing-form.ts'
import {
  wingFigures,
  type WingFigures,
  wingLie,
  wingMeasures,
  wingOutlineOf,
} from '../../../shared/revisions/wing-measures.ts'
import { wingProblems } from '../../../shared/revisions/wing-problems.ts'
import type { Point2 } from '../../../shared/roof/roof-types.ts'

/** Proportions that show a shape well while its measures are not typed. */
const samples: Record<WingShape, WingFigures> = {
  l: { A: 12, B: 9, C: 4.5, D: 4.5, E: NaN, F: NaN },
  t: { A: 12, B: 5, C: 4.5, D: 4, E: 3.5, F: NaN },
  u: { A: 13, B: 9, C: 4.5, D: 4, E: 4, F: 8 },
  cross: { A: 13, B: 5, C: 4.5, D: 3.5, E: 2.5, F: 4 },
}

/** A measure on the sketch: its two ends, and which way its line stands off them. */
type Mark = { letter: string; from: Point2; to: Point2; off: Point2 }

const down = { x: 0, y: -1 }
const up = { x: 0, y: 1 }
const left = { x: -1, y: 0 }
const right = { x: 1, y: 0 }
const none = { x: 0, y: 0 }

function marksOf(shape: WingShape, { A, B, C, D, E, F }: WingFigures): Mark[] {
  const mark = (letter: string, from: [number, number], to: [number, number], off: Point2) => ({
    letter,
    from: { x: from[0], y: from[1] },
    to: { x: to[0], y: to[1] },
    off,
  })
  if (shape === 'l') {
    return [
      mark('A', [0, 0], [A, 0], down),
      mark('B', [0, 0], [0, B], left),
      mark('C', [A, 0], [A, C], right),
      mark('D', [0, B], [D, B], up),
    ]
  }
  if (shape === 't') {
    return [
      mark('A', [0, 0], [A, 0], down),
      mark('B', [0, 0], [0, B], left),
      mark('C', [E, B + D], [E + C, B + D], up),
      mark('D', [E + C, B], [E + C, B + D], right),
      mark('E', [0, B], [E, B], up),
    ]
  }
  if (shape === 'u') {
    const middle = (D + A - E) / 2
    return [
      mark('A', [0, 0], [A, 0], down),
      mark('B', [0, 0], [0, B], left),
      mark('C', [middle, 0], [middle, C], none),
      mark('D', [0, B], [D, B], up),
      mark('E', [A - E, F], [A, F], up),
      mark('F', [A, 0], [A, F], right),
    ]
  }
  return [
    mark('A', [0, 0], [A, 0], down),
    mark('B', [0, E], [0, E + B], left),
    mark('C', [F, E + B + D], [F + C, E + B + D], up),
    mark('D', [F + C, E + B], [F + C, E + B + D], right),
    mark('E', [F + C, 0], [F + C, E], right),
    mark('F', [0, E + B], [F, E + B], up),
  ]
}

const widthPx = 300
const heightPx = 190
const marginPx = 34
const offPx = 16

/** The shape as it lies, its measures named by the letters of their fields; to scale once they are typed. */
export function WingSketch({ form, shape }: { form: RoofForm; shape: WingShape }) {
  const { figures, isToScale } = figuresShown(form, shape)
  const lie = wingLie(form)
  const outline = laidOutline(wingOutlineOf(shape, figures), lie).map(({ start }) => start)
  const place = placer(wingOutlineOf(shape, figures), lie)
  const marks = marksOf(shape, figures).filter(({ from, to }) => isLong(from, to))
  const names = wingMeasures[shape].map(({ letter, label }) => `${letter} ${label}`)
  return (
    <figure className="col-span-2 m-0">
      <svg
        viewBox={`0 0 ${widthPx} ${heightPx}`}
        role="img"
        aria-label={`Sketch: ${names.join(', ')}`}
        className="mx-auto block h-auto w-full max-w-80"
      >
        <polygon
          points={svgPoints(outline.map(place.laid))}
          strokeLinejoin="round"
          className={`fill-paper stroke-ink [stroke-width:2] ${isToScale ? '' : '[stroke-dasharray:6_4]'}`}
        />
        {marks.map((mark) => (
          <SketchMark key={mark.letter} mark={mark} place={place.own} lie={lie} />
        ))}
      </svg>
      <figcaption className="text-center text-sm text-ink-soft">
        {isToScale ? 'To scale' : 'Not to scale until every measure is typed'}
      </figcaption>
    </figure>
  )
}

function SketchMark(props: { mark: Mark; place: (point: Point2) => Point2; lie: WingLie }) {
  const { mark, place, lie } = props
  const off = laidPoint(mark.off, lie)
  const moved = (point: Point2) => {
    const at = place(point)
    return { x: at.x + off.x * offPx, y: at.y - off.y * offPx }
  }
  const [from, to] = [moved(mark.from), moved(mark.to)]
  const middle = { x: (from.x + to.x) / 2, y: (from.y + to.y) / 2 }
  const length = Math.hypot(to.x - from.x, to.y - from.y) || 1
  const across = { x: (-(to.y - from.y) / length) * 4, y: ((to.x - from.x) / length) * 4 }
  const tick = (at: Point2) =>
    `M${at.x - across.x} ${at.y - across.y}L${at.x + across.x} ${at.y + across.y}`
  return (
    <g>
      <path
        d={`M${from.x} ${from.y}L${to.x} ${to.y}${tick(from)}${tick(to)}`}
        className="fill-none stroke-chalk [stroke-width:1.5]"
      />
      <circle cx={middle.x} cy={middle.y} r={10} className="fill-sheet stroke-chalk" />
      <text
        x={middle.x}
        y={middle.y}
        dy="0.35em"
        textAnchor="middle"
        className="fill-chalk text-[13px] font-extrabold"
      >
        {mark.letter}
      </text>
    </g>
  )
}

function figuresShown(form: RoofForm, shape: WingShape) {
  const typed = wingFigures(form, shape)
  const letters = wingMeasures[shape].map(({ letter }) => letter as keyof WingFigures)
  const isRead = letters.every((letter) => typed[letter] > 0)
  const isToScale = isRead && wingProblems(form, shape).length === 0
  return { figures: isToScale ? typed : samples[shape], isToScale }
}

const isLong = (from: Point2, to: Point2) => Math.hypot(to.x - from.x, to.y - from.y) > 0

/** Fits the shape as it lies into the sketch: points of the laid outline, and of the shape's own. */
function placer(own: readonly Point2[], lie: WingLie) {
  const all = own.map((point) => laidPoint(point, lie))
  const [xs, ys] = [all.map((p) => p.x), all.map((p) => p.y)]
  const [low, high] = [Math.min(...ys), Math.max(...ys)]
  const [from, to] = [Math.min(...xs), Math.max(...xs)]
  const scale = Math.min(
    (widthPx - 2 * marginPx) / (to - from || 1),
    (heightPx - 2 * marginPx) / (high - low || 1),
  )
  const leftPx = (widthPx - (to - from) * scale) / 2
  const topPx = (heightPx - (high - low) * scale) / 2
  const laid = ({ x, y }: Point2) => ({
    x: leftPx + x * scale,
    y: topPx + (high - low - y) * scale,
  })
  return {
    laid,
    own: (point: Point2) => {
      const at = laidPoint(point, lie)
      return laid({ x: at.x - from, y: at.y - low })
    },
  }
}
