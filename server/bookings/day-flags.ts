import type { DayFlag } from '../../shared/bookings/calendar-schemas.ts'
import { type WorkingCalendar, whyNotWorked } from '../../shared/calendar/working-days.ts'
import type { CrewDay } from './crew-hours.ts'
import type { CrewDayRow, DayRow } from './calendar-store.ts'

const jobName = (row: { jobNumber: string; jobTitle: string }): string =>
  `${row.jobNumber} ${row.jobTitle}`

/** Why both are booked is the office's own note. */
function twiceFlag(row: DayRow, others: readonly CrewDayRow[], isOffice: boolean): DayFlag[] {
  if (others.length === 0) return []
  const names = others.map(jobName).join(' and ')
  const reason =
    row.booking.clashReason ?? others.find((other) => other.clashReason !== null)?.clashReason
  return reason
    ? [
        {
          code: 'crew-twice-on-purpose',
          weight: 'caution',
          text: `${row.crew.name} is also on ${names}, on purpose${isOffice ? `: ${reason}` : '.'}`,
          wayOut: 'Move one of them when that no longer holds.',
        },
      ]
    : [
        {
          code: 'crew-twice',
          weight: 'clash',
          text: `${row.crew.name} is also on ${names}.`,
          wayOut: 'Move one of them or give it to another crew.',
        },
      ]
}

function peopleFlags(row: DayRow, crewDay: CrewDay): DayFlag[] {
  if (crewDay.thereIds.length === 0)
    return [
      {
        code: 'nobody-there',
        weight: 'clash',
        text: `Nobody of ${row.crew.name} is there that day.`,
        wayOut: 'Put people in the crew for that day or give the day to another crew.',
      },
    ]
  if (crewDay.away.length === 0) return []
  return [
    {
      code: 'on-leave',
      weight: 'caution',
      text: `On leave: ${crewDay.away.join(', ')}.`,
      wayOut: 'The hours are counted without them. Add a person or a day.',
    },
  ]
}

/** What the office should know of one booked day, the worst first. */
export function dayFlags(
  row: DayRow,
  input: {
    calendar: WorkingCalendar
    crewDay: CrewDay
    others: readonly CrewDayRow[]
    isOffice: boolean
  },
): DayFlag[] {
  const closed = whyNotWorked(input.calendar, row.day)
  const flags: DayFlag[] = [
    ...twiceFlag(row, input.others, input.isOffice),
    ...peopleFlags(row, input.crewDay),
    ...(closed
      ? [
          {
            code: 'day-not-worked' as const,
            weight: 'caution' as const,
            text: `${closed}.`,
            wayOut: 'Move the day to a working day unless the crew has agreed to it.',
          },
        ]
      : []),
    ...(row.revisionLetter === null
      ? [
          {
            code: 'no-roof' as const,
            weight: 'caution' as const,
            text: 'No roof issued yet.',
            wayOut: input.isOffice
              ? 'Issue the roof, and the days fill themselves.'
              : 'The office has yet to issue the roof.',
          },
        ]
      : []),
  ]
  return flags.sort((a, b) => Number(b.weight === 'clash') - Number(a.weight === 'clash'))
}
