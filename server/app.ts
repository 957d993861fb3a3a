import express, { type Express, type RequestHandler } from 'express'
import session, { type Store } from 'express-session'
import helmet from 'helmet'
import type { Logger } from 'pino'
import { pinoHttp } from 'pino-http'
import { authRoutes } from './auth/auth-routes.ts'
import { replanUpcoming, takeRevision } from './bookings/replan.ts'
import { bookingRoutes } from './bookings/booking-routes.ts'
import { createAuthService } from './auth/auth-service.ts'
import { clashRoutes } from './clashes/clash-routes.ts'
import { isStillSignedIn, loadUser, longestSessionMs, sessionCookieName } from './auth/session.ts'
import { dayLogRoutes } from './day-logs/day-log-routes.ts'
import { hoursRoutes } from './day-logs/hours-routes.ts'
import { daySheetRoutes } from './day-sheets/day-sheet-routes.ts'
import type { Db } from './db/client.ts'
import type { Env } from './env.ts'
import type { EventHub } from './events/event-hub.ts'
import { eventRoutes } from './events/event-routes.ts'
import { findDaysRoutes } from './find-days/find-days-routes.ts'
import { firmRoutes } from './firm/firm-routes.ts'
import { type Api, createApi } from './http/api.ts'
import { AppError } from './http/app-error.ts'
import { errorHandler } from './http/error-handler.ts'
import { requestId, requestIdOf } from './http/request-id.ts'
import { refuseCrossSiteWrites, refuseOtherBodies } from './http/same-origin.ts'
import { jobRoutes } from './jobs/job-routes.ts'
import type { Framer } from './revisions/framer.ts'
import { revisionRoutes } from './revisions/revision-routes.ts'
import { createRevisionService } from './revisions/revision-service.ts'
import type { Clock } from './lib/clock.ts'
import { messageRoutes } from './messages/message-routes.ts'
import { milestoneRoutes } from './milestones/milestone-routes.ts'
import { noticeRoutes } from './notices/notice-routes.ts'
import { peopleRoutes } from './people/people-routes.ts'
import { variationRoutes } from './variations/variation-routes.ts'
import { ticketRoutes } from './people/ticket-routes.ts'
import { rainOffRoutes } from './rain-offs/rain-off-routes.ts'

export type AppDeps = {
  env: Env
  db: Db
  clock: Clock
  events: EventHub
  framer: Framer
  log: Logger
  sessionStore: Store
  /** Serves the screens: built files, or the hot-reloading middleware of `npm run dev`. */
  screens: RequestHandler[]
}

function securityHeaders(env: Env, hot: boolean): RequestHandler {
  const https = env.appUrl.startsWith('https:')
  return helmet({
    contentSecurityPolicy: hot
      ? false
      : {
          useDefaults: false,
          directives: {
            defaultSrc: ["'self'"],
            baseUri: ["'none'"],
            connectSrc: ["'self'"],
            fontSrc: ["'self'", 'data:'],
            formAction: ["'self'"],
            frameAncestors: ["'none'"],
            imgSrc: ["'self'", 'data:', 'blob:'],
            objectSrc: ["'none'"],
            scriptSrc: ["'self'"],
            styleSrc: ["'self'", "'unsafe-inline'"],
            workerSrc: ["'self'", 'blob:'],
          },
        },
    strictTransportSecurity: https,
    crossOriginOpenerPolicy: https,
    originAgentCluster: https,
  })
}

function sessions(deps: AppDeps): RequestHandler {
  return session({
    name: sessionCookieName,
    secret: deps.env.sessionSecret,
    store: deps.sessionStore,
    resave: false,
    saveUninitialized: false,
    rolling: false,
    cookie: {
      httpOnly: true,
      sameSite: 'lax',
      secure: deps.env.appUrl.startsWith('https:'),
      maxAge: longestSessionMs,
    },
  })
}

function registerRoutes(api: Api, deps: AppDeps): void {
  const { db, clock } = deps
  authRoutes(api, { db, clock, auth: createAuthService({ db, clock }) })
  eventRoutes(api, deps.events, (req) => isStillSignedIn(deps, req))
  bookingRoutes(api, deps)
  daySheetRoutes(api, deps)
  dayLogRoutes(api, deps)
  hoursRoutes(api, deps)
  rainOffRoutes(api, deps)
  findDaysRoutes(api, deps)
  messageRoutes(api, deps)
  noticeRoutes(api, deps)
  revisionRoutes(api, createRevisionService({ ...deps, takeRevision }))
  variationRoutes(api, deps)
  jobRoutes(api, { db, clock, events: deps.events })
  milestoneRoutes(api, deps)
  clashRoutes(api, deps)
  peopleRoutes(api, { db, clock, events: deps.events, replanUpcoming })
  ticketRoutes(api, { db, clock, events: deps.events, replanUpcoming })
  firmRoutes(api, { db, clock, events: deps.events, replanUpcoming })
}

/** The only wiring: everything that serves, from what it is given. */
export function buildApp(
  deps: AppDeps,
  options: { hot?: boolean } = {},
): { app: Express; api: Api } {
  const app = express()
  app.disable('x-powered-by')
  app.set('trust proxy', deps.env.trustProxy)
  app.use(requestId())
  app.use(
    pinoHttp({
      logger: deps.log,
      genReqId: (_req, res) => String(res.getHeader('X-Request-Id') ?? ''),
      customLogLevel: (_req, res, error) => (error || res.statusCode >= 500 ? 'error' : 'debug'),
      serializers: {
        req: (req: { id: unknown; method: unknown; url?: string }) => ({
          id: req.id,
          method: req.method,
          // Never the query: a link's token may stand in it.
          url: req.url?.split('?')[0],
        }),
        res: (res: { statusCode: unknown }) => ({ statusCode: res.statusCode }),
      },
    }),
  )
  app.use(securityHeaders(deps.env, options.hot ?? false))
  app.use('/api', (_req, res, next) => {
    res.setHeader('Cache-Control', 'no-store')
    next()
  })
  app.use('/api', refuseCrossSiteWrites(deps.env.appUrl))
  app.use('/api', refuseOtherBodies)
  app.use('/api', express.json({ limit: '512kb' }))
  app.use('/api', sessions(deps), loadUser(deps))
  const api = createApi(app)
  registerRoutes(api, deps)
  app.use('/api', (_req, res) => {
    throw new AppError('not_found', `There is nothing at this address (${requestIdOf(res)}).`)
  })
  for (const screen of deps.screens) app.use(screen)
  app.use(errorHandler(deps.log))
  return { app, api }
}
