import { integer, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core'
import { jobs } from './job-tables.ts'
import { people } from './people-tables.ts'

/** Work beyond the price: why, for how much, and the builder's yes. */
export const variations = sqliteTable(
  'variations',
  {
    id: text('id').primaryKey(),
    jobId: text('job_id')
      .notNull()
      .references(() => jobs.id, { onDelete: 'cascade' }),
    /** 1, 2, 3 … within the job; spoken as V1, V2. */
    sequence: integer('sequence').notNull(),
    reason: text('reason').notNull(),
    /** Below 0 for work left out; null while it is not priced. */
    priceCents: integer('price_cents'),
    askedOn: text('asked_on'),
    /** The builder's yes: the day, and who gave it. */
    agreedOn: text('agreed_on'),
    agreedBy: text('agreed_by').notNull().default(''),
    /** Taken back, by the office or the builder's no. */
    withdrawnOn: text('withdrawn_on'),
    createdById: text('created_by_id')
      .notNull()
      .references(() => people.id),
    createdAt: integer('created_at', { mode: 'timestamp_ms' }).notNull(),
    version: integer('version').notNull().default(1),
  },
  (t) => [uniqueIndex('variations_job').on(t.jobId, t.sequence)],
)
