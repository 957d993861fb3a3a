import { rateLimit } from 'express-rate-limit'
import type { Request, RequestHandler, Response } from 'express'
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

type Counter = {
  /** Tries a quarter of an hour. */
  most: number
  /** Whose tries; the address they come from when left out. */
  of?: (req: Request, res: Response) => string
  /** Count those that went well too. */
  countAll?: boolean
}

function limit({ most, of, countAll = false }: Counter): RequestHandler {
  return rateLimit({
    windowMs: 15 * minutesMs,
    limit: most,
    standardHeaders: 'draft-8',
    legacyHeaders: false,
    skipSuccessfulRequests: !countAll,
    ...(of ? { keyGenerator: of } : {}),
    handler: () => {
      throw new AppError('too_many', 'Too many tries. Wait a quarter of an hour and try again.')
    },
  })
}

function accountOf(req: Request): string {
  const email: unknown = (req.body as { email?: unknown } | undefined)?.email
  return typeof email === 'string' ? email.trim().toLowerCase().slice(0, 254) : ''
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

  // The address first: once it is full, no more accounts are remembered for it.
  const signInLimits = [limit({ most: 60 }), limit({ most: 10, of: accountOf })]
  api.route('post', '/api/session', 'public', ...signInLimits, async (req, res) => {
    const { email, password } = parseInput(signInSchema, req.body)
    await startSession(req, await auth.signIn(email, password), clock.now())
    send(res, doneSchema, { done: true }, 201)
  })

  api.route('delete', '/api/session', 'account:own', async (req, res) => {
    await endSession(req)
    res.clearCookie(sessionCookieName)
    send(res, doneSchema, { done: true })
  })

  // Each one asked for is a mail to somebody.
  const resetLimits = [
    limit({ most: 30, countAll: true }),
    limit({ most: 5, of: accountOf, countAll: true }),
  ]
  api.route('post', '/api/password-resets', 'public', ...resetLimits, (req, res) => {
    auth.askReset(parseInput(askResetSchema, req.body).email)
    send(res, doneSchema, { done: true }, 202)
  })

  api.route('put', '/api/password-resets', 'public', limit({ most: 30 }), async (req, res) => {
    const { token, password } = parseInput(useResetSchema, req.body)
    await startSession(req, await auth.useReset(token, password), clock.now())
    send(res, doneSchema, { done: true })
  })

  const ownLimit = limit({ most: 10, of: (_req, res) => currentUser(res).id })
  api.route('put', '/api/session/password', 'account:own', ownLimit, async (req, res) => {
    const { current, next } = parseInput(changePasswordSchema, req.body)
    await startSession(
      req,
      await auth.changePassword(currentUser(res).id, current, next),
      clock.now(),
    )
    send(res, doneSchema, { done: true })
  })
}
