import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs'
import { createServer } from 'node:http'
import path from 'node:path'
import { fileURLToPath } from 'node:url'
import connectSqlite3 from 'connect-sqlite3'
import type { RequestHandler } from 'express'
import session from 'express-session'
import { pino } from 'pino'
import { buildApp } from './app.ts'
import { createDayTurn } from './bookings/day-turn.ts'
import { openDatabase } from './db/client.ts'
import { demoSignIns, hasDemo } from './db/demo/demo-sign-ins.ts'
import { isEmpty, seedDemo } from './db/demo/seed-demo.ts'
import { migrateDatabase } from './db/migrate.ts'
import { type Env, readEnv } from './env.ts'
import { createEventHub } from './events/event-hub.ts'
import { builtScreens } from './http/screens.ts'
import { systemClock } from './lib/clock.ts'
import { createMailWorker } from './mail/mail-worker.ts'
import { createMailTransport } from './mail/transport.ts'
import { createFramer } from './revisions/framer.ts'

const projectDir = path.join(path.dirname(fileURLToPath(import.meta.url)), '..')

/** Outside production the secret is made once and kept beside the data, so that a restart signs nobody out. */
function keepSecret(env: Env): Env {
  if (process.env['SESSION_SECRET']) return env
  const file = path.join(env.dataDir, 'session-secret')
  mkdirSync(env.dataDir, { recursive: true, mode: 0o700 })
  if (!existsSync(file)) writeFileSync(file, env.sessionSecret, { mode: 0o600 })
  return { ...env, sessionSecret: readFileSync(file, 'utf8').trim() }
}

/** What to open in a browser on this machine. */
function address(env: Env): string {
  const host = env.host === '127.0.0.1' || env.host === '0.0.0.0' ? 'localhost' : env.host
  return `http://${host}:${env.port}`
}

async function hotScreens(): Promise<RequestHandler[]> {
  const { createServer: createVite } = await import('vite')
  const vite = await createVite({
    root: projectDir,
    server: { middlewareMode: true },
    appType: 'spa',
  })
  return [vite.middlewares]
}

async function main(): Promise<void> {
  const hot = process.argv.includes('--hot')
  const env = keepSecret(readEnv(process.env))
  const log = pino({ level: env.logLevel })
  const database = openDatabase(env.dataDir)
  migrateDatabase(database)
  if (env.seedDemo && isEmpty(database.db)) await seedDemo(database.db, systemClock)
  const SqliteStore = connectSqlite3(session)
  const sessionStore = new SqliteStore({ dir: env.dataDir, db: 'sessions.db' })
  const events = createEventHub()
  const framer = createFramer()
  const { app } = buildApp(
    {
      env,
      db: database.db,
      clock: systemClock,
      events,
      framer,
      log,
      sessionStore,
      screens: hot ? await hotScreens() : builtScreens(path.join(projectDir, 'dist')),
    },
    { hot },
  )
  const mailWorker = createMailWorker({
    db: database.db,
    clock: systemClock,
    transport: createMailTransport(env),
    appUrl: env.appUrl,
    mailFrom: env.mailFrom,
    log,
    events,
  })
  const dayTurn = createDayTurn({ db: database.db, clock: systemClock, events, log })
  const server = createServer(app)
  server.listen(env.port, env.host, () => {
    dayTurn.start()
    mailWorker.start()
    framer.warm()
    console.log(`Ridgehand is at ${address(env)}`)
    if (hasDemo(database.db)) console.log(demoSignIns())
  })
  const stop = () => {
    dayTurn.stop()
    const othersDone = Promise.allSettled([mailWorker.stop(), framer.close()])
    server.close(() => {
      void othersDone.finally(() => {
        database.close()
        process.exit(0)
      })
    })
    server.closeAllConnections()
  }
  process.once('SIGINT', stop)
  process.once('SIGTERM', stop)
}

main().catch((error: unknown) => {
  console.error(error instanceof Error ? error.message : error)
  process.exit(1)
})
