import { expect, test } from 'vitest'
import { isAwayOn, nextAwayDay } from '../../shared/people/leave-days.ts'
import { leaveSpanText } from '../../shared/people/leave-words.ts'
import {
  ticketState,
  ticketStateText,
  ticketsToRenew,
  ticketTitle,
} from '../../shared/people/ticket-words.ts'

const thu = '2026-12-03'

// Weekdays of December 2026 from a wall calendar: the 2nd, 9th and 16th are Wednesdays.
const school = { startsOn: '2026-12-01', endsOn: '2026-12-15', weekdays: [3] }

test('both ends of leave are days away, the days beside them are not', () => {
  const leave = { startsOn: '2026-12-03', endsOn: '2026-12-05', weekdays: null }
  const days = ['2026-12-02', '2026-12-03', '2026-12-05', '2026-12-06']
  expect(days.map((day) => isAwayOn(leave, day))).toEqual([false, true, true, false])
})

test('trade school takes its weekday within the span and no Wednesday after it', () => {
  const days = ['2026-12-01', '2026-12-02', '2026-12-09', '2026-12-16']
  expect(days.map((day) => isAwayOn(school, day))).toEqual([false, true, true, false])
})

test('the next day away is the first of its weekdays still to come', () => {
  expect(nextAwayDay(school, '2026-11-01')).toBe('2026-12-02')
  expect(nextAwayDay(school, thu)).toBe('2026-12-09')
  expect(nextAwayDay(school, '2026-12-10')).toBeNull()
})

test('a ticket holds on its last day, lapses soon for thirty days before and has lapsed the day after', () => {
  const on = (expiresOn: string | null) => ticketState({ expiresOn }, thu)
  expect(on(thu)).toBe('lapsing')
  expect(on('2026-12-02')).toBe('lapsed')
  expect(on('2027-01-02')).toBe('lapsing')
  expect(on('2027-01-03')).toBe('holds')
  expect(on(null)).toBe('holds')
})

test('a ticket that was renewed need not be renewed again, one for something else must', () => {
  const heights = { kind: 'working-at-heights', name: '' } as const
  const old = { ...heights, expiresOn: '2026-12-01' }
  const soon = { ...heights, expiresOn: '2026-12-20' }
  const renewed = { ...heights, expiresOn: '2028-12-01' }
  const forklift = { kind: 'other', name: 'Forklift', expiresOn: '2026-12-01' } as const
  const dogging = { kind: 'other', name: 'Dogging', expiresOn: null } as const
  expect(ticketsToRenew([old, renewed], thu)).toEqual([])
  expect(ticketsToRenew([old, soon], thu)).toEqual([soon])
  expect(ticketsToRenew([old, forklift, dogging], thu)).toEqual([old, forklift])
})

test('leave and tickets are said in words, with the year where it is another', () => {
  expect(leaveSpanText(school, thu)).toBe('each Wed, Tue 1 Dec to Tue 15 Dec')
  expect(
    leaveSpanText({ startsOn: '2026-12-30', endsOn: '2027-01-04', weekdays: [1, 3, 5] }, thu),
  ).toBe('each Mon, Wed and Fri, Wed 30 Dec to Mon 4 Jan 2027')
  expect(leaveSpanText({ startsOn: thu, endsOn: thu, weekdays: null }, thu)).toBe('Thu 3 Dec')
  expect(ticketStateText({ expiresOn: '2026-12-02' }, thu)).toBe('Lapsed after Wed 2 Dec 2026')
  expect(ticketTitle({ kind: 'other', name: 'Forklift' })).toBe('Forklift')
  expect(ticketTitle({ kind: 'driver-licence', name: 'Heavy rigid' })).toBe(
    'Driver licence, Heavy rigid',
  )
})
