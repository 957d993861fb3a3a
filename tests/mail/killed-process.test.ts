import { spawn } from 'node:child_process'
import { existsSync, mkdtempSync, readdirSync, readFileSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { expect, test } from 'vitest'
import { openDatabase } from '../../server/db/client.ts'
import { migrateDatabase } from '../../server/db/migrate.ts'
import { outbox } from '../../server/db/tables/mail-tables.ts'
import { people } from '../../server/db/tables/people-tables.ts'
import { newId } from '../../server/lib/ids.ts'
import { enqueueMail } from '../../server/mail/outbox-store.ts'

const mailCount = 12
/** Three starts of a process, on a machine that may be busy. */
const timeoutMs = 120_000
const now = new Date('2026-12-02T00:00:00Z')
const script = path.join(import.meta.dirname, 'support/mail-process.ts')

function seed(dataDir: string): void {
  const database = openDatabase(dataDir)
  migrateDatabase(database)
  for (let i = 0; i < mailCount; i++) {
    const id = newId()
    const [name, email] = [`Hand ${i}`, `hand.${i}@quillback.example`]
    database.db.insert(people).values({ id, name, email, role: 'apprentice', createdAt: now }).run()
    enqueueMail(database.db, {
      key: `invitation:${id}`,
      kind: 'invitation',
      personId: id,
      toName: name,
      toEmail: email,
      payload: {},
      now,
    })
  }
  database.close()
}

function filesIn(dir: string): string[] {
  return existsSync(dir) ? readdirSync(dir).filter((name) => name.endsWith('.eml')) : []
}

/** Runs the sender; kills it dead once `killAtFiles` mails lie in the folder. */
function runSender(dataDir: string, mailDir: string, killAtFiles: number | null): Promise<void> {
  return new Promise((resolve, reject) => {
    const child = spawn(
      process.execPath,
      ['--import', 'tsx', script, dataDir, mailDir, now.toISOString()],
      { stdio: ['ignore', 'ignore', 'inherit'] },
    )
    const watch = setInterval(() => {
      if (killAtFiles !== null && filesIn(mailDir).length >= killAtFiles) child.kill('SIGKILL')
    }, 2)
    child.on('exit', (code, signal) => {
      clearInterval(watch)
      const asMeant = killAtFiles === null ? code === 0 : signal === 'SIGKILL'
      if (asMeant) resolve()
      else reject(new Error(`The sender ended with ${code ?? signal}.`))
    })
  })
}

test(
  'a sender killed twice in the middle loses no mail, and each kill repeats one mail, marked',
  async () => {
    const dir = mkdtempSync(path.join(tmpdir(), 'killed-'))
    const mailDir = path.join(dir, 'mail')
    seed(dir)
    await runSender(dir, mailDir, 3)
    await runSender(dir, mailDir, 7)
    await runSender(dir, mailDir, null)

    const copies = new Map<string, number>()
    for (const file of filesIn(mailDir)) {
      const to = /^To: .*?([\w.]+@quillback\.example)/m.exec(
        readFileSync(path.join(mailDir, file), 'utf8'),
      )?.[1]
      copies.set(to ?? '', (copies.get(to ?? '') ?? 0) + 1)
    }
    const database = openDatabase(dir)
    const rows = database.db.select().from(outbox).all()
    database.close()
    rmSync(dir, { recursive: true })

    expect(copies.size).toBe(mailCount)
    const twice = [...copies].filter(([, count]) => count > 1)
    expect(twice.length).toBeLessThanOrEqual(2)
    expect(twice.length).toBeGreaterThan(0)
    const marked = rows.filter((row) => row.state === 'maybe-twice').map((row) => row.toEmail)
    for (const [email, count] of twice) {
      expect(count).toBe(2)
      expect(marked).toContain(email)
    }
    expect(rows.filter((row) => row.state === 'sent')).toHaveLength(mailCount - marked.length)
    expect(marked.length).toBeLessThanOrEqual(2)
  },
  timeoutMs,
)
