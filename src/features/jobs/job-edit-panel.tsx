import { useNavigate, useOutletContext } from 'react-router-dom'
import type { JobView } from '../../../shared/jobs/job-views.ts'
import { useMay, useUser } from '../../lib/session.ts'
import { Dialog } from '../../ui/dialog.tsx'
import { ErrorState } from '../../ui/states.tsx'
import { useToast } from '../../ui/toast.tsx'
import { jobDraftKey } from './job-form-draft.ts'
import { jobFormOf } from './job-form-values.ts'
import { JobForm } from './job-form.tsx'
import { useChangeJob } from './job-queries.ts'
import { useJobForm } from './use-job-form.ts'

function EditJobForm({ job, onClose }: { job: JobView; onClose: () => void }) {
  const user = useUser()
  const change = useChangeJob()
  const toast = useToast()
  const fresh = () => {
    const base = jobFormOf(job)
    return { jobId: job.id, version: job.version, base, values: base }
  }
  const state = useJobForm({
    draftKey: jobDraftKey(user.id, job.id),
    fresh,
    save: (_values, changed, from) => change.mutateAsync({ ...changed, ...from }),
    onSaved: () => {
      toast('Job saved')
      onClose()
    },
  })
  return (
    <JobForm
      state={state}
      isNew={false}
      saveLabel="Save changes"
      fresh={fresh}
      onCancel={onClose}
    />
  )
}

/** The job's fields beside its page, at an address of their own. What is typed outlives closing. */
export function JobEditPanel() {
  const job = useOutletContext<JobView>()
  const mayWrite = useMay('job:write')
  const navigate = useNavigate()
  const close = () => void navigate(`/jobs/${job.id}`)
  return (
    <Dialog open onClose={close} place="panel" title={`Edit ${job.number}`}>
      {mayWrite ? (
        <EditJobForm job={job} onClose={close} />
      ) : (
        <ErrorState message="Only the office changes jobs." />
      )}
    </Dialog>
  )
}
