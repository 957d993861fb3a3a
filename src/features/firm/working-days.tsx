import { Card } from '../../ui/card.tsx'
import { Field } from '../../ui/field.tsx'
import { Checkbox, TextInput } from '../../ui/inputs.tsx'
import { ClosedDays } from './closed-days.tsx'
import { type FirmSectionProps, gridClass, weekdays } from './firm-fields.ts'
import { NumberInput } from './number-input.tsx'

const everyWeekday = weekdays.map((name, index) => ({ name, weekday: index + 1 }))

/** The hours of each weekday worked, where they differ. */
function WeekHours({ firm, onChange, issueAt }: FirmSectionProps) {
  const { weekHours } = firm
  const ordinary = () =>
    everyWeekday.map(({ weekday }) =>
      firm.workingWeekdays.includes(weekday) ? firm.hoursPerDay : 0,
    )
  return (
    <div className="mt-2">
      <Checkbox
        label="Some weekdays are longer or shorter"
        checked={weekHours !== null}
        onChange={() => onChange({ ...firm, weekHours: weekHours === null ? ordinary() : null })}
      />
      {weekHours === null ? null : (
        <div className="mt-1 grid grid-cols-2 gap-3 sm:grid-cols-4 xl:grid-cols-7">
          {everyWeekday
            .filter(({ weekday }) => firm.workingWeekdays.includes(weekday))
            .map(({ name, weekday }) => (
              <NumberInput
                key={weekday}
                label={name}
                unit="h"
                value={weekHours[weekday - 1] ?? 0}
                onChange={(hours) =>
                  onChange({
                    ...firm,
                    weekHours: weekHours.map((was, i) => (i === weekday - 1 ? hours : was)),
                  })
                }
                error={issueAt(`weekHours.${weekday - 1}`)}
              />
            ))}
        </div>
      )}
    </div>
  )
}

/** A weekday newly ticked starts with the usual hours, one no longer ticked has none. */
function weekHoursWith(
  firm: FirmSectionProps['firm'],
  weekday: number,
  isWorked: boolean,
): number[] | null {
  return (
    firm.weekHours?.map((was, i) =>
      i === weekday - 1 ? (isWorked ? firm.hoursPerDay : 0) : was,
    ) ?? null
  )
}

export function WorkingDays(props: FirmSectionProps) {
  const { firm, onChange, issueAt } = props
  const toggle = (weekday: number) => {
    const isWorked = !firm.workingWeekdays.includes(weekday)
    const days = isWorked
      ? [...firm.workingWeekdays, weekday]
      : firm.workingWeekdays.filter((each) => each !== weekday)
    onChange({
      ...firm,
      workingWeekdays: days.sort(),
      weekHours: weekHoursWith(firm, weekday, isWorked),
    })
  }
  return (
    <Card>
      <h2 className="mb-3 text-lg font-extrabold">Days and hours</h2>
      <fieldset className="mb-3">
        <legend className="font-semibold">Days worked</legend>
        <div className="flex flex-wrap gap-x-5">
          {everyWeekday.map(({ name, weekday }) => (
            <Checkbox
              key={weekday}
              label={name}
              checked={firm.workingWeekdays.includes(weekday)}
              onChange={() => toggle(weekday)}
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
          hint="A person’s own hours come before these."
          value={firm.hoursPerDay}
          onChange={(hoursPerDay) => onChange({ ...firm, hoursPerDay })}
          error={issueAt('hoursPerDay')}
        />
      </div>
      <WeekHours {...props} />
      <h3 className="mb-2 mt-5 font-extrabold">Days the firm is shut</h3>
      <ClosedDays
        closures={firm.ownClosedDays}
        onChange={(ownClosedDays) => onChange({ ...firm, ownClosedDays })}
        issueAt={issueAt}
      />
    </Card>
  )
}
