import { describe, expect, test } from 'vitest'

import type { FrameSpec, Roof } from '../../../shared/roof/roof-types.ts'
import { planeOfEdge } from '../support/members.ts'
import { rectangle } from '../support/plans.ts'
import { makeRoof } from '../support/roofs.ts'
import { cos, endOf, framed, membersOf, sin, tan, withSizes } from './sized.ts'

const gableRoof = (changes: Partial<Roof> = {}, pitches = [25, 25]): Roof => ({
  ...withSizes(
    makeRoof(rectangle(9000, 6000), [pitches[0]!, 'gable', pitches[1]!, 'gable']),
    'barge',
    'fascia',
  ),
  ...changes,
})

const bargesOn = (spec: FrameSpec, edge: number) =>
  membersOf(spec, 'barge').filter((m) => m.planes.includes(planeOfEdge(spec, edge)))

test('two barges a gable, one up each slope', () => {
  const spec = framed(gableRoof())
  expect(membersOf(spec, 'barge')).toHaveLength(4)
  expect(bargesOn(spec, 0)).toHaveLength(2)
})

test('no barges on hips, and only where a size is typed', () => {
  const hip = withSizes(makeRoof(rectangle(9000, 6000), Array(4).fill(25)), 'barge')
  expect(membersOf(framed(hip), 'barge')).toEqual([])
  const bare = makeRoof(rectangle(9000, 6000), [25, 'gable', 25, 'gable'])
  expect(membersOf(framed(bare), 'barge')).toEqual([])
})

describe('plumb tails', () => {
  test('plumb at the apex against the other barge, plumb at the foot in line with the fascia’s front', () => {
    const spec = framed(gableRoof())
    for (const barge of membersOf(spec, 'barge')) {
      const [head, foot] = [endOf(barge, 'head'), endOf(barge, 'tail')]
      expect(head.face.fromEdgeDeg).toBeCloseTo(65, 9)
      expect(foot.face.fromEdgeDeg).toBeCloseTo(65, 9)
      expect(spec.members.find((m) => m.mark === head.against)?.role).toBe('barge')
      expect(foot.against).toBeNull()
    }
  })

  test('from the fascia’s front to the apex along the slope, and a plumb cut’s reach', () => {
    const [barge] = membersOf(framed(gableRoof()), 'barge')
    expect(barge!.setOutLengthMm).toBeCloseTo(3000 / cos(25), 6)
    expect(barge!.tailLengthMm).toBeCloseTo((450 + 30) / cos(25), 6)
    expect(barge!.cutLengthMm).toBeCloseTo((3000 + 480) / cos(25) + 190 * tan(25), 6)
  })

  test('the back stands on the verge line, the top in line with the rafters’ tops', () => {
    const spec = framed(gableRoof())
    for (const barge of membersOf(spec, 'barge')) {
      const { x, z } = barge.axis.from
      expect(Math.min(Math.abs(x + 465), Math.abs(x - 9465))).toBeCloseTo(0, 6)
      expect(z).toBeCloseTo(spec.standMm, 6)
    }
  })
})

test('square tails: the foot is cut square to the barge, 30 mm past the tails', () => {
  const [barge] = membersOf(framed(gableRoof({ tail: 'square' })), 'barge')
  expect(endOf(barge!, 'tail').face.fromEdgeDeg).toBeCloseTo(90, 9)
  expect(barge!.tailLengthMm).toBeCloseTo(450 / cos(25) + 30, 6)
})

test('unequal pitches meet plumb over the ridge, each at its own bevel', () => {
  // ridge at x tan 25 = (6000 − x) tan 35
  const spec = framed(gableRoof({}, [25, 35]))
  const ridge = (6000 * tan(35)) / (tan(25) + tan(35))
  const [low] = bargesOn(spec, 0)
  const [steep] = bargesOn(spec, 2)
  expect(low!.axis.to.y).toBeCloseTo(ridge, 6)
  expect(steep!.axis.to.y).toBeCloseTo(ridge, 6)
  expect(low!.axis.to.z).toBeCloseTo(steep!.axis.to.z, 6)
  expect(endOf(low!, 'head').face.fromEdgeDeg).toBeCloseTo(65, 9)
  expect(endOf(steep!, 'head').face.fromEdgeDeg).toBeCloseTo(55, 9)
})

test('the fascia’s end lies against the barge that covers it', () => {
  const spec = framed(gableRoof())
  const barges = membersOf(spec, 'barge').map((m) => m.mark)
  for (const fascia of membersOf(spec, 'fascia')) {
    for (const cut of fascia.cuts) expect(barges).toContain(cut.against)
  }
})

test('a barge weighs its bar: density times section times cut length', () => {
  const [barge] = membersOf(framed(gableRoof()), 'barge')
  const volumeM3 = (0.03 * 0.19 * barge!.cutLengthMm) / 1000
  expect(barge!.weightKg).toBeCloseTo(volumeM3 * 550, 6)
  expect(sin(barge!.pitchDeg) * barge!.setOutLengthMm).toBeCloseTo(barge!.riseMm, 6)
})
