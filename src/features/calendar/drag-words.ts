import type { Calendar } from '../../../shared/bookings/calendar-schemas.ts'
import { nameOf } from './booking-steps.ts'
import { daysInWords, type Landing } from './drag-plan.ts'
import type { DragData } from './use-crew-weeks-drag.ts'

/** 'Bevel crew, Thu 3 Dec to Tue 8 Dec, 3 days. Nothing in the way.' */
export function landingWords(calendar: Calendar, landing: Landing): string {
  const crew = calendar.crews.find((one) => one.id === landing.crewId)?.name ?? ''
  const where = `${crew}, ${daysInWords(landing.days)}.`
  if (landing.isIdle) return `${where} Where it is now.`
  if (landing.clashes.length === 0) return `${where} Nothing in the way.`
  return `${where} ${landing.clashes.map((clash) => clash.text).join(' ')}`
}

export const dragWords = {
  taken: (data: DragData): string =>
    data.kind === 'job'
      ? `${data.job.number} ${data.job.title} is in hand. Arrows carry it to a crew and day, Space books it there, Escape puts it back.`
      : `${nameOf(data.bar.booking)} is in hand. Left and right carry it to other days, up and down to another crew, Space puts it down, Escape puts it back.`,
  instructions: {
    draggable:
      'Space takes it in hand; arrows then carry it to other days and crews, Space puts it down, Escape puts it back. Enter shows what else can be done.',
  },
}
