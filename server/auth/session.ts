import type { Request, RequestHandler } from 'express'
import type { SessionData } from 'express-session'
import { and, eq } from 'drizzle-orm'
import type { Db } from '../db/client.ts'
import { people } from '../db/tables/people-tables.ts'
import type { Clock } from '../lib/clock.ts'
import { type CurrentUser, setCurrentUser } from './current-user.ts'

declare module 'express-session' {
  interface SessionData {
    personId: string
    epoch: number
    /** Milliseconds since 1970. */
    startedAt: number
  }
}

export const sessionCookieName = 'ridgehand.sid'

/** However much it is used: a cookie that got away does not open the firm for good. */
export const longestSessionMs = 30 * 86_400_000

type Deps = { db: Db; clock: Clock }

function personOf({ db, clock }: Deps, session: Partial<SessionData>): CurrentUser | undefined {
  const { personId, epoch, startedAt } = session
  if (!personId || !epoch || !startedAt) return undefined
  if (clock.now().getTime() - startedAt >= longestSessionMs) return undefined
  return db
    .select({ id: people.id, name: people.name, email: people.email, role: people.role })
    .from(people)
    .where(and(eq(people.id, personId), eq(people.sessionEpoch, epoch), eq(people.active, true)))
    .get()
}

/** Reads the person afresh for each request: an ended account or an older epoch is signed out at once. */
export function loadUser(deps: Deps): RequestHandler {
  return (req, res, next) => {
    const person = personOf(deps, req.session)
    if (person) setCurrentUser(res, person)
    next()
  }
}

/** Whether the session of a request that has stayed open holds to this moment. */
export async function isStillSignedIn(deps: Deps, req: Request): Promise<boolean> {
  const isThere = await new Promise<boolean>((resolve) =>
    req.session.reload((error: unknown) => resolve(!error)),
  )
  return isThere && personOf(deps, req.session) !== undefined
}

/** A new session id at every sign-in, so that one planted beforehand is worth nothing. */
export async function startSession(
  req: Request,
  person: { id: string; sessionEpoch: number },
  now: Date,
): Promise<void> {
  await new Promise<void>((resolve, reject) =>
    req.session.regenerate((error: unknown) => (error ? reject(error) : resolve())),
  )
  req.session.personId = person.id
  req.session.epoch = person.sessionEpoch
  req.session.startedAt = now.getTime()
  await new Promise<void>((resolve, reject) =>
    req.session.save((error: unknown) => (error ? reject(error) : resolve())),
  )
}

export async function endSession(req: Request): Promise<void> {
  await new Promise<void>((resolve, reject) =>
    req.session.destroy((error: unknown) => (error ? reject(error) : resolve())),
  )
}
