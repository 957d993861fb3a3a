import { and, eq, sql } from 'drizzle-orm'
import type { Db, DbOrTx } from '../db/client.ts'
import { people } from '../db/tables/people-tables.ts'
import { AppError, invalidField } from '../http/app-error.ts'
import { writeAudit } from '../lib/audit.ts'
import type { Clock } from '../lib/clock.ts'
import { newId } from '../lib/ids.ts'
import { enqueueMail } from '../mail/outbox-store.ts'
import { dropPasswordLinks, isPasswordTokenGood, spendPasswordToken } from './password-links.ts'
import { createDecoy, hashPassword, verifyPassword } from './passwords.ts'

export type SignedInPerson = { id: string; sessionEpoch: number }
export type AuthService = ReturnType<typeof createAuthService>

const wrongSignIn = 'That e-mail address and password do not go together.'

function hashOf(db: DbOrTx, personId: string): string | null {
  const columns = { passwordHash: people.passwordHash }
  const row = db.select(columns).from(people).where(eq(people.id, personId)).get()
  return row?.passwordHash ?? null
}

/** Sets the hash, ends every session of the person and every link sent before. */
function setPassword(
  tx: DbOrTx,
  input: { personId: string; passwordHash: string; action: string; now: Date },
): SignedInPerson {
  const { personId, passwordHash, action, now } = input
  const person = tx
    .update(people)
    .set({ passwordHash, sessionEpoch: sql`${people.sessionEpoch} + 1` })
    .where(and(eq(people.id, personId), eq(people.active, true)))
    .returning({ id: people.id, sessionEpoch: people.sessionEpoch })
    .get() as SignedInPerson | undefined
  if (!person) throw new AppError('not_found', 'That account is no longer open. Ask the office.')
  dropPasswordLinks(tx, personId)
  writeAudit(tx, { at: now, personId, action, entity: 'person', entityId: personId })
  return person
}

export function createAuthService({ db, clock }: { db: Db; clock: Clock }) {
  const decoy = createDecoy()
  const activeByEmail = (email: string) =>
    db
      .select()
      .from(people)
      .where(and(eq(people.email, email), eq(people.active, true)))
      .get()

  /** Same answer, and the same work, for an unknown address and a wrong password. */
  async function signIn(email: string, password: string): Promise<SignedInPerson> {
    const person = activeByEmail(email)
    const right = person?.passwordHash
      ? await verifyPassword(person.passwordHash, password)
      : await decoy.verify(password)
    if (!person || !right) throw new AppError('unauthenticated', wrongSignIn)
    return { id: person.id, sessionEpoch: person.sessionEpoch }
  }

  /** Answers alike whether the address is known or not. */
  function askReset(email: string): void {
    const now = clock.now()
    const person = activeByEmail(email)
    db.transaction((tx) => {
      writeAudit(tx, {
        at: now,
        personId: person?.id ?? null,
        action: 'reset asked',
        entity: 'person',
        entityId: person?.id ?? '',
      })
      if (!person) return
      enqueueMail(tx, {
        key: `password-reset:${newId()}`,
        kind: 'password-reset',
        personId: person.id,
        toName: person.name,
        toEmail: person.email,
        payload: {},
        now,
      })
    })
  }

  async function useReset(token: string, password: string): Promise<SignedInPerson> {
    const spentOrOld = () =>
      invalidField('token', 'That link has been used or is too old. Ask for a new one.')
    // A guess must not cost the work of a hash.
    if (!isPasswordTokenGood(db, token, clock.now())) throw spentOrOld()
    const passwordHash = await hashPassword(password)
    const now = clock.now()
    return db.transaction((tx) => {
      const personId = spendPasswordToken(tx, token, now)
      if (!personId) throw spentOrOld()
      return setPassword(tx, { personId, passwordHash, action: 'password set by link', now })
    })
  }

  async function changePassword(
    personId: string,
    current: string,
    next: string,
  ): Promise<SignedInPerson> {
    const wrongNow = () => invalidField('current', 'That is not the password you have now.')
    const known = hashOf(db, personId)
    if (known === null || !(await verifyPassword(known, current))) throw wrongNow()
    const passwordHash = await hashPassword(next)
    const now = clock.now()
    return db.transaction((tx) => {
      // A reset meanwhile stands: what was checked is the password no longer.
      if (hashOf(tx, personId) !== known) throw wrongNow()
      return setPassword(tx, { personId, passwordHash, action: 'password changed', now })
    })
  }

  return { signIn, askReset, useReset, changePassword }
}
