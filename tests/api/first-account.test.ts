import { expect, test } from 'vitest'
import { people } from '../../server/db/tables/people-tables.ts'
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

test('an address or a name that cannot be is said in plain words, and makes no account', async () => {
  const app = await createTestApp()
  const make = (email: string, name: string) => () =>
    makeFirstAccount(app.db, { email, name, now: app.clock.current })
  const words = 'Give a whole e-mail address, like name@firm.example.'
  expect(make('marnie', 'Marnie Quill')).toThrow(new Error(words))
  expect(make('marnie', '  ')).toThrow(new Error(`${words}\nGive a name.`))
  expect(app.db.select().from(people).all()).toEqual([])
})
