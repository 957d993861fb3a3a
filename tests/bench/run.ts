import { createServer, type Server } from 'node:http'
import type { AddressInfo } from 'node:net'
import autocannon from 'autocannon'
import express from 'express'
import request from 'supertest'
import { demoPassword } from '../../server/db/demo/demo-people.ts'
import { seedDemo } from '../../server/db/demo/seed-demo.ts'
import { frameRoof } from '../../shared/roof/frame-roof.ts'
import { createTestApp } from '../api/harness.ts'
import { benchRoofs } from './bench-roofs.ts'

const runs = 60
const warmUps = 15

function quantile(sorted: number[], q: number): number {
  return sorted[Math.min(sorted.length - 1, Math.floor(q * sorted.length))] ?? Number.NaN
}

/** Medians of the whole frame, and each against the first roof of the same run. */
function benchFrames(): void {
  console.log(`frameRoof, median of ${runs} runs`)
  const roofs = benchRoofs()
  // All of them first: the first one measured must not pay for the compiling.
  for (let i = 0; i < warmUps; i++) for (const { roof } of roofs) frameRoof(roof)
  let base = Number.NaN
  for (const { name, roof } of roofs) {
    const members = frameRoof(roof).members.length
    const times = Array.from({ length: runs }, () => {
      const started = performance.now()
      frameRoof(roof)
      return performance.now() - started
    }).sort((a, b) => a - b)
    const median = quantile(times, 0.5)
    if (Number.isNaN(base)) base = median
    const ratio = (median / base).toFixed(2)
    console.log(
      `  ${name.padEnd(34)} ${String(members).padStart(4)} members ${median.toFixed(2).padStart(8)} ms  × ${ratio}`,
    )
  }
}

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

/** The day sheet of the demo's crew against a bare route that sends the same bytes. */
async function benchDaySheet(): Promise<void> {
  const app = await createTestApp()
  await seedDemo(app.db, app.clock)
  const signIn = await request(app.app)
    .post('/api/session')
    .send({ email: 'tamsin@quillback.example', password: demoPassword })
  const cookie = (signIn.get('Set-Cookie') ?? []).map((line) => line.split(';')[0]).join('; ')
  const path = '/api/day-sheets?day=2026-12-02'
  const sheet = await request(app.app).get(path).set('Cookie', cookie).expect(200)
  const bare = express()
  bare.get('/bytes', (_req, res) => {
    res.type('application/json').send(sheet.text)
  })
  const [ours, theirs] = [createServer(app.app), createServer(bare)]
  const [ourUrl, bareUrl] = [await listen(ours), await listen(theirs)]
  const bareLoad = await load(`${bareUrl}/bytes`, {})
  const ourLoad = await load(`${ourUrl}${path}`, { Cookie: cookie })
  console.log(`\nday sheet, ${sheet.text.length} bytes, 4 connections`)
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
  ours.close()
  theirs.close()
  app.close()
}

benchFrames()
await benchDaySheet()
process.exit(0)
