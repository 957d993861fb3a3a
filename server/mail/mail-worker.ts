import { sql } from 'drizzle-orm'
import type { Logger } from 'pino'
import { mailTooLate } from '../../shared/messages/message-words.ts'
import type { Db, DbOrTx } from '../db/client.ts'
import { toldDays } from '../db/tables/mail-tables.ts'
import type { EventHub } from '../events/event-hub.ts'
import type { Clock } from '../lib/clock.ts'
import { newId } from '../lib/ids.ts'
import { backOffMs, mostAttempts } from './back-off.ts'
import { scheduleChangeNotices } from './change-notices.ts'
import { dropLate, nextDue, type OutboxRow, recoverInFlight, updateMail } from './outbox-store.ts'
import { scheduleReminders } from './reminders.ts'
import { type RenderedMail, renderMail, type ToldToPerson } from './render-mail.ts'
import { toldHash } from './told-day.ts'
import type { MailTransport } from './transport.ts'

export type MailWorkerDeps = {
  db: Db
  clock: Clock
  transport: MailTransport
  appUrl: string
  mailFrom: string
  log: Logger
  events: EventHub
}

export type MailWorker = {
  /** Schedules what is due and sends it, one mail after the other; calls wait for each other. */
  runOnce(): Promise<void>
  start(): void
  /** No new mail is begun; resolves when the one in flight is done. */
  stop(): Promise<void>
}

const runEveryMs = 3_000
const longestErrorText = 300

type Claim = { row: OutboxRow; rendered: RenderedMail }

/** Nothing else may see a mail as in flight until its text is written, and the two land together. */
function claimNext(deps: MailWorkerDeps): Claim | 'again' | null {
  const now = deps.clock.now()
  const row = nextDue(deps.db, now)
  if (!row) return null
  try {
    return deps.db.transaction((tx): Claim | 'again' => {
      const rendered = renderMail(tx, row, { appUrl: deps.appUrl, now })
      if ('dropped' in rendered) {
        updateMail(tx, row.id, { state: 'dropped', lastError: rendered.dropped })
        return 'again'
      }
      updateMail(tx, row.id, {
        ...rendered.to,
        state: 'sending',
        attempts: row.attempts + 1,
        subject: rendered.keep.subject,
        text: rendered.keep.text,
        html: rendered.keep.html,
      })
      return { row: { ...row, ...rendered.to, attempts: row.attempts + 1 }, rendered }
    })
  } catch (error) {
    deps.log.error({ mail: row.id, kind: row.kind, err: error }, 'mail could not be written')
    const tried = { ...row, attempts: row.attempts + 1 }
    markFailed(deps, tried, 'The text could not be written. The log says why.', false)
    return 'again'
  }
}

function rememberTold(tx: DbOrTx, row: OutboxRow, told: RenderedMail['told'], now: Date): void {
  const { personId } = row
  if (personId === null) return
  for (const one of told) rememberDay(tx, personId, one, now)
}

function rememberDay(tx: DbOrTx, personId: string, told: ToldToPerson, now: Date): void {
  const { day, content, isReminder } = told
  const known = { contentHash: toldHash(content), content, toldAt: now }
  const settled = { pendingHash: null, pendingSince: null }
  tx.insert(toldDays)
    .values({
      id: newId(),
      personId,
      day,
      ...known,
      notices: isReminder ? 0 : 1,
      reminded: isReminder,
    })
    .onConflictDoUpdate({
      target: [toldDays.personId, toldDays.day],
      set: {
        ...known,
        ...settled,
        notices: sql`${toldDays.notices} + ${isReminder ? 0 : 1}`,
        ...(isReminder ? { reminded: true } : {}),
      },
    })
    .run()
}

function markSent(deps: MailWorkerDeps, { row, rendered }: Claim): void {
  const now = deps.clock.now()
  deps.db.transaction((tx) => {
    updateMail(tx, row.id, {
      state: row.inFlightBefore ? 'maybe-twice' : 'sent',
      sentAt: now,
      lastError: null,
    })
    rememberTold(tx, row, rendered.told, now)
  })
}

function markFailed(
  deps: MailWorkerDeps,
  row: OutboxRow,
  lastError: string,
  maybeTaken: boolean,
): void {
  const spent = row.attempts >= mostAttempts
  updateMail(deps.db, row.id, {
    state: spent ? 'failed' : 'waiting',
    attempts: row.attempts,
    notBefore: new Date(deps.clock.now().getTime() + backOffMs(row.attempts)),
    lastError,
    inFlightBefore: row.inFlightBefore || maybeTaken,
  })
}

type SmtpError = { command?: unknown; responseCode?: unknown }

/** The line broke after the text was handed over and before the server answered: it may have been taken. */
function mayHaveBeenTaken(error: unknown): boolean {
  const { command, responseCode } = (error ?? {}) as SmtpError
  return command === 'DATA' && responseCode === undefined
}

/** For the office; a link in the mail is no business of an error text. */
function errorText(error: unknown, sent: RenderedMail['send']): string {
  const text = error instanceof Error ? error.message : String(error)
  const secrets = sent.text.match(/token=[\w-]+/g) ?? []
  return secrets
    .reduce((kept, secret) => kept.replaceAll(secret, 'token=[left out]'), text)
    .slice(0, longestErrorText)
}

async function deliver(deps: MailWorkerDeps, claim: Claim): Promise<void> {
  const { row, rendered } = claim
  const domain = /@([^\s>]+)/.exec(deps.mailFrom)?.[1] ?? 'ridgehand.example'
  try {
    await deps.transport.sendMail({
      // The same at every try, so that a mail program can see a second copy for what it is.
      messageId: `<${row.id}@${domain}>`,
      from: deps.mailFrom,
      to: { name: row.toName, address: row.toEmail },
      ...rendered.send,
      headers: { 'Auto-Submitted': 'auto-generated' },
    })
  } catch (error) {
    const text = errorText(error, rendered.send)
    deps.log.warn(
      { mail: row.id, kind: row.kind, attempts: row.attempts, why: text },
      'mail not taken',
    )
    markFailed(deps, row, text, mayHaveBeenTaken(error))
    return
  }
  markSent(deps, claim)
}

/** Reminders and notices that have come due, and what has become too late. */
function schedule(deps: MailWorkerDeps): number {
  const now = deps.clock.now()
  return deps.db.transaction(
    (tx) =>
      scheduleReminders(tx, now) + scheduleChangeNotices(tx, now) + dropLate(tx, now, mailTooLate),
  )
}

/**
 * Sends the outbox, one mail at a time. Promise: a crash loses no mail and repeats at most the one in flight.
 * 'sending' is committed before a mail leaves and 'sent' after it was taken; what a dead process left at
 * 'sending' goes once more and ends as 'maybe-twice'. One worker a database.
 */
export function createMailWorker(deps: MailWorkerDeps): MailWorker {
  let recovered = false
  let stopping = false
  let timer: NodeJS.Timeout | null = null
  let running: Promise<void> = Promise.resolve()
  let waiting = 0

  async function run(): Promise<void> {
    if (!recovered) {
      const count = recoverInFlight(deps.db, deps.clock.now())
      if (count > 0) deps.log.warn({ count }, 'mail was in flight when the last process ended')
      recovered = true
    }
    let changed = schedule(deps) > 0
    while (!stopping) {
      const claim = claimNext(deps)
      if (claim === null) break
      changed = true
      if (claim !== 'again') await deliver(deps, claim)
    }
    if (changed) deps.events.publish({ topic: 'messages' })
  }

  function runOnce(): Promise<void> {
    waiting += 1
    const next = running.then(run).finally(() => {
      waiting -= 1
    })
    running = next.catch(() => undefined)
    return next
  }

  function tick(): void {
    if (waiting > 0 || stopping) return
    runOnce().catch((error: unknown) => deps.log.error({ err: error }, 'mail run failed'))
  }

  return {
    runOnce,
    start() {
      if (timer) return
      timer = setInterval(tick, runEveryMs)
      tick()
    },
    async stop() {
      stopping = true
      if (timer) clearInterval(timer)
      timer = null
      await running
      deps.transport.close()
    },
  }
}
