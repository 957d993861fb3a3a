import { z } from 'zod'

/** A measure, kept as typed. */
export const typed = z.string().max(20, 'That is too long for a measure.')

/** What one plate has of its own; an empty measure takes the one typed for all. */
export const sideSchema = z.strictObject({
  finish: z.enum(['eave', 'gable']),
  pitchDeg: typed,
  overhangMm: typed,
})
export type SideForm = z.infer<typeof sideSchema>

export function plainSide(): SideForm {
  return { finish: 'eave', pitchDeg: '', overhangMm: '' }
}

export const mostCorners = 64
