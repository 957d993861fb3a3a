import { useNavigate } from 'react-router-dom'
import { newDeviceId } from '../../lib/device-id.ts'
import { useMay, useUser } from '../../lib/session.ts'
import { Card } from '../../ui/card.tsx'
import { PageHeader } from '../../ui/page-header.tsx'
import { ErrorState } from '../../ui/states.tsx'
import { useToast } from '../../ui/toast.tsx'
import { jobDraftKey, keptText, readJobDraft } from './job-form-draft.ts'
import { emptyJobForm } from './job-form-values.ts'
import { JobForm } from './job-form.tsx'
import { useChangeJob, useCreateJob } from './job-queries.ts'
import { jobInTheWay, type Save, useJobForm } from './use-job-form.ts'

function freshForm() {
  const base = emptyJobForm
  return { jobId: newDeviceId(), version: 1, base, values: base }
}

/** When an earlier try did arrive without its answer coming back, what was typed since is saved onto that job. */
function useSaveNewJob(): Save {
  const create = useCreateJob()
  const change = useChangeJob()
  return async (values, _changed, { jobId }) => {
    try {
      return await create.mutateAsync({ ...values, id: jobId })
    } catch (error) {
      const saved = jobInTheWay(error)
      if (!saved) throw error
      const number = values.number || saved.number
      return change.mutateAsync({ ...values, number, jobId, version: saved.version })
    }
  }
}

function NewJobForm() {
  const draftKey = jobDraftKey(useUser().id, 'new')
  const save = useSaveNewJob()
  const navigate = useNavigate()
  const toast = useToast()
  const state = useJobForm({
    draftKey,
    fresh: freshForm,
    save,
    onSaved: (job) => {
      toast(`Saved as ${job.number}`)
      void navigate(`/jobs/${job.id}`, { replace: true })
    },
  })
  const leave = () => {
    if (readJobDraft(draftKey)) toast(keptText, { kind: 'stop' })
    void navigate('/board')
  }
  return (
    <Card className="max-w-3xl sm:px-6">
      <JobForm state={state} isNew saveLabel="Save the job" fresh={freshForm} onCancel={leave} />
    </Card>
  )
}

export function NewJobPage() {
  const mayWrite = useMay('job:write')
  return (
    <>
      <PageHeader title="New job" lead="Only the title is needed now; the rest can follow." />
      {mayWrite ? <NewJobForm /> : <ErrorState message="Only the office writes jobs down." />}
    </>
  )
}
