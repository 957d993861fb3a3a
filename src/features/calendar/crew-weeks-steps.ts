import type { Calendar, CalendarBooking } from '../../../shared/bookings/calendar-schemas.ts'
import { pulledDays, splitDays, swappedPlaces } from '../../../shared/bookings/booking-places.ts'
import { movedDays } from '../../../shared/bookings/move-days.ts'
import { type Day, dayPlus, formatDay } from '../../../shared/calendar/days.ts'
import { previousWorkedDay, workedDaysFrom } from '../../../shared/calendar/working-days.ts'
import { type BookingStep, nameOf, partOf, stepOf } from './booking-steps.ts'
import { daysInWords, type Drag, type Landing, placeOf } from './drag-plan.ts'

/** The step that a drop makes. */
export function stepOfDrop(calendar: Calendar, drag: Drag, landing: Landing): BookingStep {
  const { crewId, days } = landing
  const crewName = calendar.crews.find((crew) => crew.id === crewId)?.name ?? 'the crew'
  if (drag.kind === 'job') return bookJob(drag.job, { crewId, crewName, days })
  const { booking } = drag.bar
  if (drag.kind === 'pull') return lengthStep(booking, days)
  return placeStep(calendar, booking, { crewId, days, first: landing.move?.to ?? days[0] ?? '' })
}

const lengthStep = (booking: CalendarBooking, days: Day[]): BookingStep =>
  stepOf(`${nameOf(booking)} is now ${daysInWords(days)}`, partOf(booking, { days }))

function placeStep(
  calendar: Calendar,
  booking: CalendarBooking,
  put: { crewId: string; days: Day[]; first: Day },
): BookingStep {
  const { crewId, days, first } = put
  const crew = calendar.crews.find((one) => one.id === crewId)
  const to = crewId === booking.crew.id || !crew ? '' : ` and to ${crew.name}`
  return stepOf(
    `${nameOf(booking)} moved to ${formatDay(first)}${to}`,
    partOf(booking, { crewId, days }),
  )
}

/** The day `from` and those after it go to `to`, to another crew when it is one. */
export function moveStep(
  calendar: Calendar,
  booking: CalendarBooking,
  move: { from: Day; to: Day; crewId?: string },
): BookingStep {
  const { days: before, worked } = placeOf(booking)
  const days = movedDays(calendar, before, worked, move)
  const crewId = move.crewId ?? booking.crew.id
  const step = placeStep(calendar, booking, { crewId, days, first: move.to })
  const { from, to } = move
  return { ...step, parts: step.parts.map((part) => ({ ...part, move: { from, to } })) }
}

/** One end of a run a working day further out or in; null when nothing of it would be left. */
export function pullStep(
  calendar: Calendar,
  booking: CalendarBooking,
  stretch: readonly Day[],
  pull: { end: 'first' | 'last'; by: 1 | -1 },
): BookingStep | null {
  const { end, by } = pull
  const [first, last] = [stretch[0], stretch[stretch.length - 1]]
  if (first === undefined || last === undefined) return null
  const outside =
    end === 'last'
      ? workedDaysFrom(calendar, dayPlus(last, 1), 1)[0]
      : previousWorkedDay(calendar, first)
  const inside = end === 'last' ? stretch[stretch.length - 2] : stretch[1]
  const to = by === 1 ? outside : inside
  if (!to) return null
  const place = placeOf(booking)
  const days = pulledDays(calendar, place, { stretch, end, to })
  return days.join() === place.days.join() ? null : lengthStep(booking, days)
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

/** When just one booking is in the way of a move: the two could change places. */
export function swapInsteadOf(
  calendar: Calendar,
  drag: Drag,
  landing: Landing,
): { label: string; step: BookingStep } | undefined {
  if (drag.kind !== 'move') return undefined
  const { booking } = drag.bar
  const inTheWay = calendar.bookings.filter(
    (other) =>
      other.id !== booking.id &&
      other.crew.id === landing.crewId &&
      other.allDays.some((day) => landing.days.includes(day)),
  )
  const [other] = inTheWay
  if (!other || inTheWay.length > 1) return undefined
  const step = swapStep(calendar, booking, other)
  return step ? { label: `Change places with ${other.job.number}`, step } : undefined
}
