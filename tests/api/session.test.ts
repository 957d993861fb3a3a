import { expect, test } from 'vitest'
import { createTestApp, testPassword } from './harness.ts'

test('the office signs in, sees who it is, and signs out', async () => {
  const app = await createTestApp()
  const person = app.addPerson('office', 'Orla Brandt')
  const agent = await app.agentFor(person.email)
  const session = await agent.get('/api/session').expect(200)
  expect(session.body.user).toMatchObject({ name: 'Orla Brandt', role: 'office' })
  await agent.delete('/api/session').expect(200)
  const after = await agent.get('/api/session').expect(200)
  expect(after.body.user).toBeNull()
})

test('an unknown address and a wrong password get the same answer', async () => {
  const app = await createTestApp()
  const person = app.addPerson('office', 'Orla Brandt')
  const agent = await app.agentFor()
  const wrong = await agent
    .post('/api/session')
    .send({ email: person.email, password: 'not this one' })
  const unknown = await agent
    .post('/api/session')
    .send({ email: 'nobody@quillback.example', password: testPassword })
  expect(wrong.status).toBe(401)
  expect(unknown.status).toBe(401)
  expect(unknown.body.message).toBe(wrong.body.message)
})

test('a password change signs every other device out and keeps this one', async () => {
  const app = await createTestApp()
  const person = app.addPerson('leading-hand', 'Tamsin Rook')
  const here = await app.agentFor(person.email)
  const elsewhere = await app.agentFor(person.email)
  await here
    .put('/api/session/password')
    .send({ current: testPassword, next: 'a new one for the crew' })
    .expect(200)
  expect((await here.get('/api/session')).body.user?.name).toBe('Tamsin Rook')
  expect((await elsewhere.get('/api/session')).body.user).toBeNull()
})

test('a write that another site makes the browser send is refused', async () => {
  const app = await createTestApp()
  const person = app.addPerson('office', 'Orla Brandt')
  const agent = await app.agentFor()
  await agent
    .post('/api/session')
    .set('Origin', 'https://elsewhere.example')
    .send({ email: person.email, password: testPassword })
    .expect(403)
  await agent
    .post('/api/session')
    .set('Sec-Fetch-Site', 'cross-site')
    .send({ email: person.email, password: testPassword })
    .expect(403)
})

test('the eleventh wrong try on one account within a quarter of an hour is refused', async () => {
  const app = await createTestApp()
  const person = app.addPerson('office', 'Orla Brandt')
  const agent = await app.agentFor()
  for (let attempt = 0; attempt < 10; attempt++) {
    await agent.post('/api/session').send({ email: person.email, password: 'wrong' }).expect(401)
  }
  await agent.post('/api/session').send({ email: person.email, password: testPassword }).expect(429)
})

test('a body with a field that does not belong is refused with its name', async () => {
  const app = await createTestApp()
  const agent = await app.agentFor()
  const answer = await agent
    .post('/api/session')
    .send({ email: 'no address', password: 'x', extra: 1 })
    .expect(400)
  const paths = answer.body.issues.map((issue: { path: string }) => issue.path)
  expect(paths).toContain('email')
  expect(paths).toContain('extra')
})
