import { eq } from 'drizzle-orm'
import { expect, test } from 'vitest'
import { bookings, tasks } from '../../server/db/tables/booking-tables.ts'
import { leave, people } from '../../server/db/tables/people-tables.ts'
import { newId } from '../../server/lib/ids.ts'
import type { Agent } from './harness.ts'
import { crewOnSite, days } from './day-sheet-kit.ts'

/** Words that only the office may read, wherever in an answer they would stand. */
const officeOnly = {
  customer: 'Osric Hale',
  customerPhone: '0491 570 157',
  price: '1845050',
  notes: 'Slow payer',
  clashReason: 'Promised before the customer pays',
  leaveReason: 'Knee operation',
  colleaguePhone: '0491 570 158',
  mailDomain: 'quillback.example',
  otherJob: 'Wintle Lane shed',
}
const siteContactPhone = '0491 570 156'

/** A crew double-booked on purpose, somebody on leave, a task handed to the apprentice, another crew's job. */
async function fullSite() {
  const site = await crewOnSite()
  const { app, kit, people: who } = site
  app.db.update(people).set({ phone: officeOnly.colleaguePhone }).run()
  app.db.update(bookings).set({ clashReason: officeOnly.clashReason }).run()
  const secondJob = kit.addJob({ title: 'Second job of the day' })
  kit.addBooking(secondJob, site.crew.id, [days.wednesday])
  const otherJob = kit.addJob({ title: officeOnly.otherJob })
  const otherBooking = kit.addBooking(otherJob, site.otherCrew.id, Object.values(days))
  const onLeave = { startsOn: days.thursday, endsOn: days.thursday }
  app.db
    .insert(leave)
    .values({
      id: newId(),
      personId: who.apprentice.id,
      ...onLeave,
      reason: officeOnly.leaveReason,
    })
    .run()
  const taskId = site.addTask(site.dayIds.wednesday, { assignedToId: who.apprentice.id })
  const otherTaskId = site.addTask(otherBooking.dayIds[1]!, {
    assignedToId: who.otherApprentice.id,
  })
  return { ...site, secondJob, otherJob, otherBooking, taskId, otherTaskId }
}
type Site = Awaited<ReturnType<typeof fullSite>>

/** Every address that a person on site may open, and some that try for more. */
function addresses(site: Site): string[] {
  const { jobId, booking, dayIds, taskId } = site
  return [
    '/api/session',
    '/api/jobs',
    `/api/jobs?q=${officeOnly.customer.split(' ')[0]}`,
    `/api/jobs?crew=${site.otherCrew.id}`,
    `/api/jobs/${jobId}`,
    `/api/jobs/${site.secondJob}`,
    `/api/jobs/${jobId}/revisions/A`,
    `/api/jobs/${jobId}/plate-checks/A`,
    `/api/calendar?from=${days.tuesday}&to=${days.monday}`,
    `/api/bookings/${booking.id}`,
    `/api/day-sheets`,
    ...Object.values(days).map((day) => `/api/day-sheets?day=${day}`),
    ...Object.values(dayIds).map((id) => `/api/day-sheets/${id}/spec`),
    `/api/my-tasks?day=${days.wednesday}`,
    `/api/tasks/${taskId}`,
    '/api/crews',
  ]
}

/** All answers as one text, the person's own address left out. */
async function everythingSeen(site: Site, agent: Agent, ownEmail: string): Promise<string> {
  const texts: string[] = []
  for (const address of addresses(site)) {
    const answer = await agent.get(address)
    expect(answer.status, address).toBeLessThan(500)
    texts.push(answer.text)
  }
  const stale = { version: 99, position: 0 }
  texts.push((await agent.patch(`/api/tasks/${site.taskId}`).send(stale)).text)
  const undo = { id: newId(), delta: -1 }
  texts.push((await agent.post(`/api/tasks/${site.taskId}/ticks`).send(undo)).text)
  return texts.join('\n').replaceAll(ownEmail, '')
}

function found(text: string, secrets: Record<string, string>): string[] {
  return Object.entries(secrets).flatMap(([name, words]) => (text.includes(words) ? [name] : []))
}

test('the office finds all of it, so the words looked for are really there', async () => {
  const site = await fullSite()
  const { email } = site.people.office
  const agent = await site.app.agentFor(email)
  const text =
    (await everythingSeen(site, agent, email)) + (await agent.get('/api/people').expect(200)).text
  expect(found(text, officeOnly).sort()).toEqual(Object.keys(officeOnly).sort())
})

test('a leading hand sees nothing that is the office’s, in any answer, however deep', async () => {
  const site = await fullSite()
  const { email } = site.people.lead
  const text = await everythingSeen(site, await site.app.agentFor(email), email)
  expect(text).toContain('House at Lot 12')
  expect(text).toContain(siteContactPhone)
  expect(found(text, officeOnly)).toEqual([])
})

test('an apprentice sees nothing that is the office’s, nor the site contact’s phone', async () => {
  const site = await fullSite()
  const { email } = site.people.apprentice
  const text = await everythingSeen(site, await site.app.agentFor(email), email)
  expect(text).toContain('House at Lot 12')
  expect(found(text, { ...officeOnly, siteContactPhone })).toEqual([])
})

test('what is another crew’s is missing to a leading hand and an apprentice, to read and to write', async () => {
  const site = await fullSite()
  const { otherJob, otherBooking, otherTaskId, people: who } = site
  for (const person of [who.lead, who.apprentice]) {
    const agent = await site.app.agentFor(person.email)
    const answers = [
      await agent.get(`/api/jobs/${otherJob}`),
      await agent.get(`/api/jobs/${otherJob}/revisions/A`),
      await agent.get(`/api/jobs/${otherJob}/plate-checks/A`),
      await agent.get(`/api/bookings/${otherBooking.id}`),
      await agent.get(`/api/day-sheets?crewId=${site.otherCrew.id}`),
      await agent.get(`/api/day-sheets/${otherBooking.dayIds[1]}/spec`),
      await agent.get(`/api/tasks/${otherTaskId}`),
      await agent.patch(`/api/tasks/${otherTaskId}`).send({ version: 1, position: 0 }),
      await agent.post(`/api/tasks/${otherTaskId}/ticks`).send({ id: newId(), delta: 1 }),
      await agent.post(`/api/tasks/${otherTaskId}/hand`).send({ raised: true }),
    ]
    for (const answer of answers) expect([403, 404]).toContain(answer.status)
  }
  const row = site.app.db.select().from(tasks).where(eq(tasks.id, otherTaskId)).get()
  expect(row).toMatchObject({ version: 1, handRaisedAt: null })
})

test('an apprentice reaches a task of the own crew only once it is theirs', async () => {
  const site = await fullSite()
  const agent = await site.app.agentFor(site.people.apprentice.email)
  const notMine = site.addTask(site.dayIds.wednesday, { assignedToId: site.people.lead.id })
  await agent.get(`/api/tasks/${notMine}`).expect(404)
  await agent.post(`/api/tasks/${notMine}/ticks`).send({ id: newId(), delta: 1 }).expect(404)
  await agent.get(`/api/tasks/${site.taskId}`).expect(200)
})

test('an apprentice sees no roof of a day whose reminder has not gone, nor of one pencilled', async () => {
  const site = await fullSite()
  const agent = await site.app.agentFor(site.people.apprentice.email)
  await agent.get(`/api/day-sheets/${site.dayIds.wednesday}/spec`).expect(200)
  await agent.get(`/api/day-sheets/${site.dayIds.monday}/spec`).expect(404)
  site.app.db.update(bookings).set({ state: 'pencilled' }).run()
  await agent.get(`/api/day-sheets/${site.dayIds.wednesday}/spec`).expect(404)
  await agent.get(`/api/jobs/${site.jobId}/revisions/A`).expect(404)
})
