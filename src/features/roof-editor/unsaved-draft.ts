import { z } from 'zod'
import { type RoofForm, roofFormSchema } from '../../../shared/revisions/roof-form.ts'

const unsavedSchema = z.object({ form: roofFormSchema, version: z.number() })
export type UnsavedDraft = { form: RoofForm; version: number }

const keyOf = (jobId: string) => `ridgehand.roof.${jobId}`

/** What was typed and not yet saved stays on this device through a reload or a lost line. */
export function keepUnsaved(jobId: string, unsaved: UnsavedDraft | null): void {
  try {
    if (unsaved === null) window.sessionStorage.removeItem(keyOf(jobId))
    else window.sessionStorage.setItem(keyOf(jobId), JSON.stringify(unsaved))
  } catch {
    // Storage may be shut off or full; the form on screen still holds everything.
  }
}

export function readUnsaved(jobId: string): UnsavedDraft | null {
  try {
    const text = window.sessionStorage.getItem(keyOf(jobId))
    const parsed = unsavedSchema.safeParse(text === null ? null : JSON.parse(text))
    return parsed.success ? parsed.data : null
  } catch {
    return null
  }
}
