import { blob, index, integer, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core'
import { leaveKinds } from '../../../shared/people/leave-kinds.ts'
import { ticketKinds } from '../../../shared/people/ticket-kinds.ts'

export const people = sqliteTable(
  'people',
  {
    id: text('id').primaryKey(),
    name: text('name').notNull(),
    /** Lower case. */
    email: text('email').notNull(),
    phone: text('phone').notNull().default(''),
    role: text('role', { enum: ['office', 'leading-hand', 'apprentice'] }).notNull(),
    /** Null until the person has set one through the link in their mail. */
    passwordHash: text('password_hash'),
    /** Goes up at a password change or when access ends; older sessions are refused. */
    sessionEpoch: integer('session_epoch').notNull().default(1),
    active: integer('active', { mode: 'boolean' }).notNull().default(true),
    /** Ordinary hours Monday to Sunday; null: the firm's. */
    weekHours: text('week_hours', { mode: 'json' }).$type<number[]>(),
    createdAt: integer('created_at', { mode: 'timestamp_ms' }).notNull(),
    version: integer('version').notNull().default(1),
  },
  (t) => [uniqueIndex('people_email').on(t.email), index('people_name').on(t.name)],
)

/** A link by mail to set a password; only the token's hash is kept. */
export const passwordResets = sqliteTable(
  'password_resets',
  {
    id: text('id').primaryKey(),
    personId: text('person_id')
      .notNull()
      .references(() => people.id, { onDelete: 'cascade' }),
    tokenHash: text('token_hash').notNull(),
    expiresAt: integer('expires_at', { mode: 'timestamp_ms' }).notNull(),
    usedAt: integer('used_at', { mode: 'timestamp_ms' }),
  },
  (t) => [
    uniqueIndex('password_resets_token').on(t.tokenHash),
    index('password_resets_person').on(t.personId),
  ],
)

export const crews = sqliteTable('crews', {
  id: text('id').primaryKey(),
  name: text('name').notNull(),
  /** One letter, on the pennant. */
  letter: text('letter').notNull(),
  /** 1 to 6: which of the six pennant colours. */
  colour: integer('colour').notNull(),
  active: integer('active', { mode: 'boolean' }).notNull().default(true),
})

/** Who is in a crew from which day to which (both inclusive; null = until further notice). */
export const crewMembers = sqliteTable(
  'crew_members',
  {
    id: text('id').primaryKey(),
    crewId: text('crew_id')
      .notNull()
      .references(() => crews.id),
    personId: text('person_id')
      .notNull()
      .references(() => people.id),
    startsOn: text('starts_on').notNull(),
    endsOn: text('ends_on'),
  },
  (t) => [
    index('crew_members_crew').on(t.crewId, t.startsOn),
    index('crew_members_person').on(t.personId, t.startsOn),
  ],
)

/** Days a person is away; both inclusive. */
export const leave = sqliteTable(
  'leave',
  {
    id: text('id').primaryKey(),
    personId: text('person_id')
      .notNull()
      .references(() => people.id),
    startsOn: text('starts_on').notNull(),
    endsOn: text('ends_on').notNull(),
    kind: text('kind', { enum: leaveKinds }).notNull().default('leave'),
    /** ISO weekdays within the span (trade school each Wednesday); null: every day of it. */
    weekdays: text('weekdays', { mode: 'json' }).$type<number[]>(),
    reason: text('reason').notNull().default(''),
  },
  (t) => [index('leave_person').on(t.personId, t.startsOn), index('leave_ends').on(t.endsOn)],
)

/** A day on which a person works with another crew than the own one. */
export const crewLoans = sqliteTable(
  'crew_loans',
  {
    id: text('id').primaryKey(),
    personId: text('person_id')
      .notNull()
      .references(() => people.id),
    /** The crew that borrows. */
    crewId: text('crew_id')
      .notNull()
      .references(() => crews.id),
    day: text('day').notNull(),
    note: text('note').notNull().default(''),
  },
  (t) => [
    uniqueIndex('crew_loans_person').on(t.personId, t.day),
    index('crew_loans_crew').on(t.crewId, t.day),
  ],
)

/** A ticket to work: what for, and the last day it holds. */
export const tickets = sqliteTable(
  'tickets',
  {
    id: text('id').primaryKey(),
    personId: text('person_id')
      .notNull()
      .references(() => people.id),
    kind: text('kind', { enum: ticketKinds }).notNull(),
    /** What it is called where the kind does not say. */
    name: text('name').notNull().default(''),
    number: text('number').notNull().default(''),
    /** The last day it holds; null: it does not lapse. */
    expiresOn: text('expires_on'),
    version: integer('version').notNull().default(1),
  },
  (t) => [index('tickets_person').on(t.personId), index('tickets_expires').on(t.expiresOn)],
)

/** The photo of a ticket's card: turned upright, made smaller, nothing but the picture in it. */
export const ticketPhotos = sqliteTable('ticket_photos', {
  ticketId: text('ticket_id')
    .primaryKey()
    .references(() => tickets.id, { onDelete: 'cascade' }),
  contentType: text('content_type').notNull(),
  bytes: blob('bytes', { mode: 'buffer' }).notNull(),
  addedAt: integer('added_at', { mode: 'timestamp_ms' }).notNull(),
})
