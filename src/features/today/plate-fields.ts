import {
  comparePlates,
  type Diagonal,
  diagonalsToMeasure,
  type NewPlateCheck,
  planSidesMm,
} from '../../../shared/day-sheets/plate-check.ts'
import type { Point2 } from '../../../shared/roof/roof-types.ts'

/** One length to take on site. */
export type PlateField = {
  /** Path in the request, so that a refusal lands at its field. */
  path: string
  label: string
  planMm: number
  isOptional: boolean
}

const name = ({ from, to }: Diagonal) => `Corner ${from + 1} to corner ${to + 1}`

/** Sides first, then the diagonals worth taking; further ones than the first are welcome, not asked. */
export function plateFields(outline: readonly Point2[]): PlateField[] {
  const count = outline.length
  const sides = planSidesMm(outline).map((planMm, i) => ({
    path: `sidesMm.${i}`,
    label: name({ from: i, to: (i + 1) % count }),
    planMm,
    isOptional: false,
  }))
  const diagonals = diagonalsToMeasure(count)
  const plan = comparePlates(outline, {
    sidesMm: [],
    diagonals: diagonals.map((one) => ({ ...one, lengthMm: 0 })),
  })
  return [
    ...sides,
    ...plan.diagonals.map((one, i) => ({
      path: `diagonals.${i}`,
      label: name(one),
      planMm: one.planMm,
      isOptional: i > 1,
    })),
  ]
}

/** What was typed as mm; null when it is no length. */
export function typedMm(text: string): number | null {
  const tidy = text.trim().replaceAll(/[\s,]|mm$/g, '')
  if (!/^\d+(\.\d+)?$/.test(tidy)) return null
  const mm = Number(tidy)
  return mm > 0 ? mm : null
}

export type PlateTexts = Record<string, string>

/** What each field lacks, in words; empty when the check can be sent. */
export function plateIssues(fields: readonly PlateField[], texts: PlateTexts): PlateTexts {
  const issues: PlateTexts = {}
  for (const { path, isOptional } of fields) {
    const text = texts[path] ?? ''
    if (text.trim() === '' && isOptional) continue
    if (typedMm(text) === null) issues[path] = 'Give the measured length in mm.'
  }
  return issues
}

/** The request for what was typed; only for texts without issues. */
export function plateCheckOf(
  outline: readonly Point2[],
  texts: PlateTexts,
  rest: Pick<NewPlateCheck, 'id' | 'letter' | 'note'>,
): NewPlateCheck {
  const at = (path: string) => typedMm(texts[path] ?? '')
  return {
    ...rest,
    sidesMm: outline.map((_, i) => at(`sidesMm.${i}`) ?? 0),
    diagonals: diagonalsToMeasure(outline.length).flatMap((diagonal, i) => {
      const lengthMm = at(`diagonals.${i}`)
      return lengthMm === null ? [] : [{ ...diagonal, lengthMm }]
    }),
  }
}
