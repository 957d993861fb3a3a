import type { Roof } from './roof-types.ts'
import type { Slope } from './slopes.ts'
import { radians } from './vector.ts'

/** Least seat of a rafter on its plate: roof.md, after NBC 9.23.14 (38 mm on timber). */
export const leastSeatMm = 38

/** A rafter's birdsmouth may take this part of its depth: AS 1684.2, as quoted by a secondary page. */
export const birdsmouthShare = 1 / 3

/**
 * Height over plate that one slope asks for, mm: what is left over the largest birdsmouth that takes
 * at most a third of the rafter's depth, square to the edge, and seats at most on the plate's width.
 */
const standAskedMm = (roof: Roof, pitchDeg: number): number => {
  const pitch = radians(pitchDeg)
  const plumbDepth = roof.sections.rafter.depthMm / Math.cos(pitch)
  const byDepth = (roof.sections.rafter.depthMm * birdsmouthShare) / Math.cos(pitch)
  const byPlate = roof.plateWidthMm * Math.tan(pitch)
  return plumbDepth - Math.min(byDepth, byPlate)
}

/** The one height over plate of the whole roof, mm: as typed, or the largest that a slope asks for. */
export const commonStandMm = (roof: Roof, slopes: readonly Pick<Slope, 'pitchDeg'>[]): number =>
  roof.standMm ?? Math.max(...slopes.map((slope) => standAskedMm(roof, slope.pitchDeg)))

/** Seat of a rafter at a height over plate, mm; negative when its underside clears the plate. */
export const rafterSeatMm = (roof: Roof, pitchDeg: number, standMm: number): number => {
  const pitch = radians(pitchDeg)
  return (roof.sections.rafter.depthMm / Math.cos(pitch) - standMm) / Math.tan(pitch)
}
