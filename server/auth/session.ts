import type { Request, RequestHandler } from 'express'
import type { SessionData } from 'express-session'
import { and, eq } from 'drizzle-orm'
import type { Db } from '../db/client.ts'
import { people } from '../db/tables/people-tables.ts'
import { type CurrentUser, setCurrentUser } from './current-user.ts'

declare module 'express-session' {
  interface SessionData {
    personId: string
    epoch: number
  }
}

export const sessionCookieName = 'ridgehand.sid'

function personOf(db: Db, { personId, epoch }: Partial<SessionData>): CurrentUser | undefined {
  if (!personId || !epoch) return undefined
  return db
    .select({ id: people.id, name: people.name, email: people.email, role: people.role })
    .from(people)
    .where(and(eq(people.id, personId), eq(people.sessionEpoch, epoch), eq(people.active, true)))
    .get()
}

/** Reads the person afresh for each request: an ended account or an older epoch is signed out at once. */
export function loadUser(db: Db): RequestHandler {
  return (req, res, next) => {
    const person = personOf(db, req.session)
    if (person) setCurrentUser(res, person)
    next()
  }
}

/** Whether the session of a request that has stayed open holds to this moment. */
export async function isStillSignedIn(db: Db, req: Request): Promise<boolean> {
  const isThere = await new Promise<boolean>((resolve) =>
    req.session.reload((error: unknown) => resolve(!error)),
  )
  return isThere && personOf(db, req.session) !== undefined
}

/** A new session id at every sign-in, so that one planted beforehand is worth nothing. */
export async function startSession(
  req: Request,
  person: { id: string; sessionEpoch: number },
): Promise<void> {
  await new Promise<void>((resolve, reject) =>
    req.session.regenerate((error: unknown) => (error ? reject(error) : resolve())),
  )
  req.session.personId = person.id
  req.session.epoch = person.sessionEpoch
  await new Promise<void>((resolve, reject) =>
    req.session.save((error: unknown) => (error ? reject(error) : resolve())),
  )
}

export async function endSession(req: Request): Promise<void> {
  await new Promise<void>((resolve, reject) =>
    req.session.destroy((error: unknown) => (error ? reject(error) : resolve())),
  )
}
