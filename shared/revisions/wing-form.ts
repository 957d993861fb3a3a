import { z } from 'zod'
import { plainSide, sideSchema, typed } from './form-parts.ts'

/** Shapes of a main building and its wings; each keeps its own measures and plates. */
export const wingShapes = ['l', 't', 'u', 'cross'] as const
export type WingShape = (typeof wingShapes)[number]

const sideCounts: Record<WingShape, number> = { l: 6, t: 8, u: 8, cross: 12 }
const sidesOf = (shape: WingShape) => z.array(sideSchema).length(sideCounts[shape])

/**
 * L, T, U and cross: measures as they lie before they are turned, and what each plate has of its own.
 * `lengthMm` and `widthMm` of the roof form are the main building's, or those over all.
 */
export const wingsSchema = z.strictObject({
  turn: z.enum(['none', 'left', 'half', 'right']),
  mirrored: z.enum(['no', 'yes']),
  l: z.strictObject({ frontWidthMm: typed, sideWidthMm: typed, sides: sidesOf('l') }),
  t: z.strictObject({
    wingWidthMm: typed,
    projectionMm: typed,
    /** Empty: the wing stands in the middle. */
    fromLeftMm: typed,
    sides: sidesOf('t'),
  }),
  u: z.strictObject({
    frontWidthMm: typed,
    leftWidthMm: typed,
    rightWidthMm: typed,
    /** Empty: as long as the left wing. */
    rightLengthMm: typed,
    sides: sidesOf('u'),
  }),
  cross: z.strictObject({
    wingWidthMm: typed,
    backMm: typed,
    /** Empty: as far as at the back. */
    frontMm: typed,
    /** Empty: the wings stand in the middle. */
    fromLeftMm: typed,
    sides: sidesOf('cross'),
  }),
})
export type WingsForm = z.infer<typeof wingsSchema>

export function emptyWings(): WingsForm {
  const sides = (shape: WingShape) => Array.from({ length: sideCounts[shape] }, plainSide)
  return {
    turn: 'none',
    mirrored: 'no',
    l: { frontWidthMm: '', sideWidthMm: '', sides: sides('l') },
    t: { wingWidthMm: '', projectionMm: '', fromLeftMm: '', sides: sides('t') },
    u: {
      frontWidthMm: '',
      leftWidthMm: '',
      rightWidthMm: '',
      rightLengthMm: '',
      sides: sides('u'),
    },
    cross: { wingWidthMm: '', backMm: '', frontMm: '', fromLeftMm: '', sides: sides('cross') },
  }
}

export function isWingShape(shape: string): shape is WingShape {
  return wingShapes.some((each) => each === shape)
}
