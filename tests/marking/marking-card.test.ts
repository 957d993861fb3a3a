import { expect, test } from 'vitest'
import { markingCardLines, markingCardOf } from '../../shared/marking/marking-card.ts'
import type { MarkingOptions } from '../../shared/marking/marking-figures.ts'
import { topTiltDeg } from '../../shared/marking/saw-words.ts'
import { frameRoof } from '../../shared/roof/frame-roof.ts'
import { framedOnce } from '../roof/support/framed.ts'
import { rectangle } from '../roof/support/plans.ts'
import { makeRoof } from '../roof/support/roofs.ts'
import {
  angle,
  common,
  creeperLeft,
  creeperRight,
  headCut,
  pitchDeg,
  ridge,
  specOf,
} from './hand-computed-spec.ts'

const options: MarkingOptions = { units: 'mm', roundMm: 1, roundDeg: 0.5, sawMaxTiltDeg: 50 }

test('a common of 3 m run and 2.25 m rise is marked 3750 set out and 3728 to its head cut', () => {
  // Source: Pythagoras, a 3-4-5 triangle; half of a 35 ridge over its cosine is 21.9.
  const card = markingCardOf(specOf([common]), 'C1', options)
  expect(card.name).toBe('Common rafter')
  expect(card.section).toBe('140 × 45')
  expect(card.setOutLength).toMatchObject({ valueMm: 3750, text: '3750', unit: 'mm' })
  const head = card.ends.find((end) => end.end === 'head')!
  expect(head.points).toMatchObject([{ label: 'Head cut', valueMm: 3728.125, text: '3728' }])
  expect(head.points[0]!.note).toBe('from the heel line')
  const tail = card.ends.find((end) => end.end === 'tail')!
  expect(tail.points).toMatchObject([{ text: '563', note: 'down from the heel line' }])
})

test('the plumb bevel of a 37° rafter reads both ways and the two make 90', () => {
  const card = markingCardOf(specOf([common]), 'C1', options)
  const cut = card.ends.find((end) => end.end === 'head')!.cuts[0]!
  expect(cut.kind).toBe('plumb cut')
  expect(cut.face.fromSquareDeg).toBeCloseTo(pitchDeg, 9)
  expect(cut.face.fromEdgeDeg + cut.face.fromSquareDeg).toBeCloseTo(90, 9)
  expect(cut.face.fromSquareText).toBe('37.0°')
  expect(cut.face.fromEdgeText).toBe('53.0°')
  expect(cut.edge).toBeNull()
  expect(cut.bearsOn).toBe('Bears on the ridge R1')
})

test.each([45.25, 44.75, 67.3, 12.49, 89.75])(
  'a bevel of %s° shows two angles that make 90 as shown',
  (fromEdgeDeg) => {
    const member = { ...common, cuts: [{ ...headCut, face: angle(fromEdgeDeg) }] }
    const { face } = markingCardOf(specOf([member]), 'C1', options).ends[0]!.cuts[0]!
    expect(parseFloat(face.fromEdgeText) + parseFloat(face.fromSquareText)).toBe(90)
    expect(face.fromEdgeDeg).toBe(fromEdgeDeg)
  },
)

test('a line past square says so instead of showing a minus', () => {
  const member = { ...common, cuts: [{ ...headCut, face: angle(95) }] }
  const card = markingCardOf(specOf([member]), 'C1', options)
  expect(markingCardLines(card).join('\n')).toContain(
    '5.0° past square, towards the head, 95.0° from the edge',
  )
})

test('a line of left and right creepers says which is which', () => {
  const card = markingCardOf(specOf([creeperRight, creeperLeft]), 'CR1', options)
  expect(card.quantityWords).toBe('x2: 1 left, 1 right')
  expect(card.drawnMark).toBe('CR1a')
  expect(card.handWords).toBe(
    'Left hand: long point on the left looking up the rafter, bow up. Right hand: the same, mirrored.',
  )
  expect(card.ends.find((end) => end.end === 'head')!.points).toMatchObject([
    { label: 'Long point, left', valueMm: 2403.1, text: '2403' },
    { label: 'Short point, right', valueMm: 2346.9, text: '2347' },
  ])
})

test('a right-hand creeper alone has its long point on the right', () => {
  const card = markingCardOf(specOf([creeperRight]), 'CR1', options)
  expect(card.handWords).toBe('Long point on the right looking up the rafter, bow up.')
  expect(card.ends.find((end) => end.end === 'head')!.points[0]!.label).toBe('Long point, right')
})

test('a ridge has no heel: it is measured from its first node and runs past both', () => {
  const card = markingCardOf(specOf([ridge]), 'R1', options)
  expect(card.birdsmouth).toBeNull()
  expect(card.tailLength).toBeNull()
  expect(card.drop).toMatchObject({ valueMm: 13.1, text: '13' })
  const text = markingCardLines(card).join('\n')
  expect(text).not.toContain('heel')
  expect(text).toContain('Head cut 4023 mm from the first node: ')
  expect(text).toContain('Foot cut 23 mm past the first node: ')
})

test('numbers stay exact and are rounded only where they are written', () => {
  const card = markingCardOf(specOf([common]), 'C1', { ...options, roundMm: 5 })
  expect(card.cutLength).toMatchObject({ valueMm: 4374.6, text: '4375' })
  const inches = markingCardOf(specOf([common]), 'C1', { ...options, units: 'feet-inches' })
  // 3750 / 25.4 = 147.638 in = 12 ft 3 10/16 in.
  expect(inches.setOutLength).toMatchObject({ valueMm: 3750, text: `12' 3 5/8"`, unit: '' })
})

test('a cut past the saw says the tilt, a way round, and how to hold it', () => {
  const steep = {
    ...creeperLeft,
    cuts: [{ ...creeperLeft.cuts[0]!, bladeTiltDeg: 58.2, pastSaw: true }],
  }
  const [past, round, safety] = markingCardOf(specOf([steep]), 'CR1', options).ends[0]!.cuts[0]!
    .sawWords
  expect(past).toBe('Past the saw: needs 58.0° of tilt, the saw has 50.0°.')
  expect(round).toContain('top edge')
  expect(safety).toBe("Clamped, guard working, within the saw's manual.")
})

test('with its base on the top edge the blade of a square-across plumb cut tilts by the pitch', () => {
  // Source: geometry; a plumb plane square to the run leans from square to the edge by the pitch.
  expect(topTiltDeg(common, headCut)).toBeCloseTo(pitchDeg, 3)
})

test('only the cautions and planing of the line are on its card', () => {
  const spec = specOf([common, ridge], {
    cautions: [
      { code: 'birdsmouth-deep', members: ['C1a'], text: 'Deep.', remedy: 'Ask.' },
      { code: 'section-shallow', members: ['R1'], text: 'Shallow.', remedy: 'Ask.' },
    ],
    planing: [
      { mark: 'R1', end: 'head', side: 'left', offMm: 2.1 },
      { mark: 'C1a', end: 'head', side: 'right', offMm: 1.6 },
    ],
  })
  const card = markingCardOf(spec, 'C1', options)
  expect(card.warnings).toEqual([{ text: 'Deep.', remedy: 'Ask.' }])
  expect(card.planing).toEqual(['C1a: plane 2 mm off the right top corner at the head.'])
})

test('corners planed alike are one sentence, and a piece planed at both ends says so once', () => {
  const off = (mark: string, end: 'head' | 'foot', side: 'left' | 'right', offMm = 2) =>
    ({ mark, end, side, offMm }) as const
  const spec = specOf([ridge], {
    planing: [
      off('R1', 'head', 'left'),
      off('R1', 'head', 'right'),
      off('R1', 'foot', 'left'),
      off('R1', 'foot', 'right'),
    ],
  })
  expect(markingCardOf(spec, 'R1', options).planing).toEqual([
    'R1: plane 2 mm off both top corners at the head and the foot.',
  ])
  const uneven = specOf([ridge], {
    planing: [off('R1', 'head', 'left'), off('R1', 'head', 'right', 5)],
  })
  expect(markingCardOf(uneven, 'R1', options).planing).toEqual([
    'R1: plane 2 mm off the left top corner at the head.',
    'R1: plane 5 mm off the right top corner at the head.',
  ])
})

test('two cheeks give the points that are on the timber: the middle and both edges', () => {
  // Source: geometry. Octagonal end at 25°, rafters 45: the diagonal crown's cheeks stand at 45° to it in
  // plan and meet on its centre line 35.11 below the node (roof.md, known values); each edge is half a
  // thickness further down in plan, over the cosine of the pitch: 22.5 / cos 25° = 24.83.
  const cut = 3000 * (2 - Math.SQRT2)
  const outline = [
    [0, 0],
    [8000, 0],
    [8000 + cut, cut],
    [8000 + cut, 6000 - cut],
    [8000, 6000],
    [0, 6000],
  ] as const
  const spec = frameRoof(makeRoof(outline, [25, 25, 25, 25, 25, 25]))
  const diagonal = spec.members.find(
    (one) => one.role === 'crown-end' && one.cuts.filter(({ end }) => end === 'head').length === 2,
  )!
  const line = spec.cutLines.find(({ members }) => members.includes(diagonal.mark))!
  const head = markingCardOf(spec, line.mark, options).ends.find(({ end }) => end === 'head')!
  expect(head.points.map(({ label }) => label)).toEqual([
    'Long point, centre',
    'Short point, both edges',
  ])
  const centreMm = 3000 / Math.cos((25 * Math.PI) / 180) - 35.11
  expect(head.points[0]!.valueMm).toBeCloseTo(centreMm, 1)
  expect(head.points[1]!.valueMm).toBeCloseTo(centreMm - 24.83, 1)
})

test('a ridge says which of its ends the tape starts from', () => {
  const spec = framedOnce(makeRoof(rectangle(9000, 6000), [25, 25, 25, 25]))
  const card = markingCardOf(spec, 'R1', options)
  const board = spec.members.find((one) => one.role === 'ridge')!
  const crown = spec.members.find((one) => card.handWords.includes(`crown end rafter ${one.mark}`))!
  expect(crown.axis.to.x).toBeCloseTo(board.axis.from.x, 6)
  expect(crown.axis.to.y).toBeCloseTo(board.axis.from.y, 6)
})

test('a cut line that the roof has not is refused by name', () => {
  expect(() => markingCardOf(specOf([common]), 'H9', options)).toThrow('no cut line H9')
})

test('every card of a hip roof carries the numbers of the member it describes', () => {
  const spec = framedOnce(makeRoof(rectangle(9000, 6000), [25, 25, 25, 25]))
  expect(spec.cutLines.length).toBeGreaterThan(5)
  for (const line of spec.cutLines) {
    const card = markingCardOf(spec, line.mark, options)
    const member = spec.members.find((one) => one.mark === card.drawnMark)!
    expect(line.members).toContain(member.mark)
    expect(card.setOutLength.valueMm).toBe(member.setOutLengthMm)
    expect(card.cutLength.valueMm).toBe(line.cutLengthMm)
    const cuts = card.ends.flatMap((end) => end.cuts)
    expect(cuts).toHaveLength(member.cuts.length)
    for (const cut of cuts) {
      const same = member.cuts.filter((one) => one.bladeTiltDeg === cut.bladeTiltDeg)
      expect(same.map((one) => one.face.fromEdgeDeg)).toContain(cut.face.fromEdgeDeg)
    }
    const single = member.cuts.filter((one) => one.end === 'head')
    const points = card.ends.find((end) => end.end === 'head')!.points.map((p) => p.valueMm)
    if (single.length === 1) expect(points).toContain(Math.abs(single[0]!.longPointFromHeelMm))
    else expect(Math.min(...points)).toBeCloseTo(single[0]!.shortPointFromHeelMm, 2)
  }
})
