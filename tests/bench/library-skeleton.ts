import type { Point2 } from '../../shared/roof/roof-types.ts'

/**
 * The straight skeleton of an outline by the npm package straight-skeleton 3.0.0 (CGAL in WebAssembly):
 * lines in plan for one pitch all round, no gables, no members. Loading is not timed.
 */
export async function loadLibrary(): Promise<(outline: readonly Point2[]) => () => unknown> {
  // The package looks for a browser's global names.
  const names = globalThis as Record<string, unknown>
  names['self'] = globalThis
  names['window'] = globalThis
  const { SkeletonBuilder } = await import('straight-skeleton')
  await SkeletonBuilder.init()
  return (outline) => {
    const ring = [...outline, ...outline.slice(0, 1)].map(({ x, y }) => [x, y])
    return () => {
      if (SkeletonBuilder.buildFromPolygon([ring]) === null) throw new Error('no skeleton')
    }
  }
}
