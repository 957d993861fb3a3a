import { pieceHand } from './timber-hand.ts'
import type { DrawnMember } from './timber-pose.ts'
import type { TimberPoint } from './timber-shape.ts'
import { endCuts, timberTopEnd } from './timber-shape.ts'

export type MeasuringPointName = 'long point' | 'short point' | 'edge' | 'cut'

/** A place the tape reads on the top of the timber, from the heel plumb line. */
export type MeasuringPoint = {
  end: 'head' | 'tail' | 'foot'
  name: MeasuringPointName
  /** Which arrises it is on, or where between them two cheeks meet. */
  side: 'left' | 'right' | 'both edges' | 'centre' | 'left of centre' | 'right of centre'
  alongMm: number
  places: TimberPoint[]
}

const sameMm = 0.05

/**
 * What the tape reads at one end of a timber, the farthest first. A cut square across gives one
 * reading, one cheek two, two cheeks two or three.
 */
export function measuringPoints(member: DrawnMember, end: 'head' | 'foot'): MeasuringPoint[] {
  const outward = end === 'head' ? 1 : -1
  const endWord = endCuts(member, end)[0]?.end ?? end
  const groups: TimberPoint[][] = []
  for (const place of timberTopEnd(member, end)) {
    const same = groups.find(
      (group) => Math.abs((group[0]?.alongMm ?? 0) - place.alongMm) <= sameMm,
    )
    if (same) same.push(place)
    else groups.push([place])
  }
  const ordered = groups.sort((a, b) => outward * ((b[0]?.alongMm ?? 0) - (a[0]?.alongMm ?? 0)))
  return ordered.map((places, i) => ({
    end: endWord,
    name: pointName(i, ordered.length),
    side: pointSide(places, member.section.thicknessMm / 2),
    alongMm: places[0]?.alongMm ?? 0,
    places,
  }))
}

/** The words on the tape's line, fullest first: "long point, left", then "long point", "long". */
export function measuringPointWords(point: MeasuringPoint): string[] {
  if (point.name === 'cut')
    return point.end === 'head' ? ['heel to head cut', 'head cut'] : [point.end]
  const short = point.name === 'edge' ? point.side : point.name.replace(' point', '')
  if (point.end === 'head') return [`${point.name}, ${point.side}`, point.name, short]
  return [`${point.end} ${point.name}, ${point.side}`, `${point.end} ${short}`, short]
}

function pointName(rank: number, count: number): MeasuringPointName {
  if (count === 1) return 'cut'
  if (rank === 0) return 'long point'
  return rank === count - 1 ? 'short point' : 'edge'
}

function pointSide(places: readonly TimberPoint[], halfMm: number): MeasuringPoint['side'] {
  const onArris = places.filter((p) => Math.abs(p.acrossMm) > halfMm - 0.01)
  if (onArris.length > 1) return 'both edges'
  const acrossMm = (onArris[0] ?? places[0])?.acrossMm ?? 0
  if (onArris.length === 1) return acrossMm > 0 ? 'left' : 'right'
  if (Math.abs(acrossMm) < 0.5) return 'centre'
  return acrossMm > 0 ? 'left of centre' : 'right of centre'
}

/** Which way round a timber is cut, in words over its drawing: "Long point on the left, bow up". */
export function handWords(member: DrawnMember): string {
  const hand = pieceHand(member)
  if (hand?.end === 'head') return `Long point on the ${hand.side}, bow up`
  const cheeks = endCuts(member, 'head').filter((cut) => cut.longSide !== 'none').length
  const foot = hand ? `, foot's long point on the ${hand.side}` : ''
  if (cheeks > 1) return `Long point in the middle, two cheeks${foot}, bow up`
  return `Square across the head${foot}, bow up`
}
