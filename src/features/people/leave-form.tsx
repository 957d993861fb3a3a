import { type FormEvent, useState } from 'react'
import { isoWeekday } from '../../../shared/calendar/days.ts'
import { type LeaveKind, leaveKinds } from '../../../shared/people/leave-kinds.ts'
import { leaveKindNames, weekdayNames } from '../../../shared/people/leave-words.ts'
import { issueAt } from '../../lib/failure-text.ts'
import { useSession } from '../../lib/session.ts'
import { useFaultFocus } from '../../lib/use-fault-focus.ts'
import { Button } from '../../ui/button.tsx'
import { Field } from '../../ui/field.tsx'
import { FormFailure } from '../../ui/form-failure.tsx'
import { Checkbox, Select, TextInput } from '../../ui/inputs.tsx'
import { useAddLeave } from './time-queries.ts'

type WeekdaysProps = {
  value: number[]
  error: string | undefined
  onChange: (weekdays: number[]) => void
}

function Weekdays({ value, error, onChange }: WeekdaysProps) {
  return (
    <fieldset>
      <legend className="font-semibold">On each</legend>
      <div className="flex flex-wrap gap-x-4">
        {weekdayNames.map((name, i) => (
          <Checkbox
            key={name}
            label={name}
            checked={value.includes(i + 1)}
            onChange={(event) =>
              onChange(
                event.target.checked
                  ? [...value, i + 1].sort()
                  : value.filter((day) => day !== i + 1),
              )
            }
          />
        ))}
      </div>
      {error ? (
        <p role="alert" className="text-sm font-semibold text-stop">
          {error}
        </p>
      ) : null}
    </fieldset>
  )
}

type Props = { personId: string; onDone: () => void }

export function LeaveForm({ personId, onDone }: Props) {
  const { firm } = useSession()
  const [kind, setKind] = useState<LeaveKind>('leave')
  const [startsOn, setStartsOn] = useState(firm.today)
  const [endsOn, setEndsOn] = useState(firm.today)
  const [weekdays, setWeekdays] = useState<number[] | null>(null)
  const [reason, setReason] = useState('')
  const add = useAddLeave()
  const formRef = useFaultFocus(add.error)
  const pickKind = (next: LeaveKind) => {
    setKind(next)
    if (next === 'trade-school' && weekdays === null) setWeekdays([isoWeekday(startsOn)])
    if (next !== 'trade-school' && kind === 'trade-school') setWeekdays(null)
  }
  const submit = (event: FormEvent) => {
    event.preventDefault()
    if (add.isPending) return
    add.mutate({ id: personId, kind, startsOn, endsOn, weekdays, reason }, { onSuccess: onDone })
  }
  return (
    <form ref={formRef} onSubmit={submit} noValidate className="space-y-3">
      <Field label="What for" error={issueAt(add.error, 'kind')}>
        <Select value={kind} onChange={(event) => pickKind(event.target.value as LeaveKind)}>
          {leaveKinds.map((each) => (
            <option key={each} value={each}>
              {leaveKindNames[each]}
            </option>
          ))}
        </Select>
      </Field>
      <div className="grid gap-3 sm:grid-cols-2">
        <Field label="First day away" error={issueAt(add.error, 'startsOn')}>
          <TextInput
            type="date"
            value={startsOn}
            onChange={(event) => {
              setStartsOn(event.target.value)
              if (endsOn < event.target.value) setEndsOn(event.target.value)
            }}
          />
        </Field>
        <Field label="Last day away" error={issueAt(add.error, 'endsOn')}>
          <TextInput
            type="date"
            value={endsOn}
            onChange={(event) => setEndsOn(event.target.value)}
          />
        </Field>
      </div>
      <Checkbox
        label="Only some weekdays"
        checked={weekdays !== null}
        onChange={(event) => setWeekdays(event.target.checked ? [isoWeekday(startsOn)] : null)}
      />
      {weekdays ? (
        <Weekdays value={weekdays} error={issueAt(add.error, 'weekdays')} onChange={setWeekdays} />
      ) : null}
      <Field label="Remark" hint="Seen by the office only." error={issueAt(add.error, 'reason')}>
        <TextInput value={reason} onChange={(event) => setReason(event.target.value)} />
      </Field>
      <FormFailure
        error={add.error}
        shownPaths={['kind', 'startsOn', 'endsOn', 'weekdays', 'reason']}
      />
      <Button type="submit" busy={add.isPending}>
        Add leave
      </Button>
    </form>
  )
}
