import { frameRoof } from '../../../shared/roof/frame-roof.ts'
import { RoofRefusedError } from '../../../shared/roof/roof-problems.ts'
import type { FrameSpec, Roof } from '../../../shared/roof/roof-types.ts'
import { makeRoof } from '../support/roofs.ts'
import {
  between,
  bodyOf,
  isHouse,
  notchMm,
  oneOf,
  sidesOf,
  type Corner,
  type Next,
  type Side,
} from './house-plans.ts'
import { numbersFrom } from './random-roofs.ts'

type Pitch = number | 'gable'

/** One pitch, one for each way the eaves face, or one for each wing; some wing ends gables. */
function pitchesOf(next: Next, sides: Side[], gables: boolean): Pitch[] {
  const one = between(next, 16, 40)
  const kind = oneOf(next, ['one', 'one', 'one', 'facing', 'wing'] as const)
  const byKey = new Map<string, number>()
  return sides.map((side, i) => {
    if (side.isEnd && gables && next() < 0.4) return 'gable'
    if (kind === 'one') return one
    const after = sides[(i + 1) % sides.length]!
    const facing = Math.round(Math.atan2(after.y - side.y, after.x - side.x) / (Math.PI / 2))
    const key = kind === 'facing' ? `${facing}` : `${side.wing}`
    const pitch = byKey.get(key) ?? Math.max(14, one - 5 + between(next, 0, 10))
    byKey.set(key, pitch)
    return pitch
  })
}

/** Eaves across a notch do not run into each other: nobody would type that overhang. */
const waysOf = (next: Next, outline: readonly Corner[]): Parameters<typeof makeRoof>[2] => ({
  hipTop: oneOf(next, ['backed', 'lowered']),
  valleyTop: oneOf(next, ['square', 'dished']),
  tail: oneOf(next, ['plumb', 'plumb', 'square']),
  spacing: oneOf(next, ['even', 'even', 'full']),
  maxSpacingMm: oneOf(next, [600, 600, 900]),
  overhangMm: Math.min(oneOf(next, [300, 450, 600]), notchMm(outline) > 1400 ? 600 : 300),
})

function rectilinear(next: Next): Roof {
  const sides = sidesOf(bodyOf(next))
  const pitches = pitchesOf(next, sides, next() < 0.6)
  const outline = sides.map(({ x, y }): [number, number] => [x, y])
  return makeRoof(outline, pitches, waysOf(next, outline))
}

function skewed(next: Next): Roof {
  const sides = sidesOf(bodyOf(next))
  const outline = movedOutline(next, sides)
  if (!isHouse(outline)) return skewed(next)
  return makeRoof(outline, pitchesOf(next, sides, false), waysOf(next, outline))
}

/** Every corner moved, or each wing's end pushed aside, or one corner: odd angles, splayed ends. */
function movedOutline(next: Next, sides: readonly Side[]): Corner[] {
  const moves = oneOf(next, ['corners', 'ends', 'one'] as const)
  const moved = sides.map(({ x, y, isEnd }, i): Corner => {
    const afterEnd = sides.at(i - 1)!.isEnd
    const chosen =
      moves === 'corners' || (moves === 'ends' ? isEnd || afterEnd : i % sides.length === 2)
    const by = moves === 'corners' ? 250 : 900
    const [dx, dy] = [(2 * next() - 1) * by, (2 * next() - 1) * by]
    return chosen ? [x + dx, y + dy] : [x, y]
  })
  const turn = next() < 0.5 ? 0 : next() * 2 * Math.PI
  const [c, s] = [Math.cos(turn), Math.sin(turn)]
  return moved.map(([x, y]): Corner => [x * c - y * s, x * s + y * c])
}

export type House = { roof: Roof; spec: FrameSpec; refused: string[] }

/** More than this in a row from one stream is a fault of the program, not of the plan. */
const MOST_REFUSALS = 12

/**
 * A house from a seed. A plan that is refused with a reason is drawn again from the same stream; the
 * reasons come with the house, and the test counts them.
 */
function drawnHouse(seed: number, draw: (next: Next) => Roof): House {
  const next = numbersFrom(seed)
  const refused: string[] = []
  while (refused.length <= MOST_REFUSALS) {
    const roof = draw(next)
    try {
      return { roof, spec: frameRoof(roof), refused }
    } catch (error) {
      if (!(error instanceof RoofRefusedError)) throw error
      refused.push(error.problems.map((p) => `${p.path}: ${p.message}`).join('; '))
    }
  }
  throw new Error(`seed ${seed}: every plan is refused: ${refused.join(' | ')}`)
}

/** L, T, U, Z and cross plans, jogs: all corners square. */
export const rectilinearHouse = (seed: number): House => drawnHouse(seed + 20_000, rectilinear)

/** The same kinds with corners moved and wings at odd angles. */
export const skewedHouse = (seed: number): House => drawnHouse(seed + 40_000, skewed)

/** The plans alone, drawn once each. */
export const rectilinearPlan = (seed: number): Roof => rectilinear(numbersFrom(seed + 20_000))
export const skewedPlan = (seed: number): Roof => skewed(numbersFrom(seed + 40_000))
