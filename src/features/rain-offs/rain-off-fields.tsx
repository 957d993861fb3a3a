import type { CalendarCrew } from '../../../shared/bookings/calendar-schemas.ts'
import { mostRainOffDays } from '../../../shared/rain-offs/rain-off-schemas.ts'
import { Field } from '../../ui/field.tsx'
import { Select, TextInput } from '../../ui/inputs.tsx'
import type { RainOffKey } from './use-rain-off-address.ts'

type Props = {
  crews: readonly CalendarCrew[]
  values: { crewId: string; day: string; days: number; useFreeDays: boolean }
  onChange: (changes: Partial<Record<RainOffKey, string>>) => void
  issueAt: (path: string) => string | undefined
}

const freeChoices = [
  { value: 'keep', label: 'Everything after moves on', hint: 'Free days stay free.' },
  { value: 'use', label: 'Free days are used up first', hint: 'Fewer bookings move.' },
] as const

/** Whom it rains on, from when, for how long, and how what follows gives way. */
export function RainOffFields({ crews, values, onChange, issueAt }: Props) {
  return (
    <div className="space-y-4">
      <Field label="Crew" error={issueAt('crewId') ?? issueAt('crew')}>
        <Select value={values.crewId} onChange={(e) => onChange({ crew: e.target.value })}>
          {crews.map((crew) => (
            <option key={crew.id} value={crew.id}>
              {crew.name}
            </option>
          ))}
        </Select>
      </Field>
      <div className="grid gap-4 sm:grid-cols-2">
        <Field label="First day lost" error={issueAt('fromDay') ?? issueAt('day')}>
          <TextInput
            type="date"
            value={values.day}
            onChange={(e) => (e.target.value ? onChange({ day: e.target.value }) : undefined)}
          />
        </Field>
        <Field label="Working days lost" error={issueAt('workingDays') ?? issueAt('days')}>
          <Select value={String(values.days)} onChange={(e) => onChange({ days: e.target.value })}>
            {Array.from({ length: mostRainOffDays }, (_, i) => (
              <option key={i} value={i + 1}>
                {i + 1}
              </option>
            ))}
          </Select>
        </Field>
      </div>
      <fieldset>
        <legend className="mb-1 font-semibold">What follows</legend>
        {freeChoices.map(({ value, label, hint }) => (
          <label key={value} className="flex min-h-11 items-center gap-3">
            <input
              type="radio"
              name="free"
              value={value}
              checked={(value === 'use') === values.useFreeDays}
              onChange={() => onChange({ free: value })}
              className="h-5 w-5 shrink-0 accent-clay"
            />
            <span>
              {label}. <span className="text-ink-soft">{hint}</span>
            </span>
          </label>
        ))}
      </fieldset>
    </div>
  )
}
