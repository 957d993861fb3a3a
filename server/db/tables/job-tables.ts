import { index, integer, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core'
import type { RoofGlyphData } from '../../../shared/drawing/roof-glyph.ts'
import type { SizesTyped } from '../../../shared/revisions/sizes-typed.ts'
import type { FrameSpec, Roof, RoofSettings } from '../../../shared/roof/roof-types.ts'
import { people } from './people-tables.ts'

export const jobs = sqliteTable(
  'jobs',
  {
    id: text('id').primaryKey(),
    /** Short and spoken: 'QR-104' in the demo. */
    number: text('number').notNull(),
    title: text('title').notNull(),
    siteAddress: text('site_address').notNull().default(''),
    accessNotes: text('access_notes').notNull().default(''),
    siteContactName: text('site_contact_name').notNull().default(''),
    siteContactPhone: text('site_contact_phone').notNull().default(''),
    customerName: text('customer_name').notNull().default(''),
    customerPhone: text('customer_phone').notNull().default(''),
    customerEmail: text('customer_email').notNull().default(''),
    covering: text('covering', { enum: ['tiles', 'sheet', 'shingles', 'other'] }).notNull(),
    wantedBy: text('wanted_by'),
    priceCents: integer('price_cents'),
    priceSentOn: text('price_sent_on'),
    acceptedOn: text('accepted_on'),
    completedOn: text('completed_on'),
    /** What the office writes for itself. */
    notes: text('notes').notNull().default(''),
    /** What the crew reads on Today. */
    crewNotes: text('crew_notes').notNull().default(''),
    createdAt: integer('created_at', { mode: 'timestamp_ms' }).notNull(),
    updatedAt: integer('updated_at', { mode: 'timestamp_ms' }).notNull(),
    version: integer('version').notNull().default(1),
  },
  (t) => [
    uniqueIndex('jobs_number').on(t.number),
    index('jobs_updated').on(t.updatedAt),
    index('jobs_wanted').on(t.wantedBy),
    index('jobs_completed').on(t.completedOn),
  ],
)

/** The roof as the office is typing it; may be wrong, is never worked from. */
export const roofDrafts = sqliteTable('roof_drafts', {
  jobId: text('job_id')
    .primaryKey()
    .references(() => jobs.id, { onDelete: 'cascade' }),
  /** The editor's form as typed, wrong values included, so that nothing typed is lost. */
  form: text('form', { mode: 'json' }).$type<unknown>().notNull(),
  updatedAt: integer('updated_at', { mode: 'timestamp_ms' }).notNull(),
  version: integer('version').notNull().default(1),
  /** Who typed each size as it now stands. */
  sizesTyped: text('sizes_typed', { mode: 'json' }).$type<SizesTyped>().notNull().default({}),
})

/** Issued and never changed again. */
export const roofRevisions = sqliteTable(
  'roof_revisions',
  {
    id: text('id').primaryKey(),
    jobId: text('job_id')
      .notNull()
      .references(() => jobs.id, { onDelete: 'cascade' }),
    /** 1 for A, 2 for B … */
    sequence: integer('sequence').notNull(),
    letter: text('letter').notNull(),
    roof: text('roof', { mode: 'json' }).$type<Roof>().notNull(),
    settings: text('settings', { mode: 'json' }).$type<RoofSettings>().notNull(),
    spec: text('spec', { mode: 'json' }).$type<FrameSpec>().notNull(),
    glyph: text('glyph', { mode: 'json' }).$type<RoofGlyphData>().notNull(),
    engineVersion: text('engine_version').notNull(),
    /** Over roof, settings and engine version: the same input issues no second revision. */
    inputHash: text('input_hash').notNull(),
    issuedAt: integer('issued_at', { mode: 'timestamp_ms' }).notNull(),
    issuedById: text('issued_by_id')
      .notNull()
      .references(() => people.id),
    sizesTyped: text('sizes_typed', { mode: 'json' }).$type<SizesTyped>().notNull().default({}),
  },
  (t) => [uniqueIndex('roof_revisions_job').on(t.jobId, t.sequence)],
)

/** Sides and diagonals taken on site; lengths are 'from plan' until one is recorded for the revision. */
export const plateChecks = sqliteTable(
  'plate_checks',
  {
    id: text('id').primaryKey(),
    jobId: text('job_id')
      .notNull()
      .references(() => jobs.id, { onDelete: 'cascade' }),
    revisionId: text('revision_id')
      .notNull()
      .references(() => roofRevisions.id),
    /** Measured length of edge i, corner i to corner i + 1. */
    sidesMm: text('sides_mm', { mode: 'json' }).$type<number[]>().notNull(),
    diagonals: text('diagonals', { mode: 'json' })
      .$type<{ from: number; to: number; lengthMm: number }[]>()
      .notNull(),
    note: text('note').notNull().default(''),
    takenById: text('taken_by_id')
      .notNull()
      .references(() => people.id),
    takenAt: integer('taken_at', { mode: 'timestamp_ms' }).notNull(),
  },
  (t) => [
    index('plate_checks_job').on(t.jobId, t.takenAt),
    index('plate_checks_revision').on(t.revisionId),
  ],
)
