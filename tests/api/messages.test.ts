import { eq } from 'drizzle-orm'
import { expect, test } from 'vitest'
import { audit } from '../../server/db/tables/audit-tables.ts'
import { outbox } from '../../server/db/tables/mail-tables.ts'
import { newId } from '../../server/lib/ids.ts'
import { createMailYard, type MailYard } from '../mail/support/mail-yard.ts'

async function yardWithMail() {
  const yard = await createMailYard()
  yard.setPerson(yard.lead.id, { phone: '07 5550 4321' })
  yard.book(['2026-12-03'])
  yard.at('2026-12-02T05:00:00Z')
  await yard.worker().runOnce()
  const office = await yard.agentFor(yard.office.email)
  const reminder = yard.mailOf(`reminder:${yard.lead.id}:2026-12-03`)!
  return { yard, office, reminder }
}

function addMail(yard: MailYard, change: Partial<typeof outbox.$inferInsert> = {}): string {
  const id = newId()
  yard.db
    .insert(outbox)
    .values({
      id,
      key: `invitation:${id}`,
      kind: 'invitation',
      personId: yard.apprentice.id,
      toName: yard.apprentice.name,
      toEmail: yard.apprentice.email,
      payload: {},
      state: 'failed',
      attempts: 21,
      lastError: 'No such mailbox',
      notBefore: yard.clock.current,
      createdAt: yard.clock.current,
      ...change,
    })
    .run()
  return id
}

const stateOf = (yard: MailYard, id: string) =>
  yard.db.select().from(outbox).where(eq(outbox.id, id)).get()?.state

test('the office reads what was sent, newest first, word for word', async () => {
  const { yard, office, reminder } = await yardWithMail()
  const newer = addMail(yard, { createdAt: new Date('2026-12-02T05:30:00Z') })
  const list = await office.get('/api/messages').expect(200)
  expect(list.body.messages).toHaveLength(3)
  expect(list.body.messages[0].id).toBe(newer)
  expect(list.body).toMatchObject({ nextCursor: null, fakeMail: true })
  const detail = await office.get(`/api/messages/${reminder.id}`).expect(200)
  expect(detail.body).toMatchObject({
    state: 'sent',
    kind: 'crew-reminder',
    day: '2026-12-03',
    toEmail: yard.lead.email,
    subject: 'Thu 3 Dec, 07:00: 12 Kiln Road, Marrow Creek',
    text: yard.sentTo(yard.lead.email)[0]?.text,
    html: yard.sentTo(yard.lead.email)[0]?.html,
    mayRetry: false,
  })
})

test('only the office reads or resends messages; signed out nobody does', async () => {
  const { yard, reminder } = await yardWithMail()
  for (const [email, status] of [
    [yard.lead.email, 403],
    [yard.apprentice.email, 403],
    [undefined, 401],
  ] as const) {
    const agent = await yard.agentFor(email)
    await agent.get('/api/messages').expect(status)
    await agent.get(`/api/messages/${reminder.id}`).expect(status)
    const refused = await agent.post(`/api/messages/${reminder.id}/retry`).send({}).expect(status)
    expect(JSON.stringify(refused.body)).not.toContain('Kiln Road')
  }
})

test('the list is narrowed by state, kind and words, and a percent sign is only a percent sign', async () => {
  const { yard, office } = await yardWithMail()
  addMail(yard)
  const count = async (query: string) =>
    (await office.get(`/api/messages?${query}`).expect(200)).body.messages.length as number
  expect(await count('state=failed')).toBe(1)
  expect(await count('kind=crew-reminder')).toBe(2)
  expect(await count('q=tamsin')).toBe(1)
  expect(await count('q=kiln%20road')).toBe(2)
  expect(await count('q=%25')).toBe(0)
  expect(await count('q=kiln&state=failed')).toBe(0)
})

test('a filter that is not one is refused by its name', async () => {
  const { office } = await yardWithMail()
  for (const [query, path] of [
    ['state=gone', 'state'],
    ['kind=letter', 'kind'],
    ['cursor=here', 'cursor'],
    ['colour=red', 'colour'],
  ]) {
    const answer = await office.get(`/api/messages?${query}`).expect(400)
    expect(answer.body.issues[0].path).toBe(path)
  }
})

test('the pages follow each other without a gap or a repeat, also for mails of one instant', async () => {
  const yard = await createMailYard()
  const ids = Array.from({ length: 120 }, () => addMail(yard))
  const office = await yard.agentFor(yard.office.email)
  const seen: string[] = []
  let cursor: string | null = ''
  while (cursor !== null) {
    const query: string = cursor ? `?cursor=${cursor}` : ''
    const page = (await office.get(`/api/messages${query}`).expect(200)).body as {
      messages: { id: string }[]
      nextCursor: string | null
    }
    seen.push(...page.messages.map((one) => one.id))
    cursor = page.nextCursor
  }
  expect(seen).toHaveLength(ids.length)
  expect(new Set(seen)).toEqual(new Set(ids))
})

test('a failed mail tried again goes out, once, however often it was asked for', async () => {
  const yard = await createMailYard()
  const id = addMail(yard)
  const office = await yard.agentFor(yard.office.email)
  expect((await office.get(`/api/messages/${id}`)).body.mayRetry).toBe(true)
  const first = await office.post(`/api/messages/${id}/retry`).send({}).expect(200)
  expect(first.body).toMatchObject({ state: 'waiting', attempts: 0, lastError: null })
  await office.post(`/api/messages/${id}/retry`).send({}).expect(200)
  expect(yard.db.select().from(audit).where(eq(audit.entityId, id)).all()).toHaveLength(1)
  await yard.worker().runOnce()
  expect(yard.fake.sent).toHaveLength(1)
  expect(stateOf(yard, id)).toBe('sent')
  await office.post(`/api/messages/${id}/retry`).send({}).expect(409)
})

test('a reminder for work that has started is not tried again', async () => {
  const yard = await createMailYard()
  const id = addMail(yard, { notAfter: yard.clock.current })
  const office = await yard.agentFor(yard.office.email)
  expect((await office.get(`/api/messages/${id}`)).body.mayRetry).toBe(false)
  await office.post(`/api/messages/${id}/retry`).send({}).expect(409)
  expect(stateOf(yard, id)).toBe('failed')
})

test('a message that is not there is 404, half an id likewise, and a body with more in it is refused', async () => {
  const { yard, office } = await yardWithMail()
  await office.get(`/api/messages/${newId()}`).expect(404)
  await office.post(`/api/messages/${newId()}/retry`).send({}).expect(404)
  await office.get('/api/messages/half').expect(404)
  const id = addMail(yard)
  const answer = await office.post(`/api/messages/${id}/retry`).send({ state: 'sent' }).expect(400)
  expect(answer.body.issues[0].path).toBe('state')
  expect(stateOf(yard, id)).toBe('failed')
})

test('words to text are offered where the person has a phone, and never for a mail with a secret link', async () => {
  const { yard, office, reminder } = await yardWithMail()
  const detail = await office.get(`/api/messages/${reminder.id}`).expect(200)
  expect(detail.body.textIt).toEqual({
    phone: '07 5550 4321',
    words:
      'Thu 3 Dec, 07:00: 12 Kiln Road, Marrow Creek. http://ridgehand.test/today?day=2026-12-03',
  })
  const noPhone = yard.mailOf(`reminder:${yard.apprentice.id}:2026-12-03`)!
  expect((await office.get(`/api/messages/${noPhone.id}`)).body.textIt).toBeNull()
  const secret = addMail(yard, { personId: yard.lead.id })
  expect((await office.get(`/api/messages/${secret}`)).body.textIt).toBeNull()
})
