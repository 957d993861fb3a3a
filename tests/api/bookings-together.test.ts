import { eq } from 'drizzle-orm'
import { expect, test } from 'vitest'
import type { Booking } from '../../shared/bookings/calendar-schemas.ts'
import { bookings } from '../../server/db/tables/booking-tables.ts'
import { newId } from '../../server/lib/ids.ts'
import { bookingFirm, daysOf, fri, mon, sat, thu, tue, wed } from './booking-kit.ts'

type Firm = Awaited<ReturnType<typeof bookingFirm>>
type Body = { changes?: Record<string, unknown>[]; create?: Record<string, unknown>[] }

const send = (firm: Firm, body: Body) => firm.officeAgent.post('/api/bookings/changes').send(body)
const of = (booking: Booking, more: Record<string, unknown> = {}) => ({
  bookingId: booking.id,
  version: booking.version,
  ...more,
})
const read = async (firm: Firm, id: string): Promise<Booking> =>
  (await firm.officeAgent.get(`/api/bookings/${id}`).expect(200)).body
const placed = (all: Booking[]) => all.map((b) => [b.crew.id, daysOf(b), b.version])

test('two bookings of one crew change places in one go', async () => {
  const firm = await bookingFirm()
  const hill = await firm.booked({ days: [thu, fri] })
  const creek = await firm.booked({ jobId: firm.jobs.creekJob, days: [mon, tue] })
  const answer = await send(firm, {
    changes: [of(hill, { days: [mon, tue] }), of(creek, { days: [thu, fri] })],
  }).expect(200)
  expect(placed(answer.body.bookings)).toEqual([
    [firm.crew.id, [mon, tue], 2],
    [firm.crew.id, [thu, fri], 2],
  ])
  expect(answer.body.bookings.every((b: Booking) => b.clashReason === null)).toBe(true)
})

test('two crews change jobs in one go', async () => {
  const firm = await bookingFirm()
  const hill = await firm.booked({ days: [thu, fri] })
  const creek = await firm.booked({
    jobId: firm.jobs.creekJob,
    crewId: firm.otherCrew.id,
    days: [thu, fri],
  })
  const answer = await send(firm, {
    changes: [of(hill, { crewId: firm.otherCrew.id }), of(creek, { crewId: firm.crew.id })],
  }).expect(200)
  expect(placed(answer.body.bookings)).toEqual([
    [firm.otherCrew.id, [thu, fri], 2],
    [firm.crew.id, [thu, fri], 2],
  ])
})

test('a booking is split at a day: the second part is a booking of its own and the work goes on in it', async () => {
  const firm = await bookingFirm()
  const whole = await firm.booked()
  expect(daysOf(whole)).toEqual([thu, fri])
  const secondId = newId()
  const second = { clientId: secondId, jobId: whole.job.id, crewId: firm.otherCrew.id }
  const answer = await send(firm, {
    changes: [of(whole, { days: [thu] })],
    create: [{ ...second, days: [fri, mon, tue], state: 'pencilled' }],
  }).expect(200)
  const [first, made] = answer.body.bookings as [Booking, Booking]
  expect([daysOf(first), daysOf(made)]).toEqual([[thu], [fri, mon, tue]])
  const tasksOf = (b: Booking) => b.days.flatMap((d) => d.tasks).length
  expect([tasksOf(first) > 0, tasksOf(made) > 0]).toEqual([true, true])
  // Undo: the part made is taken off, the first has its days again; redo puts it back.
  const back = await send(firm, {
    changes: [of(first, { days: [thu, fri] }), of(made, { cancelled: true })],
  }).expect(200)
  const [undone, gone] = back.body.bookings as [Booking, Booking]
  expect([daysOf(undone), gone.cancelled]).toEqual([[thu, fri], true])
  const again = await send(firm, {
    changes: [of(undone, { days: [thu] }), of(gone, { cancelled: false })],
  }).expect(200)
  expect(again.body.bookings[1]).toMatchObject({ cancelled: false, allDays: [fri, mon, tue] })
})

test('one stale version refuses all, names it with both versions, and nothing is written', async () => {
  const firm = await bookingFirm()
  const hill = await firm.booked({ days: [thu, fri] })
  const creek = await firm.booked({ jobId: firm.jobs.creekJob, days: [mon, tue] })
  await send(firm, { changes: [of(creek, { state: 'firm' })] }).expect(200)
  const stale = await send(firm, {
    changes: [of(hill, { days: [mon, tue] }), of(creek, { days: [thu, fri] })],
    create: [
      {
        clientId: newId(),
        jobId: firm.jobs.hillJob,
        crewId: firm.crew.id,
        days: [wed],
        state: 'firm',
      },
    ],
  }).expect(409)
  expect(stale.body.detail).toMatchObject({
    kind: 'stale',
    current: { id: creek.id, version: 2, state: 'firm', allDays: [mon, tue] },
    sent: { bookingId: creek.id, version: 1, days: [thu, fri] },
  })
  expect(placed([await read(firm, hill.id)])).toEqual([[firm.crew.id, [thu, fri], 1]])
  expect(firm.app.db.select().from(bookings).all()).toHaveLength(2)
})

test('clashes with bookings that stay are all named at once, and nothing is written', async () => {
  const firm = await bookingFirm()
  await firm.booked({ days: [tue] })
  const creek = await firm.booked({ jobId: firm.jobs.creekJob, days: [thu, fri] })
  const refused = await send(firm, { changes: [of(creek, { days: [sat, tue] })] }).expect(409)
  expect(
    refused.body.detail.clashes.map((c: { code: string; day: string }) => [c.code, c.day]),
  ).toEqual([
    ['crew-twice', tue],
    ['day-not-worked', sat],
  ])
  expect(daysOf(await read(firm, creek.id))).toEqual([thu, fri])
  const meant = await send(firm, {
    changes: [of(creek, { days: [sat, tue], clashReason: 'Same street', evenIfNotWorked: true })],
  }).expect(200)
  expect(meant.body.bookings[0]).toMatchObject({ allDays: [sat, tue], clashReason: 'Same street' })
})

test('two bookings moved onto one day of one crew in one go clash with each other', async () => {
  const firm = await bookingFirm()
  const hill = await firm.booked({ days: [thu] })
  const creek = await firm.booked({ jobId: firm.jobs.creekJob, days: [fri] })
  const refused = await send(firm, {
    changes: [of(hill, { days: [mon] }), of(creek, { days: [mon] })],
  }).expect(409)
  expect(refused.body.detail.kind).toBe('clash')
  expect(refused.body.message).toContain('QR-1 Hill house')
  expect(refused.body.message).toContain('QR-2 Creek shed')
})

test('a worked day stays in a change of several as in a change of one', async () => {
  const firm = await bookingFirm()
  const hill = await firm.booked({ startsOn: wed })
  firm.tick(firm.taskRows(hill.id)[0]!.task.id)
  const answer = await send(firm, { changes: [of(hill, { days: [thu, fri] })] }).expect(409)
  expect(answer.body.message).toContain('Wed 2 Dec has been worked')
  await send(firm, { changes: [of(hill, { cancelled: true })] }).expect(409)
})

test('one of several may be moved from a day on, laid by the server over days off', async () => {
  const firm = await bookingFirm()
  const hill = await firm.booked({ days: [thu, fri] })
  const answer = await send(firm, {
    changes: [of(hill, { move: { from: thu, to: fri } })],
  }).expect(200)
  expect(daysOf(answer.body.bookings[0])).toEqual([fri, mon])
})

test('the same send again makes no second booking', async () => {
  const firm = await bookingFirm()
  const one = {
    clientId: newId(),
    jobId: firm.jobs.hillJob,
    crewId: firm.crew.id,
    days: [thu, fri],
    state: 'pencilled',
  }
  await send(firm, { create: [one] }).expect(200)
  const again = await send(firm, { create: [one] }).expect(200)
  expect(again.body.bookings[0]).toMatchObject({ id: one.clientId, version: 1 })
  const rows = firm.app.db.select().from(bookings).where(eq(bookings.jobId, one.jobId)).all()
  expect(rows).toHaveLength(1)
})

test.each([
  ['nothing at all', () => ({}), 'changes'],
  ['one booking twice', (b: Booking) => ({ changes: [of(b), of(b)] }), 'changes'],
  ['no version', (b: Booking) => ({ changes: [{ bookingId: b.id }] }), 'changes.0.version'],
  [
    'a booking to make without days',
    (b: Booking) => ({
      create: [
        { clientId: newId(), jobId: b.job.id, crewId: b.crew.id, startsOn: mon, state: 'firm' },
      ],
    }),
    'create.0.days',
  ],
  [
    'a crew that is not there',
    (b: Booking) => ({ changes: [of(b, { crewId: newId() })] }),
    'crewId',
  ],
])('%s is refused at its field', async (_what, bodyOf, path) => {
  const firm = await bookingFirm()
  const hill = await firm.booked()
  const answer = await send(firm, bodyOf(hill)).expect(400)
  expect(answer.body.issues.map((issue: { path: string }) => issue.path)).toContain(path)
})

test('only the office changes bookings; a booking that is not there is not found', async () => {
  const firm = await bookingFirm()
  const hill = await firm.booked()
  const lead = await firm.app.agentFor(firm.people.lead.email)
  await lead
    .post('/api/bookings/changes')
    .send({ changes: [of(hill, { days: [mon] })] })
    .expect(403)
  await send(firm, { changes: [{ bookingId: newId(), version: 1, days: [mon] }] }).expect(404)
})
