import { and, asc, eq, lte } from 'drizzle-orm'
import type { Day } from '../../../shared/calendar/days.ts'
import { instantAt } from '../../../shared/calendar/local-time.ts'
import { newId } from '../../lib/ids.ts'
import type { Db } from '../client.ts'
import { bookingDays, bookings, tasks, ticks } from '../tables/booking-tables.ts'

type Input = {
  jobId: string
  done: 'all' | 'half' | 'none'
  /** Days up to this one have been worked; on it, 'half' stops part way. */
  before: Day
  crew: string[]
  timeZone: string
}

/** Pieces ticked off on the days worked so far, each task handed to one of the crew in turn. */
export function tickDemoTasks(db: Db, { jobId, done, before, crew, timeZone }: Input): void {
  if (done === 'none') return
  const rows = db
    .select({ id: tasks.id, quantity: tasks.quantity, day: bookingDays.day })
    .from(tasks)
    .innerJoin(bookingDays, eq(bookingDays.id, tasks.bookingDayId))
    .innerJoin(bookings, eq(bookings.id, bookingDays.bookingId))
    .where(and(eq(bookings.jobId, jobId), lte(bookingDays.day, before)))
    .orderBy(asc(bookingDays.day), asc(tasks.position))
    .all()
  const todays = rows.filter((row) => row.day === before)
  db.transaction((tx) => {
    for (const [i, row] of rows.entries()) {
      const personId = crew[i % crew.length]
      if (!personId) continue
      const todayIndex = todays.indexOf(row)
      const isOpen = done === 'half' && todayIndex >= todays.length / 3
      const pieces = isOpen
        ? todayIndex === Math.ceil(todays.length / 3)
          ? Math.floor(row.quantity / 2)
          : 0
        : row.quantity
      const at = instantAt(row.day, '10:00', timeZone)
      tx.update(tasks)
        .set({
          assignedToId: personId,
          firstPieceAt: pieces > 0 ? at : null,
          firstPieceById: pieces > 0 ? (crew[0] ?? null) : null,
        })
        .where(eq(tasks.id, row.id))
        .run()
      for (let piece = 0; piece < pieces; piece++) {
        tx.insert(ticks).values({ id: newId(), taskId: row.id, personId, delta: 1, at }).run()
      }
    }
  })
}
