import { formatDay } from '../../shared/calendar/days.ts'
import type { Message, MessageDetail } from '../../shared/messages/message-schemas.ts'
import type { ListMessages, MessageList } from '../../shared/messages/message-schemas.ts'
import type { CurrentUser } from '../auth/current-user.ts'
import type { Db } from '../db/client.ts'
import type { Env } from '../env.ts'
import type { EventHub } from '../events/event-hub.ts'
import { AppError, notFound } from '../http/app-error.ts'
import { writeAudit } from '../lib/audit.ts'
import type { Clock } from '../lib/clock.ts'
import { dayUrl } from '../mail/day-mail.ts'
import { type OutboxRow, updateMail } from '../mail/outbox-store.ts'
import { findMessage, listMessages, personOf } from './message-store.ts'

export type MessageDeps = { db: Db; clock: Clock; events: EventHub; env: Env }

function dayOf(row: OutboxRow): string | null {
  const day = row.payload['day']
  return typeof day === 'string' ? day : null
}

function asMessage(row: OutboxRow): Message {
  return {
    id: row.id,
    kind: row.kind,
    state: row.state,
    toName: row.toName,
    toEmail: row.toEmail,
    subject: row.subject,
    day: dayOf(row),
    attempts: row.attempts,
    lastError: row.lastError,
    createdAt: row.createdAt.toISOString(),
    sentAt: row.sentAt?.toISOString() ?? null,
    nextTryAt: row.state === 'waiting' ? row.notBefore.toISOString() : null,
  }
}

export function createMessageService({ db, clock, events, env }: MessageDeps) {
  const fakeMail = env.smtpUrl === null
  const isTooLate = (row: OutboxRow) => row.notAfter !== null && row.notAfter <= clock.now()

  /** Words for the phone's own messages; a mail with a secret link has none. */
  function textItFor(row: OutboxRow): MessageDetail['textIt'] {
    const person = personOf(db, row)
    const day = dayOf(row)
    if (!person || person.phone === '' || day === null) return null
    const about = row.subject ?? `What is on for ${formatDay(day)}`
    return { phone: person.phone, words: `${about}. ${dayUrl(env.appUrl, person.role, day)}` }
  }

  function asDetail(row: OutboxRow): MessageDetail {
    return {
      ...asMessage(row),
      text: row.text,
      html: row.html,
      mayRetry: row.state === 'failed' && !isTooLate(row),
      textIt: textItFor(row),
      fakeMail,
    }
  }

  function list(filter: ListMessages): MessageList {
    const { rows, nextCursor } = listMessages(db, filter)
    return { messages: rows.map(asMessage), nextCursor, fakeMail }
  }

  function read(id: string): MessageDetail {
    const row = findMessage(db, id)
    if (!row) throw notFound('That message')
    return asDetail(row)
  }

  /** Puts a given-up mail back in line. Asked twice, it stays in line once. */
  function retry(user: CurrentUser, id: string): MessageDetail {
    const now = clock.now()
    db.transaction((tx) => {
      const row = findMessage(tx, id)
      if (!row) throw notFound('That message')
      if (row.state === 'waiting' || row.state === 'sending') return
      if (row.state !== 'failed')
        throw new AppError('conflict', 'Only a message that failed can be tried again.')
      if (isTooLate(row))
        throw new AppError('conflict', 'It is too late for this one. Call or text them.')
      updateMail(tx, id, { state: 'waiting', attempts: 0, notBefore: now, lastError: null })
      writeAudit(tx, {
        at: now,
        personId: user.id,
        action: 'message tried again',
        entity: 'message',
        entityId: id,
      })
    })
    events.publish({ topic: 'messages' })
    return read(id)
  }

  return { list, read, retry }
}
