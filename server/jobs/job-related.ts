import { and, asc, desc, eq, inArray, isNull, sql } from 'drizzle-orm'
import type { RoofGlyphData } from '../../shared/drawing/roof-glyph.ts'
import type { JobBooking, JobCrew } from '../../shared/jobs/job-views.ts'
import type { Day } from '../../shared/calendar/days.ts'
import { localDayOf } from '../../shared/calendar/local-time.ts'
import { permissionScope } from '../../shared/auth/permissions.ts'
import type { DbOrTx } from '../db/client.ts'
import { bookingDays, bookings } from '../db/tables/booking-tables.ts'
import { plateChecks, roofDrafts, roofRevisions } from '../db/tables/job-tables.ts'
import { crews } from '../db/tables/people-tables.ts'
import { bookingDayVisible } from '../lib/visibility.ts'
import { crewIdsOf } from '../people/roster.ts'
import type { Viewer } from './job-board-store.ts'

export type RevisionRow = {
  id: string
  jobId: string
  letter: string
  issuedAt: Date
  glyph: RoofGlyphData
}
export type BookingRow = JobBooking & { jobId: string; nextDay: Day | null }

/** What stands around a job, for many jobs at once; one query a kind. */
export type Related = {
  /** Newest first. */
  revisions: RevisionRow[]
  draftUpdatedAt: Date | null
  arePlatesMeasured: boolean
  /** Those the viewer may see, by first day. */
  bookings: BookingRow[]
  /** Of all standing bookings, seen or not. */
  lastBookedDay: Day | null
}

function readRevisions(db: DbOrTx, jobIds: string[], latestOnly: boolean): RevisionRow[] {
  const latest = sql`${roofRevisions.sequence} = (
    select max(r.sequence) from roof_revisions r where r.job_id = ${roofRevisions.jobId})`
  return db
    .select({
      id: roofRevisions.id,
      jobId: roofRevisions.jobId,
      letter: roofRevisions.letter,
      issuedAt: roofRevisions.issuedAt,
      glyph: roofRevisions.glyph,
    })
    .from(roofRevisions)
    .where(and(inArray(roofRevisions.jobId, jobIds), latestOnly ? latest : undefined))
    .orderBy(desc(roofRevisions.sequence))
    .all()
}

function readBookings(db: DbOrTx, viewer: Viewer, jobIds: string[]): BookingRow[] {
  const today = localDayOf(viewer.now, viewer.firm.timeZone)
  return db
    .select({
      id: bookings.id,
      jobId: bookings.jobId,
      state: bookings.state,
      startsOn: sql<Day>`min(${bookingDays.day})`.as('starts_on'),
      endsOn: sql<Day>`max(${bookingDays.day})`,
      dayCount: sql<number>`count(*)`,
      nextDay: sql<Day | null>`min(case when ${bookingDays.day} >= ${today} then ${bookingDays.day} end)`,
      crew: { id: crews.id, name: crews.name, letter: crews.letter, colour: crews.colour },
    })
    .from(bookings)
    .innerJoin(bookingDays, eq(bookingDays.bookingId, bookings.id))
    .innerJoin(crews, eq(crews.id, bookings.crewId))
    .where(
      and(
        inArray(bookings.jobId, jobIds),
        isNull(bookings.cancelledAt),
        bookingDayVisible(viewer.user, 'job:read', viewer.firm, viewer.now),
      ),
    )
    .groupBy(bookings.id)
    .orderBy(asc(sql`starts_on`), asc(bookings.id))
    .all()
}

function readLastDays(db: DbOrTx, jobIds: string[]): Map<string, Day> {
  const rows = db
    .select({ jobId: bookings.jobId, lastDay: sql<Day>`max(${bookingDays.day})` })
    .from(bookings)
    .innerJoin(bookingDays, eq(bookingDays.bookingId, bookings.id))
    .where(and(inArray(bookings.jobId, jobIds), isNull(bookings.cancelledAt)))
    .groupBy(bookings.jobId)
    .all()
  return new Map(rows.map((row) => [row.jobId, row.lastDay]))
}

function byJob<Row extends { jobId: string }>(rows: Row[]): Map<string, Row[]> {
  const grouped = new Map<string, Row[]>()
  for (const row of rows) grouped.set(row.jobId, [...(grouped.get(row.jobId) ?? []), row])
  return grouped
}

export function readRelated(
  db: DbOrTx,
  viewer: Viewer,
  jobIds: string[],
  options: { latestRevisionOnly: boolean },
): (jobId: string) => Related {
  const revisions = byJob(readRevisions(db, jobIds, options.latestRevisionOnly))
  const bookingRows = byJob(readBookings(db, viewer, jobIds))
  const lastDays = readLastDays(db, jobIds)
  const drafts = new Map(
    db
      .select({ jobId: roofDrafts.jobId, updatedAt: roofDrafts.updatedAt })
      .from(roofDrafts)
      .where(inArray(roofDrafts.jobId, jobIds))
      .all()
      .map((row) => [row.jobId, row.updatedAt]),
  )
  const checked = new Set(
    db
      .selectDistinct({ revisionId: plateChecks.revisionId })
      .from(plateChecks)
      .where(inArray(plateChecks.jobId, jobIds))
      .all()
      .map((row) => row.revisionId),
  )
  return (jobId) => {
    const own = revisions.get(jobId) ?? []
    const latest = own[0]
    return {
      revisions: own,
      draftUpdatedAt: drafts.get(jobId) ?? null,
      arePlatesMeasured: latest !== undefined && checked.has(latest.id),
      bookings: bookingRows.get(jobId) ?? [],
      lastBookedDay: lastDays.get(jobId) ?? null,
    }
  }
}

/** The crews a viewer can choose from: all in use, or their own. */
export function readCrews(db: DbOrTx, viewer: Viewer): JobCrew[] {
  const rows = db
    .select({ id: crews.id, name: crews.name, letter: crews.letter, colour: crews.colour })
    .from(crews)
    .where(eq(crews.active, true))
    .orderBy(asc(crews.name))
    .all()
  if (permissionScope(viewer.user.role, 'crew:read') === 'all') return rows
  const today = localDayOf(viewer.now, viewer.firm.timeZone)
  const own = new Set(crewIdsOf(db, viewer.user.id, today))
  return rows.filter((crew) => own.has(crew.id))
}
