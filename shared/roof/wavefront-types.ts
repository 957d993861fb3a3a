import type { Point2, Point3 } from './roof-types.ts'

/**
 * The moving line of one slope, or of a gable (speed 0). Cut the roof level at height z: the front of a
 * slope is its plate line moved inwards by `speed` · z.
 */
export type Front = {
  index: number
  /** Plate edges it starts from, in order along it. */
  edges: number[]
  from: Point2
  to: Point2
  along: Point2
  inward: Point2
  /** mm inwards per mm of height: 1 / tan(pitch). */
  speed: number
  gable: boolean
}

/** Where two fronts meet: at height z it stands at `point` + `velocity` · (z − `fromMm`). */
export type WaveCorner = {
  point: Point2
  fromMm: number
  velocity: Point2
  node: number
  /** The first front this corner runs into, as last looked up; see `nextEvent`. */
  next: WaveHit | null
}

/** A corner comes to the front between corners `start` and `end` at a height; `start` null when to none. */
export type WaveHit = { zMm: number; start: WaveCorner | null; end: WaveCorner | null }

/** A closed part of the level cut, its inside on the left; corner k is where front k starts. */
export type WaveLoop = { fronts: number[]; corners: WaveCorner[]; zMm: number }

/** A crease between two nodes, with the fronts whose slopes lie on its left and right. */
export type WaveArc = { from: number; to: number; left: number; right: number }

/** Why the slopes cannot be set out; `edges` are plate edges. */
export type WaveRefusal =
  | { reason: 'gable-reached'; gable: number; edges: number[] }
  | { reason: 'level-break'; edges: [number, number] }
  | { reason: 'unsettled'; edges: number[] }

export type Wave = {
  /** The first nodes are the outer ends of the fronts: node k is where front k starts. */
  nodes: Point3[]
  arcs: WaveArc[]
  /** Front that stands for each front's slope: its own, or another one in the same line. */
  owner: number[]
  /** Fronts as they were moved: nearly collinear ones that grew together share one line. */
  fronts: Front[]
  refusal: WaveRefusal | null
}
