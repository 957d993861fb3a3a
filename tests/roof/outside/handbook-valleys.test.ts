import { describe, expect, test } from 'vitest'

import { example } from '../support/handbook.ts'
import { degOfRise, foot, FOOT_MM, inch, INCH_MM } from '../support/hip-building.ts'
import { ofRole } from '../support/members.ts'
import { misfits, type Row } from '../support/misfits.ts'
import { lBuilding, wingedBuilding } from '../support/wing-building.ts'
import type { Member } from '../../../shared/roof/roof-types.ts'

/** Source: tests/fixtures/handbook.json, as in handbook-lengths.test.ts. */

/** A length along a member as it lies in plan. */
const level = (member: Member, mm: number): number => (mm * member.runMm) / member.setOutLengthMm

test('valley of an addition, 9 in 12, span 30 ft (NAVEDTRA 14044, Builder 3&2 Vol 2, fig. 2-41)', () => {
  const { number } = example('nav-short-valley-9in12-span30')
  const pitch = degOfRise(9, 12)
  const { valley } = wingedBuilding(30 * FOOT_MM, { mainDeg: pitch, wingDeg: pitch })
  const commonRunMm = 15 * FOOT_MM
  expect(
    misfits([
      ['run', foot(valley.runMm), number('results.valley_run_ft'), 0.005],
      // The page's text misprints 9.21 for 19.21.
      ['unit', (valley.setOutLengthMm / commonRunMm) * 12, number('results.unit_in'), 0.005],
      ['length', foot(valley.setOutLengthMm), number('results.length_ft'), 0.005],
      // The text multiplies the rounded unit by 15: 288.15 in.
      ['length in inches', inch(valley.setOutLengthMm), 288.15, 15 * 0.005],
    ]),
  ).toEqual([])
})

test('valley between pitches as 5 to 8, the minor one 10 in 12 (I.S. Griffith, Carpentry, App. on uneven pitch)', () => {
  const { number } = example('griffith-hip-run-unequal-5-8')
  // 10 in 12 over a run of 6 rises 5, and so does the other slope over its run of 7.5.
  const { valley } = wingedBuilding(15 * FOOT_MM, {
    mainDeg: degOfRise(10, 12),
    wingDeg: degOfRise(5, 7.5),
  })
  const { from, to } = valley.axis
  // the main building's plate runs along x, the wing's along y
  const [minorMm, majorMm] = [Math.abs(to.y - from.y), Math.abs(to.x - from.x)]
  const angle = (Math.atan2(minorMm, majorMm) * 180) / Math.PI
  expect(
    misfits([
      ['major run to 6 of minor', (majorMm / minorMm) * 6, number('results.a_in'), 1e-6],
      [
        'plan to 6 of minor',
        (valley.runMm / minorMm) * 6,
        number('results.valley_plan_per_6in'),
        0.05,
      ],
      // Printed 19.20, twice the rounded 9.6; a plan length, though the book has it as the valley's.
      [
        'plan to 12 of minor',
        (valley.runMm / minorMm) * 12,
        number('results.valley_length_in_per_12_minor_run'),
        2 * 0.05,
      ],
      ['tangent of B', minorMm / majorMm, number('results.tanB'), 0.0005],
      // To the minute: 38° 40'.
      ['B', angle, 38 + 40 / 60, 0.5 / 60],
    ]),
  ).toEqual([])
})

describe('creepers at 16 in, 8 in 12, on an L with a narrow wing (NAVEDTRA 14044)', () => {
  const jacks = example('nav-jack-8in12-16oc')
  const { spec, valley } = lBuilding(
    degOfRise(8, 12),
    { mainMm: 24 * FOOT_MM, wingMm: 12 * FOOT_MM },
    { maxSpacingMm: 16 * INCH_MM },
  )
  const difference = jacks.number('results.common_difference_in')
  const valleyHead = valley.axis.to
  const fromHead = (m: Member): number =>
    Math.max(Math.abs(m.axis.from.x - valleyHead.x), Math.abs(m.axis.from.y - valleyHead.y))
  const onMainBack = (m: Member): boolean =>
    m.planes.every((p) => spec.planes[p]!.edges.includes(2))
  const onWing = (m: Member): boolean => m.planes.every((p) => spec.planes[p]!.edges.includes(3))
  const cripples = ofRole(spec, 'cripple-creeper').filter(onMainBack)
  const valleyCreepers = ofRole(spec, 'valley-creeper').filter(onWing)
  const byLength = (list: Member[]): number[] =>
    list.map((m) => inch(m.setOutLengthMm)).sort((a, b) => a - b)
  const steps = (list: Member[]): number[] =>
    byLength(list)
      .slice(1)
      .map((mm, k) => mm - byLength(list)[k]!)

  test('valley jacks step by the common difference, cripples by two (9–12: 1 ×, 2 ×; 13, 14: 2 ×, 4 ×)', () => {
    example('nav-valley-jacks-cripples')
    expect(valleyCreepers.length).toBeGreaterThan(2)
    expect(cripples.length).toBeGreaterThan(2)
    const two = jacks.number('results.second_jack_in')
    expect(
      misfits([
        ...steps(valleyCreepers).map((mm): Row => ['valley jack', mm, difference, 0.005]),
        ...steps(cripples).map((mm): Row => ['cripple', mm, two, 0.01]),
      ]),
    ).toEqual([])
  })

  // The book counts its jacks from the head of the valley; ours step from the gable's end, so their
  // lengths are the same multiples of how many spacings off the head they stand, whole or not.
  test('a valley jack is as many differences long as it stands spacings off the valley’s head, a cripple twice', () => {
    const rows = (list: Member[], times: number): Row[] =>
      list.map((m): Row => {
        const spacings = inch(fromHead(m)) / 16
        return [m.mark, inch(m.setOutLengthMm), times * spacings * difference, spacings * 0.01]
      })
    expect(misfits([...rows(valleyCreepers, 1), ...rows(cripples, 2)])).toEqual([])
  })

  // The book has half the 45° thickness of the ridge at a valley jack's head too. Here it cannot be:
  // a creeper stands square to its ridge and bears on its side, half the ridge's own thickness off.
  test('hip and valley jacks lose half the 45° thickness, cripples at both ends', () => {
    const half45 = (35 / 2) * Math.SQRT2
    const hipCreepers = ofRole(spec, 'creeper')
    expect(hipCreepers.length).toBeGreaterThan(4)
    expect(
      misfits([
        ...hipCreepers.map((m): Row => ['hip', level(m, m.headDeductionMm), half45, 0.001]),
        ...[...valleyCreepers, ...cripples].map((m): Row => [
          'valley',
          level(m, m.footDeductionMm),
          half45,
          0.001,
        ]),
        ...cripples.map((m): Row => ['cripple head', level(m, m.headDeductionMm), half45, 0.001]),
        ...valleyCreepers.map((m): Row => ['ridge', level(m, m.headDeductionMm), 35 / 2, 0.001]),
      ]),
    ).toEqual([])
  })

  test('a cripple loses the full diagonal thickness of hip and valley (Radford’s Cyclopedia, plate 4)', () => {
    example('radford-p4-10in12') // cripple_reduction
    const lost = cripples.map((m) => level(m, m.headDeductionMm + m.footDeductionMm))
    expect(misfits(lost.map((mm): Row => ['cripple', mm, 35 * Math.SQRT2, 0.001]))).toEqual([])
  })
})

test('against the ridge a hip or valley loses half the ridge’s 45° thickness (NAVEDTRA 14044)', () => {
  // Here hips bear on the commons; it is the valley of two equal wings that stands against ridges.
  example('nav-hip-shortening') // against_ridge
  const { valley } = lBuilding(degOfRise(8, 12), { mainMm: 7200, wingMm: 7200 })
  const lost = level(valley, valley.headDeductionMm)
  expect(misfits([['level deduction', lost, (35 / 2) * Math.SQRT2, 0.001]])).toEqual([])
})
