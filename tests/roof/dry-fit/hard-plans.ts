import type { Roof } from '../../../shared/roof/roof-types.ts'
import { makeRoof } from '../support/roofs.ts'
import { numbersFrom } from './random-roofs.ts'

/**
 * Eight to ten sides, each with a pitch of its own: slopes meet in a heap of short broken hips near the
 * middle, where no order of joints may close every head. No house is like it; a caution must see it.
 */
export function hardPlan(seed: number): Roof {
  const next = numbersFrom(seed + 90_000)
  const sides = 8 + Math.floor(next() * 3)
  const outline = Array.from({ length: sides }, (_, i): [number, number] => {
    const turn = ((i + 0.5 * (next() - 0.5)) / sides) * 2 * Math.PI
    return [6000 * Math.cos(turn), 4000 * Math.sin(turn)]
  })
  const about = 25 + next() * 12
  const pitches = outline.map(() => about + 6 * (next() - 0.5))
  return makeRoof(outline, pitches)
}
