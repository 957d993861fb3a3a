import { eq } from 'drizzle-orm'
import { expect, test } from 'vitest'
import type { RainOffList, RainOffPreview } from '../../shared/rain-offs/rain-off-schemas.ts'
import { jobs } from '../../server/db/tables/job-tables.ts'
import { milestones } from '../../server/db/tables/milestone-tables.ts'
import { leave } from '../../server/db/tables/people-tables.ts'
import { newId } from '../../server/lib/ids.ts'
import { bookingFirm, fri, mon, thu, tue, wed } from './booking-kit.ts'
import type { Agent } from './harness.ts'
import { calendarOf } from './rain-off-kit.ts'

const nextDay = new Date('2026-12-03T00:00:00Z')

type Firm = Awaited<ReturnType<typeof bookingFirm>>

/** Hill house Thu and Fri, Creek shed on Mon. */
async function wetFirm() {
  const firm = await bookingFirm()
  const hill = await firm.booked({ days: [thu, fri], state: 'firm' })
  const creek = await firm.booked({ jobId: firm.jobs.creekJob, days: [mon] })
  return { firm, hill, creek, lead: await firm.app.agentFor(firm.people.lead.email) }
}

async function preview({ officeAgent, crew }: Firm, query = `day=${thu}&days=1`) {
  const answer = await officeAgent.get(`/api/rain-offs/preview?crew=${crew.id}&${query}`)
  expect(answer.status).toBe(200)
  return answer.body as RainOffPreview
}

const seenOf = (shown: RainOffPreview) =>
  shown.moves.map(({ bookingId, version, daysAfter }) => ({ bookingId, version, daysAfter }))

async function make(firm: Firm, changes: Record<string, unknown> = {}) {
  const shown = await preview(firm)
  return firm.officeAgent.post('/api/rain-offs').send({
    clientId: newId(),
    crewId: firm.crew.id,
    fromDay: thu,
    workingDays: 1,
    useFreeDays: false,
    seen: seenOf(shown),
    ...changes,
  })
}

const list = async (agent: Agent) => (await agent.get('/api/rain-offs')).body as RainOffList
const firstOf = async (agent: Agent) => {
  const found = (await list(agent)).rainOffs[0]
  if (!found) throw new Error('no rain-off')
  return found
}

test('a wet Thursday is shown before anything moves: from where to where, whose customers, which deliveries', async () => {
  const { firm, hill, creek } = await wetFirm()
  const { db } = firm.app
  db.update(jobs).set({ customerName: 'Ines Holt' }).where(eq(jobs.id, firm.jobs.hillJob)).run()
  const timber = { kind: 'timber-on-site', state: 'promised', day: thu, broughtBy: 'Yard' } as const
  db.insert(milestones)
    .values({ id: newId(), jobId: firm.jobs.hillJob, ...timber, updatedAt: firm.app.clock.now() })
    .run()
  const before = calendarOf(firm)
  const shown = await preview(firm)
  expect(shown.lostDays).toEqual([thu])
  expect(shown.moves).toMatchObject([
    {
      bookingId: hill.id,
      customerName: 'Ines Holt',
      daysBefore: [thu, fri],
      daysAfter: [fri, mon],
      moved: [
        { from: thu, to: fri },
        { from: fri, to: mon },
      ],
      milestones: [timber],
    },
    { bookingId: creek.id, wantedBy: mon, daysAfter: [tue] },
  ])
  expect(calendarOf(firm)).toEqual(before)
})

test('what the new days knock into is said, and what stood in the way before is not said again', async () => {
  const { firm, hill, creek } = await wetFirm()
  const away = { id: newId(), personId: firm.people.lead.id, startsOn: mon, endsOn: mon }
  firm.app.db.insert(leave).values(away).run()
  const shown = await preview(firm)
  const codesOf = (id: string) =>
    shown.moves.find((move) => move.bookingId === id)?.clashes.map(({ code, day }) => [code, day])
  // Hill house gets Monday, when the leading hand is away; Creek shed had that Monday and leaves it.
  expect(codesOf(hill.id)).toEqual(
    expect.arrayContaining([
      ['apprentice-alone', mon],
      ['on-leave', mon],
    ]),
  )
  expect(codesOf(creek.id)).toEqual([])
})

test('all of it moves at once, and undone the same day every booking is back as it was', async () => {
  const { firm, hill, creek } = await wetFirm()
  const before = calendarOf(firm)
  const answer = await make(firm)
  expect(answer.status).toBe(201)
  const daysNow = (id: string) => calendarOf(firm).days.filter((row) => row.id === id)
  expect(
    daysNow(hill.id)
      .map((row) => row.day.day)
      .sort(),
  ).toEqual([fri, mon])
  expect(daysNow(creek.id).map((row) => row.day.day)).toEqual([tue])
  const row = await firstOf(firm.officeAgent)
  expect(row).toMatchObject({ state: 'made', movedBookings: 2, canUndo: true })
  const undo = `/api/rain-offs/${row.id}/undo`
  await firm.officeAgent.post(undo).send({ version: row.version }).expect(200)
  expect(calendarOf(firm)).toEqual(before)
  expect(await firstOf(firm.officeAgent)).toMatchObject({ state: 'undone', canUndo: false })
})

test('a booking changed since is named, and then nothing is undone', async () => {
  const { firm, creek } = await wetFirm()
  await make(firm)
  const row = await firstOf(firm.officeAgent)
  const now = (await firm.officeAgent.get(`/api/bookings/${creek.id}`)).body as { version: number }
  const change = { version: now.version, gear: 'Drop saw' }
  await firm.officeAgent.patch(`/api/bookings/${creek.id}`).send(change).expect(200)
  const before = calendarOf(firm)
  const answer = await firm.officeAgent
    .post(`/api/rain-offs/${row.id}/undo`)
    .send({ version: row.version })
  expect(answer.status).toBe(409)
  expect(answer.body).toMatchObject({
    message: expect.stringContaining('QR-2 has been changed since'),
    detail: { kind: 'moved-on', bookings: [{ bookingId: creek.id }] },
  })
  expect(calendarOf(firm)).toEqual(before)
})

test('a job booked since on a day that was left free is named too, and so is a day begun since', async () => {
  const { firm, hill } = await wetFirm()
  await make(firm)
  await firm.booked({ jobId: firm.jobs.bareJob, days: [thu] })
  const begun = firm.taskRows(hill.id).find((row) => row.day === mon)
  if (!begun) throw new Error('no task')
  const row = await firstOf(firm.officeAgent)
  const undo = () =>
    firm.officeAgent.post(`/api/rain-offs/${row.id}/undo`).send({ version: row.version })
  expect((await undo()).body).toMatchObject({
    message: expect.stringContaining('QR-1 would meet QR-3 on Thu 3 Dec'),
  })
  firm.tick(begun.task.id)
  expect((await undo()).body).toMatchObject({
    message: expect.stringContaining('QR-1 has been started on Mon 7 Dec'),
  })
})

test('on the day after it is no longer undone', async () => {
  const { firm } = await wetFirm()
  await make(firm)
  firm.app.clock.current = nextDay
  const row = await firstOf(firm.officeAgent)
  expect(row.canUndo).toBe(false)
  const answer = await firm.officeAgent
    .post(`/api/rain-offs/${row.id}/undo`)
    .send({ version: row.version })
  expect(answer.status).toBe(409)
})

test('what was not shown does not move: a booking made meanwhile refuses it', async () => {
  const { firm } = await wetFirm()
  const seen = seenOf(await preview(firm))
  await firm.booked({ jobId: firm.jobs.bareJob, days: [tue] })
  const before = calendarOf(firm)
  const answer = await make(firm, { seen })
  expect(answer.status).toBe(409)
  expect(answer.body).toMatchObject({ detail: { kind: 'calendar-changed' } })
  expect(calendarOf(firm)).toEqual(before)
})

test('pressed twice it moves once', async () => {
  const { firm } = await wetFirm()
  const clientId = newId()
  const seen = seenOf(await preview(firm))
  await make(firm, { clientId, seen })
  const after = calendarOf(firm)
  await make(firm, { clientId, seen })
  expect(calendarOf(firm)).toEqual(after)
  expect((await list(firm.officeAgent)).rainOffs).toHaveLength(1)
})

test('two jobs on one day on purpose stay together with the reason, there and back', async () => {
  const { firm } = await wetFirm()
  const said = { jobId: firm.jobs.bareJob, days: [fri], clashReason: 'Two of them finish by noon' }
  const bare = await firm.booked(said)
  const before = calendarOf(firm)
  await make(firm)
  const moved = calendarOf(firm).days.filter((row) => row.id === bare.id)
  expect(moved).toMatchObject([{ day: { day: mon }, clashReason: said.clashReason }])
  const row = await firstOf(firm.officeAgent)
  const undo = `/api/rain-offs/${row.id}/undo`
  await firm.officeAgent.post(undo).send({ version: row.version }).expect(200)
  expect(calendarOf(firm)).toEqual(before)
})

test('a day begun before the rain stays, and its booking gets a day for what is left', async () => {
  const { firm, hill } = await wetFirm()
  firm.app.clock.current = nextDay
  const first = firm.taskRows(hill.id)[0]
  if (!first) throw new Error('no task')
  firm.tick(first.task.id)
  const shown = await preview(firm)
  expect(shown.stays).toEqual([{ bookingId: hill.id, job: 'QR-1', day: thu }])
  expect(shown.moves[0]).toMatchObject({
    daysAfter: [thu, fri, mon],
    moved: [{ from: fri, to: mon }],
    added: [{ from: thu, to: fri }],
  })
  const before = calendarOf(firm)
  expect((await make(firm)).status).toBe(201)
  const row = await firstOf(firm.officeAgent)
  const undo = `/api/rain-offs/${row.id}/undo`
  await firm.officeAgent.post(undo).send({ version: row.version }).expect(200)
  expect(calendarOf(firm)).toEqual(before)
})

test('a leading hand asks for own crew, the office sees who and makes it, and the asker sees that', async () => {
  const { firm, lead } = await wetFirm()
  const asked = { clientId: newId(), crewId: firm.crew.id, fromDay: thu, workingDays: 1 }
  await lead
    .post('/api/rain-offs/asked')
    .send({ ...asked, reason: 'Plates under water' })
    .expect(201)
  const row = await firstOf(firm.officeAgent)
  expect(row).toMatchObject({
    state: 'asked',
    askedBy: 'Tamsin Rook',
    reason: 'Plates under water',
    fromDay: thu,
  })
  const answer = await make(firm, { asked: { id: row.id, version: row.version } })
  expect(answer.status).toBe(201)
  expect(await firstOf(lead)).toMatchObject({
    id: row.id,
    state: 'made',
    settledBy: 'Orla Brandt',
    isMine: true,
    canUndo: false,
  })
})

test('the same day is asked for once, and taken back by who asked while it waits', async () => {
  const { firm, lead } = await wetFirm()
  const ask = () =>
    lead
      .post('/api/rain-offs/asked')
      .send({ clientId: newId(), crewId: firm.crew.id, fromDay: thu, workingDays: 1 })
  await ask().expect(201)
  expect((await ask()).body).toMatchObject({
    message: 'Tamsin Rook has asked for Thu 3 Dec already. The office has it.',
  })
  const row = await firstOf(lead)
  const back = `/api/rain-offs/${row.id}/withdraw`
  await firm.officeAgent.post(back).send({ version: row.version }).expect(404)
  await lead.post(back).send({ version: row.version }).expect(200)
  expect(await firstOf(lead)).toMatchObject({ state: 'declined', takenBack: true })
})

test('a no is told to who asked, and can be taken back', async () => {
  const { firm, lead } = await wetFirm()
  const asked = { clientId: newId(), crewId: firm.crew.id, fromDay: thu, workingDays: 2 }
  await lead.post('/api/rain-offs/asked').send(asked).expect(201)
  const row = await firstOf(firm.officeAgent)
  const at = `/api/rain-offs/${row.id}`
  await firm.officeAgent.post(`${at}/decline`).send({ version: row.version }).expect(200)
  const declined = await firstOf(lead)
  expect(declined).toMatchObject({ state: 'declined', takenBack: false, settledBy: 'Orla Brandt' })
  await firm.officeAgent.post(`${at}/reopen`).send({ version: declined.version }).expect(200)
  expect(await firstOf(lead)).toMatchObject({ state: 'asked', settledBy: null })
})

test('a leading hand neither asks for another crew nor sees what it asked', async () => {
  const { firm, lead } = await wetFirm()
  const other = await firm.app.agentFor(firm.people.otherLead.email)
  const asked = { clientId: newId(), crewId: firm.otherCrew.id, fromDay: thu, workingDays: 1 }
  await lead.post('/api/rain-offs/asked').send(asked).expect(404)
  await other.post('/api/rain-offs/asked').send(asked).expect(201)
  expect((await list(lead)).rainOffs).toEqual([])
  expect((await list(lead)).crews.map((crew) => crew.id)).toEqual([firm.crew.id])
})

test('a crew with nothing booked from that day on has nothing to move', async () => {
  const { firm } = await wetFirm()
  const shown = await preview(firm, `day=${wed}&days=1&free=use`)
  expect(shown.moves).toEqual([])
  const answer = await make(firm, { crewId: firm.otherCrew.id, seen: [] })
  expect(answer.status).toBe(409)
})
