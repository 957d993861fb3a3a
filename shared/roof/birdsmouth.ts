import type { Ground } from './build-pieces.ts'
import type { Piece } from './piece.ts'
import type { Birdsmouth } from './roof-types.ts'
import { at } from './slopes.ts'
import { degrees, dot2, sub2 } from './vector.ts'

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

/** How far a hip or valley lies on its plates in plan, from the heel inwards along its centre line. */
const cornerReachMm = (ground: Ground, piece: Piece, corner: number): number => {
  const plates = [at(ground.plates.edges, corner - 1), at(ground.plates.edges, corner)]
  const reaches = plates.map(
    (edge) => ground.roof.plateWidthMm / Math.max(dot2(piece.dir, edge.inward), 1e-6),
  )
  // over a hip's corner either plate bears, at a valley's corner there is plate where both are
  return piece.role === 'valley' ? Math.min(...reaches) : Math.max(...reaches)
}

/** What of a seat lies on plate, mm: a rafter cut off inside the heel line by a valley starts later. */
const bearingMm = (ground: Ground, piece: Piece, seatMm: number): number => {
  if (piece.corner !== null) return Math.min(seatMm, cornerReachMm(ground, piece, piece.corner))
  const starts = piece.tailCuts.map(
    ({ normal, point }) => dot2(normal, sub2(point, piece.foot)) / dot2(normal, piece.dir),
  )
  const from = Math.max(0, piece.overPlate.fromMm, ...starts)
  return Math.max(0, Math.min(seatMm, piece.overPlate.toMm) - from)
}

/**
 * The birdsmouth of a rafter, hip or valley at the common height over plate, mm and degrees; null where the
 * piece stands on no plate or its underside clears it.
 */
export const birdsmouthOf = (ground: Ground, piece: Piece, standMm: number): Birdsmouth | null => {
  if (piece.edge === null && piece.corner === null) return null
  // a rafter's foot is at its own plate, a little over or under the slope's line where plates are out of it
  const ownStandMm = standMm - piece.dropMm + piece.foot.z
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
    bearingMm: bearingMm(ground, piece, seatMm - offsetMm),
    heelOffsetMm: offsetMm,
    seatFromEdgeDeg: pitchDeg,
    heelFromEdgeDeg: 90 - pitchDeg,
  }
}
