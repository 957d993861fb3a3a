import { type FormEvent, useState } from 'react'
import { ticketKinds } from '../../../shared/people/ticket-kinds.ts'
import type { Ticket } from '../../../shared/people/ticket-schemas.ts'
import { ticketKindNames } from '../../../shared/people/ticket-words.ts'
import { issueAt } from '../../lib/failure-text.ts'
import { useFaultFocus } from '../../lib/use-fault-focus.ts'
import { Button } from '../../ui/button.tsx'
import { Field } from '../../ui/field.tsx'
import { FormFailure } from '../../ui/form-failure.tsx'
import { Select, TextInput } from '../../ui/inputs.tsx'
import { useAddTicket, useEditTicket } from './ticket-queries.ts'

type Props = { personId: string; ticket: Ticket | null; onDone: () => void }

const paths = ['kind', 'name', 'number', 'expiresOn']

export function TicketForm({ personId, ticket, onDone }: Props) {
  const [fields, setFields] = useState({
    kind: ticket?.kind ?? ('working-at-heights' as Ticket['kind']),
    name: ticket?.name ?? '',
    number: ticket?.number ?? '',
    expiresOn: ticket?.expiresOn ?? '',
  })
  const add = useAddTicket()
  const edit = useEditTicket()
  const { error, isPending } = ticket ? edit : add
  const formRef = useFaultFocus(error)
  const set = (name: keyof typeof fields) => (event: { target: { value: string } }) =>
    setFields((now) => ({ ...now, [name]: event.target.value }))
  const submit = (event: FormEvent) => {
    event.preventDefault()
    if (isPending) return
    const input = { personId, ...fields, expiresOn: fields.expiresOn || null }
    if (ticket)
      edit.mutate({ ...input, ticketId: ticket.id, version: ticket.version }, { onSuccess: onDone })
    else add.mutate(input, { onSuccess: onDone })
  }
  return (
    <form ref={formRef} onSubmit={submit} noValidate className="space-y-3">
      <div className="grid gap-3 sm:grid-cols-2">
        <Field label="What for" error={issueAt(error, 'kind')}>
          <Select value={fields.kind} onChange={set('kind')}>
            {ticketKinds.map((kind) => (
              <option key={kind} value={kind}>
                {ticketKindNames[kind]}
              </option>
            ))}
          </Select>
        </Field>
        <Field
          label={fields.kind === 'other' ? 'What it is called' : 'Class or trade'}
          error={issueAt(error, 'name')}
        >
          <TextInput value={fields.name} onChange={set('name')} autoComplete="off" />
        </Field>
        <Field label="Number" error={issueAt(error, 'number')}>
          <TextInput value={fields.number} onChange={set('number')} autoComplete="off" />
        </Field>
        <Field
          label="Last day it holds"
          hint="Empty: it does not lapse."
          error={issueAt(error, 'expiresOn')}
        >
          <TextInput type="date" value={fields.expiresOn} onChange={set('expiresOn')} />
        </Field>
      </div>
      <FormFailure error={error} shownPaths={paths} />
      <Button type="submit" busy={isPending}>
        {ticket ? 'Save ticket' : 'Add ticket'}
      </Button>
    </form>
  )
}
