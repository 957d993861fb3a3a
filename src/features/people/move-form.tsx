import { type FormEvent, useState } from 'react'
import { dayNear } from '../../../shared/people/leave-words.ts'
import type { Crew, PersonDetail } from '../../../shared/people/people-schemas.ts'
import { issueAt } from '../../lib/failure-text.ts'
import { useSession } from '../../lib/session.ts'
import { useFaultFocus } from '../../lib/use-fault-focus.ts'
import { Button } from '../../ui/button.tsx'
import { Field } from '../../ui/field.tsx'
import { FormFailure } from '../../ui/form-failure.tsx'
import { TextInput } from '../../ui/inputs.tsx'
import { crewName } from './crew-name.ts'
import { CrewSelect } from './crew-select.tsx'
import { useTellMove } from './use-tell-move.ts'
import type { Say } from './use-undo-line.tsx'

type Props = { person: PersonDetail; crews: Crew[]; say: Say; onDone: () => void }

/** From a day on in another crew. */
export function MoveForm({ person, crews, say, onDone }: Props) {
  const { firm } = useSession()
  const [crewId, setCrewId] = useState(person.crewId ?? '')
  const [from, setFrom] = useState(firm.today)
  const { move, tell } = useTellMove(person, crews, say)
  const formRef = useFaultFocus(move.error)
  const planned = person.nextMove
  const submit = (event: FormEvent) => {
    event.preventDefault()
    if (!move.isPending) tell({ crewId: crewId || null, from }, onDone)
  }
  return (
    <form ref={formRef} onSubmit={submit} noValidate className="space-y-3">
      <div className="grid gap-3 sm:grid-cols-2">
        <Field label="Crew" error={issueAt(move.error, 'crewId')}>
          <CrewSelect crews={crews} value={crewId} onChange={setCrewId} />
        </Field>
        <Field label="From" error={issueAt(move.error, 'from')}>
          <TextInput
            type="date"
            value={from}
            min={firm.today}
            onChange={(event) => setFrom(event.target.value)}
          />
        </Field>
      </div>
      {planned && from <= planned.from ? (
        <p className="text-ink-soft">
          Takes the place of the move to {crewName(crews, planned.crewId)} from{' '}
          {dayNear(planned.from, firm.today)}.
        </p>
      ) : null}
      <FormFailure error={move.error} shownPaths={['crewId', 'from']} />
      <Button type="submit" busy={move.isPending}>
        Move
      </Button>
    </form>
  )
}
