import { z } from 'zod'

/**
 * The roof as the office types it: every measure is kept as text, wrong ones included, so that nothing
 * typed is lost. `roofOfForm` reads it into a `Roof`.
 */

const typed = z.string().max(20, 'That is too long for a measure.')

export const roofShapes = ['rectangle', 'octagonal-end', 'splayed-end', 'corners'] as const
export const roofShapeSchema = z.enum(roofShapes)
export type RoofShape = z.infer<typeof roofShapeSchema>

/** Sides of the ready shapes, as they lie on the plan: front below, length across. */
export const sideKeys = [
  'front',
  'front-right',
  'right',
  'back-right',
  'back',
  'back-left',
  'left',
  'front-left',
] as const
export type SideKey = (typeof sideKeys)[number]

/** What one plate has of its own; an empty measure takes the one typed for all. */
const sideSchema = z.strictObject({
  finish: z.enum(['eave', 'gable']),
  pitchDeg: typed,
  overhangMm: typed,
})
export type SideForm = z.infer<typeof sideSchema>

/** A typed corner, and the plate that runs from it to the next. */
const cornerSchema = z.strictObject({ x: typed, y: typed, ...sideSchema.shape })
export type CornerForm = z.infer<typeof cornerSchema>

const sectionSchema = z.strictObject({ depthMm: typed, thicknessMm: typed })
export type SectionForm = z.infer<typeof sectionSchema>

export const sectionKeys = ['rafter', 'hip', 'ridge', 'valley'] as const
export type SectionKey = (typeof sectionKeys)[number]

export const mostCorners = 64

export const roofFormSchema = z.strictObject({
  shape: roofShapeSchema,
  widthMm: typed,
  lengthMm: typed,
  /** What `lengthMm` measures where an end is cut off: the straight side, or everything. */
  lengthOf: z.enum(['straight-side', 'overall']),
  /** How far a splay cuts back along each of its two sides. */
  splayMm: typed,
  /** Which end is octagonal or splayed. */
  endAt: z.enum(['right', 'left', 'both']),
  sides: z.strictObject(
    Object.fromEntries(sideKeys.map((key) => [key, sideSchema])) as Record<
      SideKey,
      typeof sideSchema
    >,
  ),
  corners: z.array(cornerSchema).max(mostCorners, `A plan has at most ${mostCorners} corners.`),
  pitchDeg: typed,
  overhangMm: typed,
  vergeOverhangMm: typed,
  overhangFrom: z.enum(['frame', 'brickwork']),
  plateWidthMm: typed,
  maxSpacingMm: typed,
  spacing: z.enum(['even', 'full']),
  sections: z.strictObject({
    rafter: sectionSchema,
    hip: sectionSchema,
    ridge: sectionSchema,
    valley: sectionSchema,
  }),
  tail: z.enum(['plumb', 'square']),
  tailAllowanceMm: typed,
  hipTop: z.enum(['backed', 'lowered']),
  valleyTop: z.enum(['square', 'dished']),
  /** Height over plate; empty: worked out. */
  standMm: typed,
})
export type RoofForm = z.infer<typeof roofFormSchema>

const plainSide: SideForm = { finish: 'eave', pitchDeg: '', overhangMm: '' }
const emptySection: SectionForm = { depthMm: '', thicknessMm: '' }

/** A new line of the corner list. */
export const emptyCorner: CornerForm = { x: '', y: '', ...plainSide }

/**
 * Where a new roof starts. Plate width and spacing are the everyday ones (common practice, no source);
 * sections are empty, because a person types every size.
 */
export function formOfShape(shape: RoofShape): RoofForm {
  const side = (): SideForm => ({ ...plainSide })
  const section = (): SectionForm => ({ ...emptySection })
  return {
    shape,
    widthMm: '',
    lengthMm: '',
    lengthOf: 'straight-side',
    splayMm: '',
    endAt: 'right',
    sides: Object.fromEntries(sideKeys.map((key) => [key, side()])) as RoofForm['sides'],
    corners: Array.from({ length: 4 }, () => ({ ...emptyCorner })),
    pitchDeg: '',
    overhangMm: '',
    vergeOverhangMm: '',
    overhangFrom: 'frame',
    plateWidthMm: '90',
    maxSpacingMm: '600',
    spacing: 'even',
    sections: { rafter: section(), hip: section(), ridge: section(), valley: section() },
    tail: 'plumb',
    tailAllowanceMm: '0',
    hipTop: 'lowered',
    valleyTop: 'square',
    standMm: '',
  }
}
