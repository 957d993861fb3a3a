import fc from 'fast-check'
import { expect, test } from 'vitest'
import { movedDays } from '../../shared/bookings/move-days.ts'
import type { ClashBooking } from '../../shared/clashes/clash-facts.ts'
import { findClashes } from '../../shared/clashes/find-clashes.ts'
import { bookingLandings, jobLandings } from '../../shared/clashes/find-landings.ts'
import {
  bevel,
  bookingOf,
  creekShed,
  day,
  firmWith,
  fri,
  mon,
  plumb,
  thu,
  wed,
} from './clash-kit.ts'

const span = { from: wed, to: '2026-12-11', crews: [plumb, bevel] }
const freely = { day: thu, workMinutes: 0 }

const at = (landings: ReturnType<typeof bookingLandings>, crew: { id: string }, on: string) =>
  landings
    .find((one) => one.crewId === crew.id && one.day === on)
    ?.clashes.map((clash) => `${clash.day} ${clash.weight} ${clash.code}`)

test('dropped where it is, a booking without a clash has none', () => {
  const hill = bookingOf()
  const landings = bookingLandings(firmWith({ bookings: [hill] }), hill, freely, span)
  expect(at(landings, plumb, thu)).toEqual([])
})

test('the work is held against the people of the crew it is dropped on', () => {
  const hill = bookingOf()
  const facts = firmWith({ bookings: [hill] })
  // Two days of two people: 32 hours. The other crew is one person.
  const landings = bookingLandings(facts, hill, { day: thu, workMinutes: 1900 }, span)
  expect(at(landings, plumb, thu)).toEqual([])
  expect(at(landings, bevel, thu)).toEqual([`${fri} caution too-short`])
  const words = landings.find((one) => one.crewId === bevel.id && one.day === thu)?.clashes[0]?.text
  expect(words).toBe('Too short by 15.7 h.')
})

test('a roof not issued is the same wherever a booking lands, and is not said of the place', () => {
  const bare = bookingOf({ days: [day(thu, { revision: null })], state: 'pencilled' })
  const landings = bookingLandings(firmWith({ bookings: [bare] }), bare, freely, span)
  expect(landings.every((one) => one.clashes.every((clash) => clash.code !== 'no-roof'))).toBe(true)
})

test('nothing lands from a day the booking does not have or that has been worked', () => {
  const begun = bookingOf({ days: [day(wed, { worked: true }), thu] })
  const facts = firmWith({ bookings: [begun] })
  expect(bookingLandings(facts, begun, { day: mon, workMinutes: 0 }, span)).toEqual([])
  expect(bookingLandings(facts, begun, { day: wed, workMinutes: 0 }, span)).toEqual([])
})

test('a job whose work nobody is there to do says so on the day it is dropped on', () => {
  const facts = firmWith({ bookings: [], there: {} })
  const landings = jobLandings(facts, bookingOf().job, 600, { ...span, to: thu })
  expect(at(landings, plumb, thu)).toEqual([`${thu} clash nobody-there`])
})

const freeDays = [thu, fri, mon, '2026-12-08', '2026-12-09', '2026-12-10', '2026-12-11']
const someDays = fc.subarray(freeDays, { minLength: 1, maxLength: 3 })

test('what a landing says of a move is what the calendar says once it has been made', () => {
  fc.assert(
    fc.property(
      someDays,
      someDays,
      someDays,
      fc.option(fc.constantFrom(...freeDays), { nil: null }),
      (own, creek, shed, timber) => {
        const milestones =
          timber === null
            ? []
            : [
                {
                  kind: 'timber-on-site' as const,
                  day: timber,
                  state: 'asked' as const,
                  broughtBy: '',
                },
              ]
        const hill = bookingOf({ days: own, job: { milestones } })
        const others = [
          creekShed({ days: creek }),
          bookingOf({
            id: 'shed',
            crew: bevel,
            days: shed,
            job: { number: 'QR-9', title: 'Shed' },
          }),
        ]
        const facts = firmWith({ bookings: [hill, ...others] })
        const from = own[0]!
        const landings = bookingLandings(facts, hill, { day: from, workMinutes: 0 }, span)
        expect(landings.length).toBe(20)
        for (const { crewId, day: to, clashes } of landings) {
          const days = movedDays(facts.calendar, own, new Set(), { from, to })
          const crew = [plumb, bevel].find((one) => one.id === crewId)!
          const made: ClashBooking = { ...bookingOf({ days, job: { milestones } }), crew }
          const found = findClashes({ ...facts, bookings: [made, ...others] })
            .filter((clash) => clash.bookingId === 'hill')
            .map(({ code, weight, day: on, text, wayOut }) => ({
              code,
              weight,
              day: on,
              text,
              wayOut,
            }))
          expect(clashes).toEqual(found)
        }
      },
    ),
    { numRuns: 150 },
  )
})
