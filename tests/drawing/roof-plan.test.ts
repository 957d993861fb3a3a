import { describe, expect, test } from 'vitest'
import {
  boxesOverlap,
  distanceToSegment,
  pointAlong,
  segmentLength,
} from '../../shared/drawing/drawing-geometry.ts'
import { overhangOutline } from '../../shared/drawing/overhang-outline.ts'
import { cornerBox } from '../../shared/drawing/plan-corners.ts'
import { planDrawing, type PlanDrawingOptions } from '../../shared/drawing/plan-drawing.ts'
import { planMemberAt } from '../../shared/drawing/plan-members.ts'
import type { FrameSpec, Point2, Roof } from '../../shared/roof/roof-types.ts'
import { framedOnce } from '../roof/support/framed.ts'
import { rectangle } from '../roof/support/plans.ts'
import { convexReferences, makeRoof, referenceRoof } from '../roof/support/roofs.ts'

// The outlines, nodes and lines of the reference roofs are from tests/fixtures/roofs.json, which was
// computed from plane intersections alone.
const framed = convexReferences.map((reference) => {
  const roof = referenceRoof(reference)
  return { reference, roof, spec: framedOnce(roof) }
})
const phonePx = 358
const deskPx = 968
const options = (changes: Partial<PlanDrawingOptions> = {}): PlanDrawingOptions => ({
  widthPx: phonePx,
  maxHeightPx: phonePx,
  mode: 'read',
  units: 'mm',
  problems: [],
  firstMarks: new Set(),
  ...changes,
})
const widths = [
  { at: 'a phone', widthPx: phonePx, maxHeightPx: 420 },
  { at: 'a desk', widthPx: deskPx, maxHeightPx: deskPx },
]
const draw = (roof: Roof, spec: FrameSpec | null, o: PlanDrawingOptions) => {
  const drawing = planDrawing(roof, spec, o)
  if (!drawing) throw new Error('nothing drawn')
  return drawing
}
const apart = (a: Point2, b: Point2) => Math.hypot(a.x - b.x, a.y - b.y)

describe.each(framed)('$reference.title', ({ reference, roof, spec }) => {
  describe.each(widths)('at the width of $at', ({ widthPx, maxHeightPx }) => {
    test.each(['read', 'edit'] as const)('no two words of the %s drawing overlap', (mode) => {
      const drawing = draw(roof, spec, options({ widthPx, maxHeightPx, mode }))
      const words = [
        ...drawing.labels,
        ...drawing.dimensions.flatMap((d) => (d.label ? [d.label] : [])),
        ...drawing.corners.map(cornerBox),
      ]
      const clashes = words.flatMap((a, i) =>
        words
          .slice(i + 1)
          .filter((b) => boxesOverlap(a, b))
          .map((b) => [a, b]),
      )
      expect(clashes).toEqual([])
    })

    test('marks never read upside down', () => {
      for (const label of draw(roof, spec, options({ widthPx, maxHeightPx })).labels) {
        expect(label.angleDeg).toBeGreaterThanOrEqual(-91)
        expect(label.angleDeg).toBeLessThanOrEqual(90)
      }
    })

    test('every plate shows its length', () => {
      const drawing = draw(roof, spec, options({ widthPx, maxHeightPx, mode: 'edit' }))
      const sides = roof.outline.map((p, i) =>
        apart(p, roof.outline[(i + 1) % roof.outline.length]!),
      )
      const shown = drawing.dimensions.map((d) => d.label?.text ?? '')
      expect(shown).toHaveLength(sides.length)
      for (const [i, side] of sides.entries()) {
        expect(shown[i]).toMatch(new RegExp(`^(Edge )?${i + 1} · ${Math.round(side)}$`))
      }
    })
  })

  test('every member is drawn once', () => {
    const drawn = draw(roof, spec, options()).members.map((member) => member.mark)
    expect([...drawn].sort()).toEqual(spec.members.map((member) => member.mark).sort())
    expect(new Set(drawn).size).toBe(drawn.length)
  })

  test('every mark is either written or counted as left out', () => {
    const drawing = draw(roof, spec, options())
    const told = [...drawing.labels.map((label) => label.mark), ...drawing.hiddenMarks]
    expect(told.sort()).toEqual(spec.members.map((member) => member.mark).sort())
  })

  test('ridges and hips are drawn from node to node of the reference', () => {
    const drawing = draw(roof, spec, options({ widthPx: deskPx, maxHeightPx: deskPx }))
    const { place } = drawing.view
    for (const line of reference.lines.filter((one) => one.kind !== 'verge')) {
      const from = place({ x: line.frm[0]!, y: line.frm[1]! })
      const to = place({ x: line.to[0]!, y: line.to[1]! })
      const found = drawing.roofLines.some(
        ({ segment }) =>
          (apart(segment.from, from) < 0.05 && apart(segment.to, to) < 0.05) ||
          (apart(segment.from, to) < 0.05 && apart(segment.to, from) < 0.05),
      )
      expect(found, `${line.kind} ${line.frm.join()} – ${line.to.join()}`).toBe(true)
    }
  })

  test('every rafter is drawn as long in plan as its numbers say', () => {
    const drawing = draw(roof, spec, options({ widthPx: deskPx, maxHeightPx: deskPx }))
    for (const member of spec.members) {
      const drawn = drawing.members.find((one) => one.mark === member.mark)!
      const alongs = (head: boolean) =>
        member.cuts.filter((cut) => (cut.end === 'head') === head).map((cut) => cut.alongMm)
      const lengthMm = Math.min(...alongs(true)) - Math.max(...alongs(false))
      const planMm = lengthMm * Math.cos((member.pitchDeg * Math.PI) / 180)
      expect(segmentLength(drawn.centre) / drawing.view.pxPerMm).toBeCloseTo(planMm, 3)
      expect(apart(drawn.heel, drawing.view.place(member.axis.from))).toBeLessThan(1e-6)
    }
  })

  test('a picked timber always shows its mark, however small the drawing', () => {
    for (const { mark } of spec.members.filter((_, i) => i % 4 === 0)) {
      const drawing = draw(roof, spec, options({ firstMarks: new Set([mark]) }))
      expect(drawing.labels.find((label) => label.mark === mark)?.text).toBe(mark)
    }
  })

  test('a finger on a timber, where it is clearest of its neighbours, picks it', () => {
    const { members } = draw(roof, spec, options({ widthPx: deskPx, maxHeightPx: deskPx }))
    for (const member of members) {
      const clearance = (point: Point2) =>
        Math.min(
          ...members
            .filter((other) => other.mark !== member.mark)
            .map((other) => distanceToSegment(point, other.centre)),
        )
      const places = Array.from({ length: 49 }, (_, i) => pointAlong(member.centre, (i + 1) / 50))
      const clearest = places.sort((a, b) => clearance(b) - clearance(a))[0]!
      const finger = { x: clearest.x + 1, y: clearest.y + 1 }
      expect(planMemberAt(members, finger, 22)?.mark).toBe(member.mark)
    }
    expect(planMemberAt(members, { x: 2, y: 2 }, 22)).toBeNull()
  })
})

describe('9.0 × 6.0 m, four hips', () => {
  const roof = makeRoof(rectangle(9000, 6000), [25, 25, 25, 25])
  const spec = framedOnce(roof)

  test('at a desk every mark is written in full', () => {
    const drawing = draw(roof, spec, options({ widthPx: deskPx, maxHeightPx: deskPx }))
    expect(drawing.hiddenMarks).toEqual([])
    for (const label of drawing.labels) expect(label.text).toBe(label.mark)
  })

  test('the tails stand 450 outside the plates all round, and commons end on that line', () => {
    // Source: 450 overhang on each side of 9000 × 6000 makes 9900 × 6900; arithmetic.
    const tails = overhangOutline(roof)
    expect(Math.max(...tails.map((p) => p.x)) - Math.min(...tails.map((p) => p.x))).toBeCloseTo(
      9900,
    )
    expect(Math.max(...tails.map((p) => p.y)) - Math.min(...tails.map((p) => p.y))).toBeCloseTo(
      6900,
    )
    const drawing = draw(roof, spec, options())
    const lineYs = drawing.tails.map((p) => p.y)
    for (const member of drawing.members.filter((one) => one.role === 'common')) {
      const nearest = Math.min(...lineYs.map((y) => Math.abs(y - member.centre.from.y)))
      expect(nearest).toBeLessThan(0.01)
    }
  })

  test('north of the plan is the top of the drawing', () => {
    const { view } = draw(roof, spec, options())
    expect(view.place({ x: 0, y: 6000 }).y).toBeLessThan(view.place({ x: 0, y: 0 }).y)
    expect(view.place({ x: 9000, y: 0 }).x).toBeGreaterThan(view.place({ x: 0, y: 0 }).x)
  })
})

describe('a roof that is still being typed', () => {
  const roof = makeRoof(rectangle(9000, 6000), [25, 25, 25, 25])

  test('problems are marked on their plate or corner, and others are listed', () => {
    const drawing = draw(roof, null, {
      ...options(),
      problems: [
        { path: 'edges.1.pitchDeg', message: 'Edge 2' },
        { path: 'outline.3', message: 'Corner 4' },
        { path: 'sections.rafter.depthMm', message: 'Rafter depth' },
      ],
    })
    const { place } = drawing.view
    expect(apart(drawing.problems[0]!.at, place({ x: 9000, y: 3000 }))).toBeLessThan(1e-6)
    expect(apart(drawing.problems[1]!.at, place({ x: 0, y: 6000 }))).toBeLessThan(1e-6)
    expect(drawing.problemsElsewhere.map((p) => p.message)).toEqual(['Rafter depth'])
  })

  test('a corner without a number is left out and the rest keep their own numbers', () => {
    const outline = [...roof.outline]
    outline[1] = { x: Number.NaN, y: 0 }
    const drawing = draw({ ...roof, outline }, null, options({ mode: 'edit' }))
    expect(drawing.corners.map((corner) => corner.corner)).toEqual([0, 2, 3])
    expect(planDrawing({ ...roof, outline: [] }, null, options())).toBeNull()
  })
})
