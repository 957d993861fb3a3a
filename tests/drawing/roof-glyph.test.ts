import { describe, expect, test } from 'vitest'
import { roofGlyphOf } from '../../shared/drawing/roof-glyph.ts'
import { framedOnce } from '../roof/support/framed.ts'
import { convexReferences, hollowReferences, referenceRoof } from '../roof/support/roofs.ts'

describe.each([...convexReferences, ...hollowReferences])('the glyph of $title', (reference) => {
  const roof = referenceRoof(reference)
  const glyph = roofGlyphOf(framedOnce(roof), roof)

  test('has the corners of the plan, its longer side 100 long, upright', () => {
    // Source: the outline of tests/fixtures/roofs.json, scaled by hand here.
    const xs = reference.outline_mm.map((p) => p[0]!)
    const ys = reference.outline_mm.map((p) => p[1]!)
    const scale =
      100 / Math.max(Math.max(...xs) - Math.min(...xs), Math.max(...ys) - Math.min(...ys))
    for (const [i, [x, y]] of glyph.outline.entries()) {
      expect(x).toBeCloseTo((xs[i]! - Math.min(...xs)) * scale, 1)
      expect(y).toBeCloseTo((Math.max(...ys) - ys[i]!) * scale, 1)
    }
  })

  test('has one line for each ridge, hip, broken hip and valley', () => {
    const kinds = reference.lines
      .map((line) => line.kind.replace(' ', '-'))
      .filter((kind) => kind !== 'verge')
      .sort()
    expect(glyph.lines.map((line) => line[4]).sort()).toEqual(kinds)
  })

  test('is small enough to travel with every card', () => {
    expect(JSON.stringify(glyph).length).toBeLessThan(900)
    expect(JSON.parse(JSON.stringify(glyph))).toEqual(glyph)
  })
})

test('a roof that is not framed yet has its silhouette alone', () => {
  const roof = referenceRoof(convexReferences[0]!)
  const glyph = roofGlyphOf(null, roof)
  expect(glyph.lines).toEqual([])
  expect(glyph.outline).toHaveLength(roof.outline.length)
})
