import { z } from 'zod'
import { mostCorners, plainSide, sideSchema, typed } from './form-parts.ts'

export const turnKinds = ['left', 'right', 'straight', 'left-by', 'right-by'] as const
export type TurnKind = (typeof turnKinds)[number]

/** One side of an outline as walked, and the turn at its end: square, none, or by `turnDeg`. */
const walkSideSchema = z.strictObject({
  lengthMm: typed,
  turn: z.enum(turnKinds),
  turnDeg: typed,
  /** What its plate has of its own, kept while the corner is not there yet or not there any more. */
  side: sideSchema,
})
export type WalkSideForm = z.infer<typeof walkSideSchema>

export const walkSchema = z.strictObject({
  /** Where the first side heads: 0 to the right of the page, 90 up it. */
  startDeg: typed,
  sides: z.array(walkSideSchema).max(mostCorners, `A plan has at most ${mostCorners} sides.`),
})
export type WalkForm = z.infer<typeof walkSchema>

/** A new line of sides and turns: most corners of a house, walked with it on the left. */
export function emptyWalkSide(): WalkSideForm {
  return { lengthMm: '', turn: 'left', turnDeg: '', side: plainSide() }
}

export function emptyWalk(): WalkForm {
  return { startDeg: '0', sides: [] }
}
