import { expect, test } from 'vitest'
import { asCorners, platesOfForm } from '../../shared/revisions/form-outline.ts'
import { withText } from '../../shared/revisions/form-paths.ts'
import { hasHips, hasValleys, typingProblems } from '../../shared/revisions/form-typing.ts'
import {
  heldWalk,
  walkClosings,
  walkShown,
  walkWithSides,
  withWalk,
} from '../../shared/revisions/form-walk.ts'
import { formOfShape, type RoofForm, roofFormSchema } from '../../shared/revisions/roof-form.ts'
import { emptyWalkSide, type TurnKind } from '../../shared/revisions/walk-form.ts'
import { typedForm } from './typed-form.ts'

const xy = (form: RoofForm) => platesOfForm(form).map(({ start }) => [start.x, start.y])

const valley = { 'sections.valley.depthMm': '190', 'sections.valley.thicknessMm': '35' }

const lForm = (texts: Record<string, string> = {}) =>
  typedForm('l', {
    ...valley,
    lengthMm: '9000',
    widthMm: '7000',
    'wings.l.frontWidthMm': '4000',
    'wings.l.sideWidthMm': '3500',
    ...texts,
  })

function problemsOf(form: RoofForm): Record<string, string> {
  const found = typingProblems(form, platesOfForm(form))
  return Object.fromEntries(found.map(({ path, message }) => [path, message]))
}

/** Sides typed one under another: '9000 left', '4000 right', '2500 left-by 45'. */
function walked(form: RoofForm, ...lines: string[]): RoofForm {
  const sides = lines.map((line) => {
    const [lengthMm = '', turn = 'left', turnDeg = ''] = line.split(' ')
    return { ...emptyWalkSide(), lengthMm, turn: turn as TurnKind, turnDeg }
  })
  return withWalk(form, { startDeg: '0', sides })
}

// Outlines laid out by hand from the measures beside them.
test('an L typed by its four measures has the outline on the plan', () => {
  expect(xy(lForm())).toEqual([
    [0, 0],
    [9000, 0],
    [9000, 4000],
    [3500, 4000],
    [3500, 7000],
    [0, 7000],
  ])
  expect(xy(lForm({ 'wings.mirrored': 'yes' }))).toEqual([
    [9000, 0],
    [9000, 7000],
    [5500, 7000],
    [5500, 4000],
    [0, 4000],
    [0, 0],
  ])
})

test('the wing of a T stands in the middle until its distance is typed', () => {
  const t = typedForm('t', {
    lengthMm: '12000',
    'wings.t.wingWidthMm': '5000',
    'wings.t.projectionMm': '3000',
  })
  expect(xy(t)[3]).toEqual([8500, 6000])
  expect(xy(withText(t, 'wings.t.fromLeftMm', '2000'))[3]).toEqual([7000, 6000])
})

test('a second wing of a U and a second projection of a cross are as the first until typed', () => {
  const u = typedForm('u', {
    lengthMm: '15000',
    widthMm: '9000',
    'wings.u.frontWidthMm': '5000',
    'wings.u.leftWidthMm': '4000',
    'wings.u.rightWidthMm': '4500',
  })
  expect(xy(u)[2]).toEqual([15_000, 9000])
  const cross = typedForm('cross', {
    lengthMm: '14000',
    'wings.cross.wingWidthMm': '5000',
    'wings.cross.backMm': '3000',
  })
  expect(xy(cross)[0]).toEqual([0, 3000])
  expect(xy(cross)[8]).toEqual([9500, 12_000])
})

test('measures that make no such shape are told at the field, with what to do', () => {
  expect(problemsOf(lForm({ 'wings.l.sideWidthMm': '9000' }))).toEqual({
    'wings.l.sideWidthMm':
      'Wing 2, 9000 mm wide, takes up all of the length over all, 9000 mm: make it narrower.',
  })
  const t = typedForm('t', {
    ...valley,
    'wings.t.wingWidthMm': '4000',
    'wings.t.projectionMm': '3000',
  })
  expect(problemsOf(withText(t, 'wings.t.fromLeftMm', '0'))['wings.t.fromLeftMm']).toContain(
    'take the L',
  )
  expect(problemsOf(withText(t, 'wings.t.fromLeftMm', '5500'))['wings.t.fromLeftMm']).toContain(
    'between 0 and 5000 mm',
  )
  expect(problemsOf(lForm({ 'wings.l.frontWidthMm': '4' }))['wings.l.frontWidthMm']).toContain(
    'for 4 m type 4000',
  )
})

test('an L asks for a valley, a rectangle does not, and an inner corner by a gable does not', () => {
  expect(hasValleys(platesOfForm(lForm()))).toBe(true)
  const unsized = lForm({ 'sections.valley.depthMm': '', 'sections.valley.thicknessMm': '' })
  expect(problemsOf(unsized)['sections.valley.depthMm']).toBe('Type the depth of the valley.')
  expect(hasValleys(platesOfForm(typedForm()))).toBe(false)
  expect(hasValleys(platesOfForm(lForm({ 'wings.l.sides.3.finish': 'gable' })))).toBe(false)
  expect(hasHips(platesOfForm(lForm()))).toBe(true)
})

test('an L turned into corners keeps every gable, pitch and overhang on its own edge', () => {
  const l = lForm({ 'wings.l.sides.1.finish': 'gable', 'wings.l.sides.4.pitchDeg': '30' })
  for (const lie of [{}, { 'wings.mirrored': 'yes' }, { 'wings.turn': 'right' }]) {
    const shape = Object.entries(lie).reduce((form, [path, text]) => withText(form, path, text), l)
    const corners = asCorners(shape)!
    expect(xy(corners)).toEqual(xy(shape))
    const own = (form: RoofForm) =>
      platesOfForm(form).map(({ side }) => [side.finish, side.pitchDeg])
    expect(own(corners)).toEqual(own(shape))
  }
  expect(asCorners(lForm({ widthMm: '' }))).toBeNull()
})

test('sides and turns make the corners of the same L', () => {
  const form = walked(
    typedForm('corners'),
    '9000 left',
    '4000 left',
    '5500 right',
    '3000 left',
    '3500 left',
    '7000 left',
  )
  expect(xy(form)).toEqual(xy(lForm()))
  expect(problemsOf(form)['walk']).toBeUndefined()
  expect(walkShown(form).sides.map((side) => side.lengthMm)).toEqual([
    '9000',
    '4000',
    '5500',
    '3000',
    '3500',
    '7000',
  ])
})

test('walked with the house on the right the corners still run counter-clockwise', () => {
  const form = walked(typedForm('corners'), '9000 right', '6000 right', '9000 right', '6000 right')
  // Down the page from the start: x to the right, y up.
  expect(xy(form)).toEqual([
    [0, 0],
    [0, -6000],
    [9000, -6000],
    [9000, 0],
  ])
  const gabled = withText(form, 'corners.0.finish', 'gable')
  // Corner 1 to 2 is the side walked last.
  expect(walkShown(gabled).sides.map(({ side }) => side.finish)).toEqual([
    'eave',
    'eave',
    'eave',
    'gable',
  ])
})

test('an outline still open says by how much, and offers what closes it', () => {
  const plain = typedForm('corners', valley)
  const form = walked(plain, '9000 left', '4000 left', '5500 right', '3000 left')
  expect(problemsOf(form)).toEqual({
    walk: 'The outline is open by 7826 mm: type the next side, or close it.',
  })
  const closings = walkClosings(heldWalk(walked(form, '9000 left', '6000 left', '9000 left'))!, 0)
  expect(closings[0]).toMatchObject({ kind: 'add', lengthMm: 6000, isTurnChanged: false })
})

test('a changed side is answered by the two that can take it up', () => {
  const sides = ['9000 left', '4000 left', '5500 right', '3000 left', '3500 left', '7000 left']
  const form = walked(typedForm('corners'), ...sides.with(0, '10000 left'))
  expect(heldWalk(form)!.walk.gapMm).toBe(1000)
  const [closing] = walkClosings(heldWalk(form)!, 0)
  expect(closing).toMatchObject({ kind: 'stretch', lengthsMm: [4500, 7000] })
  const closed = withWalk(form, walkWithSides(walkShown(form), closing!.sides))
  expect(heldWalk(closed)!.walk.isClosed).toBe(true)
  expect(xy(closed)[4]).toEqual([4500, 7000])
})

test('emptying a length in the middle loses no gable further on', () => {
  const sides = ['9000 left', '4000 left', '5500 right', '3000 left', '3500 left', '7000 left']
  const form = walked(typedForm('corners'), ...sides)
  const gabled = withText(form, 'corners.4.finish', 'gable')
  const shown = walkShown(gabled)
  const emptied = withWalk(gabled, {
    ...shown,
    sides: shown.sides.with(1, { ...shown.sides[1]!, lengthMm: '' }),
  })
  expect(problemsOf(emptied)['walk.sides.1.lengthMm']).toBe('Type the length of side 2.')
  const again = walkShown(emptied)
  const retyped = withWalk(emptied, {
    ...again,
    sides: again.sides.with(1, { ...again.sides[1]!, lengthMm: '4000' }),
  })
  expect(retyped.corners.map(({ finish }) => finish)).toEqual(gabled.corners.map((c) => c.finish))
})

test('once a corner is moved by hand its sides are worked out anew', () => {
  const form = walked(typedForm('corners'), '9000 left', '6000 left', '9000 left', '6000 left')
  const moved = withText(withText(form, 'corners.2.x', '8000'), 'corners.2.y', '6500')
  expect(heldWalk(moved)).toBeNull()
  expect(walkShown(moved).sides[2]!.lengthMm).toBe('8015.61')
  expect(problemsOf(moved)['walk']).toBeUndefined()
})

test('a draft saved before there were wings, walks and timbers beside the frame still opens', () => {
  const form = typedForm()
  const { rafter, hip, ridge, valley } = form.sections
  const since = ['wings', 'walk', 'collarTieHeightMm']
  const old = Object.entries({ ...form, sections: { rafter, hip, ridge, valley } }).filter(
    ([key]) => !since.includes(key),
  )
  const stored: unknown = JSON.parse(JSON.stringify(Object.fromEntries(old)))
  expect(roofFormSchema.parse(stored)).toEqual(form)
  expect(roofFormSchema.parse(formOfShape('cross'))).toEqual(formOfShape('cross'))
})
