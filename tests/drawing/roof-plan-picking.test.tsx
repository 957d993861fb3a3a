// @vitest-environment jsdom
import { cleanup, fireEvent, render, screen } from '@testing-library/react'
import { afterEach, expect, test, vi } from 'vitest'
import { roofGlyphOf } from '../../shared/drawing/roof-glyph.ts'
import { posedMember } from '../../shared/drawing/timber-pose.ts'
import { frameRoof } from '../../shared/roof/frame-roof.ts'
import { RoofGlyph } from '../../src/drawings/roof-glyph.tsx'
import { RoofPlan } from '../../src/drawings/roof-plan.tsx'
import { TimberDrawing } from '../../src/drawings/timber-drawing.tsx'
import { rectangle } from '../roof/support/plans.ts'
import { makeRoof } from '../roof/support/roofs.ts'

const roof = makeRoof(rectangle(9000, 6000), [25, 25, 25, 25])
const spec = frameRoof(roof)
const [first, second] = spec.members.map((member) => member.mark)
const button = (mark: string | undefined) =>
  screen.getByRole('button', { name: new RegExp(`^${mark},`) })

// The test page has no media queries; the plan asks whether it is being printed.
vi.stubGlobal('matchMedia', () => ({
  matches: false,
  addEventListener: () => {},
  removeEventListener: () => {},
}))

afterEach(cleanup)

test('a timber is picked by a tap, and by Enter after the arrow keys', () => {
  const onPick = vi.fn()
  render(<RoofPlan roof={roof} spec={spec} onPick={onPick} />)
  fireEvent.click(button(first))
  expect(onPick).toHaveBeenLastCalledWith(first)
  button(first).focus()
  fireEvent.keyDown(button(first), { key: 'ArrowRight' })
  expect(document.activeElement).toBe(button(second))
  fireEvent.keyDown(button(second), { key: 'Enter' })
  expect(onPick).toHaveBeenLastCalledWith(second)
})

test('the Tab key stops at the plan once, at the picked timber', () => {
  render(<RoofPlan roof={roof} spec={spec} selected={second ?? null} onPick={() => {}} />)
  const stops = screen
    .getAllByRole('button')
    .filter((one) => one.getAttribute('tabindex') === '0' && one.hasAttribute('data-mark'))
  expect(stops).toEqual([button(second)])
  expect(button(second).getAttribute('aria-pressed')).toBe('true')
})

test('what is due and what is done is said in words as well as drawn', () => {
  const props = { due: new Set([first ?? '']), done: new Set([second ?? '']) }
  render(<RoofPlan roof={roof} spec={spec} {...props} onPick={() => {}} />)
  expect(button(first).getAttribute('aria-label')).toMatch(/, due today$/)
  expect(button(second).getAttribute('aria-label')).toMatch(/, done$/)
  expect(screen.getByText('Due today')).toBeTruthy()
})

test('a plan that is only read is one picture, with no buttons in it', () => {
  render(<RoofPlan roof={roof} spec={spec} label="Roof of lot 14" />)
  expect(screen.getByRole('img', { name: 'Roof of lot 14' })).toBeTruthy()
  expect(document.querySelectorAll('[data-mark][role]')).toHaveLength(0)
})

test('layers are shown and put away by name, and only where a roof has them', () => {
  const { rerender } = render(<RoofPlan roof={roof} spec={spec} onPick={() => {}} />)
  expect(screen.queryByRole('checkbox')).toBeNull()
  const rafter = spec.members.find((member) => member.role === 'common')
  if (!rafter) throw new Error('no common rafter')
  const tie = { ...rafter, mark: 'CT1', role: 'collar-tie' as const }
  const withTie = { ...spec, members: [...spec.members, tie] }
  rerender(<RoofPlan roof={roof} spec={withTie} onPick={() => {}} />)
  expect(button('CT1')).toBeTruthy()
  fireEvent.click(screen.getByRole('checkbox', { name: 'Collar ties' }))
  expect(screen.queryByRole('button', { name: /^CT1,/ })).toBeNull()
  expect(button(rafter.mark)).toBeTruthy()
})

test('a problem can be read where it is drawn', () => {
  const problem = { path: 'edges.1.pitchDeg', message: 'Edge 2: pitch is from 5 to 60' }
  render(<RoofPlan roof={roof} spec={null} mode="edit" problems={[problem]} onPick={() => {}} />)
  expect(screen.getByRole('img', { name: problem.message })).toBeTruthy()
})

test('a glyph has a title when it stands alone and is silent beside its name', () => {
  const glyph = roofGlyphOf(spec, roof)
  const { rerender } = render(<RoofGlyph glyph={glyph} title="Hip roof, 9.0 × 6.0 m" />)
  expect(screen.getByRole('img', { name: 'Hip roof, 9.0 × 6.0 m' })).toBeTruthy()
  rerender(<RoofGlyph glyph={glyph} />)
  expect(screen.queryByRole('img')).toBeNull()
})

test('a creeper says which side its long point is, and to keep the bow up', () => {
  const creeper = spec.members.find((member) => member.hand === 'left')
  if (!creeper) throw new Error('no left-hand creeper')
  render(<TimberDrawing member={posedMember(spec, creeper)} />)
  expect(screen.getByText('Long point on the left, bow up')).toBeTruthy()
  expect(screen.getAllByText('from edge').length).toBeGreaterThan(1)
})
