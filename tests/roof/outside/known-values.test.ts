import { expect, test } from 'vitest'

import { frameRoof } from '../../../shared/roof/frame-roof.ts'
import { hipBuilding } from '../support/hip-building.ts'
import { hipFrom, ofRole } from '../support/members.ts'
import { misfits } from '../support/misfits.ts'
import { convexReferences, referenceRoof } from '../support/roofs.ts'

/**
 * Source: the project's own agreement on what the computation means; "built once from this text, no
 * published source". Rafters 45 thick and 140 deep on 90 plates, hip and ridge 35 thick, 25°.
 */
const PRINTED = 0.005

test('deductions at a square hip end at 25° are the agreed ones', () => {
  const { spec, common, crown, hip, sideCreepers, endCreepers } = hipBuilding(25, 3000)
  const plain = ofRole(spec, 'common').map((m) => m.headDeductionMm)
  const creepers = [...sideCreepers, ...endCreepers].map((m) => m.headDeductionMm)
  expect(creepers.length).toBeGreaterThan(4)
  const rows = [
    ...plain.map(
      (mm, i) => [`common ${i}`, mm, 19.31, PRINTED] as [string, number, number, number],
    ),
    ['centring rafter', common.headDeductionMm, 19.31, PRINTED] as [string, number, number, number],
    ['crown end', crown.headDeductionMm, 24.83, PRINTED] as [string, number, number, number],
    ['hip', hip.headDeductionMm, 33.5, PRINTED] as [string, number, number, number],
    ...creepers.map(
      (mm, i) => [`creeper ${i}`, mm, 27.31, PRINTED] as [string, number, number, number],
    ),
  ]
  expect(misfits(rows)).toEqual([])
})

test('hip and ridge drop, stand, heel and seat at 25° are the agreed ones', () => {
  const { spec, hip, ridge, common } = hipBuilding(25, 3000, { hipTop: 'lowered' })
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

test('deductions at an octagonal end at 25° are the agreed ones', () => {
  const reference = convexReferences.find((r) => r.id === 'octagonal-end')!
  const roof = referenceRoof(reference)
  const spec = frameRoof(roof)
  const crowns = ofRole(spec, 'crown-end')
  // In line with the ridge its bearing is 0 or 180°; the two diagonal ones stand at 45° to it.
  const inLine = crowns.filter((m) => Math.abs(m.axis.to.y - m.axis.from.y) < 1)
  const diagonal = crowns.filter((m) => Math.abs(m.axis.to.y - m.axis.from.y) >= 1)
  expect([inLine.length, diagonal.length]).toEqual([1, 2])
  const hips = roof.outline.slice(1, 5).map((corner) => hipFrom(spec, corner))
  expect(
    misfits([
      ['crown end in line', inLine[0]!.headDeductionMm, 24.83, PRINTED],
      ...diagonal.map((m): [string, number, number, number] => [
        `diagonal crown end ${m.mark}`,
        m.headDeductionMm,
        35.11,
        PRINTED,
      ]),
      ...hips.map((m): [string, number, number, number] => [
        `hip ${m.mark}`,
        m.headDeductionMm,
        64.02,
        PRINTED,
      ]),
    ]),
  ).toEqual([])
})

test('the octagonal end’s backed hip bevel of 20.58° does not double to the crown end’s 42.19°', () => {
  const reference = convexReferences.find((r) => r.id === 'octagonal-end')!
  const roof = referenceRoof(reference)
  const spec = frameRoof(roof)
  const diagonal = ofRole(spec, 'crown-end').filter(
    (m) => Math.abs(m.axis.to.y - m.axis.from.y) >= 1,
  )
  const bevels = diagonal.flatMap((m) =>
    m.cuts.filter((c) => c.end === 'head').map((c) => c.edge.fromEdgeDeg),
  )
  const hip = hipFrom(spec, roof.outline[1]!)
  const hipBevels = hip.cuts.filter((c) => c.end === 'head').map((c) => c.edge.fromEdgeDeg)
  expect(bevels).toHaveLength(4)
  const rows = [
    ...bevels.map((deg): [string, number, number, number] => ['crown end', deg, 42.19, PRINTED]),
    ...hipBevels.map((deg): [string, number, number, number] => ['hip', deg, 20.58, PRINTED]),
  ]
  expect(misfits(rows)).toEqual([])
  expect(spec.cautions.map((c) => c.code)).toContain('crown-bevel-shortcut')
})
