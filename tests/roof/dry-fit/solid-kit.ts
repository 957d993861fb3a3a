import Module, { type CrossSection, type Manifold, type ManifoldToplevel } from 'manifold-3d'

import type { Vec } from './vec.ts'

/** The general solid-geometry library (manifold-3d) that judges the frame; loaded once. */
export type SolidKit = ManifoldToplevel
export type Solid = Manifold
export type Flat = CrossSection

let loading: Promise<SolidKit> | null = null

export function loadSolidKit(): Promise<SolidKit> {
  loading ??= Module().then((kit) => {
    kit.setup()
    return kit
  })
  return loading
}

/** Vertices in double precision (a mesh export would round them to single). */
export function solidVertices(solid: Solid): Vec[] {
  const vertices: Vec[] = []
  solid
    .warp((v) => {
      vertices.push([v[0], v[1], v[2]])
    })
    .numVert()
  return vertices
}

export type Box = { min: Vec; max: Vec }

export function boxOf(points: readonly Vec[], growMm: number): Box {
  const low = (i: 0 | 1 | 2): number => Math.min(...points.map((p) => p[i])) - growMm
  const high = (i: 0 | 1 | 2): number => Math.max(...points.map((p) => p[i])) + growMm
  return { min: [low(0), low(1), low(2)], max: [high(0), high(1), high(2)] }
}

export function boxesMeet(a: Box, b: Box): boolean {
  return ([0, 1, 2] as const).every((i) => a.min[i] <= b.max[i] && b.min[i] <= a.max[i])
}
