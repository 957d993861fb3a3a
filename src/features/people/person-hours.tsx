import { type FormEvent, useState } from 'react'
import { weekdayNames } from '../../../shared/people/leave-words.ts'
import type { PersonDetail } from '../../../shared/people/people-schemas.ts'
import { issueAt } from '../../lib/failure-text.ts'
import { useFaultFocus } from '../../lib/use-fault-focus.ts'
import { Button } from '../../ui/button.tsx'
import { Field } from '../../ui/field.tsx'
import { FormFailure } from '../../ui/form-failure.tsx'
import { TextInput } from '../../ui/inputs.tsx'
import { useToast } from '../../ui/toast.tsx'
import { PanelSection } from './panel-section.tsx'
import { useSetHours } from './people-queries.ts'

const numberOf = (typed: string): number => {
  const text = typed.trim().replace(',', '.')
  return text === '' ? 0 : Number(text)
}

const hourPaths = weekdayNames.map((_, i) => `weekHours.${i}`)

function HoursForm({ person, onDone }: { person: PersonDetail; onDone: () => void }) {
  const [typed, setTyped] = useState((person.weekHours ?? person.firmWeekHours).map(String))
  const save = useSetHours()
  const formRef = useFaultFocus(save.error)
  const send = (weekHours: number[] | null) =>
    save.mutate({ id: person.id, weekHours, version: person.version }, { onSuccess: onDone })
  const submit = (event: FormEvent) => {
    event.preventDefault()
    if (!save.isPending) send(typed.map(numberOf))
  }
  return (
    <form ref={formRef} onSubmit={submit} noValidate className="space-y-3">
      <div className="grid grid-cols-4 gap-2 sm:grid-cols-7">
        {weekdayNames.map((name, i) => (
          <Field key={name} label={name} error={issueAt(save.error, `weekHours.${i}`)}>
            <TextInput
              inputMode="decimal"
              value={typed[i] ?? ''}
              onChange={(event) =>
                setTyped((now) => now.map((hours, at) => (at === i ? event.target.value : hours)))
              }
            />
          </Field>
        ))}
      </div>
      <FormFailure error={save.error} shownPaths={hourPaths} />
      <div className="flex flex-wrap gap-2">
        <Button type="submit" busy={save.isPending}>
          Save hours
        </Button>
        {person.weekHours ? (
          <Button kind="plain" busy={save.isPending} onClick={() => send(null)}>
            Back to the firm’s
          </Button>
        ) : null}
      </div>
    </form>
  )
}

/** 'Mon 8 · Tue 8 · … · Fri 4', days without hours left out. */
function weekText(weekHours: readonly number[]): string {
  const days = weekdayNames.flatMap((name, i) => {
    const hours = weekHours[i] ?? 0
    return hours > 0 ? [`${name} ${hours}`] : []
  })
  return days.length === 0 ? 'none' : days.join(' · ')
}

export function PersonHours({ person }: { person: PersonDetail }) {
  const toast = useToast()
  const hours = person.weekHours ?? person.firmWeekHours
  const total = hours.reduce((sum, each) => sum + each, 0)
  return (
    <PanelSection
      title="Ordinary hours"
      action="Change"
      form={(close) => (
        <HoursForm
          key={person.version}
          person={person}
          onDone={() => {
            toast('Hours saved.')
            close()
          }}
        />
      )}
    >
      <p>
        {person.weekHours ? 'Own' : 'As the firm'}: {weekText(hours)}.{' '}
        <span className="text-ink-soft">{total} h a week.</span>
      </p>
    </PanelSection>
  )
}
