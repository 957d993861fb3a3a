import { and, eq, inArray, sql } from 'drizzle-orm'
import type { DbOrTx } from '../db/client.ts'
import { audit } from '../db/tables/audit-tables.ts'

export type LogHistory = {
  /** When the log that stands, or the last one taken back, was first written; null: by nobody. */
  writtenAt: Date | null
  /** How often a log of the day was written or corrected: no version has been higher. */
  writes: number
}

/** What the audit knows of a day's logs, those taken back too. */
export function readLogHistory(db: DbOrTx, bookingDayId: string): LogHistory {
  const row = db
    .select({
      writtenAt: sql<
        number | null
      >`max(case when ${audit.action} = 'day-log.written' then ${audit.at} end)`,
      writes: sql<number>`count(*)`,
    })
    .from(audit)
    .where(
      and(
        eq(audit.entity, 'booking-day'),
        eq(audit.entityId, bookingDayId),
        inArray(audit.action, ['day-log.written', 'day-log.corrected']),
      ),
    )
    .get()
  const writtenAt = row?.writtenAt ?? null
  return { writtenAt: writtenAt === null ? null : new Date(writtenAt), writes: row?.writes ?? 0 }
}
