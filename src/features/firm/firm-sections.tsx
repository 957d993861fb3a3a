import { Card } from '../../ui/card.tsx'
import { Field } from '../../ui/field.tsx'
import { Select, TextInput } from '../../ui/inputs.tsx'
import { type FirmSectionProps as Props, gridClass, roofFields } from './firm-fields.ts'
import { NumberInput } from './number-input.tsx'
import { PublicHolidays } from './public-holidays.tsx'
import { WorkingDays } from './working-days.tsx'

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

function Reminders({ firm, onChange, issueAt }: Props) {
  return (
    <Card>
      <h2 className="mb-3 text-lg font-extrabold">Reminders and changes</h2>
      <div className={gridClass}>
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
      <WorkingDays {...props} />
      <PublicHolidays {...props} />
      <Reminders {...props} />
      <RoofDefaults {...props} />
    </>
  )
}
