import type { Ground } from '../build-pieces.ts'
import type { FrameDraft } from '../members.ts'

/** What the timbers beside the frame are set out from: the roof, and its frame as cut. */
export type BesideGround = Ground & { standMm: number; drafts: readonly FrameDraft[] }

/** The timber that a roof line got, if any. */
export const timberOnLine = (ground: BesideGround, line: number): FrameDraft | null =>
  ground.drafts.find((draft) => draft.piece.line === line) ?? null
