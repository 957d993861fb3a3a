import { expect, test } from 'vitest'
import { sizesTypedWords } from '../../shared/revisions/sizes-typed.ts'

const brisbane = 'Australia/Brisbane'
const maren = { by: 'Maren Tolhurst', at: '2026-12-02T22:00:00Z' }
const orla = { by: 'Orla Brandt', at: '2026-12-02T05:00:00Z' }

test('one person and day behind all sizes is said once, by the firm’s clock', () => {
  // 22:00 in Greenwich is the next morning in Brisbane.
  expect(sizesTypedWords({ rafter: maren, ridge: maren }, brisbane)).toBe(
    'Sizes typed by Maren Tolhurst, Thu 3 Dec',
  )
})

test('several people are named with what each typed', () => {
  expect(sizesTypedWords({ rafter: orla, hip: maren, ridge: orla }, brisbane)).toBe(
    'Sizes typed: rafter, ridge by Orla Brandt, Wed 2 Dec; hip by Maren Tolhurst, Thu 3 Dec',
  )
})

test('sizes from before names were kept name nobody', () => {
  expect(sizesTypedWords({}, brisbane)).toBeNull()
})
