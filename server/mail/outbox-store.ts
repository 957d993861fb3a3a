import type { DbOrTx } from '../db/client.ts'
import { outbox } from '../db/tables/mail-tables.ts'
import { newId } from '../lib/ids.ts'

export type MailKind = (typeof outbox.$inferInsert)['kind']

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
