/** A local calendar day of the firm: 'YYYY-MM-DD'. Days are text; only instants are dates. */
export type Day = string

const msPerDay = 86_400_000

function utcOf(day: Day): number {
  return Date.parse(`${day}T00:00:00Z`)
}

/** The day `count` days after (before when negative). */
export function dayPlus(day: Day, count: number): Day {
  return new Date(utcOf(day) + count * msPerDay).toISOString().slice(0, 10)
}

/** Days from a to b; negative when b is before a. */
export function daysBetween(a: Day, b: Day): number {
  return Math.round((utcOf(b) - utcOf(a)) / msPerDay)
}

/** 1 = Monday … 7 = Sunday. */
export function isoWeekday(day: Day): number {
  return new Date(utcOf(day)).getUTCDay() || 7
}

const weekdayNames = ['Mon', 'Tue', 'Wed', 'Thu', 'Fri', 'Sat', 'Sun'] as const
const monthNames = [
  'Jan',
  'Feb',
  'Mar',
  'Apr',
  'May',
  'Jun',
  'Jul',
  'Aug',
  'Sep',
  'Oct',
  'Nov',
  'Dec',
] as const

/** 'Thu 4 Dec'. */
export function formatDay(day: Day): string {
  const [, month = 1, date = 1] = day.split('-').map(Number)
  return `${weekdayNames[isoWeekday(day) - 1]} ${date} ${monthNames[month - 1]}`
}

/** 'Thu 4 Dec 2026'. */
export function formatDayWithYear(day: Day): string {
  return `${formatDay(day)} ${day.slice(0, 4)}`
}
