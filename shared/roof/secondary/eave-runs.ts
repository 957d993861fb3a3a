import { cornerOffLineMm, at } from '../slopes.ts'
import type { PlateEdge, PlateLines } from '../slopes.ts'
import { cross2 } from '../vector.ts'
import { eavesThatMeet, runsStraightOn, tailLineMm } from './tail-lines.ts'

/** What a fascia meets at an end: another eave's fascia, a gable's verge, or an eave that runs on at another height. */
export type RunEnd = {
  kind: 'mitre' | 'verge' | 'square'
  /** The plate corner, and the edge beyond it. */
  corner: number
  edge: number
  /** An inward corner of the plan. */
  inward: boolean
}

/** Eaves in one line with one tail plane, in order, and what is at both ends. */
export type EaveRun = { edges: number[]; from: RunEnd; to: RunEnd; lengthMm: number }

/** Plates less out of line than this share one fascia. */
const oneLineMm = 0.01

const sharesTail = (before: PlateEdge, after: PlateEdge): boolean =>
  before.finish === 'eave' &&
  after.finish === 'eave' &&
  before.pitchDeg === after.pitchDeg &&
  before.overhangMm === after.overhangMm &&
  runsStraightOn(before, after) &&
  Math.abs(cornerOffLineMm(before.from, after.from, after.to)) < oneLineMm

const runEnd = (before: PlateEdge, after: PlateEdge, beyond: PlateEdge): RunEnd => ({
  kind: beyond.finish === 'gable' ? 'verge' : runsStraightOn(before, after) ? 'square' : 'mitre',
  corner: after.index,
  edge: beyond.index,
  inward: cross2(before.along, after.along) < 0,
})

/** The runs of eaves that take one fascia of this thickness each, in the order of their first edges; none where two meet over a recess. */
export const eaveRuns = (plates: PlateLines, boardMm: number): EaveRun[] => {
  const { edges } = plates
  const taken = eavesThatMeet(plates, boardMm).flatMap((k) => [
    at(edges, k - 1),
    at(edges, k),
    at(edges, k + 1),
  ])
  return edges.flatMap((edge): EaveRun[] => {
    const before = at(edges, edge.index - 1)
    if (edge.finish === 'gable' || sharesTail(before, edge)) return []
    const own = [edge]
    while (own.length < edges.length && sharesTail(at(own, -1), at(edges, at(own, -1).index + 1))) {
      own.push(at(edges, at(own, -1).index + 1))
    }
    const last = at(own, -1)
    const after = at(edges, last.index + 1)
    const lengthMm = own.reduce((sum, { index }) => sum + tailLineMm(plates, index), 0)
    if (lengthMm <= 0 || own.some((one) => taken.includes(one))) return []
    return [
      {
        edges: own.map(({ index }) => index),
        from: runEnd(before, edge, before),
        to: runEnd(last, after, after),
        lengthMm,
      },
    ]
  })
}
