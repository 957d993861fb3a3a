import { type FormEvent, useState } from 'react'
import { issueAt } from '../../lib/failure-text.ts'
import { Button } from '../../ui/button.tsx'
import { Field } from '../../ui/field.tsx'
import { FormFailure } from '../../ui/form-failure.tsx'
import { TextArea, TextInput } from '../../ui/inputs.tsx'

type Values = { reason: string; price: string }

type Props = {
  start: Values
  save: string
  error: unknown
  busy: boolean
  onSave: (values: Values) => void
  onBack: () => void
}

/** What the variation is and why, and its price. */
export function VariationForm({ start, save, error, busy, onSave, onBack }: Props) {
  const [values, setValues] = useState(start)
  const submit = (event: FormEvent) => {
    event.preventDefault()
    onSave(values)
  }
  return (
    <form className="mt-2 space-y-3 py-2" onSubmit={submit} noValidate>
      <Field label="What, and why" error={issueAt(error, 'reason')}>
        <TextArea
          autoFocus
          maxLength={500}
          value={values.reason}
          onChange={(event) => setValues({ ...values, reason: event.target.value })}
        />
      </Field>
      <Field
        label="Price"
        hint="In dollars; with a minus for work left out. Leave it empty until it is priced."
        error={issueAt(error, 'price')}
        className="max-w-64"
      >
        <TextInput
          inputMode="text"
          autoComplete="off"
          value={values.price}
          onChange={(event) => setValues({ ...values, price: event.target.value })}
        />
      </Field>
      <FormFailure error={error} shownPaths={['reason', 'price']} />
      <div className="flex flex-wrap gap-2">
        <Button type="submit" busy={busy}>
          {save}
        </Button>
        <Button kind="quiet" onClick={onBack}>
          Back
        </Button>
      </div>
    </form>
  )
}

type YesProps = {
  today: string
  error: unknown
  busy: boolean
  onSave: (agreed: { on: string; by: string }) => void
  onBack: () => void
}

/** The builder's yes: the day and the name of who gave it. */
export function VariationYesForm({ today, error, busy, onSave, onBack }: YesProps) {
  const [agreed, setAgreed] = useState({ on: today, by: '' })
  const submit = (event: FormEvent) => {
    event.preventDefault()
    onSave(agreed)
  }
  return (
    <form className="mt-2 space-y-3 py-2" onSubmit={submit} noValidate>
      <div className="flex flex-wrap gap-3">
        <Field label="Who said yes" error={issueAt(error, 'agreed.by')} className="min-w-56 flex-1">
          <TextInput
            autoFocus
            autoComplete="off"
            maxLength={80}
            value={agreed.by}
            onChange={(event) => setAgreed({ ...agreed, by: event.target.value })}
          />
        </Field>
        <Field label="On" error={issueAt(error, 'agreed.on')}>
          <TextInput
            type="date"
            max={today}
            value={agreed.on}
            onChange={(event) => setAgreed({ ...agreed, on: event.target.value })}
          />
        </Field>
      </div>
      <FormFailure error={error} shownPaths={['agreed.by', 'agreed.on']} />
      <div className="flex flex-wrap gap-2">
        <Button type="submit" busy={busy}>
          Keep the yes
        </Button>
        <Button kind="quiet" onClick={onBack}>
          Back
        </Button>
      </div>
    </form>
  )
}
