import type { Joints } from './clusters.ts'
import { slopeRafters } from './layout.ts'
import { linePieces } from './line-pieces.ts'
import { gather } from './lists.ts'
import type { Piece } from './piece.ts'
import type { RoofLines } from './roof-lines.ts'
import type { Roof, RoofSettings } from './roof-types.ts'
import { slopeGround } from './slope-ground.ts'
import type { PlateLines } from './slopes.ts'

/** All that is known of a roof before any timber is cut. */
export type Ground = {
  roof: Roof
  settings: RoofSettings
  plates: PlateLines
  lines: RoofLines
  joints: Joints
}

/** Every timber of the roof with its set-out line, none cut yet: lines first, then rafters slope by slope. */
export const buildPieces = (ground: Ground): Piece[] => {
  const pieces = [
    ...linePieces(ground),
    ...gather(ground.plates.slopes, (slope) => slopeRafters(ground, slopeGround(ground, slope))),
  ]
  pieces.forEach((piece, id) => (piece.id = id))
  return pieces
}
