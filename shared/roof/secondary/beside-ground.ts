import type { Ground } from '../build-pieces.ts'
import type { FrameDraft } from '../members.ts'
import type { Face } from '../roof-lines.ts'
import { at } from '../slopes.ts'

/** What the timbers beside the frame are set out from: the roof, and its frame as cut. */
export type BesideGround = Ground & { standMm: number; drafts: readonly FrameDraft[] }

/** The roof line on a border of a slope's face, by its two nodes; null on a plate line. */
export const lineOfBorder = (ground: Ground, face: Face, border: number): number | null => {
  const from = at(face.nodes, border)
  const to = at(face.nodes, border + 1)
  const found = ground.lines.lines.findIndex(
    (line) =>
      line.kind !== 'eave' &&
      line.kind !== 'verge' &&
      line.slopes.includes(face.slope) &&
      ((line.from === from && line.to === to) || (line.from === to && line.to === from)),
  )
  return found < 0 ? null : found
}

/** The timber that a roof line got, if any. */
export const timberOnLine = (ground: BesideGround, line: number): FrameDraft | null =>
  ground.drafts.find((draft) => draft.piece.line === line) ?? null
