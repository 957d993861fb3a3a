import { planSegments, sharedRange } from './contacts.ts'
import type { Segment } from './contacts.ts'
import { boxesMeet, convexOverlap, grownBox, polygonSignedArea } from './convex.ts'
import type { Box } from './convex.ts'
import { phases } from './joint-phases.ts'
import type { EndJob } from './joint-phases.ts'
import { gather } from './lists.ts'
import { isAlongCrease } from './piece.ts'
import type { Piece, PieceEnd, PlanCut } from './piece.ts'
import type { Point2 } from './roof-types.ts'
import { at } from './slopes.ts'
import { halfObstacle } from './trim.ts'
import type { Obstacle } from './trim.ts'
import { add2, cross2, distance2, dot2, scale2, sub2 } from './vector.ts'

/** What is wrong with a group of joints: how much in all, and which of them had better be made another way. */
export type JointFaults = {
  total: number
  needsOther: (joint: number) => boolean
  /** Pieces whose heads do not close. */
  openPieces: readonly number[]
  /** Whether a hip or valley stops far short of its end. */
  stopsShort: boolean
}

/** A head that does not close, in the count of faults; a third cut or a feathered one only adds to it. */
const open = 10
const awkward = 1
/** A cut that runs along its piece, or an end that hangs by a corner, is worth another way though it closes. */
const poor = 5
/** An end hangs by a corner where less than this share of its faces bears. */
const leastBorne = 0.2
/** A cut leaner than this to its piece (cosine) runs out in a feather. */
const featherFacing = 0.2
/** And one leaner than this would have to be ripped along it. */
const ripFacing = 0.1
/** Cut faces shorter than this in plan are slivers. */
const sliverMm = 0.3
/** Where a face has closed it bears; what lies as far behind it as `behindMm` it was meant to meet. */
const closedMm = 0.1
const nearlyMm = 1.5
const behindMm = 6
/** What lies further than this off an end has no part in it; more than `behindMm`. */
const besideMm = 10
const closedShare = 0.985
/** A hip or valley that stops this far short of its end leaves what should bear on it there hanging. */
const farMm = 400
/** Pieces that share more of the plan than this are in each other's way. */
const overlapMm2 = 1

/** What stands in plan: the piece, the shape of it, and of a timber not cut yet the joints it runs to. */
type Body = {
  piece: number
  points: readonly Point2[]
  sides: Segment[]
  box: Box
  runsTo: Obstacle['runsTo']
}

/** Length of a segment within a convex shape. */
const lengthWithin = (from: Point2, to: Point2, points: readonly Point2[]): number => {
  const run = sub2(to, from)
  let low = 0
  let high = 1
  for (let k = 0; k < points.length; k++) {
    const p = at(points, k)
    const side = sub2(at(points, k + 1), p)
    const start = cross2(side, sub2(from, p))
    const gain = cross2(side, run)
    if (Math.abs(gain) < 1e-12) {
      if (start < 0) return 0
      continue
    }
    const crossing = -start / gain
    if (gain > 0) low = Math.max(low, crossing)
    else high = Math.min(high, crossing)
    if (high <= low) return 0
  }
  return (high - low) * Math.hypot(run.x, run.y)
}

const touchesFace = (face: Segment, body: Body): boolean =>
  body.sides.some((side) => sharedRange(face, side) !== null)

/** How much of a cut's face bears, mm in plan, and whether it closes on all that it was meant to meet. */
const bearingOf = (face: Segment, cut: PlanCut, bodies: readonly Body[]) => {
  const named = bodies.filter((body) => touchesFace(face, body))
  if (named.length === 0) return { bornMm: 0, closes: false }
  const covered = (offMm: number) => {
    const off = scale2(cut.normal, offMm)
    const [from, to] = [add2(face.from, off), add2(face.to, off)]
    return named.reduce((sum, body) => sum + lengthWithin(from, to, body.points), 0)
  }
  const meant = Math.min(covered(behindMm), covered(nearlyMm))
  const bornMm = covered(closedMm)
  return { bornMm, closes: bornMm >= closedShare * meant && bornMm > sliverMm }
}

/** How far before its set-out end a piece's centre line is cut off; under 0 where it runs past. */
const shortMm = (piece: Piece, end: PieceEnd, cuts: readonly PlanCut[]): number => {
  const [set, out] = end === 'head' ? [piece.head, piece.dir] : [piece.foot, scale2(piece.dir, -1)]
  return Math.max(
    ...cuts.map(({ normal, point }) => dot2(normal, sub2(set, point)) / dot2(normal, out)),
  )
}

const isCutShort = ({ piece, end }: EndJob): boolean =>
  isAlongCrease(piece.role) &&
  shortMm(piece, end, end === 'head' ? piece.headCuts : piece.footCuts) > farMm

const endFaults = (job: EndJob, own: Body, bodies: readonly Body[]): number => {
  const { piece, end } = job
  const cuts = end === 'head' ? piece.headCuts : piece.footCuts
  let faults = Math.max(0, cuts.length - 2) * awkward
  let [faceMm, bornMm] = [0, 0]
  if (isCutShort(job)) faults += poor
  cuts.forEach((cut, k) => {
    const facing = Math.abs(dot2(cut.normal, piece.dir))
    if (facing < featherFacing) faults += facing < ripFacing ? poor : awkward
    const face = own.sides.find((s) => s.side.kind === end && s.side.cut === k)
    const size = face === undefined ? 0 : distance2(face.from, face.to)
    if (face === undefined || size < sliverMm) {
      faults += open
      return
    }
    const bearing = bearingOf(face, cut, bodies)
    if (!bearing.closes) faults += open
    faceMm += size
    bornMm += bearing.bornMm
  })
  return bornMm < leastBorne * faceMm ? faults + poor : faults
}

/** Whether a timber not cut yet runs to a joint of this piece: there the one is cut to the other, and looked at again. */
const meetsLater = ({ headJoint, footJoint }: Piece, { runsTo = [] }: Body): boolean =>
  runsTo.some((joint) => joint !== null && (joint === headJoint || joint === footJoint))

const overlaps = (piece: Piece, own: Body, bodies: readonly Body[]): boolean =>
  bodies.some(
    (body) =>
      body.piece !== own.piece &&
      !meetsLater(piece, body) &&
      boxesMeet(own.box, body.box) &&
      polygonSignedArea(convexOverlap(own.points, body.points)) > overlapMm2,
  )

export const bodyOf = (obstacle: Obstacle): Body => ({
  piece: obstacle.piece,
  points: obstacle.polygon.points,
  sides: planSegments(obstacle.piece, obstacle.polygon),
  box: obstacle.box,
  runsTo: obstacle.runsTo,
})

/** Looks at all ends of a group of joints as placed in order: whether each bears and closes on what stood before it. */
export const jointFaults = (
  jobs: readonly EndJob[],
  before: readonly Body[],
  hasFootJob: (piece: Piece) => boolean,
): JointFaults => {
  const made = new Map<number, Body[]>()
  const ends = jobs.map(({ piece, end }) => bodyOf(halfObstacle(piece, end)))
  jobs.forEach(({ piece, end }, k) => {
    const bodies = made.get(piece.id) ?? []
    made.set(piece.id, bodies)
    bodies.push(at(ends, k))
    if (end === 'head' && !hasFootJob(piece)) bodies.push(bodyOf(halfObstacle(piece, 'foot')))
  })
  const standing: Body[] = [...before]
  const ofJoint = new Map<number, number>()
  const openPieces: number[] = []
  let total = 0
  jobs.forEach((job, k) => {
    const { piece, end } = job
    const own = at(ends, k)
    const cuts = end === 'head' ? piece.headCuts : piece.footCuts
    const mates = gather(cuts, ({ mitreWith }) => made.get(mitreWith ?? -1) ?? [])
    const near = grownBox(own.box, besideMm)
    const others = [...new Set([...standing, ...mates])].filter(
      (body) => body.piece !== piece.id && boxesMeet(near, body.box),
    )
    // a foot that others bear on bears on nothing itself
    const bearing = job.phase === phases.brokenFoot ? 0 : endFaults(job, own, others)
    const faults = bearing + (overlaps(piece, own, others) ? open : 0)
    total += faults
    if (faults >= open) openPieces.push(piece.id)
    if (job.joint !== null) ofJoint.set(job.joint, (ofJoint.get(job.joint) ?? 0) + faults)
    // once one end stands, what bears on the timber bears on all of it
    standing.push(...(made.get(piece.id) ?? []))
    made.delete(piece.id)
  })
  return {
    total,
    needsOther: (joint) => (ofJoint.get(joint) ?? 0) >= poor,
    openPieces,
    stopsShort: jobs.some(isCutShort),
  }
}
