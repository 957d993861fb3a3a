import { eq } from 'drizzle-orm'
import { type Day, formatDay } from '../../shared/calendar/days.ts'
import { roleMay } from '../../shared/auth/permissions.ts'
import type { Role } from '../../shared/auth/roles.ts'
import type { FrameSpec } from '../../shared/roof/roof-types.ts'
import type { MarkingOptions } from '../../shared/marking/marking-figures.ts'
import type { DbOrTx } from '../db/client.ts'
import { bookings } from '../db/tables/booking-tables.ts'
import type { jobs } from '../db/tables/job-tables.ts'
import { type CrewDaySheet, readDaySheets } from '../day-sheets/day-sheet-store.ts'
import type { Firm } from '../firm/firm-store.ts'
import type { ToldBooking, ToldDay, ToldLine, ToldPerson } from './told-day.ts'

/** One booking of a day as its mail shows it: what is told, and the numbers that go with it. */
export type DayMailBooking = {
  told: ToldBooking
  /** What is told, in the day's order of work. */
  lines: ToldLine[]
  siteContact: string
  crewNotes: string
  who: string[]
  cautions: string[]
  roof: { spec: FrameSpec; options: MarkingOptions; plates: CrewDaySheet['plates'] } | null
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

function roofOf(firm: Firm, sheet: CrewDaySheet): DayMailBooking['roof'] {
  const { revision, plates } = sheet
  if (!revision) return null
  const { roundMm, roundDeg, sawMaxTiltDeg } = revision.settings
  return {
    spec: revision.spec,
    options: { units: firm.lengthUnits, roundMm, roundDeg, sawMaxTiltDeg },
    plates,
  }
}

/** Name and, for whom the permission table lets see it, phone. */
function siteContactFor(role: Role, job: typeof jobs.$inferSelect): string {
  const phone = roleMay(role, 'site-contact-phone:read') ? job.siteContactPhone : ''
  return [job.siteContactName, phone].filter(Boolean).join(', ')
}

/** The booking's own sheet of the day, as Today shows it. */
function sheetOf(db: DbOrTx, bookingId: string, day: Day): CrewDaySheet | undefined {
  const booking = db
    .select({ crewId: bookings.crewId })
    .from(bookings)
    .where(eq(bookings.id, bookingId))
    .get()
  if (!booking) return undefined
  return readDaySheets(db, { crewId: booking.crewId, day }).find(
    (sheet) => sheet.booking.id === bookingId,
  )
}

function inOrderOfWork(lines: ToldLine[], sheet: CrewDaySheet): ToldLine[] {
  const place = (line: ToldLine) =>
    sheet.tasks.findIndex(
      (task) =>
        task.work === line.work &&
        task.cutLineMark === line.mark &&
        (line.mark !== null || task.title === line.title),
    )
  return [...lines].sort((a, b) => place(a) - place(b))
}

/** Where a person of a role opens a day. */
export function dayUrl(appUrl: string, role: Role, day: Day): string {
  return `${appUrl}/${role === 'apprentice' ? 'my-tasks' : 'today'}?day=${day}`
}

/** Everything a day's mail says to a person, as the rows are now. */
export function readDayMail(
  db: DbOrTx,
  from: { firm: Firm; person: ToldPerson; day: Day; told: ToldDay; appUrl: string; now: Date },
): DayMail {
  const { firm, person, day, told } = from
  const bookingMails = told.bookings.map((one): DayMailBooking => {
    const sheet = sheetOf(db, one.bookingId, day)
    if (!sheet) throw new Error(`Booking ${one.bookingId} has no sheet on ${day}.`)
    return {
      told: one,
      lines: inOrderOfWork(one.lines, sheet),
      siteContact: siteContactFor(person.role, sheet.job),
      crewNotes: sheet.job.crewNotes,
      who: sheet.roster.filter((member) => !member.onLeave).map((member) => member.name),
      cautions: [...new Set(sheet.cautions.map(({ text, remedy }) => `${text} ${remedy}`.trim()))],
      roof: roofOf(firm, sheet),
    }
  })
  return {
    day,
    dayWords: formatDay(day),
    personName: person.name,
    firmName: firm.name,
    firmPhone: firm.phone,
    bookings: bookingMails,
    url: dayUrl(from.appUrl, person.role, day),
  }
}
