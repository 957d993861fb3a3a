import { formatDay } from '../../../shared/calendar/days.ts'
import type { WeekHours } from '../../../shared/day-logs/hours-schemas.ts'
import { decimalHours } from '../../../shared/day-logs/hours-sums.ts'

const totalOf = (minutes: readonly number[]) => minutes.reduce((total, each) => total + each, 0)
const shown = (minutes: number) => (minutes === 0 ? '–' : decimalHours(minutes))

type PersonHours = WeekHours['people'][number]

/** A phone has no room for seven columns: a person a card, worked days only. */
function PersonCard({ person, days }: { person: PersonHours; days: string[] }) {
  return (
    <li className="rounded-md border border-rule bg-sheet p-3">
      <p className="flex justify-between gap-4 font-extrabold">
        <span className="min-w-0 [overflow-wrap:anywhere]">{person.name}</span>
        <span className="tabular-nums">{decimalHours(totalOf(person.minutes))} h</span>
      </p>
      <ul>
        {days.map((day, i) =>
          person.minutes[i] ? (
            <li key={day} className="flex justify-between gap-4">
              <span>{formatDay(day)}</span>
              <span className="tabular-nums">{decimalHours(person.minutes[i])} h</span>
            </li>
          ) : null,
        )}
      </ul>
    </li>
  )
}

/** A person a row, a day a column, hours as decimals. */
export function WeekTable({ hours }: { hours: WeekHours }) {
  const { days, people } = hours
  const withHours = people.filter((person) => totalOf(person.minutes) > 0)
  const without = people.filter((person) => totalOf(person.minutes) === 0)
  const cell = 'border-t border-rule px-3 py-2 text-right tabular-nums'
  return (
    <>
      <ul className="space-y-3 sm:hidden">
        {withHours.map((person) => (
          <PersonCard key={person.personId} person={person} days={days} />
        ))}
        {without.length > 0 ? (
          <li className="text-ink-soft">No hours: {without.map(({ name }) => name).join(', ')}.</li>
        ) : null}
      </ul>
      <div className="hidden rounded-md border border-rule bg-sheet sm:block">
        <table className="w-full border-collapse">
          <caption className="sr-only">Hours of each person and day</caption>
          <thead>
            <tr className="text-ink-soft">
              <th className="px-3 py-2 text-left font-semibold">Person</th>
              {days.map((day) => (
                <th
                  key={day}
                  className={`px-3 py-2 text-right font-semibold ${day === hours.today ? 'text-clay' : ''}`}
                >
                  {formatDay(day)}
                </th>
              ))}
              <th className="px-3 py-2 text-right font-semibold">Hours</th>
            </tr>
          </thead>
          <tbody>
            {people.map((person) => (
              <tr key={person.personId}>
                <th scope="row" className="border-t border-rule px-3 py-2 text-left font-semibold">
                  {person.name}
                </th>
                {days.map((day, i) => (
                  <td key={day} className={cell}>
                    {shown(person.minutes[i] ?? 0)}
                  </td>
                ))}
                <td className={`${cell} font-extrabold`}>{shown(totalOf(person.minutes))}</td>
              </tr>
            ))}
          </tbody>
          <tfoot className="font-extrabold">
            <tr>
              <th scope="row" className="border-t-2 border-rule px-3 py-2 text-left">
                Together
              </th>
              {days.map((day, i) => (
                <td key={day} className={`${cell} border-t-2`}>
                  {shown(totalOf(people.map((person) => person.minutes[i] ?? 0)))}
                </td>
              ))}
              <td className={`${cell} border-t-2`}>
                {shown(totalOf(people.flatMap((person) => person.minutes)))}
              </td>
            </tr>
          </tfoot>
        </table>
      </div>
    </>
  )
}
