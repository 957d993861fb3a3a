import type { Request } from 'express'
import {
  bookingChangesSchema,
  changedBookingsSchema,
} from '../../shared/bookings/booking-changes.ts'
import {
  cancelBookingSchema,
  changeBookingSchema,
  createBookingSchema,
  restoreBookingSchema,
} from '../../shared/bookings/booking-schemas.ts'
import {
  bookingSchema,
  calendarQuerySchema,
  calendarSchema,
  unbookedJobsSchema,
  unbookedQuerySchema,
} from '../../shared/bookings/calendar-schemas.ts'
import { currentUser } from '../auth/current-user.ts'
import type { Db } from '../db/client.ts'
import type { EventHub } from '../events/event-hub.ts'
import { type Api, send } from '../http/api.ts'
import { notFound } from '../http/app-error.ts'
import { parseInput } from '../http/parse-input.ts'
import { pathId } from '../http/path-id.ts'
import type { Clock } from '../lib/clock.ts'
import { createBookingService } from './booking-service.ts'
import { createCalendarService } from './calendar-service.ts'
import { createUnbookedService } from './unbooked-service.ts'

export function bookingRoutes(api: Api, deps: { db: Db; clock: Clock; events: EventHub }): void {
  const calendar = createCalendarService(deps)
  const bookings = createBookingService({ ...deps, calendar })
  const unbooked = createUnbookedService(deps)
  const idOf = (req: Request): string => pathId(req, 'bookingId', 'That booking')

  api.route('get', '/api/calendar', 'calendar:read', (req, res) => {
    const span = parseInput(calendarQuerySchema, req.query)
    send(res, calendarSchema, calendar.read(currentUser(res), span))
  })

  api.route('get', '/api/calendar/unbooked', 'booking:write', (req, res) => {
    const { job } = parseInput(unbookedQuerySchema, req.query)
    send(res, unbookedJobsSchema, unbooked.read(job))
  })

  api.route('get', '/api/bookings/:bookingId', 'calendar:read', (req, res) => {
    const booking = calendar.readBooking(currentUser(res), idOf(req))
    if (!booking) throw notFound('That booking')
    send(res, bookingSchema, booking)
  })

  api.route('post', '/api/bookings', 'booking:write', (req, res) => {
    const input = parseInput(createBookingSchema, req.body)
    send(res, bookingSchema, bookings.create(currentUser(res), input), 201)
  })

  api.route('post', '/api/bookings/changes', 'booking:write', (req, res) => {
    const input = parseInput(bookingChangesSchema, req.body)
    send(res, changedBookingsSchema, { bookings: bookings.changeAll(currentUser(res), input) })
  })

  api.route('patch', '/api/bookings/:bookingId', 'booking:write', (req, res) => {
    const input = parseInput(changeBookingSchema, req.body)
    send(res, bookingSchema, bookings.change(currentUser(res), idOf(req), input))
  })

  api.route('post', '/api/bookings/:bookingId/cancel', 'booking:write', (req, res) => {
    const input = parseInput(cancelBookingSchema, req.body)
    send(res, bookingSchema, bookings.cancel(currentUser(res), idOf(req), input))
  })

  api.route('post', '/api/bookings/:bookingId/restore', 'booking:write', (req, res) => {
    const input = parseInput(restoreBookingSchema, req.body)
    send(res, bookingSchema, bookings.restore(currentUser(res), idOf(req), input))
  })
}
