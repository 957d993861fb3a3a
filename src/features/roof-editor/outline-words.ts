import { edgeLengthMm, insideAngleDeg } from '../../../shared/outline/outline-geometry.ts'
import type { SnapReason } from '../../../shared/outline/snap-corner.ts'
import type { Point2, Roof } from '../../../shared/roof/roof-types.ts'
import { formatLength, formatMm, type LengthUnits } from '../../../shared/units/format-length.ts'

/** A corner as it stands: 'Corner 3 at 9000, 4000: edge 2 is 4000, edge 3 is 5000, 90°'. */
export function cornerWords(outline: readonly Point2[], corner: number, units: LengthUnits) {
  const count = outline.length
  const before = (corner + count - 1) % count
  const at = outline[corner]
  const place = at ? `${formatMm(at.x)}, ${formatMm(at.y)}` : ''
  const sides = [before, corner].map(
    (edge) => `edge ${edge + 1} is ${formatLength(edgeLengthMm(outline, edge), units)}`,
  )
  return `Corner ${corner + 1} at ${place}: ${sides.join(', ')}, ${angleWords(outline, corner)}`
}

/** The angle inside the building, to a tenth of a degree. */
export function angleWords(outline: readonly Point2[], corner: number): string {
  return `${Math.round(insideAngleDeg(outline, corner) * 10) / 10}°`
}

export function snapWords(why: SnapReason): string {
  if (why.kind === 'square') return `square to edge ${why.edge + 1}`
  if (why.kind === 'straight') return `straight on from edge ${why.edge + 1}`
  return `in line with corner ${why.corner + 1}`
}

/** 'Edge 2, eave at 25°, 4000 long' for a screen reader. */
export function edgeWords(roof: Roof, edge: number, units: LengthUnits): string {
  const own = roof.edges[edge]
  const finish =
    own?.finish === 'gable'
      ? 'gable'
      : Number.isFinite(own?.pitchDeg)
        ? `eave at ${own?.pitchDeg}°`
        : 'eave, no pitch yet'
  return `Edge ${edge + 1}, ${finish}, ${formatLength(edgeLengthMm(roof.outline, edge), units)} long`
}
