import { and, asc, eq, gt, gte, isNull, lt } from 'drizzle-orm'
import type { SignInLink } from '../../shared/people/people-schemas.ts'
import type { DbOrTx } from '../db/client.ts'
import { outbox } from '../db/tables/mail-tables.ts'
import { passwordResets } from '../db/tables/people-tables.ts'

/** Keys of invitations in the outbox: `invitation:<id>`. */
export const invitationKeys = { from: 'invitation:', before: 'invitation;' }

const noLink: SignInLink = { state: 'none', sentAt: null, worksUntil: null }

/** How the latest invitation of each person stands, from its mail and the link that went with it. */
export function readSignInLinks(db: DbOrTx, now: Date): (personId: string) => SignInLink {
  const mails = db
    .select({ personId: outbox.personId, state: outbox.state, sentAt: outbox.sentAt })
    .from(outbox)
    .where(
      and(
        gte(outbox.key, invitationKeys.from),
        lt(outbox.key, invitationKeys.before),
        eq(outbox.kind, 'invitation'),
      ),
    )
    .orderBy(asc(outbox.createdAt), asc(outbox.id))
    .all()
  const latest = new Map(mails.map((mail) => [mail.personId, mail]))
  const links = db
    .select({ personId: passwordResets.personId, expiresAt: passwordResets.expiresAt })
    .from(passwordResets)
    .where(and(isNull(passwordResets.usedAt), gt(passwordResets.expiresAt, now)))
    .all()
  const goodUntil = new Map(links.map((link) => [link.personId, link.expiresAt]))
  return (personId) => {
    const mail = latest.get(personId)
    if (!mail) return noLink
    const sentAt = mail.sentAt?.toISOString() ?? null
    const until = goodUntil.get(personId)?.toISOString() ?? null
    if (mail.state === 'waiting' || mail.state === 'sending') return { ...noLink, state: 'waiting' }
    if (mail.state === 'failed' || mail.state === 'dropped') return { ...noLink, state: 'failed' }
    return { state: until === null ? 'ended' : 'works', sentAt, worksUntil: until }
  }
}
