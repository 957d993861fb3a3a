import { formatDay } from '../../../shared/calendar/days.ts'
import type { JobBooking } from '../../../shared/jobs/job-views.ts'

/** 'Thu 4 Dec' or 'Thu 4 Dec to Mon 8 Dec'. */
export function bookingDaysText({ startsOn, endsOn }: JobBooking): string {
  if (startsOn === endsOn) return formatDay(startsOn)
  return `${formatDay(startsOn)} to ${formatDay(endsOn)}`
}
