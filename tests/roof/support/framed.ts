import { frameRoof } from '../../../shared/roof/frame-roof.ts'
import type { FrameSpec, Roof, RoofSettings } from '../../../shared/roof/roof-types.ts'

const kept = new Map<string, FrameSpec>()

function frozen<T>(value: T): T {
  if (typeof value === 'object' && value !== null && !Object.isFrozen(value)) {
    Object.freeze(value)
    for (const inner of Object.values(value)) frozen(inner)
  }
  return value
}

/**
 * The frame of a roof, worked out once for all tests that look at it; frozen, so that none can change it
 * for the others. Not for tests of whether a roof frames alike twice.
 */
export function framedOnce(roof: Roof, settings?: RoofSettings): FrameSpec {
  const key = JSON.stringify([roof, settings ?? null])
  const spec = kept.get(key) ?? frozen(frameRoof(roof, settings))
  kept.set(key, spec)
  return spec
}
