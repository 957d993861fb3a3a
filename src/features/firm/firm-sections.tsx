import type { FirmSettings } from '../../../shared/firm/firm-schemas.ts'
import { Card } from '../../ui/card.tsx'
import { Field } from '../../ui/field.tsx'
import { Checkbox, Select, TextInput } from '../../ui/inputs.tsx'
import { ClosedDays } from './closed-days.tsx'
import { roofFields, weekdays } from './firm-fields.ts'
import { NumberInput } from './number-input.tsx'

type Props = {
  firm: FirmSettings
  onChange: (firm: FirmSettings) => void
  issueAt: (path: string) => string | undefined
}

const gridClass = 'grid gap-3 sm:grid-cols-2 xl:grid-cols-3'

// Zones with an airport's city in them only; the list comes from the browser itself.
const timeZones = Intl.supportedValuesOf('timeZone').filter((zone) => zone.includes('/'))

function FirmDetails({ firm, onChange, issueAt }: Props) {
  return (
    <Card>
      <h2 className="mb-3 text-lg font-extrabold">The firm</h2>
      <div className={gridClass}>
        <Field label="Name" error={issueAt('name')}>
          <TextInput
            value={firm.name}
            onChange={(event) => onChange({ ...firm, name: event.target.value })}
          />
        </Field>
        <Field label="Phone" error={issueAt('phone')}>
          <TextInput
            type="tel"
            value={firm.phone}
            onChange={(event) => onChange({ ...firm, phone: event.target.value })}
          />
        </Field>
        <Field label="Time zone" error={issueAt('timeZone')}>
          <Select
            value={firm.timeZone}
            onChange={(event) => onChange({ ...firm, timeZone: event.target.value })}
          >
            {(timeZones.includes(firm.timeZone) ? timeZones : [firm.timeZone, ...timeZones]).map(
              (zone) => (
                <option key={zone}>{zone}</option>
              ),
            )}
          </Select>
        </Field>
        <Field label="Lengths are shown in">
          <Select
            value={firm.lengthUnits}
            onChange={(event) =>
              onChange({ ...firm, lengthUnits: event.target.value === 'mm' ? 'mm' : 'feet-inches' })
            }
          >
            <option value="mm">Millimetres</option>
            <option value="feet-inches">Feet, inches and sixteenths</option>
          </Select>
        </Field>
        <NumberInput
          label="Brickwork stands outside the frame"
          unit="mm"
          hint="Added to an overhang measured from brickwork."
          value={firm.brickOffsetMm}
          onChange={(brickOffsetMm) => onChange({ ...firm, brickOffsetMm })}
          error={issueAt('brickOffsetMm')}
        />
      </div>
    </Card>
  )
}

function DaysAndReminders({ firm, onChange, issueAt }: Props) {
  const toggle = (weekday: number) => {
    const has = firm.workingWeekdays.includes(weekday)
    const days = has
      ? firm.workingWeekdays.filter((each) => each !== weekday)
      : [...firm.workingWeekdays, weekday]
    onChange({ ...firm, workingWeekdays: days.sort() })
  }
  return (
    <Card>
      <h2 className="mb-3 text-lg font-extrabold">Days and reminders</h2>
      <fieldset className="mb-3">
        <legend className="font-semibold">Days worked</legend>
        <div className="flex flex-wrap gap-x-5">
          {weekdays.map((name, index) => (
            <Checkbox
              key={name}
              label={name}
              checked={firm.workingWeekdays.includes(index + 1)}
              onChange={() => toggle(index + 1)}
            />
          ))}
        </div>
        {issueAt('workingWeekdays') ? (
          <p className="text-sm font-semibold text-stop">{issueAt('workingWeekdays')}</p>
        ) : null}
      </fieldset>
      <div className={gridClass}>
        <Field label="Work starts at" error={issueAt('startAt')}>
          <TextInput
            type="time"
            value={firm.startAt}
            onChange={(event) => onChange({ ...firm, startAt: event.target.value })}
          />
        </Field>
        <NumberInput
          label="Hours a day, each person"
          unit="h"
          value={firm.hoursPerDay}
          onChange={(hoursPerDay) => onChange({ ...firm, hoursPerDay })}
          error={issueAt('hoursPerDay')}
        />
        <Field
          label="Reminders go at"
          hint="On the working day before."
          error={issueAt('reminderAt')}
        >
          <TextInput
            type="time"
            value={firm.reminderAt}
            onChange={(event) => onChange({ ...firm, reminderAt: event.target.value })}
          />
        </Field>
        <NumberInput
          label="Changes are held for"
          unit="min"
          hint="Then those concerned get one notice."
          value={firm.changeHoldMinutes}
          onChange={(changeHoldMinutes) => onChange({ ...firm, changeHoldMinutes })}
          error={issueAt('changeHoldMinutes')}
        />
      </div>
      <h3 className="mb-2 mt-5 font-extrabold">Closed days</h3>
      <ClosedDays
        days={firm.closedDays}
        onChange={(closedDays) => onChange({ ...firm, closedDays })}
      />
    </Card>
  )
}

function RoofDefaults({ firm, onChange, issueAt }: Props) {
  return (
    <Card>
      <h2 className="text-lg font-extrabold">Saw and timber</h2>
      <p className="mb-3 text-ink-soft">For roofs issued from now on; issued ones never change.</p>
      <div className={gridClass}>
        {roofFields.map(({ key, ...field }) => (
          <NumberInput
            key={key}
            {...field}
            value={firm.roofSettings[key]}
            onChange={(value) =>
              onChange({ ...firm, roofSettings: { ...firm.roofSettings, [key]: value } })
            }
            error={issueAt(`roofSettings.${key}`)}
          />
        ))}
      </div>
    </Card>
  )
}

export function FirmSections(props: Props) {
  return (
    <>
      <FirmDetails {...props} />
      <DaysAndReminders {...props} />
      <RoofDefaults {...props} />
    </>
  )
}
