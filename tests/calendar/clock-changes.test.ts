import { expect, test } from 'vitest'
import { dayPlus, daysBetween, isoWeekday } from '../../shared/calendar/days.ts'
import { instantAt, localDayOf, localTimeOf } from '../../shared/calendar/local-time.ts'
import { previousWorkedDay, workedDaysFrom } from '../../shared/calendar/working-days.ts'

/*
 * Source: in New South Wales daylight saving ends on the first Sunday of April at 3:00, back to 2:00, and
 * begins on the first Sunday of October at 2:00, on to 3:00 (Standard Time Act 1987 (NSW) as amended, and the
 * IANA zone Australia/Sydney; from memory): UTC+11 in summer, UTC+10 in winter. Queensland has none: UTC+10.
 */
const sydney = 'Australia/Sydney'
const brisbane = 'Australia/Brisbane'
const clocksBack = '2026-04-05'
const clocksOn = '2026-10-04'

test('work that starts at 07:00 starts at 07:00 on the wall, whichever side of the change', () => {
  expect(instantAt('2026-04-03', '07:00', sydney).toISOString()).toBe('2026-04-02T20:00:00.000Z')
  expect(instantAt('2026-04-06', '07:00', sydney).toISOString()).toBe('2026-04-05T21:00:00.000Z')
  expect(instantAt('2026-10-02', '07:00', sydney).toISOString()).toBe('2026-10-01T21:00:00.000Z')
  expect(instantAt('2026-10-05', '07:00', sydney).toISOString()).toBe('2026-10-04T20:00:00.000Z')
  expect(instantAt('2026-10-05', '07:00', brisbane).toISOString()).toBe('2026-10-04T21:00:00.000Z')
})

test('Friday 15:00 to Monday 15:00 is an hour more over the autumn change, an hour less over the spring one', () => {
  const hours = (from: string, to: string) =>
    (instantAt(to, '15:00', sydney).getTime() - instantAt(from, '15:00', sydney).getTime()) /
    3_600_000
  expect(hours('2026-04-03', '2026-04-06')).toBe(73)
  expect(hours('2026-10-02', '2026-10-05')).toBe(71)
  expect(hours('2026-11-06', '2026-11-09')).toBe(72)
})

test('every minute of the day is on the day the wall shows, right up to midnight of both changes', () => {
  for (const day of [clocksBack, clocksOn]) {
    expect(localDayOf(instantAt(day, '00:00', sydney), sydney)).toBe(day)
    const lastMinute = instantAt(day, '23:59', sydney)
    expect(localDayOf(lastMinute, sydney)).toBe(day)
    expect(localTimeOf(lastMinute, sydney)).toBe('23:59')
    expect(localDayOf(new Date(lastMinute.getTime() + 60_000), sydney)).toBe(dayPlus(day, 1))
  }
})

test('a reminder set in the hour that is left out still goes that morning, and one in the hour that comes twice goes once', () => {
  const leftOut = instantAt(clocksOn, '02:30', sydney)
  // 02:30 is not on the wall: 01:59 is followed by 03:00, at 16:00 UTC of the day before.
  expect(localDayOf(leftOut, sydney)).toBe(clocksOn)
  expect(Math.abs(leftOut.getTime() - Date.parse('2026-10-03T16:00:00Z'))).toBeLessThanOrEqual(
    30 * 60_000,
  )
  const twice = instantAt(clocksBack, '02:30', sydney).toISOString()
  expect(['2026-04-04T15:30:00.000Z', '2026-04-04T16:30:00.000Z']).toContain(twice)
})

test('a day is one day long when it has 23 or 25 hours: days are text', () => {
  expect(dayPlus('2026-04-04', 2)).toBe('2026-04-06')
  expect(dayPlus('2026-10-05', -2)).toBe('2026-10-03')
  expect(daysBetween('2026-10-01', '2026-10-08')).toBe(7)
  expect(isoWeekday(clocksBack)).toBe(7)
  const firm = { workingWeekdays: [1, 2, 3, 4, 5], closedDays: [] }
  expect(previousWorkedDay(firm, '2026-10-05')).toBe('2026-10-02')
  expect(workedDaysFrom(firm, '2026-04-03', 2)).toEqual(['2026-04-03', '2026-04-06'])
})
