import { eq } from 'drizzle-orm'
import { expect, test } from 'vitest'
import { readBookedDays } from '../../server/bookings/booking-store.ts'
import { readStage } from '../../server/jobs/job-board-store.ts'
import { audit } from '../../server/db/tables/audit-tables.ts'
import { dayLogs } from '../../server/db/tables/day-log-tables.ts'
import { people } from '../../server/db/tables/people-tables.ts'
import { crewOnSite, days } from './day-sheet-kit.ts'

type Site = Awaited<ReturnType<typeof crewOnSite>>

/** Everybody there for eight hours, two of them lost to rain. */
function wetDay({ people: crew }: Site, changes: Record<string, unknown> = {}) {
  return {
    version: 0,
    done: 'Plates set out, first pair tried.',
    remarks: '',
    people: [
      { personId: crew.lead.id, turnedUp: true, minutes: 480 },
      { personId: crew.apprentice.id, turnedUp: true, minutes: 450 },
    ],
    delays: [{ reason: 'weather', note: 'Heavy rain from ten', lostMinutes: 120 }],
    ...changes,
  }
}

async function onSite() {
  const site = await crewOnSite()
  const lead = await site.app.agentFor(site.people.lead.email)
  const office = await site.app.agentFor(site.people.office.email)
  const today = `/api/day-sheets/${site.dayIds.wednesday}/log`
  return { site, lead, office, today }
}

test('the roster is put down with its ordinary hours before anybody types', async () => {
  const { site, lead, today } = await onSite()
  site.app.db
    .update(people)
    .set({ weekHours: [7.6, 7.6, 7.6, 7.6, 7.6, 0, 0] })
    .where(eq(people.id, site.people.apprentice.id))
    .run()
  const { body } = await lead.get(today).expect(200)
  expect(body).toMatchObject({ day: days.wednesday, log: null, closedBecause: null, others: [] })
  expect(body.roster).toEqual([
    { personId: site.people.lead.id, name: 'Tamsin Rook', onLeave: false, minutes: 480 },
    { personId: site.people.apprentice.id, name: 'Wim Casey', onLeave: false, minutes: 456 },
  ])
})

test('the leading hand closes the day, and the sheet says who and how many hours', async () => {
  const { site, lead, today } = await onSite()
  const { body } = await lead.put(today).send(wetDay(site)).expect(200)
  expect(body.log).toMatchObject({
    version: 1,
    loggedBy: 'Tamsin Rook',
    delays: [{ reason: 'weather', note: 'Heavy rain from ten', lostMinutes: 120 }],
  })
  const sheets = await lead.get(`/api/day-sheets?day=${days.wednesday}`).expect(200)
  expect(sheets.body.sheets[0].log).toMatchObject({ minutes: 930, lostMinutes: 120 })
  const [entry] = site.app.db.select().from(audit).where(eq(audit.action, 'day-log.written')).all()
  expect(entry?.entityId).toBe(site.dayIds.wednesday)
})

test('a day with a log and not a tick is worked: it stays, and the job is on site', async () => {
  const { site, lead, office, today } = await onSite()
  const worked = () => readBookedDays(site.app.db, site.booking.id).filter((day) => day.worked)
  expect(worked()).toEqual([])
  expect(readStage(site.app.db, site.jobId)).not.toBe('on-site')

  await lead.put(today).send(wetDay(site)).expect(200)

  expect(worked().map((day) => day.day)).toEqual([days.wednesday])
  expect(readStage(site.app.db, site.jobId)).toBe('on-site')
  const booking = await office.get(`/api/bookings/${site.booking.id}`).expect(200)
  const taken = await office
    .patch(`/api/bookings/${site.booking.id}`)
    .send({ version: booking.body.version, days: [days.thursday, days.monday] })
    .expect(409)
  expect(taken.body.message).toContain('Wed 2 Dec')
})

test('a day that is closed is not planned again; taking the log back frees it', async () => {
  const { site, lead, office, today } = await onSite()
  await lead.put(today).send(wetDay(site)).expect(200)
  const firm = await office.get('/api/firm').expect(200)
  // Saving the firm plans every day ahead that is not worked.
  await office.put('/api/firm').send(firm.body).expect(200)
  const plannedOn = async (day: string) => {
    const { body } = await lead.get(`/api/day-sheets?day=${day}`).expect(200)
    return body.sheets[0].tasks.length as number
  }
  expect(await plannedOn(days.wednesday)).toBe(0)
  expect(await plannedOn(days.thursday)).toBeGreaterThan(0)

  await lead.delete(`${today}?version=1`).expect(200)
  expect(await plannedOn(days.wednesday)).toBeGreaterThan(0)
  expect(site.app.db.select().from(dayLogs).all()).toEqual([])
})

test('the same log sent again after a lost answer writes nothing twice', async () => {
  const { site, lead, today } = await onSite()
  await lead.put(today).send(wetDay(site)).expect(200)
  const again = await lead.put(today).send(wetDay(site)).expect(200)
  expect(again.body.log.version).toBe(1)
})

test('a log made from an older one is refused with both, and nothing is lost', async () => {
  const { site, lead, office, today } = await onSite()
  await lead.put(today).send(wetDay(site)).expect(200)
  await office
    .put(today)
    .send(wetDay(site, { version: 1, remarks: 'By phone' }))
    .expect(200)
  const sent = wetDay(site, { version: 1, remarks: 'From site' })
  const { body } = await lead.put(today).send(sent).expect(409)
  expect(body.detail).toMatchObject({
    kind: 'stale',
    current: { version: 2, remarks: 'By phone' },
    sent: { remarks: 'From site' },
  })
})

test('the day after, the leading hand no longer corrects it; the office does', async () => {
  const { site, lead, office, today } = await onSite()
  await lead.put(today).send(wetDay(site)).expect(200)
  site.app.clock.current = new Date('2026-12-03T00:00:00Z')
  const late = await lead
    .put(today)
    .send(wetDay(site, { version: 1, done: 'More' }))
    .expect(409)
  expect(late.body.message).toBe('Closed on Wed 2 Dec. Ask the office to correct it.')
  const { body } = await lead.get(today).expect(200)
  expect(body.closedBecause).toBe('Closed on Wed 2 Dec. Ask the office to correct it.')
  await office
    .put(today)
    .send(wetDay(site, { version: 1, done: 'More' }))
    .expect(200)
})

test('a day forgotten is closed the morning after; a day ahead is not closed by anybody', async () => {
  const { site, lead, office } = await onSite()
  await lead.put(`/api/day-sheets/${site.dayIds.tuesday}/log`).send(wetDay(site)).expect(200)
  for (const agent of [lead, office]) {
    const ahead = await agent
      .put(`/api/day-sheets/${site.dayIds.thursday}/log`)
      .send(wetDay(site))
      .expect(409)
    expect(ahead.body.message).toContain('Thu 3 Dec is still ahead')
  }
})

test('another crew’s day is not there for its neighbours, and an apprentice reads but does not write', async () => {
  const { site, today } = await onSite()
  const otherLead = await site.app.agentFor(site.people.otherLead.email)
  await otherLead.get(today).expect(404)
  await otherLead.put(today).send(wetDay(site)).expect(404)
  const apprentice = await site.app.agentFor(site.people.apprentice.email)
  await apprentice.get(today).expect(200)
  await apprentice.put(today).send(wetDay(site)).expect(403)
})

test('a leading hand puts down the own crew; the office puts down anybody of the firm', async () => {
  const { site, lead, office, today } = await onSite()
  const visitor = { personId: site.people.otherApprentice.id, turnedUp: true, minutes: 240 }
  const log = wetDay(site, { people: [visitor] })
  const refused = await lead.put(today).send(log).expect(400)
  expect(refused.body.issues[0].path).toBe('people.0.personId')
  const { body } = await office.get(today).expect(200)
  expect(body.others.map((one: { name: string }) => one.name)).toEqual(['Bex Arden', 'Ned Farrow'])
  await office.put(today).send(log).expect(200)
})

test('hours without turning up, a delay without hours and another without words are refused', async () => {
  const { site, lead, today } = await onSite()
  const personId = site.people.lead.id
  const faults = [
    { people: [{ personId, turnedUp: false, minutes: 60 }] },
    { people: [{ personId, turnedUp: true, minutes: 1441 }] },
    {
      people: [
        { personId, turnedUp: true, minutes: 60 },
        { personId, turnedUp: true, minutes: 60 },
      ],
    },
    { delays: [{ reason: 'weather', note: '', lostMinutes: 0 }] },
    { delays: [{ reason: 'other', note: '', lostMinutes: 30 }] },
  ]
  for (const fault of faults) await lead.put(today).send(wetDay(site, fault)).expect(400)
})

test('two jobs on one day share the hours: what is logged on the first is not offered on the second', async () => {
  const { site, lead, today } = await onSite()
  const otherJob = site.kit.addJob({ number: 'QR-9', title: 'Carport' })
  const second = site.kit.addBooking(otherJob, site.crew.id, [days.wednesday])
  const secondLog = `/api/day-sheets/${second.dayIds[0]}/log`
  const minutesAt = async (address: string) => {
    const { body } = await lead.get(address).expect(200)
    return body.roster.map((one: { minutes: number }) => one.minutes) as number[]
  }
  expect(await minutesAt(today)).toEqual([240, 240])
  await lead.put(today).send(wetDay(site)).expect(200)
  expect(await minutesAt(secondLog)).toEqual([0, 30])
})
