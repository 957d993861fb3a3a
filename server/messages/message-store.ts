import { and, desc, eq, lt, or, type SQL, sql } from 'drizzle-orm'
import type { ListMessages } from '../../shared/messages/message-schemas.ts'
import { messagesPageSize } from '../../shared/messages/message-schemas.ts'
import type { DbOrTx } from '../db/client.ts'
import { outbox } from '../db/tables/mail-tables.ts'
import { people } from '../db/tables/people-tables.ts'
import type { OutboxRow } from '../mail/outbox-store.ts'

/** Newest first; the id settles those of one instant. */
function afterCursor(cursor: string): SQL | undefined {
  const [at = '0', id = ''] = cursor.split('.')
  const createdAt = new Date(Number(at))
  return or(
    lt(outbox.createdAt, createdAt),
    and(eq(outbox.createdAt, createdAt), lt(outbox.id, id)),
  )
}

function matching(words: string): SQL | undefined {
  const pattern = `%${words.replaceAll(/[\\%_]/g, (sign) => `\\${sign}`)}%`
  const within = (column: typeof outbox.toName | typeof outbox.toEmail | typeof outbox.subject) =>
    sql`${column} like ${pattern} escape '\\'`
  return or(within(outbox.toName), within(outbox.toEmail), within(outbox.subject))
}

export function cursorOf(row: OutboxRow): string {
  return `${row.createdAt.getTime()}.${row.id}`
}

/** One page, and whether another follows. */
export function listMessages(
  db: DbOrTx,
  filter: ListMessages,
): { rows: OutboxRow[]; nextCursor: string | null } {
  const found = db
    .select()
    .from(outbox)
    .where(
      and(
        filter.state ? eq(outbox.state, filter.state) : undefined,
        filter.kind ? eq(outbox.kind, filter.kind) : undefined,
        filter.q ? matching(filter.q) : undefined,
        filter.cursor ? afterCursor(filter.cursor) : undefined,
      ),
    )
    .orderBy(desc(outbox.createdAt), desc(outbox.id))
    .limit(messagesPageSize + 1)
    .all()
  const rows = found.slice(0, messagesPageSize)
  const last = rows[rows.length - 1]
  return { rows, nextCursor: found.length > rows.length && last ? cursorOf(last) : null }
}

export function findMessage(db: DbOrTx, id: string): OutboxRow | undefined {
  return db.select().from(outbox).where(eq(outbox.id, id)).get()
}

export function personOf(db: DbOrTx, row: OutboxRow): typeof people.$inferSelect | undefined {
  if (row.personId === null) return undefined
  return db.select().from(people).where(eq(people.id, row.personId)).get()
}
