import { createServer, type Server } from 'node:http'
import type { AddressInfo } from 'node:net'
import autocannon from 'autocannon'
import { eq } from 'drizzle-orm'
import express from 'express'
import request from 'supertest'
import { demoPassword } from '../../server/db/demo/demo-people.ts'
import { seedDemo } from '../../server/db/demo/seed-demo.ts'
import { people } from '../../server/db/tables/people-tables.ts'
import { daySheetsFor } from '../../server/day-sheets/day-sheet-service.ts'
import { readFirm } from '../../server/firm/firm-store.ts'
import {
  keptIssuedRoofs,
  readIssuedRoofs,
  type ReadIssuedRoofs,
} from '../../server/revisions/issued-roofs.ts'
import { createTestApp, type TestApp } from '../api/harness.ts'
import { mediansMs, takenMs } from './timing.ts'

const email = 'tamsin@quillback.example'
const day = '2026-12-02'

function listen(server: Server): Promise<string> {
  return new Promise((resolve) => {
    server.listen(0, '127.0.0.1', () =>
      resolve(`http://127.0.0.1:${(server.address() as AddressInfo).port}`),
    )
  })
}

async function load(url: string, headers: Record<string, string>) {
  await autocannon({ url, headers, connections: 4, duration: 3 })
  const { latency, requests, non2xx } = await autocannon({
    url,
    headers,
    connections: 4,
    duration: 8,
  })
  if (non2xx > 0) throw new Error(`${non2xx} answers of ${url} were no success`)
  return { p50: latency.p50, p99: latency.p99, perSecond: requests.average }
}

/** What keeping issued roofs is worth: the same sheet, its roofs read anew each time and once. */
function benchKeptRoofs(app: TestApp): void {
  const user = app.db.select().from(people).where(eq(people.email, email)).get()
  if (!user) throw new Error('the demo has no such person')
  const viewer = { user, firm: readFirm(app.db), now: app.clock.now() }
  const readBy = (readRoofs: ReadIssuedRoofs) => () =>
    daySheetsFor({ db: app.db, readRoofs }, viewer, { day })
  const { anew, kept } = mediansMs(
    { anew: readBy(readIssuedRoofs), kept: readBy(keptIssuedRoofs()) },
    { warmUps: 60, mostRuns: 200, leastRuns: 100 },
  )
  console.log(
    `  the sheet alone: roofs read anew ${anew.toFixed(2)} ms, kept ${kept.toFixed(2)} ms, × ${(anew / kept).toFixed(2)}`,
  )
}

/** The day sheet of the demo's crew against a bare route that sends the same bytes. */
export async function benchDaySheet(): Promise<void> {
  const app = await createTestApp()
  const began = takenMs()
  await seedDemo(app.db, app.clock)
  console.log(
    `\nDemo seeded in ${((takenMs() - began) / 1000).toFixed(1)} processor seconds, the engine not warmed up`,
  )
  const signIn = await request(app.app)
    .post('/api/session')
    .send({ email, password: demoPassword })
    .expect(201)
  const cookie = (signIn.get('Set-Cookie') ?? []).map((line) => line.split(';')[0]).join('; ')
  const path = `/api/day-sheets?day=${day}`
  const sheet = await request(app.app).get(path).set('Cookie', cookie).expect(200)
  const bare = express()
  bare.get('/bytes', (_req, res) => {
    res.type('application/json').send(sheet.text)
  })
  const [ours, theirs] = [createServer(app.app), createServer(bare)]
  const [ourUrl, bareUrl] = [await listen(ours), await listen(theirs)]
  const bareLoad = await load(`${bareUrl}/bytes`, {})
  const ourLoad = await load(`${ourUrl}${path}`, { Cookie: cookie })
  console.log(`Day sheet, ${sheet.text.length} bytes, 4 connections`)
  for (const [name, one] of [
    ['bare Express route', bareLoad],
    ['day-sheet route', ourLoad],
  ] as const) {
    console.log(
      `  ${name.padEnd(20)} p50 ${one.p50} ms  p99 ${one.p99} ms  ${one.perSecond.toFixed(0)} a second`,
    )
  }
  console.log(
    `  ratio of requests a second: ${(bareLoad.perSecond / ourLoad.perSecond).toFixed(1)}`,
  )
  benchKeptRoofs(app)
  ours.close()
  theirs.close()
  app.close()
}
