import { expect, test } from 'vitest'
import { publicHolidays } from '../../server/firm/public-holidays.ts'
import { closureDays } from '../../shared/calendar/closures.ts'

test('Queensland’s whole-day holidays of 2026 are those of its Holidays Act', () => {
  // Source: Holidays Act 1983 (Qld), schedule 1 (seen, as consolidated by AustLII; Easter Sunday came with a
  // later amendment, from memory), with Good Friday on 3 April 2026. The evening of Christmas Eve is no whole
  // day, and the show days of single towns are for the firm to type.
  expect(publicHolidays('AU', 'QLD', 2026).map(({ day }) => day)).toEqual([
    '2026-01-01',
    '2026-01-26',
    '2026-04-03',
    '2026-04-04',
    '2026-04-05',
    '2026-04-06',
    '2026-04-25',
    '2026-05-04',
    '2026-10-05',
    '2026-12-25',
    '2026-12-26',
    '2026-12-28',
  ])
})

test('a holiday moved to a weekday is still that holiday', () => {
  const moved = publicHolidays('AU', 'QLD', 2026).find(({ day }) => day === '2026-12-28')
  expect(moved).toMatchObject({ holiday: 'Boxing Day', name: 'Boxing Day (substitute day)' })
})

test('Easter Monday follows the paschal moon', () => {
  // Source: Easter Sunday is 28 March 2027 and 16 April 2028 by the Gregorian computus (Meeus, Astronomical
  // Algorithms, chapter 8; worked by hand).
  const easterMonday = (year: number) =>
    publicHolidays('AU', 'QLD', year).find(({ holiday }) => holiday === 'Easter Monday')?.day
  expect(easterMonday(2027)).toBe('2027-03-29')
  expect(easterMonday(2028)).toBe('2028-04-17')
})

test('a closure over the new year shuts each of its days', () => {
  const shut = closureDays([{ day: '2026-12-30', lastDay: '2027-01-02', name: 'Christmas break' }])
  expect(shut.map(({ day }) => day)).toEqual([
    '2026-12-30',
    '2026-12-31',
    '2027-01-01',
    '2027-01-02',
  ])
  expect(closureDays([{ day: '2026-08-12', name: 'Show day' }])).toHaveLength(1)
})
