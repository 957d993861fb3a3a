import { describe, expect, test } from 'vitest'

import { frameRoof } from '../../shared/roof/frame-roof.ts'
import type { FrameSpec, Member, MemberRole } from '../../shared/roof/roof-types.ts'
import { makeRoof } from './support/roofs.ts'

/**
 * Source: the project's written agreement on what the set-out means ("Known values, 25°"): built once
 * from that text, no published source. Rafters 45 × 140, hips and ridge 35 thick, plates 90.
 */
const rectangle = [
  [0, 0],
  [9000, 0],
  [9000, 6000],
  [0, 6000],
] as const
const octagonalEnd = [
  [0, 0],
  [9000, 0],
  [10757.359, 1757.359],
  [10757.359, 4242.641],
  [9000, 6000],
  [0, 6000],
] as const

const hipRoof = frameRoof(makeRoof(rectangle, [25, 25, 25, 25], { hipTop: 'lowered' }))
const octagonal = frameRoof(
  makeRoof(octagonalEnd, [25, 25, 25, 25, 25, 'gable'], { hipTop: 'lowered' }),
)

const ofRole = (spec: FrameSpec, role: MemberRole): Member[] =>
  spec.members.filter((m) => m.role === role)
const first = (spec: FrameSpec, role: MemberRole): Member => ofRole(spec, role)[0]!

describe('a hip roof at 25°', () => {
  test.each([
    ['common', 19.31],
    ['crown-end', 24.83],
    ['creeper', 27.31],
    ['hip', 33.5],
  ] as const)('every %s is deducted %d at its head', (role, deduction) => {
    const members = ofRole(hipRoof, role)
    expect(members.length).toBeGreaterThan(0)
    for (const member of members) expect(member.headDeductionMm).toBeCloseTo(deduction, 2)
  })

  test('the ridge runs half a rafter past each centring pair', () => {
    const ridge = first(hipRoof, 'ridge')
    expect(ridge.headDeductionMm).toBeCloseTo(-22.5, 6)
    expect(ridge.footDeductionMm).toBeCloseTo(-22.5, 6)
    expect(ridge.cutLengthMm).toBeCloseTo(3045, 6)
  })

  test('hip and ridge drop by the agreed amounts', () => {
    expect(first(hipRoof, 'hip').dropMm).toBeCloseTo(5.77, 2)
    expect(first(hipRoof, 'ridge').dropMm).toBeCloseTo(8.16, 2)
  })

  test('a 140 rafter on a 90 plate stands 112.51 over it, heel 41.97, seat 90', () => {
    const { birdsmouth } = first(hipRoof, 'common')
    expect(hipRoof.standMm).toBeCloseTo(112.51, 2)
    expect(birdsmouth?.heelMm).toBeCloseTo(41.97, 2)
    expect(birdsmouth?.seatMm).toBeCloseTo(90, 2)
  })

  test('creepers come in left and right pairs of one length, four to a pair of slopes at each end', () => {
    for (const line of hipRoof.cutLines.filter((l) => l.role === 'creeper')) {
      expect([line.quantity, line.left, line.right]).toEqual([8, 4, 4])
    }
  })

  test('an ordinary hip roof raises no caution', () => {
    expect(hipRoof.cautions).toEqual([])
  })
})

describe('an octagonal end at 25°', () => {
  const diagonal = ofRole(octagonal, 'crown-end').filter((m) => m.cuts[0]!.longSide !== 'none')

  test('the crown end in line bears square, the two diagonal ones go between with two cheeks', () => {
    expect(diagonal).toHaveLength(2)
    for (const crown of diagonal) {
      expect(crown.headDeductionMm).toBeCloseTo(35.11, 2)
      expect(crown.cuts.filter((cut) => cut.end === 'head')).toHaveLength(2)
    }
  })

  test('hips are deducted 64.02', () => {
    for (const hip of ofRole(octagonal, 'hip')) expect(hip.headDeductionMm).toBeCloseTo(64.02, 2)
  })

  test("twice the backed hip's edge bevel is 41.15 where the diagonal crown end wants 42.19, and the spec says what that costs", () => {
    const hip = first(octagonal, 'hip')
    const backed = hip.cuts[0]!.edgeOtherTop!.fromEdgeDeg
    expect(2 * backed).toBeCloseTo(41.15, 1)
    expect(diagonal[0]!.cuts[0]!.edge.fromEdgeDeg).toBeCloseTo(42.19, 2)
    const caution = octagonal.cautions.find((c) => c.code === 'crown-bevel-shortcut')
    expect(caution?.members.sort()).toEqual(diagonal.map((m) => m.mark).sort())
    expect(caution?.text).toContain('41.15')
    expect(caution?.text).toContain('42.19')
  })
})
