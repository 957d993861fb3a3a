import { useSearchParams } from 'react-router-dom'
import { daySchema } from '../../../shared/http/fields.ts'
import { type Day, dayPlus, isoWeekday } from '../../../shared/calendar/days.ts'
import { useSession } from '../../lib/session.ts'
import type { Span } from './calendar-queries.ts'

export type CalendarView = 'month' | 'week' | 'crews'

export const weekCounts = [2, 3, 4, 5, 6] as const
const isView = (text: string | null): text is CalendarView =>
  text === 'week' || text === 'month' || text === 'crews'

const mondayOf = (day: Day): Day => dayPlus(day, 1 - isoWeekday(day))
const firstOfMonth = (day: Day): Day => `${day.slice(0, 7)}-01`
const firstOfNextMonth = (day: Day): Day => firstOfMonth(dayPlus(firstOfMonth(day), 31))
const lastOfMonth = (day: Day): Day => dayPlus(firstOfNextMonth(day), -1)

/** The days a view shows: whole weeks, Monday first. */
export function spanOf(view: CalendarView, on: Day, weeks = 2): Span {
  if (view === 'crews') return { from: mondayOf(on), to: dayPlus(mondayOf(on), 7 * weeks - 1) }
  if (view === 'week') return { from: mondayOf(on), to: dayPlus(mondayOf(on), 6) }
  return { from: mondayOf(firstOfMonth(on)), to: dayPlus(mondayOf(lastOfMonth(on)), 6) }
}

/** A day in the view before or after. */
export function stepOf(view: CalendarView, on: Day, direction: -1 | 1): Day {
  if (view !== 'month') return dayPlus(on, 7 * direction)
  return direction === 1 ? firstOfNextMonth(on) : firstOfMonth(dayPlus(firstOfMonth(on), -1))
}

const months = [
  'January',
  'February',
  'March',
  'April',
  'May',
  'June',
  'July',
  'August',
  'September',
  'October',
  'November',
  'December',
]

export function titleOf(view: CalendarView, on: Day, weeks = 2): string {
  const nameOf = (day: Day): string => months[Number(day.slice(5, 7)) - 1] ?? ''
  if (view === 'month') return `${nameOf(on)} ${on.slice(0, 4)}`
  const { from, to } = spanOf(view, on, weeks)
  const first = from.slice(0, 7) === to.slice(0, 7) ? '' : ` ${nameOf(from)}`
  return `${Number(from.slice(8))}${first} to ${Number(to.slice(8))} ${nameOf(to)} ${to.slice(0, 4)}`
}

/** View and day of the calendar, kept in the address. */
export function useCalendarAddress(isNarrow: boolean) {
  const { firm } = useSession()
  const [search, setSearch] = useSearchParams()
  const asked = search.get('on') ?? search.get('day') ?? ''
  const on = daySchema.safeParse(asked).success ? asked : firm.today
  const askedView = search.get('view')
  const view: CalendarView = isView(askedView) ? askedView : isNarrow ? 'week' : 'month'
  const askedWeeks = Number(search.get('weeks'))
  const weeks = weekCounts.find((count) => count === askedWeeks) ?? weekCounts[0]
  const isWall = view === 'crews' && !isNarrow && search.get('wall') === '1'
  const go = (next: { view?: CalendarView; on?: Day; weeks?: number; wall?: boolean }) =>
    setSearch(
      (now) => {
        now.set('view', next.view ?? view)
        now.set('on', next.on ?? on)
        if (next.weeks !== undefined) now.set('weeks', String(next.weeks))
        if (next.wall === true) now.set('wall', '1')
        if (next.wall === false) now.delete('wall')
        return now
      },
      { replace: true },
    )
  return { view, on, weeks, isWall, today: firm.today, span: spanOf(view, on, weeks), go }
}

/** The search part for a link that keeps the calendar as it is, with these added or (null) taken out. */
export function searchWith(
  search: URLSearchParams,
  changes: Record<string, string | null>,
): string {
  const next = new URLSearchParams(search)
  for (const [key, value] of Object.entries(changes)) {
    if (value === null) next.delete(key)
    else next.set(key, value)
  }
  const text = next.toString()
  return text ? `?${text}` : ''
}
