import {
  coveringNames,
  type JobFieldName,
  type JobFieldsInput,
} from '../../../shared/jobs/job-schemas.ts'
import type { JobView } from '../../../shared/jobs/job-views.ts'
import { formatDayWithYear } from '../../../shared/calendar/days.ts'
import { Button } from '../../ui/button.tsx'
import { Note } from '../../ui/states.tsx'
import { changedFields, jobFieldLabels, jobFieldNames, jobFormOf } from './job-form-values.ts'

const dayFields: readonly JobFieldName[] = ['wantedBy', 'priceSentOn', 'acceptedOn', 'completedOn']

function shown(values: JobFieldsInput, name: JobFieldName): string {
  const value = values[name]
  if (value === '') return 'empty'
  if (name === 'covering') return coveringNames[values.covering]
  return dayFields.includes(name) && /^\d{4}-\d\d-\d\d$/.test(value)
    ? formatDayWithYear(value)
    : value
}

type Props = {
  current: JobView
  base: JobFieldsInput
  values: JobFieldsInput
  busy: boolean
  onSaveOver: () => void
  onTakeTheirs: () => void
}

/** Somebody else saved first: both versions of what was changed here, and two ways on. */
export function JobConflict({ current, base, values, busy, onSaveOver, onTakeTheirs }: Props) {
  const theirs = jobFormOf(current)
  const mine = changedFields(values, base)
  const differing = jobFieldNames.filter((name) => name in mine && theirs[name] !== values[name])
  return (
    <Note kind="caution" title="Somebody else changed this job since you opened it">
      {differing.length > 0 ? (
        <dl className="my-2 max-h-[40vh] space-y-2 overflow-y-auto">
          {differing.map((name) => (
            <div key={name}>
              <dt className="font-semibold">{jobFieldLabels[name]}</dt>
              <dd className="[overflow-wrap:anywhere]">There now: {shown(theirs, name)}</dd>
              <dd className="[overflow-wrap:anywhere]">Yours: {shown(values, name)}</dd>
            </div>
          ))}
        </dl>
      ) : (
        <p className="my-2">What you changed does not touch what they changed.</p>
      )}
      <div className="flex flex-wrap gap-2">
        <Button busy={busy} onClick={onSaveOver}>
          Save mine
        </Button>
        <Button kind="plain" busy={busy} onClick={onTakeTheirs}>
          Take what is there
        </Button>
      </div>
    </Note>
  )
}
