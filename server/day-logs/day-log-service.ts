import { and, asc, eq, inArray, isNull, sql } from 'drizzle-orm'
import { permissionScope, type Permission } from '../../shared/auth/permissions.ts'
import { formatDay } from '../../shared/calendar/days.ts'
import { localDayOf } from '../../shared/calendar/local-time.ts'
import { ordinaryMinutes } from '../../shared/calendar/ordinary-hours.ts'
import { expectedMinutes, whyLogShut } from '../../shared/day-logs/day-log-rules.ts'
import type {
  DayToClose,
  ExpectedPerson,
  WriteDayLog,
} from '../../shared/day-logs/day-log-schemas.ts'
import { replanJob } from '../bookings/replan.ts'
import type { Db, DbOrTx } from '../db/client.ts'
import { bookingDays, bookings } from '../db/tables/booking-tables.ts'
import { dayLogs } from '../db/tables/day-log-tables.ts'
import { jobs } from '../db/tables/job-tables.ts'
import { crews, people } from '../db/tables/people-tables.ts'
import { tasksOfBookings, type Viewer } from '../day-sheets/task-store.ts'
import { AppError, invalidField, notFound } from '../http/app-error.ts'
import { writeAudit } from '../lib/audit.ts'
import { newId } from '../lib/ids.ts'
import { bookingDayVisible } from '../lib/visibility.ts'
import { rosterOf } from '../people/roster.ts'
import {
  type DayLogRow,
  readDayLog,
  readLogRow,
  readMinutesElsewhere,
  saveLog,
} from './day-log-store.ts'
import { readLogHistory } from './log-history.ts'
import { isLoggedDay } from './worked-days.ts'

const minutesPerDay = 24 * 60

/** A standing booked day, looked up together with the right to it. */
function findDay(db: DbOrTx, viewer: Viewer, permission: Permission, bookingDayId: string) {
  const row = db
    .select({
      id: bookingDays.id,
      day: bookingDays.day,
      bookingId: bookings.id,
      job: { id: jobs.id, number: jobs.number, title: jobs.title },
      crew: { id: crews.id, name: crews.name, letter: crews.letter, colour: crews.colour },
    })
    .from(bookingDays)
    .innerJoin(bookings, eq(bookings.id, bookingDays.bookingId))
    .innerJoin(jobs, eq(jobs.id, bookings.jobId))
    .innerJoin(crews, eq(crews.id, bookings.crewId))
    .where(
      and(
        eq(bookingDays.id, bookingDayId),
        isNull(bookings.cancelledAt),
        bookingDayVisible(viewer.user, permission, viewer.firm, viewer.now),
      ),
    )
    .get()
  if (!row) throw notFound('That day')
  return row
}
type FoundDay = ReturnType<typeof findDay>

const todayOf = ({ now, firm }: Viewer) => localDayOf(now, firm.timeZone)

/** A correction does not open a log again for who may only correct it on the day it was written. */
function whyShut(
  db: DbOrTx,
  viewer: Viewer,
  found: FoundDay,
  log: DayLogRow | null,
): string | null {
  const writtenAt = log && (readLogHistory(db, found.id).writtenAt ?? log.loggedAt)
  return whyLogShut(permissionScope(viewer.user.role, 'day-log:write'), {
    day: found.day,
    today: todayOf(viewer),
    loggedOn: writtenAt && localDayOf(writtenAt, viewer.firm.timeZone),
  })
}

/** Rain moves a day while its log waits on a phone: the hours belong to the day they were put down for. */
function refuseMoved(found: FoundDay, input: WriteDayLog): void {
  if (input.day === undefined || input.day === found.day) return
  throw new AppError(
    'conflict',
    `This was put down for ${formatDay(input.day)}, and the office has moved that day to ${formatDay(found.day)}. Ring the office about the hours.`,
  )
}

/** The crew's sheets of the day that are still to be closed, this one counted. */
function countOpenSheets(db: DbOrTx, found: FoundDay): number {
  const rows = db
    .select({ id: bookingDays.id })
    .from(bookingDays)
    .innerJoin(bookings, eq(bookings.id, bookingDays.bookingId))
    .where(
      and(
        eq(bookingDays.day, found.day),
        eq(bookings.crewId, found.crew.id),
        isNull(bookings.cancelledAt),
        sql`(${bookingDays.id} = ${found.id} or not ${isLoggedDay})`,
      ),
    )
    .all()
  return rows.length
}

function readOthers(db: DbOrTx, rosterIds: ReadonlySet<string>) {
  return db
    .select({ id: people.id, name: people.name, weekHours: people.weekHours })
    .from(people)
    .where(and(eq(people.active, true), inArray(people.role, ['leading-hand', 'apprentice'])))
    .orderBy(asc(people.name))
    .all()
    .filter((person) => !rosterIds.has(person.id))
    .map((person) => ({ ...person, onLeave: false }))
}

/** A booked day with what is to be put down for it. */
export function dayToClose(db: DbOrTx, viewer: Viewer, bookingDayId: string): DayToClose {
  const found = findDay(db, viewer, 'day-log:read', bookingDayId)
  const { user, firm } = viewer
  const roster = rosterOf(db, found.crew.id, found.day)
  const isOffice = permissionScope(user.role, 'day-log:write') === 'all'
  const others = isOffice ? readOthers(db, new Set(roster.map((person) => person.id))) : []
  const elsewhere = readMinutesElsewhere(db, {
    day: found.day,
    bookingDayId,
    personIds: [...roster, ...others].map((person) => person.id),
  })
  const openSheets = countOpenSheets(db, found)
  const expected = (person: (typeof others)[number]): ExpectedPerson => ({
    personId: person.id,
    name: person.name,
    onLeave: person.onLeave,
    minutes: expectedMinutes({
      ordinaryMinutes: ordinaryMinutes(firm, person, found.day),
      loggedElsewhereMinutes: elsewhere.get(person.id) ?? 0,
      openSheets,
    }),
  })
  const dayTasks = tasksOfBookings(db, [found.bookingId]).filter(
    (task) => task.bookingDayId === bookingDayId,
  )
  return {
    bookingDayId,
    day: found.day,
    today: todayOf(viewer),
    job: found.job,
    crew: found.crew,
    plannedMinutes: dayTasks.reduce((total, task) => total + task.plannedMinutes, 0),
    ticked: dayTasks.map(({ title, doneCount, quantity }) => ({ title, doneCount, quantity })),
    roster: roster.map(expected),
    others: others.map(expected),
    log: readDayLog(db, bookingDayId),
    closedBecause: whyShut(db, viewer, found, readLogRow(db, bookingDayId)),
  }
}

function checkPeople(tx: DbOrTx, viewer: Viewer, found: FoundDay, input: WriteDayLog): void {
  const before = readDayLog(tx, found.id)?.people.map((person) => person.personId) ?? []
  const roster = rosterOf(tx, found.crew.id, found.day).map((person) => person.id)
  const isOffice = permissionScope(viewer.user.role, 'day-log:write') === 'all'
  const known = new Set([
    ...before,
    ...roster,
    ...(isOffice ? readOthers(tx, new Set(roster)).map((person) => person.id) : []),
  ])
  const personIds = input.people.map((person) => person.personId)
  const elsewhere = readMinutesElsewhere(tx, { day: found.day, bookingDayId: found.id, personIds })
  for (const [i, { personId, minutes }] of input.people.entries()) {
    if (!known.has(personId))
      throw invalidField(`people.${i}.personId`, 'Pick somebody who is with the crew that day.')
    if (minutes + (elsewhere.get(personId) ?? 0) > minutesPerDay)
      throw invalidField(
        `people.${i}.minutes`,
        'With the hours on another job this day comes to more than 24.',
      )
  }
}

/** The same log sent again, when its first answer was lost on the way. */
function isSentAgain(tx: DbOrTx, viewer: Viewer, row: DayLogRow | null, input: WriteDayLog) {
  if (!row || row.loggedById !== viewer.user.id) return false
  if (input.version !== 0 && row.version !== input.version + 1) return false
  const log = readDayLog(tx, row.bookingDayId)
  if (!log) return false
  const asSent = (value: Omit<WriteDayLog, 'version' | 'day'>) =>
    JSON.stringify([
      value.done,
      value.remarks,
      value.people.map((p) => `${p.personId} ${p.turnedUp} ${p.minutes}`).sort(),
      value.delays.map(({ reason, note, lostMinutes }) => [reason, note, lostMinutes]),
    ])
  return asSent(log) === asSent(input)
}

function staleLog(tx: DbOrTx, bookingDayId: string, input: WriteDayLog): AppError {
  return new AppError(
    'conflict',
    'Somebody else has closed or corrected this day since you opened it. Both are shown: keep the one that is right.',
    { detail: { kind: 'stale', current: readDayLog(tx, bookingDayId), sent: input } },
  )
}

/** Closes a day, or corrects its log. @throws AppError 404, 409 or 400. */
export function writeDayLog(
  db: Db,
  viewer: Viewer,
  bookingDayId: string,
  input: WriteDayLog,
): DayToClose {
  const { user, now } = viewer
  return db.transaction(
    (tx) => {
      const found = findDay(tx, viewer, 'day-log:write', bookingDayId)
      const before = readLogRow(tx, bookingDayId)
      if (isSentAgain(tx, viewer, before, input)) return dayToClose(tx, viewer, bookingDayId)
      refuseMoved(found, input)
      const shut = whyShut(tx, viewer, found, before)
      if (shut) throw new AppError('conflict', shut)
      if ((before?.version ?? 0) !== input.version) throw staleLog(tx, bookingDayId, input)
      checkPeople(tx, viewer, found, input)
      saveLog(
        tx,
        {
          id: before?.id ?? newId(),
          bookingDayId,
          loggedById: user.id,
          loggedAt: now,
          // A log written anew goes on from one taken back, so that nobody corrects the wrong one.
          version: before ? before.version + 1 : readLogHistory(tx, bookingDayId).writes + 1,
        },
        input,
      )
      writeAudit(tx, {
        at: now,
        personId: user.id,
        action: before ? 'day-log.corrected' : 'day-log.written',
        entity: 'booking-day',
        entityId: bookingDayId,
        detail: { ...input },
      })
      // A day that is closed is a day worked: it is frozen, and what is left moves on at the turn of the day.
      if (!before) replanJob(tx, found.job.id, now)
      return dayToClose(tx, viewer, bookingDayId)
    },
    { behavior: 'immediate' },
  )
}

/** Opens a closed day again. The audit keeps what stood in its log. @throws AppError 404 or 409. */
export function takeBackDayLog(
  db: Db,
  viewer: Viewer,
  bookingDayId: string,
  { version }: { version: number },
): DayToClose {
  const { user, now } = viewer
  return db.transaction(
    (tx) => {
      const found = findDay(tx, viewer, 'day-log:write', bookingDayId)
      const before = readLogRow(tx, bookingDayId)
      if (!before) return dayToClose(tx, viewer, bookingDayId)
      const shut = whyShut(tx, viewer, found, before)
      if (shut) throw new AppError('conflict', shut)
      const log = readDayLog(tx, bookingDayId)
      if (before.version !== version)
        throw new AppError('conflict', 'Somebody else has corrected this day. Look at it first.', {
          detail: { kind: 'stale', current: log },
        })
      tx.delete(dayLogs).where(eq(dayLogs.id, before.id)).run()
      writeAudit(tx, {
        at: now,
        personId: user.id,
        action: 'day-log.taken-back',
        entity: 'booking-day',
        entityId: bookingDayId,
        detail: { log },
      })
      replanJob(tx, found.job.id, now)
      return dayToClose(tx, viewer, bookingDayId)
    },
    { behavior: 'immediate' },
  )
}
