import type { Calendar, CalendarBooking } from '../../../shared/bookings/calendar-schemas.ts'
import { splitDays, swappedPlaces } from '../../../shared/bookings/booking-places.ts'
import { type Day, formatDay } from '../../../shared/calendar/days.ts'
import { type BookingStep, nameOf, partOf, stepOf } from './booking-steps.ts'
import { daysInWords, type Drag, type Landing, placeOf } from './drag-plan.ts'

/** The step that a drop makes. */
export function stepOfDrop(calendar: Calendar, drag: Drag, landing: Landing): BookingStep {
  const { crewId, days } = landing
  const crewName = calendar.crews.find((crew) => crew.id === crewId)?.name ?? 'the crew'
  if (drag.kind === 'job') return bookJob(drag.job, { crewId, crewName, days })
  const { booking } = drag.bar
  if (drag.kind === 'pull')
    return stepOf(`${nameOf(booking)} is now ${daysInWords(days)}`, partOf(booking, { days }))
  const to = crewId === booking.crew.id ? '' : ` and to ${crewName}`
  const first = landing.move?.to ?? days[0] ?? ''
  return stepOf(
    `${nameOf(booking)} moved to ${formatDay(first)}${to}`,
    partOf(booking, { crewId, days }),
  )
}

function bookJob(
  job: { id: string; number: string; title: string },
  put: { crewId: string; crewName: string; days: Day[] },
): BookingStep {
  const id = crypto.randomUUID()
  const side = {
    crewId: put.crewId,
    days: put.days,
    state: 'pencilled' as const,
    clashReason: null,
  }
  return stepOf(
    `${job.number} ${job.title} pencilled in for ${put.crewName}, ${daysInWords(put.days)}`,
    {
      id,
      name: `${job.number} ${job.title}`,
      version: 1,
      before: { ...side, cancelled: true },
      after: { ...side, cancelled: false },
      create: {
        clientId: id,
        jobId: job.id,
        crewId: put.crewId,
        days: put.days,
        state: 'pencilled',
      },
    },
  )
}

/** The part from `day` on becomes a booking of its own. */
export function splitStep(booking: CalendarBooking, day: Day): BookingStep | null {
  const parts = splitDays(placeOf(booking), day)
  if (!parts) return null
  const [first, second] = parts
  const id = crypto.randomUUID()
  const { state, clashReason } = booking
  const crewId = booking.crew.id
  const side = { crewId, days: second, state, clashReason }
  return stepOf(`${nameOf(booking)} split at ${formatDay(day)}`, partOf(booking, { days: first }), {
    id,
    name: nameOf(booking),
    version: 1,
    before: { ...side, cancelled: true },
    after: { ...side, cancelled: false },
    create: {
      clientId: id,
      jobId: booking.job.id,
      crewId,
      days: second,
      state,
      startAt: booking.startAt,
      evenIfNotWorked: true,
      ...(clashReason === null ? {} : { clashReason }),
    },
  })
}

export function swapStep(
  calendar: Calendar,
  a: CalendarBooking,
  b: CalendarBooking,
): BookingStep | null {
  const places = swappedPlaces(calendar, placeOf(a), placeOf(b))
  if (!places) return null
  return stepOf(
    `${nameOf(a)} and ${nameOf(b)} changed places`,
    partOf(a, places[0]),
    partOf(b, places[1]),
  )
}

export function stateStep(booking: CalendarBooking): BookingStep {
  const state = booking.state === 'firm' ? 'pencilled' : 'firm'
  const words = state === 'firm' ? 'is firm now' : 'is only pencilled in now'
  return stepOf(`${nameOf(booking)} ${words}`, partOf(booking, { state }))
}
