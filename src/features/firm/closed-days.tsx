import { useState } from 'react'
import { formatDayWithYear } from '../../../shared/calendar/days.ts'
import type { FirmSettings } from '../../../shared/firm/firm-schemas.ts'
import { Button } from '../../ui/button.tsx'
import { Field } from '../../ui/field.tsx'
import { TextInput } from '../../ui/inputs.tsx'

type Closed = FirmSettings['closedDays']

/** Public holidays and the firm's own shut days. */
export function ClosedDays({ days, onChange }: { days: Closed; onChange: (days: Closed) => void }) {
  const [day, setDay] = useState('')
  const [name, setName] = useState('')
  const ready = day !== '' && name.trim() !== ''
  const add = () => {
    const others = days.filter((each) => each.day !== day)
    onChange([...others, { day, name: name.trim() }].sort((a, b) => a.day.localeCompare(b.day)))
    setDay('')
    setName('')
  }
  return (
    <div className="space-y-3">
      {days.length === 0 ? <p className="text-ink-soft">No closed days yet.</p> : null}
      <ul className="space-y-1">
        {days.map((each) => (
          <li key={each.day} className="flex items-center justify-between gap-3">
            <span>
              {formatDayWithYear(each.day)} · {each.name}
            </span>
            <Button
              kind="quiet"
              aria-label={`Take out ${each.name}`}
              onClick={() => onChange(days.filter((other) => other.day !== each.day))}
            >
              Take out
            </Button>
          </li>
        ))}
      </ul>
      <div className="grid gap-3 sm:grid-cols-[1fr_2fr_auto] sm:items-end">
        <Field label="Day">
          <TextInput type="date" value={day} onChange={(event) => setDay(event.target.value)} />
        </Field>
        <Field label="Why">
          <TextInput
            value={name}
            maxLength={60}
            onChange={(event) => setName(event.target.value)}
          />
        </Field>
        <Button kind="plain" disabled={!ready} onClick={add}>
          Add day
        </Button>
      </div>
    </div>
  )
}
