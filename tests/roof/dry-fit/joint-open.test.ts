import { beforeAll, expect, test } from 'vitest'
import { frameRoof } from '../../../shared/roof/frame-roof.ts'
import type { FrameSpec } from '../../../shared/roof/roof-types.ts'
import { convexReferences, makeRoof, referenceRoof } from '../support/roofs.ts'
import { furtherRoofs } from './further-roofs.ts'
import { randomBuilding, randomRoof } from './random-roofs.ts'
import { reportLines } from './report.ts'
import { loadSolidKit, type SolidKit } from './solid-kit.ts'
import { dryFit } from './stand-up.ts'

let kit: SolidKit
beforeAll(async () => {
  kit = await loadSolidKit()
})

const openMarks = (spec: FrameSpec) =>
  spec.cautions
    .filter((caution) => caution.code === 'joint-open')
    .flatMap((caution) => caution.members)

test('a head that no order of joints closes is named, and the solids agree that it stands open', () => {
  // Eight corners, a pitch of its own on every side: found by trying random plans, no source.
  const roof = makeRoof(
    [
      [-5617, -642],
      [-2138, -2275],
      [2755, -2155],
      [5643, -600],
      [5005, 1249],
      [3281, 2021],
      [-2815, 2141],
      [-4776, 1398],
    ],
    [33, 36.5, 36, 36.8, 34.4, 36.5, 33.9, 31.4],
    {},
  )
  const spec = frameRoof(roof)
  const marks = openMarks(spec)
  expect(marks).toHaveLength(1)
  const complaints = reportLines(dryFit(kit, roof, spec))
  expect(complaints.filter((line) => line.includes(marks[0]!))).not.toEqual([])
})

test('no reference roof, further roof or everyday random plan is said to have an open joint', () => {
  const roofs = [
    ...convexReferences.map((roof) => referenceRoof(roof, { hipTop: 'lowered', tail: 'plumb' })),
    ...Object.values(furtherRoofs).map((build) => build()),
    ...Array.from({ length: 40 }, (_, i) => randomRoof(i + 1)),
    ...Array.from({ length: 40 }, (_, i) => randomBuilding(i + 1)),
  ]
  expect(roofs.flatMap((roof) => openMarks(frameRoof(roof)))).toEqual([])
})
