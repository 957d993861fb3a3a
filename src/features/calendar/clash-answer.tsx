import { type FormEvent, type ReactNode, useState } from 'react'
import type { BookingConflict } from '../../../shared/bookings/booking-schemas.ts'
import { Button } from '../../ui/button.tsx'
import { Field } from '../../ui/field.tsx'
import { TextInput } from '../../ui/inputs.tsx'
import { Note } from '../../ui/states.tsx'

export type OnPurpose = { clashReason?: string; evenIfNotWorked?: boolean }

type Props = {
  conflict: BookingConflict
  busy: boolean
  onAnswer: (said: OnPurpose) => void
  onBack: () => void
  /** Another way out, beside going back. */
  children?: ReactNode
}

/** What stands in the way, day by day; the way round it is typed on purpose. */
export function ClashAnswer({ conflict, busy, onAnswer, onBack, children }: Props) {
  const [reason, setReason] = useState('')
  const [error, setError] = useState<string>()
  const isTwice = conflict.clashes.some((clash) => clash.code === 'crew-twice')
  const isClosed = conflict.clashes.some((clash) => clash.code === 'day-not-worked')
  const submit = (event: FormEvent) => {
    event.preventDefault()
    if (busy) return
    if (isTwice && reason.trim() === '') return setError('Say why both are booked.')
    onAnswer({
      ...(isTwice ? { clashReason: reason.trim() } : {}),
      ...(isClosed ? { evenIfNotWorked: true } : {}),
    })
  }
  return (
    <form onSubmit={submit} noValidate className="space-y-4" aria-label="What stands in the way">
      <div role="alert">
        <Note kind="stop" title={isTwice ? 'The crew is booked already' : 'Not a day you work'}>
          <ul className="list-disc pl-5">
            {conflict.clashes.map((clash) => (
              <li key={`${clash.code} ${clash.day} ${clash.text}`}>{clash.text}</li>
            ))}
          </ul>
        </Note>
      </div>
      <p>
        {isTwice
          ? 'Pick other days or another crew. If it is meant, say why.'
          : 'Pick other days, unless the crew has agreed to work them.'}
      </p>
      {isTwice ? (
        <Field label="Why both are booked" error={error}>
          <TextInput
            value={reason}
            maxLength={200}
            onChange={(e) => setReason(e.target.value)}
            autoFocus
          />
        </Field>
      ) : null}
      <div className="flex flex-wrap gap-2">
        <Button type="button" onClick={onBack}>
          Go back
        </Button>
        {children}
        <Button type="submit" kind="danger" busy={busy}>
          {isTwice ? 'Book both on purpose' : 'Book it all the same'}
        </Button>
      </div>
    </form>
  )
}
