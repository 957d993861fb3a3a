import type { Point2 } from './roof-types.ts'
import type { Front } from './wavefront-types.ts'
import { add2, cross2, distance2, dot2, left2, scale2, sub2, unit2 } from './vector.ts'

/** Two fronts whose directions differ by less than this (sine) run one way. */
const oneWaySine = 0.001
/** Fronts off one line by less than this are in one line: float noise. */
const exactMm = 1e-4
/** Plates off one line by up to this, each way, are meant to be in one line. */
const alignMm = 1

const midpoint = (front: Front): Point2 => scale2(add2(front.from, front.to), 0.5)

/** Whether two fronts run the same way. */
export const runOneWay = (a: Front, b: Front): boolean =>
  dot2(a.along, b.along) > 0 && Math.abs(cross2(a.along, b.along)) < oneWaySine

/** The line that fits some fronts best, longer ones counting for more, and how far their ends are off it. */
const commonLine = (fronts: readonly Front[]) => {
  let [weight, middle, along] = [0, { x: 0, y: 0 }, { x: 0, y: 0 }]
  for (const front of fronts) {
    const lengthMm = distance2(front.from, front.to)
    weight += lengthMm
    middle = add2(middle, scale2(midpoint(front), lengthMm))
    along = add2(along, scale2(front.along, lengthMm))
  }
  middle = scale2(middle, 1 / weight)
  // the ends far apart tell the direction better than the plates' own
  const turns = fronts.map((front) => sub2(midpoint(front), middle))
  const far = turns.reduce((a, b) => (Math.hypot(b.x, b.y) > Math.hypot(a.x, a.y) ? b : a))
  const reach = Math.hypot(far.x, far.y)
  if (reach > 1) along = scale2(far, Math.sign(dot2(far, along)) / reach)
  along = unit2(along)
  const inward = left2(along)
  const offMm = Math.max(
    ...fronts.flatMap(({ from, to }) =>
      [from, to].map((end) => Math.abs(dot2(inward, sub2(end, middle)))),
    ),
  )
  return { middle, along, inward, offMm }
}

type Fit = 'exact' | 'near' | 'apart'

/** Whether fronts of one speed that run one way lie in one line. */
export const fitOf = (a: Front, b: Front): Fit => {
  const { offMm } = commonLine([a, b])
  return offMm <= exactMm ? 'exact' : offMm <= alignMm ? 'near' : 'apart'
}

/** The fronts put into one line. */
export const alignFronts = (fronts: readonly Front[]): Front[] => {
  const { middle, along, inward } = commonLine(fronts)
  const onLine = (p: Point2) => add2(middle, scale2(along, dot2(along, sub2(p, middle))))
  return fronts.map((front) => ({
    ...front,
    from: onLine(front.from),
    to: onLine(front.to),
    along,
    inward,
  }))
}
