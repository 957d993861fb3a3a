import { and, eq } from 'drizzle-orm'
import { type Day, formatDay } from '../../shared/calendar/days.ts'
import { roleMay } from '../../shared/auth/permissions.ts'
import type { Role } from '../../shared/auth/roles.ts'
import type { FrameSpec } from '../../shared/roof/roof-types.ts'
import type { MarkingOptions } from '../../shared/marking/marking-figures.ts'
import type { DbOrTx } from '../db/client.ts'
import { bookingDays, bookings } from '../db/tables/booking-tables.ts'
import { jobs, plateChecks, roofRevisions } from '../db/tables/job-tables.ts'
import type { Firm } from '../firm/firm-store.ts'
import { rosterOf } from '../people/roster.ts'
import type { ToldBooking, ToldDay, ToldPerson } from './told-day.ts'

/** One booking of a day as its mail shows it: what is told, and the numbers that go with it. */
export type DayMailBooking = {
  told: ToldBooking
  siteContact: string
  crewNotes: string
  who: string[]
  roof: { spec: FrameSpec; options: MarkingOptions; platesMeasured: boolean } | null
}

export type DayMail = {
  day: Day
  dayWords: string
  personName: string
  firmName: string
  firmPhone: string
  bookings: DayMailBooking[]
  /** To this person's screen of the day. */
  url: string
}

function roofOf(db: DbOrTx, firm: Firm, bookingId: string, day: Day): DayMailBooking['roof'] {
  const revision = db
    .select({ id: roofRevisions.id, spec: roofRevisions.spec, settings: roofRevisions.settings })
    .from(bookingDays)
    .innerJoin(roofRevisions, eq(roofRevisions.id, bookingDays.revisionId))
    .where(and(eq(bookingDays.bookingId, bookingId), eq(bookingDays.day, day)))
    .get()
  if (!revision) return null
  const check = db
    .select({ id: plateChecks.id })
    .from(plateChecks)
    .where(eq(plateChecks.revisionId, revision.id))
    .get()
  const { roundMm, roundDeg, sawMaxTiltDeg } = revision.settings
  return {
    spec: revision.spec,
    options: { units: firm.lengthUnits, roundMm, roundDeg, sawMaxTiltDeg },
    platesMeasured: check !== undefined,
  }
}

/** Name and, for whom the permission table lets see it, phone. */
function siteContactFor(role: Role, job: typeof jobs.$inferSelect): string {
  const phone = roleMay(role, 'site-contact-phone:read') ? job.siteContactPhone : ''
  return [job.siteContactName, phone].filter(Boolean).join(', ')
}

function bookingMail(
  db: DbOrTx,
  firm: Firm,
  person: ToldPerson,
  day: Day,
  told: ToldBooking,
): DayMailBooking[] {
  const row = db
    .select({ crewId: bookings.crewId, job: jobs })
    .from(bookings)
    .innerJoin(jobs, eq(jobs.id, bookings.jobId))
    .where(eq(bookings.id, told.bookingId))
    .get()
  if (!row) return []
  return [
    {
      told,
      siteContact: siteContactFor(person.role, row.job),
      crewNotes: row.job.crewNotes,
      who: rosterOf(db, row.crewId, day)
        .filter((member) => !member.onLeave)
        .map((member) => member.name),
      roof: roofOf(db, firm, told.bookingId, day),
    },
  ]
}

/** Where a person of a role opens a day. */
export function dayUrl(appUrl: string, role: Role, day: Day): string {
  return `${appUrl}/${role === 'apprentice' ? 'my-tasks' : 'today'}?day=${day}`
}

/** Everything a day's mail says to a person, as the rows are now. */
export function readDayMail(
  db: DbOrTx,
  from: { firm: Firm; person: ToldPerson; day: Day; told: ToldDay; appUrl: string },
): DayMail {
  const { firm, person, day, told } = from
  return {
    day,
    dayWords: formatDay(day),
    personName: person.name,
    firmName: firm.name,
    firmPhone: firm.phone,
    bookings: told.bookings.flatMap((one) => bookingMail(db, firm, person, day, one)),
    url: dayUrl(from.appUrl, person.role, day),
  }
}
