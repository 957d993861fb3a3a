import { expect, test } from 'vitest'
import {
  heldMove,
  type Place,
  pulledDays,
  splitDays,
  stretchesOf,
  swappedPlaces,
} from '../../shared/bookings/booking-places.ts'
import { movedDays } from '../../shared/bookings/move-days.ts'

// The rules are the house's own (no outside source); the days are read off a calendar of December 2026.
const calendar = {
  workingWeekdays: [1, 2, 3, 4, 5],
  closedDays: [{ day: '2026-12-09', name: 'Show day' }],
}
const [wed, thu, fri, sat, mon, tue, showDay, thu10] = [
  '2026-12-02',
  '2026-12-03',
  '2026-12-04',
  '2026-12-05',
  '2026-12-07',
  '2026-12-08',
  '2026-12-09',
  '2026-12-10',
]
const place = (days: string[], worked: string[] = [], crewId = 'plumb'): Place => ({
  crewId,
  days,
  worked: new Set(worked),
})

test('days over a weekend or a show day are one stretch; a working day between cuts it', () => {
  expect(stretchesOf(calendar, [thu, fri, mon, tue, thu10])).toEqual([[thu, fri, mon, tue, thu10]])
  expect(stretchesOf(calendar, [thu, mon])).toEqual([[thu], [mon]])
  expect(stretchesOf(calendar, [thu, fri, sat, mon])).toEqual([[thu, fri, sat, mon]])
})

test('the day taken hold of lands where it is dropped, the days before and after it in working days', () => {
  const three = place([wed, thu, fri])
  const drop = (day: string, to: string) => {
    const move = heldMove(calendar, three, { stretch: three.days, day, to })
    return move && movedDays(calendar, three.days, three.worked, move)
  }
  expect(drop(wed, thu)).toEqual([thu, fri, mon])
  expect(drop(thu, mon)).toEqual([fri, mon, tue])
  expect(drop(fri, thu10)).toEqual([mon, tue, thu10])
})

test('worked days stay when the rest is dragged, and a stretch all worked is not dragged', () => {
  const begun = place([wed, thu, fri], [wed])
  const move = heldMove(calendar, begun, { stretch: begun.days, day: wed, to: mon })
  expect(move).toEqual({ from: thu, to: mon })
  expect(movedDays(calendar, begun.days, begun.worked, move!)).toEqual([wed, mon, tue])
  const done = place([wed], [wed])
  expect(heldMove(calendar, done, { stretch: [wed], day: wed, to: mon })).toBeNull()
})

test('an end is pulled over days off to a working day, and back; one day and days worked stay', () => {
  const two = place([thu, fri])
  const pull = (end: 'first' | 'last', to: string, of = two) =>
    pulledDays(calendar, of, { stretch: of.days, end, to })
  expect(pull('last', thu10)).toEqual([thu, fri, mon, tue, thu10])
  expect(pull('last', showDay)).toEqual([thu, fri, mon, tue, showDay])
  expect(pull('last', thu)).toEqual([thu])
  expect(pull('last', wed)).toEqual([thu])
  expect(pull('first', wed)).toEqual([wed, thu, fri])
  expect(pull('first', mon)).toEqual([fri])
  expect(pull('last', thu, place([thu, fri, mon], [fri]))).toEqual([thu, fri])
})

test('pulling one stretch leaves the booking’s other days alone', () => {
  const parted = place([thu, tue])
  expect(pulledDays(calendar, parted, { stretch: [thu], end: 'last', to: fri })).toEqual([
    thu,
    fri,
    tue,
  ])
})

test('a booking is split at a day, but not before its first or where a worked day would change hands', () => {
  expect(splitDays(place([wed, thu, fri]), thu)).toEqual([[wed], [thu, fri]])
  expect(splitDays(place([wed, thu]), wed)).toBeNull()
  expect(splitDays(place([wed, thu], [thu]), thu)).toBeNull()
})

test('two bookings of one crew change their order and keep to the days they have together', () => {
  const [a, b] = swappedPlaces(calendar, place([wed, thu]), place([fri, mon, tue]))!
  expect([a.days, b.days]).toEqual([
    [mon, tue],
    [wed, thu, fri],
  ])
  const [c, d] = swappedPlaces(calendar, place([fri, mon, tue]), place([wed, thu], [wed]))!
  expect([c.days, d.days]).toEqual([
    [thu, fri, mon],
    [wed, tue],
  ])
})

test('bookings of two crews change crew and first day, and keep how long they are', () => {
  const [a, b] = swappedPlaces(calendar, place([wed, thu, fri]), place([mon], [], 'rafter'))!
  expect(a).toEqual({ crewId: 'rafter', days: [mon, tue, thu10] })
  expect(b).toEqual({ crewId: 'plumb', days: [wed] })
})

test('a booking all worked changes places with none', () => {
  expect(swappedPlaces(calendar, place([wed], [wed]), place([fri]))).toBeNull()
})
