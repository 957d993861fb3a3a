import { stringify } from 'csv-stringify/sync'
import { formatDayWithYear } from '../../shared/calendar/days.ts'
import type { WeekHours } from '../../shared/day-logs/hours-schemas.ts'
import { decimalHours } from '../../shared/day-logs/hours-sums.ts'

/**
 * A week's hours as a spreadsheet opens it: one person a row, one day a column, hours as decimals. RFC 4180
 * lines with a byte-order mark, so that names keep their accents; a name that begins like a formula is
 * quoted as text.
 */
export function weekHoursCsv({ days, people }: WeekHours): string {
  const rows = people.map(({ name, minutes }) => [
    name,
    ...minutes.map(decimalHours),
    decimalHours(minutes.reduce((total, each) => total + each, 0)),
  ])
  return stringify([['Person', ...days.map(formatDayWithYear), 'Total hours'], ...rows], {
    bom: true,
    escape_formulas: true,
    record_delimiter: 'windows',
  })
}
