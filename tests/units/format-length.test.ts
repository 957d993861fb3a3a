import { describe, expect, test } from 'vitest'
import {
  formatFeetInches,
  formatLength,
  formatMm,
  lengthUnitWord,
} from '../../shared/units/format-length.ts'

describe('lengths in millimetres', () => {
  test('a length shows as whole millimetres without thousands separators', () => {
    expect(formatMm(3290.6)).toBe('3291')
    expect(formatMm(12000)).toBe('12000')
    expect(formatMm(0.4)).toBe('0')
  })

  test('a piece that runs past shows a true minus, and nothing shows as minus nought', () => {
    expect(formatMm(-22.5)).toBe('−23')
    expect(formatMm(-0.2)).toBe('0')
  })

  test('a length that is not known shows a dash rather than NaN', () => {
    expect(formatMm(Number.NaN)).toBe('–')
    expect(formatFeetInches(Number.POSITIVE_INFINITY)).toBe('–')
  })
})

// Source: the international inch is 25.4 mm exactly (1959 agreement); the rest is arithmetic.
describe('lengths in feet, inches and sixteenths', () => {
  test('3291 mm reads ten foot nine and nine sixteenths', () => {
    expect(formatFeetInches(3291)).toBe(`10' 9 9/16"`)
  })

  test('fractions are in lowest terms', () => {
    expect(formatFeetInches(25.4 * 5.5)).toBe(`5 1/2"`)
    expect(formatFeetInches(25.4 * (12 + 3 + 12 / 16))).toBe(`1' 3 3/4"`)
    expect(formatFeetInches(25.4 / 8)).toBe(`1/8"`)
  })

  test('what rounds up to a whole foot shows the foot', () => {
    expect(formatFeetInches(304.7)).toBe(`1' 0"`)
    expect(formatFeetInches(0)).toBe(`0"`)
    expect(formatFeetInches(-25.4)).toBe(`−1"`)
  })

  test('every sixteenth up to three feet reads back as itself', () => {
    for (let sixteenths = 0; sixteenths <= 36 * 16; sixteenths += 1) {
      expect(readSixteenths(formatFeetInches((sixteenths / 16) * 25.4))).toBe(sixteenths)
    }
  })
})

test('the firm setting chooses the units', () => {
  expect(formatLength(3291, 'mm')).toBe('3291')
  expect(formatLength(3291, 'feet-inches')).toBe(`10' 9 9/16"`)
  expect(lengthUnitWord('mm')).toBe('mm')
  expect(lengthUnitWord('feet-inches')).toBe('')
})

/** Reads a tape the way a person would, independent of how it was written. */
function readSixteenths(text: string): number {
  const feet = /(\d+)'/.exec(text)?.[1] ?? '0'
  const afterFeet = text.replace(/^\d+'\s*/, '').replace('"', '')
  const fraction = /(\d+)\/(\d+)/.exec(afterFeet)
  const inches = /^(\d+)(?!\/|\d)/.exec(afterFeet)?.[1] ?? '0'
  const part = fraction ? (Number(fraction[1]) / Number(fraction[2])) * 16 : 0
  return Number(feet) * 192 + Number(inches) * 16 + part
}
