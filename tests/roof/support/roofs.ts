import reference from '../../fixtures/roofs.json' with { type: 'json' }
import type { Point2, Roof, RoofEdge } from '../../../shared/roof/roof-types.ts'

/** A roof as a person would type it; every test starts from these sizes and changes what it means to. */
export function makeRoof(
  outline: readonly (readonly [number, number])[],
  pitches: readonly (number | 'gable')[],
  changes: Partial<Omit<Roof, 'outline' | 'edges'>> & { overhangMm?: number } = {},
): Roof {
  const { overhangMm = 450, ...rest } = changes
  const edges = pitches.map((pitch): RoofEdge =>
    pitch === 'gable'
      ? { finish: 'gable', overhangMm }
      : { finish: 'eave', pitchDeg: pitch, overhangMm },
  )
  return {
    outline: outline.map(([x, y]): Point2 => ({ x, y })),
    edges,
    plateWidthMm: 90,
    maxSpacingMm: 600,
    spacing: 'even',
    sections: {
      rafter: { thicknessMm: 45, depthMm: 140 },
      hip: { thicknessMm: 35, depthMm: 190 },
      valley: { thicknessMm: 35, depthMm: 190 },
      ridge: { thicknessMm: 35, depthMm: 190 },
    },
    tail: 'plumb',
    tailAllowanceMm: 0,
    hipTop: 'backed',
    valleyTop: 'square',
    ...rest,
  }
}

export type ReferenceRoof = (typeof reference.roofs)[number]

const turn = (a: number[], b: number[], c: number[]): number =>
  (b[0]! - a[0]!) * (c[1]! - b[1]!) - (b[1]! - a[1]!) * (c[0]! - b[0]!)

export function isConvex(outline: number[][]): boolean {
  const n = outline.length
  return outline.every((a, i) => turn(a, outline[(i + 1) % n]!, outline[(i + 2) % n]!) >= 0)
}

const pitchesOf = (roof: ReferenceRoof): (number | 'gable')[] =>
  roof.edges.map((edge) => (typeof edge === 'string' ? 'gable' : edge.pitch_deg))

/** tests/fixtures/roofs.json as roofs to frame. */
export function referenceRoof(
  roof: ReferenceRoof,
  changes: Parameters<typeof makeRoof>[2] = {},
): Roof {
  const outline = roof.outline_mm.map(([x, y]) => [x!, y!] as const)
  return makeRoof(outline, pitchesOf(roof), changes)
}

export const allReferences = reference.roofs
export const convexReferences = reference.roofs.filter((roof) => isConvex(roof.outline_mm))
export const hollowReferences = reference.roofs.filter((roof) => !isConvex(roof.outline_mm))

/** A regular plan about (0, 0); `acrossMm` is measured flat to flat. */
export function regularOutline(sides: number, acrossMm: number): [number, number][] {
  const radius = acrossMm / 2 / Math.cos(Math.PI / sides)
  return Array.from({ length: sides }, (_, i) => {
    const turnRad = (2 * Math.PI * (i - 0.5)) / sides - Math.PI / 2
    return [radius * Math.cos(turnRad), radius * Math.sin(turnRad)]
  })
}
