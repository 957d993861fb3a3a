import type { AddressInfo } from 'node:net'
import request from 'supertest'
import { expect, test } from 'vitest'
import { readEnv } from '../../server/env.ts'
import { createTestApp, testNow, type TestApp, testPassword } from './harness.ts'

const cookieOf = (answer: request.Response) => answer.get('Set-Cookie')?.[0] ?? ''

async function signIn(app: TestApp, email: string): Promise<string> {
  const answer = await request(app.app)
    .post('/api/session')
    .send({ email, password: testPassword })
    .expect(201)
  return cookieOf(answer).split(';')[0] ?? ''
}

/** A stream of news as a browser keeps it open; `heard` grows, `ended` resolves when the server closes it. */
async function listen(app: TestApp, cookie: string) {
  const server = app.app.listen(0)
  const { port } = server.address() as AddressInfo
  const answer = await fetch(`http://127.0.0.1:${port}/api/events`, { headers: { cookie } })
  expect(answer.status).toBe(200)
  const reader = answer.body!.getReader()
  const heard: string[] = []
  const ended = (async () => {
    for (;;) {
      const { done, value } = await reader.read()
      if (done) return
      heard.push(new TextDecoder().decode(value))
    }
  })()
  // Cut off by the test itself, it is no fault.
  ended.catch(() => undefined)
  const stop = () => {
    server.closeAllConnections()
    server.close()
  }
  return { heard, ended, stop }
}

const news = (heard: string[]) => heard.join('').match(/data: /g)?.length ?? 0

async function expectClosed(
  app: TestApp,
  email: string,
  end: (cookie: string) => Promise<unknown>,
): Promise<void> {
  const cookie = await signIn(app, email)
  const stream = await listen(app, cookie)
  app.events.publish({ topic: 'jobs' })
  await expect.poll(() => news(stream.heard)).toBe(1)
  await end(cookie)
  app.events.publish({ topic: 'people' })
  await stream.ended
  expect(stream.heard.join('')).not.toContain('people')
  stream.stop()
}

test('signing out ends the stream of news, and nothing more is heard on it', async () => {
  const app = await createTestApp()
  const { email } = app.addPerson('leading-hand', 'Tamsin Rook')
  await expectClosed(app, email, (cookie) =>
    request(app.app).delete('/api/session').set('Cookie', cookie).expect(200),
  )
})

test('a password changed on another device ends the stream of news', async () => {
  const app = await createTestApp()
  const { email } = app.addPerson('leading-hand', 'Tamsin Rook')
  await expectClosed(app, email, async () => {
    const elsewhere = await app.agentFor(email)
    await elsewhere
      .put('/api/session/password')
      .send({ current: testPassword, next: 'another one for the crew' })
      .expect(200)
  })
})

test('access taken away ends the stream of news', async () => {
  const app = await createTestApp()
  const office = await app.agentFor(app.addPerson('office', 'Orla Brandt').email)
  const person = app.addPerson('apprentice', 'Wim Casey')
  await expectClosed(app, person.email, () =>
    office
      .patch(`/api/people/${person.id}`)
      .send({ ...person, id: undefined, phone: '', role: 'apprentice', active: false, version: 1 })
      .expect(200),
  )
})

test('a thirteenth stream of news of one person closes the oldest, and nobody else’s', async () => {
  const app = await createTestApp()
  const { email } = app.addPerson('office', 'Orla Brandt')
  const other = app.addPerson('leading-hand', 'Tamsin Rook')
  const cookie = await signIn(app, email)
  const others = await listen(app, await signIn(app, other.email))
  const streams = []
  for (let i = 0; i < 13; i++) streams.push(await listen(app, cookie))
  const [oldest, ...kept] = streams
  await oldest!.ended
  expect(oldest!.heard.join('')).toContain('event: superseded')
  app.events.publish({ topic: 'jobs' })
  for (const stream of [...kept, others]) await expect.poll(() => news(stream.heard)).toBe(1)
  expect(oldest!.heard.join('')).not.toContain('jobs')
  // A place given up is free again.
  kept[0]!.stop()
  await kept[0]!.ended.catch(() => undefined)
  const again = await listen(app, cookie)
  app.events.publish({ topic: 'firm' })
  for (const stream of [...kept.slice(1), others]) {
    await expect.poll(() => news(stream.heard)).toBe(2)
  }
  for (const stream of [...streams, others, again]) stream.stop()
})

test('a session ends thirty days after signing in, however much it is used', async () => {
  const app = await createTestApp()
  const { email } = app.addPerson('office', 'Orla Brandt')
  const cookie = await signIn(app, email)
  const userOn = async (day: number) => {
    app.clock.current = new Date(testNow.getTime() + day * 86_400_000)
    const { body } = await request(app.app).get('/api/session').set('Cookie', cookie).expect(200)
    return body.user?.name ?? null
  }
  for (const day of [1, 10, 20, 29.9]) expect(await userOn(day)).toBe('Orla Brandt')
  expect(await userOn(30)).toBeNull()
  await request(app.app).get('/api/jobs').set('Cookie', cookie).expect(401)
})

test('signing in gives a new session: one planted beforehand stays signed out', async () => {
  const app = await createTestApp()
  const { email } = app.addPerson('office', 'Orla Brandt')
  const before = await signIn(app, email)
  const answer = await request(app.app)
    .post('/api/session')
    .set('Cookie', before)
    .send({ email, password: testPassword })
    .expect(201)
  expect(cookieOf(answer).split(';')[0]).not.toBe(before)
  const { body } = await request(app.app).get('/api/session').set('Cookie', before).expect(200)
  expect(body.user).toBeNull()
})

test('behind TLS the cookie is for TLS only; scripts and other sites never have it', async () => {
  const https = { APP_URL: 'https://roofs.example' }
  const app = await createTestApp({ env: https })
  const { email } = app.addPerson('office', 'Orla Brandt')
  const answer = await request(app.app)
    .post('/api/session')
    .set('X-Forwarded-Proto', 'https')
    .send({ email, password: testPassword })
    .expect(201)
  expect(cookieOf(answer)).toMatch(/; Secure/)
  expect(cookieOf(answer)).toMatch(/; HttpOnly/)
  expect(cookieOf(answer)).toMatch(/; SameSite=Lax/)
  expect(answer.get('Strict-Transport-Security')).toMatch(/max-age=\d+/)
})

test('this server speaks no TLS itself, so an https address means one proxy, and none is refused', () => {
  expect(readEnv({ APP_URL: 'https://roofs.example' }).trustProxy).toBe(1)
  expect(readEnv({ APP_URL: 'http://roofs.example' }).trustProxy).toBe(0)
  expect(readEnv({ APP_URL: 'https://roofs.example', TRUST_PROXY: '2' }).trustProxy).toBe(2)
  expect(() => readEnv({ APP_URL: 'https://roofs.example', TRUST_PROXY: '0' })).toThrow(
    /TRUST_PROXY: /,
  )
})

test.each(['javascript:alert(1)', 'localhost:4380', 'ftp://roofs.example'])(
  'an address that no browser opens as a page (%s) stops the start',
  (url) => {
    expect(() => readEnv({ APP_URL: url })).toThrow(/APP_URL: /)
  },
)
