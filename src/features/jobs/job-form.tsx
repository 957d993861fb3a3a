import { useWatch } from 'react-hook-form'
import { Button } from '../../ui/button.tsx'
import { Note } from '../../ui/states.tsx'
import { JobConflict } from './job-conflict.tsx'
import { JobFields } from './job-fields.tsx'
import { jobFormOf } from './job-form-values.ts'
import type { JobFormDraft } from './job-form-draft.ts'
import type { JobFormState } from './use-job-form.ts'

/** The panel's foot stays in sight; it reaches over the panel's own padding. */
const stuckClass =
  'sticky -bottom-4 -mx-4 -mb-4 border-t border-rule px-4 sm:-bottom-6 sm:-mx-6 sm:-mb-6 sm:px-6'

type Props = {
  state: JobFormState
  isNew: boolean
  saveLabel: string
  fresh: () => JobFormDraft
  onCancel: () => void
}

function Restored({ onDiscard }: { onDiscard: () => void }) {
  return (
    <Note kind="caution" title="Not saved yet">
      <div className="flex flex-wrap items-center justify-between gap-2">
        <p>What you typed before is still here.</p>
        <Button kind="quiet" onClick={onDiscard}>
          Discard it
        </Button>
      </div>
    </Note>
  )
}

function Conflict({ state }: { state: JobFormState }) {
  const values = useWatch({ control: state.form.control, compute: (all) => all })
  const { conflict, saveOver, base, startAgain } = state
  if (!conflict || !saveOver) return null
  const theirs = jobFormOf(conflict)
  const { id, version } = conflict
  return (
    <JobConflict
      current={conflict}
      base={base}
      values={values}
      busy={state.form.formState.isSubmitting}
      onSaveOver={() => void saveOver()}
      onTakeTheirs={() => startAgain({ jobId: id, version, base: theirs, values: theirs })}
    />
  )
}

export function JobForm({ state, isNew, saveLabel, fresh, onCancel }: Props) {
  const { form, submit, conflict, isRestored, startAgain } = state
  const { isSubmitting, errors } = form.formState
  return (
    <form onSubmit={(event) => void submit(event)} noValidate className="space-y-6">
      {isRestored && !conflict ? <Restored onDiscard={() => startAgain(fresh())} /> : null}
      <JobFields form={form} isNew={isNew} />
      <div className={`space-y-3 bg-sheet py-3 ${isNew ? '' : stuckClass}`}>
        {conflict ? (
          <Conflict state={state} />
        ) : (
          <>
            {errors.root?.message ? (
              <p role="alert" className="font-semibold text-stop">
                {errors.root.message}
              </p>
            ) : null}
            <div className="flex flex-wrap gap-2">
              <Button type="submit" busy={isSubmitting}>
                {saveLabel}
              </Button>
              <Button kind="plain" onClick={onCancel}>
                Cancel
              </Button>
            </div>
          </>
        )}
      </div>
    </form>
  )
}
