import { readFileSync } from 'node:fs'
import { expect, test } from 'vitest'

import { allExamples } from '../support/handbook.ts'

/** Examples that are no business of a convex frame, each with the reason. */
const leftOut: Record<string, string> = {
  'hodgson-brace-36-36': 'a brace, not a rafter',
  'hodgson-brace-24-18': 'a brace, not a rafter',
  'griffith-stepoff-fraction': 'stepping off with a square; nothing of the spec',
  'nav-short-valley-9in12-span30': 'valleys are not framed yet',
  'griffith-hip-run-unequal-5-8': 'valleys are not framed yet',
  'nav-valley-jacks-cripples': 'valleys are not framed yet',
  'king-hip-ridge': 'a ridge rule of another joint order (hips against the ridge)',
  'griffith-hip-ridge': 'a ridge rule of another joint order (hips against the ridge)',
  'irc-notch-quarter': 'a rule for notches; the frame spec gives a depth, not a rule',
  'army-takeoff-28in': 'stock cutting',
  'csp-wikipedia': 'stock cutting',
  'csp-gilmore-gomory-chvatal': 'stock cutting',
  'binpack-u120_00': 'stock cutting',
}

test('every handbook example is either checked or left out for a reason', () => {
  const here = new URL('.', import.meta.url)
  const text = ['handbook-lengths.test.ts', 'handbook-hips.test.ts']
    .map((file) => readFileSync(new URL(file, here), 'utf8'))
    .join('\n')
  const unchecked = allExamples.filter((id) => !text.includes(`'${id}'`))
  expect(unchecked.sort()).toEqual(Object.keys(leftOut).sort())
})
