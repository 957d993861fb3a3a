import { expect, test } from 'vitest'
import { answerHints } from '../../shared/revisions/answer-hints.ts'
import type { Caution } from '../../shared/roof/roof-types.ts'
import { typedForm } from './typed-form.ts'

const unlevel: Pick<Caution, 'code' | 'answers'> = {
  code: 'eaves-not-level',
  answers: [
    { path: 'edges.1.overhangMm', value: 420, unit: 'mm' },
    { path: 'edges.2.overhangMm', value: 480.5, unit: 'mm' },
  ],
}
const frame = { brickOffsetMm: 110 }

test('the overhang that levels two eaves is said at the field of each edge', () => {
  expect([...answerHints(typedForm(), [unlevel], frame)]).toEqual([
    ['sides.right.overhangMm', '420 mm would level the eaves.'],
    ['sides.back.overhangMm', '480.5 mm would level the eaves.'],
  ])
})

test('measured from brickwork it is said as it would be typed', () => {
  const form = typedForm('rectangle', { overhangFrom: 'brickwork' })
  expect(answerHints(form, [unlevel], frame).get('sides.right.overhangMm')).toBe(
    '310 mm would level the eaves.',
  )
})

test('a size is said at the section it was typed in, and a pitch for all once', () => {
  const shallow: Pick<Caution, 'code' | 'answers'> = {
    code: 'section-shallow',
    answers: [{ path: 'sections.valley.depthMm', value: 210, unit: 'mm' }],
  }
  const flat: Pick<Caution, 'code' | 'answers'> = {
    code: 'pitch-below-covering',
    answers: [0, 1, 2, 3].map((edge) => ({
      path: `edges.${edge}.pitchDeg`,
      value: 15,
      unit: 'deg' as const,
    })),
  }
  // The valley is empty and is read as the hip.
  expect([...answerHints(typedForm(), [shallow, flat], frame)]).toEqual([
    ['sections.hip.depthMm', '210 mm or more would bear fully.'],
    ['pitchDeg', '15° and up is usual for the covering.'],
  ])
})
