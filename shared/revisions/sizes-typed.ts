import { z } from 'zod'
import { formatDay } from '../calendar/days.ts'
import { localDayOf } from '../calendar/local-time.ts'
import { sectionNames } from './form-typing.ts'
import { besideKeys, type RoofForm, type SectionKey, sectionKeys } from './roof-form.ts'

/** Who typed a size as it now stands, and when: an instant. */
const sizeTypedSchema = z.object({ by: z.string(), at: z.string() })
export type SizeTyped = z.infer<typeof sizeTypedSchema>

const allKeys = [...sectionKeys, ...besideKeys] as const

/** By section; sizes typed before names were kept, and empty ones, have no entry. */
export const sizesTypedSchema = z.partialRecord(z.enum(allKeys), sizeTypedSchema)
export type SizesTyped = z.infer<typeof sizesTypedSchema>

type Sized = { form: RoofForm; sizesTyped: SizesTyped }

/**
 * Who stands behind each size after a save. A size that stays as it was stays with who typed it; one that
 * changed is the saver's; one that was emptied is nobody's. `before` is null for the first save.
 */
export function sizesTypedAfter(
  before: Sized | null,
  form: RoofForm,
  saver: SizeTyped,
): SizesTyped {
  const entries = allKeys.flatMap((key): [SectionKey, SizeTyped][] => {
    const size = sizeText(form, key)
    if (size === '') return []
    const isSame = before !== null && sizeText(before.form, key) === size
    const typed = isSame ? before.sizesTyped[key] : saver
    return typed ? [[key, typed]] : []
  })
  return Object.fromEntries(entries)
}

/** Both figures, or nothing while neither is typed. */
function sizeText(form: RoofForm, key: SectionKey): string {
  const { depthMm, thicknessMm } = form.sections[key]
  const [depth, thickness] = [depthMm.trim(), thicknessMm.trim()]
  return depth === '' && thickness === '' ? '' : `${depth} × ${thickness}`
}

/**
 * 'Sizes typed by Maren Tolhurst, Thu 3 Dec', or section by section where several people or days stand
 * behind them; null when nobody is known.
 */
export function sizesTypedWords(sizesTyped: SizesTyped, timeZone: string): string | null {
  const groups = new Map<string, SectionKey[]>()
  for (const key of allKeys) {
    const typed = sizesTyped[key]
    if (!typed) continue
    const who = `${typed.by}, ${formatDay(localDayOf(new Date(typed.at), timeZone))}`
    groups.set(who, [...(groups.get(who) ?? []), key])
  }
  const [only, ...others] = [...groups]
  if (!only) return null
  if (others.length === 0) return `Sizes typed by ${only[0]}`
  const parts = [only, ...others].map(
    ([who, keys]) => `${keys.map((key) => sectionNames[key]).join(', ')} by ${who}`,
  )
  return `Sizes typed: ${parts.join('; ')}`
}
