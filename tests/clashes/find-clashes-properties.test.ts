import fc from 'fast-check'
import { expect, test } from 'vitest'
import type { ClashBooking, ClashDay, ClashFacts } from '../../shared/clashes/clash-facts.ts'
import { findClashes } from '../../shared/clashes/find-clashes.ts'
import { leaveKinds } from '../../shared/people/leave-kinds.ts'
import { milestoneKinds, milestoneStates } from '../../shared/milestones/milestone-kinds.ts'
import { ticketKinds } from '../../shared/people/ticket-kinds.ts'
import { marksOf } from './clash-kit.ts'

// Random firms, and beside them each rule read out naively, day by day, sharing nothing with the program's.

/** Mon 30 Nov 2026 and the eleven days after it; the tests stand on the fourth. */
const span = [
  '2026-11-30',
  '2026-12-01',
  '2026-12-02',
  '2026-12-03',
  '2026-12-04',
  '2026-12-05',
  '2026-12-06',
  '2026-12-07',
  '2026-12-08',
  '2026-12-09',
  '2026-12-10',
  '2026-12-11',
]
const weekend = ['2026-12-05', '2026-12-06']
const today = '2026-12-03'
const crewIds = ['plumb', 'bevel']
const personIds = ['p0', 'p1', 'p2', 'p3']

const anyDay = fc.constantFrom(...span)
const anyDayOrNone = fc.option(anyDay, { nil: null })
const anyLetter = fc.constantFrom({ letter: 'A', sequence: 1 }, { letter: 'B', sequence: 2 })

type RandomFirm = {
  people: { role: 'office' | 'leading-hand' | 'apprentice'; crewId: string }[]
  tickets: { personId: string; kind: (typeof ticketKinds)[number]; expiresOn: string | null }[]
  away: { personId: string; day: string; kind: (typeof leaveKinds)[number] }[]
  closed: string[]
  bookings: ClashBooking[]
}

const anyBookedDay = (day: string): fc.Arbitrary<ClashDay> =>
  fc.record({
    day: fc.constant(day),
    worked: fc.boolean(),
    revision: fc.option(anyLetter, { nil: null }),
    toldLetters: fc.array(fc.constantFrom('A', 'B', null), { maxLength: 2 }),
  })

const anyBooking = (id: string): fc.Arbitrary<ClashBooking> =>
  fc.record({
    id: fc.constant(id),
    crew: fc.constantFrom(...crewIds).map((crewId) => ({ id: crewId, name: crewId })),
    state: fc.constantFrom('pencilled' as const, 'firm' as const),
    clashReason: fc.option(fc.constant('meant'), { nil: null }),
    shortMinutes: fc.constantFrom(0, 0, 45, 600),
    job: fc.record({
      id: fc.constant(`job of ${id}`),
      number: fc.constant(id),
      title: fc.constant('House'),
      isComplete: fc.constantFrom(false, false, false, true),
      newestRevision: fc.option(anyLetter, { nil: null }),
      milestones: fc.uniqueArray(
        fc.record({
          kind: fc.constantFrom(...milestoneKinds),
          day: anyDayOrNone,
          state: fc.constantFrom(...milestoneStates),
          broughtBy: fc.constantFrom('', 'The yard'),
        }),
        { selector: (one) => one.kind, maxLength: 6 },
      ),
    }),
    days: fc
      .subarray(span, { minLength: 1, maxLength: 4 })
      .chain((days) => fc.tuple(...days.map(anyBookedDay))),
  })

const anyFirm: fc.Arbitrary<RandomFirm> = fc.record({
  people: fc.tuple(
    ...personIds.map(() =>
      fc.record({
        role: fc.constantFrom('office' as const, 'leading-hand' as const, 'apprentice' as const),
        crewId: fc.constantFrom(...crewIds),
      }),
    ),
  ),
  tickets: fc.array(
    fc.record({
      personId: fc.constantFrom(...personIds),
      kind: fc.constantFrom(...ticketKinds),
      expiresOn: anyDayOrNone,
    }),
    { maxLength: 10 },
  ),
  away: fc.array(
    fc.record({
      personId: fc.constantFrom(...personIds),
      day: anyDay,
      kind: fc.constantFrom(...leaveKinds),
    }),
    { maxLength: 12 },
  ),
  closed: fc.subarray(span, { maxLength: 2 }),
  bookings: fc
    .integer({ min: 0, max: 4 })
    .chain((n) => fc.tuple(...Array.from({ length: n }, (_, i) => anyBooking(`b${i}`)))),
})

function factsOf(firm: RandomFirm): ClashFacts {
  return {
    today,
    reader: 'office',
    calendar: {
      workingWeekdays: [1, 2, 3, 4, 5],
      closedDays: firm.closed.map((day) => ({ day, name: 'Shut' })),
    },
    bookings: firm.bookings,
    crews: {
      on(crewId, day) {
        const own = firm.people.flatMap((person, i) =>
          person.crewId === crewId ? [{ id: personIds[i]!, name: `P${i}`, role: person.role }] : [],
        )
        const leaveOf = (id: string) =>
          firm.away.find((one) => one.personId === id && one.day === day)
        const there = own.filter(({ id }) => leaveOf(id) === undefined)
        const away = own.flatMap(({ id, name }) => {
          const gone = leaveOf(id)
          return gone ? [{ id, name, kind: gone.kind }] : []
        })
        return { there, away, minutes: there.length * 480 }
      },
      ticketsOf: (personId) => firm.tickets.filter((one) => one.personId === personId),
    },
  }
}

/** People of a crew on a day by index, present or away. */
function presentOf(firm: RandomFirm, crewId: string, day: string) {
  const own = [0, 1, 2, 3].filter((i) => firm.people[i]!.crewId === crewId)
  const isAway = (i: number) => firm.away.some((a) => a.personId === `p${i}` && a.day === day)
  return { there: own.filter((i) => !isAway(i)), away: own.filter(isAway) }
}

const ticketsOf = (firm: RandomFirm, i: number, kind: string) =>
  firm.tickets.filter((one) => one.personId === `p${i}` && one.kind === kind)
const holds = (expiresOn: string | null, day: string) => expiresOn === null || expiresOn >= day

function naivePeople(firm: RandomFirm, crewId: string, day: string): string[] {
  const { there, away } = presentOf(firm, crewId, day)
  if (there.length === 0) return ['clash nobody-there']
  const marks: string[] = []
  const roleOf = (i: number) => firm.people[i]!.role
  const mayLead = there.some(
    (i) =>
      roleOf(i) === 'leading-hand' ||
      ticketsOf(firm, i, 'trade-licence').some((one) => holds(one.expiresOn, day)),
  )
  if (!mayLead && there.some((i) => roleOf(i) === 'apprentice'))
    marks.push('clash apprentice-alone')
  const hasLapsed = (kinds: string[]) =>
    there.some((i) =>
      kinds.some((kind) => {
        const kept = ticketsOf(firm, i, kind)
        const anyGone = kept.some((one) => !holds(one.expiresOn, day))
        const noneHolds = kept.every((one) => !holds(one.expiresOn, day))
        return kind === 'other' ? anyGone : anyGone && noneHolds
      }),
    )
  if (hasLapsed(['working-at-heights', 'construction-induction'])) marks.push('clash ticket-lapsed')
  const lesser = ['first-aid', 'elevated-platform', 'driver-licence', 'trade-licence', 'other']
  if (hasLapsed(lesser)) marks.push('caution ticket-lapsed')
  if (there.some((i) => ticketsOf(firm, i, 'working-at-heights').length === 0))
    marks.push('caution ticket-lapsed')
  if (away.length > 0) marks.push('caution on-leave')
  return marks
}

function naiveRoof(booking: ClashBooking, { worked, revision, toldLetters }: ClashDay): string[] {
  if (worked || booking.job.isComplete) return []
  const isFirm = booking.state === 'firm'
  if (!revision) return [isFirm ? 'clash no-roof' : 'caution no-roof']
  if (!isFirm) return []
  const newest = booking.job.newestRevision
  if (newest && newest.letter > revision.letter) return ['clash roof-revised']
  return toldLetters.every((told) => told === revision.letter) ? [] : ['caution roof-revised']
}

const waitedFor: Record<string, string> = {
  'frames-up': 'before-frames',
  'edge-protection-up': 'before-edge-protection',
  'timber-on-site': 'before-timber',
}

function naiveMilestones({ job }: ClashBooking, first: ClashDay): string[] {
  if (first.worked || job.isComplete) return []
  const marks: string[] = []
  for (const { kind, day, state } of job.milestones) {
    const code = waitedFor[kind]
    if (code === undefined || state === 'done') continue
    if (day === null) marks.push(`caution ${code}`)
    else if (day > first.day) marks.push(`clash ${code}`)
  }
  return marks
}

function naiveTwice(firm: RandomFirm, booking: ClashBooking, day: string): string[] {
  const onThatDay = firm.bookings.filter(
    (one) =>
      one.id !== booking.id &&
      one.crew.id === booking.crew.id &&
      one.days.some((booked) => booked.day === day),
  )
  if (onThatDay.length === 0) return []
  const isMeant = [booking, ...onThatDay].some((one) => one.clashReason !== null)
  return [isMeant ? 'caution crew-twice-on-purpose' : 'clash crew-twice']
}

function naiveMarks(firm: RandomFirm): string[] {
  const marks: string[] = []
  for (const booking of firm.bookings) {
    for (const [i, booked] of booking.days.entries()) {
      const { day } = booked
      if (day < today) continue
      const isClosed = weekend.includes(day) || firm.closed.includes(day)
      const isShort = i === booking.days.length - 1 && booking.shortMinutes > 0
      const found = [
        ...naiveTwice(firm, booking, day),
        ...naivePeople(firm, booking.crew.id, day),
        ...(isClosed ? ['caution day-not-worked'] : []),
        ...naiveRoof(booking, booked),
        ...(i === 0 ? naiveMilestones(booking, booked) : []),
        ...(isShort && !booking.job.isComplete ? ['caution too-short'] : []),
      ]
      marks.push(...found.map((mark) => `${booking.id} ${day} ${mark}`))
    }
  }
  return marks.sort()
}

test('on random firms the clashes found are those a naive reading of each rule finds', () => {
  const seen = new Map<string, number>()
  fc.assert(
    fc.property(anyFirm, (firm) => {
      const found = marksOf(findClashes(factsOf(firm)))
      for (const mark of found) {
        const code = mark.split(' ').slice(2).join(' ')
        seen.set(code, (seen.get(code) ?? 0) + 1)
      }
      expect([...found].sort()).toEqual(naiveMarks(firm))
    }),
    { numRuns: 600 },
  )
  // The firms were wild enough: each rule was met, in each of its weights.
  expect(seen.size).toBe(19)
})

test('the order of the bookings changes nothing but the order of what is found', () => {
  fc.assert(
    fc.property(anyFirm, (firm) => {
      const turned = { ...firm, bookings: [...firm.bookings].reverse() }
      expect(marksOf(findClashes(factsOf(turned))).sort()).toEqual(
        marksOf(findClashes(factsOf(firm))).sort(),
      )
    }),
    { numRuns: 100 },
  )
})
