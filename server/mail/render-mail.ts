import { eq } from 'drizzle-orm'
import { z } from 'zod'
import { daySchema } from '../../shared/http/fields.ts'
import { mailNotNeeded } from '../../shared/messages/message-words.ts'
import { invitationHours, issuePasswordToken, resetHours } from '../auth/password-links.ts'
import type { DbOrTx } from '../db/client.ts'
import { people } from '../db/tables/people-tables.ts'
import { readFirm } from '../firm/firm-store.ts'
import { dayChanges } from './day-changes.ts'
import { readDayMail } from './day-mail.ts'
import { noticeDays } from './notice-days.ts'
import type { OutboxRow } from './outbox-store.ts'
import {
  type AccountMailInput,
  invitationMail,
  passwordResetMail,
} from './templates/account-mails.ts'
import { changeNoticeMail } from './templates/change-notice.ts'
import { reminderMail } from './templates/crew-reminder.ts'
import { type MailDocument, mailHtml, mailText } from './templates/mail-document.ts'
import { type ToldDay, toldDayOf, type ToldPerson } from './told-day.ts'
import { readDifferencesOf } from './told-differences.ts'

export type MailText = { subject: string; text: string; html: string }

export type RenderedMail = {
  /** The person's name and address as they are now: a mended address reaches what still waits. */
  to: { toName: string; toEmail: string }
  send: MailText
  /** As sent, with secret links left out. */
  keep: MailText
  /** What the person then knows, of which days. */
  told: ToldToPerson[]
}

export type ToldToPerson = { day: string; content: ToldDay; isReminder: boolean }

export type Rendering = RenderedMail | { dropped: string }

const dayPayloadSchema = z.object({ day: daySchema })

function textOf(document: MailDocument): MailText {
  return { subject: document.subject, text: mailText(document), html: mailHtml(document) }
}

function receiver(person: ToldPerson): RenderedMail['to'] {
  return { toName: person.name, toEmail: person.email }
}

function accountMail(
  db: DbOrTx,
  person: ToldPerson,
  from: { appUrl: string; now: Date; hours: number },
  template: (input: AccountMailInput) => MailDocument,
): RenderedMail {
  const token = issuePasswordToken(db, person.id, from.now, from.hours)
  const about = { personName: person.name, firmName: readFirm(db).name, hours: from.hours }
  const url = `${from.appUrl}/set-password?token=${token}`
  return {
    to: receiver(person),
    send: textOf(template({ ...about, url })),
    keep: textOf(template({ ...about, url: null })),
    told: [],
  }
}

type From = { appUrl: string; now: Date }

function dayReminder(db: DbOrTx, row: OutboxRow, person: ToldPerson, from: From): Rendering {
  const { day } = dayPayloadSchema.parse(row.payload)
  const firm = readFirm(db)
  const told = toldDayOf(db, firm, person.id, day)
  const mail = readDayMail(db, { ...from, firm, person, day, told })
  if (mail.bookings.length === 0) return { dropped: mailNotNeeded }
  const text = textOf(reminderMail(mail))
  return {
    to: receiver(person),
    send: text,
    keep: text,
    told: [{ day, content: told, isReminder: true }],
  }
}

/** The net change of a person's days as it is now; what came back since it was asked for is left out. */
function changeNotice(db: DbOrTx, row: OutboxRow, person: ToldPerson, from: From): Rendering {
  const days = noticeDays(row.payload)
  const firm = readFirm(db)
  const changed = readDifferencesOf(db, firm, { personId: person.id, days, now: from.now })
    .map((one) => ({ ...one, changes: dayChanges(db, person.id, one.day, one.before, one.after) }))
    .filter(({ changes }) => changes.length > 0)
  if (changed.length === 0) return { dropped: mailNotNeeded }
  const text = textOf(
    changeNoticeMail(
      changed.map(({ day, after, changes, row: toldRow }) => ({
        mail: readDayMail(db, { ...from, firm, person, day, told: after }),
        changes,
        isNew: toldRow === null,
        isReminded: toldRow?.reminded === true,
      })),
    ),
  )
  return {
    to: receiver(person),
    send: text,
    keep: text,
    told: changed.map(({ day, after }) => ({ day, content: after, isReminder: false })),
  }
}

/** Writes a mail's text from the rows as they are now. Makes secret links, so runs in a transaction. */
export function renderMail(
  db: DbOrTx,
  row: OutboxRow,
  from: { appUrl: string; now: Date },
): Rendering {
  const person = row.personId
    ? db.select().from(people).where(eq(people.id, row.personId)).get()
    : undefined
  if (!person?.active) return { dropped: mailNotNeeded }
  switch (row.kind) {
    case 'password-reset':
      return accountMail(db, person, { ...from, hours: resetHours }, passwordResetMail)
    case 'invitation':
      return accountMail(db, person, { ...from, hours: invitationHours }, invitationMail)
    case 'crew-reminder':
      return dayReminder(db, row, person, from)
    case 'change-notice':
      return changeNotice(db, row, person, from)
  }
}
