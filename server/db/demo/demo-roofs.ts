import { formOfShape, type RoofForm, type RoofShape } from '../../../shared/revisions/roof-form.ts'

const sections = {
  rafter: { depthMm: '140', thicknessMm: '45' },
  hip: { depthMm: '190', thicknessMm: '35' },
  ridge: { depthMm: '190', thicknessMm: '35' },
  valley: { depthMm: '', thicknessMm: '' },
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
    corners: [
      ['0', '0'],
      ['8200', '0'],
      ['8900', '5600'],
      ['300', '6400'],
    ].map(([x = '', y = '']) => ({ x, y, finish: 'eave' as const, pitchDeg: '', overhangMm: '' })),
  }),
} satisfies Record<string, RoofForm>

export type DemoRoofKey = keyof typeof demoRoofs
