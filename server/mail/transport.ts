import path from 'node:path'
import { createTransport } from 'nodemailer'
import { createFakeMailTransport } from '../../fakes/mail/fake-mail-transport.ts'

export type OutgoingMail = {
  messageId: string
  from: string
  to: { name: string; address: string }
  subject: string
  text: string
  html: string
  headers: Record<string, string>
}

/** What the worker needs of nodemailer: hands one message over, and throws when it was not taken. */
export type MailTransport = { sendMail(mail: OutgoingMail): Promise<unknown>; close(): void }

const smtpTimeoutMs = 30_000

/** A real server when `SMTP_URL` is set; else the local fake, which keeps each mail as a file beside the data. */
export function createMailTransport(env: {
  smtpUrl: string | null
  dataDir: string
}): MailTransport {
  if (env.smtpUrl !== null) {
    return createTransport({
      url: env.smtpUrl,
      connectionTimeout: smtpTimeoutMs,
      greetingTimeout: smtpTimeoutMs,
      socketTimeout: smtpTimeoutMs,
    })
  }
  return createTransport(createFakeMailTransport({ dir: path.join(env.dataDir, 'fake-mail') }))
}
