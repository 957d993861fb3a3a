import { X } from 'lucide-react'
import { useState } from 'react'
import { type Day, dayPlus, formatDay } from '../../../shared/calendar/days.ts'
import { Button } from '../../ui/button.tsx'
import { Field } from '../../ui/field.tsx'
import { TextInput } from '../../ui/inputs.tsx'

type Props = {
  days: readonly Day[]
  worked: readonly Day[]
  onChange: (days: Day[]) => void
  onMove: (move: { from: Day; to: Day }) => void
}

/** The days of a booking one by one, and all those ahead moved together. */
export function DaysEditor({ days, worked, onChange, onMove }: Props) {
  const last = days[days.length - 1] ?? ''
  const firstAhead = days.find((day) => !worked.includes(day))
  const [extra, setExtra] = useState('')
  const [moveTo, setMoveTo] = useState('')
  const isNew = extra !== '' && !days.includes(extra)
  return (
    <fieldset className="space-y-3">
      <legend className="mb-1 font-semibold">Days</legend>
      <ul className="flex flex-wrap gap-2">
        {days.map((day) => (
          <li
            key={day}
            className="flex items-center rounded-md border border-ink-soft pl-3 font-semibold"
          >
            {formatDay(day)}
            {worked.includes(day) ? (
              <span className="flex min-h-11 items-center px-3 font-normal text-ink-soft">
                worked
              </span>
            ) : (
              <button
                type="button"
                aria-label={`Take off ${formatDay(day)}`}
                disabled={days.length === 1}
                className="flex h-11 w-11 items-center justify-center disabled:opacity-50"
                onClick={() => onChange(days.filter((one) => one !== day))}
              >
                <X size={18} aria-hidden />
              </button>
            )}
          </li>
        ))}
      </ul>
      <div className="flex flex-wrap items-end gap-2">
        <Field label="Another day" className="min-w-40 flex-1">
          <TextInput
            type="date"
            value={extra}
            onFocus={() => (extra === '' && last ? setExtra(dayPlus(last, 1)) : undefined)}
            onChange={(e) => setExtra(e.target.value)}
          />
        </Field>
        <Button
          kind="plain"
          disabled={!isNew}
          onClick={() => {
            onChange([...days, extra].sort())
            setExtra('')
          }}
        >
          Add day
        </Button>
      </div>
      {firstAhead ? (
        <div className="flex flex-wrap items-end gap-2">
          <Field
            label={
              worked.length > 0 ? 'Move the days ahead to start on' : 'Move all days to start on'
            }
            className="min-w-40 flex-1"
          >
            <TextInput type="date" value={moveTo} onChange={(e) => setMoveTo(e.target.value)} />
          </Field>
          <Button
            kind="plain"
            disabled={moveTo === '' || moveTo === firstAhead}
            onClick={() => onMove({ from: firstAhead, to: moveTo })}
          >
            Move
          </Button>
        </div>
      ) : null}
    </fieldset>
  )
}
