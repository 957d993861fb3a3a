import { describe, expect, test } from 'vitest'

import { example } from '../support/handbook.ts'
import {
  degOfRise,
  edgeTan,
  faceTan,
  FOOT_MM,
  hipBuilding,
  inch,
  INCH_MM,
} from '../support/hip-building.ts'
import { misfits, type Row } from '../support/misfits.ts'
import { makeRoof } from '../support/roofs.ts'
import { frameRoof } from '../../../shared/roof/frame-roof.ts'

/**
 * Source: tests/fixtures/handbook.json, worked examples of public-domain manuals and trade training
 * sheets; each check names its book. Tolerance: half the last printed digit, unless the book
 * multiplies a rounded unit length, reads off a square, or cuts digits short, which is then said.
 */
const metre = (mm: number): number => mm / 1000
const TWELFTH_IN = 1 / 12

describe('common rafters', () => {
  test('7 in 12 over a span of 16 ft (NAVEDTRA 14044, Builder 3&2 Vol 2, ch. 2)', () => {
    const { number } = example('nav-common-7in12-16ft')
    const { common } = hipBuilding(degOfRise(7, 12), 8 * FOOT_MM)
    expect(
      misfits([
        [
          'unit',
          (common.setOutLengthMm / common.runMm) * 12,
          number('results.common_unit_in'),
          0.005,
        ],
        // The book multiplies the rounded unit by 8 ft.
        ['length', inch(common.setOutLengthMm), number('results.length_in'), 8 * 0.005],
        ['length as text, 9 ft 3 1/8 in', inch(common.setOutLengthMm), 111.125, 1 / 16],
      ]),
    ).toEqual([])
  })

  test('13 in 12 over 20 ft 8 in (US Army Engineer School subcourse EN0069)', () => {
    const { number } = example('army-common-13in12-20ft8')
    const { common } = hipBuilding(degOfRise(13, 12), 124 * INCH_MM)
    expect(
      misfits([
        ['run', inch(common.runMm), number('results.run_in'), 0.001],
        ['unit', (common.setOutLengthMm / common.runMm) * 12, number('results.unit_in'), 0.005],
        // 124 / 12 rounded units.
        ['length', inch(common.setOutLengthMm), number('results.length_in'), (124 / 12) * 0.005],
        ['length as text, 15 ft 3 in', inch(common.setOutLengthMm), 183, 0.5],
      ]),
    ).toEqual([])
  })

  test('8 in 12, run 10 ft, 1 ft of tail along the rafter (US Army subcourse EN5156)', () => {
    const { number } = example('army-common-8in12-10ft')
    const pitch = degOfRise(8, 12)
    const overhangMm = FOOT_MM * Math.cos(Math.atan2(8, 12))
    const { common } = hipBuilding(pitch, 10 * FOOT_MM, { overhangMm })
    const set = inch(common.setOutLengthMm)
    expect(
      misfits([
        // The book rounds the unit to twelfths (14 5/12) and multiplies by 10.
        ['unit', (common.setOutLengthMm / common.runMm) * 12, 14 + 5 / 12, TWELFTH_IN / 2],
        ['length', set, number('results.length_in'), 10 * (TWELFTH_IN / 2)],
        ['tail', inch(common.tailLengthMm), 12, 0.001],
        ['with tail, 13 ft to the nearest inch', set + inch(common.tailLengthMm), 156, 0.5],
      ]),
    ).toEqual([])
  })

  // W. Noyes, Handwork in Wood; F.T. Hodgson, ABC of the Steel Square: read off a square to twelfths.
  test.each([
    'noyes-common-1',
    'noyes-common-2',
    'noyes-common-3',
    'noyes-common-4',
    'hodgson-common-1',
    'hodgson-common-2',
    'hodgson-common-3',
  ])('%s, read off a square to twelfths of an inch', (id) => {
    const { number } = example(id)
    const rise = 2 * number('inputs.pitch_rise_over_span')
    const { common } = hipBuilding(degOfRise(rise, 1), number('inputs.run_in') * INCH_MM)
    expect(
      misfits([['length', inch(common.setOutLengthMm), number('results.length_in'), TWELFTH_IN]]),
    ).toEqual([])
  })

  // F.T. Hodgson, ABC of the Steel Square: printed for braces; a rafter of that run and rise is as long.
  test.each([
    ['hodgson-brace-36-36', 36, 36, 'results.length_in', 0.005],
    ['hodgson-brace-24-18', 24, 18, 'results.length', 0.0001],
  ] as const)('%s: a brace %d by %d', (id, run, rise, result, tolerance) => {
    const { common } = hipBuilding(degOfRise(rise, run), run * INCH_MM)
    const printed = example(id).number(result)
    expect(misfits([['length', inch(common.setOutLengthMm), printed, tolerance]])).toEqual([])
  })

  test('quarter pitch over a run of 151 in: twelve steps and a part of one (I.S. Griffith, Carpentry, sec. 23)', () => {
    const { number } = example('griffith-stepoff-fraction')
    const rise = 2 * number('inputs.pitch_rise_over_span')
    const { common, hip } = hipBuilding(degOfRise(rise, 1), number('inputs.run_in') * INCH_MM)
    const steps = number('results.whole_steps')
    const last = [number('results.last_step_run_in'), number('results.last_step_rise_in')] as const
    const stepped = steps * Math.hypot(12, 12 * rise) + Math.hypot(...last)
    expect(
      misfits([
        ['length stepped off', inch(common.setOutLengthMm), stepped, 0.0001],
        ['rise stepped off', inch(common.riseMm), steps * 12 * rise + last[1], 0.0001],
        // 9 11/12 in: the book has 17 to the foot for 16.97, and reads to twelfths.
        ['last step of the hip', (hip.runMm / common.runMm) * last[0], 9 + 11 / 12, TWELFTH_IN / 2],
      ]),
    ).toEqual([])
  })

  test('half pitch over a span of 25 ft (I.S. Griffith, Carpentry, 1916, App. IV)', () => {
    const { number } = example('griffith-common-half-pitch-span25')
    const hipExample = example('griffith-hip-half-pitch-span25')
    const { common, hip } = hipBuilding(degOfRise(12, 12), 12.5 * FOOT_MM)
    const perFoot = (mm: number): number => (mm / common.runMm) * 12
    expect(
      misfits([
        ['common unit', perFoot(common.setOutLengthMm), number('results.unit_in'), 0.005],
        ['common', inch(common.setOutLengthMm), number('results.length_in'), 12.5 * 0.005],
        ['common as text, 17 ft 8 1/8 in', inch(common.setOutLengthMm), 212.125, 1 / 16],
        ['hip unit', perFoot(hip.setOutLengthMm), hipExample.number('results.unit_in'), 0.005],
        // Length derived from the printed unit, not printed: 12.5 × 20.78.
        ['hip', inch(hip.setOutLengthMm), hipExample.number('derived.length_in'), 12.5 * 0.005],
      ]),
    ).toEqual([])
  })

  test('25° rises 0.466 and runs 1.103 a metre (Costin, Advanced Building & Joinery, ch. 3)', () => {
    const { number } = example('costin-25deg')
    const { common } = hipBuilding(25, 3000)
    expect(
      misfits([
        ['rise', common.riseMm / common.runMm, number('results.rise_per_m'), 0.0005],
        ['rafter', common.setOutLengthMm / common.runMm, number('results.rafter_per_m'), 0.0005],
      ]),
    ).toEqual([])
  })

  test('18°, half span 3925, eaves 600 and 150 more (trade training sheet on residential roofs)', () => {
    const { number } = example('au-residential-18deg')
    const { common } = hipBuilding(18, 3925, { overhangMm: 750 })
    expect(
      misfits([
        ['rise', metre(common.riseMm), number('results.rise_m'), 0.0005],
        ['length', metre(common.setOutLengthMm), number('results.true_length_m'), 0.0005],
        // The sheet cuts 0.7886 short to 0.788.
        ['tail', metre(common.tailLengthMm), number('results.overhang_on_slope_m'), 0.001],
      ]),
    ).toEqual([])
  })
})

test('pattern rafter at 22.5° with its creepers (trade training slides on the pattern rafter)', () => {
  const { number } = example('au-pattern-rafter-22.5')
  const given = (key: string): number => number(`inputs.${key}`)
  const rafter = { thicknessMm: given('rafter_mm'), depthMm: 140 }
  const hipSection = { thicknessMm: given('hip_mm'), depthMm: 190 }
  const ridge = { thicknessMm: given('ridge_mm'), depthMm: 190 }
  const built = hipBuilding(given('pitch_deg'), given('half_span_mm'), {
    overhangMm: given('eaves_mm'),
    maxSpacingMm: given('rafter_spacing_mm'),
    sections: { rafter, hip: hipSection, valley: hipSection, ridge },
  })
  const { common, sideCreepers } = built
  const [first, second] = sideCreepers
  const cos = common.runMm / common.setOutLengthMm
  expect(
    misfits([
      ['rise a metre', common.riseMm / common.runMm, number('results.rise_m_per_m'), 0.0005],
      ['length a metre', 1 / cos, number('results.true_length_m_per_m'), 0.0005],
      ['set-out length', metre(common.setOutLengthMm), number('results.set_out_length_m'), 0.0005],
      [
        'creeper difference',
        metre(first!.setOutLengthMm - second!.setOutLengthMm),
        number('results.creeper_difference_m'),
        0.0005,
      ],
      [
        'half the mitre of the hip, level',
        first!.headDeductionMm * cos,
        number('results.half_mitre_hip_mm'),
        0.005,
      ],
      ['ridge past its node', -built.ridge.headDeductionMm, number('results.half_rafter_mm'), 0.05],
      ['tail', common.tailLengthMm, number('results.overhang_on_slope_mm'), 0.5],
    ]),
  ).toEqual([])
})

test('roof of 1008 sq ft at one pitch (Estimating Building Costs): area is plan over cosine', () => {
  const { number } = example('ebc-roof-area')
  const areaFt2 = (rise: number): number => {
    // The book's plan is an L of 40 × 22 and 8 × 16 ft; one pitch makes any plan of that area equal.
    const [long, wide] = [42 * FOOT_MM, 24 * FOOT_MM]
    const pitch = degOfRise(rise, 1)
    const roof = makeRoof(
      [
        [0, 0],
        [long, 0],
        [long, wide],
        [0, wide],
      ],
      [pitch, pitch, pitch, pitch],
    )
    return (frameRoof(roof).totals.roofAreaM2 * 1e6) / FOOT_MM ** 2
  }
  expect(number('inputs.plan_ft2')).toBe(42 * 24)
  // The book works with rounded multipliers; its figures are out by up to half of one per cent.
  const share = 0.005
  expect(
    misfits([
      ['half pitch', areaFt2(1), number('results.1/2'), share * 1432],
      ['third pitch', areaFt2(2 / 3), number('results.1/3'), share * 1210],
      ['quarter pitch', areaFt2(1 / 2), number('results.1/4'), share * 1129],
      ['three-quarter pitch', areaFt2(3 / 2), number('results.3/4'), share * 1815],
      ['100 sq ft at half pitch', areaFt2(1) / 10.08, number('results.100ft2_half_pitch'), 0.71],
    ]),
  ).toEqual([])
})

test('ready reckoner worked at 0.7 rise, called 35° (reprinted TRADA Timber 2020 Yearbook, p. 169)', () => {
  const { number } = example('rrr-35deg')
  const rise = number('inputs.rise_per_300') / 300
  const lowered = hipBuilding(degOfRise(rise, 1), 3000, { hipTop: 'lowered' })
  const backed = hipBuilding(degOfRise(rise, 1), 3000)
  const { common, hip, sideCreepers } = lowered
  const square = (tan: number, blade: number): number => tan * blade
  const backingTan = Math.tan(((backed.hip.backing?.leftDeg ?? NaN) * Math.PI) / 180)
  const differences = [300, 350, 400, 450, 500, 550, 600].map((centres) => {
    const built = hipBuilding(degOfRise(rise, 1), 3000, { maxSpacingMm: centres })
    const [first, second] = built.sideCreepers
    const out = first!.setOutLengthMm - second!.setOutLengthMm
    const printed = number(`results.jack_difference_mm.${centres}`)
    return [`creepers at ${centres}`, out, printed, 0.5] as Row
  })
  // Blade and tongue lengths on the square: the page is good to ±1 mm.
  expect(
    misfits([
      // The page cuts its last digit short: 1.57797 to 1.5779, 12.2066 to 12.206.
      ...[1, 4, 10].flatMap((run): Row[] => {
        const unit = run === 10 ? 0.001 : 0.0001
        const [rafterMm, hipMm] = [common.setOutLengthMm * run, hip.setOutLengthMm * run]
        return [
          [`rafter ${run}`, rafterMm / common.runMm, number(`results.rafter_per_run.${run}`), unit],
          [`hip ${run}`, hipMm / common.runMm, number(`results.hip_per_run.${run}`), unit],
        ]
      }),
      ['hip plumb', square(1 / faceTan(hip), 424), 210, 1],
      ['hip edge', square(edgeTan(hip), 300), 269, 1],
      ['hip backing', square(backingTan, 300), 134, 1],
      ['creeper edge', square(edgeTan(sideCreepers[0]!), 300), 245, 1],
      ...differences,
    ]),
  ).toEqual([])
})
