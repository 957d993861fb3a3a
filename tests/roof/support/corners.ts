import corners from '../../fixtures/corners.json' with { type: 'json' }
import type { Cut } from '../../../shared/roof/roof-types.ts'
import type { Row } from './misfits.ts'

/**
 * Source: tests/fixtures/corners.json, 57 plate corners computed from 3-D vectors alone, outside
 * this program (no roof formula). Tolerances as stated there.
 */
export const MM = 0.01
export const DEG = 0.001

export type Corner = (typeof corners.cases)[number]
export const hipCorners = corners.cases.filter((c) => c.in.interior_deg < 180)
export const valleyCorners = corners.cases.filter((c) => c.in.interior_deg > 180)

/** Names of a corner's case for a test's title. */
export const titled = (list: Corner[]): (readonly [number, number, number, Corner])[] =>
  list.map((c) => [c.in.interior_deg, c.in.pitch1_deg, c.in.pitch2_deg, c] as const)

export const rad = (deg: number): number => (deg * Math.PI) / 180
export const tanDeg = (deg: number): number => Math.tan(rad(deg))

export type Bevels = { face_from_edge: number; edge_from_edge: number; tilt: number }

export function bevelRows(name: string, cut: Cut, edgeDeg: number, expected: Bevels): Row[] {
  return [
    [`${name}, face bevel`, cut.face.fromEdgeDeg, expected.face_from_edge, DEG],
    [`${name}, edge bevel`, edgeDeg, expected.edge_from_edge, DEG],
    [`${name}, blade tilt`, cut.bladeTiltDeg, expected.tilt, DEG],
  ]
}

/** The angle between two bearings in plan, 0 to 180°. */
export const betweenDeg = (a: number, b: number): number =>
  Math.abs(((((a - b + 540) % 360) + 360) % 360) - 180)

type Spot = { x: number; y: number }
export const bearingDeg = (from: Spot, to: Spot): number =>
  (Math.atan2(to.y - from.y, to.x - from.x) * 180) / Math.PI
