import type { AddressInfo } from 'node:net'
import { type ParsedMail, simpleParser } from 'mailparser'
import { SMTPServer } from 'smtp-server'
import { expect, test } from 'vitest'
import { createMailTransport } from '../../server/mail/transport.ts'
import { createMailYard } from './support/mail-yard.ts'

type Taken = { to: string[]; mail: ParsedMail }

/** A mail server on a free port of this machine; refuses the first `refusals` texts for now (451, RFC 5321 4.2.3). */
async function mailServer(refusals: number) {
  const taken: Taken[] = []
  let left = refusals
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ['STARTTLS', 'AUTH'],
    onData(stream, session, callback) {
      simpleParser(stream).then(
        (mail) => {
          if (left > 0) {
            left -= 1
            return callback(Object.assign(new Error('Try again later'), { responseCode: 451 }))
          }
          taken.push({ to: session.envelope.rcptTo.map((one) => one.address), mail })
          callback()
        },
        (error: Error) => callback(error),
      )
    },
  })
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', () => resolve()))
  const { port } = server.server.address() as AddressInfo
  return {
    taken,
    url: `smtp://127.0.0.1:${port}`,
    close: () => new Promise<void>((resolve) => server.close(() => resolve())),
  }
}

test('over a real SMTP server the reminder arrives whole, after one refusal, with both parts', async () => {
  const server = await mailServer(1)
  const yard = await createMailYard()
  yard.setPerson(yard.lead.id, { name: 'Tåmsin Rook' })
  yard.book(['2026-12-03'])
  yard.at('2026-12-02T05:00:00Z')
  const worker = yard.worker(createMailTransport({ smtpUrl: server.url, dataDir: 'unused' }))
  await worker.runOnce()
  expect(server.taken).toHaveLength(1)
  expect(yard.mails().find((mail) => mail.state === 'waiting')?.lastError).toContain('451')
  yard.at('2026-12-02T05:01:00Z')
  await worker.runOnce()
  await worker.stop()
  await server.close()

  expect(server.taken.map((one) => one.to[0]).sort()).toEqual(
    [yard.apprentice.email, yard.lead.email].sort(),
  )
  const mine = server.taken.find((one) => one.to[0] === yard.lead.email)?.mail
  const row = yard.mailOf(`reminder:${yard.lead.id}:2026-12-03`)
  expect(mine?.subject).toBe('Thu 3 Dec, 07:00: 12 Kiln Road, Marrow Creek')
  expect(mine?.text?.trim()).toBe(row?.text?.trim())
  expect(String(mine?.html).trim()).toBe(row?.html?.trim())
  expect(mine?.text).toContain('140 × 45')
  expect(mine?.messageId).toBe(`<${row?.id}@ridgehand.example>`)
  expect(mine?.headers.get('auto-submitted')).toBe('auto-generated')
  expect(mine?.attachments).toHaveLength(0)
})
