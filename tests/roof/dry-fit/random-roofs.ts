import type { Roof } from '../../../shared/roof/roof-types.ts'
import { makeRoof } from '../support/roofs.ts'

/** A repeatable stream of numbers in [0, 1): the same seed always builds the same roof. */
export function numbersFrom(seed: number): () => number {
  let state = (seed * 2654435761 + 12345) >>> 0
  return () => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0
    return state / 2 ** 32
  }
}

/** Corners on an ellipse at uneven angles are always convex; sides too short are left out. */
function randomOutline(next: () => number): [number, number][] {
  const corners = 3 + Math.floor(next() * 5)
  const [wide, deep] = [3500 + next() * 3000, 3000 + next() * 2000]
  const turn = next() * 2 * Math.PI
  const angles = Array.from(
    { length: corners },
    (_, i) => turn + ((i + 0.6 * (next() - 0.5)) / corners) * 2 * Math.PI,
  )
  return angles.map((a) => [wide * Math.cos(a), deep * Math.sin(a)])
}

/** Any convex plan with eaves all round; every third one with a pitch of its own on each side. */
export function randomRoof(seed: number): Roof {
  const next = numbersFrom(seed)
  const outline = randomOutline(next)
  const one = 18 + Math.round(next() * 27)
  const pitches = outline.map(() => (seed % 3 === 0 ? one - 4 + Math.round(next() * 8) : one))
  return makeRoof(outline, pitches, { hipTop: seed % 2 === 0 ? 'backed' : 'lowered' })
}

/**
 * A straight building with a gable left and an end of one to three sides right: hip, skew, splayed
 * or octagonal by chance, each end side with a pitch of its own when the seed is odd.
 */
export function randomBuilding(seed: number): Roof {
  const next = numbersFrom(seed + 5000)
  const wide = 4200 + Math.round(next() * 3000)
  const long = 6000 + Math.round(next() * 3000)
  const sides = 1 + Math.floor(next() * 3)
  const end: [number, number][] = []
  for (let i = 0; i <= sides; i += 1) {
    const across = i === 0 || i === sides ? 0 : 0.2 * (next() - 0.5)
    const y = wide * (i / sides + across / sides)
    const bulge = Math.sin((Math.PI * y) / wide) * wide * 0.35
    end.push([long + bulge + (next() - 0.5) * 0.1 * wide, y])
  }
  const side = 18 + Math.round(next() * 22)
  const ends = Array.from({ length: sides }, () =>
    seed % 2 === 1 ? side - 3 + Math.round(next() * 8) : side,
  )
  const outline: [number, number][] = [[0, 0], ...end, [0, wide]]
  return makeRoof(outline, [side, ...ends, side, 'gable'], {
    hipTop: seed % 4 < 2 ? 'backed' : 'lowered',
    tail: seed % 3 === 0 ? 'square' : 'plumb',
  })
}
