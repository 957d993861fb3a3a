import { describe, expect, test } from 'vitest'

import { plateLines } from '../../../shared/roof/plate-lines.ts'
import { publishedLines, publishedPlanes } from '../../../shared/roof/published-lines.ts'
import { roofLines } from '../../../shared/roof/roof-lines.ts'
import type { Point3, RoofLine, RoofPlane } from '../../../shared/roof/roof-types.ts'
import reference from '../../fixtures/roofs.json' with { type: 'json' }
import { misfits, type Row } from '../support/misfits.ts'
import { referenceRoof, type ReferenceRoof } from '../support/roofs.ts'

/**
 * Source: tests/fixtures/roofs.json; every node there is the intersection of roof planes chosen by
 * hand from the plan, outside this program. Tolerances as stated there: 0.1 mm, 0.01°, 0.001 m².
 */
const MM = 0.1
const DEG = 0.01
const M2 = 0.001

type ReferenceLine = ReferenceRoof['lines'][number]
type Shape = { lines: RoofLine[]; planes: RoofPlane[] }

/** Plates whose slopes grow together are one slope; the narrow T is the one such roof of the list. */
const oneSlope: Record<string, number[][]> = { 'T-narrow-wing': [[2, 6]] }

const shapeOf = (roof: ReferenceRoof): Shape => {
  const plates = plateLines(referenceRoof(roof))
  const lines = roofLines(plates)
  return { lines: publishedLines(plates, lines), planes: publishedPlanes(plates, lines) }
}

const apart = (a: Point3, b: number[]): number => Math.hypot(a.x - b[0]!, a.y - b[1]!, a.z - b[2]!)

const isSame = (line: RoofLine, wanted: ReferenceLine): boolean =>
  [
    [line.from, line.to],
    [line.to, line.from],
  ].some(([a, b]) => apart(a!, wanted.frm) < MM && apart(b!, wanted.to) < MM)

const edgesOf = (shape: Shape, line: RoofLine): number[] =>
  line.planes.flatMap((p) => shape.planes[p]!.edges).sort((a, b) => a - b)

function lineRows(roof: ReferenceRoof, shape: Shape, wanted: ReferenceLine): Row[] {
  const name = `${wanted.kind} ${wanted.frm.join(',')}`
  const line = shape.lines.find((l) => l.kind !== 'eave' && isSame(l, wanted))
  if (line === undefined) return [[`${name} is there`, 0, 1, 0]]
  const slopes = wanted.edges
    .filter((e) => typeof roof.edges[e] !== 'string')
    .flatMap((e) => oneSlope[roof.id]?.find((edges) => edges.includes(e)) ?? [e])
    .sort((a, b) => a - b)
  return [
    [`${name}: kind ${line.kind}`, +(line.kind === wanted.kind.replace(' ', '-')), 1, 0],
    [`${name}: plan length`, line.planLengthMm, wanted.plan_length_mm, MM],
    [`${name}: true length`, line.trueLengthMm, wanted.true_length_mm, MM],
    [`${name}: pitch`, line.pitchDeg, wanted.pitch_deg, DEG],
    [`${name}: slopes`, +(edgesOf(shape, line).join() === slopes.join()), 1, 0],
  ]
}

function areaRows(roof: ReferenceRoof, shape: Shape): Row[] {
  const rows = roof.slope_area_m2.flatMap((area, edge): Row[] => {
    const plane = shape.planes.find((p) => p.edges.includes(edge))
    if (typeof roof.edges[edge] === 'string') {
      return [[`edge ${edge} is a gable`, +(plane === undefined), 1, 0]]
    }
    // the list gives no areas for the T plan; its plan area is checked below
    if (area === null) return []
    return [[`slope ${edge}, area`, plane?.areaM2 ?? NaN, area, M2]]
  })
  return rows
}

const sum = (values: number[]): number => values.reduce((a, b) => a + b, 0)
const lengthOf = (roof: ReferenceRoof, ...kinds: string[]): number =>
  sum(roof.lines.filter((l) => kinds.includes(l.kind)).map((l) => l.true_length_mm))
const ownLengthOf = (shape: Shape, ...kinds: string[]): number =>
  sum(shape.lines.filter((l) => kinds.includes(l.kind)).map((l) => l.trueLengthMm))

describe('reference roofs', () => {
  test('there are eleven', () => {
    expect(reference.roofs).toHaveLength(11)
  })

  test.each(reference.roofs)('$title has the lines and slope areas of its planes', (roof) => {
    const shape = shapeOf(roof)
    const sloping = shape.lines.filter((l) => l.kind !== 'eave')
    const eaves = roof.edges.filter((e) => typeof e !== 'string').length
    const joined = oneSlope[roof.id] ?? []
    const rows: Row[] = [
      ['lines', sloping.length, roof.lines.length, 0],
      ['slopes', shape.planes.length, eaves - joined.length, 0],
      ...roof.lines.flatMap((line) => lineRows(roof, shape, line)),
      ...areaRows(roof, shape),
      ['ridge in all', ownLengthOf(shape, 'ridge'), lengthOf(roof, 'ridge'), MM],
      [
        'hips in all',
        ownLengthOf(shape, 'hip', 'broken-hip'),
        lengthOf(roof, 'hip', 'broken hip'),
        MM,
      ],
      ['valleys in all', ownLengthOf(shape, 'valley'), lengthOf(roof, 'valley'), MM],
    ]
    expect(misfits(rows)).toEqual([])
    for (const edges of joined) {
      expect(shape.planes.map((p) => p.edges)).toContainEqual(edges)
    }
  })

  test.each(reference.roofs)('$title covers its plan, at one pitch by area over cosine', (roof) => {
    const { planes } = shapeOf(roof)
    const plan = sum(planes.map((p) => p.areaM2 * Math.cos((p.pitchDeg * Math.PI) / 180)))
    expect(plan).toBeCloseTo(roof.plan_area_m2, 3)
  })

  test.each(reference.roofs)('$title has its nodes where three planes meet', (roof) => {
    const ends = shapeOf(roof)
      .lines.filter((l) => l.kind !== 'eave')
      .flatMap((l) => [l.from, l.to])
    const missing = Object.entries(roof.nodes).filter(
      ([, node]) => !ends.some((end) => apart(end, node) < MM),
    )
    expect(missing).toEqual([])
  })
})
