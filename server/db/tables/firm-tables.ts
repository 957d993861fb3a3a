import { integer, real, sqliteTable, text } from 'drizzle-orm/sqlite-core'
import type { Closure } from '../../../shared/calendar/closures.ts'
import type { LabourRates } from '../../../shared/labour/labour-rates.ts'
import type { RoofSettings } from '../../../shared/roof/roof-types.ts'

/** One row (id 1): the contractor this installation serves. */
export const firm = sqliteTable('firm', {
  id: integer('id').primaryKey(),
  name: text('name').notNull(),
  phone: text('phone').notNull(),
  timeZone: text('time_zone').notNull(),
  /** Local hour of the working day before at which reminders go: 'HH:MM'. */
  reminderAt: text('reminder_at').notNull(),
  /** How long a change settles before its notice goes out. */
  changeHoldMinutes: integer('change_hold_minutes').notNull(),
  startAt: text('start_at').notNull(),
  hoursPerDay: real('hours_per_day').notNull(),
  /** Ordinary hours Monday to Sunday where they differ from day to day; null: `hoursPerDay` on each working weekday. */
  weekHours: text('week_hours', { mode: 'json' }).$type<number[]>(),
  /** ISO weekdays worked, 1 = Monday. */
  workingWeekdays: text('working_weekdays', { mode: 'json' }).$type<number[]>().notNull(),
  /** The firm's own; public holidays come to them in `readFirm`. */
  closedDays: text('closed_days', { mode: 'json' }).$type<Closure[]>().notNull(),
  /** ISO 3166 country and its state, whose public holidays are not worked; null: none are looked up. */
  holidayCountry: text('holiday_country'),
  holidayState: text('holiday_state'),
  /** Public holidays the firm works all the same. */
  holidaysWorked: text('holidays_worked', { mode: 'json' }).$type<string[]>().notNull().default([]),
  /** Added to an overhang measured from brickwork to get it from frame. */
  brickOffsetMm: real('brick_offset_mm').notNull(),
  lengthUnits: text('length_units', { enum: ['mm', 'feet-inches'] }).notNull(),
  roofSettings: text('roof_settings', { mode: 'json' }).$type<RoofSettings>().notNull(),
  labourRates: text('labour_rates', { mode: 'json' }).$type<LabourRates>().notNull(),
  version: integer('version').notNull().default(1),
})
