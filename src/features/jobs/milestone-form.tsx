import { type FormEvent, useState } from 'react'
import type { Milestone } from '../../../shared/milestones/milestone-schemas.ts'
import { failureText, issueAt } from '../../lib/failure-text.ts'
import { Button } from '../../ui/button.tsx'
import { Field } from '../../ui/field.tsx'
import { TextInput } from '../../ui/inputs.tsx'
import { milestoneConflictOf } from './milestone-queries.ts'
import type { MilestoneFields } from './use-set-milestone.ts'

type Props = {
  milestone: Milestone
  error: unknown
  busy: boolean
  onSave: (fields: MilestoneFields) => void
  onCancel: () => void
}

/** Day, bringer and a word on one milestone; what was not touched is not sent. */
export function MilestoneForm({ milestone, error, busy, onSave, onCancel }: Props) {
  const [start] = useState(milestone)
  const [day, setDay] = useState(milestone.day ?? '')
  const [broughtBy, setBroughtBy] = useState(milestone.broughtBy)
  const [note, setNote] = useState(milestone.note)
  const submit = (event: FormEvent) => {
    event.preventDefault()
    const typed = { day: day || null, broughtBy: broughtBy.trim(), note: note.trim() }
    onSave({
      ...(typed.day === start.day ? {} : { day: typed.day }),
      ...(typed.broughtBy === start.broughtBy ? {} : { broughtBy: typed.broughtBy }),
      ...(typed.note === start.note ? {} : { note: typed.note }),
    })
  }
  const failure = milestoneConflictOf(error)
    ? undefined
    : failureText(error, ['day', 'broughtBy', 'note'])
  return (
    <form
      onSubmit={submit}
      noValidate
      className="mt-3 grid gap-3 sm:grid-cols-2"
      onKeyDown={(event) => (event.key === 'Escape' ? onCancel() : undefined)}
    >
      <Field label="Day" error={issueAt(error, 'day')}>
        <TextInput type="date" value={day} onChange={(e) => setDay(e.target.value)} autoFocus />
      </Field>
      <Field label="Who brings it" error={issueAt(error, 'broughtBy')}>
        <TextInput
          value={broughtBy}
          maxLength={80}
          onChange={(e) => setBroughtBy(e.target.value)}
        />
      </Field>
      <Field label="A word on it" error={issueAt(error, 'note')} className="sm:col-span-2">
        <TextInput value={note} maxLength={200} onChange={(e) => setNote(e.target.value)} />
      </Field>
      {failure ? (
        <p role="alert" className="font-semibold text-stop sm:col-span-2">
          {failure}
        </p>
      ) : null}
      <div className="flex flex-wrap gap-2 sm:col-span-2">
        <Button type="submit" busy={busy}>
          Save
        </Button>
        <Button kind="plain" onClick={onCancel}>
          Cancel
        </Button>
      </div>
    </form>
  )
}
