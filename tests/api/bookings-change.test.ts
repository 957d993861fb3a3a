import { eq } from 'drizzle-orm'
import { expect, test } from 'vitest'
import {
  type Booking,
  type CalendarBooking,
  calendarSchema,
} from '../../shared/bookings/calendar-schemas.ts'
import { audit } from '../../server/db/tables/audit-tables.ts'
import { bookings, tasks } from '../../server/db/tables/booking-tables.ts'
import { partOf, stepOf } from '../../src/features/calendar/booking-steps.ts'
import { bodyOf } from '../../src/features/calendar/step-bodies.ts'
import { bookingFirm, daysOf, fri, mon, sat, thu, tue, wed } from './booking-kit.ts'

type Firm = Awaited<ReturnType<typeof bookingFirm>>

const change = (firm: Firm, booking: Booking | CalendarBooking, body: Record<string, unknown>) =>
  firm.officeAgent.patch(`/api/bookings/${booking.id}`).send({ version: booking.version, ...body })
const rowOf = (firm: Firm, id: string) =>
  firm.app.db.select().from(bookings).where(eq(bookings.id, id)).get()!

test('moving a day takes the days after it along over the weekend, and leaves those before', async () => {
  const firm = await bookingFirm()
  const booking = await firm.booked({ days: [wed, thu, fri] })
  const moved = await change(firm, booking, { move: { from: thu, to: fri } }).expect(200)
  expect(daysOf(moved.body)).toEqual([wed, fri, mon])
  expect(moved.body.version).toBe(booking.version + 1)
})

test('a move raises the calendar sequence and keeps the uid; gear alone raises only the version', async () => {
  const firm = await bookingFirm()
  const booking = await firm.booked()
  const before = rowOf(firm, booking.id)
  const moved = await change(firm, booking, { move: { from: thu, to: mon } }).expect(200)
  expect(rowOf(firm, booking.id)).toMatchObject({ uid: before.uid, sequence: 1 })
  await change(firm, moved.body, { gear: 'Nail guns' }).expect(200)
  expect(rowOf(firm, booking.id)).toMatchObject({ sequence: 1, version: 3, gear: 'Nail guns' })
})

test('a change that changes nothing leaves the version alone', async () => {
  const firm = await bookingFirm()
  const booking = await firm.booked()
  const same = await change(firm, booking, { days: [fri, thu], state: 'pencilled' }).expect(200)
  expect(same.body.version).toBe(booking.version)
})

test('a stale change is refused with both versions', async () => {
  const firm = await bookingFirm()
  const booking = await firm.booked()
  await change(firm, booking, { gear: 'Crane' }).expect(200)
  const stale = await change(firm, booking, { gear: 'Nail guns' }).expect(409)
  expect(stale.body.detail).toMatchObject({
    kind: 'stale',
    current: { gear: 'Crane', version: 2 },
    sent: { gear: 'Nail guns', version: 1 },
  })
  expect(rowOf(firm, booking.id).gear).toBe('Crane')
})

test('undo is a change back, refused when somebody changed the booking meanwhile', async () => {
  const firm = await bookingFirm()
  const booking = await firm.booked()
  const moved = await change(firm, booking, { move: { from: thu, to: mon } }).expect(200)
  expect(daysOf(moved.body)).toEqual([mon, tue])
  const back = await change(firm, moved.body, { days: daysOf(booking) }).expect(200)
  expect(daysOf(back.body)).toEqual([thu, fri])
  await change(firm, moved.body, { days: daysOf(booking) }).expect(409)
})

test('another crew, other days and firm in one go; the days are planned by its hours', async () => {
  const firm = await bookingFirm()
  const booking = await firm.booked()
  const changed = await change(firm, booking, {
    crewId: firm.otherCrew.id,
    days: [thu, fri, mon, tue],
    state: 'firm',
    startAt: '06:15',
  }).expect(200)
  expect(changed.body).toMatchObject({ state: 'firm', startAt: '06:15', shortMinutes: 0 })
  expect(changed.body.days[0]).toMatchObject({ availableMinutes: 480, peopleThere: 1 })
})

test('moving onto a day the crew is booked is refused with the reason, and done on purpose', async () => {
  const firm = await bookingFirm()
  await firm.booked({ startsOn: mon })
  const creek = await firm.booked({ jobId: firm.jobs.creekJob, startsOn: thu })
  const refused = await change(firm, creek, { move: { from: fri, to: tue } }).expect(409)
  expect(refused.body.detail.clashes).toEqual([
    { code: 'crew-twice', day: tue, text: 'Tue 8 Dec: Plumb crew is on QR-1 Hill house.' },
  ])
  expect(daysOf((await firm.officeAgent.get(`/api/bookings/${creek.id}`)).body)).toEqual([thu, fri])
  const meant = await change(firm, creek, {
    move: { from: fri, to: tue },
    clashReason: 'Same street',
  }).expect(200)
  expect(daysOf(meant.body)).toEqual([thu, tue])
  // Settled once, it is not asked again for another change of the same days.
  await change(firm, meant.body, { gear: 'Crane' }).expect(200)
})

test('a day dragged off one that two jobs share on purpose goes back there by Undo, reason and all', async () => {
  const firm = await bookingFirm()
  await firm.booked({ startsOn: mon })
  const said = { startsOn: thu, days: [thu, mon], clashReason: 'Same street' }
  const creek = await firm.booked({ jobId: firm.jobs.creekJob, ...said, startsOn: undefined })
  const calendar = await firm.officeAgent.get(`/api/calendar?from=${wed}&to=${tue}`).expect(200)
  const before = calendarSchema.parse(calendar.body).bookings.find((one) => one.id === creek.id)!
  expect(before.clashReason).toBe('Same street')
  const dragged = await change(firm, before, { move: { from: mon, to: fri } }).expect(200)
  expect(dragged.body).toMatchObject({ allDays: [thu, fri], clashReason: null })
  const step = stepOf('Creek shed moved', partOf(before, { days: [thu, fri], clashReason: null }))
  const undo = bodyOf(step, 'back', { versionOf: () => dragged.body.version, said: null })
  const back = await firm.officeAgent.post('/api/bookings/changes').send(undo).expect(200)
  expect(back.body.bookings[0]).toMatchObject({ allDays: [thu, mon], clashReason: 'Same street' })
})

test('moving onto a day not worked is refused until it is said on purpose', async () => {
  const firm = await bookingFirm()
  const booking = await firm.booked()
  const refused = await change(firm, booking, { move: { from: fri, to: sat } }).expect(409)
  expect(refused.body.detail.clashes[0]).toMatchObject({ code: 'day-not-worked', day: sat })
  const meant = await change(firm, booking, {
    move: { from: fri, to: sat },
    evenIfNotWorked: true,
  }).expect(200)
  expect(daysOf(meant.body)).toEqual([thu, sat])
})

test('a worked day is not moved, dropped, cancelled or given to another crew', async () => {
  const firm = await bookingFirm()
  const booking = await firm.booked({ startsOn: wed })
  expect(daysOf(booking)).toEqual([wed, thu])
  firm.tick(firm.taskRows(booking.id)[0]!.task.id)
  const dropped = await change(firm, booking, { days: [thu, fri] }).expect(409)
  expect(dropped.body.message).toContain('Wed 2 Dec has been worked')
  await change(firm, booking, { move: { from: wed, to: fri } }).expect(409)
  await change(firm, booking, { crewId: firm.otherCrew.id }).expect(409)
  await firm.officeAgent.post(`/api/bookings/${booking.id}/cancel`).send({ version: 1 }).expect(409)
  const ahead = await change(firm, booking, { move: { from: thu, to: fri } }).expect(200)
  expect(daysOf(ahead.body)).toEqual([wed, fri])
  expect(ahead.body.days[0].worked).toBe(true)
})

test('a cancelled booking is kept, frees its days, and comes back when they are still free', async () => {
  const firm = await bookingFirm()
  const booking = await firm.booked()
  const url = `/api/bookings/${booking.id}`
  const cancelled = await firm.officeAgent.post(`${url}/cancel`).send({ version: 1 }).expect(200)
  expect(cancelled.body).toMatchObject({ cancelled: true, version: 2 })
  await change(firm, cancelled.body, { gear: 'Crane' }).expect(409)
  const calendar = await firm.officeAgent.get(`/api/calendar?from=${wed}&to=${tue}`)
  expect(calendar.body.bookings).toEqual([])
  await firm.officeAgent.post(`${url}/restore`).send({ version: 1 }).expect(409)
  const restored = await firm.officeAgent.post(`${url}/restore`).send({ version: 2 }).expect(200)
  expect(restored.body).toMatchObject({ cancelled: false, version: 3 })
  expect(daysOf(restored.body)).toEqual([thu, fri])
  const again = await firm.officeAgent.post(`${url}/cancel`).send({ version: 3 }).expect(200)
  await firm.booked({ jobId: firm.jobs.creekJob })
  const taken = await firm.officeAgent.post(`${url}/restore`).send({ version: 4 }).expect(409)
  expect(taken.body.message).toContain('QR-2 Creek shed')
  const meant = await firm.officeAgent
    .post(`${url}/restore`)
    .send({ version: again.body.version, clashReason: 'Both small' })
    .expect(200)
  // What was said on purpose once holds when that cancellation is undone.
  const dropped = await firm.officeAgent
    .post(`${url}/cancel`)
    .send({ version: meant.body.version })
    .expect(200)
  const back = await firm.officeAgent
    .post(`${url}/restore`)
    .send({ version: dropped.body.version })
    .expect(200)
  expect(back.body).toMatchObject({ cancelled: false, clashReason: 'Both small' })
})

test('each change is in the audit with who made it', async () => {
  const firm = await bookingFirm()
  const booking = await firm.booked()
  await change(firm, booking, { move: { from: thu, to: mon } }).expect(200)
  await firm.officeAgent.post(`/api/bookings/${booking.id}/cancel`).send({ version: 2 }).expect(200)
  const entries = firm.app.db.select().from(audit).where(eq(audit.entityId, booking.id)).all()
  expect(entries.map((e) => e.action)).toEqual([
    'booking.created',
    'booking.changed',
    'booking.cancelled',
  ])
  expect(entries.every((e) => e.personId === firm.people.office.id)).toBe(true)
})

test.each([
  [{ version: 0 }, 'version'],
  [{ crewId: '3f1c9a34-7f59-4c2b-9a53-0b1f4f0f9d11' }, 'crewId'],
  [{ move: { from: mon, to: tue } }, 'move.from'],
  [{ move: { from: thu, to: 'later' } }, 'move.to'],
  [{ days: [] }, 'days'],
  [{ startAt: '25:00' }, 'startAt'],
  [{ jobId: '3f1c9a34-7f59-4c2b-9a53-0b1f4f0f9d11' }, 'jobId'],
])('a change with %j is refused at its field and leaves the booking alone', async (body, path) => {
  const firm = await bookingFirm()
  const booking = await firm.booked()
  const answer = await change(firm, booking, body).expect(400)
  expect(answer.body.issues.map((issue: { path: string }) => issue.path)).toContain(path)
  expect(rowOf(firm, booking.id).version).toBe(1)
})

test('a person given a task keeps it when its day moves, unless they are not in the crew', async () => {
  const firm = await bookingFirm()
  const booking = await firm.booked()
  const hips = firm.taskRows(booking.id).find((r) => r.task.packageKey === 'creepers')!
  const { id: apprenticeId } = firm.people.apprentice
  firm.app.db
    .update(tasks)
    .set({ assignedToId: apprenticeId })
    .where(eq(tasks.id, hips.task.id))
    .run()
  const moved = await change(firm, booking, { move: { from: thu, to: mon } }).expect(200)
  const after = firm.taskRows(booking.id).filter((r) => r.task.assignedToId === apprenticeId)
  expect(after.map((r) => r.task.cutLineMark)).toContain(hips.task.cutLineMark)
  await change(firm, moved.body, { crewId: firm.otherCrew.id }).expect(200)
  expect(firm.taskRows(booking.id).every((r) => r.task.assignedToId === null)).toBe(true)
})
