import { rateLimit } from 'express-rate-limit'
import type { Request } from 'express'
import {
  askResetSchema,
  changePasswordSchema,
  doneSchema,
  sessionSchema,
  signInSchema,
  useResetSchema,
} from '../../shared/auth/auth-schemas.ts'
import { localDayOf } from '../../shared/calendar/local-time.ts'
import type { Db } from '../db/client.ts'
import { readFirm } from '../firm/firm-store.ts'
import { type Api, send } from '../http/api.ts'
import { AppError } from '../http/app-error.ts'
import { parseInput } from '../http/parse-input.ts'
import type { Clock } from '../lib/clock.ts'
import type { AuthService } from './auth-service.ts'
import { currentUser, maybeCurrentUser } from './current-user.ts'
import { endSession, sessionCookieName, startSession } from './session.ts'

const minutesMs = 60_000

/** Two counters: one an account, one an address; either one full stops the try. */
function signInLimits() {
  const shared = {
    windowMs: 15 * minutesMs,
    standardHeaders: 'draft-8' as const,
    legacyHeaders: false,
    handler: () => {
      throw new AppError(
        'too_many',
        'Too many tries. Wait a quarter of an hour, or reset the password.',
      )
    },
  }
  const account = (req: Request) => {
    const email: unknown = (req.body as { email?: unknown } | undefined)?.email
    return typeof email === 'string'
      ? `account:${email.trim().toLowerCase().slice(0, 254)}`
      : 'account:none'
  }
  return [
    rateLimit({ ...shared, limit: 10, keyGenerator: account, skipSuccessfulRequests: true }),
    rateLimit({ ...shared, limit: 60, skipSuccessfulRequests: true }),
  ]
}

export function authRoutes(api: Api, deps: { db: Db; clock: Clock; auth: AuthService }): void {
  const { db, clock, auth } = deps
  const sessionFor = (user: ReturnType<typeof maybeCurrentUser>) => {
    const firm = readFirm(db)
    return {
      user,
      firm: {
        name: firm.name,
        timeZone: firm.timeZone,
        lengthUnits: firm.lengthUnits,
        today: localDayOf(clock.now(), firm.timeZone),
      },
    }
  }

  api.route('get', '/api/session', 'public', (_req, res) => {
    send(res, sessionSchema, sessionFor(maybeCurrentUser(res)))
  })

  api.route('post', '/api/session', 'public', ...signInLimits(), async (req, res) => {
    const { email, password } = parseInput(signInSchema, req.body)
    await startSession(req, await auth.signIn(email, password))
    send(res, doneSchema, { done: true }, 201)
  })

  api.route('delete', '/api/session', 'account:own', async (req, res) => {
    await endSession(req)
    res.clearCookie(sessionCookieName)
    send(res, doneSchema, { done: true })
  })

  api.route('post', '/api/password-resets', 'public', ...signInLimits(), (req, res) => {
    auth.askReset(parseInput(askResetSchema, req.body).email)
    send(res, doneSchema, { done: true }, 202)
  })

  api.route('put', '/api/password-resets', 'public', ...signInLimits(), async (req, res) => {
    const { token, password } = parseInput(useResetSchema, req.body)
    await startSession(req, await auth.useReset(token, password))
    send(res, doneSchema, { done: true })
  })

  api.route('put', '/api/session/password', 'account:own', async (req, res) => {
    const { current, next } = parseInput(changePasswordSchema, req.body)
    await startSession(req, await auth.changePassword(currentUser(res).id, current, next))
    send(res, doneSchema, { done: true })
  })
}
