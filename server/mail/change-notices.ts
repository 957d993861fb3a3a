import { eq, gte } from 'drizzle-orm'
import { localDayOf } from '../../shared/calendar/local-time.ts'
import type { DbOrTx } from '../db/client.ts'
import { toldDays } from '../db/tables/mail-tables.ts'
import { people } from '../db/tables/people-tables.ts'
import { type Firm, readFirm } from '../firm/firm-store.ts'
import { enqueueOrRevive } from './outbox-store.ts'
import { startsOf, type ToldDay, toldDayOf, toldDaySchema, toldHash } from './told-day.ts'

export type ToldRow = typeof toldDays.$inferSelect

const minuteMs = 60_000

/** Until when word of a change is of use: the later of the start told and the start now. */
function noticeUntil(firm: Firm, row: ToldRow, now: ToldDay): Date | null {
  const told = toldDaySchema.parse(row.content)
  const lasts = [told, now].flatMap((day) => startsOf(day, row.day, firm.timeZone)?.last ?? [])
  if (lasts.length === 0) return null
  return new Date(Math.max(...lasts.map((last) => last.getTime())))
}

function setPending(db: DbOrTx, row: ToldRow, hash: string | null, since: Date | null): void {
  if (row.pendingHash === hash) return
  db.update(toldDays)
    .set({ pendingHash: hash, pendingSince: since })
    .where(eq(toldDays.id, row.id))
    .run()
}

function enqueueNotice(db: DbOrTx, row: ToldRow, notAfter: Date, now: Date): boolean {
  const person = db.select().from(people).where(eq(people.id, row.personId)).get()
  if (!person?.active || person.email === '') return false
  return enqueueOrRevive(db, {
    key: `change:${row.personId}:${row.day}:${row.notices + 1}`,
    kind: 'change-notice',
    personId: row.personId,
    toName: person.name,
    toEmail: person.email,
    payload: { day: row.day },
    now,
    notAfter,
  })
}

function followRow(db: DbOrTx, firm: Firm, row: ToldRow, now: Date): boolean {
  const current = toldDayOf(db, firm, row.personId, row.day)
  const hash = toldHash(current)
  if (hash === row.contentHash) {
    setPending(db, row, null, null)
    return false
  }
  const until = noticeUntil(firm, row, current)
  if (until === null || until <= now) return false
  if (hash !== row.pendingHash || row.pendingSince === null) {
    setPending(db, row, hash, now)
    if (firm.changeHoldMinutes > 0) return false
  } else if (now.getTime() - row.pendingSince.getTime() < firm.changeHoldMinutes * minuteMs) {
    return false
  }
  return enqueueNotice(db, row, until, now)
}

/**
 * Looks at every day somebody was told of and has not started: what differs settles for the firm's hold, then
 * one notice with the net change waits in the outbox; what came back to what was told makes none.
 */
export function scheduleChangeNotices(db: DbOrTx, now: Date): number {
  const firm = readFirm(db)
  const today = localDayOf(now, firm.timeZone)
  const rows = db.select().from(toldDays).where(gte(toldDays.day, today)).all()
  return rows.filter((row) => followRow(db, firm, row, now)).length
}
