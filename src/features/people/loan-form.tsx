import { type FormEvent, useState } from 'react'
import type { Crew, Person } from '../../../shared/people/people-schemas.ts'
import { issueAt } from '../../lib/failure-text.ts'
import { useSession } from '../../lib/session.ts'
import { useFaultFocus } from '../../lib/use-fault-focus.ts'
import { Button } from '../../ui/button.tsx'
import { Field } from '../../ui/field.tsx'
import { FormFailure } from '../../ui/form-failure.tsx'
import { Select, TextInput } from '../../ui/inputs.tsx'
import { useAddLoan } from './time-queries.ts'

type Props = {
  /** What is to choose: the crew that one person goes to, or whom one crew borrows. */
  choose: 'crew' | 'person'
  /** Who may be lent: one person, or those to choose from. */
  people: Pick<Person, 'id' | 'name'>[]
  /** The crews that may borrow: one, or those to choose from. */
  crews: Crew[]
  onDone: () => void
}

type Choice = { id: string; name: string }
type PickProps = { choices: Choice[]; value: string; onChange: (id: string) => void; id?: string }

function Pick({ choices, value, onChange, ...rest }: PickProps) {
  return (
    <Select {...rest} value={value} onChange={(event) => onChange(event.target.value)}>
      {choices.map((each) => (
        <option key={each.id} value={each.id}>
          {each.name}
        </option>
      ))}
    </Select>
  )
}

/** A day with another crew. */
export function LoanForm({ choose, people, crews, onDone }: Props) {
  const { firm } = useSession()
  const [personId, setPersonId] = useState(people[0]?.id ?? '')
  const [crewId, setCrewId] = useState(crews[0]?.id ?? '')
  const [day, setDay] = useState(firm.today)
  const [note, setNote] = useState('')
  const add = useAddLoan()
  const formRef = useFaultFocus(add.error)
  const submit = (event: FormEvent) => {
    event.preventDefault()
    if (!add.isPending) add.mutate({ id: personId, crewId, day, note }, { onSuccess: onDone })
  }
  return (
    <form ref={formRef} onSubmit={submit} noValidate className="space-y-3">
      <div className="grid gap-3 sm:grid-cols-2">
        {choose === 'crew' ? (
          <Field label="To" error={issueAt(add.error, 'crewId')}>
            <Pick choices={crews} value={crewId} onChange={setCrewId} />
          </Field>
        ) : (
          <Field label="Whom" error={issueAt(add.error, 'crewId')}>
            <Pick choices={people} value={personId} onChange={setPersonId} />
          </Field>
        )}
        <Field label="On" error={issueAt(add.error, 'day')}>
          <TextInput
            type="date"
            value={day}
            min={firm.today}
            onChange={(event) => setDay(event.target.value)}
          />
        </Field>
      </div>
      <Field label="Remark" error={issueAt(add.error, 'note')}>
        <TextInput value={note} onChange={(event) => setNote(event.target.value)} />
      </Field>
      <FormFailure error={add.error} shownPaths={['crewId', 'day', 'note']} />
      <Button type="submit" busy={add.isPending}>
        {choose === 'crew' ? 'Lend for the day' : 'Borrow for the day'}
      </Button>
    </form>
  )
}
