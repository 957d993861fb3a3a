import { type FormEvent, useState } from 'react'
import type { Crew } from '../../../shared/people/people-schemas.ts'
import { CrewPennant } from '../../drawings/crew-pennant.tsx'
import { issueAt } from '../../lib/failure-text.ts'
import { useFaultFocus } from '../../lib/use-fault-focus.ts'
import { Button } from '../../ui/button.tsx'
import { FormFailure } from '../../ui/form-failure.tsx'
import { Field } from '../../ui/field.tsx'
import { Checkbox, TextInput } from '../../ui/inputs.tsx'
import { useSaveCrew } from './people-queries.ts'

const colours = [1, 2, 3, 4, 5, 6]

type Props = { crew: Crew | null; crews: readonly Crew[]; onDone: () => void }

/** The first colour that no crew flies yet. */
function freeColour(crews: readonly Crew[]): number {
  return colours.find((each) => crews.every((crew) => crew.colour !== each)) ?? 1
}

export function CrewForm({ crew, crews, onDone }: Props) {
  const [name, setName] = useState(crew?.name ?? '')
  const [letter, setLetter] = useState(crew?.letter ?? '')
  const [colour, setColour] = useState(crew?.colour ?? freeColour(crews))
  const [active, setActive] = useState(crew?.active ?? true)
  const save = useSaveCrew()
  const formRef = useFaultFocus(save.error)
  const submit = (event: FormEvent) => {
    event.preventDefault()
    if (!save.isPending)
      save.mutate({ id: crew?.id ?? null, name, letter, colour, active }, { onSuccess: onDone })
  }
  return (
    <form ref={formRef} onSubmit={submit} noValidate className="space-y-4">
      <Field label="Name" error={issueAt(save.error, 'name')}>
        <TextInput value={name} onChange={(event) => setName(event.target.value)} />
      </Field>
      <Field label="Letter" hint="Stands on the pennant." error={issueAt(save.error, 'letter')}>
        <TextInput
          value={letter}
          maxLength={1}
          onChange={(event) => setLetter(event.target.value.toUpperCase())}
        />
      </Field>
      <fieldset>
        <legend className="mb-1 font-semibold">Pennant</legend>
        <div className="flex flex-wrap gap-2">
          {colours.map((each) => (
            <label
              key={each}
              className={`flex min-h-11 min-w-11 items-center justify-center rounded-md border-2 has-focus-visible:outline-3 has-focus-visible:outline-chalk ${each === colour ? 'border-ink' : 'border-transparent'}`}
            >
              <input
                type="radio"
                name="colour"
                className="sr-only"
                checked={each === colour}
                onChange={() => setColour(each)}
              />
              <CrewPennant
                letter={letter || '?'}
                colour={each}
                name={`Pennant ${each}`}
                className="h-7 w-9 text-base"
              />
            </label>
          ))}
        </div>
      </fieldset>
      {crew ? (
        <Checkbox
          label="In use"
          checked={active}
          onChange={(event) => setActive(event.target.checked)}
        />
      ) : null}
      <FormFailure error={save.error} shownPaths={['name', 'letter']} />
      <Button type="submit" busy={save.isPending}>
        Save crew
      </Button>
    </form>
  )
}
