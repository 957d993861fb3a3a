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

type Row = [path: string, ...rest: Rest]
type Rest = [by: BentBy, caught: FieldRule['caught'], check: FieldRule['check'], says: RegExp]

/** The same of several coordinates. */
const axes = (path: string, names: string, ...rest: Rest): Row[] =>
  [...names].map((name) => [`${path}.${name}`, ...rest])

const plan = /^run|^set-out|turned off|stands off|over no line|not given where|stand less drop/

const rows: Row[] = [
  ['section.thicknessMm', 'mm', 'rule', ['numbers'], /^its section/],
  ['section.depthMm', 'mm', 'rule', ['numbers'], /^its section/],
  ...axes('axis.from', 'xy', 'mm', 'rebuild', ['numbers', 'cut plane', 'place'], plan),
  ['axis.from.z', 'mm', 'rule', ['numbers'], /^rise/],
  ...axes('axis.to', 'xy', 'mm', 'rebuild', ['numbers', 'cut plane', 'place'], plan),
  ['axis.to.z', 'mm', 'rule', ['numbers'], /^rise/],
  ['riseMm', 'mm', 'rule', ['numbers'], /^rise/],
  ['runMm', 'mm', 'rule', ['numbers'], /^run/],
  ['pitchDeg', 'deg', 'rebuild', ['cut plane'], /turned off|stands off|not given where/],
  ['setOutLengthMm', 'mm', 'rule', ['numbers'], /^set-out length/],
  ['headDeductionMm', 'mm', 'rule', ['numbers'], /^head deduction/],
  ['footDeductionMm', 'mm', 'rule', ['numbers'], /^foot deduction/],
  ['tailLengthMm', 'mm', 'rule', ['numbers'], /^tail/],
  ['cutLengthMm', 'mm', 'rebuild', ['numbers'], /^cut length/],
  ['dropMm', 'mm', 'rule', ['place', 'beside'], /stand less drop/],
  ['weightKg', 'share', 'rule', ['numbers'], /^weighs/],
  ['planes', 'slope', 'rule', ['place', 'cut plane', 'beside'], /./],
  ['backing.leftDeg', 'deg', 'rule', ['place'], /backing/],
  ['backing.rightDeg', 'deg', 'rule', ['place'], /backing/],
  ['birdsmouth.seatMm', 'mm', 'rule', ['numbers'], /^birdsmouth seat is/],
  ['birdsmouth.heelMm', 'mm', 'rule', ['numbers'], /^birdsmouth heel is/],
  ['birdsmouth.depthMm', 'mm', 'rule', ['numbers'], /^birdsmouth depth/],
  ['birdsmouth.standMm', 'mm', 'rule', ['place'], /^its stand/],
  ['birdsmouth.bearingMm', 'mm', 'rebuild', ['seat'], /of bearing published/],
  ['birdsmouth.heelOffsetMm', 'mm', 'rebuild', ['numbers'], /^birdsmouth depth/],
  ['birdsmouth.seatFromEdgeDeg', 'deg', 'rule', ['numbers'], /^birdsmouth seat angle/],
  ['birdsmouth.heelFromEdgeDeg', 'deg', 'rule', ['numbers'], /^birdsmouth heel angle/],
  ...axes('cuts.plane.point', 'xyz', 'mm', 'rebuild', ['cut plane'], /not given where/),
  ...axes('cuts.plane.normal', 'xyz', 'turn', 'rebuild', ['cut plane'], /turned off|length 1/),
  ['cuts.alongMm', 'mm', 'rebuild', ['cut plane'], /stands off/],
  ['cuts.longPointFromHeelMm', 'mm', 'rebuild', ['long and short points'], /^long point/],
  ['cuts.shortPointFromHeelMm', 'mm', 'rebuild', ['long and short points'], /^short point/],
  ['cuts.face.fromEdgeDeg', 'deg', 'rebuild', ['cut plane'], /turned off/],
  ['cuts.face.fromSquareDeg', 'deg', 'rule', ['numbers'], /sum to 90/],
  [
    'cuts.edge.fromEdgeDeg',
    'deg',
    'rebuild',
    ['cut plane', 'numbers'],
    /turned off|edge bevel of the square/,
  ],
  ['cuts.edge.fromSquareDeg', 'deg', 'rule', ['numbers'], /sum to 90/],
  ['cuts.edgeOtherTop.fromEdgeDeg', 'deg', 'rebuild', ['numbers'], /edge bevel of the/],
  ['cuts.edgeOtherTop.fromSquareDeg', 'deg', 'rule', ['numbers'], /sum to 90/],
  ['cuts.bladeTiltDeg', 'deg', 'rebuild', ['numbers'], /^blade tilt/],
]

export const fieldRules: FieldRule[] = rows.map(([path, by, caught, check, says]) => ({
  path,
  by,
  caught,
  check,
  says,
}))

/** Paths of every number in a value; a list counts as one place. */
export function numberPaths(value: unknown, path = ''): string[] {
  if (typeof value === 'number') return [path]
  if (Array.isArray(value)) return value.flatMap((item) => numberPaths(item, path))
  if (value === null || typeof value !== 'object') return []
  return Object.entries(value).flatMap(([key, inner]) =>
    numberPaths(inner, path === '' ? key : `${path}.${key}`),
  )
}
