import { describe, expect, test } from 'vitest'
import { pieceHand } from '../../shared/drawing/timber-hand.ts'
import { posedMember } from '../../shared/drawing/timber-pose.ts'
import { cutAlongMm, timberAxes } from '../../shared/drawing/timber-shape.ts'
import { markingCardLines, markingCardOf } from '../../shared/marking/marking-card.ts'
import type { MarkingOptions } from '../../shared/marking/marking-figures.ts'
import { shareWords } from '../../shared/marking/role-words.ts'
import { roundingWords } from '../../shared/marking/rounding-words.ts'
import { defaultSettings } from '../../shared/roof/roof-settings.ts'
import type { FrameSpec, MemberRole } from '../../shared/roof/roof-types.ts'
import { framedOnce } from '../roof/support/framed.ts'
import { rectangle } from '../roof/support/plans.ts'
import { hollowReferences, makeRoof, referenceRoof } from '../roof/support/roofs.ts'
import {
  common,
  creeperLeft,
  creeperRight,
  headCut,
  specOf,
  tailCut,
} from './hand-computed-spec.ts'

const options: MarkingOptions = { units: 'mm', roundMm: 1, roundDeg: 0.5, sawMaxTiltDeg: 50 }
const hollow = (id: string) => hollowReferences.find((reference) => reference.id === id)!
const deg = (angle: number) => (angle * Math.PI) / 180
const cardsOf = (spec: FrameSpec, role: MemberRole) =>
  spec.cutLines
    .filter((line) => line.role === role)
    .map((line) => markingCardOf(spec, line.mark, options))
const headPoints = (spec: FrameSpec, mark: string) =>
  markingCardOf(spec, mark, options).ends[0]!.points

describe('a T plan, main 6.0 m wide, wing 4.0 m wide, 25°', () => {
  const spec = framedOnce(referenceRoof(hollow('T-narrow-wing')))

  test('a pair of valley creepers is one left and one right, told apart by the foot', () => {
    const pair = cardsOf(spec, 'valley-creeper').find((card) => card.quantity === 2)!
    expect(pair.quantityWords).toBe('x2: 1 left, 1 right')
    expect(pair.handWords).toBe(
      "Left hand: foot's long point on the left looking up the rafter, bow up. Right hand: the same, mirrored.",
    )
    expect(shareWords(spec.members, pair.memberMarks)).toBe('x2: 1 left, 1 right')
    const drawn = spec.members.find((one) => one.mark === pair.drawnMark)!
    expect(drawn.hand).toBeNull()
    expect(pieceHand(drawn)).toEqual({ side: 'left', end: 'foot' })
  })

  test('a valley creeper is measured along its edges and its foot is cut against the valley', () => {
    // Source: geometry. The foot meets a 35 valley that runs at 45° in plan, so its far edge is one rafter
    // thickness further on in plan: 45 / cos 25° = 49.65 along the timber.
    const card = cardsOf(spec, 'valley-creeper').find((one) => one.quantity === 2)!
    const [left, right] = card.edges
    expect(left!.label).toBe('Left edge')
    expect(right!.label).toBe('Right edge')
    expect(left!.valueMm - right!.valueMm).toBeCloseTo(45 / Math.cos(deg(25)), 2)
    const foot = card.ends.find(({ end }) => end === 'foot')!
    expect(foot.cuts[0]!.bearsOn).toMatch(/^Against the valleys V1a and V1b$/)
    expect(card.birdsmouth).toBeNull()
    const text = markingCardLines(card).join('\n')
    expect(text).not.toMatch(/heel|set-out point/)
  })

  test('a rafter whose tail runs into the valley says so', () => {
    const card = cardsOf(spec, 'common').find((one) =>
      one.ends.some(({ end, cuts }) => end === 'tail' && cuts.some((cut) => cut.bearsOn)),
    )!
    const tail = card.ends.find(({ end }) => end === 'tail')!
    expect(tail.cuts[0]!.bearsOn).toBe('Against the valleys V1a and V1b')
    expect(tail.points.map(({ label }) => label)).toEqual([
      'Long point, left',
      'Short point, right',
    ])
  })

  test('a valley is measured from the corner line, and says where its heel line is and how deep', () => {
    // Source: roof.md: the heel is moved out by half the thickness at a square corner, level; along the edge
    // that is 17.5 over the cosine of the valley's pitch, atan(tan 25° / √2); the height over plate is the
    // stand of 112.51 (roof.md, known values) less what the top falls over those 17.5.
    const card = cardsOf(spec, 'valley')[0]!
    const pitch = Math.atan(Math.tan(deg(25)) / Math.SQRT2)
    const figures = card.birdsmouth!.figures
    expect(figures[0]).toMatchObject({
      label: 'Heel line',
      note: 'down the edge from the corner line',
    })
    expect(figures[0]!.valueMm).toBeCloseTo(17.5 / Math.cos(pitch), 4)
    expect(figures[1]!.valueMm).toBeCloseTo(112.51 - 17.5 * Math.tan(pitch), 1)
    expect(headPoints(spec, card.mark)[0]!.note).toBe('from the corner line')
    expect(card.setOutLength.note).toBe('the corner line to centre, nothing off')
    expect(card.ends[0]!.cuts[0]!.edgeOtherTop!.label).toBe('Across a dished top')
  })
})

test('a dished valley is marked and cut square, then dished to lines that lie in both slopes', () => {
  // Source: geometry. At one pitch both halves fall alike to the middle: half the thickness times the
  // tangent of the dish's angle; the edges stay.
  const spec = framedOnce(referenceRoof(hollow('L-equal'), { valleyTop: 'dished' }))
  const valley = spec.members.find((one) => one.role === 'valley')!
  const card = cardsOf(spec, 'valley')[0]!
  const depthMm = Math.round(17.5 * Math.tan(deg(Math.abs(valley.backing!.leftDeg))))
  expect(card.dish).toBe(
    `Mark and cut square, then dish to the lines: ${depthMm} mm deep along the middle, square to the top, 0 mm at both edges.`,
  )
  expect(card.backing[0]!.label).toBe('Dish, both edges')
  expect(card.drop).toMatchObject({ label: 'Raised' })
  expect(card.ends[0]!.cuts[0]!.edge!.label).toBe('Across the square top, before dishing')
  expect(markingCardLines(card)).toContain(card.dish)
})

test('a backed hip is not dished and a square valley has nothing to dish', () => {
  const spec = framedOnce(referenceRoof(hollow('L-equal')))
  for (const role of ['hip', 'valley'] as const)
    for (const card of cardsOf(spec, role)) expect(card.dish).toBeNull()
})

test.each(hollowReferences)(
  'every card of $title says its hands, its ends and where it is measured from',
  (reference) => {
    const spec = framedOnce(referenceRoof(reference))
    for (const line of spec.cutLines) {
      const card = markingCardOf(spec, line.mark, options)
      const pieces = spec.members.filter((one) => line.members.includes(one.mark))
      const handed = pieces.filter((one) => pieceHand(one) !== null).length
      expect(card.left + card.right, line.mark).toBe(handed)
      for (const end of card.ends)
        for (const point of end.points)
          expect(point.note, line.mark).toMatch(/(heel|corner) line|node/)
      expect(card.edges.length > 0, line.mark).toBe(
        pieces[0]!.birdsmouth === null && line.role !== 'ridge',
      )
      const text = markingCardLines(card).join('\n')
      expect(text, line.mark).not.toMatch(/NaN|undefined|Infinity|−/)
    }
  },
)

describe('timbers beside the frame', () => {
  const size = { thicknessMm: 70, depthMm: 140 }
  const board = { thicknessMm: 30, depthMm: 190 }
  const roof = makeRoof(rectangle(9000, 6000), [25, 25, 25, 'gable'], {
    sections: {
      rafter: { thicknessMm: 45, depthMm: 140 },
      hip: { thicknessMm: 35, depthMm: 190 },
      valley: { thicknessMm: 35, depthMm: 190 },
      ridge: { thicknessMm: 35, depthMm: 190 },
      underpurlin: size,
      collarTie: { thicknessMm: 35, depthMm: 90 },
      fascia: board,
      barge: board,
    },
    tail: 'square',
  })
  const spec = framedOnce(roof, { ...defaultSettings, maxRafterSpanMm: 2200 })
  const roles = ['underpurlin', 'collar-tie', 'fascia', 'barge'] as const

  test.each(roles)('a %s has a card with its edges and which way it is looked at', (role) => {
    const cards = cardsOf(spec, role)
    expect(cards.length).toBeGreaterThan(0)
    for (const card of cards) {
      expect(card.edges[0]!.valueMm).toBeGreaterThan(500)
      expect(card.handWords).toMatch(/up\.$/)
      expect(markingCardLines(card).join('\n')).not.toMatch(/NaN|undefined|heel line to centre/)
    }
  })

  test('an underpurlin lies square to its slope: its sides lean from plumb by the pitch', () => {
    for (const purlin of spec.members.filter((one) => one.role === 'underpurlin')) {
      const { left, down, along } = timberAxes(posedMember(spec, purlin))
      expect(along.z).toBeCloseTo(0, 9)
      expect(down.z).toBeCloseTo(-Math.cos(deg(25)), 6)
      expect(Math.abs(left.z)).toBeCloseTo(Math.sin(deg(25)), 6)
    }
  })

  test('its edges are read where its cuts say, in its own pose', () => {
    for (const member of spec.members.filter((one) => one.topInSlope)) {
      const posed = posedMember(spec, member)
      for (const cut of member.cuts) {
        const sides = [1, -1].map((side) =>
          cutAlongMm(posed, cut, (side * member.section.thicknessMm) / 2, 0),
        )
        const long = cut.end === 'head' ? Math.max(...sides) : Math.min(...sides)
        expect(long, member.mark).toBeCloseTo(cut.longPointFromHeelMm, 2)
      }
    }
  })

  test('a collar tie says the height of its underside over the plate and its length below', () => {
    const card = cardsOf(spec, 'collar-tie')[0]!
    const tie = spec.members.find((one) => one.mark === card.drawnMark)!
    const [top, under, height] = card.edges
    expect([top!.label, under!.label]).toEqual(['Along the top', 'Along the underside'])
    // Source: geometry; each end runs out by the depth over the tangent of the pitch.
    expect(under!.valueMm - top!.valueMm).toBeCloseTo((2 * 90) / Math.tan(deg(25)), 1)
    expect(height!.valueMm).toBeCloseTo(tie.axis.from.z - 90, 6)
    for (const { cuts } of card.ends) {
      expect(cuts[0]!.kind).toBe('splay cut')
      expect(cuts[0]!.face.fromEdgeText).toBe('25.0°')
    }
    expect(card.handWords).toBe('No left or right, bow up.')
  })
})

describe('what rounding costs, in words', () => {
  const spec = (worstMm: number, joint: [string, string] | null) =>
    specOf([common], { rounding: { worstMm, joint } })

  test('the worst joint by its marks and tenths of a millimetre', () => {
    expect(roundingWords(spec(0.82, ['CR3', 'H1']), options)).toBe(
      'Marked to the nearest mm and half degree, the worst joint is 0.8 mm out: CR3 on H1.',
    )
  })

  test('the steps are the firm’s own', () => {
    expect(roundingWords(spec(2.04, ['V1', 'R2']), { ...options, roundMm: 2, roundDeg: 1 })).toBe(
      'Marked to the nearest 2 mm and degree, the worst joint is 2.0 mm out: V1 on R2.',
    )
  })

  test('a tape in sixteenths is not promised what one in mm gives', () => {
    // Source: 25.4 / 16 = 1.5875.
    const words = roundingWords(spec(0.82, ['CR3', 'H1']), { ...options, units: 'feet-inches' })
    expect(words).toContain('A sixteenth of an inch is 1.6 mm')
  })

  test('where nothing is out it says that every joint closes', () => {
    expect(roundingWords(spec(0, null), options)).toBe(
      'Marked to the nearest mm and half degree, every joint closes.',
    )
  })
})

test('a piece with a long point at both ends says both, for they may be on different sides', () => {
  const foot = {
    ...creeperLeft.cuts[0]!,
    end: 'foot' as const,
    longSide: 'right' as const,
    longPointFromHeelMm: 2,
    shortPointFromHeelMm: 52,
  }
  const cripple = {
    ...creeperLeft,
    mark: 'CC1',
    role: 'cripple-creeper' as const,
    birdsmouth: null,
  }
  const words = (side: 'left' | 'right') =>
    markingCardOf(
      specOf([{ ...cripple, cuts: [creeperLeft.cuts[0]!, { ...foot, longSide: side }] }]),
      'CC1',
      options,
    ).handWords
  expect(words('right')).toBe(
    "Head's long point on the left, foot's on the right, looking up the rafter, bow up.",
  )
  expect(words('left')).toBe(
    'Long points of head and foot on the left looking up the rafter, bow up.',
  )
})

describe('the hand of a piece', () => {
  test('is that of its head where the head has one', () => {
    expect(pieceHand(creeperLeft)).toEqual({ side: 'left', end: 'head' })
    expect(pieceHand(creeperRight)).toEqual({ side: 'right', end: 'head' })
  })

  test('is that of its foot where the head is square, and none where both are', () => {
    // A tail cut against a valley: at the left arris 500 below the heel, at the right one 450.
    const againstValley = {
      ...tailCut,
      against: 'V1',
      longSide: 'left' as const,
      longPointFromHeelMm: -500,
      shortPointFromHeelMm: -450,
    }
    expect(pieceHand({ ...common, cuts: [headCut, againstValley] })).toEqual({
      side: 'left',
      end: 'foot',
    })
    expect(pieceHand(common)).toBeNull()
  })
})
