import { type Day, formatDay, formatDayWithYear } from '../calendar/days.ts'
import type { LeaveSpan } from './leave-days.ts'
import type { LeaveKind } from './leave-kinds.ts'

export const leaveKindNames: Record<LeaveKind, string> = {
  leave: 'Leave',
  sick: 'Sick',
  'trade-school': 'Trade school',
  other: 'Away',
}

export const weekdayNames = ['Mon', 'Tue', 'Wed', 'Thu', 'Fri', 'Sat', 'Sun'] as const

const listFormat = new Intl.ListFormat('en-AU', { type: 'conjunction' })

/** 'Thu 4 Dec' in the year of `today`, else with its year. */
export function dayNear(day: Day, today: Day): string {
  return day.slice(0, 4) === today.slice(0, 4) ? formatDay(day) : formatDayWithYear(day)
}

/** 'Thu 4 Dec', 'Thu 4 Dec to Fri 5 Dec', 'each Wed, Wed 4 Feb to Wed 25 Nov'. */
export function leaveSpanText({ startsOn, endsOn, weekdays }: LeaveSpan, today: Day): string {
  const first = dayNear(startsOn, today)
  const span = startsOn === endsOn ? first : `${first} to ${dayNear(endsOn, today)}`
  if (weekdays === null) return span
  const names = weekdays.flatMap((weekday) => weekdayNames[weekday - 1] ?? [])
  return `each ${listFormat.format(names)}, ${span}`
}
