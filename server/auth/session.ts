import type { Request, RequestHandler } from 'express'
import { and, eq } from 'drizzle-orm'
import type { Db } from '../db/client.ts'
import { people } from '../db/tables/people-tables.ts'
import { setCurrentUser } from './current-user.ts'

declare module 'express-session' {
  interface SessionData {
    personId: string
    epoch: number
  }
}

export const sessionCookieName = 'ridgehand.sid'

/** Reads the person afresh for each request: an ended account or an older epoch is signed out at once. */
export function loadUser(db: Db): RequestHandler {
  return (req, res, next) => {
    const { personId, epoch } = req.session
    if (!personId || !epoch) return next()
    const person = db
      .select({ id: people.id, name: people.name, email: people.email, role: people.role })
      .from(people)
      .where(and(eq(people.id, personId), eq(people.sessionEpoch, epoch), eq(people.active, true)))
      .get()
    if (person) setCurrentUser(res, person)
    next()
  }
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
