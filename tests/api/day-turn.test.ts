import { and, eq } from 'drizzle-orm'
import { pino } from 'pino'
import { expect, test } from 'vitest'
import { createDayTurn } from '../../server/bookings/day-turn.ts'
import { seedDemo } from '../../server/db/demo/seed-demo.ts'
import { bookingDays, tasks, ticks } from '../../server/db/tables/booking-tables.ts'
import { jobs } from '../../server/db/tables/job-tables.ts'
import { newId } from '../../server/lib/ids.ts'
import { createTestApp, type TestApp } from './harness.ts'

/** Pieces planned for a day of a booking. */
function piecesOn(app: TestApp, bookingId: string, day: string): number {
  return app.db
    .select({ quantity: tasks.quantity })
    .from(tasks)
    .innerJoin(bookingDays, eq(bookingDays.id, tasks.bookingDayId))
    .where(and(eq(bookingDays.bookingId, bookingId), eq(bookingDays.day, day)))
    .all()
    .reduce((sum, row) => sum + row.quantity, 0)
}

test('what a day past left undone is on the next day without anybody touching the calendar', async () => {
  const app = await createTestApp()
  await seedDemo(app.db, app.clock)
  const office = await app.agentFor(app.addPerson('office', 'Orla Brandt').email)
  // The splayed surgery, which the second crew starts on Thu 3 Dec.
  const surgery = app.db.select().from(jobs).where(eq(jobs.number, 'QR-107')).get()
  const { body: job } = await office.get(`/api/jobs/${surgery?.id}`).expect(200)
  const bookingId: string = job.bookings[0].id
  const { body: booking } = await office.get(`/api/bookings/${bookingId}`).expect(200)
  await office
    .patch(`/api/bookings/${bookingId}`)
    .send({ version: booking.version, days: ['2026-12-03', '2026-12-09'] })
    .expect(200)
  const whole = piecesOn(app, bookingId, '2026-12-03')
  expect(piecesOn(app, bookingId, '2026-12-09')).toBe(0)

  // On Thursday one piece of the first line is cut; then it rains.
  const first = app.db
    .select({ id: tasks.id })
    .from(tasks)
    .innerJoin(bookingDays, eq(bookingDays.id, tasks.bookingDayId))
    .where(and(eq(bookingDays.bookingId, bookingId), eq(bookingDays.day, '2026-12-03')))
    .orderBy(tasks.position)
    .get()
  const personId = app.addPerson('apprentice', 'Wren Moss').id
  app.clock.current = new Date('2026-12-03T00:00:00Z')
  app.db
    .insert(ticks)
    .values({ id: newId(), taskId: first?.id ?? '', personId, delta: 1, at: app.clock.current })
    .run()

  const dayTurn = createDayTurn({ ...app.deps, log: pino({ level: 'silent' }) })
  app.clock.current = new Date('2026-12-03T20:00:00Z')
  expect(dayTurn.runOnce()).toBe(true)
  expect(piecesOn(app, bookingId, '2026-12-09')).toBe(whole - 1)
  // The day that was started stays as it was, and one look a day is enough.
  expect(piecesOn(app, bookingId, '2026-12-03')).toBe(whole)
  expect(dayTurn.runOnce()).toBe(false)
})
