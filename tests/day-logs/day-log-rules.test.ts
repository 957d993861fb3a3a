import fc from 'fast-check'
import { expect, test } from 'vitest'
import { weekHoursCsv } from '../../server/day-logs/hours-csv.ts'
import { expectedMinutes, whyLogShut } from '../../shared/day-logs/day-log-rules.ts'
import type { JobDayHours } from '../../shared/day-logs/hours-schemas.ts'
import {
  daysByCrew,
  decimalHours,
  hoursRatio,
  hoursSum,
  lostTimeOf,
} from '../../shared/day-logs/hours-sums.ts'
import { formatQuarters } from '../../shared/labour/format-hours.ts'

const today = '2026-12-02'
const yesterday = '2026-12-01'

test('who leads a crew closes a day that is over or under way, the office corrects any, nobody closes one ahead', () => {
  const open = { day: today, today, loggedOn: null }
  expect(whyLogShut('own-crew', open)).toBeNull()
  expect(whyLogShut('own-crew', { ...open, day: yesterday })).toBeNull()
  expect(whyLogShut('own-crew', { day: yesterday, today, loggedOn: today })).toBeNull()
  expect(whyLogShut('own-crew', { day: yesterday, today, loggedOn: yesterday })).toContain('office')
  expect(whyLogShut('all', { day: yesterday, today, loggedOn: yesterday })).toBeNull()
  expect(whyLogShut('all', { ...open, day: '2026-12-03' })).toContain('Thu 3 Dec is still ahead')
  expect(whyLogShut(null, open)).not.toBeNull()
})

test('a person’s hours put down over the sheets of one day never come to more than the ordinary day', () => {
  fc.assert(
    fc.property(
      fc.integer({ min: 0, max: 48 }),
      fc.integer({ min: 1, max: 4 }),
      (quarters, sheets) => {
        const ordinary = quarters * 15
        let logged = 0
        for (let openSheets = sheets; openSheets >= 1; openSheets--) {
          logged += expectedMinutes({
            ordinaryMinutes: ordinary,
            loggedElsewhereMinutes: logged,
            openSheets,
          })
        }
        expect(logged).toBe(ordinary)
      },
    ),
  )
})

const crewA = { id: 'a', name: 'Adze crew', letter: 'A', colour: 1 }
const crewB = { id: 'b', name: 'Bevel crew', letter: 'B', colour: 2 }

function dayOf(
  day: string,
  minutes: { planned: number; done: number; logged?: number; lost?: number },
  crew = crewA,
): JobDayHours {
  const { planned, done, logged, lost = 0 } = minutes
  const log =
    logged === undefined
      ? null
      : {
          version: 1,
          done: '',
          remarks: 'Wet',
          people: [{ personId: 'p', name: 'Tamsin Rook', turnedUp: true, minutes: logged }],
          delays: lost > 0 ? [{ reason: 'weather' as const, note: 'Rain', lostMinutes: lost }] : [],
          loggedBy: 'Tamsin Rook',
          loggedAt: '2026-12-02T05:00:00.000Z',
        }
  return { bookingDayId: day, day, crew, plannedMinutes: planned, doneMinutes: done, log }
}

const week = [
  dayOf('2026-11-30', { planned: 480, done: 400, logged: 600, lost: 120 }),
  dayOf('2026-12-01', { planned: 480, done: 480, logged: 480 }),
  dayOf('2026-12-02', { planned: 480, done: 100 }),
  dayOf('2026-12-01', { planned: 480, done: 0, logged: 240, lost: 240 }, crewB),
]

test('the time the work took leaves out hours lost, days not closed and days without a tick', () => {
  const sum = hoursSum(week)
  expect(sum).toMatchObject({ loggedMinutes: 1320, lostMinutes: 360, closedDays: 3 })
  // By hand: (600 − 120 + 480) worked for 880 planned minutes of ticked work.
  expect(hoursRatio(sum)).toBeCloseTo(960 / 880, 10)
  expect(hoursRatio(hoursSum([week[2]!]))).toBeNull()
})

test('a job’s hours part by crew, and its lost time names day, crew and reason', () => {
  expect(daysByCrew(week).map(({ crew, days }) => [crew.name, days.length])).toEqual([
    ['Adze crew', 3],
    ['Bevel crew', 1],
  ])
  expect(lostTimeOf(week).map((lost) => [lost.day, lost.crewName, lost.lostMinutes])).toEqual([
    ['2026-11-30', 'Adze crew', 120],
    ['2026-12-01', 'Bevel crew', 240],
  ])
})

test('hours are said in quarters on site and as decimals for the wages', () => {
  expect([0, 15, 465, 480, 1425].map(formatQuarters)).toEqual([
    '0 h',
    '¼ h',
    '7¾ h',
    '8 h',
    '23¾ h',
  ])
  expect([0, 465, 100].map(decimalHours)).toEqual([0, 7.75, 1.67])
})

test('no name, whatever it begins with, leaves the CSV as a formula', () => {
  // Source: OWASP, CSV injection: cells that begin with = + - @, tab or carriage return.
  fc.assert(
    fc.property(fc.constantFrom('=', '+', '-', '@', '\t', '\r'), fc.string(), (first, rest) => {
      const csv = weekHoursCsv({
        days: [],
        today,
        people: [{ personId: 'p', name: `${first}${rest}`, minutes: [] }],
        open: [],
      })
      const body = csv.slice(csv.indexOf('\r\n') + 2).replace(/^"/, '')
      expect(body.startsWith(`'${first}`)).toBe(true)
    }),
  )
})
