import { index, integer, sqliteTable, text } from 'drizzle-orm/sqlite-core'
import { crews, people } from './people-tables.ts'

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
    /** Each booking moved: its days before, and its version after, so that undoing is refused when it has moved on. */
    moved: text('moved', { mode: 'json' })
      .$type<{ bookingId: string; daysBefore: string[]; versionAfter: number }[]>()
      .notNull()
      .default([]),
    version: integer('version').notNull().default(1),
  },
  (t) => [index('rain_offs_state').on(t.state, t.fromDay), index('rain_offs_crew').on(t.crewId)],
)
