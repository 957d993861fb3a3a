import { z } from 'zod'
import { idSchema, textSchema } from '../http/fields.ts'
import type { Point2 } from '../roof/roof-types.ts'

const measuredMmSchema = z
  .number('Give the length in mm.')
  .positive('A length is more than nothing.')
  .max(200_000, 'That is longer than any plate this program takes.')

export const newPlateCheckSchema = z.strictObject({
  /** Made on the device, so that sending it twice records one. */
  id: idSchema,
  letter: textSchema(4, { required: 'Say which revision was measured.' }),
  /** Side i runs from corner i to corner i + 1. */
  sidesMm: z.array(measuredMmSchema).max(64, 'A plan has at most 64 sides.'),
  diagonals: z
    .array(
      z.strictObject({
        from: z.number().int().min(0),
        to: z.number().int().min(0),
        lengthMm: measuredMmSchema,
      }),
    )
    .max(128, 'That is more diagonals than are needed.'),
  note: textSchema(500),
})
export type NewPlateCheck = z.infer<typeof newPlateCheckSchema>

export type Diagonal = { from: number; to: number }

const comparedSchema = z.object({
  /** Corners, 0 first. */
  from: z.number(),
  to: z.number(),
  planMm: z.number(),
  measuredMm: z.number(),
  /** Measured less plan. */
  offMm: z.number(),
  differs: z.boolean(),
})
export type ComparedLength = z.infer<typeof comparedSchema>

export const plateComparisonSchema = z.object({
  sides: z.array(comparedSchema),
  diagonals: z.array(comparedSchema),
  toleranceMm: z.number(),
})
export type PlateComparison = z.infer<typeof plateComparisonSchema>

export const plateCheckSchema = z.object({
  id: z.string(),
  letter: z.string(),
  takenAt: z.string(),
  takenBy: z.string(),
  note: z.string(),
  comparison: plateComparisonSchema,
})
/** The latest check of a revision; null before the first. */
export const latestPlateCheckSchema = z.object({ check: plateCheckSchema.nullable() })
export type PlateCheckAnswer = z.infer<typeof plateCheckSchema>

/** Common practice, no source: more than this between plan and plate changes what is cut. */
export const plateToleranceMm = 5

function distanceMm(outline: readonly Point2[], from: number, to: number): number {
  const [a, b] = [outline[from], outline[to]]
  return a && b ? Math.hypot(b.x - a.x, b.y - a.y) : Number.NaN
}

export function planSidesMm(outline: readonly Point2[]): number[] {
  return outline.map((_, i) => distanceMm(outline, i, (i + 1) % outline.length))
}

/**
 * Diagonals worth measuring: both of a four-sided plan; otherwise one from the first corner to each other
 * corner, which fixes the shape, and one more that checks it. None for a triangle.
 */
export function diagonalsToMeasure(cornerCount: number): Diagonal[] {
  if (cornerCount < 4) return []
  const fan = Array.from({ length: cornerCount - 3 }, (_, i) => ({ from: 0, to: i + 2 }))
  return [...fan, { from: 1, to: cornerCount - 1 }]
}

export function isDiagonal(cornerCount: number, { from, to }: Diagonal): boolean {
  if (from >= cornerCount || to >= cornerCount || from === to) return false
  const apart = Math.abs(from - to)
  return apart !== 1 && apart !== cornerCount - 1
}

/** What was measured beside what the plan says, mm. */
export function comparePlates(
  outline: readonly Point2[],
  measured: { sidesMm: readonly number[]; diagonals: readonly (Diagonal & { lengthMm: number })[] },
): PlateComparison {
  const compare = (from: number, to: number, measuredMm: number): ComparedLength => {
    const planMm = distanceMm(outline, from, to)
    const offMm = measuredMm - planMm
    return { from, to, planMm, measuredMm, offMm, differs: Math.abs(offMm) > plateToleranceMm }
  }
  return {
    sides: measured.sidesMm.map((mm, i) => compare(i, (i + 1) % outline.length, mm)),
    diagonals: measured.diagonals.map((d) => compare(d.from, d.to, d.lengthMm)),
    toleranceMm: plateToleranceMm,
  }
}

export function differingCount(comparison: PlateComparison): number {
  return [...comparison.sides, ...comparison.diagonals].filter((one) => one.differs).length
}
