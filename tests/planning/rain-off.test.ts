import fc from 'fast-check'
import { expect, test } from 'vitest'
import { dayPlus, daysBetween, isoWeekday } from '../../shared/calendar/days.ts'
import type { WorkingCalendar } from '../../shared/calendar/working-days.ts'
import { type BookingMove, rainOff, type RainOffFacts } from '../../shared/planning/rain-off.ts'
import { sampleOf } from '../roof/support/sample.ts'
import { monday, rainOffFacts } from './random-firm.ts'

// What holds comes from the words of the trade (rained off: everything after moves on, in its order, and
// what was begun stays); no outside source. Working days are counted here by the test's own loop.

const isWorkedDay = (calendar: WorkingCalendar, day: string): boolean =>
  calendar.workingWeekdays.includes(isoWeekday(day)) &&
  !calendar.closedDays.some((closed) => closed.day === day)

/** The working day `count` after `day`, counted one by one. */
function workingDaysOn(calendar: WorkingCalendar, day: string, count: number): string {
  let at = day
  let left = count
  while (left > 0) {
    at = dayPlus(at, 1)
    if (isWorkedDay(calendar, at)) left--
  }
  return at
}

function made(facts: RainOffFacts) {
  const result = rainOff(facts)
  if (!result) throw new Error('no working days')
  const after = new Map(
    facts.bookings.map((b) => [
      b.id,
      result.moves.find((m) => m.bookingId === b.id)?.daysAfter ?? b.days.map((d) => d.day).sort(),
    ]),
  )
  return { ...result, after }
}

const all = (moves: readonly BookingMove[]) => moves.flatMap((m) => [...m.moved, ...m.added])

function holds(check: (facts: RainOffFacts) => void): void {
  fc.assert(fc.property(rainOffFacts, check), { numRuns: sampleOf(100, 1000) })
}

const week: WorkingCalendar = {
  workingWeekdays: [1, 2, 3, 4, 5],
  closedDays: [{ day: '2026-12-25', name: 'Christmas Day' }],
}
const booked = (id: string, ...days: string[]) => ({
  id,
  days: days.map((day) => ({ day, worked: false, unfinished: false })),
})
const wetThursday = (changes: Partial<RainOffFacts>): RainOffFacts => ({
  calendar: week,
  today: '2026-12-03',
  bookings: [],
  fromDay: '2026-12-03',
  workingDays: 1,
  useFreeDays: false,
  ...changes,
})

test('a wet Thursday: Thursday and Friday of one job go to Friday and Monday, the next job a day later too', () => {
  const { after } = made(
    wetThursday({
      bookings: [booked('hill', '2026-12-03', '2026-12-04'), booked('creek', '2026-12-09')],
    }),
  )
  expect(after.get('hill')).toEqual(['2026-12-04', '2026-12-07'])
  expect(after.get('creek')).toEqual(['2026-12-10'])
})

test('with free days used up first, the job after a free day stays', () => {
  const { after } = made(
    wetThursday({
      useFreeDays: true,
      bookings: [booked('hill', '2026-12-03', '2026-12-04'), booked('creek', '2026-12-09')],
    }),
  )
  expect(after.get('hill')).toEqual(['2026-12-04', '2026-12-07'])
  expect(after.get('creek')).toEqual(['2026-12-09'])
})

test('Christmas Day is passed over', () => {
  const { after } = made(
    wetThursday({ fromDay: '2026-12-24', bookings: [booked('hill', '2026-12-24')] }),
  )
  expect(after.get('hill')).toEqual(['2026-12-28'])
})

test('a day started before the rain stays, and what it left undone gets a day of its own', () => {
  const hill = {
    id: 'hill',
    days: [
      { day: '2026-12-03', worked: true, unfinished: true },
      { day: '2026-12-04', worked: false, unfinished: false },
    ],
  }
  const { after, stays } = made(wetThursday({ bookings: [hill, booked('creek', '2026-12-07')] }))
  expect(after.get('hill')).toEqual(['2026-12-03', '2026-12-04', '2026-12-07'])
  expect(after.get('creek')).toEqual(['2026-12-08'])
  expect(stays).toEqual([{ bookingId: 'hill', day: '2026-12-03' }])
})

test('a Saturday agreed to and rained off goes to Monday, and Monday to Tuesday', () => {
  const { after, lostDays } = made(
    wetThursday({
      fromDay: '2026-12-05',
      bookings: [booked('hill', '2026-12-05', '2026-12-07')],
    }),
  )
  expect(lostDays).toEqual(['2026-12-05'])
  expect(after.get('hill')).toEqual(['2026-12-07', '2026-12-08'])
})

test('a firm that works on no day has nowhere to move to', () => {
  expect(rainOff(wetThursday({ calendar: { workingWeekdays: [], closedDays: [] } }))).toBeNull()
})

test('days started never move, nor does any day before the rain', () => {
  holds((facts) => {
    const { after } = made(facts)
    for (const booking of facts.bookings)
      for (const { day, worked } of booking.days)
        if (worked || day < facts.fromDay) expect(after.get(booking.id)).toContain(day)
  })
})

test('nothing is put on a day off, on a day lost, or before today', () => {
  holds((facts) => {
    const { moves, lostDays } = made(facts)
    for (const { to } of all(moves)) {
      expect(isWorkedDay(facts.calendar, to)).toBe(true)
      expect(lostDays).not.toContain(to)
      expect(to >= facts.today).toBe(true)
    }
  })
})

test('no day is lost and none made, but for what a day started had left', () => {
  holds((facts) => {
    for (const move of made(facts).moves) {
      expect(move.daysAfter.length).toBe(move.daysBefore.length + move.added.length)
      expect(new Set(move.daysAfter).size).toBe(move.daysAfter.length)
      for (const { from } of move.added) {
        const day = facts.bookings.find((b) => b.id === move.bookingId)?.days
        expect(day?.find((d) => d.day === from)).toMatchObject({ worked: true, unfinished: true })
      }
    }
  })
})

test('no job overtakes another, and jobs meet on a day only where they did before', () => {
  holds((facts) => {
    const { moves } = made(facts)
    const to = new Map<string, string>()
    for (const move of moves)
      for (const { from, to: place } of move.moved) to.set(`${move.bookingId} ${from}`, place)
    const rows = facts.bookings.flatMap((b) =>
      b.days
        .filter((d) => d.day >= facts.fromDay)
        .map((d) => ({ ...d, place: to.get(`${b.id} ${d.day}`) ?? d.day })),
    )
    for (const a of rows)
      for (const b of rows) {
        if (!a.worked && !b.worked)
          expect(Math.sign(daysBetween(a.place, b.place))).toBe(
            Math.sign(daysBetween(a.day, b.day)),
          )
        if (a.worked && !b.worked && a.place === b.place) expect(a.day).toBe(b.day)
      }
  })
})

test('where no day was begun and none is on a day off, every day moves on by just the days lost', () => {
  holds((facts) => {
    const bookings = facts.bookings.map((b) => ({
      ...b,
      days: b.days.filter((d) => !d.worked && isWorkedDay(facts.calendar, d.day)),
    }))
    const plain = { ...facts, bookings, today: monday, useFreeDays: false }
    for (const { from, to } of all(made(plain).moves))
      expect(to).toBe(workingDaysOn(facts.calendar, from, facts.workingDays))
  })
})

test('using up free days first moves no day further than moving all does, and no day that need not', () => {
  holds((facts) => {
    const lean = made({ ...facts, useFreeDays: true })
    const full = made({ ...facts, useFreeDays: false })
    const placeIn = (moves: readonly BookingMove[], id: string, from: string): string =>
      moves.find((m) => m.bookingId === id)?.moved.find((m) => m.from === from)?.to ?? from
    for (const booking of facts.bookings)
      for (const { day } of booking.days)
        expect(placeIn(lean.moves, booking.id, day) <= placeIn(full.moves, booking.id, day)).toBe(
          true,
        )
    const taken = new Set([...lean.after.values()].flat())
    const lastLost = lean.lostDays[lean.lostDays.length - 1] ?? ''
    for (const { from, to } of lean.moves.flatMap((m) => m.moved)) {
      // Every working day passed over on the way is used, lost, or gone by: no day was free.
      for (let day = from; day < to; day = dayPlus(day, 1))
        if (isWorkedDay(facts.calendar, day) && day >= facts.today && day > lastLost)
          expect(taken.has(day)).toBe(true)
    }
  })
})
