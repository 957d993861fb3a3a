import { expect, test } from 'vitest'
import { formatPrice, priceCentsOf, priceInputText } from '../../shared/jobs/price-text.ts'

// Plain arithmetic of dollars and cents; no outside source.

test.each([
  ['18450', 1_845_000],
  ['$18,450.50', 1_845_050],
  [' 18 450.5 ', 1_845_050],
  ['0.07', 7],
  ['', null],
  ['   ', null],
])('%j typed as a price is %j cents', (text, cents) => {
  expect(priceCentsOf(text)).toBe(cents)
})

test.each(['about 18000', '-5', '12.345', '1e6', '$', '18.450,00', '12345678901'])(
  '%j is not taken for a price',
  (text) => {
    expect(priceCentsOf(text)).toBeUndefined()
  },
)

test('a price reads with its thousands apart and cents only where there are some', () => {
  expect(formatPrice(1_845_000)).toBe('$18,450')
  expect(formatPrice(123_456_705)).toBe('$1,234,567.05')
  expect(formatPrice(50)).toBe('$0.50')
})

test('a stored price comes back into its field as the same price', () => {
  for (const cents of [0, 7, 50, 1_845_000, 1_845_050]) {
    expect(priceCentsOf(priceInputText(cents))).toBe(cents)
  }
})
