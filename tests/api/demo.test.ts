import { expect, test } from 'vitest'
import { demoPassword } from '../../server/db/demo/demo-people.ts'
import { isEmpty, seedDemo } from '../../server/db/demo/seed-demo.ts'
import { roofRevisions } from '../../server/db/tables/job-tables.ts'
import { people, tickets } from '../../server/db/tables/people-tables.ts'
import { jobStages } from '../../shared/jobs/job-stage.ts'
import { ticketState } from '../../shared/people/ticket-words.ts'
import { createTestApp } from './harness.ts'

// The Australian regulator's numbers for fiction: mobiles from 0491 570 006 on and landlines in 5550;
// the list is from memory, not read again for this test.
const fictional = /^(0491 57\d \d{3}|\(07\) 5550 0\d{3})$/

// A Wednesday, a Monday morning, a Sunday, the day before a year's end.
test.each([
  '2026-12-02T00:00:00Z',
  '2026-12-06T21:00:00Z',
  '2026-12-13T02:00:00Z',
  '2026-12-30T23:00:00Z',
])(
  'the demo seeded at %s has three crews, eleven people and fourteen jobs over every stage',
  async (now) => {
    const app = await createTestApp({ now: new Date(now) })
    expect(isEmpty(app.db)).toBe(true)
    await seedDemo(app.db, app.clock)
    expect(isEmpty(app.db)).toBe(false)
    const agent = await app.agentFor()
    await agent
      .post('/api/session')
      .send({ email: 'marnie@quillback.example', password: demoPassword })
      .expect(201)
    const { body } = await agent.get('/api/jobs').expect(200)
    const stages = new Set(body.jobs.map((job: { stage: string }) => job.stage))
    expect([...stages].sort()).toEqual([...jobStages].sort())
    expect(body.jobs).toHaveLength(14)
    expect((await agent.get('/api/crews')).body.crews).toHaveLength(3)
    const everybody = app.db.select().from(people).all()
    expect(everybody).toHaveLength(11)
    for (const { phone, email } of everybody) {
      expect(phone).toMatch(fictional)
      expect(email).toMatch(/\.example$/)
    }
  },
)

test('the demo’s roofs are of every shape and each frames into a cut list', async () => {
  const app = await createTestApp()
  await seedDemo(app.db, app.clock)
  const roles = new Set(
    app.db
      .select()
      .from(roofRevisions)
      .all()
      .flatMap((row) => row.spec.members.map((m) => m.role)),
  )
  expect([...roles].sort()).toEqual([
    'barge',
    'broken-hip',
    'collar-tie',
    'common',
    'creeper',
    'crown-end',
    'fascia',
    'hip',
    'ridge',
    'underpurlin',
    'valley',
    'valley-creeper',
  ])
})

test('the demo’s crews hold the tickets of the roof, one of them soon to lapse and none lapsed', async () => {
  const app = await createTestApp()
  await seedDemo(app.db, app.clock)
  const today = '2026-12-02'
  const crewPeople = app.db
    .select()
    .from(people)
    .all()
    .filter((one) => one.role !== 'office')
  const held = app.db.select().from(tickets).all()
  for (const person of crewPeople) {
    const kinds = held.filter((one) => one.personId === person.id).map((one) => one.kind)
    expect(kinds).toEqual(expect.arrayContaining(['working-at-heights', 'construction-induction']))
  }
  const soon = held.filter((ticket) => ticketState(ticket, today) === 'lapsing')
  expect(soon.map((ticket) => ticket.kind)).toEqual(['working-at-heights'])
  expect(held.some((ticket) => ticketState(ticket, today) === 'lapsed')).toBe(false)
})
