import { index, integer, sqliteTable, text } from 'drizzle-orm/sqlite-core'

/** Who changed what, for the office. Never holds a secret. */
export const audit = sqliteTable(
  'audit',
  {
    id: integer('id').primaryKey({ autoIncrement: true }),
    at: integer('at', { mode: 'timestamp_ms' }).notNull(),
    personId: text('person_id'),
    action: text('action').notNull(),
    entity: text('entity').notNull(),
    entityId: text('entity_id').notNull(),
    detail: text('detail', { mode: 'json' }).$type<Record<string, unknown>>().notNull(),
  },
  (t) => [index('audit_entity').on(t.entity, t.entityId), index('audit_at').on(t.at)],
)
