import { formatDay, formatDayWithYear, type Day } from '../../../shared/calendar/days.ts'
import type { JobBooking } from '../../../shared/jobs/job-views.ts'

/** 'Thu 4 Dec', its year only when that is not the current one. */
export function dayText(day: Day, today: Day): string {
  return day.slice(0, 4) === today.slice(0, 4) ? formatDay(day) : formatDayWithYear(day)
}

/** A day stays on one line. */
export function unbroken(text: string): string {
  return text.replaceAll(' ', '\u00a0')
}

/** 'Thu 4 Dec' or 'Thu 4 Dec to Mon 8 Dec'. */
export function bookingDaysText({ startsOn, endsOn }: JobBooking, today: Day): string {
  if (startsOn === endsOn) return unbroken(dayText(startsOn, today))
  return `${unbroken(formatDay(startsOn))} to ${unbroken(dayText(endsOn, today))}`
}
