import type { Point2, Roof } from '../../../shared/roof/roof-types.ts'
import { makeRoof } from '../support/roofs.ts'

type Plan = [number, number][]

/** A repeatable stream of numbers in [0, 1) (the mulberry32 generator). */
export function numbersFrom(seed: number): () => number {
  let state = Math.imul(seed, 0x9e3779b9) >>> 0
  return () => {
    state = (state + 0x6d2b79f5) >>> 0
    let t = Math.imul(state ^ (state >>> 15), state | 1)
    t ^= t + Math.imul(t ^ (t >>> 7), t | 61)
    return ((t ^ (t >>> 14)) >>> 0) / 2 ** 32
  }
}

const side = (a: number[], b: number[], c: number[]): number =>
  (b[0]! - a[0]!) * (c[1]! - a[1]!) - (b[1]! - a[1]!) * (c[0]! - a[0]!)

const distanceToSide = (p: number[], a: number[], b: number[]): number => {
  const [dx, dy] = [b[0]! - a[0]!, b[1]! - a[1]!]
  const t = ((p[0]! - a[0]!) * dx + (p[1]! - a[1]!) * dy) / (dx * dx + dy * dy)
  const s = Math.min(1, Math.max(0, t))
  return Math.hypot(p[0]! - a[0]! - s * dx, p[1]! - a[1]! - s * dy)
}

/** A plan a building can have: no edge under 300 mm, no two walls nearer than that, nothing crosses. */
export function isClear(plan: Plan): boolean {
  const n = plan.length
  const corner = (k: number) => plan[((k % n) + n) % n]!
  for (let i = 0; i < n; i += 1) {
    if (Math.hypot(corner(i + 1)[0] - corner(i)[0], corner(i + 1)[1] - corner(i)[1]) < 320)
      return false
    for (let j = i + 2; j < n; j += 1) {
      if (i === 0 && j === n - 1) continue
      const [a, b, c, d] = [corner(i), corner(i + 1), corner(j), corner(j + 1)]
      if (side(a, b, c) * side(a, b, d) < 0 && side(c, d, a) * side(c, d, b) < 0) return false
      const apart = Math.min(
        distanceToSide(a, c, d),
        distanceToSide(b, c, d),
        distanceToSide(c, a, b),
        distanceToSide(d, a, b),
      )
      if (apart < 320) return false
    }
    const [p, q, r] = [corner(i - 1), corner(i), corner(i + 1)]
    const [u, v] = [
      [q[0] - p[0], q[1] - p[1]],
      [r[0] - q[0], r[1] - q[1]],
    ] as const
    const turn = Math.atan2(u[0] * v[1] - u[1] * v[0], u[0] * v[0] + u[1] * v[1])
    if (Math.abs(turn) > 2.9) return false
  }
  return plan.reduce((sum, p, k) => sum + p[0] * corner(k + 1)[1] - p[1] * corner(k + 1)[0], 0) > 0
}

/** A rectangle with bays and recesses, square all round; `grid` makes sizes meet by chance. */
function squarePlan(next: () => number, corners: number, grid: number): Plan {
  const size = (low: number, high: number) =>
    Math.round((low + next() * (high - low)) / grid) * grid
  let plan: Plan = [
    [0, 0],
    [size(6000, 16000), 0],
    [0, 0],
    [0, size(5000, 11000)],
  ]
  plan[2] = [plan[1]![0], plan[3]![1]]
  for (let tries = 0; tries < 200 && plan.length + 2 <= corners; tries += 1) {
    const k = Math.floor(next() * plan.length)
    const [p, q] = [plan[k]!, plan[(k + 1) % plan.length]!]
    const long = Math.hypot(q[0] - p[0], q[1] - p[1])
    const [ux, uy] = [(q[0] - p[0]) / long, (q[1] - p[1]) / long]
    const from = next() < 0.4 ? 0 : size(600, long)
    const to = next() < 0.4 ? long : from + size(1200, 5000)
    const out = size(800, 4500) * (next() < 0.6 ? 1 : -1)
    if (to > long || (from === 0 && to === long)) continue
    const place = (s: number, o: number): [number, number] => [
      p[0] + ux * s + uy * o,
      p[1] + uy * s - ux * o,
    ]
    const bay: Plan = [
      ...(from === 0 ? [] : [place(from, 0)]),
      place(from, out),
      place(to, out),
      ...(to === long ? [] : [place(to, 0)]),
    ]
    const kept: Plan = []
    plan.forEach((corner, n) => {
      const gone = (n === k && from === 0) || (n === (k + 1) % plan.length && to === long)
      if (!gone) kept.push(corner)
      if (n === k) kept.push(...bay)
    })
    if (kept.length <= corners && isClear(kept)) plan = kept
  }
  return plan
}

function skewPlan(next: () => number, corners: number): Plan {
  const plan = squarePlan(next, corners, 1)
  const lean = (next() - 0.5) * 0.8
  return plan.map(([x, y]) => [
    x + lean * y + (next() - 0.5) * 900,
    y + lean * 0.3 * x + (next() - 0.5) * 900,
  ])
}

function starPlan(next: () => number, corners: number): Plan {
  const across = 2500 + corners * 350
  return Array.from({ length: corners }, (_, k) => {
    const angle = ((k + 0.7 * (next() - 0.5)) / corners) * 2 * Math.PI
    const out = across * (0.45 + 0.9 * next())
    return [Math.cos(angle) * out, Math.sin(angle) * out]
  })
}

const turned = (plan: Plan, angle: number): Plan => {
  const [c, s] = [Math.cos(angle), Math.sin(angle)]
  return plan.map(([x, y]) => [x * c - y * s, x * s + y * c])
}

const quarterTurned = (plan: Plan): Plan => plan.map(([x, y]) => [-y, x])

export type PlanKind = 'square' | 'square on a grid' | 'skew' | 'star'
export const planKinds: PlanKind[] = ['square', 'square on a grid', 'skew', 'star']

/**
 * A random plan of up to `corners` corners; some are turned, so that no wall runs along an axis.
 * `exact`: walls in one line are so to the last digit.
 */
export function randomPlan(kind: PlanKind, seed: number, corners: number, exact = false): Plan {
  const next = numbersFrom(seed)
  for (;;) {
    const plan =
      kind === 'star'
        ? starPlan(next, corners)
        : kind === 'skew'
          ? skewPlan(next, corners)
          : squarePlan(next, corners, kind === 'square' ? 1 : 600)
    const turn = next() < 0.5 ? next() * 6.28 : 0
    const quarter = exact && kind.startsWith('square')
    const set = turn === 0 ? plan : quarter ? quarterTurned(plan) : turned(plan, turn)
    if (isClear(set)) return set
  }
}

const squareGable = (plan: Plan, k: number): boolean => {
  const n = plan.length
  const direction = (i: number): [number, number] => {
    const [p, q] = [plan[(i + n) % n]!, plan[(i + 1) % n]!]
    const long = Math.hypot(q[0] - p[0], q[1] - p[1])
    return [(q[0] - p[0]) / long, (q[1] - p[1]) / long]
  }
  const own = direction(k)
  return [k - 1, k + 1].every((i) => {
    const other = direction((i + n) % n)
    const turn = own[0] * other[1] - own[1] * other[0]
    return Math.abs(own[0] * other[0] + own[1] * other[1]) < 1e-6 && (i < k ? -turn : turn) > 0
  })
}

/** A random roof: one pitch, or one for each eave; in square plans some ends are gables. */
export function randomLinesRoof(seed: number, onePitch: boolean): Roof {
  const next = numbersFrom(seed + 777)
  const kind = planKinds[seed % planKinds.length]!
  const plan = randomPlan(kind, seed, 4 + Math.floor(next() * (seed % 3 === 0 ? 29 : 13)))
  const one = Math.round(15 + next() * 30)
  const pitches = plan.map(() => (onePitch ? one : Math.round(one - 8 + next() * 16)))
  const edges = pitches.map((pitch, k): number | 'gable' =>
    !onePitch && next() < 0.5 && squareGable(plan, k) ? 'gable' : pitch,
  )
  return makeRoof(plan, edges)
}

export const planAreaMm2 = (outline: readonly Point2[]): number =>
  outline.reduce((sum, p, k) => {
    const q = outline[(k + 1) % outline.length]!
    return sum + (p.x * q.y - q.x * p.y) / 2
  }, 0)
