import { and, asc, eq, gt } from 'drizzle-orm'
import { type Day, formatDay } from '../../shared/calendar/days.ts'
import type { DbOrTx } from '../db/client.ts'
import { bookingDays, bookings } from '../db/tables/booking-tables.ts'
import { crewsWorkedWith, type ToldBooking, type ToldDay, type ToldLine } from './told-day.ts'

const workWords = { cut: 'Cut', stand: 'Stand', 'set-out': '' } as const

function lineName(line: ToldLine): string {
  return line.mark === null ? line.title : `${workWords[line.work]} ${line.mark}`
}

const lineKey = (line: ToldLine) => `${line.work}|${line.mark ?? ''}|${line.title}`

function lineChanges(before: ToldLine[], after: ToldLine[]): string[] {
  const old = new Map(before.map((line) => [lineKey(line), line]))
  const now = new Map(after.map((line) => [lineKey(line), line]))
  const added = after.filter((line) => !old.has(lineKey(line)))
  const gone = before.filter((line) => !now.has(lineKey(line)))
  const differing = after.flatMap((line) => {
    const was = old.get(lineKey(line))
    if (!was || JSON.stringify(was) === JSON.stringify(line)) return []
    if (was.quantity !== line.quantity)
      return [`${lineName(line)}: now ${line.quantity}, was ${was.quantity}`]
    return [`${lineName(line)}: other pieces, ${line.members.join(', ')}`]
  })
  return [
    ...added.map((line) => `Added: ${lineName(line)}, ${line.quantity}`),
    ...gone.map((line) => `Taken off: ${lineName(line)}`),
    ...differing,
  ]
}

function fieldChange(label: string, before: string, after: string): string[] {
  if (before === after) return []
  if (after === '') return [`${label} nothing any more, was ${before}`]
  return [before === '' ? `${label}: ${after}` : `${label} now ${after}, was ${before}`]
}

/** What differs within one booking, in words. */
export function bookingChanges(before: ToldBooking, after: ToldBooking): string[] {
  return [
    ...fieldChange('Start', before.startAt, after.startAt),
    ...fieldChange('Site', before.site, after.site),
    ...fieldChange('Getting in', before.access, after.access),
    ...fieldChange('Bring', before.gear, after.gear),
    ...fieldChange(
      'Job',
      `${before.jobNumber} ${before.jobTitle}`,
      `${after.jobNumber} ${after.jobTitle}`,
    ),
    ...fieldChange('Roof revision', before.revision ?? '', after.revision ?? ''),
    ...lineChanges(before.lines, after.lines),
  ]
}

/** Why a booking that was told is not on this person's day any more. */
function goneWords(db: DbOrTx, personId: string, day: Day, before: ToldBooking): string {
  const name = `${before.jobNumber} ${before.jobTitle}`
  const booking = db.select().from(bookings).where(eq(bookings.id, before.bookingId)).get()
  if (!booking || booking.cancelledAt !== null) return `${name}: cancelled.`
  const later = db
    .select({ day: bookingDays.day })
    .from(bookingDays)
    .where(and(eq(bookingDays.bookingId, booking.id), gt(bookingDays.day, day)))
    .orderBy(asc(bookingDays.day))
    .all()
  const stillThatDay = db
    .select({ day: bookingDays.day })
    .from(bookingDays)
    .where(and(eq(bookingDays.bookingId, booking.id), eq(bookingDays.day, day)))
    .get()
  if (booking.state === 'pencilled')
    return `${name}: not firm any more. Do not go on ${formatDay(day)}.`
  if (!crewsWorkedWith(db, personId, day).includes(booking.crewId) || stillThatDay)
    return `${name}: you are not on it on ${formatDay(day)} any more.`
  const next = later.map((row) => formatDay(row.day)).join(', ')
  return next === '' ? `${name}: moved off ${formatDay(day)}.` : `${name}: moved, now on ${next}.`
}

/** The net change of a person's day, one sentence each; empty when nothing differs. */
export function dayChanges(
  db: DbOrTx,
  personId: string,
  day: Day,
  before: ToldDay,
  after: ToldDay,
): string[] {
  const old = new Map(before.bookings.map((one) => [one.bookingId, one]))
  const now = new Set(after.bookings.map((one) => one.bookingId))
  const gone = before.bookings.filter((one) => !now.has(one.bookingId))
  const several = before.bookings.length + after.bookings.length > 2
  const inBoth = after.bookings.flatMap((one) => {
    const was = old.get(one.bookingId)
    if (!was) return [`New: ${one.jobNumber} ${one.jobTitle}, start ${one.startAt}.`]
    const changes = bookingChanges(was, one)
    return several ? changes.map((change) => `${one.jobNumber}: ${change}`) : changes
  })
  return [...gone.map((one) => goneWords(db, personId, day, one)), ...inBoth]
}
