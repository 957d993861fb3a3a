import { expect, test } from 'vitest'
import { platesOfForm } from '../../shared/revisions/form-outline.ts'
import { withText } from '../../shared/revisions/form-paths.ts'
import { roofOfForm } from '../../shared/revisions/roof-of-form.ts'
import { defaultSettings } from '../../shared/roof/roof-settings.ts'
import {
  mayAddCorner,
  withCornerAt,
  withCornerOn,
  withoutCorner,
  withPastedCorners,
} from '../../src/features/roof-editor/outline-edits.ts'
import { outlineFaults } from '../../src/features/roof-editor/outline-faults.ts'
import { typedForm } from './typed-form.ts'

/** 9.0 × 6.0 m with a gable on the right and its back at 30°. */
const house = typedForm('rectangle', {
  'sides.right.finish': 'gable',
  'sides.back.pitchDeg': '30',
})
const told = (form: typeof house) =>
  form.corners.map(({ x, y, finish, pitchDeg }) => [x, y, finish, pitchDeg].join(' ').trim())

test('dragging a corner of a ready shape makes it corners, each plate as it was', () => {
  const moved = withCornerAt(house, 2, { x: 8000, y: 6500.004 })!
  expect(moved.shape).toBe('corners')
  expect(told(moved)).toEqual(['0 0 eave', '9000 0 gable', '8000 6500 eave 30', '0 6000 eave'])
  expect(withCornerAt(moved, 2, { x: 8000, y: 6500 })).toBeNull()
  expect(withCornerAt(typedForm('rectangle', { widthMm: '' }), 2, { x: 0, y: 0 })).toBeNull()
})

test('a corner put on a plate leaves both halves as the plate was; taken out, all is as before', () => {
  const more = withCornerOn(house, 2)!
  expect(told(more)).toEqual([
    '0 0 eave',
    '9000 0 gable',
    '9000 6000 eave 30',
    '4500 6000 eave 30',
    '0 6000 eave',
  ])
  expect(told(withoutCorner(more, 3)!)).toEqual(
    told(withCornerAt(house, 0, { x: 1, y: 0 })!).with(0, '0 0 eave'),
  )
  const triangle = withoutCorner(house, 0)!
  expect(withoutCorner(triangle, 0)).toBeNull()
  const outline = platesOfForm(more).map(({ start }) => start)
  expect(mayAddCorner(outline, 0)).toBe(true)
  expect(
    mayAddCorner(
      [
        { x: 0, y: 0 },
        { x: 599, y: 0 },
        { x: 0, y: 900 },
      ],
      0,
    ),
  ).toBe(false)
})

test('pasted corners keep a gable where the plate is the same, and nowhere else', () => {
  const longer = withPastedCorners(house, [
    { x: -3000, y: 0 },
    { x: 9000, y: 0 },
    { x: 9000, y: 6000 },
    { x: -3000, y: 6000 },
  ])
  expect(told(longer)).toEqual([
    '-3000 0 eave',
    '9000 0 gable',
    '9000 6000 eave',
    '-3000 6000 eave',
  ])
})

test('faults are numbered where they are, a crossing once, those of no place last', () => {
  const corners = [
    ['0', '0'],
    ['9000', '6000'],
    ['9000', '0'],
    ['0', '6000'],
  ].map(([x = '', y = '']) => ({ x, y, finish: 'eave' as const, pitchDeg: '', overhangMm: '' }))
  const sizes = { 'sections.valley.depthMm': '190', 'sections.valley.thicknessMm': '35' }
  const form = { ...typedForm('corners', { ...sizes, maxSpacingMm: '1500' }), corners }
  const reading = roofOfForm(withText(form, 'corners.3.pitchDeg', '70'), {
    brickOffsetMm: 0,
    settings: defaultSettings,
  })
  if (reading.roof) throw new Error('A bow tie is no plan')
  const faults = outlineFaults(reading.drawn.outline, platesOfForm(form), {
    problems: reading.problems,
    drawn: reading.drawnProblems,
  })
  expect(faults.map(({ number, at }) => [number, at?.kind, at])).toEqual([
    [1, 'crossing', { kind: 'crossing', edges: [0, 2] }],
    [2, 'edge', { kind: 'edge', index: 3 }],
    [null, undefined, null],
  ])
  expect(faults[2]!.message).toContain('rafter spacing')
})
