import { describe, expect, test } from 'vitest'
import { boxesOverlap, segmentCrossesBox } from '../../shared/drawing/drawing-geometry.ts'
import { overhangOutline } from '../../shared/drawing/overhang-outline.ts'
import { cornerBox } from '../../shared/drawing/plan-corners.ts'
import { planDrawing, type PlanDrawingOptions } from '../../shared/drawing/plan-drawing.ts'
import type { FrameSpec, Roof } from '../../shared/roof/roof-types.ts'
import { framedOnce } from '../roof/support/framed.ts'
import { hollowReferences, makeRoof, referenceRoof } from '../roof/support/roofs.ts'
import { laidOutSpec } from './support/laid-out-spec.ts'

const phonePx = 358
const deskPx = 1100
const sizes = [
  { at: 'a phone', widthPx: phonePx, maxHeightPx: 420 },
  { at: 'a desk', widthPx: deskPx, maxHeightPx: 640 },
  { at: 'a phone, drawn four times as large', widthPx: 4 * phonePx, maxHeightPx: 4 * 420 },
]

const draw = (roof: Roof, spec: FrameSpec | null, changes: Partial<PlanDrawingOptions>) => {
  const drawing = planDrawing(roof, spec, {
    widthPx: deskPx,
    maxHeightPx: 640,
    mode: 'read',
    units: 'mm',
    problems: [],
    firstMarks: new Set(),
    ...changes,
  })
  if (!drawing) throw new Error('nothing drawn')
  return drawing
}

type Drawing = ReturnType<typeof draw>

/** Every word that runs into another, off the paper, or through which a fine line runs. */
function clashes({ labels, dimensions, corners, view }: Drawing): string[] {
  const words = [
    ...labels,
    ...dimensions.flatMap((d) => (d.label ? [d.label] : [])),
    ...corners.map((corner) => ({
      ...cornerBox(corner),
      text: `(${corner.corner + 1})`,
      leader: corner.leader,
    })),
  ]
  return words.flatMap((a, i) => {
    const others = words.filter((_, k) => k !== i)
    const { x, y } = a.centre
    const isOff = x < 0 || y < 0 || x > view.widthPx || y > view.heightPx
    return [
      ...(isOff ? [`${a.text} off the paper`] : []),
      ...others.slice(i).flatMap((b) => (boxesOverlap(a, b) ? [`${a.text} / ${b.text}`] : [])),
      ...others.flatMap((b) =>
        a.leader && segmentCrossesBox(a.leader, b) ? [`${a.text}’s line / ${b.text}`] : [],
      ),
    ]
  })
}

/** Numbers that are the same each run; any generator of evenly spread numbers would do. */
function dice(seed: number): () => number {
  let state = seed
  return () => {
    state = (state * 1664525 + 1013904223) % 4294967296
    return state / 4294967296
  }
}

/** A house with wings of any depth along one side, turned in plan: two corners, then four a wing. */
function wingedOutline(wings: number, seed: number): [number, number][] {
  const next = dice(seed)
  const turn = next() * Math.PI
  const corners: [number, number][] = []
  let x = 0
  for (let i = 0; i < wings; i++) {
    const gap = i === 0 ? 0 : 900 + next() * 3000
    const width = 2400 + next() * 4000
    const depth = 5500 + next() * 4000
    if (i > 0) corners.push([x, 5000], [x + gap, 5000])
    x += gap
    corners.push([x, depth], [x + width, depth])
    x += width
  }
  const outline: [number, number][] = [[x, 0], [0, 0], ...corners]
  const counterClockwise = [...outline].reverse()
  return counterClockwise.map(([px, py]) => [
    px * Math.cos(turn) - py * Math.sin(turn),
    px * Math.sin(turn) + py * Math.cos(turn),
  ])
}

const cross = makeRoof(
  [
    [3000, 0],
    [8000, 0],
    [8000, 4000],
    [12000, 4000],
    [12000, 9000],
    [8000, 9000],
    [8000, 12000],
    [3000, 12000],
    [3000, 9000],
    [0, 9000],
    [0, 4000],
    [3000, 4000],
  ],
  Array.from({ length: 12 }, () => 25),
)
const frames = [
  ...hollowReferences.map((reference) => {
    const roof = referenceRoof(reference)
    return { title: reference.title, roof, spec: framedOnce(roof) }
  }),
  { title: 'A cross', roof: cross, spec: framedOnce(cross) },
]

describe.each(frames)('$title', ({ roof, spec }) => {
  test.each(sizes)('no two words of the plan run into one another on $at', (size) => {
    expect(clashes(draw(roof, spec, size))).toEqual([])
    expect(clashes(draw(roof, spec, { ...size, mode: 'edit' }))).toEqual([])
  })

  test.each(sizes)('every side shows its length on $at', (size) => {
    const { dimensions } = draw(roof, spec, { ...size, mode: 'edit' })
    const shown = dimensions.map(({ label }) => label?.text.split(' · ').at(-1))
    const sides = roof.outline.map((p, i) => {
      const q = roof.outline[(i + 1) % roof.outline.length]!
      return `${Math.round(Math.hypot(q.x - p.x, q.y - p.y))}`
    })
    expect(shown).toEqual(sides)
  })

  test('drawn twice as large as a desk’s, every member has its own mark', () => {
    const drawing = draw(roof, spec, { widthPx: 2 * deskPx, maxHeightPx: 2 * 640 })
    expect(drawing.hiddenMarks).toEqual([])
    for (const label of drawing.labels) expect(label.text).toBe(label.mark)
  })

  test('the line of the tails stands its overhang outside every side, inward corners too', () => {
    // Source: 450 all round; a parallel 450 outside each side, arithmetic.
    const tails = overhangOutline(roof)
    expect(tails).toHaveLength(roof.outline.length)
    for (const [i, p] of roof.outline.entries()) {
      const q = roof.outline[(i + 1) % roof.outline.length]!
      const length = Math.hypot(q.x - p.x, q.y - p.y)
      for (const tail of [tails[i]!, tails[(i + 1) % tails.length]!]) {
        const out = ((tail.x - p.x) * (q.y - p.y) - (tail.y - p.y) * (q.x - p.x)) / length
        expect(out).toBeCloseTo(450, 6)
      }
    }
  })
})

describe.each(hollowReferences)('timbers laid on the lines of $title', (reference) => {
  test.each(sizes)('no two marks run into one another on $at', (size) => {
    const drawing = draw(referenceRoof(reference), laidOutSpec(reference, 450), size)
    expect(clashes(drawing)).toEqual([])
  })
})

describe('outlines of up to 64 corners, turned any way', () => {
  const outlines = Array.from({ length: 16 }, (_, i) => wingedOutline(i + 1, 41 + i))

  test.each(outlines.map((outline) => ({ corners: outline.length, outline })))(
    'no two words run into one another round $corners corners',
    ({ outline }) => {
      const roof = makeRoof(
        outline,
        outline.map(() => 25),
      )
      for (const size of sizes)
        expect(clashes(draw(roof, null, { ...size, mode: 'edit' }))).toEqual([])
    },
  )

  test('the largest drawing of the largest outline shows the length of every side', () => {
    const outline = outlines.at(-1)!
    expect(outline.length).toBe(64)
    const roof = makeRoof(
      outline,
      outline.map(() => 25),
    )
    const { dimensions } = draw(roof, null, { widthPx: 12 * phonePx, maxHeightPx: 12 * 420 })
    expect(dimensions.filter(({ label }) => label === null)).toEqual([])
  })
})

test('layers put away are not drawn, but for a picked timber', () => {
  const [reference] = hollowReferences
  const roof = referenceRoof(reference!)
  const spec = laidOutSpec(reference!)
  const tie = { ...spec.members[0]!, mark: 'CT1', role: 'collar-tie' as const }
  const withTie = { ...spec, members: [...spec.members, tie] }
  const marks = (changes: Partial<PlanDrawingOptions>) =>
    draw(roof, withTie, changes).members.map((member) => member.mark)
  const hiddenLayers = new Set(['collar-ties'] as const)
  expect(marks({})).toContain('CT1')
  expect(marks({ hiddenLayers })).not.toContain('CT1')
  expect(marks({ hiddenLayers, firstMarks: new Set(['CT1']) })).toContain('CT1')
})
