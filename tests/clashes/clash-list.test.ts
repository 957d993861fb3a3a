import { expect, test } from 'vitest'
import { daysInWords } from '../../shared/clashes/days-in-words.ts'
import { findClashes } from '../../shared/clashes/find-clashes.ts'
import { groupedClashes, worstFirst } from '../../shared/clashes/grouped-clashes.ts'
import { clashBookings, clashChoices, countWords } from '../../src/features/clashes/clash-view.ts'
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

test('days are written one by one, as a pair, or as a span with their number', () => {
  expect(daysInWords([thu])).toBe('Thu 3 Dec')
  expect(daysInWords([thu, fri])).toBe('Thu 3 Dec and Fri 4 Dec')
  expect(daysInWords([thu, fri, mon])).toBe('Thu 3 Dec to Mon 7 Dec (3 days)')
})

const away = [thu, fri].map((on) => ({
  id: 'wim',
  name: 'Wim Casey',
  kind: 'leave' as const,
  day: on,
}))
const bare = bookingOf({
  id: 'bare',
  crew: bevel,
  state: 'pencilled',
  days: [day(wed, { revision: null })],
  job: { number: 'QR-3', title: 'No plan yet' },
})
const found = findClashes(
  firmWith({ bookings: [bookingOf(), creekShed({ days: [fri] }), bare], away }),
)
const listed = groupedClashes(found)
const crewOf = (crew: { id: string; name: string }, letter: string) => ({
  ...crew,
  letter,
  colour: 1,
})
const list = {
  today: wed,
  clashes: listed,
  bookings: [
    {
      id: 'hill',
      state: 'firm' as const,
      job: { id: 'h', number: 'QR-1', title: 'Hill house' },
      crew: crewOf(plumb, 'P'),
    },
    {
      id: 'creek',
      state: 'firm' as const,
      job: { id: 'c', number: 'QR-2', title: 'Creek shed' },
      crew: crewOf(plumb, 'P'),
    },
    {
      id: 'bare',
      state: 'pencilled' as const,
      job: { id: 'b', number: 'QR-3', title: 'No plan yet' },
      crew: crewOf(bevel, 'B'),
    },
  ],
}
const all = { q: '', weight: null, what: null, crew: null }
const shown = (filter: Partial<Parameters<typeof clashBookings>[1]>) =>
  clashBookings(list, { ...all, ...filter }).map((one) => [
    one.job.number,
    one.clashes.map((clash) => clash.code),
  ])

test('somebody away on two days of a booking is one line; each booking keeps its own', () => {
  expect(listed.map(({ bookingId, code, days }) => [bookingId, code, days])).toEqual([
    ['bare', 'no-roof', [wed]],
    ['hill', 'on-leave', [thu, fri]],
    ['hill', 'crew-twice', [fri]],
    ['creek', 'crew-twice', [fri]],
    ['creek', 'on-leave', [fri]],
  ])
})

test('the list goes by first day, and within a booking what must be settled comes first', () => {
  expect(shown({})).toEqual([
    ['QR-3', ['no-roof']],
    ['QR-1', ['crew-twice', 'on-leave']],
    ['QR-2', ['crew-twice', 'on-leave']],
  ])
  expect(worstFirst(listed)[0]?.code).toBe('crew-twice')
})

test('filters leave what they name: weight, what, crew, and words of number or name in any order', () => {
  expect(shown({ weight: 'clash' })).toEqual([
    ['QR-1', ['crew-twice']],
    ['QR-2', ['crew-twice']],
  ])
  expect(shown({ what: 'no-roof' })).toEqual([['QR-3', ['no-roof']]])
  expect(shown({ crew: bevel.id })).toEqual([['QR-3', ['no-roof']]])
  expect(shown({ q: 'shed creek' }).map(([number]) => number)).toEqual(['QR-2'])
  expect(shown({ q: 'qr-1 shed' })).toEqual([])
})

test('the counts and the choices are those of the whole list', () => {
  expect(countWords(list)).toBe('2 clashes, 3 cautions')
  expect(countWords({ clashes: listed.slice(1, 3) })).toBe('1 clash, 1 caution')
  expect(clashChoices(list).codes).toEqual(['crew-twice', 'no-roof', 'on-leave'])
  expect(clashChoices(list).crews.map((crew) => crew.letter)).toEqual(['B', 'P'])
})
