import { and, asc, eq, isNull, lt } from 'drizzle-orm'
import type { Day } from '../../../shared/calendar/days.ts'
import { instantAt } from '../../../shared/calendar/local-time.ts'
import { ordinaryMinutes } from '../../../shared/calendar/ordinary-hours.ts'
import type { WriteDayLog } from '../../../shared/day-logs/day-log-schemas.ts'
import { saveLog } from '../../day-logs/day-log-store.ts'
import { isWorkedDay } from '../../day-logs/worked-days.ts'
import { readFirm } from '../../firm/firm-store.ts'
import { newId } from '../../lib/ids.ts'
import { rosterOf } from '../../people/roster.ts'
import type { Db } from '../client.ts'
import { bookingDays, bookings } from '../tables/booking-tables.ts'

type Story = Pick<WriteDayLog, 'done' | 'remarks' | 'delays'>

/** What the crews wrote, taken in turn. */
const stories: Story[] = [
  { done: 'Plates set out and the first pair tried.', remarks: '', delays: [] },
  {
    done: '',
    remarks: 'Tarps over the packs. Battery of the small saw is done for.',
    delays: [{ reason: 'weather', note: 'Showers from one o’clock', lostMinutes: 180 }],
  },
  { done: 'All commons of the long side are cut.', remarks: '', delays: [] },
  {
    done: '',
    remarks: 'Scaffolder promised the east side for tomorrow.',
    delays: [{ reason: 'edge-protection', note: 'East side not up until ten', lostMinutes: 150 }],
  },
]

/** The days worked before today, closed by who led them; the latest of all is still to be closed. */
export function closeDemoDays(db: Db, { today }: { today: Day }): void {
  const firm = readFirm(db)
  const worked = db
    .select({ id: bookingDays.id, day: bookingDays.day, crewId: bookings.crewId })
    .from(bookingDays)
    .innerJoin(bookings, eq(bookings.id, bookingDays.bookingId))
    .where(and(lt(bookingDays.day, today), isNull(bookings.cancelledAt), isWorkedDay))
    .orderBy(asc(bookingDays.day), asc(bookings.createdAt), asc(bookings.id))
    .all()
  for (const [i, { id, day, crewId }] of worked.slice(0, -1).entries()) {
    const roster = rosterOf(db, crewId, day)
    const lead = roster.find((person) => person.role === 'leading-hand') ?? roster[0]
    const story = stories[i % stories.length]
    if (!lead || !story) continue
    const people = roster.map((person) => ({
      personId: person.id,
      turnedUp: !person.onLeave,
      minutes: person.onLeave ? 0 : ordinaryMinutes(firm, person, day),
    }))
    const row = {
      id: newId(),
      bookingDayId: id,
      loggedById: lead.id,
      loggedAt: instantAt(day, '15:20', firm.timeZone),
      version: 1,
    }
    saveLog(db, row, { version: 0, people, ...story })
  }
}
