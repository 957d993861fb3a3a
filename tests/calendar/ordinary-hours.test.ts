import { expect, test } from 'vitest'
import { ordinaryMinutes } from '../../shared/calendar/ordinary-hours.ts'

const monday = '2026-12-07'
const friday = '2026-12-11'
const saturday = '2026-12-12'
const firm = { hoursPerDay: 8, workingWeekdays: [1, 2, 3, 4, 5], weekHours: null }
const shortFriday = { ...firm, weekHours: [8.5, 8.5, 8.5, 8.5, 6, 0, 0] }
const noOwn = { weekHours: null }

test('somebody without own hours works the firm’s', () => {
  expect(ordinaryMinutes(firm, noOwn, monday)).toBe(480)
})

test('a firm with a short Friday has a short Friday', () => {
  expect(ordinaryMinutes(shortFriday, noOwn, monday)).toBe(510)
  expect(ordinaryMinutes(shortFriday, noOwn, friday)).toBe(360)
})

test('somebody who does not work Fridays brings no minutes on a Friday', () => {
  const fourDays = { weekHours: [8, 8, 8, 8, 0, 0, 0] }
  expect(ordinaryMinutes(shortFriday, fourDays, monday)).toBe(480)
  expect(ordinaryMinutes(shortFriday, fourDays, friday)).toBe(0)
})

test('a Saturday worked all the same is a usual day for everybody', () => {
  expect(ordinaryMinutes(shortFriday, noOwn, saturday)).toBe(480)
  expect(ordinaryMinutes(firm, { weekHours: [8, 8, 8, 8, 8, 0, 0] }, saturday)).toBe(480)
  expect(ordinaryMinutes(firm, { weekHours: [8, 8, 8, 8, 8, 5, 0] }, saturday)).toBe(300)
})
