import type { ExpectedPerson, WriteDayLog } from '../../../shared/day-logs/day-log-schemas.ts'
import { Badge } from '../../ui/badge.tsx'
import { Button } from '../../ui/button.tsx'
import { Card } from '../../ui/card.tsx'
import { Field } from '../../ui/field.tsx'
import { Select } from '../../ui/inputs.tsx'
import { HoursStepper } from './hours-stepper.tsx'

type Person = WriteDayLog['people'][number]
type Props = {
  rows: WriteDayLog['people']
  known: ReadonlyMap<string, ExpectedPerson>
  /** People the office can still put down. */
  others: ExpectedPerson[]
  onChange: (rows: WriteDayLog['people']) => void
}

const stepMinutes = 15
const everybodyStepMinutes = 30
const mostMinutes = 16 * 60

type RowProps = {
  row: Person
  person: ExpectedPerson
  onChange: (row: Person) => void
}

function PersonRow({ row, person, onChange }: RowProps) {
  const toggle = () =>
    onChange({ ...row, turnedUp: !row.turnedUp, minutes: row.turnedUp ? 0 : person.minutes })
  return (
    <li className="flex items-center justify-between gap-x-3 py-2">
      <label className="flex min-h-14 min-w-0 flex-1 items-center gap-3 text-lg font-semibold">
        <input
          type="checkbox"
          checked={row.turnedUp}
          onChange={toggle}
          className="h-7 w-7 shrink-0 accent-clay"
        />
        <span className="min-w-0 [overflow-wrap:anywhere]">
          {person.name} {person.onLeave ? <Badge kind="ochre">on leave</Badge> : null}
        </span>
      </label>
      {row.turnedUp ? (
        <HoursStepper
          label={`Hours of ${person.name}`}
          minutes={row.minutes}
          stepMinutes={stepMinutes}
          mostMinutes={mostMinutes}
          onChange={(minutes) => onChange({ ...row, minutes })}
        />
      ) : (
        <p className="shrink-0 text-base">Not here</p>
      )}
    </li>
  )
}

function AddSomebody({
  others,
  onAdd,
}: {
  others: ExpectedPerson[]
  onAdd: (person: ExpectedPerson) => void
}) {
  if (others.length === 0) return null
  return (
    <Field label="Somebody else was here" className="mt-2 max-w-sm">
      <Select
        className="min-h-14"
        value=""
        onChange={(event) => {
          const person = others.find((one) => one.personId === event.target.value)
          if (person) onAdd(person)
        }}
      >
        <option value="">Pick a person</option>
        {others.map(({ personId, name }) => (
          <option key={personId} value={personId}>
            {name}
          </option>
        ))}
      </Select>
    </Field>
  )
}

/** Who turned up, and for how long on this job. */
export function PeopleHours({ rows, known, others, onChange }: Props) {
  const here = rows.filter((row) => row.turnedUp)
  const stepAll = (by: number) =>
    onChange(
      rows.map((row) =>
        row.turnedUp
          ? { ...row, minutes: Math.min(mostMinutes, Math.max(0, row.minutes + by)) }
          : row,
      ),
    )
  return (
    <Card aria-labelledby="who-turned-up">
      <h2 id="who-turned-up" className="text-lg font-extrabold">
        Who turned up
      </h2>
      {rows.length === 0 ? <p>Nobody is in this crew that day. Ask the office.</p> : null}
      <ul className="list-none divide-y divide-rule p-0">
        {rows.map((row) => {
          const person = known.get(row.personId)
          return person ? (
            <PersonRow
              key={row.personId}
              row={row}
              person={person}
              onChange={(next) =>
                onChange(rows.map((one) => (one.personId === next.personId ? next : one)))
              }
            />
          ) : null
        })}
      </ul>
      {here.length > 1 ? (
        <div className="mt-1 flex flex-wrap items-center gap-2">
          <span className="font-semibold">All</span>
          <Button
            kind="plain"
            size="site"
            className="px-3 whitespace-nowrap"
            onClick={() => stepAll(-everybodyStepMinutes)}
          >
            ½ h less
          </Button>
          <Button
            kind="plain"
            size="site"
            className="px-3 whitespace-nowrap"
            onClick={() => stepAll(everybodyStepMinutes)}
          >
            ½ h more
          </Button>
        </div>
      ) : null}
      <AddSomebody
        others={others.filter((one) => !rows.some((row) => row.personId === one.personId))}
        onAdd={({ personId, minutes }) =>
          onChange([...rows, { personId, turnedUp: true, minutes }])
        }
      />
    </Card>
  )
}
