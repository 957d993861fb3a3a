import type { FrameSpec, LineKind, Point2, Roof } from '../roof/roof-types.ts'

export type RoofGlyphLineKind = Exclude<LineKind, 'eave' | 'verge'>

/**
 * The silhouette of a plan with its roof lines, small enough to travel with every card and booking.
 * Drawing coordinates (y down), the longer side 100 long, to one decimal.
 */
export type RoofGlyphData = {
  outline: [number, number][]
  lines: [number, number, number, number, RoofGlyphLineKind][]
}

const longSide = 100

/** A roof that is not computed yet (`spec` null) gives its silhouette alone. */
export function roofGlyphOf(
  spec: Pick<FrameSpec, 'lines'> | null,
  roof: Pick<Roof, 'outline'>,
): RoofGlyphData {
  const place = glyphPlacement(roof.outline)
  const lines = (spec?.lines ?? []).flatMap((line): RoofGlyphData['lines'] => {
    if (line.kind === 'eave' || line.kind === 'verge') return []
    const [x1, y1] = place(line.from)
    const [x2, y2] = place(line.to)
    return x1 === x2 && y1 === y2 ? [] : [[x1, y1, x2, y2, line.kind]]
  })
  return { outline: roof.outline.map(place), lines }
}

function glyphPlacement(outline: readonly Point2[]): (point: Point2) => [number, number] {
  const xs = outline.map((p) => p.x)
  const ys = outline.map((p) => p.y)
  const left = Math.min(...xs)
  const top = Math.max(...ys)
  const scale = longSide / Math.max(Math.max(...xs) - left, top - Math.min(...ys), 1)
  return (point) => [toTenth((point.x - left) * scale), toTenth((top - point.y) * scale)]
}

function toTenth(value: number): number {
  return Math.round(value * 10) / 10 + 0
}
