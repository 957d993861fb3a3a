import type { Point3 } from '../roof-types.ts'
import { slopePoint } from '../slopes.ts'
import type { Slope } from '../slopes.ts'
import { point3, radians } from '../vector.ts'

/** A slope's three directions, of length 1: along its plate, up the slope, and square out of it. */
export type SlopeAxes = { along: Point3; upSlope: Point3; normal: Point3; sin: number; cos: number }

export const slopeAxes = (slope: Slope): SlopeAxes => {
  const pitch = radians(slope.pitchDeg)
  const [sin, cos] = [Math.sin(pitch), Math.cos(pitch)]
  const { along, inward } = slope
  return {
    along: { x: along.x, y: along.y, z: 0 },
    upSlope: { x: inward.x * cos, y: inward.y * cos, z: sin },
    normal: { x: -inward.x * sin, y: -inward.y * sin, z: cos },
    sin,
    cos,
  }
}

/** The point of the rafters' top plane `alongMm` along the plate and `inMm` of plan inside it. */
export const topPlanePoint = (
  slope: Slope,
  standMm: number,
  alongMm: number,
  inMm: number,
): Point3 => point3(slopePoint(slope, alongMm, inMm), standMm + inMm * slope.tan)
