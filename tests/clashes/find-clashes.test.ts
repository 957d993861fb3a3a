import { expect, test } from 'vitest'
import { findClashes } from '../../shared/clashes/find-clashes.ts'
import {
  bevel,
  bookingOf,
  creekShed,
  day,
  firmWith,
  fri,
  ivo,
  marksOf,
  mon,
  roofA,
  roofB,
  sat,
  tamsin,
  thu,
  wed,
  wim,
} from './clash-kit.ts'

// What counts as a clash is the product's own agreement; no outside source.

test('a crew on one job a day, all ticketed and there, with its roof, has no clash', () => {
  expect(findClashes(firmWith({ bookings: [bookingOf()] }))).toEqual([])
  expect(findClashes(firmWith({ bookings: [] }))).toEqual([])
})

test('a crew on two jobs one day is a clash on both, naming the other', () => {
  const found = findClashes(firmWith({ bookings: [bookingOf(), creekShed({ days: [fri, mon] })] }))
  expect(marksOf(found)).toEqual([`hill ${fri} clash crew-twice`, `creek ${fri} clash crew-twice`])
  expect(found[0]).toMatchObject({
    text: 'Plumb crew is also on QR-2 Creek shed.',
    wayOut: 'Move one of them or give it to another crew.',
  })
})

test('another crew on the same day stands in nobody’s way', () => {
  const found = findClashes(firmWith({ bookings: [bookingOf(), creekShed({ crew: bevel })] }))
  expect(found).toEqual([])
})

test('two jobs on purpose are a caution with the reason, which a crew does not read', () => {
  const bookings = [bookingOf(), creekShed({ days: [fri], clashReason: 'Half a day each' })]
  const [office] = findClashes(firmWith({ bookings }))
  expect(office).toMatchObject({ code: 'crew-twice-on-purpose', weight: 'caution' })
  expect(office?.text).toBe('Plumb crew is also on QR-2 Creek shed, on purpose: Half a day each')
  const [crew] = findClashes(firmWith({ bookings, reader: 'crew' }))
  expect(crew?.text).toBe('Plumb crew is also on QR-2 Creek shed, on purpose.')
  expect(crew?.wayOut).toBe('Ask the office.')
})

test('a crew with nobody in it, or with all of it away, is not there', () => {
  const bookings = [bookingOf({ days: [thu] })]
  expect(marksOf(findClashes(firmWith({ bookings, there: {} })))).toEqual([
    `hill ${thu} clash nobody-there`,
  ])
  const away = [tamsin, wim].map(({ id, name }) => ({ id, name, kind: 'sick' as const, day: thu }))
  expect(marksOf(findClashes(firmWith({ bookings, away })))).toEqual([
    `hill ${thu} clash nobody-there`,
  ])
})

test('who is away is a caution, each kind of leave in its words; a crew reads no kind', () => {
  const away = [{ id: 'wim', name: 'Wim Casey', kind: 'trade-school' as const, day: thu }]
  const bookings = [bookingOf()]
  const found = findClashes(firmWith({ bookings, away }))
  expect(marksOf(found)).toEqual([`hill ${thu} caution on-leave`])
  expect(found[0]?.text).toBe('At trade school: Wim Casey.')
  expect(findClashes(firmWith({ bookings, away, reader: 'crew' }))[0]?.text).toBe(
    'Away: Wim Casey.',
  )
})

test('an apprentice whose leading hand is away that day is alone', () => {
  const away = [{ id: 'tamsin', name: 'Tamsin Rook', kind: 'leave' as const, day: fri }]
  const found = findClashes(firmWith({ bookings: [bookingOf()], away }))
  expect(marksOf(found)).toEqual([
    `hill ${fri} clash apprentice-alone`,
    `hill ${fri} caution on-leave`,
  ])
  expect(found[0]?.text).toBe('Wim Casey is there without a tradesperson.')
})

test('somebody with a trade licence that holds is a tradesperson; one with a lapsed licence is none', () => {
  const office = { id: 'orla', name: 'Orla Brandt', role: 'office' as const }
  const there = { plumb: [wim, office] }
  const licence = (expiresOn: string | null) => ({
    orla: [
      { kind: 'working-at-heights' as const, expiresOn: null },
      { kind: 'trade-licence' as const, expiresOn },
    ],
  })
  const bookings = [bookingOf({ days: [fri] })]
  const marks = (expiresOn: string | null) =>
    marksOf(findClashes(firmWith({ bookings, there, tickets: licence(expiresOn) })))
  expect(marks(null)).toEqual([])
  expect(marks(fri)).toEqual([])
  expect(marks(thu)).toEqual([
    `hill ${fri} clash apprentice-alone`,
    `hill ${fri} caution ticket-lapsed`,
  ])
})

test('a working at heights ticket holds on its last day and is a clash the day after', () => {
  const tickets = { wim: [{ kind: 'working-at-heights' as const, expiresOn: thu }] }
  const found = findClashes(firmWith({ bookings: [bookingOf()], tickets }))
  expect(marksOf(found)).toEqual([`hill ${fri} clash ticket-lapsed`])
  expect(found[0]?.text).toBe('Wim Casey: working at heights lapsed Thu 3 Dec.')
})

test('a ticket renewed makes the lapsed one forgotten', () => {
  const tickets = {
    wim: [
      { kind: 'working-at-heights' as const, expiresOn: '2026-06-30' },
      { kind: 'working-at-heights' as const, expiresOn: '2028-06-30' },
    ],
  }
  expect(findClashes(firmWith({ bookings: [bookingOf()], tickets }))).toEqual([])
})

test('no working at heights ticket kept is a caution that names everybody without one', () => {
  const there = { plumb: [tamsin, wim, ivo] }
  const tickets = { wim: [], ivo: [{ kind: 'first-aid' as const, expiresOn: null }] }
  const found = findClashes(firmWith({ bookings: [bookingOf({ days: [thu] })], there, tickets }))
  expect(marksOf(found)).toEqual([`hill ${thu} caution ticket-lapsed`])
  expect(found[0]?.text).toBe('No working at heights ticket kept for Wim Casey and Ivo Marsh.')
})

test('a lapsed ticket that not every roof asks for is a caution', () => {
  const tickets = {
    tamsin: [
      { kind: 'working-at-heights' as const, expiresOn: null },
      { kind: 'first-aid' as const, expiresOn: '2026-11-30' },
    ],
  }
  const found = findClashes(firmWith({ bookings: [bookingOf({ days: [thu] })], tickets }))
  expect(marksOf(found)).toEqual([`hill ${thu} caution ticket-lapsed`])
  expect(found[0]?.text).toBe('Tamsin Rook: first aid lapsed Mon 30 Nov.')
})

test('a day the firm does not work is a caution with its name', () => {
  const closedDays = [{ day: fri, name: 'Show day' }]
  const found = findClashes(firmWith({ bookings: [bookingOf({ days: [fri, sat] })], closedDays }))
  expect(found.map((clash) => clash.text)).toEqual(['Show day.', 'Not a working weekday.'])
  expect(found.map((clash) => clash.weight)).toEqual(['caution', 'caution'])
})

const promised = (kind: 'frames-up' | 'edge-protection-up' | 'timber-on-site', on: string | null) =>
  bookingOf({ job: { milestones: [{ kind, day: on, state: 'promised', broughtBy: '' }] } })

test('a first day before frames, edge protection or timber is a clash; the same day is none', () => {
  const codes = (booking: ReturnType<typeof bookingOf>) =>
    marksOf(findClashes(firmWith({ bookings: [booking] })))
  expect(codes(promised('frames-up', fri))).toEqual([`hill ${thu} clash before-frames`])
  expect(codes(promised('edge-protection-up', fri))).toEqual([
    `hill ${thu} clash before-edge-protection`,
  ])
  expect(codes(promised('timber-on-site', fri))).toEqual([`hill ${thu} clash before-timber`])
  expect(codes(promised('timber-on-site', thu))).toEqual([])
})

test('frames asked for without a day are a caution, and the way out names who brings them', () => {
  const job = {
    milestones: [
      { kind: 'frames-up' as const, day: null, state: 'asked' as const, broughtBy: 'Tait Homes' },
    ],
  }
  const [found] = findClashes(firmWith({ bookings: [bookingOf({ job })] }))
  expect(found).toMatchObject({ code: 'before-frames', weight: 'caution', day: thu })
  expect(found?.text).toBe('Frames: no day yet.')
  expect(found?.wayOut).toBe('Ask Tait Homes for a day and set it on the job.')
})

test('what is done, or comes after the roof, is not waited for; a booking begun neither', () => {
  const done = { kind: 'frames-up' as const, day: fri, state: 'done' as const, broughtBy: '' }
  const cover = { kind: 'roof-cover' as const, day: null, state: 'asked' as const, broughtBy: '' }
  const timber = {
    kind: 'timber-on-site' as const,
    day: mon,
    state: 'promised' as const,
    broughtBy: '',
  }
  const bookings = [bookingOf({ job: { milestones: [done, cover] } })]
  expect(findClashes(firmWith({ bookings }))).toEqual([])
  const begun = bookingOf({
    job: { milestones: [timber] },
    days: [day(wed, { worked: true }), thu],
  })
  expect(findClashes(firmWith({ bookings: [begun] }))).toEqual([])
})

test('without an issued roof a pencilled day is a caution and a firm one a clash', () => {
  const bare = (state: 'pencilled' | 'firm') =>
    bookingOf({ state, days: [day(thu, { revision: null })], job: { newestRevision: null } })
  expect(marksOf(findClashes(firmWith({ bookings: [bare('pencilled')] })))).toEqual([
    `hill ${thu} caution no-roof`,
  ])
  expect(marksOf(findClashes(firmWith({ bookings: [bare('firm')] })))).toEqual([
    `hill ${thu} clash no-roof`,
  ])
})

test('a firm day planned to an older roof is a clash, unless it has been worked', () => {
  const days = [day(wed, { worked: true }), day(thu), day(fri, { revision: roofB })]
  const booking = bookingOf({ days, job: { newestRevision: roofB } })
  const found = findClashes(firmWith({ bookings: [booking] }))
  expect(marksOf(found)).toEqual([`hill ${thu} clash roof-revised`])
  expect(found[0]?.text).toBe('Planned to roof A; the newest is B.')
  const pencilled = { ...booking, state: 'pencilled' as const }
  expect(findClashes(firmWith({ bookings: [pencilled] }))).toEqual([])
})

test('a roof issued after the crew was told is a caution until they are told of it', () => {
  const withTold = (toldLetters: (string | null)[]) =>
    findClashes(
      firmWith({
        bookings: [
          bookingOf({
            days: [day(thu, { revision: roofB, toldLetters })],
            job: { newestRevision: roofB },
          }),
        ],
      }),
    )
  expect(withTold([])).toEqual([])
  expect(withTold(['B', 'B'])).toEqual([])
  expect(marksOf(withTold(['B', 'A']))).toEqual([`hill ${thu} caution roof-revised`])
  expect(withTold(['B', 'A'])[0]?.text).toBe('The crew was told roof A; it is B now.')
  expect(withTold([null])[0]?.text).toBe('Roof B was issued after the crew was told.')
})

test('a booking too short says so on its last day, by how much', () => {
  const found = findClashes(firmWith({ bookings: [bookingOf({ shortMinutes: 330 })] }))
  expect(marksOf(found)).toEqual([`hill ${fri} caution too-short`])
  expect(found[0]?.text).toBe('Too short by 5.5 h.')
})

test('a job marked complete waits for nothing more, but its crew is still booked', () => {
  const milestones = [
    { kind: 'frames-up' as const, day: null, state: 'asked' as const, broughtBy: '' },
  ]
  const complete = bookingOf({
    shortMinutes: 300,
    days: [day(thu, { revision: null })],
    job: { isComplete: true, milestones },
  })
  expect(findClashes(firmWith({ bookings: [complete] }))).toEqual([])
  const both = findClashes(firmWith({ bookings: [complete, creekShed({ days: [thu] })] }))
  expect(marksOf(both)).toEqual([`hill ${thu} clash crew-twice`, `creek ${thu} clash crew-twice`])
})

test('days that are over have no clash, and the first day over waits for nothing', () => {
  const milestones = [
    { kind: 'timber-on-site' as const, day: mon, state: 'promised' as const, broughtBy: '' },
  ]
  const bookings = [bookingOf({ job: { milestones } }), creekShed()]
  expect(marksOf(findClashes(firmWith({ bookings, today: fri })))).toEqual([
    `hill ${fri} clash crew-twice`,
    `creek ${fri} clash crew-twice`,
  ])
})

test('on one day the clashes come before the cautions, in their order of weight', () => {
  const away = [{ id: 'tamsin', name: 'Tamsin Rook', kind: 'leave' as const, day: sat }]
  const milestones = [
    { kind: 'edge-protection-up' as const, day: mon, state: 'guessed' as const, broughtBy: '' },
  ]
  const hill = bookingOf({ days: [sat], shortMinutes: 60, job: { milestones } })
  const found = findClashes(firmWith({ bookings: [hill, creekShed({ days: [sat] })], away }))
  expect(found.filter((c) => c.bookingId === 'hill').map((c) => c.code)).toEqual([
    'crew-twice',
    'apprentice-alone',
    'before-edge-protection',
    'too-short',
    'on-leave',
    'day-not-worked',
  ])
})

test('every clash has words and a way out', () => {
  const away = [{ id: 'tamsin', name: 'Tamsin Rook', kind: 'other' as const, day: sat }]
  const hill = bookingOf({
    days: [day(sat, { revision: roofA })],
    shortMinutes: 30,
    job: {
      newestRevision: roofB,
      milestones: (['frames-up', 'edge-protection-up', 'timber-on-site'] as const).map((kind) => ({
        kind,
        day: mon,
        state: 'asked',
        broughtBy: '',
      })),
    },
  })
  const tickets = { wim: [{ kind: 'construction-induction' as const, expiresOn: thu }] }
  const found = findClashes(
    firmWith({ bookings: [hill, creekShed({ days: [sat] })], away, tickets }),
  )
  expect(new Set(found.map((clash) => clash.code)).size).toBeGreaterThanOrEqual(9)
  for (const { text, wayOut } of found) {
    expect(text).toMatch(/^[A-Z].*\.$/)
    expect(wayOut).toMatch(/^[A-Z].*\.$/)
  }
})
