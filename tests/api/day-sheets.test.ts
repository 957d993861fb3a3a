import { eq } from 'drizzle-orm'
import { expect, test } from 'vitest'
import { bookingDays, bookings } from '../../server/db/tables/booking-tables.ts'
import { leave } from '../../server/db/tables/people-tables.ts'
import { newId } from '../../server/lib/ids.ts'
import { crewOnSite, days } from './day-sheet-kit.ts'

test('a leading hand opens today and finds site, start, who, gear, tasks and the days around', async () => {
  const site = await crewOnSite()
  site.addTask(site.dayIds.wednesday, { assignedToId: site.people.apprentice.id })
  site.app.db.update(bookings).set({ gear: 'Long ladder', startAt: '06:30' }).run()
  site.app.db
    .insert(leave)
    .values({
      id: newId(),
      personId: site.people.apprentice.id,
      startsOn: days.wednesday,
      endsOn: days.wednesday,
    })
    .run()
  const agent = await site.app.agentFor(site.people.lead.email)
  const { body } = await agent.get('/api/day-sheets').expect(200)
  expect(body).toMatchObject({
    day: days.wednesday,
    previousDay: days.tuesday,
    nextDay: days.thursday,
    crew: { id: site.crew.id },
  })
  expect(body.crews).toHaveLength(1)
  const sheet = body.sheets[0]
  expect(sheet).toMatchObject({
    startAt: '06:30',
    gear: 'Long ladder',
    dayNumber: 2,
    dayCount: 4,
    revision: { letter: 'A' },
    plates: null,
    minutesPlanned: 21,
    // One of two is on leave: 8 hours of one person.
    minutesThere: 480,
  })
  expect(sheet.job).toMatchObject({
    siteContactName: 'Pella Vance',
    siteContactPhone: '0491 570 156',
    crewNotes: 'Dog in the yard',
  })
  expect(sheet.job.mapUrl).toContain('12%20Lantern%20Street')
  expect(sheet.roster).toContainEqual({
    id: site.people.apprentice.id,
    name: 'Wim Casey',
    onLeave: true,
  })
  expect(sheet.changes).toEqual(['Wim Casey is not with the crew; was on Tue 1 Dec.'])
  expect(sheet.tasks[0]).toMatchObject({ doneCount: 0, assignedTo: { name: 'Wim Casey' } })
})

test('what a role may not see is nowhere in its day sheet', async () => {
  const site = await crewOnSite()
  site.addTask(site.dayIds.wednesday)
  const secrets = {
    lead: ['0491 570 157', 'Osric Hale', '1845050', 'Slow payer', 'quillback.example'],
    apprentice: ['0491 570 156', '0491 570 157', 'Osric Hale', '1845050', 'Slow payer'],
  }
  for (const who of ['lead', 'apprentice'] as const) {
    const agent = await site.app.agentFor(site.people[who].email)
    const { text, body } = await agent.get('/api/day-sheets').expect(200)
    expect(body.sheets).toHaveLength(1)
    for (const secret of secrets[who]) expect(text).not.toContain(secret)
  }
})

test('the office opens any crew, and gets the one that is booked when it names none', async () => {
  const site = await crewOnSite()
  const agent = await site.app.agentFor(site.people.office.email)
  const { body } = await agent.get('/api/day-sheets').expect(200)
  expect(body.crew.id).toBe(site.crew.id)
  expect(body.crews).toHaveLength(2)
  const other = await agent.get(`/api/day-sheets?crewId=${site.otherCrew.id}`).expect(200)
  expect(other.body).toMatchObject({ crew: { id: site.otherCrew.id }, sheets: [], nextDay: null })
})

test("another crew's sheet, roof and task answer like missing ones", async () => {
  const site = await crewOnSite()
  const taskId = site.addTask(site.dayIds.wednesday)
  const missing = newId()
  for (const who of ['otherLead', 'otherApprentice'] as const) {
    const agent = await site.app.agentFor(site.people[who].email)
    const own = await agent.get('/api/day-sheets').expect(200)
    expect(own.body.sheets).toEqual([])
    for (const [foreign, none] of [
      [`/api/day-sheets?crewId=${site.crew.id}`, `/api/day-sheets?crewId=${missing}`],
      [`/api/day-sheets/${site.dayIds.wednesday}/spec`, `/api/day-sheets/${missing}/spec`],
      [`/api/tasks/${taskId}`, `/api/tasks/${missing}`],
    ] as const) {
      const a = await agent.get(foreign).expect(404)
      const b = await agent.get(none).expect(404)
      expect(a.body.message).toBe(b.body.message)
    }
    await agent.post(`/api/tasks/${taskId}/ticks`).send(site.tick()).expect(404)
    await agent.post(`/api/tasks/${taskId}/hand`).send({ raised: true }).expect(404)
  }
  const lead = await site.app.agentFor(site.people.otherLead.email)
  await lead.patch(`/api/tasks/${taskId}`).send({ version: 1, position: 0 }).expect(404)
})

test('an apprentice sees a day from the reminder on the day before until seven days after', async () => {
  const site = await crewOnSite()
  const agent = await site.app.agentFor(site.people.apprentice.email)
  const sheetsOf = async (day: string) =>
    (await agent.get(`/api/day-sheets?day=${day}`).expect(200)).body.sheets.length
  // 14:59 in Brisbane; the reminder goes at 15:00.
  site.app.clock.current = new Date('2026-12-02T04:59:00Z')
  expect(await sheetsOf(days.thursday)).toBe(0)
  await agent.get(`/api/day-sheets/${site.dayIds.thursday}/spec`).expect(404)
  site.app.clock.current = new Date('2026-12-02T05:00:00Z')
  expect(await sheetsOf(days.thursday)).toBe(1)
  await agent.get(`/api/day-sheets/${site.dayIds.thursday}/spec`).expect(200)
  expect(await sheetsOf(days.monday)).toBe(0)
  // Tue 1 Dec and seven days: still on the 8th, gone on the 9th.
  site.app.clock.current = new Date('2026-12-08T04:00:00Z')
  expect(await sheetsOf(days.tuesday)).toBe(1)
  site.app.clock.current = new Date('2026-12-09T04:00:00Z')
  expect(await sheetsOf(days.tuesday)).toBe(0)
})

test('a leading hand sees 14 days back and 28 ahead, an apprentice no pencilled day', async () => {
  const site = await crewOnSite()
  const lead = await site.app.agentFor(site.people.lead.email)
  const apprentice = await site.app.agentFor(site.people.apprentice.email)
  site.app.db.update(bookings).set({ state: 'pencilled' }).run()
  const sheetsOf = async (agent: typeof lead) =>
    (await agent.get(`/api/day-sheets?day=${days.wednesday}`).expect(200)).body.sheets.length
  expect(await sheetsOf(lead)).toBe(1)
  expect(await sheetsOf(apprentice)).toBe(0)
  site.app.clock.current = new Date('2026-12-17T00:00:00Z')
  expect(await sheetsOf(lead)).toBe(0)
})

test('a cancelled booking is on nobody’s sheet', async () => {
  const site = await crewOnSite()
  const taskId = site.addTask(site.dayIds.wednesday)
  site.app.db.update(bookings).set({ cancelledAt: site.app.clock.current }).run()
  const agent = await site.app.agentFor(site.people.lead.email)
  const { body } = await agent.get('/api/day-sheets').expect(200)
  expect(body).toMatchObject({ sheets: [], nextDay: null, previousDay: null })
  await agent.get(`/api/tasks/${taskId}`).expect(404)
  await agent.get(`/api/day-sheets/${site.dayIds.wednesday}/spec`).expect(404)
})

test('pieces not finished yesterday are left over today, until they are planned again', async () => {
  const site = await crewOnSite()
  const commons = site.spec.cutLines.find((line) => line.role === 'common')!
  const yesterday = site.addTask(site.dayIds.tuesday)
  const agent = await site.app.agentFor(site.people.lead.email)
  await agent.post(`/api/tasks/${yesterday}/ticks`).send(site.tick()).expect(200)
  const leftOver = async () =>
    (await agent.get('/api/day-sheets').expect(200)).body.sheets[0].leftOver
  expect(await leftOver()).toMatchObject([{ id: yesterday, doneCount: 1, quantity: 3 }])
  site.addTask(site.dayIds.wednesday, { memberMarks: commons.members.slice(1, 3), quantity: 2 })
  expect(await leftOver()).toEqual([])
})

test('a roof changed since the day before is said on the sheet', async () => {
  const site = await crewOnSite()
  const next = site.kit.addRevision(site.jobId, site.people.office.id, 2)
  site.app.db
    .update(bookingDays)
    .set({ revisionId: next })
    .where(eq(bookingDays.id, site.dayIds.wednesday))
    .run()
  const agent = await site.app.agentFor(site.people.lead.email)
  const { body } = await agent.get('/api/day-sheets').expect(200)
  expect(body.sheets[0].changes).toEqual(['Roof is now revision B; Tue 1 Dec had A.'])
})

test('the roof of a day comes with its plan, its spec and how the firm rounds', async () => {
  const site = await crewOnSite()
  const agent = await site.app.agentFor(site.people.apprentice.email)
  const { body } = await agent.get(`/api/day-sheets/${site.dayIds.wednesday}/spec`).expect(200)
  expect(body.spec.members).toHaveLength(site.spec.members.length)
  expect(body.marking).toEqual({ units: 'mm', roundMm: 1, roundDeg: 0.5, sawMaxTiltDeg: 50 })
})

test('a day that is no day and a field that does not belong are refused by name', async () => {
  const site = await crewOnSite()
  const agent = await site.app.agentFor(site.people.lead.email)
  const answer = await agent.get('/api/day-sheets?day=2026-02-30&colour=red').expect(400)
  const paths = answer.body.issues.map((issue: { path: string }) => issue.path)
  expect(paths).toEqual(expect.arrayContaining(['day', 'colour']))
})
