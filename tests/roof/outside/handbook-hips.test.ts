import { describe, expect, test } from 'vitest'

import { frameRoof } from '../../../shared/roof/frame-roof.ts'
import type { FrameSpec, Member, Roof } from '../../../shared/roof/roof-types.ts'
import { example } from '../support/handbook.ts'
import {
  degOfRise,
  edgeTan,
  faceTan,
  foot,
  FOOT_MM,
  hipBuilding,
  inch,
  INCH_MM,
} from '../support/hip-building.ts'
import { creepersOn, cutsAt, hipFrom, planeOfEdge } from '../support/members.ts'
import { misfits } from '../support/misfits.ts'
import { convexReferences, referenceRoof } from '../support/roofs.ts'

/**
 * Source: tests/fixtures/handbook.json, as in handbook-lengths.test.ts. A pair such as 17 : 19 3/4
 * is laid on a square: its tangent is blade over tongue. Books take 17 for 16.97 (the diagonal of
 * 12), 13 for 12.99 (the octagon hip) and 5 for 4.97 (12 tan 22.5°): the tolerance allows for that.
 */
const tanDeg = (deg: number): number => Math.tan((deg * Math.PI) / 180)

describe('hips over a square corner', () => {
  test('8 in 12, common run 15 ft (NAVEDTRA 14044, Builder 3&2 Vol 2, ch. 2)', () => {
    const { number } = example('nav-hip-8in12-run15')
    const { hip, common } = hipBuilding(degOfRise(8, 12), 15 * FOOT_MM)
    expect(
      misfits([
        ['hip run', foot(hip.runMm), number('results.hip_run_ft'), 0.005],
        ['total rise', foot(hip.riseMm), number('results.total_rise_ft'), 0.0001],
        ['unit', (hip.setOutLengthMm / common.runMm) * 12, number('results.hip_unit_in'), 0.005],
        ['unit run', (hip.runMm / common.runMm) * 12, number('results.hip_unit_run_in'), 0.005],
        ['length', foot(hip.setOutLengthMm), number('results.hip_length_ft'), 0.005],
      ]),
    ).toEqual([])
  })

  test('10 in 12: plumb bevel, side cuts of hip and creeper (F.T. Hodgson, ABC of the Steel Square, pp. 28–33)', () => {
    example('hodgson-hip-rise10')
    const { hip, sideCreepers } = hipBuilding(degOfRise(10, 12), 3600, { hipTop: 'lowered' })
    expect(
      misfits([
        // 7 1/17 = 12 × 10 / 17.
        ['hip rise in 12 of its own run', 12 / faceTan(hip), 7 + 1 / 17, 1 / 17],
        ['creeper side cut, 12 : 15 5/8', 12 / edgeTan(sideCreepers[0]!), 15.625, 1 / 16],
        ['hip side cut, 17 : 19 3/4', 17 / edgeTan(hip), 19.75, 1 / 16],
      ]),
    ).toEqual([])
  })

  test('10 in 12: pairs of plate 4 (Radford’s Cyclopedia of Construction, vol. 3)', () => {
    example('radford-p4-10in12')
    const { hip, common, sideCreepers } = hipBuilding(degOfRise(10, 12), 3600, {
      hipTop: 'lowered',
    })
    expect(
      misfits([
        ['common plumb, 12 and 10', 10 * faceTan(common), 12, 0.001],
        ['creeper side cut, 12 : 15 7/12', 12 / edgeTan(sideCreepers[0]!), 15 + 7 / 12, 1 / 24],
        ['hip plumb, 17 and 10', 10 * faceTan(hip), 17, 0.05],
        ['hip side cut, 17 : 19 3/4', 17 / edgeTan(hip), 19.75, 1 / 16],
      ]),
    ).toEqual([])
  })

  test('6 in 12: hip unit, creepers at 16 in (Radford’s Cyclopedia, plate 3)', () => {
    const { number } = example('radford-hip-p3-6in12')
    const { hip, common, sideCreepers } = hipBuilding(degOfRise(6, 12), 11.25 * FOOT_MM, {
      maxSpacingMm: 16 * INCH_MM,
    })
    const out = sideCreepers[0]!.setOutLengthMm - sideCreepers[1]!.setOutLengthMm
    expect(
      misfits([
        ['unit', (hip.setOutLengthMm / common.runMm) * 12, number('results.hip_unit_in'), 0.001],
        ['difference, 1 ft 6 in', inch(out), 18, 0.5],
      ]),
    ).toEqual([])
  })

  test('drop of a square-topped hip at 8 in 12 (NAVEDTRA 14044: 8 and 17, half the thickness on the 17)', () => {
    example('nav-backing-drop')
    const { hip } = hipBuilding(degOfRise(8, 12), 3600, { hipTop: 'lowered' })
    const half = hip.section.thicknessMm / 2
    // 17 for 16.97 moves the drop by 0.2 per cent: 0.02 mm here.
    expect(misfits([['drop', hip.dropMm, (half * 8) / 17, 0.02]])).toEqual([])
  })

  test('hip against the commons loses half their 45° thickness (NAVEDTRA 14044)', () => {
    example('nav-hip-shortening')
    const { hip } = hipBuilding(degOfRise(8, 12), 3600)
    const level = hip.headDeductionMm * (hip.runMm / hip.setOutLengthMm)
    expect(misfits([['level deduction', level, (45 / 2) * Math.SQRT2, 0.001]])).toEqual([])
  })

  test('creepers at 16 in, 8 in 12: one difference, then two (NAVEDTRA 14044)', () => {
    const { number } = example('nav-jack-8in12-16oc')
    const { common, sideCreepers } = hipBuilding(degOfRise(8, 12), 10 * FOOT_MM, {
      maxSpacingMm: 16 * INCH_MM,
    })
    const shorter = sideCreepers.map((m) => inch(common.setOutLengthMm - m.setOutLengthMm))
    expect(
      misfits([
        ['first', shorter[0]!, number('results.common_difference_in'), 0.005],
        ['second', shorter[1]!, number('results.second_jack_in'), 0.01],
      ]),
    ).toEqual([])
  })

  test('creepers at 16 and 20 in, 10 in 12 (Audel, Carpenters & Builders Guide, vol. 3, pp. 975, 977)', () => {
    const { number } = example('audel-jack-10in12')
    const differenceAt = (centresIn: number): number => {
      const { sideCreepers } = hipBuilding(degOfRise(10, 12), 10 * FOOT_MM, {
        maxSpacingMm: centresIn * INCH_MM,
      })
      return inch(sideCreepers[0]!.setOutLengthMm - sideCreepers[1]!.setOutLengthMm)
    }
    expect(
      misfits([
        ['16 in', differenceAt(16), number('results.diff_16_in'), 0.005],
        // Printed to the whole inch.
        ['20 in', differenceAt(20), number('results.diff_20_in'), 0.5],
      ]),
    ).toEqual([])
  })

  test('ridge of a 36 × 24 ft hip roof: 12 ft set out, half a common more at each end (Carpentry Refresher, topic 8)', () => {
    const { number } = example('refresher-ridge-36x24')
    const { ridge } = hipBuilding(30, 12 * FOOT_MM, { ridgeMm: 12 * FOOT_MM })
    const theoretical = number('results.theoretical_ridge_ft')
    expect(
      misfits([
        ['set out', foot(ridge.setOutLengthMm), theoretical, 0.0001],
        ['cut, hips with two cheeks', ridge.cutLengthMm, theoretical * FOOT_MM + 45, 0.01],
      ]),
    ).toEqual([])
  })
})

describe('hips between slopes of different pitch (F.T. Hodgson, ABC of the Steel Square)', () => {
  test('runs 12 and 16 ft, rise 10 ft (p. 43): hip run 20 ft', () => {
    const { number } = example('hodgson-unequal-24x-run16-rise10')
    const { hip, common, crown } = hipBuilding(degOfRise(10, 12), 12 * FOOT_MM, {
      endPitchDeg: degOfRise(10, 16),
    })
    expect(
      misfits([
        ['hip run', foot(hip.runMm), number('results.hip_run_ft'), 0.0001],
        // Derived from the printed runs, not printed.
        ['main common', foot(common.setOutLengthMm), number('derived.main_common_ft'), 0.0001],
        ['end common', foot(crown.setOutLengthMm), number('derived.end_common_ft'), 0.0001],
        ['hip', foot(hip.setOutLengthMm), number('derived.hip_ft'), 0.0001],
      ]),
    ).toEqual([])
  })

  test('runs 9 and 14 ft, rise 9 ft (pp. 32–33): creeper side cuts', () => {
    const { number } = example('hodgson-unequal-18x28-rise9')
    const { common, crown, sideCreepers, endCreepers } = hipBuilding(45, 9 * FOOT_MM, {
      endPitchDeg: degOfRise(9, 14),
    })
    const [short, long] = [foot(common.setOutLengthMm), foot(crown.setOutLengthMm)]
    expect(
      misfits([
        // Lengths derived from the printed runs; the pairs '14 : short', '9 : long' are printed.
        ['short common', short, number('derived.short_common_ft'), 0.0001],
        ['long common', long, number('derived.long_common_ft'), 0.0001],
        ['14 : short common', edgeTan(sideCreepers[0]!), 14 / short, 1e-6],
        ['9 : long common', edgeTan(endCreepers[0]!), 9 / long, 1e-6],
      ]),
    ).toEqual([])
  })
})

describe('octagonal end', () => {
  const octagonal = (
    pitchDeg: number,
    changes: Partial<Roof>,
  ): { spec: FrameSpec; hip: Member; creeper: Member; commonRunMm: number } => {
    const reference = convexReferences.find((r) => r.id === 'octagonal-end')!
    const base = referenceRoof(reference, changes)
    const edges = base.edges.map((e) => (e.finish === 'eave' ? { ...e, pitchDeg } : e))
    const roof = { ...base, edges }
    const spec = frameRoof(roof)
    const hip = hipFrom(spec, roof.outline[1]!)
    const creeper = creepersOn(spec, hip, planeOfEdge(spec, 0))[0]!
    return { spec, hip, creeper, commonRunMm: 3000 }
  }

  test('hip runs 13 to 12 and backs by 5/12 of half its thickness (I.S. Griffith, sec. 38–39)', () => {
    example('griffith-octagon')
    const hipSection = { thicknessMm: 2 * INCH_MM, depthMm: 190 }
    const rafter = { thicknessMm: 45, depthMm: 140 }
    const sections = { rafter, hip: hipSection, valley: hipSection, ridge: hipSection }
    const built = octagonal(degOfRise(8, 12), { hipTop: 'lowered', sections })
    const { hip, creeper, commonRunMm } = built
    const setBack = hip.dropMm / tanDeg(hip.pitchDeg)
    expect(
      misfits([
        ['hip run in 12', (hip.runMm / commonRunMm) * 12, 13, 0.05],
        // Level set-back of the arris; 5/12 stands for tan 22.5° = 4.97/12.
        ['backing over half thickness', (setBack / INCH_MM) * 12, 5, 0.05],
        ['tangent on 12, in plan', 12 / tanDeg(cutsAt(creeper, 'head')[0]!.bladeTiltDeg), 5, 0.05],
      ]),
    ).toEqual([])
  })

  test('creeper side cut is 5 to the common’s length a foot (Hodgson: 5 and 15, 9 in 12)', () => {
    example('hodgson-octagon-jack')
    const { creeper } = octagonal(degOfRise(9, 12), {})
    expect(misfits([['5 : 15', 15 * edgeTan(creeper), 5, 0.05]])).toEqual([])
  })

  test('10 in 12: hip plumb 13 and 10, creeper side cut 5 : 15 7/12 (Radford’s Cyclopedia, plate 4)', () => {
    example('radford-p4-10in12')
    const { hip, creeper } = octagonal(degOfRise(10, 12), {})
    expect(
      misfits([
        ['hip plumb', 10 * faceTan(hip), 13, 0.05],
        ['creeper', (15 + 7 / 12) * edgeTan(creeper), 5, 0.05],
      ]),
    ).toEqual([])
  })
})
