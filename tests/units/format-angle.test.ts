import { expect, test } from 'vitest'
import { formatAngle } from '../../shared/units/format-angle.ts'

test('an angle shows to the half degree with one decimal', () => {
  expect(formatAngle(41.93)).toBe('42.0°')
  expect(formatAngle(18.249)).toBe('18.0°')
  expect(formatAngle(18.26)).toBe('18.5°')
  expect(formatAngle(65)).toBe('65.0°')
})

test('an angle past square keeps its sign and nothing shows as minus nought', () => {
  expect(formatAngle(-20.1)).toBe('−20.0°')
  expect(formatAngle(-0.1)).toBe('0.0°')
})

test('a firm that marks to the whole degree may ask for it, and an unknown angle is a dash', () => {
  expect(formatAngle(41.9, 1)).toBe('42.0°')
  expect(formatAngle(Number.NaN)).toBe('–')
})
