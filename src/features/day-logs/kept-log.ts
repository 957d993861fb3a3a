import { z } from 'zod'
import type { WriteDayLog } from '../../../shared/day-logs/day-log-schemas.ts'
import { delayReasons } from '../../../shared/day-logs/delay-reasons.ts'

/** Looser than what is sent: half a delay is kept as well. */
const keptSchema = z.object({
  version: z.number(),
  day: z.string().optional(),
  done: z.string(),
  remarks: z.string(),
  people: z.array(z.object({ personId: z.string(), turnedUp: z.boolean(), minutes: z.number() })),
  delays: z.array(
    z.object({ reason: z.enum(delayReasons), note: z.string(), lostMinutes: z.number() }),
  ),
})

const keyOf = (userId: string, bookingDayId: string) => `ridgehand.log.${userId}.${bookingDayId}`

/** What was put down and has not reached the office stays on this device, through a reload or a dead phone. */
export function keepLog(userId: string, bookingDayId: string, log: WriteDayLog | null): void {
  try {
    if (log === null) window.localStorage.removeItem(keyOf(userId, bookingDayId))
    else window.localStorage.setItem(keyOf(userId, bookingDayId), JSON.stringify(log))
  } catch {
    // Storage may be shut off or full; the form on screen still holds everything.
  }
}

export function readKeptLog(userId: string, bookingDayId: string): WriteDayLog | null {
  try {
    const text = window.localStorage.getItem(keyOf(userId, bookingDayId))
    const parsed = keptSchema.safeParse(text === null ? null : JSON.parse(text))
    return parsed.success ? parsed.data : null
  } catch {
    return null
  }
}
