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

/** Whole hours and quarters: 495 → '8¼ h'. */
export function hoursWords(minutes: number): string {
  const quarters = Math.round(minutes / 15)
  const hours = Math.floor(quarters / 4)
  const fraction = ['', '¼', '½', '¾'][quarters % 4] ?? ''
  return `${hours > 0 || fraction === '' ? hours : ''}${fraction} h`
}
