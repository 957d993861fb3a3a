import { type SQL, sql } from 'drizzle-orm'

// Names in full, as text: over one table alone Drizzle writes its columns without their table.

/** Somebody has closed the day. Over a row of `booking_days`. */
export const isLoggedDay: SQL<boolean> = sql<boolean>`exists (
  select 1 from day_logs where day_logs.booking_day_id = booking_days.id)`

/** A day is worked once it has a tick, be it one taken back, or a log. Over a row of `booking_days`. */
export const isWorkedDay: SQL<boolean> = sql<boolean>`(exists (
  select 1 from tasks join ticks on ticks.task_id = tasks.id
  where tasks.booking_day_id = booking_days.id) or ${isLoggedDay})`
