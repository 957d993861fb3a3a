import { z } from 'zod'
import { mostCorners, plainSide, sideSchema, typed } from './form-parts.ts'
import { emptyWalk, walkSchema } from './walk-form.ts'
import { emptyWings, wingShapes, wingsSchema } from './wing-form.ts'

/**
 * The roof as the office types it: every measure is kept as text, wrong ones included, so that nothing
 * typed is lost. `roofOfForm` reads it into a `Roof`.
 */

export const roofShapes = [
  'rectangle',
  ...wingShapes,
  'octagonal-end',
  'splayed-end',
  'corners',
] as const
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

/** A typed corner, and the plate that runs from it to the next. */
const cornerSchema = z.strictObject({ x: typed, y: typed, ...sideSchema.shape })
export type CornerForm = z.infer<typeof cornerSchema>

const sectionSchema = z.strictObject({ depthMm: typed, thicknessMm: typed })
export type SectionForm = z.infer<typeof sectionSchema>

/** The timbers of the frame, and those beside it, which are set out only where a size is typed. */
export const sectionKeys = ['rafter', 'hip', 'ridge', 'valley'] as const
export const besideKeys = ['underpurlin', 'collarTie', 'fascia', 'barge'] as const
export type BesideKey = (typeof besideKeys)[number]
export type SectionKey = (typeof sectionKeys)[number] | BesideKey

const optionalSection = () => sectionSchema.default(() => ({ depthMm: '', thicknessMm: '' }))

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
  wings: wingsSchema.default(emptyWings),
  corners: z.array(cornerSchema).max(mostCorners, `A plan has at most ${mostCorners} corners.`),
  /**
   * The sides and turns that `corners` were walked by, as typed; empty where the corners were moved or
   * typed since, which then hold alone.
   */
  walk: walkSchema.default(emptyWalk),
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
    underpurlin: optionalSection(),
    collarTie: optionalSection(),
    fascia: optionalSection(),
    barge: optionalSection(),
  }),
  tail: z.enum(['plumb', 'square']),
  tailAllowanceMm: typed,
  hipTop: z.enum(['backed', 'lowered']),
  valleyTop: z.enum(['square', 'dished']),
  /** Height over plate; empty: worked out. */
  standMm: typed,
  /** Of the underside over the plate; empty: in the upper third of the rise. */
  collarTieHeightMm: typed.default(''),
})
export type RoofForm = z.infer<typeof roofFormSchema>

const emptySection: SectionForm = { depthMm: '', thicknessMm: '' }

/** A new line of the corner list. */
export const emptyCorner: CornerForm = { x: '', y: '', ...plainSide() }

/**
 * Where a new roof starts. Plate width and spacing are the everyday ones (common practice, no source);
 * sections are empty, because a person types every size.
 */
export function formOfShape(shape: RoofShape): RoofForm {
  const section = (): SectionForm => ({ ...emptySection })
  return {
    shape,
    widthMm: '',
    lengthMm: '',
    lengthOf: 'straight-side',
    splayMm: '',
    endAt: 'right',
    sides: Object.fromEntries(sideKeys.map((key) => [key, plainSide()])) as RoofForm['sides'],
    wings: emptyWings(),
    corners: Array.from({ length: 4 }, () => ({ ...emptyCorner })),
    walk: emptyWalk(),
    pitchDeg: '',
    overhangMm: '',
    vergeOverhangMm: '',
    overhangFrom: 'frame',
    plateWidthMm: '90',
    maxSpacingMm: '600',
    spacing: 'even',
    sections: {
      rafter: section(),
      hip: section(),
      ridge: section(),
      valley: section(),
      underpurlin: section(),
      collarTie: section(),
      fascia: section(),
      barge: section(),
    },
    tail: 'plumb',
    tailAllowanceMm: '0',
    hipTop: 'lowered',
    valleyTop: 'square',
    standMm: '',
    collarTieHeightMm: '',
  }
}
