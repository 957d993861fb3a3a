import { index, integer, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core'

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
    reason: text('reason').notNull().default(''),
  },
  (t) => [index('leave_person').on(t.personId, t.startsOn)],
)
