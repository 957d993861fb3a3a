import { eq } from 'drizzle-orm'
import { expect, test } from 'vitest'
import { bookingDays, tasks, ticks } from '../../server/db/tables/booking-tables.ts'
import { newId } from '../../server/lib/ids.ts'
import { createMailYard } from './support/mail-yard.ts'

// Wed 2 Dec 2026 in Brisbane; the reminder for Thursday went at 15:00 (05:00 UTC); hold 15 minutes.

async function remindedYard() {
  const yard = await createMailYard()
  const booking = yard.book(['2026-12-03'])
  const dayId = booking.dayIds[0]!
  const worker = yard.worker()
  yard.at('2026-12-02T05:00:00Z')
  await worker.runOnce()
  expect(yard.fake.sent).toHaveLength(2)
  /** Runs now and once the hold is over. */
  const settle = async (from: string) => {
    yard.at(from)
    await worker.runOnce()
    yard.clock.current = new Date(yard.clock.current.getTime() + 15 * 60_000)
    await worker.runOnce()
  }
  const notices = () => yard.fake.sent.slice(2)
  return { yard, booking, dayId, worker, settle, notices }
}

test('a start moved after the reminder leads to one notice a person, when the hold has run out', async () => {
  const { yard, booking, worker, notices } = await remindedYard()
  yard.setBooking(booking.id, { startAt: '09:00' })
  yard.at('2026-12-02T06:00:00Z')
  await worker.runOnce()
  yard.at('2026-12-02T06:14:59Z')
  await worker.runOnce()
  expect(notices()).toHaveLength(0)
  yard.at('2026-12-02T06:15:00Z')
  await worker.runOnce()
  await worker.runOnce()
  yard.at('2026-12-02T08:00:00Z')
  await yard.worker().runOnce()
  expect(
    notices()
      .map((mail) => mail.to)
      .sort(),
  ).toEqual([yard.apprentice.email, yard.lead.email].sort())
  expect(notices()[0]?.subject).toBe('Change for Thu 3 Dec: Start now 09:00, was 07:00')
  expect(notices()[0]?.text).toContain('Start now 09:00, was 07:00')
  expect(notices()[0]?.text).toContain('Cut length 3853 mm')
})

test('a further change starts the hold afresh, and the notice says the net change only', async () => {
  const { yard, booking, worker, notices } = await remindedYard()
  yard.setBooking(booking.id, { startAt: '09:00' })
  yard.at('2026-12-02T06:00:00Z')
  await worker.runOnce()
  yard.setBooking(booking.id, { startAt: '10:00', gear: 'Second ladder' })
  yard.at('2026-12-02T06:10:00Z')
  await worker.runOnce()
  yard.at('2026-12-02T06:20:00Z')
  await worker.runOnce()
  expect(notices()).toHaveLength(0)
  yard.at('2026-12-02T06:25:00Z')
  await worker.runOnce()
  expect(notices()).toHaveLength(2)
  expect(notices()[0]?.text).toContain('Start now 10:00, was 07:00')
  expect(notices()[0]?.text).toContain('Bring: Second ladder')
  expect(notices()[0]?.text).not.toContain('09:00')
})

test('moved away and back again makes no notice', async () => {
  const { yard, dayId, worker, notices } = await remindedYard()
  yard.moveDay(dayId, '2026-12-10')
  yard.at('2026-12-02T06:00:00Z')
  await worker.runOnce()
  yard.moveDay(dayId, '2026-12-03')
  yard.at('2026-12-02T06:10:00Z')
  await worker.runOnce()
  yard.at('2026-12-02T09:00:00Z')
  await worker.runOnce()
  expect(notices()).toHaveLength(0)
  expect(yard.mails()).toHaveLength(2)
})

test('changed back while its notice could not be sent: the notice is dropped, and a new change still told', async () => {
  const { yard, booking, worker, settle, notices } = await remindedYard()
  yard.setBooking(booking.id, { startAt: '09:00' })
  yard.fake.failNext(2)
  await settle('2026-12-02T06:00:00Z')
  expect(notices()).toHaveLength(0)
  yard.setBooking(booking.id, { startAt: null })
  yard.at('2026-12-02T06:30:00Z')
  await worker.runOnce()
  expect(notices()).toHaveLength(0)
  yard.setBooking(booking.id, { startAt: '10:00' })
  await settle('2026-12-02T07:00:00Z')
  expect(notices()).toHaveLength(2)
  expect(notices()[0]?.text).toContain('Start now 10:00, was 07:00')
})

test('a day moved on is called off with its new day, and the new day has its own reminder in time', async () => {
  const { yard, dayId, worker, settle, notices } = await remindedYard()
  yard.moveDay(dayId, '2026-12-04')
  await settle('2026-12-02T06:00:00Z')
  expect(notices()).toHaveLength(2)
  expect(notices()[0]?.subject).toBe('Change: Thu 3 Dec is off')
  expect(notices()[0]?.text).toContain('QR-100 Hip roof: moved, now on Fri 4 Dec.')
  yard.at('2026-12-03T05:00:00Z')
  await worker.runOnce()
  expect(notices()).toHaveLength(4)
  expect(notices()[2]?.subject).toContain('Fri 4 Dec, 07:00')
})

test('a cancelled day and a day no longer firm are both called off', async () => {
  const cancelled = await remindedYard()
  cancelled.yard.setBooking(cancelled.booking.id, { cancelledAt: cancelled.yard.clock.current })
  await cancelled.settle('2026-12-02T06:00:00Z')
  expect(cancelled.notices()).toHaveLength(2)
  expect(cancelled.notices()[0]?.text).toContain('QR-100 Hip roof: cancelled.')

  const pencilled = await remindedYard()
  pencilled.yard.setBooking(pencilled.booking.id, { state: 'pencilled' })
  await pencilled.settle('2026-12-02T06:00:00Z')
  expect(pencilled.notices()).toHaveLength(2)
  expect(pencilled.notices()[0]?.text).toContain('not firm any more')
})

test('another crew takes over: those off it hear so, those on it get their reminder at once', async () => {
  const { yard, booking, settle, notices } = await remindedYard()
  yard.setBooking(booking.id, { crewId: yard.otherCrew.id })
  await settle('2026-12-02T06:00:00Z')
  expect(yard.sentTo(yard.otherHand.email).map((mail) => mail.subject)).toEqual([
    'Thu 3 Dec, 07:00: 12 Kiln Road, Marrow Creek',
  ])
  expect(yard.sentTo(yard.lead.email)[1]?.text).toContain('you are not on it on Thu 3 Dec any more')
  expect(notices()).toHaveLength(3)
})

test('a new revision is told with its letter and its lengths', async () => {
  const { yard, dayId, settle, notices } = await remindedYard()
  const next = yard.addRevision(yard.job, 2, 30)
  yard.db.update(bookingDays).set({ revisionId: next.id }).where(eq(bookingDays.id, dayId)).run()
  await settle('2026-12-02T06:00:00Z')
  const common = next.spec.cutLines.find((line) => line.role === 'common')
  expect(notices()).toHaveLength(2)
  expect(notices()[0]?.text).toContain('Roof revision now B, was A')
  expect(notices()[0]?.text).toContain(`Cut length ${Math.round(common!.cutLengthMm)} mm`)
})

test('a line taken off the day is named', async () => {
  const { yard, dayId, settle, notices } = await remindedYard()
  const mine = yard.db.select().from(tasks).where(eq(tasks.bookingDayId, dayId)).all()
  const ridge = mine.find((task) => task.work === 'stand' && task.cutLineMark === 'R1')!
  yard.db.delete(tasks).where(eq(tasks.id, ridge.id)).run()
  await settle('2026-12-02T06:00:00Z')
  expect(notices()[0]?.text).toContain('Taken off: Stand R1')
})

test('ticks, assignments, shared lines and a new order of the day are no change to tell', async () => {
  const { yard, dayId, settle, notices } = await remindedYard()
  const mine = yard.db.select().from(tasks).where(eq(tasks.bookingDayId, dayId)).all()
  const first = mine.find((task) => task.quantity > 1)!
  yard.db
    .insert(ticks)
    .values({
      id: newId(),
      taskId: first.id,
      personId: yard.apprentice.id,
      delta: 1,
      at: yard.clock.current,
    })
    .run()
  const [one, ...rest] = first.memberMarks
  yard.db
    .update(tasks)
    .set({ assignedToId: yard.lead.id, memberMarks: rest, quantity: rest.length, position: 99 })
    .where(eq(tasks.id, first.id))
    .run()
  yard.db
    .insert(tasks)
    .values({
      ...first,
      id: newId(),
      position: 0,
      memberMarks: [one!],
      quantity: 1,
      assignedToId: yard.apprentice.id,
    })
    .run()
  await settle('2026-12-02T06:00:00Z')
  expect(notices()).toHaveLength(0)
})

test('a second change after a notice makes a second notice, of what differs from the first', async () => {
  const { yard, booking, settle, notices } = await remindedYard()
  yard.setBooking(booking.id, { startAt: '09:00' })
  await settle('2026-12-02T06:00:00Z')
  yard.setBooking(booking.id, { startAt: '10:00' })
  await settle('2026-12-02T07:00:00Z')
  expect(notices()).toHaveLength(4)
  expect(notices()[2]?.text).toContain('Start now 10:00, was 09:00')
  expect(yard.mailOf(`change:${yard.lead.id}:2026-12-03:2`)?.state).toBe('sent')
})

test('a change once work has started makes no notice', async () => {
  const { yard, booking, settle, notices } = await remindedYard()
  yard.setBooking(booking.id, { gear: 'Second ladder' })
  await settle('2026-12-02T21:00:00Z')
  expect(notices()).toHaveLength(0)
})

test('somebody put on leave after the reminder is told that the day is off; the others hear nothing', async () => {
  const { yard, settle, notices } = await remindedYard()
  yard.putOnLeave(yard.apprentice.id, '2026-12-03')
  await settle('2026-12-02T06:00:00Z')
  expect(notices().map((mail) => mail.to)).toEqual([yard.apprentice.email])
})
