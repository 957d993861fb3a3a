import { eq } from 'drizzle-orm'
import { expect, test } from 'vitest'
import { outbox } from '../../server/db/tables/mail-tables.ts'
import { leave, people } from '../../server/db/tables/people-tables.ts'
import { rosterOf } from '../../server/people/roster.ts'
import { createTestApp, testPassword } from './harness.ts'

const missingId = '00000000-0000-4000-8000-000000000000'

async function firmWithTwoCrews() {
  const app = await createTestApp()
  const office = app.addPerson('office', 'Orla Brandt')
  const lead = app.addPerson('leading-hand', 'Tamsin Rook')
  const apprentice = app.addPerson('apprentice', 'Wil Osei')
  const first = app.addCrew('Anvil', [lead.id, apprentice.id])
  const second = app.addCrew('Bracken', [])
  return { app, office, lead, apprentice, first, second, agent: await app.agentFor(office.email) }
}

test('the office adds an apprentice, who is sent a link and cannot sign in before using it', async () => {
  const { app, agent, first } = await firmWithTwoCrews()
  const made = await agent
    .post('/api/people')
    .send({
      name: 'Jun Pell',
      email: 'Jun.Pell@quillback.example',
      phone: '',
      role: 'apprentice',
      crewId: first.id,
    })
    .expect(201)
  expect(made.body).toMatchObject({
    email: 'jun.pell@quillback.example',
    invited: true,
    crewId: first.id,
  })
  const mails = app.db.select().from(outbox).all()
  expect(mails.map((mail) => [mail.kind, mail.toEmail])).toEqual([
    ['invitation', 'jun.pell@quillback.example'],
  ])
  const stranger = await app.agentFor()
  await stranger
    .post('/api/session')
    .send({ email: 'jun.pell@quillback.example', password: testPassword })
    .expect(401)
})

test('an address that somebody else has is refused at its field and nothing is half-written', async () => {
  const { app, agent, lead } = await firmWithTwoCrews()
  const answer = await agent
    .post('/api/people')
    .send({ name: 'Twin', email: lead.email, phone: '', role: 'apprentice', crewId: null })
    .expect(400)
  expect(answer.body.issues[0].path).toBe('email')
  expect(app.db.select().from(people).all()).toHaveLength(3)
  expect(app.db.select().from(outbox).all()).toHaveLength(0)
})

test('a stale edit of a person is refused with what is there now', async () => {
  const { agent, lead } = await firmWithTwoCrews()
  const edit = {
    name: 'Tamsin Rook',
    email: lead.email,
    phone: '',
    role: 'leading-hand',
    active: true,
  }
  await agent
    .patch(`/api/people/${lead.id}`)
    .send({ ...edit, phone: '0491 570 156', version: 1 })
    .expect(200)
  const stale = await agent
    .patch(`/api/people/${lead.id}`)
    .send({ ...edit, version: 1 })
    .expect(409)
  expect(stale.body.detail.current.phone).toBe('0491 570 156')
})

test('taking somebody’s access away signs them out at once', async () => {
  const { app, agent, lead } = await firmWithTwoCrews()
  const theirs = await app.agentFor(lead.email)
  const edit = {
    name: 'Tamsin Rook',
    email: lead.email,
    phone: '',
    role: 'leading-hand',
    version: 1,
  }
  await agent
    .patch(`/api/people/${lead.id}`)
    .send({ ...edit, active: false })
    .expect(200)
  await theirs.get('/api/crews').expect(401)
})

test('the office cannot lock itself out', async () => {
  const { agent, office } = await firmWithTwoCrews()
  const edit = { name: 'Orla Brandt', email: office.email, phone: '', role: 'office', version: 1 }
  await agent
    .patch(`/api/people/${office.id}`)
    .send({ ...edit, active: false })
    .expect(400)
})

test('a move to another crew starts on its day and leaves the days before as they were', async () => {
  const { app, agent, apprentice, first, second } = await firmWithTwoCrews()
  await agent
    .put(`/api/people/${apprentice.id}/crew`)
    .send({ crewId: second.id, from: '2026-12-07' })
    .expect(200)
  const names = (crewId: string, day: string) =>
    rosterOf(app.db, crewId, day).map((person) => person.name)
  expect(names(first.id, '2026-12-06')).toEqual(['Tamsin Rook', 'Wil Osei'])
  expect(names(first.id, '2026-12-07')).toEqual(['Tamsin Rook'])
  expect(names(second.id, '2026-12-07')).toEqual(['Wil Osei'])
  await agent
    .put(`/api/people/${apprentice.id}/crew`)
    .send({ crewId: second.id, from: '2026-12-01' })
    .expect(400)
})

test('leave that ends before it starts is refused at its last day; good leave shows on the roster', async () => {
  const { app, agent, apprentice, first } = await firmWithTwoCrews()
  const bad = await agent
    .post(`/api/people/${apprentice.id}/leave`)
    .send({ startsOn: '2026-12-09', endsOn: '2026-12-08', reason: '' })
    .expect(400)
  expect(bad.body.issues[0].path).toBe('endsOn')
  await agent
    .post(`/api/people/${apprentice.id}/leave`)
    .send({ startsOn: '2026-12-08', endsOn: '2026-12-09', reason: 'Trade school' })
    .expect(201)
  const away = rosterOf(app.db, first.id, '2026-12-09').filter((person) => person.onLeave)
  expect(away.map((person) => person.name)).toEqual(['Wil Osei'])
  const row = app.db.select().from(leave).where(eq(leave.personId, apprentice.id)).get()
  await agent.delete(`/api/people/${missingId}/leave/${row?.id}`).expect(404)
  await agent.delete(`/api/people/${apprentice.id}/leave/${row?.id}`).expect(200)
  expect(app.db.select().from(leave).all()).toHaveLength(0)
})

test('a leading hand sees the own crew only, an apprentice no list of crews', async () => {
  const { app, lead, apprentice } = await firmWithTwoCrews()
  const theirs = await app.agentFor(lead.email)
  const seen = await theirs.get('/api/crews').expect(200)
  expect(seen.body.crews.map((crew: { name: string }) => crew.name)).toEqual(['Anvil'])
  await (await app.agentFor(apprentice.email)).get('/api/crews').expect(403)
})

test('two crews cannot carry one letter', async () => {
  const { agent } = await firmWithTwoCrews()
  const answer = await agent
    .post('/api/crews')
    .send({ name: 'Another', letter: 'a', colour: 3 })
    .expect(400)
  expect(answer.body.issues[0].path).toBe('letter')
})

test('firm settings are saved whole or not at all, and a stale save is refused', async () => {
  const { agent } = await firmWithTwoCrews()
  const { body: firm } = await agent.get('/api/firm').expect(200)
  const bad = await agent
    .put('/api/firm')
    .send({ ...firm, name: 'Renamed', timeZone: 'Nowhere/At_all' })
    .expect(400)
  expect(bad.body.issues[0].path).toBe('timeZone')
  expect((await agent.get('/api/firm')).body.name).not.toBe('Renamed')
  const saved = await agent
    .put('/api/firm')
    .send({ ...firm, name: 'Quillback Roofing', reminderAt: '14:30' })
    .expect(200)
  expect(saved.body).toMatchObject({
    name: 'Quillback Roofing',
    reminderAt: '14:30',
    version: firm.version + 1,
  })
  await agent.put('/api/firm').send(firm).expect(409)
})
