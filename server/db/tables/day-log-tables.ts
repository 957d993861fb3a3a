import { index, integer, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core'
import { delayReasons } from '../../../shared/day-logs/delay-reasons.ts'
import { bookingDays } from './booking-tables.ts'
import { people } from './people-tables.ts'

/** A day closed by who led it. A day with a log is worked, ticks or none. */
export const dayLogs = sqliteTable(
  'day_logs',
  {
    id: text('id').primaryKey(),
    bookingDayId: text('booking_day_id')
      .notNull()
      .references(() => bookingDays.id),
    /** What was done, in words, beside the ticks. */
    done: text('done').notNull().default(''),
    remarks: text('remarks').notNull().default(''),
    loggedById: text('logged_by_id')
      .notNull()
      .references(() => people.id),
    loggedAt: integer('logged_at', { mode: 'timestamp_ms' }).notNull(),
    version: integer('version').notNull().default(1),
  },
  (t) => [uniqueIndex('day_logs_day').on(t.bookingDayId)],
)

/** Who turned up, and for how long on this job. */
export const dayLogPeople = sqliteTable(
  'day_log_people',
  {
    id: text('id').primaryKey(),
    dayLogId: text('day_log_id')
      .notNull()
      .references(() => dayLogs.id, { onDelete: 'cascade' }),
    personId: text('person_id')
      .notNull()
      .references(() => people.id),
    turnedUp: integer('turned_up', { mode: 'boolean' }).notNull(),
    minutes: integer('minutes').notNull(),
  },
  (t) => [
    uniqueIndex('day_log_people_log').on(t.dayLogId, t.personId),
    index('day_log_people_person').on(t.personId),
  ],
)

/** Hours lost, and to what. */
export const dayLogDelays = sqliteTable(
  'day_log_delays',
  {
    id: text('id').primaryKey(),
    dayLogId: text('day_log_id')
      .notNull()
      .references(() => dayLogs.id, { onDelete: 'cascade' }),
    reason: text('reason', { enum: delayReasons }).notNull(),
    note: text('note').notNull().default(''),
    /** Of all people together. */
    lostMinutes: integer('lost_minutes').notNull(),
  },
  (t) => [index('day_log_delays_log').on(t.dayLogId)],
)
