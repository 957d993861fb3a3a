import { zodResolver } from '@hookform/resolvers/zod'
import { useEffect, useState } from 'react'
import { useForm } from 'react-hook-form'
import { type JobFieldsInput, jobFieldsSchema } from '../../../shared/jobs/job-schemas.ts'
import { jobConflictSchema, type JobView } from '../../../shared/jobs/job-views.ts'
import { ApiFailure } from '../../lib/api-client.ts'
import { failureText } from '../../lib/failure-text.ts'
import { dropJobDraft, type JobFormDraft, readJobDraft, writeJobDraft } from './job-form-draft.ts'
import { changedFields, jobFieldNames } from './job-form-values.ts'

export type Save = (
  values: JobFieldsInput,
  changed: Partial<JobFieldsInput>,
  from: { jobId: string; version: number },
) => Promise<JobView>

type Options = {
  draftKey: string
  /** What the form begins with when nothing unsaved is kept. */
  fresh: () => JobFormDraft
  save: Save
  onSaved: (job: JobView) => void
}

/** The job as it is now, when a save was refused because it had moved on. */
export function jobInTheWay(error: unknown): JobView | null {
  if (!(error instanceof ApiFailure) || error.error.code !== 'conflict') return null
  const parsed = jobConflictSchema.safeParse(error.error.detail)
  return parsed.success ? parsed.data.current : null
}

/** Leaving the page for good would lose what is typed; the browser asks first. */
function useWarnOnLeaving(isDirty: boolean): void {
  useEffect(() => {
    if (!isDirty) return undefined
    const warn = (event: BeforeUnloadEvent) => event.preventDefault()
    window.addEventListener('beforeunload', warn)
    return () => window.removeEventListener('beforeunload', warn)
  }, [isDirty])
}

/** The job form: keeps what is typed, puts faults at their fields, and holds the other version on a conflict. */
export function useJobForm({ draftKey, fresh, save, onSaved }: Options) {
  const [kept] = useState(() => readJobDraft(draftKey))
  const [start, setStart] = useState<JobFormDraft>(() => kept ?? fresh())
  const [isRestored, setRestored] = useState(kept !== null)
  const [conflict, setConflict] = useState<JobView | null>(null)
  const form = useForm<JobFieldsInput>({
    resolver: zodResolver(jobFieldsSchema, undefined, { raw: true }),
    defaultValues: start.base,
    mode: 'onTouched',
  })
  const { reset, subscribe, setError, formState } = form

  useEffect(() => {
    if (kept) reset(kept.values, { keepDefaultValues: true })
  }, [kept, reset])

  useEffect(
    () =>
      subscribe({
        formState: { values: true },
        callback: ({ values }) => {
          const isChanged = Object.keys(changedFields(values, start.base)).length > 0
          if (isChanged) writeJobDraft(draftKey, { ...start, values })
          else dropJobDraft(draftKey)
        },
      }),
    [subscribe, draftKey, start],
  )
  useWarnOnLeaving(formState.isDirty)

  const fail = (error: unknown) => {
    setConflict(jobInTheWay(error))
    const issues = error instanceof ApiFailure ? error.error.issues : []
    for (const { path, message } of issues) {
      const field = jobFieldNames.find((name) => name === path)
      if (field) setError(field, { message }, { shouldFocus: true })
    }
    const message = failureText(error, jobFieldNames)
    if (message) setError('root', { message })
  }
  const saveAt = (version: number) =>
    form.handleSubmit(async (values) => {
      try {
        const from = { jobId: start.jobId, version }
        const job = await save(values, changedFields(values, start.base), from)
        dropJobDraft(draftKey)
        onSaved(job)
      } catch (error) {
        fail(error)
      }
    })
  const startAgain = (from: JobFormDraft) => {
    dropJobDraft(draftKey)
    setStart(from)
    reset(from.base)
    setConflict(null)
    setRestored(false)
  }
  return {
    form,
    submit: saveAt(start.version),
    conflict,
    isRestored,
    base: start.base,
    saveOver: conflict ? saveAt(conflict.version) : null,
    startAgain,
  }
}

export type JobFormState = ReturnType<typeof useJobForm>
