import { keepPreviousData, useQuery } from '@tanstack/react-query'
import { type ReactNode, useState } from 'react'
import { formatDay } from '../../../shared/calendar/days.ts'
import type {
  PublicHoliday,
  PublicHolidays as PublicHolidaysAnswer,
} from '../../../shared/firm/holiday-schemas.ts'
import { failureText } from '../../lib/failure-text.ts'
import { useSession } from '../../lib/session.ts'
import { Card } from '../../ui/card.tsx'
import { Field } from '../../ui/field.tsx'
import { Checkbox, Select } from '../../ui/inputs.tsx'
import { Skeleton } from '../../ui/skeleton.tsx'
import { ErrorState } from '../../ui/states.tsx'
import { type FirmSectionProps, gridClass } from './firm-fields.ts'
import { holidaysQuery } from './firm-queries.ts'

type Places = { code: string; name: string }[]

function PlaceSelect(props: {
  label: string
  none: string
  places: Places
  value: string | null
  onChange: (code: string | null) => void
  error: string | undefined
}) {
  const { label, none, places, value, onChange, error } = props
  return (
    <Field label={label} error={error}>
      <Select value={value ?? ''} onChange={(event) => onChange(event.target.value || null)}>
        <option value="">{none}</option>
        {places.map(({ code, name }) => (
          <option key={code} value={code}>
            {name}
          </option>
        ))}
      </Select>
    </Field>
  )
}

type ListProps = {
  holidays: PublicHoliday[]
  worked: string[]
  onToggle: (holiday: string) => void
}

function HolidayList({ holidays, worked, onToggle }: ListProps) {
  return (
    <fieldset>
      <legend className="font-semibold">Days off</legend>
      <p className="text-sm text-ink-soft">Take the tick out where the firm works all the same.</p>
      <div className="grid gap-x-6 sm:grid-cols-2 xl:grid-cols-3">
        {holidays.map(({ day, name, holiday }) => {
          const isWorked = worked.includes(holiday)
          return (
            <Checkbox
              key={`${day} ${name}`}
              label={`${formatDay(day)} · ${name}${isWorked ? ', worked' : ''}`}
              checked={!isWorked}
              onChange={() => onToggle(holiday)}
            />
          )
        })}
      </div>
    </fieldset>
  )
}

type PlaceProps = FirmSectionProps & { places: PublicHolidaysAnswer; children: ReactNode }

function HolidayPlace({ firm, onChange, issueAt, places, children }: PlaceProps) {
  const { holidayCountry: country, holidayState: state } = firm
  return (
    <div className={gridClass}>
      <PlaceSelect
        label="Country"
        none="None looked up"
        places={places.countries}
        value={country}
        onChange={(holidayCountry) => onChange({ ...firm, holidayCountry, holidayState: null })}
        error={issueAt('holidayCountry')}
      />
      {places.states.length > 0 && country !== null ? (
        <PlaceSelect
          label="State"
          none="None: the whole country’s only"
          places={places.states}
          value={state}
          onChange={(holidayState) => onChange({ ...firm, holidayState })}
          error={issueAt('holidayState')}
        />
      ) : null}
      {children}
    </div>
  )
}

function YearSelect(props: { first: number; year: number; onYear: (year: number) => void }) {
  const { first, year, onYear } = props
  return (
    <Field label="Year shown">
      <Select value={year} onChange={(event) => onYear(Number(event.target.value))}>
        {[first, first + 1, first + 2].map((each) => (
          <option key={each}>{each}</option>
        ))}
      </Select>
    </Field>
  )
}

function DataNote() {
  return (
    <p className="mt-3 max-w-prose text-sm text-ink-soft">
      Holiday data: the date-holidays package, from Wikipedia articles,{' '}
      <a
        className="text-chalk underline"
        href="https://creativecommons.org/licenses/by-sa/3.0/"
        target="_blank"
        rel="noreferrer"
      >
        CC BY-SA 3.0
      </a>
      . Your government’s list decides.
    </p>
  )
}

/** Public holidays of where the firm works, and those it works all the same. */
export function PublicHolidays({ firm, onChange, issueAt }: FirmSectionProps) {
  const thisYear = Number(useSession().firm.today.slice(0, 4))
  const [year, setYear] = useState(thisYear)
  const { holidayCountry: country, holidayState: state, holidaysWorked: worked } = firm
  const query = useQuery({
    ...holidaysQuery({ country, state, year }),
    placeholderData: keepPreviousData,
  })
  const toggle = (holiday: string) =>
    onChange({
      ...firm,
      holidaysWorked: worked.includes(holiday)
        ? worked.filter((other) => other !== holiday)
        : [...worked, holiday],
    })
  return (
    <Card>
      <h2 className="mb-1 text-lg font-extrabold">Public holidays</h2>
      <p className="mb-3 max-w-prose text-ink-soft">
        Days off of the country and state. A local show day goes under the days the firm is shut.
      </p>
      {query.isError ? (
        <ErrorState
          message={failureText(query.error) ?? 'The holidays did not come.'}
          onRetry={() => void query.refetch()}
        />
      ) : null}
      {query.isPending ? <Skeleton className="h-24" /> : null}
      {query.data ? (
        <>
          <HolidayPlace {...{ firm, onChange, issueAt }} places={query.data}>
            {country === null ? null : <YearSelect first={thisYear} year={year} onYear={setYear} />}
          </HolidayPlace>
          {country === null ? (
            <p className="mt-3 font-semibold text-ochre">
              No country chosen: public holidays count as working days.
            </p>
          ) : (
            <div className="mt-3" aria-busy={query.isPlaceholderData}>
              <HolidayList holidays={query.data.holidays} worked={worked} onToggle={toggle} />
            </div>
          )}
          <DataNote />
        </>
      ) : null}
    </Card>
  )
}
