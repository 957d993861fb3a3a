import fc from 'fast-check'
import { dayPlus } from '../../shared/calendar/days.ts'
import type { RainOffFacts } from '../../shared/planning/rain-off.ts'

/** The tests' first day: a Monday. */
export const monday = '2026-11-30'

export const dayIn = (spanDays: number) =>
  fc.integer({ min: 0, max: spanDays }).map((ahead) => dayPlus(monday, ahead))

/** A week of one to seven working days, and up to a dozen days closed. */
export const calendars = fc.record({
  workingWeekdays: fc.uniqueArray(fc.integer({ min: 1, max: 7 }), { minLength: 1, maxLength: 7 }),
  closedDays: fc.uniqueArray(
    dayIn(60).map((day) => ({ day, name: 'Closed' })),
    { maxLength: 12, selector: (closed) => closed.day },
  ),
})

const bookedDays = fc.uniqueArray(
  fc
    .record({ day: dayIn(45), worked: fc.boolean(), isLeft: fc.boolean(), dry: fc.nat(3) })
    // Most days are still to be worked.
    .map(({ day, worked, isLeft, dry }) => ({
      day,
      worked: worked && dry === 0,
      unfinished: worked && dry === 0 && isLeft,
    })),
  { minLength: 1, maxLength: 8, selector: (row) => row.day },
)

const bookings = fc
  .array(bookedDays, { maxLength: 6 })
  .map((each) => each.map((days, i) => ({ id: `booking ${i}`, days })))

/** One crew's bookings, some sharing days, some on days off, some begun; and a rain-off of them. */
export const rainOffFacts: fc.Arbitrary<RainOffFacts> = fc.record({
  calendar: calendars,
  today: dayIn(10),
  bookings,
  fromDay: dayIn(20),
  workingDays: fc.integer({ min: 1, max: 6 }),
  useFreeDays: fc.boolean(),
})
