import session from 'express-session'
import { type Logger, pino } from 'pino'
import request from 'supertest'
import type { Role } from '../../shared/auth/roles.ts'
import { buildApp } from '../../server/app.ts'
import { hashPassword } from '../../server/auth/passwords.ts'
import { openDatabase } from '../../server/db/client.ts'
import { migrateDatabase } from '../../server/db/migrate.ts'
import { crewMembers, crews, people } from '../../server/db/tables/people-tables.ts'
import { readEnv } from '../../server/env.ts'
import { createEventHub } from '../../server/events/event-hub.ts'
import { readFirm } from '../../server/firm/firm-store.ts'
import { newId } from '../../server/lib/ids.ts'
import type { Framer } from '../../server/revisions/framer.ts'
import { prepareRevision } from '../../server/revisions/prepare-revision.ts'

export const testPassword = 'plumb bob and string line'
let testHash: Promise<string> | null = null

/** Wed 2 Dec 2026, 10:00 in Brisbane. */
export const testNow = new Date('2026-12-02T00:00:00Z')

export type TestApp = Awaited<ReturnType<typeof createTestApp>>
export type Agent = ReturnType<typeof request.agent>

/** Frames in the test's own thread; `framing.test.ts` has the threads of the real one. */
const framerAtHand: Framer = {
  prepare: (question) => Promise.resolve().then(() => prepareRevision(question)),
  warm: () => undefined,
  close: () => Promise.resolve(),
}

/** A whole server on a fresh in-memory database, its clock in the test's hand. */
export async function createTestApp(
  options: { now?: Date; env?: Record<string, string>; log?: Logger; framer?: Framer } = {},
) {
  const database = openDatabase(':memory:')
  migrateDatabase(database)
  const clock = { current: options.now ?? testNow, now: () => clock.current }
  const events = createEventHub()
  const given = { NODE_ENV: 'test', PORT: '0', APP_URL: 'http://ridgehand.test' }
  const env = readEnv({ ...given, ...options.env })
  const deps = {
    env,
    db: database.db,
    clock,
    events,
    framer: options.framer ?? framerAtHand,
    log: options.log ?? pino({ level: 'silent' }),
    sessionStore: new session.MemoryStore(),
    screens: [],
  }
  const { app, api } = buildApp(deps)
  readFirm(database.db)
  testHash ??= hashPassword(testPassword)
  const passwordHash = await testHash

  function addPerson(role: Role, name: string): { id: string; name: string; email: string } {
    const id = newId()
    const email = `${name.toLowerCase().replaceAll(/[^a-z]+/g, '.')}@quillback.example`
    database.db
      .insert(people)
      .values({ id, name, email, role, phone: '', passwordHash, createdAt: clock.current })
      .run()
    return { id, name, email }
  }

  function addCrew(name: string, memberIds: string[], startsOn = '2026-01-01'): { id: string } {
    const id = newId()
    const colour = database.db.select().from(crews).all().length + 1
    database.db
      .insert(crews)
      .values({ id, name, letter: name.charAt(0), colour })
      .run()
    for (const personId of memberIds) {
      database.db
        .insert(crewMembers)
        .values({ id: newId(), crewId: id, personId, startsOn, endsOn: null })
        .run()
    }
    return { id }
  }

  /** An agent with its own cookies; signed in when an address is given. */
  async function agentFor(email?: string): Promise<Agent> {
    const agent = request.agent(app)
    if (email) await agent.post('/api/session').send({ email, password: testPassword }).expect(201)
    return agent
  }

  return {
    ...deps,
    deps,
    database,
    app,
    api,
    clock,
    addPerson,
    addCrew,
    agentFor,
    close: () => database.close(),
  }
}
