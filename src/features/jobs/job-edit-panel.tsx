import { useNavigate, useOutletContext } from 'react-router-dom'
import type { JobView } from '../../../shared/jobs/job-views.ts'
import { useMay, useUser } from '../../lib/session.ts'
import { Dialog } from '../../ui/dialog.tsx'
import { ErrorState } from '../../ui/states.tsx'
import { useToast } from '../../ui/toast.tsx'
import { jobDraftKey, keptText, readJobDraft } from './job-form-draft.ts'
import { jobFormOf } from './job-form-values.ts'
import { JobForm } from './job-form.tsx'
import { useChangeJob } from './job-queries.ts'
import { useJobForm } from './use-job-form.ts'

type EditProps = { job: JobView; onClose: () => void; onLeave: () => void }

function EditJobForm({ job, onClose, onLeave }: EditProps) {
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
      onCancel={onLeave}
    />
  )
}

/** The job's fields beside its page, at an address of their own. What is typed outlives closing. */
export function JobEditPanel() {
  const job = useOutletContext<JobView>()
  const mayWrite = useMay('job:write')
  const navigate = useNavigate()
  const user = useUser()
  const toast = useToast()
  const close = () => void navigate(`/jobs/${job.id}`)
  const leave = () => {
    if (readJobDraft(jobDraftKey(user.id, job.id))) toast(keptText, { kind: 'stop' })
    close()
  }
  return (
    <Dialog open onClose={leave} place="panel" title={`Edit ${job.number}`}>
      {mayWrite ? (
        <EditJobForm job={job} onClose={close} onLeave={leave} />
      ) : (
        <ErrorState message="Only the office changes jobs." />
      )}
    </Dialog>
  )
}
