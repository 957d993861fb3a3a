import type { Complaint } from './report.ts'

/** What a number is bent by: a millimetre, half a degree, a thousandth, or to another slope. */
export type BentBy = 'mm' | 'deg' | 'share' | 'turn' | 'slope'

/**
 * Every number of a member, its cuts and its birdsmouth, and what catches it when it is bent. `rebuild`:
 * the timber sawn from it is not where the spec says; `rule`: it no longer agrees with another number.
 * `says` is how the complaint reads. A number with two lines is caught by one where the other is blind:
 * along a rafter the length is off, across it the plane is.
 */
export type FieldRule = {
  path: string
  by: BentBy
  caught: 'rebuild' | 'rule'
  check: Complaint['check'][]
  says: RegExp
}

const plan = /^run|^set-out|turned off|stands off|over no line|not given where|stand less drop/

export const fieldRules: FieldRule[] = [
  {
    path: 'section.thicknessMm',
    by: 'mm',
    caught: 'rule',
    check: ['numbers'],
    says: /^its section/,
  },
  { path: 'section.depthMm', by: 'mm', caught: 'rule', check: ['numbers'], says: /^its section/ },
  {
    path: 'axis.from.x',
    by: 'mm',
    caught: 'rebuild',
    check: ['numbers', 'cut plane', 'place'],
    says: plan,
  },
  {
    path: 'axis.from.y',
    by: 'mm',
    caught: 'rebuild',
    check: ['numbers', 'cut plane', 'place'],
    says: plan,
  },
  { path: 'axis.from.z', by: 'mm', caught: 'rule', check: ['numbers'], says: /^rise/ },
  {
    path: 'axis.to.x',
    by: 'mm',
    caught: 'rebuild',
    check: ['numbers', 'cut plane', 'place'],
    says: plan,
  },
  {
    path: 'axis.to.y',
    by: 'mm',
    caught: 'rebuild',
    check: ['numbers', 'cut plane', 'place'],
    says: plan,
  },
  { path: 'axis.to.z', by: 'mm', caught: 'rule', check: ['numbers'], says: /^rise/ },
  { path: 'riseMm', by: 'mm', caught: 'rule', check: ['numbers'], says: /^rise/ },
  { path: 'runMm', by: 'mm', caught: 'rule', check: ['numbers'], says: /^run/ },
  {
    path: 'pitchDeg',
    by: 'deg',
    caught: 'rebuild',
    check: ['cut plane'],
    says: /turned off|stands off|not given where/,
  },
  { path: 'setOutLengthMm', by: 'mm', caught: 'rule', check: ['numbers'], says: /^set-out length/ },
  {
    path: 'headDeductionMm',
    by: 'mm',
    caught: 'rule',
    check: ['numbers'],
    says: /^head deduction/,
  },
  {
    path: 'footDeductionMm',
    by: 'mm',
    caught: 'rule',
    check: ['numbers'],
    says: /^foot deduction/,
  },
  { path: 'tailLengthMm', by: 'mm', caught: 'rule', check: ['numbers'], says: /^tail/ },
  { path: 'cutLengthMm', by: 'mm', caught: 'rebuild', check: ['numbers'], says: /^cut length/ },
  { path: 'dropMm', by: 'mm', caught: 'rule', check: ['place', 'beside'], says: /stand less drop/ },
  { path: 'weightKg', by: 'share', caught: 'rule', check: ['numbers'], says: /^weighs/ },
  {
    path: 'planes',
    by: 'slope',
    caught: 'rule',
    check: ['place', 'cut plane', 'beside'],
    says: /./,
  },
  { path: 'backing.leftDeg', by: 'deg', caught: 'rule', check: ['place'], says: /backing/ },
  { path: 'backing.rightDeg', by: 'deg', caught: 'rule', check: ['place'], says: /backing/ },
  {
    path: 'birdsmouth.seatMm',
    by: 'mm',
    caught: 'rule',
    check: ['numbers'],
    says: /^birdsmouth seat is/,
  },
  {
    path: 'birdsmouth.heelMm',
    by: 'mm',
    caught: 'rule',
    check: ['numbers'],
    says: /^birdsmouth heel is/,
  },
  {
    path: 'birdsmouth.depthMm',
    by: 'mm',
    caught: 'rule',
    check: ['numbers'],
    says: /^birdsmouth depth/,
  },
  { path: 'birdsmouth.standMm', by: 'mm', caught: 'rule', check: ['place'], says: /^its stand/ },
  {
    path: 'birdsmouth.bearingMm',
    by: 'mm',
    caught: 'rebuild',
    check: ['seat'],
    says: /of bearing published/,
  },
  {
    path: 'birdsmouth.heelOffsetMm',
    by: 'mm',
    caught: 'rebuild',
    check: ['numbers'],
    says: /^birdsmouth depth/,
  },
  {
    path: 'birdsmouth.seatFromEdgeDeg',
    by: 'deg',
    caught: 'rule',
    check: ['numbers'],
    says: /^birdsmouth seat angle/,
  },
  {
    path: 'birdsmouth.heelFromEdgeDeg',
    by: 'deg',
    caught: 'rule',
    check: ['numbers'],
    says: /^birdsmouth heel angle/,
  },
  {
    path: 'cuts.plane.point.x',
    by: 'mm',
    caught: 'rebuild',
    check: ['cut plane'],
    says: /not given where/,
  },
  {
    path: 'cuts.plane.point.y',
    by: 'mm',
    caught: 'rebuild',
    check: ['cut plane'],
    says: /not given where/,
  },
  {
    path: 'cuts.plane.point.z',
    by: 'mm',
    caught: 'rebuild',
    check: ['cut plane'],
    says: /not given where/,
  },
  {
    path: 'cuts.plane.normal.x',
    by: 'turn',
    caught: 'rebuild',
    check: ['cut plane'],
    says: /turned off|length 1/,
  },
  {
    path: 'cuts.plane.normal.y',
    by: 'turn',
    caught: 'rebuild',
    check: ['cut plane'],
    says: /turned off|length 1/,
  },
  {
    path: 'cuts.plane.normal.z',
    by: 'turn',
    caught: 'rebuild',
    check: ['cut plane'],
    says: /turned off|length 1/,
  },
  { path: 'cuts.alongMm', by: 'mm', caught: 'rebuild', check: ['cut plane'], says: /stands off/ },
  {
    path: 'cuts.longPointFromHeelMm',
    by: 'mm',
    caught: 'rebuild',
    check: ['long and short points'],
    says: /^long point/,
  },
  {
    path: 'cuts.shortPointFromHeelMm',
    by: 'mm',
    caught: 'rebuild',
    check: ['long and short points'],
    says: /^short point/,
  },
  {
    path: 'cuts.face.fromEdgeDeg',
    by: 'deg',
    caught: 'rebuild',
    check: ['cut plane'],
    says: /turned off/,
  },
  {
    path: 'cuts.face.fromSquareDeg',
    by: 'deg',
    caught: 'rule',
    check: ['numbers'],
    says: /sum to 90/,
  },
  {
    path: 'cuts.edge.fromEdgeDeg',
    by: 'deg',
    caught: 'rebuild',
    check: ['cut plane', 'numbers'],
    says: /turned off|edge bevel of the square/,
  },
  {
    path: 'cuts.edge.fromSquareDeg',
    by: 'deg',
    caught: 'rule',
    check: ['numbers'],
    says: /sum to 90/,
  },
  {
    path: 'cuts.edgeOtherTop.fromEdgeDeg',
    by: 'deg',
    caught: 'rebuild',
    check: ['numbers'],
    says: /edge bevel of the/,
  },
  {
    path: 'cuts.edgeOtherTop.fromSquareDeg',
    by: 'deg',
    caught: 'rule',
    check: ['numbers'],
    says: /sum to 90/,
  },
  {
    path: 'cuts.bladeTiltDeg',
    by: 'deg',
    caught: 'rebuild',
    check: ['numbers'],
    says: /^blade tilt/,
  },
]

/** Paths of every number in a value; a list counts as one place. */
export function numberPaths(value: unknown, path = ''): string[] {
  if (typeof value === 'number') return [path]
  if (Array.isArray(value)) return value.flatMap((item) => numberPaths(item, path))
  if (value === null || typeof value !== 'object') return []
  return Object.entries(value).flatMap(([key, inner]) =>
    numberPaths(inner, path === '' ? key : `${path}.${key}`),
  )
}
