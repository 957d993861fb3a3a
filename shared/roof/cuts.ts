import { bevelOf, bothWays } from './bevel.ts'
import type { Crossing, Timber } from './bevel.ts'
import type { Ground } from './build-pieces.ts'
import { clipConvex, polygonSignedArea } from './convex.ts'
import type { Labelled } from './convex.ts'
import { isAlongCrease, piecePoint } from './piece.ts'
import type { Piece, PlanCut } from './piece.ts'
import type { Cut, Point3 } from './roof-types.ts'
import { at } from './slopes.ts'
import type { PlateEdge } from './slopes.ts'
import { add2, dot3, length2, point3, radians, scale2 } from './vector.ts'
import type { Plane } from './vector.ts'

/** A cut before the pieces have marks. */
export type DraftCut = Omit<Cut, 'against' | 'alsoAgainst'> & {
  /** Pieces that it lies against, most first; none until all are cut. */
  bears: readonly number[]
  /** Place in the piece's list of joint cuts of this end; null for a tail left free. */
  listed: number | null
  crossing: Crossing
}

/** A tail cut with a face smaller than this takes no timber that a saw would find. */
const leastTailMm2 = 30

/** A piece as a timber in space, at its height over plate. */
export const timberOf = (piece: Piece, standMm: number): Timber => {
  const { cos } = piece
  const sin = piece.tan * cos
  const dir = piece.dir
  return {
    origin: { x: piece.foot.x, y: piece.foot.y, z: piece.foot.z + standMm - piece.dropMm },
    direction: { x: dir.x * cos, y: dir.y * cos, z: sin },
    left: point3(piece.left, 0),
    up: { x: -dir.x * sin, y: -dir.y * sin, z: cos },
    down: { x: 0, y: 0, z: -1 },
    halfMm: piece.halfMm,
    depthMm: piece.section.depthMm,
    sin,
    cos,
    // beside a hip that leans back one slope can rise: backing under 0, and nothing to plane there
    arrisFall: piece.backed
      ? {
          left: Math.max(0, piece.fall.left) * piece.halfMm,
          right: Math.max(0, piece.fall.right) * piece.halfMm,
        }
      : { left: 0, right: 0 },
  }
}

/** A piece as it is when done: a valley's top dished once its cuts are sawn on the square blank. */
export const finishedTimber = (piece: Piece, timber: Timber): Timber => {
  if (!piece.dished) return timber
  const arris = (fall: number) => fall * piece.halfMm - piece.dropMm
  return {
    ...timber,
    arrisFall: { left: arris(piece.fall.left), right: arris(piece.fall.right) },
    dishMm: -piece.dropMm,
  }
}

/** The slopes' falls aside, measured square to the piece's edge instead of plumb; a backed top stays square where its slope rises. */
const squareFalls = (piece: Piece) => {
  const fall = (mm: number) => (piece.backed ? Math.max(0, mm) : mm) * piece.cos
  return { left: fall(piece.fall.left), right: fall(piece.fall.right) }
}

const draftCut = (
  ground: Ground,
  piece: Piece,
  timber: Timber,
  end: Cut['end'],
  plane: Plane,
  listed: number | null,
): DraftCut => {
  const bevel = bevelOf(plane, timber, squareFalls(piece))
  const { longSide } = bevel
  const leftIsLong = longSide !== 'right'
  const shown = piece.backed ? bevel.slopedEdgeDeg : bevel.squareEdgeDeg
  const other = piece.backed ? bevel.squareEdgeDeg : bevel.slopedEdgeDeg
  return {
    end,
    plane,
    bears: [],
    listed,
    crossing: bevel.crossing,
    alongMm: bevel.alongMm,
    longSide,
    longPointFromHeelMm: leftIsLong ? bevel.leftMm : bevel.rightMm,
    shortPointFromHeelMm: leftIsLong ? bevel.rightMm : bevel.leftMm,
    face: bothWays(bevel.faceFromEdgeDeg),
    edge: bothWays(shown),
    edgeOtherTop: isAlongCrease(piece.role) ? bothWays(other) : null,
    bladeTiltDeg: bevel.tiltDeg,
    pastSaw: bevel.tiltDeg > ground.settings.sawMaxTiltDeg + 1e-9,
  }
}

/** A plumb joint cut as a plane, its point on the top centre line. */
const jointPlane = (piece: Piece, timber: Timber, cut: PlanCut): Plane => {
  const { normal, point } = cut
  const facing = normal.x * piece.dir.x + normal.y * piece.dir.y
  const planMm =
    (normal.x * (point.x - piece.foot.x) + normal.y * (point.y - piece.foot.y)) / facing
  return {
    point: point3(piecePoint(piece, planMm, 0), timber.origin.z + planMm * piece.tan),
    normal: { x: normal.x, y: normal.y, z: 0 },
  }
}

/** The tail plane of an eave: plumb, or square to the slope, through the overhang line of the top plane. */
export const tailPlane = (ground: Ground, edge: PlateEdge, standMm: number): Plane => {
  const pitch = radians(edge.pitchDeg)
  const line = add2(edge.from, scale2(edge.inward, -edge.overhangMm))
  const point: Point3 = point3(line, standMm - edge.overhangMm * Math.tan(pitch))
  const out = scale2(edge.inward, -1)
  if (ground.roof.tail === 'plumb') return { point, normal: point3(out, 0) }
  const level = Math.cos(pitch)
  return { point, normal: { x: out.x * level, y: out.y * level, z: -Math.sin(pitch) } }
}

const tailEdges = (ground: Ground, piece: Piece): PlateEdge[] => {
  const { edges } = ground.plates
  if (piece.edge !== null) return [at(edges, piece.edge)]
  if (piece.corner === null) return []
  return [at(edges, piece.corner - 1), at(edges, piece.corner)]
}

/** Moves a plane's point onto the timber's top centre line, where the set-out looks for it. */
const onCentreLine = (plane: Plane, cut: DraftCut, timber: Timber): Plane => ({
  normal: plane.normal,
  point: {
    x: timber.origin.x + timber.direction.x * cut.alongMm,
    y: timber.origin.y + timber.direction.y * cut.alongMm,
    z: timber.origin.z + timber.direction.z * cut.alongMm,
  },
})

/** What a tail cut has left to take beside the other cuts of the tail, mm² on its own plane. */
const tailFaceMm2 = (timber: Timber, cut: DraftCut, others: DraftCut[]): number => {
  const { halfMm, depthMm, cos } = timber
  let face: Labelled<null> = {
    points: [
      { x: -halfMm, y: 0 },
      { x: halfMm, y: 0 },
      { x: halfMm, y: depthMm / cos },
      { x: -halfMm, y: depthMm / cos },
    ],
    labels: [null, null, null, null],
  }
  for (const { crossing } of others) {
    // x left, y down: where the other cut lies further off the timber than this one
    const normal = {
      x: crossing.perLeft - cut.crossing.perLeft,
      y: crossing.perDown - cut.crossing.perDown,
    }
    const offMm = cut.crossing.baseMm - crossing.baseMm
    const size = length2(normal)
    if (size > 1e-12) face = clipConvex(face, scale2(normal, 1 / size), offMm / size, null)
    else if (offMm < 0) return 0
  }
  const facing = Math.abs(dot3(cut.plane.normal, timber.direction))
  return (polygonSignedArea(face.points) * cos) / facing
}

/** The eaves' tail planes and the cuts against valleys, those that take timber. */
const tailCuts = (ground: Ground, piece: Piece, timber: Timber, standMm: number): DraftCut[] => {
  const free = tailEdges(ground, piece).map((edge) => {
    const plane = tailPlane(ground, edge, standMm)
    const cut = draftCut(ground, piece, timber, 'tail', plane, null)
    return { ...cut, plane: onCentreLine(plane, cut, timber) }
  })
  const butting = piece.tailCuts.map((cut, place) =>
    draftCut(ground, piece, timber, 'tail', jointPlane(piece, timber, cut), place),
  )
  const all = [...free, ...butting]
  return all.reduce((kept, cut) => {
    const others = kept.filter((other) => other !== cut)
    return tailFaceMm2(timber, cut, others) < leastTailMm2 ? others : kept
  }, all)
}

/** All saw cuts of a piece but its birdsmouth: head, then foot, then tail. */
export const cutsOf = (
  ground: Ground,
  piece: Piece,
  timber: Timber,
  standMm: number,
): DraftCut[] => {
  const joint = (end: 'head' | 'foot') => (cut: PlanCut, place: number) =>
    draftCut(ground, piece, timber, end, jointPlane(piece, timber, cut), place)
  return [
    ...piece.headCuts.map(joint('head')),
    ...piece.footCuts.map(joint('foot')),
    ...tailCuts(ground, piece, timber, standMm),
  ]
}
