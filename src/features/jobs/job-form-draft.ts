import { z } from 'zod'
import { coverings, type JobFieldsInput } from '../../../shared/jobs/job-schemas.ts'
import { emptyJobForm } from './job-form-values.ts'

const text = z.string()
const valuesSchema = z.object({
  ...(Object.fromEntries(Object.keys(emptyJobForm).map((name) => [name, text])) as Record<
    Exclude<keyof JobFieldsInput, 'covering'>,
    typeof text
  >),
  covering: z.enum(coverings),
})

const draftSchema = z.object({
  /** Of the job; made when a new one is begun, so that saving twice makes one job. */
  jobId: z.string(),
  /** What the typing began with. */
  version: z.number(),
  base: valuesSchema,
  values: valuesSchema,
})
export type JobFormDraft = z.infer<typeof draftSchema>

export const keptText = 'Not saved. What you typed is kept until you come back to it.'

/** Typed and not saved: kept in this tab, a person and a form apart. */
export function jobDraftKey(userId: string, form: string): string {
  return `ridgehand.job-form.${userId}.${form}`
}

export function readJobDraft(key: string): JobFormDraft | null {
  try {
    return draftSchema.parse(JSON.parse(window.sessionStorage.getItem(key) ?? 'null'))
  } catch {
    return null
  }
}

export function writeJobDraft(key: string, draft: JobFormDraft): void {
  try {
    window.sessionStorage.setItem(key, JSON.stringify(draft))
  } catch {
    // Storage may be shut off; the form then lasts as long as it is open.
  }
}

export function dropJobDraft(key: string): void {
  try {
    window.sessionStorage.removeItem(key)
  } catch {
    // Nothing was kept.
  }
}
