import { index, integer, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core'
import { people } from './people-tables.ts'

/**
 * Every mail there is: written in the transaction that caused it, sent by the worker.
 * `key` makes it once-only ('reminder:<person>:<day>').
 */
export const outbox = sqliteTable(
  'outbox',
  {
    id: text('id').primaryKey(),
    key: text('key').notNull(),
    kind: text('kind', {
      enum: ['crew-reminder', 'change-notice', 'password-reset', 'invitation'],
    }).notNull(),
    personId: text('person_id').references(() => people.id),
    toName: text('to_name').notNull(),
    toEmail: text('to_email').notNull(),
    /** What the renderer needs; the text itself is made when it is sent. Never a secret. */
    payload: text('payload', { mode: 'json' }).$type<Record<string, unknown>>().notNull(),
    /**
     * waiting → sending → sent; waiting again after a failure until tries run out → failed;
     * 'maybe-twice' was in flight when the process died and has been sent again.
     */
    state: text('state', {
      enum: ['waiting', 'sending', 'sent', 'maybe-twice', 'failed', 'dropped'],
    }).notNull(),
    attempts: integer('attempts').notNull().default(0),
    inFlightBefore: integer('in_flight_before', { mode: 'boolean' }).notNull().default(false),
    notBefore: integer('not_before', { mode: 'timestamp_ms' }).notNull(),
    /** Not worth sending after this (a reminder once work has started). */
    notAfter: integer('not_after', { mode: 'timestamp_ms' }),
    lastError: text('last_error'),
    /** As sent; with anything secret in it left out. */
    subject: text('subject'),
    text: text('text'),
    html: text('html'),
    createdAt: integer('created_at', { mode: 'timestamp_ms' }).notNull(),
    sentAt: integer('sent_at', { mode: 'timestamp_ms' }),
  },
  (t) => [
    uniqueIndex('outbox_key').on(t.key),
    index('outbox_due').on(t.state, t.notBefore),
    index('outbox_created').on(t.createdAt),
  ],
)

/** What a person was last told about a day, so that a change after that is told once. */
export const toldDays = sqliteTable(
  'told_days',
  {
    id: text('id').primaryKey(),
    personId: text('person_id')
      .notNull()
      .references(() => people.id),
    day: text('day').notNull(),
    /** Of what the mail says; a differing one means the day changed. */
    contentHash: text('content_hash').notNull(),
    /** The last words, to say what changed. */
    content: text('content', { mode: 'json' }).$type<unknown>().notNull(),
    toldAt: integer('told_at', { mode: 'timestamp_ms' }).notNull(),
    /** A change seen but still settling. */
    pendingHash: text('pending_hash'),
    pendingSince: integer('pending_since', { mode: 'timestamp_ms' }),
    notices: integer('notices').notNull().default(0),
    /** The day's reminder has gone, with its numbers; before that only the day itself was told. */
    reminded: integer('reminded', { mode: 'boolean' }).notNull().default(true),
  },
  (t) => [uniqueIndex('told_days_person').on(t.personId, t.day), index('told_days_day').on(t.day)],
)
