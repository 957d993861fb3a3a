import { mkdirSync, renameSync, writeFileSync } from 'node:fs'
import path from 'node:path'
import type { MailMessage, Transport } from 'nodemailer'

/** One message as the fake took it. */
export type FakeMail = {
  messageId: string
  from: string
  to: string
  subject: string
  text: string
  html: string
  /** The whole message as it would have gone over the wire. */
  raw: string
  /** Where it was written; null when nothing is kept on disk. */
  file: string | null
}

export type FakeMailInfo = { messageId: string; accepted: string[]; file: string | null }

export type FakeMailTransport = Transport<FakeMailInfo> & {
  /** What was taken since this transport was made, oldest first. */
  readonly sent: readonly FakeMail[]
  /** The next `count` messages are refused, as a server in trouble would. */
  failNext(count: number, message?: string): void
}

const largestBytes = 2_000_000
const addressShape = /^[^\s@<>",;]+@[^\s@<>",;]+\.[^\s@<>",;]+$/
const unfilled = /\bundefined\b|\bNaN\b|\[object Object\]/

type Checked = Omit<FakeMail, 'raw' | 'file'>

function filledText(name: string, value: unknown): string {
  if (typeof value !== 'string' || value.trim() === '') throw new Error(`The mail has no ${name}.`)
  if (unfilled.test(value)) throw new Error(`The mail's ${name} has an unfilled place in it.`)
  return value
}

function checkedAddresses(addresses: readonly string[], name: string): string {
  if (addresses.length === 0) throw new Error(`The mail has no ${name}.`)
  const wrong = addresses.find((address) => !addressShape.test(address))
  if (wrong !== undefined) throw new Error(`The mail's ${name} is no address: ${wrong}`)
  return addresses.join(', ')
}

/** Refuses what a real server would bounce, and what a reader would be puzzled by. */
function checked(mail: MailMessage<FakeMailInfo>): Checked {
  const envelope = mail.message.getEnvelope()
  const { subject, text, html } = mail.data
  const subjectText = filledText('subject', subject)
  if (/[\r\n]/.test(subjectText)) throw new Error("The mail's subject runs over a line.")
  return {
    messageId: mail.message.messageId(),
    from: checkedAddresses(envelope.from ? [envelope.from] : [], 'sender'),
    to: checkedAddresses(envelope.to, 'receiver'),
    subject: subjectText,
    text: filledText('text part', text),
    html: filledText('HTML part', html),
  }
}

function fileNameOf(messageId: string, count: number): string {
  const stamp = new Date().toISOString().replaceAll(/[:.]/g, '-')
  const id = messageId.replaceAll(/[^a-zA-Z0-9@.-]/g, '')
  return `${stamp}-${String(count).padStart(4, '0')}-${id}.eml`
}

/** Written aside and renamed, so that a file in the folder is always whole. */
function writeMessage(dir: string, name: string, raw: Buffer): string {
  mkdirSync(dir, { recursive: true })
  const file = path.join(dir, name)
  writeFileSync(`${file}.part`, raw)
  renameSync(`${file}.part`, file)
  return file
}

/**
 * A stand-in for a mail server: checks each message and keeps it as one file in `dir` (or in memory only
 * when `dir` is null). Handed to nodemailer's `createTransport`.
 */
export function createFakeMailTransport({ dir }: { dir: string | null }): FakeMailTransport {
  const sent: FakeMail[] = []
  let failures: string[] = []

  async function take(mail: MailMessage<FakeMailInfo>): Promise<FakeMailInfo> {
    const failure = failures.shift()
    if (failure !== undefined) throw new Error(failure)
    const head = checked(mail)
    const raw = await mail.message.build()
    if (raw.length > largestBytes) throw new Error('The mail is too large.')
    const file =
      dir === null ? null : writeMessage(dir, fileNameOf(head.messageId, sent.length), raw)
    sent.push({ ...head, raw: raw.toString('utf8'), file })
    return { messageId: head.messageId, accepted: head.to.split(', '), file }
  }

  return {
    name: 'fake-mail',
    version: '1',
    sent,
    failNext(count, message = 'The fake mail server was told to refuse this.') {
      failures = Array.from({ length: count }, () => message)
    },
    send(mail, callback) {
      take(mail).then(
        (info) => callback(null, info),
        (error: unknown) => callback(error instanceof Error ? error : new Error(String(error))),
      )
    },
  }
}
