import { and, asc, eq, inArray, type SQL } from 'drizzle-orm'
import type {
  Booking,
  Calendar,
  CalendarBooking,
  CalendarCrew,
  CalendarDay,
  CrewHoursOfDay,
} from '../../shared/bookings/calendar-schemas.ts'
import { permissionScope } from '../../shared/auth/permissions.ts'
import { type Day, dayPlus, daysBetween } from '../../shared/calendar/days.ts'
import { localDayOf } from '../../shared/calendar/local-time.ts'
import { groupBy } from '../../shared/collections/group-by.ts'
import { packagesInWords } from '../../shared/labour/package-words.ts'
import type { CurrentUser } from '../auth/current-user.ts'
import { readDayClashes } from '../clashes/read-clashes.ts'
import type { Db, DbOrTx } from '../db/client.ts'
import { bookings } from '../db/tables/booking-tables.ts'
import { crews } from '../db/tables/people-tables.ts'
import { type Firm, readFirm } from '../firm/firm-store.ts'
import type { Clock } from '../lib/clock.ts'
import { bookingDayVisible } from '../lib/visibility.ts'
import {
  type DayRow,
  daysBetweenScope,
  type Extent,
  readDayRows,
  readDayTaskLines,
  readDayWork,
  readExtents,
  readWorkedDayIds,
  standingScope,
} from './calendar-store.ts'
import { type CrewHours, readCrewHours } from './crew-hours.ts'

const both = (...conditions: SQL[]): SQL => and(...conditions) ?? conditions[0] ?? standingScope()

type Seen = { rows: DayRow[]; days: CalendarDay[]; extents: Map<string, Extent>; hours: CrewHours }

/** Rows of a scope with everything a screen says about each day: the same few queries for any number. */
function readSeen(
  db: DbOrTx,
  input: { scope: SQL; visible: SQL; firm: Firm; today: Day; isOffice: boolean },
): Seen {
  const { scope, visible, firm, today, isOffice } = input
  const rows = readDayRows(db, scope)
  const [first, last] = [rows[0], rows[rows.length - 1]]
  const span = { from: first?.day ?? today, to: last?.day ?? today }
  const hours = readCrewHours(db, span, firm)
  const work = readDayWork(db, scope)
  const worked = readWorkedDayIds(db, scope)
  const reader = isOffice ? 'office' : 'crew'
  const clashes = readDayClashes(db, span, { firm, today, reader })
  const days = rows.map((row): CalendarDay => {
    const crewDay = hours.on(row.crew.id, row.day)
    const held = work.get(row.id)
    return {
      id: row.id,
      day: row.day,
      revisionLetter: row.revisionLetter,
      holds: packagesInWords(held?.packageKeys ?? []),
      plannedMinutes: held?.plannedMinutes ?? 0,
      availableMinutes: crewDay.minutes,
      peopleThere: crewDay.thereIds.length,
      worked: worked.has(row.id),
      flags: clashes(row.booking.id, row.day),
    }
  })
  const bookingIds = [...new Set(rows.map((row) => row.booking.id))]
  const extents =
    bookingIds.length > 0 ? readExtents(db, bookingIds, visible, today) : new Map<string, Extent>()
  return { rows, days, extents, hours }
}

function asBookings(seen: Seen, view: { firm: Firm; isOffice: boolean }): CalendarBooking[] {
  const { firm, isOffice } = view
  const byId = new Map<string, CalendarBooking>()
  for (const [i, row] of seen.rows.entries()) {
    const day = seen.days[i]
    const extent = seen.extents.get(row.booking.id)
    if (!day || !extent) continue
    const { completedOn, ...job } = row.job
    const booking = byId.get(row.booking.id) ?? {
      id: row.booking.id,
      version: row.booking.version,
      state: row.booking.state,
      startAt: row.booking.startAt ?? firm.startAt,
      job,
      crew: row.crew,
      glyph: null,
      ...extent,
      shortMinutes: completedOn === null ? row.booking.shortMinutes : 0,
      clashReason: isOffice ? row.booking.clashReason : null,
      days: [],
    }
    booking.days.push(day)
    booking.glyph = row.glyph ?? booking.glyph
    byId.set(row.booking.id, booking)
  }
  return [...byId.values()]
}

export type CalendarService = ReturnType<typeof createCalendarService>

export function createCalendarService(deps: { db: Db; clock: Clock }) {
  const { db, clock } = deps

  function viewOf(user: CurrentUser, from: DbOrTx = db, span?: { from: Day; to: Day }) {
    const firm = readFirm(from, span)
    const now = clock.now()
    return {
      firm,
      today: localDayOf(now, firm.timeZone),
      visible: bookingDayVisible(user, 'calendar:read', firm, now),
      isOffice: permissionScope(user.role, 'booking:write') === 'all',
    }
  }

  /** Bookings, cancelled or not, that are this user's to see: the same few queries for any number. */
  function readBookings(user: CurrentUser, ids: readonly string[], from: DbOrTx = db): Booking[] {
    const view = viewOf(user, from)
    const visible = view.isOffice ? view.visible : both(standingScope(), view.visible)
    const scope = both(visible, inArray(bookings.id, [...ids]))
    const seen = readSeen(from, { ...view, scope, visible })
    const lines = groupBy(readDayTaskLines(from, scope), (line) => line.dayId)
    const rows = new Map(seen.rows.map((row) => [row.booking.id, row.booking]))
    return asBookings(seen, view).flatMap((booking) => {
      const row = rows.get(booking.id)
      if (!row) return []
      const { startAt: ownStartAt, gear, cancelledAt } = row
      const days = booking.days.map((day) => ({ ...day, tasks: lines.get(day.id) ?? [] }))
      return [{ ...booking, ownStartAt, gear, cancelled: cancelledAt !== null, days }]
    })
  }

  return {
    readBookings,

    /** What is booked from one day to another, as far as the user may see it. */
    read(user: CurrentUser, span: { from: Day; to: Day }): Calendar {
      const view = viewOf(user, db, span)
      const visible = both(standingScope(), view.visible)
      const scope = both(visible, daysBetweenScope(span.from, span.to))
      const seen = readSeen(db, { ...view, scope, visible })
      const shown = asBookings(seen, view)
      const shownCrews = view.isOffice ? readActiveCrews(db) : crewsOf(shown)
      return {
        ...span,
        today: view.today,
        bookings: shown,
        crews: shownCrews,
        crewHours: view.isOffice
          ? hoursOfSpan(readCrewHours(db, span, view.firm), shownCrews, span)
          : hoursOfBooked(shown),
        workingWeekdays: view.firm.workingWeekdays,
        closedDays: view.firm.closedDays.filter(
          ({ day }) => day >= dayPlus(span.from, -7) && day <= dayPlus(span.to, 60),
        ),
      }
    },

    /** One booking, cancelled or not; null when it is not there or not this user's to see. */
    readBooking(user: CurrentUser, id: string, from: DbOrTx = db): Booking | null {
      return readBookings(user, [id], from)[0] ?? null
    },
  }
}

function hoursOfSpan(
  hours: CrewHours,
  shownCrews: readonly CalendarCrew[],
  { from, to }: { from: Day; to: Day },
): CrewHoursOfDay[] {
  const days = Array.from({ length: daysBetween(from, to) + 1 }, (_, i) => dayPlus(from, i))
  return shownCrews.flatMap(({ id: crewId }) =>
    days.map((day) => {
      const { minutes, thereIds } = hours.on(crewId, day)
      return { crewId, day, availableMinutes: minutes, peopleThere: thereIds.length }
    }),
  )
}

function hoursOfBooked(shown: readonly CalendarBooking[]): CrewHoursOfDay[] {
  const byKey = new Map<string, CrewHoursOfDay>()
  for (const { crew, days } of shown)
    for (const { day, availableMinutes, peopleThere } of days)
      byKey.set(`${crew.id} ${day}`, { crewId: crew.id, day, availableMinutes, peopleThere })
  return [...byKey.values()]
}

export function readActiveCrews(db: DbOrTx): CalendarCrew[] {
  return db
    .select({ id: crews.id, name: crews.name, letter: crews.letter, colour: crews.colour })
    .from(crews)
    .where(eq(crews.active, true))
    .orderBy(asc(crews.letter), asc(crews.name))
    .all()
}

function crewsOf(shown: readonly CalendarBooking[]): CalendarCrew[] {
  const byId = new Map(shown.map((booking) => [booking.crew.id, booking.crew]))
  return [...byId.values()].sort((a, b) => (a.letter < b.letter ? -1 : 1))
}
