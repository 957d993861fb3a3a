import { eq } from 'drizzle-orm'
import { expect, test } from 'vitest'
import { people } from '../../server/db/tables/people-tables.ts'
import { ticks } from '../../server/db/tables/booking-tables.ts'
import { crewOnSite, days } from './day-sheet-kit.ts'

async function closedWeek() {
  const site = await crewOnSite()
  const lead = await site.app.agentFor(site.people.lead.email)
  const office = await site.app.agentFor(site.people.office.email)
  const close = (dayId: string, changes: Record<string, unknown> = {}) =>
    lead
      .put(`/api/day-sheets/${dayId}/log`)
      .send({
        version: 0,
        done: '',
        remarks: 'Rain again',
        people: [
          { personId: site.people.lead.id, turnedUp: true, minutes: 465 },
          { personId: site.people.apprentice.id, turnedUp: false, minutes: 0 },
        ],
        delays: [{ reason: 'weather', note: 'Rain from two', lostMinutes: 90 }],
        ...changes,
      })
      .expect(200)
  return { site, lead, office, close }
}

test('planned, done, logged and lost of a job stand side by side, a day a row', async () => {
  const { site, office, close } = await closedWeek()
  const taskId = site.addTask(site.dayIds.tuesday, { quantity: 3, plannedMinutes: 30 })
  for (let piece = 0; piece < 2; piece++)
    site.app.db
      .insert(ticks)
      .values({ ...site.tick(), taskId, personId: site.people.lead.id, at: site.app.clock.current })
      .run()
  await close(site.dayIds.tuesday)

  const { body } = await office.get(`/api/jobs/${site.jobId}/hours`).expect(200)

  expect(body.days.map((one: { day: string }) => one.day)).toEqual(Object.values(days))
  expect(body.days[0]).toMatchObject({ plannedMinutes: 30, doneMinutes: 20 })
  expect(body.days[0].log.people).toContainEqual(
    expect.objectContaining({ name: 'Tamsin Rook', minutes: 465 }),
  )
  expect(body.days[1].log).toBeNull()
  expect(body.roofMinutes).toBeGreaterThan(600)
  expect(JSON.stringify(body)).not.toContain('price')
})

test('a week’s hours are a person a row and a day a column, and days nobody closed are named', async () => {
  const { site, office, close } = await closedWeek()
  const { body: before } = await office.get(`/api/hours?week=${days.wednesday}`).expect(200)
  expect(before.days).toHaveLength(7)
  expect(before.days[0]).toBe('2026-11-30')
  expect(before.open).toMatchObject([{ day: days.tuesday, bookingDayId: site.dayIds.tuesday }])

  await close(site.dayIds.tuesday)

  const { body } = await office.get(`/api/hours?week=${days.wednesday}`).expect(200)
  expect(body.open).toEqual([])
  const tamsin = body.people.find((one: { name: string }) => one.name === 'Tamsin Rook')
  expect(tamsin.minutes).toEqual([0, 465, 0, 0, 0, 0, 0])
})

test('the week as CSV opens in a spreadsheet and a name cannot become a formula', async () => {
  const { site, office, close } = await closedWeek()
  site.app.db
    .update(people)
    .set({ name: '=HYPERLINK("http://bad.example","Rook, T.")' })
    .where(eq(people.id, site.people.lead.id))
    .run()
  await close(site.dayIds.tuesday)

  const answer = await office.get(`/api/hours.csv?week=${days.wednesday}`).expect(200)

  expect(answer.headers['content-type']).toContain('text/csv')
  expect(answer.headers['content-disposition']).toContain('hours-2026-11-30.csv')
  const lines = answer.text.replace(/^\uFEFF/, '').split('\r\n')
  expect(lines[0]).toBe(
    'Person,Mon 30 Nov 2026,Tue 1 Dec 2026,Wed 2 Dec 2026,Thu 3 Dec 2026,Fri 4 Dec 2026,Sat 5 Dec 2026,Sun 6 Dec 2026,Total hours',
  )
  // RFC 4180 2.7: quotes inside a quoted field are doubled. The leading ' keeps a spreadsheet from reading a formula (OWASP, CSV injection).
  expect(lines).toContain(
    `"'=HYPERLINK(""http://bad.example"",""Rook, T."")",0,7.75,0,0,0,0,0,7.75`,
  )
  for (const line of lines) expect(line).not.toMatch(/^"?[=+@-]/)
})

test('hours are the office’s to read', async () => {
  const { site, lead } = await closedWeek()
  await lead.get(`/api/jobs/${site.jobId}/hours`).expect(403)
  await lead.get('/api/hours').expect(403)
  await lead.get('/api/hours.csv').expect(403)
})
