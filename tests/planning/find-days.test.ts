import fc from 'fast-check'
import { expect, test } from 'vitest'
import { dayPlus, isoWeekday } from '../../shared/calendar/days.ts'
import {
  type FindDaysFacts,
  findOpenings,
  finishOf,
  type Opening,
  type StandingBooking,
} from '../../shared/planning/find-days.ts'
import { sampleOf } from '../roof/support/sample.ts'
import { calendars, dayIn, monday } from './random-firm.ts'

// The search is held against one that tries every crew and every first day and looks at the calendar that
// comes of it. What is harm is the office's own sense of it; no outside source.

const horizonDays = 26

type RandomFirm = { facts: FindDaysFacts; minutesOn: (crewId: string, day: string) => number }

const bookings = fc.array(
  fc.record({
    crewId: fc.constantFrom('a', 'b'),
    isPencilled: fc.boolean(),
    isOwnJob: fc.integer({ min: 0, max: 5 }).map((n) => n === 0),
    wantedBy: fc.option(dayIn(40)),
    first: dayIn(24),
    length: fc.integer({ min: 1, max: 4 }),
    isBegun: fc.integer({ min: 0, max: 5 }).map((n) => n === 0),
  }),
  { maxLength: 6 },
)

const randomFirms: fc.Arbitrary<RandomFirm> = fc
  .record({
    calendar: calendars,
    earliest: dayIn(6),
    crewCount: fc.integer({ min: 1, max: 2 }),
    bookings,
    minutes: fc.array(fc.constantFrom(0, 480, 960, 1440, 1440), { minLength: 7, maxLength: 23 }),
    neededMinutes: fc.integer({ min: 1, max: 6000 }),
  })
  .map(({ calendar, earliest, crewCount, bookings: laid, minutes, neededMinutes }) => {
    const minutesOn = (crewId: string, day: string): number =>
      minutes[(Date.parse(day) / 86_400_000 + (crewId === 'a' ? 0 : 3)) % minutes.length] ?? 0
    const standing = laid.map(({ first, length, isBegun, ...booking }, i): StandingBooking => ({
      id: `booking ${i}`,
      ...booking,
      days: Array.from({ length }, (_, n) => ({
        day: dayPlus(first, n),
        worked: isBegun && n === 0,
      })),
    }))
    const facts: FindDaysFacts = {
      calendar,
      earliest,
      horizonDays,
      crews: ['a', 'b'].slice(0, crewCount).map((id) => ({ id, letter: id.toUpperCase() })),
      bookings: standing,
      isBlocked: (crewId, day) => minutesOn(crewId, day) === 0,
      isEnough: (crewId, days) =>
        days.reduce((sum, day) => sum + minutesOn(crewId, day), 0) >= neededMinutes,
    }
    return { facts, minutesOn }
  })

const isWorkedDay = ({ calendar }: FindDaysFacts, day: string): boolean =>
  calendar.workingWeekdays.includes(isoWeekday(day)) &&
  !calendar.closedDays.some((closed) => closed.day === day)

const daysOf = (booking: StandingBooking) => booking.days.map((d) => d.day)

/** What is wrong with a calendar in which an opening has been taken; empty when nothing is. */
function faultsOf(facts: FindDaysFacts, opening: Opening): string[] {
  const { crewId, days, moves } = opening
  const faults: string[] = []
  const own = facts.bookings.filter((b) => b.crewId === crewId)
  const after = new Map(
    own.map((b) => [b.id, moves.find((m) => m.bookingId === b.id)?.daysAfter ?? daysOf(b)]),
  )
  for (const day of days) {
    if (!isWorkedDay(facts, day)) faults.push(`${day} is a day off`)
    if (facts.isBlocked(crewId, day)) faults.push(`${day} is blocked`)
    if (day < facts.earliest) faults.push(`${day} is too soon`)
    if ([...after.values()].some((there) => there.includes(day))) faults.push(`twice on ${day}`)
  }
  for (const move of moves) {
    const booking = own.find((b) => b.id === move.bookingId)
    const before = booking ? daysOf(booking) : []
    if (!booking?.isPencilled || booking.isOwnJob) faults.push(`${move.bookingId} must stay`)
    if (booking?.days.some((d) => d.worked)) faults.push(`${move.bookingId} has begun`)
    if (new Set(move.daysAfter).size !== before.length) faults.push('a day was lost')
    const [endBefore = '', endAfter = ''] = [before, move.daysAfter].map((all) => all.at(-1))
    const { wantedBy = null } = booking ?? {}
    if (wantedBy !== null && endAfter > wantedBy && endBefore <= wantedBy) faults.push('late now')
    for (const day of move.daysAfter.filter((d) => !before.includes(d))) {
      if (!isWorkedDay(facts, day)) faults.push(`${move.bookingId} on a day off`)
      if (facts.isBlocked(crewId, day)) faults.push(`${move.bookingId} blocked`)
      const met = [...after].filter(([id, there]) => id !== move.bookingId && there.includes(day))
      if (met.length > 0) faults.push(`${move.bookingId} meets ${met.map(([id]) => id).join()}`)
    }
  }
  return faults
}

/** One crew from one first day on, tried plainly: day by day, those in the way waiting in a queue. */
function tried(facts: FindDaysFacts, crewId: string, start: string): Opening | null {
  const own = facts.bookings.filter((b) => b.crewId === crewId)
  const on = (day: string) => own.filter((b) => daysOf(b).includes(day))
  const mayMove = (b: StandingBooking): boolean =>
    b.isPencilled && !b.isOwnJob && b.days.every((d) => !d.worked && on(d.day).length === 1)
  const isFixed = (day: string): boolean => on(day).some((b) => !mayMove(b))
  const taken: string[] = []
  for (let day = start; day < dayPlus(facts.earliest, horizonDays); day = dayPlus(day, 1)) {
    if (!isWorkedDay(facts, day)) continue
    if (isFixed(day)) return null
    if (facts.isBlocked(crewId, day)) continue
    taken.push(day)
    if (facts.isEnough(crewId, taken)) break
  }
  if (!facts.isEnough(crewId, taken)) return null
  const queue: { id: string; from: string }[] = []
  const places = new Map<string, string[]>()
  const end = dayPlus(start, 300)
  for (let day = start; day < end; day = dayPlus(day, 1)) {
    const [there] = on(day)
    if (there && mayMove(there)) {
      if (taken.includes(day) || queue.length > 0) queue.push({ id: there.id, from: day })
      else places.set(there.id, [...(places.get(there.id) ?? []), day])
    }
    const isSlot =
      isWorkedDay(facts, day) &&
      !taken.includes(day) &&
      !isFixed(day) &&
      !facts.isBlocked(crewId, day)
    const next = isSlot ? queue.shift() : undefined
    if (next) places.set(next.id, [...(places.get(next.id) ?? []), day])
  }
  if (queue.length > 0) return null
  const moves = own.flatMap((b): Opening['moves'] => {
    const before = daysOf(b)
    const later = places.get(b.id)
    if (!later || !mayMove(b)) return []
    const daysAfter = [...before.filter((d) => d < start), ...later]
    return daysAfter.join() === before.join()
      ? []
      : [{ bookingId: b.id, daysBefore: before, daysAfter, moved: [] }]
  })
  return { crewId, days: taken, passedOver: [], moves }
}

/** A pencilled booking is not cut in two for the job, nor by what stays. */
function isCut(facts: FindDaysFacts, { crewId, days, moves }: Opening): boolean {
  const moving = moves.map((m) => m.bookingId)
  const own = facts.bookings.filter((b) => b.crewId === crewId && !moving.includes(b.id))
  const fixed = new Set(
    own
      .filter((b) => !b.isPencilled || b.isOwnJob || b.days.some((d) => d.worked) || isShared(b))
      .flatMap(daysOf),
  )
  function isShared(b: StandingBooking): boolean {
    return facts.bookings.some(
      (o) => o.id !== b.id && o.crewId === crewId && daysOf(o).some((d) => daysOf(b).includes(d)),
    )
  }
  const within = (all: readonly string[]): number =>
    [...fixed].filter((d) => d > (all[0] ?? '') && d < (all.at(-1) ?? '')).length
  return moves.some(
    (m) =>
      m.daysAfter.some((d) => d < (days[0] ?? '')) || within(m.daysAfter) > within(m.daysBefore),
  )
}

function soonestByTrying(facts: FindDaysFacts, mayMove: boolean): string | null {
  const finishes = facts.crews.flatMap(({ id }) =>
    Array.from({ length: horizonDays }, (_, i) => dayPlus(facts.earliest, i))
      .filter((day) => isWorkedDay(facts, day) && !facts.isBlocked(id, day))
      .flatMap((start) => {
        const opening = tried(facts, id, start)
        if (!opening || (opening.moves.length > 0 && !mayMove)) return []
        return faultsOf(facts, opening).length === 0 && !isCut(facts, opening)
          ? [finishOf(opening)]
          : []
      }),
  )
  return finishes.sort()[0] ?? null
}

const holds = (check: (firm: RandomFirm) => void, runs = sampleOf(150, 2000)): void =>
  fc.assert(fc.property(randomFirms, check), { numRuns: runs })

test('no opening carries a clash: crew free, people there, no day off, firm and begun bookings left alone', () => {
  holds(({ facts }) => {
    for (const opening of findOpenings(facts)) expect(faultsOf(facts, opening)).toEqual([])
  })
})

test('the first has the earliest finish there is, found by trying every crew and day', () => {
  let found = 0
  let moving = 0
  holds(({ facts }) => {
    const [first] = findOpenings(facts)
    expect(first ? finishOf(first) : null).toBe(soonestByTrying(facts, true))
    if (first) found++
    if (first && first.moves.length > 0) moving++
  })
  expect(found).toBeGreaterThan(20)
  expect(moving).toBeGreaterThan(2)
})

test('the earliest that moves nobody is always among the three', () => {
  holds(({ facts }) => {
    const unmoved = findOpenings(facts).filter((one) => one.moves.length === 0)
    expect(unmoved[0] ? finishOf(unmoved[0]) : null).toBe(soonestByTrying(facts, false))
  })
})

test('an opening holds all of the work, and not a day more', () => {
  holds(({ facts }) => {
    for (const { crewId, days } of findOpenings(facts)) {
      expect(facts.isEnough(crewId, days)).toBe(true)
      expect(facts.isEnough(crewId, days.slice(0, -1))).toBe(false)
    }
  })
})

test('three at most, each another one, the earlier finish first', () => {
  holds(({ facts }) => {
    const openings = findOpenings(facts)
    expect(openings.length).toBeLessThanOrEqual(3)
    expect(new Set(openings.map((o) => `${o.crewId} ${o.days.join()}`)).size).toBe(openings.length)
    expect(openings.map(finishOf)).toEqual(openings.map(finishOf).sort())
  })
})

const plain = (changes: Partial<FindDaysFacts>): FindDaysFacts => ({
  calendar: { workingWeekdays: [1, 2, 3, 4, 5], closedDays: [] },
  earliest: monday,
  horizonDays: 30,
  crews: [{ id: 'a', letter: 'A' }],
  bookings: [],
  isBlocked: () => false,
  isEnough: (_crewId, days) => days.length >= 2,
  ...changes,
})
const standing = (changes: Partial<StandingBooking>, ...days: string[]): StandingBooking => ({
  id: 'creek',
  crewId: 'a',
  isPencilled: true,
  isOwnJob: false,
  wantedBy: null,
  days: days.map((day) => ({ day, worked: false })),
  ...changes,
})

test('a pencilled booking gives way by the days it takes, and the way without it is shown beside', () => {
  const openings = findOpenings(plain({ bookings: [standing({}, '2026-11-30', '2026-12-01')] }))
  expect(openings[0]).toMatchObject({
    days: ['2026-11-30', '2026-12-01'],
    moves: [{ bookingId: 'creek', daysAfter: ['2026-12-02', '2026-12-03'] }],
  })
  expect(openings[1]).toMatchObject({ days: ['2026-12-02', '2026-12-03'], moves: [] })
})

test('a firm booking does not, nor a pencilled one that would end after it is wanted', () => {
  const days = ['2026-11-30', '2026-12-01']
  for (const changes of [{ isPencilled: false }, { wantedBy: '2026-12-02' }])
    expect(findOpenings(plain({ bookings: [standing(changes, ...days)] }))).toMatchObject([
      { days: ['2026-12-02', '2026-12-03'], moves: [] },
    ])
})
