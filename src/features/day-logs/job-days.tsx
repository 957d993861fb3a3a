import type { ReactNode } from 'react'
import { Link } from 'react-router-dom'
import { formatDay } from '../../../shared/calendar/days.ts'
import { loggedMinutes, lostMinutes } from '../../../shared/day-logs/day-log-rules.ts'
import { delayReasonNames } from '../../../shared/day-logs/delay-words.ts'
import type { JobDayHours, JobHours } from '../../../shared/day-logs/hours-schemas.ts'
import { hoursSum } from '../../../shared/day-logs/hours-sums.ts'
import { formatHours } from '../../../shared/labour/format-hours.ts'
import { CrewPennant } from '../../drawings/crew-pennant.tsx'

const cell = 'sm:border-t sm:border-rule sm:px-3 sm:py-2 align-top'
const number = `${cell} tabular-nums sm:text-right`

/** A cell that says its column itself where the table stands as cards. */
function Hours({ name, children }: { name: string; children: ReactNode }) {
  return (
    <td className={`${number} flex justify-between sm:table-cell`}>
      <span className="text-ink-soft sm:hidden">{name}</span>
      <span>{children}</span>
    </td>
  )
}

function delayWords({ log }: JobDayHours): string {
  return (log?.delays ?? [])
    .map(({ reason, note }) => [delayReasonNames[reason], note].filter(Boolean).join(', '))
    .join('; ')
}

function whoWords({ log }: JobDayHours): string {
  return (log?.people ?? [])
    .filter((person) => person.turnedUp)
    .map(({ name, minutes }) => `${name} ${formatHours(minutes)}`)
    .join(', ')
}

function DayRow({ row, today }: { row: JobDayHours; today: string }) {
  const { day, crew, log } = row
  const words = [whoWords(row), delayWords(row), log?.done, log?.remarks].filter(Boolean)
  const isAhead = day > today
  return (
    <tr className="block border-t border-rule py-2 sm:table-row sm:border-0 sm:py-0">
      <th scope="row" className={`${cell} block text-left font-semibold sm:table-cell`}>
        <span className="flex flex-wrap items-center gap-x-3 gap-y-1 whitespace-nowrap">
          <CrewPennant letter={crew.letter} colour={crew.colour} name={crew.name} />
          {isAhead ? (
            formatDay(day)
          ) : (
            <Link to={`/today/close/${row.bookingDayId}`} className="text-chalk underline">
              {formatDay(day)}
            </Link>
          )}
        </span>
      </th>
      <Hours name="Planned">{formatHours(row.plannedMinutes)}</Hours>
      <Hours name="Of it ticked">{isAhead ? '–' : formatHours(row.doneMinutes)}</Hours>
      <Hours name="Logged">{log ? formatHours(loggedMinutes(log)) : '–'}</Hours>
      <Hours name="Of it lost">{log ? formatHours(lostMinutes(log)) : '–'}</Hours>
      <td className={`${cell} block text-sm sm:table-cell [overflow-wrap:anywhere]`}>
        {log ? words.join('. ') : isAhead ? 'Ahead' : 'Not closed'}
      </td>
    </tr>
  )
}

/** Day by day: planned, ticked, logged, lost; cards on a phone. */
export function JobDays({ hours }: { hours: JobHours }) {
  const sum = hoursSum(hours.days)
  return (
    <section className="rounded-md border border-rule bg-sheet p-4 sm:p-0">
      <table className="block w-full border-collapse sm:table">
        <caption className="sr-only">Hours of each day</caption>
        <thead className="hidden sm:table-header-group">
          <tr className="text-left text-ink-soft">
            <th className="px-3 py-2 font-semibold">Day</th>
            {['Planned', 'Of it ticked', 'Logged', 'Of it lost'].map((name) => (
              <th key={name} className="px-3 py-2 text-right font-semibold">
                {name}
              </th>
            ))}
            <th className="w-2/5 px-3 py-2 font-semibold">Who and what</th>
          </tr>
        </thead>
        <tbody className="block sm:table-row-group">
          {hours.days.map((row) => (
            <DayRow key={row.bookingDayId} row={row} today={hours.today} />
          ))}
        </tbody>
        <tfoot className="hidden font-extrabold sm:table-footer-group">
          <tr>
            <th scope="row" className={`${cell} border-t-2 text-left`}>
              Together
            </th>
            <td className={number} />
            <td className={number} />
            <td className={number}>{formatHours(sum.loggedMinutes)}</td>
            <td className={number}>{formatHours(sum.lostMinutes)}</td>
            <td className={cell}>
              {sum.closedDays} of {hours.days.length} days closed
            </td>
          </tr>
        </tfoot>
      </table>
    </section>
  )
}
