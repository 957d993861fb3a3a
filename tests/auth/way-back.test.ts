import { expect, test } from 'vitest'
import { wayBack } from '../../src/features/auth/way-back.ts'

/** As a browser reads it (WHATWG URL standard: tabs and line ends are dropped, a backslash is a slash). */
const whereItLeads = (to: string) => new URL(to, 'http://ridgehand.test').origin

test.each(['/today', '/today?day=2026-12-03&crew=a', '/jobs/1/revisions/A#x'])(
  'after sign-in a person goes on to where they were: %s',
  (to) => {
    expect(wayBack(to)).toBe(to)
  },
)

test.each([
  null,
  '',
  'today',
  'https://elsewhere.example',
  'javascript:alert(1)',
  '//elsewhere.example',
  '/\\elsewhere.example',
  '/\t/elsewhere.example',
  '/\n\\elsewhere.example',
  '\t//elsewhere.example',
])('no link sends a person anywhere else after sign-in: %j', (to) => {
  expect(whereItLeads(wayBack(to))).toBe('http://ridgehand.test')
  expect(wayBack(to)).toBe('/')
})
