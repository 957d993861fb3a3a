import { type Day, formatDay } from '../calendar/days.ts'

/** 'Thu 3 Dec', 'Thu 3 Dec and Fri 4 Dec', 'Thu 3 Dec to Wed 9 Dec (5 days)'; the days in order. */
export function daysInWords(days: readonly Day[]): string {
  const first = days[0] ?? ''
  const last = days[days.length - 1] ?? ''
  if (days.length < 2) return first && formatDay(first)
  if (days.length === 2) return `${formatDay(first)} and ${formatDay(last)}`
  return `${formatDay(first)} to ${formatDay(last)} (${days.length} days)`
}
