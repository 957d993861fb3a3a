import { describe, expect, test } from 'vitest'

import { framedOnce } from '../support/framed.ts'
import { hipBuilding } from '../support/hip-building.ts'
import { cutsAt, hipFrom, ofRole } from '../support/members.ts'
import { misfits, type Row } from '../support/misfits.ts'
import { convexReferences, referenceRoof } from '../support/roofs.ts'
import type { Member } from '../../../shared/roof/roof-types.ts'

/**
 * Source: the project's written agreement on what the computation means ("Known values, 25°"): built once
 * from that text, no published source. Rafters 45 thick and 140 deep on 90 plates, hip and ridge 35 thick.
 */
const PRINTED = 0.005

const deductions = (name: string, members: Member[], expected: number): Row[] => [
  [`${name}: there are some`, +(members.length > 0), 1, 0],
  ...members.map((m): Row => [`${name} ${m.mark}`, m.headDeductionMm, expected, PRINTED]),
]

describe('a hip roof at 25°', () => {
  const { spec, common, crown, hip, ridge } = hipBuilding(25, 3000, { hipTop: 'lowered' })

  test.each(['lowered', 'backed'] as const)(
    'hips %s: its heads lose the agreed lengths',
    (hipTop) => {
      const built = hipBuilding(25, 3000, { hipTop })
      expect(
        misfits([
          ...deductions('common', ofRole(built.spec, 'common'), 19.31),
          ...deductions('crown end', ofRole(built.spec, 'crown-end'), 24.83),
          ...deductions('creeper', ofRole(built.spec, 'creeper'), 27.31),
          ...deductions('hip', ofRole(built.spec, 'hip'), 33.5),
        ]),
      ).toEqual([])
      expect([common.role, crown.role]).toEqual(['common', 'crown-end'])
    },
  )

  test('the ridge runs half a rafter past each centring pair', () => {
    expect(ridge.headDeductionMm).toBeCloseTo(-22.5, 6)
    expect(ridge.footDeductionMm).toBeCloseTo(-22.5, 6)
    expect(ridge.cutLengthMm).toBeCloseTo(3600 + 45, 6)
  })

  test('hip and ridge drop, stand, heel and seat are the agreed ones', () => {
    expect(
      misfits([
        ['hip drop', hip.dropMm, 5.77, PRINTED],
        ['ridge drop', ridge.dropMm, 8.16, PRINTED],
        ['stand', spec.standMm, 112.51, PRINTED],
        ['heel', common.birdsmouth?.heelMm ?? NaN, 41.97, PRINTED],
        ['seat', common.birdsmouth?.seatMm ?? NaN, 90, PRINTED],
      ]),
    ).toEqual([])
  })

  test('creepers come in left and right pairs of one length, four to a pair of slopes at each end', () => {
    const lines = spec.cutLines.filter((line) => line.role === 'creeper')
    expect(lines.length).toBeGreaterThan(2)
    for (const line of lines) expect([line.quantity, line.left, line.right]).toEqual([8, 4, 4])
  })

  test('an ordinary hip roof raises no caution', () => {
    expect(spec.cautions).toEqual([])
  })
})

describe('an octagonal end at 25°', () => {
  const roof = referenceRoof(convexReferences.find((r) => r.id === 'octagonal-end')!)
  const spec = framedOnce(roof)
  const crowns = ofRole(spec, 'crown-end')
  // in line with the ridge its bearing is 0 or 180°; the two diagonal ones stand at 45° to it
  const isInLine = ({ axis }: Member): boolean => Math.abs(axis.to.y - axis.from.y) < 1
  const diagonal = crowns.filter((m) => !isInLine(m))
  const hips = roof.outline.slice(1, 5).map((corner) => hipFrom(spec, corner))

  test('the crown end in line bears square, the two diagonal ones go between with two cheeks', () => {
    expect([crowns.filter(isInLine).length, diagonal.length]).toEqual([1, 2])
    for (const crown of diagonal) expect(cutsAt(crown, 'head')).toHaveLength(2)
  })

  test('its heads lose the agreed lengths', () => {
    expect(
      misfits([
        ...deductions('crown end in line', crowns.filter(isInLine), 24.83),
        ...deductions('diagonal crown end', diagonal, 35.11),
        ...deductions('hip', hips, 64.02),
      ]),
    ).toEqual([])
  })

  test('twice the backed hip’s bevel of 20.58° is not the crown end’s 42.19°, and the spec says what that costs', () => {
    const bevels = (members: Member[]): number[] =>
      members.flatMap((m) => cutsAt(m, 'head').map((cut) => cut.edge.fromEdgeDeg))
    expect([bevels(diagonal).length, bevels(hips).length]).toEqual([4, 8])
    expect(
      misfits([
        ...bevels(diagonal).map((deg): Row => ['crown end', deg, 42.19, PRINTED]),
        ...bevels(hips).map((deg): Row => ['hip', deg, 20.58, PRINTED]),
      ]),
    ).toEqual([])
    const caution = spec.cautions.find((c) => c.code === 'crown-bevel-shortcut')
    expect([...(caution?.members ?? [])].sort()).toEqual(diagonal.map((m) => m.mark).sort())
    expect(caution?.text).toContain('41.15')
    expect(caution?.text).toContain('42.19')
  })
})
