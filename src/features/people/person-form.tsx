import { type FormEvent, useState } from 'react'
import { roleNames, roles, type Role } from '../../../shared/auth/roles.ts'
import type { Crew, Person } from '../../../shared/people/people-schemas.ts'
import { issueAt } from '../../lib/failure-text.ts'
import { useFaultFocus } from '../../lib/use-fault-focus.ts'
import { Button } from '../../ui/button.tsx'
import { Field } from '../../ui/field.tsx'
import { Checkbox, Select, TextInput } from '../../ui/inputs.tsx'
import { FormFailure } from '../../ui/form-failure.tsx'
import { useToast } from '../../ui/toast.tsx'
import { CrewSelect } from './crew-select.tsx'
import { useAddPerson, useEditPerson } from './people-queries.ts'

type Props = { person: Person | null; crews: Crew[]; onDone: () => void }

const fieldPaths = ['name', 'email', 'phone', 'role', 'crewId']

export function PersonForm({ person, crews, onDone }: Props) {
  const [fields, setFields] = useState({
    name: person?.name ?? '',
    email: person?.email ?? '',
    phone: person?.phone ?? '',
    role: person?.role ?? ('apprentice' as Role),
  })
  const [crewId, setCrewId] = useState('')
  const [active, setActive] = useState(person?.active ?? true)
  const add = useAddPerson()
  const edit = useEditPerson()
  const toast = useToast()
  const mutation = person ? edit : add
  const formRef = useFaultFocus(mutation.error)
  const set = (name: keyof typeof fields) => (event: { target: { value: string } }) =>
    setFields((now) => ({ ...now, [name]: event.target.value }))

  const save = () => {
    const done = (text: string) => () => {
      toast(text)
      onDone()
    }
    if (person) {
      edit.mutate(
        { id: person.id, ...fields, active, version: person.version },
        { onSuccess: done('Saved.') },
      )
    } else {
      add.mutate(
        { ...fields, crewId: crewId || null },
        { onSuccess: done(`${fields.name} is sent a link to sign in.`) },
      )
    }
  }

  const submit = (event: FormEvent) => {
    event.preventDefault()
    if (!mutation.isPending) save()
  }
  return (
    <form ref={formRef} onSubmit={submit} noValidate className="space-y-4">
      <Field label="Name" error={issueAt(mutation.error, 'name')}>
        <TextInput value={fields.name} onChange={set('name')} autoComplete="off" />
      </Field>
      <Field
        label="E-mail"
        hint="Reminders and links go here."
        error={issueAt(mutation.error, 'email')}
      >
        <TextInput type="email" value={fields.email} onChange={set('email')} autoComplete="off" />
      </Field>
      <Field label="Phone" error={issueAt(mutation.error, 'phone')}>
        <TextInput type="tel" value={fields.phone} onChange={set('phone')} autoComplete="off" />
      </Field>
      <Field label="Role" error={issueAt(mutation.error, 'role')}>
        <Select value={fields.role} onChange={set('role')}>
          {roles.map((role) => (
            <option key={role} value={role}>
              {roleNames[role]}
            </option>
          ))}
        </Select>
      </Field>
      {person ? (
        <Checkbox
          label="May sign in"
          checked={active}
          onChange={(event) => setActive(event.target.checked)}
        />
      ) : (
        <Field label="Crew from today" error={issueAt(mutation.error, 'crewId')}>
          <CrewSelect crews={crews} value={crewId} onChange={setCrewId} />
        </Field>
      )}
      <FormFailure error={mutation.error} shownPaths={fieldPaths} />
      <Button type="submit" busy={mutation.isPending}>
        {person ? 'Save' : 'Add and send a link'}
      </Button>
    </form>
  )
}
