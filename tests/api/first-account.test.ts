import { expect, test } from 'vitest'
import { makeFirstAccount } from '../../server/people/first-account.ts'
import { createTestApp } from './harness.ts'

test('a new installation gets its first office account by a link, and only the first', async () => {
  const app = await createTestApp()
  const who = { email: 'Marnie@Quillback.example', name: 'Marnie Quill', now: app.clock.current }
  const token = makeFirstAccount(app.db, who)
  const agent = await app.agentFor()
  await agent
    .put('/api/password-resets')
    .send({ token, password: 'first thing in the morning' })
    .expect(200)
  const { body } = await agent.get('/api/session').expect(200)
  expect(body.user).toMatchObject({ email: 'marnie@quillback.example', role: 'office' })
  expect(() => makeFirstAccount(app.db, { ...who, email: 'another@quillback.example' })).toThrow(
    /already/,
  )
})
