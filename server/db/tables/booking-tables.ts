import { index, integer, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core'
import { jobs, roofRevisions } from './job-tables.ts'
import { crews, people } from './people-tables.ts'

export const bookings = sqliteTable(
  'bookings',
  {
    id: text('id').primaryKey(),
    jobId: text('job_id')
      .notNull()
      .references(() => jobs.id),
    crewId: text('crew_id')
      .notNull()
      .references(() => crews.id),
    state: text('state', { enum: ['pencilled', 'firm'] }).notNull(),
    /** 'HH:MM' local; the firm's start where null. */
    startAt: text('start_at'),
    gear: text('gear').notNull().default(''),
    /** Why two bookings of one crew share a day, when the office meant it. */
    clashReason: text('clash_reason'),
    /** For calendar files: never changes / rises on a real change. */
    uid: text('uid').notNull(),
    sequence: integer('sequence').notNull().default(0),
    /** Minutes of the job's work that no booked day has room for, on the job's last booking; set by replan. */
    shortMinutes: integer('short_minutes').notNull().default(0),
    version: integer('version').notNull().default(1),
    cancelledAt: integer('cancelled_at', { mode: 'timestamp_ms' }),
    createdAt: integer('created_at', { mode: 'timestamp_ms' }).notNull(),
    updatedAt: integer('updated_at', { mode: 'timestamp_ms' }).notNull(),
  },
  (t) => [
    index('bookings_job').on(t.jobId),
    index('bookings_crew').on(t.crewId),
    uniqueIndex('bookings_uid').on(t.uid),
  ],
)

/** One working day of a booking; local calendar day of the firm. */
export const bookingDays = sqliteTable(
  'booking_days',
  {
    id: text('id').primaryKey(),
    bookingId: text('booking_id')
      .notNull()
      .references(() => bookings.id, { onDelete: 'cascade' }),
    day: text('day').notNull(),
    /** What that day is cut to; null while the job has no issued roof. */
    revisionId: text('revision_id').references(() => roofRevisions.id),
  },
  (t) => [
    uniqueIndex('booking_days_day').on(t.bookingId, t.day),
    index('booking_days_by_day').on(t.day),
  ],
)

/** A line of the cut list to cut, or to stand, on one day; or setting out, bracing and the like (mark null). */
export const tasks = sqliteTable(
  'tasks',
  {
    id: text('id').primaryKey(),
    bookingDayId: text('booking_day_id')
      .notNull()
      .references(() => bookingDays.id, { onDelete: 'cascade' }),
    /** Place in the day's order. */
    position: integer('position').notNull(),
    /** Package of the building order it belongs to; see shared/labour. */
    packageKey: text('package_key').notNull(),
    work: text('work', { enum: ['set-out', 'cut', 'stand'] }).notNull(),
    /** Cut line mark in the day's revision; null for set-out work. */
    cutLineMark: text('cut_line_mark'),
    /** Member marks of this share of the line. */
    memberMarks: text('member_marks', { mode: 'json' }).$type<string[]>().notNull(),
    title: text('title').notNull(),
    quantity: integer('quantity').notNull(),
    plannedMinutes: integer('planned_minutes').notNull(),
    assignedToId: text('assigned_to_id').references(() => people.id),
    /** First piece tried before the rest are cut. */
    firstPieceAt: integer('first_piece_at', { mode: 'timestamp_ms' }),
    firstPieceById: text('first_piece_by_id').references(() => people.id),
    handRaisedAt: integer('hand_raised_at', { mode: 'timestamp_ms' }),
    version: integer('version').notNull().default(1),
  },
  (t) => [
    index('tasks_day').on(t.bookingDayId, t.position),
    index('tasks_assigned').on(t.assignedToId),
  ],
)

/** One piece done (+1) or taken back (−1); the count is their sum. The id is made on the device. */
export const ticks = sqliteTable(
  'ticks',
  {
    id: text('id').primaryKey(),
    taskId: text('task_id')
      .notNull()
      .references(() => tasks.id),
    personId: text('person_id')
      .notNull()
      .references(() => people.id),
    delta: integer('delta').notNull(),
    at: integer('at', { mode: 'timestamp_ms' }).notNull(),
  },
  (t) => [index('ticks_task').on(t.taskId)],
)
