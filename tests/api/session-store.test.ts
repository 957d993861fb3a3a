import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import path from 'node:path'
import connectSqlite3 from 'connect-sqlite3'
import session from 'express-session'
import request from 'supertest'
import { expect, test } from 'vitest'
import { buildApp } from '../../server/app.ts'
import { sessionCookieName } from '../../server/auth/session.ts'
import { readEnv } from '../../server/env.ts'
import { createTestApp, testPassword } from './harness.ts'

const SqliteStore = connectSqlite3(session)

test('a restart of the server signs nobody out: sessions are on disk', async () => {
  const dir = mkdtempSync(path.join(tmpdir(), 'ridgehand-sessions-'))
  const test = await createTestApp()
  const person = test.addPerson('office', 'Orla Brandt')
  const start = () =>
    buildApp({ ...test.deps, sessionStore: new SqliteStore({ dir, db: 'sessions.db' }) }).app
  const signIn = await request(start())
    .post('/api/session')
    .send({ email: person.email, password: testPassword })
    .expect(201)
  const cookie = signIn.get('Set-Cookie')?.[0]?.split(';')[0] ?? ''
  const after = await request(start()).get('/api/session').set('Cookie', cookie).expect(200)
  expect(after.body.user.name).toBe('Orla Brandt')
  rmSync(dir, { recursive: true, force: true })
})

test('the cookie is httpOnly and sameSite, and secure once the address is https', async () => {
  const test = await createTestApp()
  const person = test.addPerson('office', 'Orla Brandt')
  const env = readEnv({
    NODE_ENV: 'test',
    PORT: '0',
    APP_URL: 'https://roofs.example',
    TRUST_PROXY: '1',
  })
  const { app } = buildApp({ ...test.deps, env, sessionStore: new session.MemoryStore() })
  const body = { email: person.email, password: testPassword }
  const behindTls = await request(app)
    .post('/api/session')
    .set('X-Forwarded-Proto', 'https')
    .send(body)
    .expect(201)
  const cookie =
    behindTls.get('Set-Cookie')?.find((line) => line.startsWith(sessionCookieName)) ?? ''
  expect(cookie).toMatch(/HttpOnly/)
  expect(cookie).toMatch(/SameSite=Lax/)
  expect(cookie).toMatch(/Secure/)
  const plain = await request(test.app).post('/api/session').send(body).expect(201)
  expect(plain.get('Set-Cookie')?.[0]).not.toMatch(/Secure/)
})

test('signing in gives a new session id, so that one planted beforehand is worth nothing', async () => {
  const test = await createTestApp()
  const person = test.addPerson('office', 'Orla Brandt')
  const agent = await test.agentFor()
  const body = { email: person.email, password: testPassword }
  const idOf = (answer: { get(name: string): string[] | string | undefined }) =>
    [answer.get('Set-Cookie')].flat()[0]?.split(';')[0]
  const first = idOf(await agent.post('/api/session').send(body).expect(201))
  const second = idOf(await agent.post('/api/session').send(body).expect(201))
  expect(first).toContain(sessionCookieName)
  expect(second).toContain(sessionCookieName)
  expect(second).not.toBe(first)
  const old = await request(test.app)
    .get('/api/session')
    .set('Cookie', first ?? '')
  expect(old.body.user).toBeNull()
})
