import { useState } from 'react'
import type { FormProblem } from '../../../shared/revisions/form-typing.ts'
import type { JobRoof } from '../../../shared/revisions/revision-schemas.ts'
import type { RoofForm } from '../../../shared/revisions/roof-form.ts'
import { type FormFirm, roofOfForm } from '../../../shared/revisions/roof-of-form.ts'
import { ApiFailure } from '../../lib/api-client.ts'
import { useToast } from '../../ui/toast.tsx'
import type { DraftSaver } from './draft-saver.ts'
import { useIssueRevision } from './roof-queries.ts'

type Subject = { form: RoofForm; firm: FormFirm; saver: DraftSaver }
type Problem = Pick<FormProblem, 'path' | 'message'>

/** Issues what is on screen: checked here first, then saved, then checked and framed by the server. */
export function useIssue(opened: JobRoof, { form, firm, saver }: Subject) {
  const toast = useToast()
  const mutation = useIssueRevision(opened.job.id)
  const [refused, setRefused] = useState<{ form: RoofForm; problems: Problem[] } | null>(null)
  const [isStarting, setIsStarting] = useState(false)

  const failed = (error: unknown) => {
    const failure = error instanceof ApiFailure ? error : null
    if (failure && failure.error.issues.length > 0) {
      setRefused({ form, problems: failure.error.issues })
    } else toast(failure?.message ?? 'Not issued. Try again.', { kind: 'stop' })
  }
  const start = async () => {
    const { problems } = roofOfForm(form, firm)
    setRefused(problems ? { form, problems } : null)
    if (problems) return
    const version = await saver.flush()
    if (version === null) {
      toast('Not issued, because the roof is not saved yet. Try again.', { kind: 'stop' })
      return
    }
    try {
      const { issued, revision } = await mutation.mutateAsync(version)
      toast(
        issued
          ? `Issued as ${revision.letter}`
          : `The same as revision ${revision.letter}, so no new one was issued.`,
      )
    } catch (error) {
      failed(error)
    }
  }
  return {
    isPending: isStarting || mutation.isPending,
    /** From the first refusal on, what is left out counts as a fault at its field. */
    wasRefused: refused !== null,
    /** Why it was refused; gone as soon as the form changes. */
    problems: refused?.form === form ? refused.problems : [],
    last: mutation.data ?? null,
    start: () => {
      if (isStarting) return
      setIsStarting(true)
      void start().finally(() => setIsStarting(false))
    },
  }
}
