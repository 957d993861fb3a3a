import { and, asc, eq, inArray, lte } from 'drizzle-orm'
import type { DbOrTx } from '../db/client.ts'
import { outbox } from '../db/tables/mail-tables.ts'
import { newId } from '../lib/ids.ts'

export type OutboxRow = typeof outbox.$inferSelect
export type MailKind = OutboxRow['kind']

export type MailToSend = {
  /** Once-only: a second mail with the same key is not made. */
  key: string
  kind: MailKind
  personId: string | null
  toName: string
  toEmail: string
  /** What the renderer needs besides the rows it reads itself; never a secret. */
  payload: Record<string, unknown>
  now: Date
  notBefore?: Date
  notAfter?: Date | null
}

/** Puts a mail in the outbox, in the caller's transaction. False when its key was there already. */
export function enqueueMail(db: DbOrTx, mail: MailToSend): boolean {
  const { now, notBefore, notAfter, ...rest } = mail
  const result = db
    .insert(outbox)
    .values({
      ...rest,
      id: newId(),
      state: 'waiting',
      notBefore: notBefore ?? now,
      notAfter: notAfter ?? null,
      createdAt: now,
    })
    .onConflictDoNothing({ target: outbox.key })
    .run()
  return result.changes === 1
}

/**
 * As `enqueueMail`, and a mail of this key that was dropped as not needed waits again: a day booked, taken
 * off and booked once more still has its reminder. `evenFailed`: one that was given up waits again too. True when a mail now waits that did not before.
 */
export function enqueueOrRevive(
  db: DbOrTx,
  mail: MailToSend,
  { evenFailed = false }: { evenFailed?: boolean } = {},
): boolean {
  if (enqueueMail(db, mail)) return true
  const notAfter = mail.notAfter ?? null
  const revivable: OutboxRow['state'][] = evenFailed ? ['dropped', 'failed'] : ['dropped']
  const revived = db
    .update(outbox)
    .set({ state: 'waiting', attempts: 0, notBefore: mail.now, notAfter, lastError: null })
    .where(and(eq(outbox.key, mail.key), inArray(outbox.state, revivable)))
    .run()
  if (revived.changes === 1) return true
  db.update(outbox)
    .set({ notAfter })
    .where(and(eq(outbox.key, mail.key), eq(outbox.state, 'waiting')))
    .run()
  return false
}

/** What was in flight when the last process died waits again, marked. */
export function recoverInFlight(db: DbOrTx, now: Date): number {
  return db
    .update(outbox)
    .set({ state: 'waiting', inFlightBefore: true, notBefore: now })
    .where(eq(outbox.state, 'sending'))
    .run().changes
}

/** Mails not worth sending any more. */
export function dropLate(db: DbOrTx, now: Date, reason: string): number {
  return db
    .update(outbox)
    .set({ state: 'dropped', lastError: reason })
    .where(and(eq(outbox.state, 'waiting'), lte(outbox.notAfter, now)))
    .run().changes
}

/** The mail that has been due longest, or undefined. */
export function nextDue(db: DbOrTx, now: Date): OutboxRow | undefined {
  return db
    .select()
    .from(outbox)
    .where(and(eq(outbox.state, 'waiting'), lte(outbox.notBefore, now)))
    .orderBy(asc(outbox.notBefore), asc(outbox.createdAt), asc(outbox.id))
    .limit(1)
    .get()
}

export function updateMail(
  db: DbOrTx,
  id: string,
  change: Partial<typeof outbox.$inferInsert>,
): void {
  db.update(outbox).set(change).where(eq(outbox.id, id)).run()
}
