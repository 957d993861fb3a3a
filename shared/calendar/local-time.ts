import { TZDate } from '@date-fns/tz'
import type { Day } from './days.ts'

/** The firm's calendar day at an instant. */
export function localDayOf(instant: Date, timeZone: string): Day {
  const local = new TZDate(instant, timeZone)
  const month = String(local.getMonth() + 1).padStart(2, '0')
  return `${local.getFullYear()}-${month}-${String(local.getDate()).padStart(2, '0')}`
}

/** 'HH:MM' at an instant. */
export function localTimeOf(instant: Date, timeZone: string): string {
  const local = new TZDate(instant, timeZone)
  return `${String(local.getHours()).padStart(2, '0')}:${String(local.getMinutes()).padStart(2, '0')}`
}

/** The instant at which the clock of `timeZone` shows `time` ('HH:MM') on `day`. */
export function instantAt(day: Day, time: string, timeZone: string): Date {
  const [year = 1970, month = 1, date = 1] = day.split('-').map(Number)
  const [hours = 0, minutes = 0] = time.split(':').map(Number)
  return new Date(new TZDate(year, month - 1, date, hours, minutes, 0, timeZone).getTime())
}

export function isTimeZone(name: string): boolean {
  try {
    new Intl.DateTimeFormat('en-AU', { timeZone: name })
    return true
  } catch {
    return false
  }
}
