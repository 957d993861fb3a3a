import { eq } from 'drizzle-orm'
import { expect, test } from 'vitest'
import { bookingDays } from '../../server/db/tables/booking-tables.ts'
import { dayLogs } from '../../server/db/tables/day-log-tables.ts'
import { crews } from '../../server/db/tables/people-tables.ts'
import { newId } from '../../server/lib/ids.ts'
import { dayPlus } from '../../shared/calendar/days.ts'
import { bookingFirm, mon, thu, wed } from './booking-kit.ts'
import { crewOnSite, days } from './day-sheet-kit.ts'

type Site = Awaited<ReturnType<typeof crewOnSite>>

async function siteWithLog() {
  const site = await crewOnSite()
  const lead = await site.app.agentFor(site.people.lead.email)
  const office = await site.app.agentFor(site.people.office.email)
  const address = `/api/day-sheets/${site.dayIds.wednesday}/log`
  return { site, lead, office, address }
}

const logOf = ({ people }: Site, changes: Record<string, unknown> = {}) => ({
  version: 0,
  done: 'Plates set out.',
  remarks: '',
  people: [{ personId: people.lead.id, turnedUp: true, minutes: 480 }],
  delays: [],
  ...changes,
})

test('what the office corrected the day after stays as the office put it', async () => {
  const { site, lead, office, address } = await siteWithLog()
  await lead.put(address).send(logOf(site)).expect(200)
  site.app.clock.current = new Date('2026-12-03T00:00:00Z')
  const byOffice = logOf(site, { version: 1, done: 'By phone' })
  await office.put(address).send(byOffice).expect(200)
  const late = logOf(site, { version: 2, done: 'From site after all' })
  await lead.put(address).send(late).expect(409)
  await lead.delete(`${address}?version=2`).expect(409)
  const { body } = await lead.get(address).expect(200)
  expect(body.closedBecause).toBe('Closed on Wed 2 Dec. Ask the office to correct it.')
  expect(body.log).toMatchObject({ version: 2, done: 'By phone' })
})

test('a correction of a log that was taken back and written anew is refused as stale', async () => {
  const { site, lead, office, address } = await siteWithLog()
  await lead.put(address).send(logOf(site)).expect(200)
  await office.delete(`${address}?version=1`).expect(200)
  const anew = logOf(site, { done: 'By the office' })
  const { body } = await office.put(address).send(anew).expect(200)
  expect(body.log.version).toBe(2)
  await lead
    .put(address)
    .send(logOf(site, { version: 1, done: 'Of the first one' }))
    .expect(409)
  await lead.delete(`${address}?version=1`).expect(409)
  const again = await office.put(address).send(anew).expect(200)
  expect(again.body.log).toMatchObject({ version: 2, done: 'By the office' })
})

test('a log kept on the phone while its day was moved is not put down for the new day', async () => {
  const { site, lead, address } = await siteWithLog()
  const tomorrow = '2026-12-04'
  site.app.db
    .update(bookingDays)
    .set({ day: tomorrow })
    .where(eq(bookingDays.id, site.dayIds.wednesday))
    .run()
  site.app.clock.current = new Date(`${tomorrow}T06:00:00Z`)
  const kept = logOf(site, { day: days.wednesday })
  const { body } = await lead.put(address).send(kept).expect(409)
  expect(body.message).toContain('Wed 2 Dec')
  expect(body.message).toContain('Fri 4 Dec')
  expect(site.app.db.select().from(dayLogs).all()).toEqual([])
  await lead
    .put(address)
    .send({ ...kept, day: tomorrow })
    .expect(200)
})

test('a variation’s id that another job has is refused, not an error of ours', async () => {
  const { jobs, officeAgent } = await bookingFirm()
  const variation = { id: newId(), reason: 'Skylight trimmed in', price: '450' }
  await officeAgent.post(`/api/jobs/${jobs.hillJob}/variations`).send(variation).expect(201)
  await officeAgent.post(`/api/jobs/${jobs.creekJob}/variations`).send(variation).expect(409)
})

test('a cancelled booking does not come back onto a crew that was stood down since', async () => {
  const { app, officeAgent, booked, otherCrew } = await bookingFirm()
  const booking = await booked({ crewId: otherCrew.id, days: [thu], startsOn: undefined })
  const { body } = await officeAgent
    .post(`/api/bookings/${booking.id}/cancel`)
    .send({ version: booking.version })
    .expect(200)
  app.db.update(crews).set({ active: false }).where(eq(crews.id, otherCrew.id)).run()
  const restore = { version: body.version as number }
  const refused = await officeAgent
    .post(`/api/bookings/${booking.id}/restore`)
    .send(restore)
    .expect(400)
  expect(refused.body.issues[0].path).toBe('crewId')
})

test('a rain-off sent again with other days does not pass for made', async () => {
  const { officeAgent, booked, crew } = await bookingFirm()
  await booked({ days: [wed, thu], startsOn: undefined })
  const previewOf = async (workingDays: number) => {
    const query = `crew=${crew.id}&day=${wed}&days=${workingDays}`
    const { body } = await officeAgent.get(`/api/rain-offs/preview?${query}`).expect(200)
    const moves = body.moves as { bookingId: string; version: number; daysAfter: string[] }[]
    return moves.map(({ bookingId, version, daysAfter }) => ({ bookingId, version, daysAfter }))
  }
  const clientId = newId()
  const make = async (workingDays: number) => ({
    clientId,
    crewId: crew.id,
    fromDay: wed,
    workingDays,
    useFreeDays: false,
    seen: await previewOf(workingDays),
  })
  const first = await make(1)
  await officeAgent.post('/api/rain-offs').send(first).expect(201)
  await officeAgent.post('/api/rain-offs').send(first).expect(201)
  await officeAgent
    .post('/api/rain-offs')
    .send(await make(2))
    .expect(409)
  const { body } = await officeAgent.get('/api/rain-offs').expect(200)
  const made = body.rainOffs[0] as { id: string; version: number }
  const undo = { version: made.version }
  await officeAgent.post(`/api/rain-offs/${made.id}/undo`).send(undo).expect(200)
  await officeAgent.post('/api/rain-offs').send(first).expect(409)
})

test('what one crew asked for is not answered by moving another', async () => {
  const { app, officeAgent, booked, crew, otherCrew, people } = await bookingFirm()
  await booked({ crewId: otherCrew.id, days: [thu], startsOn: undefined })
  const lead = await app.agentFor(people.lead.email)
  const clientId = newId()
  const asked = { clientId, crewId: crew.id, fromDay: thu, workingDays: 1 }
  await lead.post('/api/rain-offs/asked').send(asked).expect(201)
  const query = `crew=${otherCrew.id}&day=${thu}&days=1`
  const { body } = await officeAgent.get(`/api/rain-offs/preview?${query}`).expect(200)
  const moves = body.moves as { bookingId: string; version: number; daysAfter: string[] }[]
  const make = {
    clientId: newId(),
    asked: { id: clientId, version: 1 },
    crewId: otherCrew.id,
    fromDay: thu,
    workingDays: 1,
    useFreeDays: false,
    seen: moves.map(({ bookingId, version, daysAfter }) => ({ bookingId, version, daysAfter })),
  }
  const refused = await officeAgent.post('/api/rain-offs').send(make).expect(400)
  expect(refused.body.issues[0].path).toBe('crewId')
  const list = await lead.get('/api/rain-offs').expect(200)
  expect(list.body.rainOffs).toMatchObject([{ id: clientId, state: 'asked', version: 1 }])
})

test('many bookings changed at once are answered for together, not one by one', async () => {
  const firm = await bookingFirm()
  const { sqlite } = firm.app.database
  const many = Array.from({ length: 20 }, (_, i) => {
    const jobId = firm.kit.addJob({ number: `X-${i}` })
    return firm.kit.addBooking(jobId, firm.crew.id, [dayPlus(mon, i)], 'pencilled').id
  })
  const prepare = sqlite.prepare.bind(sqlite)
  const queriesOf = async (ids: string[], gear: string, version: number): Promise<number> => {
    let count = 0
    sqlite.prepare = ((source: string) => {
      count++
      return prepare(source)
    }) as typeof sqlite.prepare
    const changes = ids.map((bookingId) => ({ bookingId, version, gear }))
    const { body } = await firm.officeAgent
      .post('/api/bookings/changes')
      .send({ changes })
      .expect(200)
    sqlite.prepare = prepare
    expect(body.bookings.map((one: { id: string }) => one.id)).toEqual(ids)
    return count
  }
  const two = await queriesOf(many.slice(0, 2).reverse(), 'Ladder', 1)
  const others = await queriesOf(many.slice(2), 'Ladder', 1)
  // Sixteen more: each is read, checked, planned and written; not looked up for its answer too.
  expect((others - two) / 16).toBeLessThan(25)
})

test('closures of a whole century are refused, since every screen counts working days by them', async () => {
  const { officeAgent } = await bookingFirm()
  const { body } = await officeAgent.get('/api/firm').expect(200)
  const closure = (year: number) => ({
    day: `${year}-01-01`,
    lastDay: `${year}-04-20`,
    name: 'Shut',
  })
  const closures = (count: number) => Array.from({ length: count }, (_, i) => closure(2030 + i))
  const refused = await officeAgent
    .put('/api/firm')
    .send({ ...body, ownClosedDays: closures(100) })
    .expect(400)
  expect(refused.body.issues[0].path).toBe('ownClosedDays')
  await officeAgent
    .put('/api/firm')
    .send({ ...body, ownClosedDays: closures(5) })
    .expect(200)
})
