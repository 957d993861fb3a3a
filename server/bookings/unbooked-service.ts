import { and, asc, eq, isNotNull, isNull, or, sql } from 'drizzle-orm'
import type { z } from 'zod'
import type { unbookedJobsSchema } from '../../shared/bookings/calendar-schemas.ts'
import { localDayOf } from '../../shared/calendar/local-time.ts'
import { workPackagesOf } from '../../shared/labour/work-packages.ts'
import { labourMinutes, minutesForWork } from '../../shared/labour/work-step.ts'
import type { Db } from '../db/client.ts'
import { bookings } from '../db/tables/booking-tables.ts'
import { jobs, roofRevisions } from '../db/tables/job-tables.ts'
import { type Firm, readFirm } from '../firm/firm-store.ts'
import type { Clock } from '../lib/clock.ts'
import { readActiveCrews } from './calendar-service.ts'
import { readCrewHours } from './crew-hours.ts'
import { readSpecs } from './job-plan-store.ts'

/** Jobs won, not complete, without a booking that stands, and the one asked for; newest revision with each. */
function readUnbooked(db: Db, askedId: string | undefined) {
  const isUnbooked = and(
    isNotNull(jobs.acceptedOn),
    isNull(jobs.completedOn),
    sql`not exists (select 1 from ${bookings} where ${bookings.jobId} = ${jobs.id} and ${bookings.cancelledAt} is null)`,
  )
  return db
    .select({
      id: jobs.id,
      number: jobs.number,
      title: jobs.title,
      siteAddress: jobs.siteAddress,
      acceptedOn: jobs.acceptedOn,
      isUnbooked: sql<number>`(${isUnbooked})`.mapWith(Boolean),
      wantedBy: jobs.wantedBy,
      revisionId: roofRevisions.id,
      revisionLetter: roofRevisions.letter,
      glyph: roofRevisions.glyph,
    })
    .from(jobs)
    .leftJoin(
      roofRevisions,
      and(
        eq(roofRevisions.jobId, jobs.id),
        sql`${roofRevisions.sequence} = (select max(r.sequence) from roof_revisions r where r.job_id = ${jobs.id})`,
      ),
    )
    .where(askedId === undefined ? isUnbooked : or(isUnbooked, eq(jobs.id, askedId)))
    .orderBy(
      sql`${jobs.wantedBy} is null`,
      asc(jobs.wantedBy),
      asc(jobs.acceptedOn),
      asc(jobs.number),
    )
    .all()
}

export type UnbookedService = ReturnType<typeof createUnbookedService>

export function createUnbookedService({ db, clock }: { db: Db; clock: Clock }) {
  // A revision never changes, so its minutes hold until the firm's rates do.
  const minutesByRevision = new Map<string, number>()

  function workMinutes(firm: Firm, revisionIds: readonly string[]): Map<string, number> {
    const keyOf = (id: string): string => `${id} ${JSON.stringify(firm.labourRates)}`
    const unknown = revisionIds.filter((id) => !minutesByRevision.has(keyOf(id)))
    if (unknown.length > 0 && minutesByRevision.size > 500) minutesByRevision.clear()
    for (const [id, spec] of readSpecs(db, unknown)) {
      const minutes = labourMinutes(workPackagesOf(spec, firm.labourRates))
      minutesByRevision.set(keyOf(id), Math.round(minutes))
    }
    return new Map(revisionIds.map((id) => [id, minutesByRevision.get(keyOf(id)) ?? 0]))
  }

  return {
    read(askedId?: string): z.input<typeof unbookedJobsSchema> {
      const firm = readFirm(db)
      const today = localDayOf(clock.now(), firm.timeZone)
      const rows = readUnbooked(db, askedId)
      const crews = readActiveCrews(db)
      const hours = readCrewHours(db, { from: today, to: today }, firm)
      const minutes = workMinutes(
        firm,
        rows.flatMap((row) => row.revisionId ?? []),
      )
      const shown = rows.map(({ revisionId, isUnbooked, ...row }) => {
        const work = revisionId === null ? null : (minutes.get(revisionId) ?? null)
        const crewDays = crews.map((crew) => {
          const { minutes: crewMinutes, thereIds } = hours.on(crew.id, today)
          const people = thereIds.length
          const there = minutesForWork(firm.labourRates, { minutes: crewMinutes, people })
          const days = work === null || there === 0 ? null : Math.max(1, Math.ceil(work / there))
          return { crewId: crew.id, days }
        })
        return { isUnbooked, job: { ...row, workMinutes: work, crewDays } }
      })
      return {
        jobs: shown.filter((one) => one.isUnbooked).map((one) => one.job),
        asked: shown.find((one) => !one.isUnbooked)?.job ?? null,
        crews,
      }
    },
  }
}
