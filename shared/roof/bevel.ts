import type { Plane } from './vector.ts'
import {
  along3,
  angleBetweenDeg,
  cross3,
  degrees,
  dot3,
  planeCrossing,
  scale3,
  unit3,
} from './vector.ts'
import type { Angle, Point3 } from './roof-types.ts'

/**
 * A timber as the saw sees it: a straight piece. `direction` runs along the top edge from foot to head,
 * `left` and `up` are square to it and to each other, all of length 1. Of most timbers the side faces
 * are plumb (`left` level, `down` plumb, so not square to `direction`); of those that lie with their top
 * in a slope `down` is square to the top.
 */
export type Timber = {
  origin: Point3
  direction: Point3
  left: Point3
  up: Point3
  /** How depths under the top are measured: plumb, or square to the top of a timber that lies in a slope. */
  down: Point3
  halfMm: number
  depthMm: number
  /** Rise per mm of length, for plumb measures; 0 and 1 where `down` is square to the top. */
  sin: number
  cos: number
  /** How far each top arris lies plumb under the top centre line; 0 for a square top. */
  arrisFall: { left: number; right: number }
  /** How far the middle of a dished top lies plumb under the top centre line of its blank. */
  dishMm?: number
}

/** Where a plane crosses the lines of a timber: mm along = base + perLeft × mm aside + perDown × mm down under the top. */
export type Crossing = { baseMm: number; perLeft: number; perDown: number }

/** What a plane does to a timber: where it crosses it and at which angles it is marked and sawn. */
export type Bevel = {
  crossing: Crossing
  alongMm: number
  leftMm: number
  rightMm: number
  /** On the side face, from the arris towards the foot to the line running down. */
  faceFromEdgeDeg: number
  /** Across a square top, and across a top planed to the slopes, from the arris into the timber. */
  squareEdgeDeg: number
  slopedEdgeDeg: number
  tiltDeg: number
  /** The arris on which the timber reaches further off; beside a backed top not always the side that the plane leans from. */
  longSide: 'left' | 'right' | 'none'
}

/** Cuts whose arrises end within this are square: no long side. */
const squareMm = 1e-5

export const bothWays = (fromEdgeDeg: number): Angle => ({
  fromEdgeDeg,
  fromSquareDeg: 90 - fromEdgeDeg,
})

/** A point of the timber: `alongMm` up its edge, `leftMm` aside, `downMm` under the top centre line. */
export const timberPoint = (
  timber: Timber,
  alongMm: number,
  leftMm: number,
  downMm: number,
): Point3 =>
  along3(
    along3(along3(timber.origin, timber.direction, alongMm), timber.left, leftMm),
    timber.down,
    downMm,
  )

/** How far plumb the top lies under its centre line, `leftMm` aside. */
export const topFall = (timber: Timber, leftMm: number): number => {
  const { arrisFall, dishMm = 0, halfMm } = timber
  const arris = leftMm > 0 ? arrisFall.left : arrisFall.right
  return dishMm + (Math.abs(leftMm) / halfMm) * (arris - dishMm)
}

/** The face normal of one half of a top planed to the slopes. */
const slopedTop = (
  timber: Timber,
  side: 'left' | 'right',
  falls: { left: number; right: number },
) => {
  const lean = side === 'left' ? falls.left : -falls.right
  return unit3(along3(timber.up, timber.left, lean))
}

/**
 * Angle of a plane's line across a top facet, from the arris into the timber, at the long point; over
 * 90 where a planed top turns a nearly square cut past square.
 */
const edgeDeg = (plane: Plane, timber: Timber, top: Point3, longSide: 'left' | 'right'): number => {
  const across = unit3(cross3(plane.normal, top))
  const isToShort = dot3(across, timber.left) < 0 === (longSide === 'left')
  const line = isToShort ? across : scale3(across, -1)
  const offTimber = dot3(plane.normal, timber.direction) < 0 ? -1 : 1
  return angleBetweenDeg(line, scale3(timber.direction, -offTimber))
}

/** How a plane crosses the lines of a timber that run along it. */
export const crossingOf = (plane: Plane, timber: Timber): Crossing => {
  const facing = dot3(plane.normal, timber.direction)
  return {
    baseMm: planeCrossing(plane, timber.origin, timber.direction),
    perLeft: -dot3(plane.normal, timber.left) / facing,
    perDown: -dot3(plane.normal, timber.down) / facing,
  }
}

export const crossingAt = (crossing: Crossing, leftMm: number, downMm: number): number =>
  crossing.baseMm + crossing.perLeft * leftMm + crossing.perDown * downMm

/**
 * The one routine for every bevel: a plane in space against a timber.
 * `falls` are the slopes' falls per mm aside, square to the edge, for the angle across a planed top.
 * Lengths mm from the timber's origin along its edge, angles degrees.
 */
export const bevelOf = (
  plane: Plane,
  timber: Timber,
  falls: { left: number; right: number },
): Bevel => {
  const crossing = crossingOf(plane, timber)
  const { halfMm, arrisFall } = timber
  const leftMm = crossingAt(crossing, halfMm, arrisFall.left)
  const rightMm = crossingAt(crossing, -halfMm, arrisFall.right)
  const offTimber = dot3(plane.normal, timber.direction) < 0 ? -1 : 1
  const spread = offTimber * (leftMm - rightMm)
  const longSide = Math.abs(spread) < squareMm ? 'none' : spread > 0 ? 'left' : 'right'
  const down = cross3(plane.normal, timber.left)
  const downward = unit3(dot3(down, timber.up) > 0 ? scale3(down, -1) : down)
  const across = (top: Point3) => (longSide === 'none' ? 90 : edgeDeg(plane, timber, top, longSide))
  return {
    crossing,
    alongMm: crossing.baseMm,
    leftMm,
    rightMm,
    longSide,
    faceFromEdgeDeg: angleBetweenDeg(scale3(timber.direction, -1), downward),
    squareEdgeDeg: across(timber.up),
    slopedEdgeDeg: across(slopedTop(timber, longSide === 'left' ? 'right' : 'left', falls)),
    tiltDeg: degrees(Math.asin(Math.min(1, Math.abs(dot3(plane.normal, timber.left))))),
  }
}
