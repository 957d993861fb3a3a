import type { NodeLine, RoofLines } from './roof-lines.ts'
import type { Point2, Roof } from './roof-types.ts'
import { at } from './slopes.ts'
import { add2, distance2, dot2, scale2, sub2 } from './vector.ts'

/** A line keeps this near, over the room that two timbers take, to the one beside it all its length. */
const roomMm = 20
/** Lines that part again within this many thicknesses of where they meet are a joint. */
const jointThicknesses = 12

type Strip = {
  index: number
  from: Point2
  to: Point2
  halfMm: number
  isFromPlate: boolean
  lengthMm: number
  /** The joints that it runs between; null at the plate. */
  joints: (number | null)[]
}

const stripOf = (
  roof: Roof,
  lines: RoofLines,
  ofNode: readonly (number | null)[],
  line: NodeLine,
  index: number,
): Strip => {
  const [from, to] = [at(lines.nodes, line.from), at(lines.nodes, line.to)]
  const { valley, hip } = roof.sections
  return {
    index,
    from: from.point,
    to: to.point,
    halfMm: (line.kind === 'valley' ? valley : hip).thicknessMm / 2,
    isFromPlate: from.corner !== null,
    lengthMm: distance2(from.point, to.point),
    joints: [ofNode[line.from] ?? null, ofNode[line.to] ?? null],
  }
}

const distanceTo = (p: Point2, { from, to, lengthMm }: Strip): number => {
  const run = sub2(to, from)
  const share = dot2(sub2(p, from), run) / (lengthMm * lengthMm)
  return distance2(p, add2(from, scale2(run, Math.min(1, Math.max(0, share)))))
}

const liesBeside = (strip: Strip, other: Strip): boolean => {
  const most = strip.halfMm + other.halfMm + roomMm
  const near = [strip.from, strip.to].map((p) => distanceTo(p, other) <= most)
  if (!near.includes(true)) return false
  // in one joint no timber fits between them either
  return near.every((isNear, end) => {
    const joint = strip.joints[end] ?? null
    return isNear || (joint !== null && other.joints.includes(joint))
  })
}

/** Which of two lines keeps its timber: the one from the plate, then the longer. */
const keepsBefore = (a: Strip, b: Strip): number =>
  Number(b.isFromPlate) - Number(a.isFromPlate) || b.lengthMm - a.lengthMm || a.index - b.index

/**
 * Hips, broken hips and valleys that run so close beside another one that there is no room for two
 * timbers: the slope between them is narrower than either. They get none; what would bear on them
 * bears on the other.
 */
export const pinchedLines = (
  roof: Roof,
  lines: RoofLines,
  ofNode: readonly (number | null)[],
  skipped: ReadonlySet<number>,
): ReadonlySet<number> => {
  const strips = lines.lines.flatMap((line, index): Strip[] => {
    const isCrease = line.kind === 'hip' || line.kind === 'broken-hip' || line.kind === 'valley'
    return isCrease && !skipped.has(index) ? [stripOf(roof, lines, ofNode, line, index)] : []
  })
  const kept: Strip[] = []
  const pinched = new Set<number>()
  for (const strip of strips.sort(keepsBefore)) {
    const isLong = strip.lengthMm > jointThicknesses * 2 * strip.halfMm
    const isPinched = isLong && kept.some((other) => liesBeside(strip, other))
    if (isPinched) pinched.add(strip.index)
    else kept.push(strip)
  }
  return pinched
}
