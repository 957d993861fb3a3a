import type { CalendarBooking } from '../../../shared/bookings/calendar-schemas.ts'

/** A booking's days as they were: what was settled on purpose then is settled again. */
export const daysBackTo = (before: Pick<CalendarBooking, 'allDays' | 'clashReason'>) => ({
  days: before.allDays,
  evenIfNotWorked: true,
  ...(before.clashReason === null ? {} : { clashReason: before.clashReason }),
})
