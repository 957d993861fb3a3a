import type { BookingState } from '../../../shared/bookings/booking-schemas.ts'
import type { CalendarCrew } from '../../../shared/bookings/calendar-schemas.ts'
import { Field } from '../../ui/field.tsx'
import { Select, TextArea, TextInput } from '../../ui/inputs.tsx'
import { Segmented } from '../../ui/segmented.tsx'

const stateOptions: readonly { value: BookingState; label: string }[] = [
  { value: 'pencilled', label: 'Pencilled' },
  { value: 'firm', label: 'Firm' },
]

export type BookingValues = { crewId: string; state: BookingState; startAt: string; gear: string }
type IssueAt = (path: string) => string | undefined

export function CrewField(props: {
  crews: readonly CalendarCrew[]
  crewId: string
  onChange: (crewId: string) => void
  error: string | undefined
}) {
  return (
    <Field label="Crew" error={props.error}>
      <Select value={props.crewId} onChange={(e) => props.onChange(e.target.value)}>
        {props.crews.map((crew) => (
          <option key={crew.id} value={crew.id}>
            {crew.name}
          </option>
        ))}
      </Select>
    </Field>
  )
}

/** Pencilled or firm, start and gear: the same for a new booking and a changed one. */
export function BookingFields(props: {
  values: BookingValues
  onChange: (changes: Partial<BookingValues>) => void
  issueAt: IssueAt
}) {
  const { values, onChange, issueAt } = props
  const stateIssue = issueAt('state')
  return (
    <>
      <div>
        <p className="mb-1 font-semibold">Pencilled or firm</p>
        <Segmented
          label="Pencilled or firm"
          options={stateOptions}
          value={values.state}
          onChange={(state) => onChange({ state })}
        />
        <p className="mt-1 text-sm text-ink-soft">
          Pencilled days mail nobody. Firm days remind the crew on the working day before.
        </p>
        {stateIssue ? (
          <p role="alert" className="mt-1 text-sm font-semibold text-stop">
            {stateIssue}
          </p>
        ) : null}
      </div>
      <Field label="Start time" hint="Empty: the firm's start." error={issueAt('startAt')}>
        <TextInput
          type="time"
          value={values.startAt}
          onChange={(e) => onChange({ startAt: e.target.value })}
        />
      </Field>
      <Field label="Gear to bring" error={issueAt('gear')}>
        <TextArea
          rows={2}
          maxLength={500}
          value={values.gear}
          onChange={(e) => onChange({ gear: e.target.value })}
        />
      </Field>
    </>
  )
}
