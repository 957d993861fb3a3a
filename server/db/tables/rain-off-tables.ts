import { index, integer, sqliteTable, text } from 'drizzle-orm/sqlite-core'
import { crews, people } from './people-tables.ts'

/** One booking that a rain-off moved, with all that undoing needs to put it back as it was. */
export type MovedBooking = {
  bookingId: string
  daysBefore: string[]
  daysAfter: string[]
  /** Its version once moved: undoing is refused when it has moved on. */
  versionAfter: number
  clashReasonBefore: string | null
  /** Bookings that stayed and had a day with it before: meeting them again is no new clash. */
  metBefore: string[]
  /** Who had which task of its job on days not worked; of two bookings of one job the first holds them. */
  tasksHeld: HeldTask[]
}

/** Who had a task of a booking day, by the task's line. */
export type HeldTask = {
  bookingDayId: string
  packageKey: string
  work: string
  cutLineMark: string | null
  personId: string
}

/** A crew's days from one day on moved by working days; asked for on site, or made by the office. */
export const rainOffs = sqliteTable(
  'rain_offs',
  {
    id: text('id').primaryKey(),
    crewId: text('crew_id')
      .notNull()
      .references(() => crews.id),
    fromDay: text('from_day').notNull(),
    workingDays: integer('working_days').notNull(),
    reason: text('reason').notNull().default(''),
    /** asked → made or declined; made → undone. */
    state: text('state', { enum: ['asked', 'made', 'declined', 'undone'] }).notNull(),
    askedById: text('asked_by_id').references(() => people.id),
    askedAt: integer('asked_at', { mode: 'timestamp_ms' }),
    /** Who made, declined or undid it last, and when it was made. */
    settledById: text('settled_by_id').references(() => people.id),
    settledAt: integer('settled_at', { mode: 'timestamp_ms' }),
    moved: text('moved', { mode: 'json' }).$type<MovedBooking[]>().notNull().default([]),
    version: integer('version').notNull().default(1),
  },
  (t) => [index('rain_offs_state').on(t.state, t.fromDay), index('rain_offs_crew').on(t.crewId)],
)
