import { index, integer, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core'
import { milestoneKinds, milestoneStates } from '../../../shared/milestones/milestone-kinds.ts'
import { jobs } from './job-tables.ts'

/** One row a kind that has been given a day, a bringer or a state. */
export const milestones = sqliteTable(
  'milestones',
  {
    id: text('id').primaryKey(),
    jobId: text('job_id')
      .notNull()
      .references(() => jobs.id, { onDelete: 'cascade' }),
    kind: text('kind', { enum: milestoneKinds }).notNull(),
    /** The day it is to be there, or was; null while nobody has said. */
    day: text('day'),
    state: text('state', { enum: milestoneStates }).notNull(),
    /** Who is to bring it. */
    broughtBy: text('brought_by').notNull().default(''),
    note: text('note').notNull().default(''),
    updatedAt: integer('updated_at', { mode: 'timestamp_ms' }).notNull(),
    version: integer('version').notNull().default(1),
  },
  (t) => [uniqueIndex('milestones_job').on(t.jobId, t.kind), index('milestones_day').on(t.day)],
)
