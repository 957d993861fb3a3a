import { expect, test } from 'vitest'
import { compareSpecs, type LineChange } from '../../shared/revisions/compare-specs.ts'
import { letterBefore, revisionLetter } from '../../shared/revisions/revision-letters.ts'
import { frameRoof } from '../../shared/roof/frame-roof.ts'
import { makeRoof } from '../roof/support/roofs.ts'

type Changes = { lengthMm?: number; pitchDeg?: number; depthMm?: number; maxSpacingMm?: number }

function hipHouse({ lengthMm = 9000, pitchDeg = 25, depthMm = 140, maxSpacingMm = 600 }: Changes) {
  const corners: [number, number][] = [
    [0, 0],
    [lengthMm, 0],
    [lengthMm, 6000],
    [0, 6000],
  ]
  const roof = makeRoof(corners, [pitchDeg, pitchDeg, pitchDeg, pitchDeg], { maxSpacingMm })
  roof.sections.rafter = { ...roof.sections.rafter, depthMm }
  return frameRoof(roof)
}

const compare = (before: Changes, after: Changes): LineChange[] =>
  compareSpecs(hipHouse(before), hipHouse(after), { sameLengthMm: 1 })

const kindsOf = (changes: LineChange[], role: string) => [
  ...new Set(changes.filter((one) => one.role === role).map((one) => one.kind)),
]

test('a roof against itself has every line the same', () => {
  expect(new Set(compare({}, {}).map((one) => one.kind))).toEqual(new Set(['same']))
})

test('at a steeper pitch every rafter and hip is longer, by what the slope adds', () => {
  const changes = compare({ pitchDeg: 25 }, { pitchDeg: 30 })
  expect(kindsOf(changes, 'common')).toEqual(['longer'])
  expect(kindsOf(changes, 'hip')).toEqual(['longer'])
  expect(changes.find((one) => one.role === 'common')?.byMm).toBeCloseTo(
    hipHouse({ pitchDeg: 30 }).cutLines.find((line) => line.role === 'common')!.cutLengthMm -
      hipHouse({ pitchDeg: 25 }).cutLines.find((line) => line.role === 'common')!.cutLengthMm,
    6,
  )
  // Seen the other way round, the same timbers are shorter.
  expect(kindsOf(compare({ pitchDeg: 30 }, { pitchDeg: 25 }), 'common')).toEqual(['shorter'])
})

test('a longer house has a longer ridge and more commons, and its hips stay the same', () => {
  const changes = compare({ lengthMm: 9000 }, { lengthMm: 10_200 })
  const ridge = changes.find((one) => one.role === 'ridge')
  expect([ridge?.kind, ridge?.byMm]).toEqual(['longer', 1200])
  expect(kindsOf(changes, 'common')).toContain('more')
  expect(kindsOf(changes, 'hip')).toEqual(['same'])
})

test('a deeper rafter is another size, whatever that does to its length', () => {
  expect(kindsOf(compare({ depthMm: 140 }, { depthMm: 190 }), 'common')).toEqual(['other-size'])
})

test('closer rafters bring creepers that were not there and take none twice', () => {
  const changes = compare({ maxSpacingMm: 600 }, { maxSpacingMm: 450 })
  expect(kindsOf(changes, 'creeper')).toContain('added')
  const after = hipHouse({ maxSpacingMm: 450 })
  const named = changes.flatMap((one) => one.after?.mark ?? [])
  expect([...named].sort()).toEqual(after.cutLines.map((line) => line.mark).sort())
})

test('every line of both roofs is in exactly one change', () => {
  const changes = compare({ pitchDeg: 22.5, lengthMm: 8400 }, { pitchDeg: 24, lengthMm: 9600 })
  const before = changes.flatMap((one) => one.before?.mark ?? [])
  expect([...before].sort()).toEqual(
    hipHouse({ pitchDeg: 22.5, lengthMm: 8400 })
      .cutLines.map((line) => line.mark)
      .sort(),
  )
})

test('revision letters run on past Z, and each knows the one before', () => {
  expect(letterBefore('A')).toBeNull()
  for (const sequence of [2, 3, 26, 27, 28, 53, 702, 703])
    expect(letterBefore(revisionLetter(sequence))).toBe(revisionLetter(sequence - 1))
})
