import { roleMay } from '../../shared/auth/permissions.ts'
import type { Role } from '../../shared/auth/roles.ts'
import type { DaySheet } from '../../shared/day-sheets/day-sheet-schemas.ts'
import type { CrewDaySheet } from './day-sheet-store.ts'

/** Where the site is, for whatever map a phone has; null without an address. */
export function mapUrlOf(siteAddress: string): string | null {
  const address = siteAddress.trim()
  if (address === '') return null
  return `https://www.openstreetmap.org/search?query=${encodeURIComponent(address)}`
}

function jobView(job: CrewDaySheet['job'], role: Role): DaySheet['job'] {
  const { id, number, title, siteAddress, accessNotes, crewNotes, siteContactName } = job
  return {
    id,
    number,
    title,
    siteAddress,
    mapUrl: mapUrlOf(siteAddress),
    accessNotes,
    crewNotes,
    siteContactName,
    ...(roleMay(role, 'site-contact-phone:read') ? { siteContactPhone: job.siteContactPhone } : {}),
  }
}

/** A sheet as a role may see it: what it may not see is not there at all. */
export function daySheetView(sheet: CrewDaySheet, role: Role): DaySheet {
  const { booking, revision, plates, marks } = sheet
  return {
    bookingDayId: sheet.bookingDayId,
    bookingId: booking.id,
    day: sheet.day,
    state: booking.state,
    dayNumber: sheet.dayNumber,
    dayCount: sheet.dayCount,
    startAt: sheet.startAt,
    gear: booking.gear,
    job: jobView(sheet.job, role),
    roster: sheet.roster.map(({ id, name, onLeave }) => ({ id, name, onLeave })),
    revision: revision && { id: revision.id, letter: revision.letter },
    plates: plates && { ...plates, takenAt: plates.takenAt.toISOString() },
    minutesPlanned: sheet.minutesPlanned,
    minutesThere: sheet.minutesThere,
    log: sheet.log,
    tasks: sheet.tasks,
    leftOver: sheet.leftOver,
    changes: sheet.changes,
    cautions: sheet.cautions,
    dueMarks: marks.due,
    doneMarks: marks.done,
  }
}
