import { describe, expect, test } from 'vitest'

import { frameRoof } from '../../../shared/roof/frame-roof.ts'
import type { FrameSpec, Point3, RoofLine } from '../../../shared/roof/roof-types.ts'
import { misfits, type Row } from '../support/misfits.ts'
import {
  convexReferences,
  hollowReferences,
  referenceRoof,
  type ReferenceRoof,
} from '../support/roofs.ts'

/**
 * Source: tests/fixtures/roofs.json; every node there is the intersection of roof planes chosen by
 * hand from the plan, outside this program. Tolerances as stated there: 0.1 mm, 0.01°, 0.001 m².
 */
const MM = 0.1
const DEG = 0.01
const M2 = 0.001

type ReferenceLine = ReferenceRoof['lines'][number]

const apart = (a: Point3, b: number[]): number => Math.hypot(a.x - b[0]!, a.y - b[1]!, a.z - b[2]!)

const isSame = (line: RoofLine, wanted: ReferenceLine): boolean =>
  [
    [line.from, line.to],
    [line.to, line.from],
  ].some(([a, b]) => apart(a!, wanted.frm) < MM && apart(b!, wanted.to) < MM)

const edgesOf = (spec: FrameSpec, line: RoofLine): number[] =>
  line.planes.flatMap((p) => spec.planes[p]!.edges).sort((a, b) => a - b)

function lineRows(roof: ReferenceRoof, spec: FrameSpec, wanted: ReferenceLine): Row[] {
  const name = `${wanted.kind} ${wanted.frm.join(',')}`
  const line = spec.lines.find((l) => l.kind !== 'eave' && isSame(l, wanted))
  if (line === undefined) return [[`${name} is there`, 0, 1, 0]]
  const slopes = wanted.edges.filter((e) => typeof roof.edges[e] !== 'string').sort((a, b) => a - b)
  return [
    [`${name}: kind ${line.kind}`, +(line.kind === wanted.kind.replace(' ', '-')), 1, 0],
    [`${name}: plan length`, line.planLengthMm, wanted.plan_length_mm, MM],
    [`${name}: true length`, line.trueLengthMm, wanted.true_length_mm, MM],
    [`${name}: pitch`, line.pitchDeg, wanted.pitch_deg, DEG],
    [`${name}: slopes`, +(edgesOf(spec, line).join() === slopes.join()), 1, 0],
  ]
}

function areaRows(roof: ReferenceRoof, spec: FrameSpec): Row[] {
  const rows = roof.slope_area_m2.flatMap((area, edge): Row[] => {
    const plane = spec.planes.find((p) => p.edges.includes(edge))
    if (area === null) return [[`edge ${edge} is a gable`, +(plane === undefined), 1, 0]]
    return [[`slope ${edge}, area`, plane?.areaM2 ?? NaN, area, M2]]
  })
  const total = roof.slope_area_m2.reduce<number>((sum, area) => sum + (area ?? 0), 0)
  return [...rows, ['roof area', spec.totals.roofAreaM2, total, M2]]
}

const lengthOf = (roof: ReferenceRoof, ...kinds: string[]): number =>
  roof.lines.filter((l) => kinds.includes(l.kind)).reduce((sum, l) => sum + l.true_length_mm, 0)

describe('convex reference roofs', () => {
  test('seven of the eleven reference roofs are convex', () => {
    expect([convexReferences.length, hollowReferences.length]).toEqual([7, 4])
  })

  test.each(convexReferences)('$title has the lines and slope areas of its planes', (roof) => {
    const spec = frameRoof(referenceRoof(roof))
    const sloping = spec.lines.filter((l) => l.kind !== 'eave')
    const rows: Row[] = [
      ['lines', sloping.length, roof.lines.length, 0],
      ['slopes', spec.planes.length, roof.slope_area_m2.filter((a) => a !== null).length, 0],
      ...roof.lines.flatMap((line) => lineRows(roof, spec, line)),
      ...areaRows(roof, spec),
      ['ridge in all', spec.totals.ridgeMm, lengthOf(roof, 'ridge'), MM],
      ['hips in all', spec.totals.hipMm, lengthOf(roof, 'hip', 'broken hip'), MM],
    ]
    expect(misfits(rows)).toEqual([])
  })

  test.each(convexReferences)('$title has its nodes where three planes meet', (roof) => {
    const spec = frameRoof(referenceRoof(roof))
    const ends = spec.lines.filter((l) => l.kind !== 'eave').flatMap((l) => [l.from, l.to])
    const missing = Object.entries(roof.nodes).filter(
      ([, node]) => !ends.some((end) => apart(end, node) < MM),
    )
    expect(missing).toEqual([])
  })
})

describe('plans with an inside corner', () => {
  test.each(hollowReferences)('$title is refused in a sentence that names a corner', (roof) => {
    const frame = (): FrameSpec => frameRoof(referenceRoof(roof))
    expect(frame).toThrow(/corner \d+/i)
    expect(frame).toThrow(/\w+ \w+ \w+ \w+ \w+/)
  })
})
