import type { SideForm } from '../../../shared/revisions/form-parts.ts'
import {
  emptyCorner,
  formOfShape,
  type RoofForm,
  type RoofShape,
} from '../../../shared/revisions/roof-form.ts'
import type { WingShape } from '../../../shared/revisions/wing-form.ts'

const sections = {
  rafter: { depthMm: '140', thicknessMm: '45' },
  hip: { depthMm: '190', thicknessMm: '35' },
  ridge: { depthMm: '190', thicknessMm: '35' },
  valley: { depthMm: '', thicknessMm: '' },
}

/** All sizes are typed by somebody; these are a demo's. */
const withValley = {
  ...formOfShape('corners').sections,
  ...sections,
  valley: { depthMm: '190', thicknessMm: '35' },
}

const withTrim = {
  ...withValley,
  underpurlin: { depthMm: '140', thicknessMm: '70' },
  collarTie: { depthMm: '90', thicknessMm: '35' },
  fascia: { depthMm: '180', thicknessMm: '30' },
  barge: { depthMm: '180', thicknessMm: '30' },
}

function form(shape: RoofShape, changes: Partial<RoofForm>): RoofForm {
  const plain = formOfShape(shape)
  const sizes = { ...plain.sections, ...sections }
  return { ...plain, overhangMm: '450', vergeOverhangMm: '300', sections: sizes, ...changes }
}

function withGables(roof: RoofForm, ...sides: (keyof RoofForm['sides'])[]): RoofForm {
  const gables = Object.fromEntries(
    sides.map((side) => [side, { ...roof.sides[side], finish: 'gable' as const }]),
  )
  return { ...roof, sides: { ...roof.sides, ...gables } }
}

function withPitches(
  roof: RoofForm,
  pitches: Partial<Record<keyof RoofForm['sides'], string>>,
): RoofForm {
  const changed = Object.entries(pitches).map(([side, pitchDeg]) => [
    side,
    { ...roof.sides[side as keyof RoofForm['sides']], pitchDeg },
  ])
  return { ...roof, sides: { ...roof.sides, ...Object.fromEntries(changed) } }
}

/** A ready shape with wings; `gables` are its sides by number, as the form counts them. */
function wings<Shape extends WingShape>(
  shape: Shape,
  changes: Partial<RoofForm>,
  measures: Partial<RoofForm['wings'][Shape]>,
  gables: number[] = [],
): RoofForm {
  const plain = form(shape, changes)
  const own = { ...plain.wings[shape], ...measures }
  const sides = own.sides.map((side, i) => withFinish(side, gables.includes(i)))
  return { ...plain, wings: { ...plain.wings, [shape]: { ...own, sides } } }
}

const withFinish = <Side extends SideForm>(side: Side, isGable: boolean): Side =>
  isGable ? { ...side, finish: 'gable' } : side

/** Typed corners in mm; `gables` are the plates by number, the first from corner 1 to corner 2 being 0. */
const corners = (places: [number, number][], gables: number[] = []) =>
  places.map(([x, y], i) =>
    withFinish({ ...emptyCorner, x: String(x), y: String(y) }, gables.includes(i)),
  )

const rectangle = (
  lengthMm: string,
  widthMm: string,
  pitchDeg: string,
  changes: Partial<RoofForm> = {},
) => form('rectangle', { lengthMm, widthMm, pitchDeg, ...changes })

/** One real roof of each shape; the sizes are a demo's, not advice. */
export const demoRoofs = {
  hip: rectangle('18600', '8400', '25', { maxSpacingMm: '450' }),
  gable: withGables(rectangle('8400', '5400', '30'), 'left', 'right'),
  hipAndGable: withGables(
    rectangle('19200', '9000', '22.5', { tail: 'square', maxSpacingMm: '450' }),
    'right',
  ),
  octagonalEnd: withGables(
    form('octagonal-end', { widthMm: '6000', lengthMm: '9000', pitchDeg: '25' }),
    'left',
  ),
  splayedEnd: withGables(
    form('splayed-end', { widthMm: '6000', lengthMm: '9000', splayMm: '1200', pitchDeg: '25' }),
    'left',
  ),
  unequal: withPitches(rectangle('9000', '6000', '22.5', { overhangMm: '400' }), {
    left: '35',
    right: '35',
  }),
  pyramid: rectangle('5000', '5000', '30', { hipTop: 'backed' }),
  carport: rectangle('7200', '5400', '17.5', { overhangMm: '340', overhangFrom: 'brickwork' }),
  skewPlan: form('corners', {
    pitchDeg: '24',
    corners: corners([
      [0, 0],
      [8200, 0],
      [8900, 5600],
      [300, 6400],
    ]),
  }),
  twoWings: wings(
    'l',
    { lengthMm: '14400', widthMm: '11200', pitchDeg: '25', sections: withValley },
    { frontWidthMm: '7200', sideWidthMm: '6400' },
  ),
  gabledWing: wings(
    't',
    { lengthMm: '15600', widthMm: '8400', pitchDeg: '22.5', sections: withTrim },
    { wingWidthMm: '5400', projectionMm: '4200' },
    [4],
  ),
  threeWings: wings(
    'u',
    { lengthMm: '17400', widthMm: '11400', pitchDeg: '22.5', sections: withValley },
    { frontWidthMm: '6600', leftWidthMm: '6000', rightWidthMm: '5200', rightLengthMm: '10200' },
  ),
  // Two straight parts, 3 in 4 out of line with each other, each gable square to its own.
  bentPlan: form('corners', {
    pitchDeg: '27.5',
    sections: withValley,
    corners: corners(
      [
        [0, 0],
        [9000, 0],
        [15_000, 4500],
        [11_400, 9300],
        [7000, 6000],
        [0, 6000],
      ],
      [2, 5],
    ),
  }),
} satisfies Record<string, RoofForm>

export type DemoRoofKey = keyof typeof demoRoofs
