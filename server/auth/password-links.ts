import { and, eq, gt, isNull } from 'drizzle-orm'
import type { DbOrTx } from '../db/client.ts'
import { passwordResets } from '../db/tables/people-tables.ts'
import { newId } from '../lib/ids.ts'
import { hashToken, newToken } from './passwords.ts'

const msPerHour = 3_600_000
export const resetHours = 2
export const invitationHours = 7 * 24

/**
 * Makes a link's token for a person; only its hash is kept, and earlier unused links stop working.
 * Called when the mail is rendered, so that the token exists nowhere but in that mail.
 */
export function issuePasswordToken(db: DbOrTx, personId: string, now: Date, hours: number): string {
  const token = newToken()
  dropPasswordLinks(db, personId)
  db.insert(passwordResets)
    .values({
      id: newId(),
      personId,
      tokenHash: hashToken(token),
      expiresAt: new Date(now.getTime() + hours * msPerHour),
    })
    .run()
  return token
}

/** Links not used yet stop working: they were for another address, or for access that has ended. */
export function dropPasswordLinks(db: DbOrTx, personId: string): void {
  db.delete(passwordResets)
    .where(and(eq(passwordResets.personId, personId), isNull(passwordResets.usedAt)))
    .run()
}

const worksAt = (token: string, now: Date) =>
  and(
    eq(passwordResets.tokenHash, hashToken(token)),
    isNull(passwordResets.usedAt),
    gt(passwordResets.expiresAt, now),
  )

export function isPasswordTokenGood(db: DbOrTx, token: string, now: Date): boolean {
  const found = db
    .select({ id: passwordResets.id })
    .from(passwordResets)
    .where(worksAt(token, now))
    .get()
  return found !== undefined
}

/** Spends a token; null when it is unknown, used or too old. */
export function spendPasswordToken(db: DbOrTx, token: string, now: Date): string | null {
  const spent = db
    .update(passwordResets)
    .set({ usedAt: now })
    .where(worksAt(token, now))
    .returning({ personId: passwordResets.personId })
    .get()
  return spent?.personId ?? null
}
