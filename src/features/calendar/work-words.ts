import type { CalendarCrew, UnbookedJob } from '../../../shared/bookings/calendar-schemas.ts'
import { formatHours } from '../../../shared/labour/format-hours.ts'

/** '23 h: 2 days for P, 3 for R'. */
export function workWords(job: UnbookedJob, crews: readonly CalendarCrew[]): string {
  if (job.workMinutes === null) return 'No roof issued yet'
  const parts = crews.flatMap((crew) => {
    const days = job.crewDays.find((c) => c.crewId === crew.id)?.days
    return days ? [`${days} ${days === 1 ? 'day' : 'days'} for ${crew.name}`] : []
  })
  const hours = `${formatHours(job.workMinutes)} of work`
  return parts.length > 0 ? `${hours}: ${parts.join(', ')}` : hours
}
