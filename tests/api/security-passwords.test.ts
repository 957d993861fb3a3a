import { eq } from 'drizzle-orm'
import { pino } from 'pino'
import { expect, test } from 'vitest'
import { issuePasswordToken } from '../../server/auth/password-links.ts'
import { outbox } from '../../server/db/tables/mail-tables.ts'
import { people } from '../../server/db/tables/people-tables.ts'
import { createTestApp, type TestApp, testPassword } from './harness.ts'

const nextPassword = 'string line and chalk'

const linkFor = (app: TestApp, personId: string) =>
  issuePasswordToken(app.db, personId, app.clock.current, 2)

async function useLink(app: TestApp, token: string, from = '203.0.113.1') {
  const agent = await app.agentFor()
  return agent
    .put('/api/password-resets')
    .set('X-Forwarded-For', from)
    .send({ token, password: nextPassword })
}

test('a link is used once, however many use it at the same moment', async () => {
  const app = await createTestApp()
  const person = app.addPerson('leading-hand', 'Tamsin Rook')
  const token = linkFor(app, person.id)
  const answers = await Promise.all([1, 2, 3].map(() => useLink(app, token)))
  expect(answers.map((answer) => answer.status).sort()).toEqual([200, 400, 400])
})

test('a link used while the account is closed is not spent: nothing is half-written', async () => {
  const app = await createTestApp()
  const person = app.addPerson('apprentice', 'Wim Casey')
  const token = linkFor(app, person.id)
  const setActive = (active: boolean) =>
    app.db.update(people).set({ active }).where(eq(people.id, person.id)).run()
  setActive(false)
  expect((await useLink(app, token)).status).toBe(404)
  setActive(true)
  expect((await useLink(app, token)).status).toBe(200)
})

test('an e-mail address put right, access taken away, or a changed password ends links sent before', async () => {
  const app = await createTestApp()
  const office = await app.agentFor(app.addPerson('office', 'Orla Brandt').email)
  const person = app.addPerson('leading-hand', 'Tamsin Rook')
  const edit = async (changes: Record<string, unknown>) => {
    const { body } = await office.get('/api/people').expect(200)
    const row = (body.people as Record<string, unknown>[]).find((one) => one['id'] === person.id)!
    const { name, email, phone, role, active, version } = row
    await office
      .patch(`/api/people/${person.id}`)
      .send({ name, email, phone, role, active, version, ...changes })
      .expect(200)
  }
  const sentToWrongAddress = linkFor(app, person.id)
  await edit({ email: 'tamsin@quillback.example' })
  expect((await useLink(app, sentToWrongAddress)).status).toBe(400)

  const sentBeforeClosing = linkFor(app, person.id)
  await edit({ active: false })
  await edit({ active: true })
  expect((await useLink(app, sentBeforeClosing)).status).toBe(400)

  const sentBeforeChange = linkFor(app, person.id)
  const own = await app.agentFor('tamsin@quillback.example')
  await own
    .put('/api/session/password')
    .send({ current: testPassword, next: 'another one for the crew' })
    .expect(200)
  expect((await useLink(app, sentBeforeChange)).status).toBe(400)
})

test('reset mails to one account run out, known or not, so that nobody is flooded', async () => {
  const app = await createTestApp()
  const person = app.addPerson('leading-hand', 'Tamsin Rook')
  const agent = await app.agentFor()
  const ask = async (email: string) =>
    (await agent.post('/api/password-resets').send({ email })).status
  for (const email of [person.email, 'nobody@quillback.example']) {
    const statuses: number[] = []
    for (let i = 0; i < 12; i++) statuses.push(await ask(email))
    expect(statuses[0]).toBe(202)
    expect(statuses.at(-1)).toBe(429)
  }
  expect(app.db.select().from(outbox).all().length).toBeLessThan(10)
})

test('bad links tried from one address do not stop a good link from another', async () => {
  const app = await createTestApp({ env: { TRUST_PROXY: '1' } })
  const person = app.addPerson('leading-hand', 'Tamsin Rook')
  const token = linkFor(app, person.id)
  for (let i = 0; i < 40; i++) await useLink(app, 'x'.repeat(43), '203.0.113.9')
  expect((await useLink(app, token, '203.0.113.9')).status).toBe(429)
  expect((await useLink(app, token, '198.51.100.4')).status).toBe(200)
})

test('the password asked for again at a change cannot be guessed without end', async () => {
  const app = await createTestApp()
  const agent = await app.agentFor(app.addPerson('office', 'Orla Brandt').email)
  const change = (current: string) =>
    agent.put('/api/session/password').send({ current, next: nextPassword })
  for (let i = 0; i < 10; i++) expect((await change('not this one')).status).toBe(400)
  expect((await change(testPassword)).status).toBe(429)
})

test('of two changes of a password at the same moment one is told that it came too late', async () => {
  const app = await createTestApp()
  const { email } = app.addPerson('office', 'Orla Brandt')
  const devices = [await app.agentFor(email), await app.agentFor(email)]
  const answers = await Promise.all(
    devices.map((device, i) =>
      device
        .put('/api/session/password')
        .send({ current: testPassword, next: `${nextPassword} ${i}` }),
    ),
  )
  expect(answers.map((answer) => answer.status).sort()).toEqual([200, 400])
})

test('no password and no link stands in the log, at its most talkative', async () => {
  const lines: string[] = []
  const log = pino({ level: 'trace' }, { write: (line: string) => void lines.push(line) })
  const app = await createTestApp({ log })
  const person = app.addPerson('leading-hand', 'Tamsin Rook')
  const token = linkFor(app, person.id)
  const agent = await app.agentFor(person.email)
  await agent.get(`/set-password?token=${token}`)
  await agent.put(`/api/password-resets?token=${token}`).send({ token, password: nextPassword })
  await agent.post('/api/session').send({ email: person.email, password: 'a wrong one' })
  expect(lines.length).toBeGreaterThan(3)
  const all = lines.join('\n')
  for (const secret of [testPassword, nextPassword, 'a wrong one', token, 'ridgehand.sid'])
    expect(all).not.toContain(secret)
})
