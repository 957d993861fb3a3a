import type { Day } from '../../shared/calendar/days.ts'
import type { ClashBooking, ClashDay, ClashFacts } from '../../shared/clashes/clash-facts.ts'
import type { BookingClash, Clash } from '../../shared/clashes/clash-schemas.ts'
import { findClashes } from '../../shared/clashes/find-clashes.ts'
import { groupBy } from '../../shared/collections/group-by.ts'
import { readWorkedDayIds } from '../bookings/calendar-store.ts'
import type { DbOrTx } from '../db/client.ts'
import type { Firm } from '../firm/firm-store.ts'
import { readCrewFacts } from '../people/crew-facts.ts'
import {
  bookedWithin,
  type BookedDayRow,
  readBookedDays,
  readNeededMilestones,
  readNewestRevisions,
  readToldRoofs,
  type Span,
} from './clash-store.ts'

export type ClashView = { firm: Firm; today: Day; reader: ClashFacts['reader'] }

function widest(rows: readonly BookedDayRow[], span: Span): Span {
  const days = rows.map((row) => row.day)
  const from = days.reduce((a, b) => (b < a ? b : a), span.from)
  return { from, to: days.reduce((a, b) => (b > a ? b : a), span.to) }
}

/**
 * The facts of every booking that has a day within a span, those bookings whole: the same dozen queries for
 * any number. Who else stands on a day is known for the days of the span only.
 */
export function readClashFacts(db: DbOrTx, span: Span, view: ClashView): ClashFacts {
  const rows = readBookedDays(db, span)
  const worked = readWorkedDayIds(db, bookedWithin(span))
  const newest = readNewestRevisions(db, span)
  const needed = readNeededMilestones(db, span)
  const whole = widest(rows, span)
  const told = readToldRoofs(db, whole)
  const crews = readCrewFacts(db, whole, view.firm)
  const dayOf = (row: BookedDayRow): ClashDay => {
    const { id, day, revision, booking, crew } = row
    const letters =
      booking.state === 'firm' && day >= view.today
        ? crews.on(crew.id, day).there.map((person) => told(person.id, day, booking.id))
        : []
    return {
      day,
      worked: worked.has(id),
      revision,
      toldLetters: letters.filter((letter) => letter !== undefined),
    }
  }
  const bookings = [...groupBy(rows, (row) => row.booking.id).values()].flatMap(
    (days): ClashBooking[] => {
      const [first] = days
      if (!first) return []
      const { booking, job, crew } = first
      const { completedOn, ...named } = job
      return [
        {
          ...booking,
          crew,
          job: {
            ...named,
            isComplete: completedOn !== null,
            newestRevision: newest.get(job.id) ?? null,
            milestones: needed.get(job.id) ?? [],
          },
          days: days.map(dayOf),
        },
      ]
    },
  )
  return { today: view.today, calendar: view.firm, crews, bookings, reader: view.reader }
}

/** What stands in the way on the days of a span. */
export function readClashes(db: DbOrTx, span: Span, view: ClashView): BookingClash[] {
  return findClashes(readClashFacts(db, span, view)).filter(
    ({ day }) => day >= span.from && day <= span.to,
  )
}

/** The same by booking and day. */
export function readDayClashes(
  db: DbOrTx,
  span: Span,
  view: ClashView,
): (bookingId: string, day: Day) => Clash[] {
  const keyOf = (bookingId: string, day: Day): string => `${bookingId} ${day}`
  const byDay = groupBy(readClashes(db, span, view), ({ bookingId, day }) => keyOf(bookingId, day))
  return (bookingId, day) => byDay.get(keyOf(bookingId, day)) ?? []
}
