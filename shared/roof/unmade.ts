import type { Ground } from './build-pieces.ts'
import type { FrameDraft } from './members.ts'
import type { Piece } from './piece.ts'
import type { RoofProblem } from './roof-types.ts'
import { at } from './slopes.ts'
import { dot2, sub2 } from './vector.ts'

/** Whether a piece has all that gives it a length: a cut at its head, and one at a foot that meets timber. */
const isMade = ({ piece, cuts, cutLengthMm }: FrameDraft): boolean => {
  const needsFoot = piece.role === 'ridge' || piece.footJoint !== null || piece.footLine !== null
  const has = (end: 'head' | 'foot') => cuts.some((cut) => cut.end === end)
  return has('head') && (has('foot') || !needsFoot) && Number.isFinite(cutLengthMm)
}

/** Where a piece is, in words, and the plate edge to change. */
const placeOf = ({ plates }: Ground, piece: Piece): { edge: number; words: string } => {
  const slope = at(plates.slopes, at(piece.slopes, 0))
  const edge = piece.edge ?? at(slope.edges, 0)
  const name = piece.role.replace('-', ' ')
  if (piece.corner !== null) return { edge, words: `the ${name} from corner ${piece.corner + 1}` }
  const { from, along } = at(plates.edges, edge)
  const alongMm = Math.round(dot2(along, sub2(piece.foot, from)))
  return { edge, words: `the ${name} that starts ${alongMm} mm along it` }
}

/**
 * Pieces that could not be cut to a length, as refusals: no timber without a cut at its end leaves the
 * frame. None is known; joints cut every end.
 */
export const unmadeProblems = (ground: Ground, drafts: readonly FrameDraft[]): RoofProblem[] =>
  drafts
    .filter((draft) => !isMade(draft))
    .map(({ piece }) => {
      const { edge, words } = placeOf(ground, piece)
      const message =
        `Edge ${edge + 1}: ${words} meets nothing that it can be cut against. ` +
        'Move a corner near it, or change a pitch or the rafter spacing.'
      return { path: `edges.${edge}.pitchDeg`, message }
    })
