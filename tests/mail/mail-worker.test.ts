import { readFileSync } from 'node:fs'
import { expect, test } from 'vitest'
import type { MailTransport, OutgoingMail } from '../../server/mail/transport.ts'
import { backOffMs, mostAttempts } from '../../server/mail/back-off.ts'
import { enqueueMail } from '../../server/mail/outbox-store.ts'
import { createMailYard, type MailYard } from './support/mail-yard.ts'

function enqueueReset(yard: MailYard, key = 'password-reset:1', kind = 'password-reset' as const) {
  enqueueMail(yard.db, {
    key,
    kind,
    personId: yard.lead.id,
    toName: yard.lead.name,
    toEmail: yard.lead.email,
    payload: {},
    now: yard.clock.current,
  })
}

/** Takes a mail and never answers: what a process sees that dies between 'sending' and 'sent'. */
function dyingTransport(taken: OutgoingMail[]): MailTransport {
  return {
    sendMail(mail) {
      taken.push(mail)
      return new Promise(() => undefined)
    },
    close: () => undefined,
  }
}

async function until(condition: () => boolean): Promise<void> {
  while (!condition()) await new Promise((resolve) => setTimeout(resolve, 5))
}

test('a crash between sending and sent repeats that one mail, marked, and loses none', async () => {
  const yard = await createMailYard()
  yard.book(['2026-12-03'])
  yard.at('2026-12-02T05:00:00Z')
  const taken: OutgoingMail[] = []
  void yard.worker(dyingTransport(taken)).runOnce()
  await until(() => taken.length === 1)
  expect(
    yard
      .mails()
      .map((mail) => mail.state)
      .sort(),
  ).toEqual(['sending', 'waiting'])

  await yard.worker().runOnce()
  expect(yard.fake.sent).toHaveLength(2)
  const twice = yard.mails().filter((mail) => mail.state === 'maybe-twice')
  expect(twice).toHaveLength(1)
  expect(twice[0]).toMatchObject({ inFlightBefore: true, toEmail: taken[0]?.to.address })
  expect(yard.mails().filter((mail) => mail.state === 'sent')).toHaveLength(1)
  // Both copies carry one Message-ID, so that a mail program can join them.
  expect(yard.sentTo(taken[0]?.to.address ?? '')[0]?.messageId).toBe(taken[0]?.messageId)
})

test('one mail is in flight at a time, also when runs overlap', async () => {
  const yard = await createMailYard()
  yard.book(['2026-12-03'])
  yard.at('2026-12-02T05:00:00Z')
  let inFlight = 0
  let most = 0
  let count = 0
  const transport: MailTransport = {
    async sendMail() {
      inFlight += 1
      most = Math.max(most, inFlight)
      await new Promise((resolve) => setTimeout(resolve, 10))
      inFlight -= 1
      count += 1
    },
    close: () => undefined,
  }
  const worker = yard.worker(transport)
  await Promise.all([worker.runOnce(), worker.runOnce(), worker.runOnce()])
  expect(count).toBe(2)
  expect(most).toBe(1)
})

test('stopping waits for the mail in flight and begins no other', async () => {
  const yard = await createMailYard()
  yard.book(['2026-12-03'])
  yard.at('2026-12-02T05:00:00Z')
  let release = () => undefined as void
  let begun = 0
  const transport: MailTransport = {
    sendMail() {
      begun += 1
      return new Promise<void>((resolve) => {
        release = resolve
      })
    },
    close: () => undefined,
  }
  const worker = yard.worker(transport)
  worker.start()
  await until(() => begun === 1)
  const stopped = worker.stop()
  release()
  await stopped
  expect(begun).toBe(1)
  expect(
    yard
      .mails()
      .map((mail) => mail.state)
      .sort(),
  ).toEqual(['sent', 'waiting'])
})

test('a server in trouble is tried again after one, two and four minutes, and then it goes', async () => {
  const yard = await createMailYard()
  enqueueReset(yard)
  const worker = yard.worker()
  yard.fake.failNext(3, 'Try later')
  await worker.runOnce()
  expect(yard.mails()[0]).toMatchObject({ state: 'waiting', attempts: 1, lastError: 'Try later' })
  const minutes = async (count: number) => {
    yard.clock.current = new Date(yard.clock.current.getTime() + count * 60_000)
    await worker.runOnce()
  }
  await minutes(0.99)
  expect(yard.mails()[0]?.attempts).toBe(1)
  await minutes(0.01)
  expect(yard.mails()[0]?.attempts).toBe(2)
  await minutes(2)
  expect(yard.mails()[0]?.attempts).toBe(3)
  await minutes(3)
  expect(yard.fake.sent).toHaveLength(0)
  await minutes(1)
  expect(yard.fake.sent).toHaveLength(1)
  expect(yard.mails()[0]).toMatchObject({ state: 'sent', attempts: 4, lastError: null })
})

test('a mail refused every time is given up as failed, once, with the reason', async () => {
  const yard = await createMailYard()
  enqueueReset(yard)
  const worker = yard.worker()
  yard.fake.failNext(1000, 'No such mailbox')
  let tries = 0
  for (; yard.mails()[0]?.state !== 'failed' && tries < 100; tries++) {
    await worker.runOnce()
    yard.clock.current = new Date(yard.clock.current.getTime() + backOffMs(tries + 1))
  }
  expect(tries).toBe(mostAttempts)
  expect(yard.mails()[0]).toMatchObject({ state: 'failed', lastError: 'No such mailbox' })
  await worker.runOnce()
  expect(yard.mails()[0]?.attempts).toBe(mostAttempts)
})

test('a line that broke after the text was handed over marks the mail, for it may have been taken', async () => {
  const yard = await createMailYard()
  enqueueReset(yard)
  let tries = 0
  const transport: MailTransport = {
    sendMail() {
      tries += 1
      if (tries > 1) return Promise.resolve()
      return Promise.reject(Object.assign(new Error('Connection lost'), { command: 'DATA' }))
    },
    close: () => undefined,
  }
  const worker = yard.worker(transport)
  await worker.runOnce()
  yard.clock.current = new Date(yard.clock.current.getTime() + 60_000)
  await worker.runOnce()
  expect(yard.mails()[0]).toMatchObject({ state: 'maybe-twice', inFlightBefore: true })
})

test('a password link is in the mail that leaves, works, and is kept nowhere', async () => {
  const yard = await createMailYard()
  for (const kind of ['password-reset', 'invitation'] as const) {
    yard.fake.failNext(1, 'refused')
    enqueueMail(yard.db, {
      key: `${kind}:1`,
      kind,
      personId: yard.lead.id,
      toName: yard.lead.name,
      toEmail: yard.lead.email,
      payload: {},
      now: yard.clock.current,
    })
    const worker = yard.worker()
    await worker.runOnce()
    yard.clock.current = new Date(yard.clock.current.getTime() + 60_000)
    await worker.runOnce()
    const mail = yard.fake.sent[yard.fake.sent.length - 1]!
    const link = /http:\/\/ridgehand\.test\/set-password\?token=([\w-]{40,})/.exec(mail.text)
    const token = link?.[1] ?? ''
    expect(mail.html).toContain(`set-password?token=${token}`)
    const row = yard.mailOf(`${kind}:1`)
    expect(row?.text).toContain('[link left out]')
    expect(row?.html).toContain('[link left out]')
    const wholeDatabase = yard.database.sqlite.serialize().toString('latin1')
    expect(wholeDatabase).toContain('[link left out]')
    expect(wholeDatabase).not.toContain(token)
    const agent = await yard.agentFor()
    await agent
      .put('/api/password-resets')
      .send({ token, password: 'a new one for the crew' })
      .expect(200)
  }
})

test('an address mended while a mail waits is the one it goes to', async () => {
  const yard = await createMailYard()
  enqueueReset(yard)
  yard.setPerson(yard.lead.id, { email: 'tamsin@quillback.example' })
  await yard.worker().runOnce()
  expect(yard.fake.sent[0]?.to).toBe('tamsin@quillback.example')
})

test('the fake refuses a mail with a part missing, a bad address or an unfilled place', async () => {
  const { createTransport } = await import('nodemailer')
  const { createFakeMailTransport } = await import('../../fakes/mail/fake-mail-transport.ts')
  const { mkdtempSync } = await import('node:fs')
  const dir = mkdtempSync(`${process.env['TMPDIR'] ?? '/tmp'}/fake-mail-`)
  const fake = createFakeMailTransport({ dir })
  const transport = createTransport(fake)
  const whole = {
    from: 'Ridgehand <roofs@ridgehand.example>',
    to: 'tamsin@quillback.example',
    subject: 'Thu 3 Dec',
    text: 'Start 07:00',
    html: '<p>Start 07:00</p>',
  }
  await expect(transport.sendMail({ ...whole, html: '' })).rejects.toThrow('HTML part')
  await expect(transport.sendMail({ ...whole, subject: '' })).rejects.toThrow('subject')
  await expect(transport.sendMail({ ...whole, to: 'tamsin@quillback' })).rejects.toThrow('receiver')
  await expect(transport.sendMail({ ...whole, text: 'Start undefined' })).rejects.toThrow(
    'unfilled',
  )
  await transport.sendMail(whole)
  expect(fake.sent).toHaveLength(1)
  expect(readFileSync(fake.sent[0]?.file ?? '', 'utf8')).toContain('Subject: Thu 3 Dec')
})
