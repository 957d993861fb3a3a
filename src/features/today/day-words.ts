import { daysBetween, formatDay } from '../../../shared/calendar/days.ts'

const nearWords = new Map([
  [-1, 'Yesterday'],
  [0, 'Today'],
  [1, 'Tomorrow'],
])

/** 'Today, Thu 4 Dec', 'Mon 8 Dec'. */
export function dayTitle(day: string, today: string): string {
  const near = nearWords.get(daysBetween(today, day))
  return near ? `${near}, ${formatDay(day)}` : formatDay(day)
}
