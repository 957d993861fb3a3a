import { expect, test } from 'vitest'
import {
  blankMilestone,
  isMilestoneKept,
  pressedState,
} from '../../shared/milestones/milestone-rules.ts'

const today = '2026-12-02'

test('done with no day, or with one still ahead, was done today', () => {
  expect(pressedState({ day: null }, 'done', today)).toEqual({ state: 'done', day: today })
  expect(pressedState({ day: '2026-12-09' }, 'done', today)).toEqual({ state: 'done', day: today })
})

test('done on a day that has come keeps that day', () => {
  expect(pressedState({ day: '2026-11-30' }, 'done', today).day).toBe('2026-11-30')
})

test('asked for and promised keep the day they have, or none', () => {
  expect(pressedState({ day: '2026-12-09' }, 'promised', today).day).toBe('2026-12-09')
  expect(pressedState({ day: null }, 'asked', today).day).toBeNull()
})

test('a guess without day, bringer or word says nothing; any of them does', () => {
  const blank = blankMilestone('frames-up')
  expect(isMilestoneKept(blank)).toBe(false)
  expect(isMilestoneKept({ ...blank, day: today })).toBe(true)
  expect(isMilestoneKept({ ...blank, state: 'asked' })).toBe(true)
  expect(isMilestoneKept({ ...blank, broughtBy: 'The builder' })).toBe(true)
  expect(isMilestoneKept({ ...blank, note: 'After the slab' })).toBe(true)
})
