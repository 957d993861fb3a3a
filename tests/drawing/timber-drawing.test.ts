import { describe, expect, test } from 'vitest'
import { bevelDialsOf } from '../../shared/drawing/bevel-dials.ts'
import { textWidthPx } from '../../shared/drawing/text-size.ts'
import { timberDrawing } from '../../shared/drawing/timber-drawing.ts'
import { birdsmouthPoints } from '../../shared/drawing/timber-outline.ts'
import { handWords, measuringPoints } from '../../shared/drawing/timber-points.ts'
import { timberTopEnd } from '../../shared/drawing/timber-shape.ts'
import { timberTextPx } from '../../shared/drawing/timber-texts.ts'
import { posedMember } from '../../shared/drawing/timber-pose.ts'
import { defaultSettings } from '../../shared/roof/roof-settings.ts'
import type { Cut, FrameSpec, Member } from '../../shared/roof/roof-types.ts'
import { framedOnce } from '../roof/support/framed.ts'
import { convexReferences, hollowReferences, referenceRoof } from '../roof/support/roofs.ts'
import { sampleOf } from '../roof/support/sample.ts'

const phonePx = 358
const sections = {
  rafter: { thicknessMm: 45, depthMm: 140 },
  hip: { thicknessMm: 35, depthMm: 190 },
  valley: { thicknessMm: 35, depthMm: 190 },
  ridge: { thicknessMm: 35, depthMm: 190 },
  underpurlin: { thicknessMm: 70, depthMm: 140 },
  collarTie: { thicknessMm: 35, depthMm: 90 },
  fascia: { thicknessMm: 30, depthMm: 190 },
  barge: { thicknessMm: 30, depthMm: 190 },
}
const ways = [
  { hipTop: 'backed', tail: 'plumb', valleyTop: 'square' },
  { hipTop: 'lowered', tail: 'square', valleyTop: 'dished', sections },
  { hipTop: 'backed', tail: 'square', valleyTop: 'square' },
] as const
const closeSpans = { ...defaultSettings, maxRafterSpanMm: 2200 }
/** One of each cut line and hand, for pieces alike within a tenth of a millimetre draw alike; `PROOF=1` draws all. */
const drawnMembers = (spec: FrameSpec): Member[] =>
  spec.members.filter(({ mark, hand }, i) => {
    const line = spec.cutLines.find(({ members }) => members.includes(mark))
    const before = spec.members.slice(0, i)
    const isFirst = !before.some((m) => m.hand === hand && line?.members.includes(m.mark))
    return isFirst || sampleOf(0, 1) === 1
  })
const cases = [...convexReferences, ...hollowReferences].flatMap((reference) =>
  ways.slice(0, hollowReferences.includes(reference) ? 2 : 3).map((way) => {
    const spec = framedOnce(referenceRoof(reference, way), closeSpans)
    return {
      title: `${reference.title}, hips ${way.hipTop}, valleys ${way.valleyTop}, tails ${way.tail}`,
      members: drawnMembers(spec).map((member) => posedMember(spec, member)),
    }
  }),
)

/** What the tape reads on one arris, from the published numbers of the cuts alone. */
function publishedReading(member: Member, end: 'head' | 'foot', side: 'left' | 'right'): number {
  const cuts = member.cuts.filter((cut) => (cut.end === 'head') === (end === 'head'))
  const readings = cuts.map((cut: Cut) =>
    cut.longSide === side ? cut.longPointFromHeelMm : cut.shortPointFromHeelMm,
  )
  return end === 'head' ? Math.min(...readings) : Math.max(...readings)
}

describe.each(cases)('$title', ({ members }) => {
  test('every drawn arris ends where the long and short points say', () => {
    for (const member of members) {
      for (const end of ['head', 'foot'] as const) {
        const corners = timberTopEnd(member, end)
        const of = `${member.mark} ${end}`
        expect(corners[0]!.alongMm, of).toBeCloseTo(publishedReading(member, end, 'left'), 2)
        expect(corners.at(-1)!.alongMm, of).toBeCloseTo(publishedReading(member, end, 'right'), 2)
      }
    }
  })

  test('the drawn long point lies where longPointFromHeelMm says', () => {
    for (const member of members) {
      const heads = member.cuts.filter((cut) => cut.end === 'head')
      if (heads.length !== 1) continue
      const { scale, points } = timberDrawing(member, { widthPx: phonePx, units: 'mm' })
      const expected = scale.xPx(heads[0]!.longPointFromHeelMm)
      const farthest = Math.max(...points.filter((p) => p.isLong).map((p) => p.at.x))
      expect(Math.abs(farthest - expected), member.mark).toBeLessThan(0.05)
    }
  })

  test('the long point is drawn on the side of the hand', () => {
    for (const member of members) {
      const long = measuringPoints(member, 'head')[0]!
      const across = long.places.reduce((sum, place) => sum + place.acrossMm, 0)
      const side = Math.abs(across) < 0.01 ? null : across > 0 ? 'left' : 'right'
      expect(side, member.mark).toBe(member.hand)
      if (member.hand) expect(handWords(member)).toBe(`Long point on the ${member.hand}, bow up`)
    }
  })

  test('the birdsmouth is drawn from its numbers: the seat and the heel run out at the underside', () => {
    for (const member of members) {
      const mouth = birdsmouthPoints(member)
      expect(mouth === null).toBe(member.birdsmouth === null)
      if (!mouth) continue
      expect(mouth.heelFoot.downMm).toBeCloseTo(member.section.depthMm, 3)
      expect(mouth.seatEnd.downMm).toBeCloseTo(member.section.depthMm, 3)
    }
  })

  test('what is drawn unbroken is drawn to one scale', () => {
    for (const member of members) {
      const { scale } = timberDrawing(member, { widthPx: phonePx, units: 'mm' })
      for (const zone of scale.zones) {
        const px = scale.xPx(zone.toMm) - scale.xPx(zone.fromMm)
        expect(px / (zone.toMm - zone.fromMm)).toBeCloseTo(scale.pxPerMm, 6)
      }
    }
  })

  test('on a phone nothing runs off the paper and no two words overlap', () => {
    for (const member of members) {
      const drawing = timberDrawing(member, { widthPx: phonePx, units: 'mm' })
      const word = (text: string, fromX: number, baselineY: number) => ({
        text: `${member.mark}: ${text}`,
        fromX,
        toX: fromX + textWidthPx(text, timberTextPx),
        fromY: baselineY - timberTextPx * 0.8,
        toY: baselineY + timberTextPx * 0.2,
      })
      const words = [
        ...drawing.dimensions.map((d) =>
          word(d.text, d.textX - textWidthPx(d.text, timberTextPx) / 2, d.lineY - 4),
        ),
        ...drawing.callouts.map((c) => ({
          ...word(c.text, c.x - c.widthPx / 2, c.baselineY),
          toX: c.x + c.widthPx / 2,
        })),
        ...drawing.texts.map((t) => word(t.text, t.x, t.baselineY)),
      ]
      for (const one of words) {
        expect(one.fromX, one.text).toBeGreaterThanOrEqual(0)
        expect(one.toX, one.text).toBeLessThanOrEqual(phonePx)
      }
      const clashes = words.flatMap((a, i) =>
        words
          .slice(i + 1)
          .filter((b) => a.fromX < b.toX && b.fromX < a.toX && a.fromY < b.toY && b.fromY < a.toY)
          .map((b) => `${a.text} / ${b.text}`),
      )
      expect(clashes).toEqual([])
      for (const piece of [...drawing.topPieces, ...drawing.sidePieces])
        for (const p of piece) {
          expect(p.x).toBeGreaterThanOrEqual(0)
          expect(p.x).toBeLessThanOrEqual(phonePx)
        }
    }
  })

  test('every bevel of the spec is on a dial, once, with a letter of its own', () => {
    for (const member of members) {
      const dials = bevelDialsOf(member)
      expect(new Set(dials.map((dial) => dial.letter)).size).toBe(dials.length)
      const isOn = (where: string, fromEdgeDeg: number) =>
        dials.filter(
          (dial) => dial.where === where && Math.abs(dial.angle.fromEdgeDeg - fromEdgeDeg) < 0.06,
        ).length
      for (const cut of member.cuts) {
        // One setting of the bevel, turned over, marks both ends of a collar tie.
        const { fromEdgeDeg } = cut.face
        const isTurned = member.role === 'collar-tie' && fromEdgeDeg > 90
        expect(isOn('side', isTurned ? 180 - fromEdgeDeg : fromEdgeDeg), member.mark).toBe(1)
        if (cut.longSide !== 'none') expect(isOn('top', cut.edge.fromEdgeDeg)).toBeGreaterThan(0)
      }
      for (const dial of dials)
        expect(dial.angle.fromEdgeDeg + dial.angle.fromSquareDeg).toBeCloseTo(90, 6)
      if (member.birdsmouth) expect(isOn('side', member.birdsmouth.seatFromEdgeDeg)).toBe(1)
      expect(dials.some((dial) => dial.where === 'end')).toBe(member.backing !== null)
    }
  })
})
