import type { Ground } from './build-pieces.ts'
import type { Piece } from './piece.ts'
import type { Birdsmouth } from './roof-types.ts'
import { at } from './slopes.ts'
import { degrees, dot2 } from './vector.ts'

/** How far out a heel stands so that it clears both plate faces; 0 at every corner that the hip leans away from. */
const heelOffsetPlanMm = (ground: Ground, piece: Piece): number => {
  if (piece.corner === null) return 0
  const plates = [at(ground.plates.edges, piece.corner - 1), at(ground.plates.edges, piece.corner)]
  const behind = [-dot2(piece.dir, at(plates, 0).along), dot2(piece.dir, at(plates, 1).along)]
  const offsets = behind.map((cos) =>
    cos >= -1e-9 ? 0 : (piece.halfMm * -cos) / Math.sqrt(Math.max(1e-9, 1 - cos * cos)),
  )
  return Math.max(...offsets)
}

/** How far a piece lies on its plates in plan, from the heel inwards along its centre line. */
const plateReachMm = (ground: Ground, piece: Piece): number => {
  const { plateWidthMm } = ground.roof
  if (piece.corner === null) return plateWidthMm
  const plates = [at(ground.plates.edges, piece.corner - 1), at(ground.plates.edges, piece.corner)]
  return Math.max(
    ...plates.map((edge) => plateWidthMm / Math.max(dot2(piece.dir, edge.inward), 1e-6)),
  )
}

/**
 * The birdsmouth of a rafter or hip at the common height over plate, mm and degrees; null where the
 * piece stands on no plate or its underside clears it.
 */
export const birdsmouthOf = (ground: Ground, piece: Piece, standMm: number): Birdsmouth | null => {
  if (piece.edge === null && piece.corner === null) return null
  const ownStandMm = standMm - piece.dropMm
  const offsetMm = heelOffsetPlanMm(ground, piece)
  const heelMm = piece.section.depthMm / piece.cos - ownStandMm + offsetMm * piece.tan
  if (heelMm <= 0) return null
  const seatMm = heelMm / piece.tan
  const pitchDeg = degrees(Math.atan(piece.tan))
  return {
    seatMm,
    heelMm,
    depthMm: heelMm * piece.cos,
    standMm: ownStandMm,
    bearingMm: Math.min(seatMm - offsetMm, plateReachMm(ground, piece)),
    heelOffsetMm: offsetMm,
    seatFromEdgeDeg: pitchDeg,
    heelFromEdgeDeg: 90 - pitchDeg,
  }
}
