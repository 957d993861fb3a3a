/** Houses with wings: a main body with parts built out from its sides. */
export type Next = () => number
export type Corner = [number, number]
/** One plate edge: where it starts, and which part of the house it belongs to. */
export type Side = { x: number; y: number; wing: number; isEnd: boolean }
/** A part built out from one side of the body, from `from` to `to` along it. */
type Wing = { from: number; to: number; out: number }

/** No plate shorter than this; wings no narrower and no wider than these. */
const LEAST_SIDE = 900
const WING = [2500, 8000] as const

export const between = (next: Next, low: number, high: number): number =>
  Math.round(low + next() * (high - low))
export const oneOf = <T>(next: Next, items: readonly T[]): T =>
  items[Math.floor(next() * items.length)]!

/** Wings along one side, apart from each other; flush with a corner or well clear of it. */
function wingsOf(next: Next, sideMm: number, most: number): Wing[] {
  const wings: Wing[] = []
  let start = next() < 0.4 ? 0 : LEAST_SIDE + next() * 1500
  while (wings.length < most) {
    const width = between(next, WING[0], Math.min(WING[1], Math.max(WING[0], sideMm * 0.6)))
    const from = Math.round(start)
    let to = from + width
    if (to > sideMm + 1) break
    if (sideMm - to < LEAST_SIDE) to = sideMm
    if (to - from > sideMm - LEAST_SIDE) break
    const jog = next() < 0.2
    const out = jog ? between(next, LEAST_SIDE, 1500) : between(next, 1800, 6000)
    wings.push({ from, to, out })
    start = to + LEAST_SIDE + next() * 2500
  }
  return wings
}

type Body = { long: number; wide: number; sides: Wing[][] }

/** A main body, and which parts are built out from which of its sides. */
export function bodyOf(next: Next): Body {
  const wide = between(next, 4500, 8000)
  const long = between(next, Math.max(7000, wide + 500), 15000)
  const lengths = [long, wide, long, wide]
  const chance = [0.75, 0.35, 0.6, 0.35]
  let left = oneOf(next, [1, 1, 2, 2, 2, 3, 3])
  const sides = lengths.map((sideMm, i) => {
    if (left === 0 || next() > chance[i]!) return []
    const wings = wingsOf(next, sideMm, i % 2 === 0 ? Math.min(2, left) : 1)
    left -= wings.length
    return wings
  })
  if (sides.flat().length === 0) {
    sides[0] = [{ from: 0, to: between(next, WING[0], long - 2 * LEAST_SIDE), out: 3000 }]
  }
  return { long, wide, sides }
}

/** Walks round the body and its wings, counter-clockwise. */
export function sidesOf({ long, wide, sides }: Body): Side[] {
  const corners = [
    [0, 0],
    [long, 0],
    [long, wide],
    [0, wide],
  ] as const
  const found: Side[] = []
  let wing = 0
  sides.forEach((wings, i) => {
    const [cx, cy] = corners[i]!
    const [nx, ny] = corners[(i + 1) % 4]!
    const size = Math.hypot(nx - cx, ny - cy)
    const [dx, dy] = [(nx - cx) / size, (ny - cy) / size]
    const at = (along: number, out: number): { x: number; y: number } => ({
      x: cx + along * dx + out * dy,
      y: cy + along * dy - out * dx,
    })
    found.push({ ...at(0, 0), wing: 0, isEnd: i % 2 === 1 && wings.length === 0 })
    for (const { from, to, out } of wings) {
      wing += 1
      found.push({ ...at(from, 0), wing, isEnd: false })
      found.push({ ...at(from, out), wing, isEnd: true })
      found.push({ ...at(to, out), wing, isEnd: false })
      found.push({ ...at(to, 0), wing: 0, isEnd: false })
    }
  })
  return withoutIdle(found)
}

/** Leaves out corners that are none: two in one place, and those in the middle of a straight side. */
function withoutIdle(sides: Side[]): Side[] {
  const apart = sides.filter((side, i) => {
    const after = sides[(i + 1) % sides.length]!
    return Math.hypot(after.x - side.x, after.y - side.y) > 1
  })
  return apart.filter((side, i) => {
    const before = apart.at(i - 1)!
    const after = apart[(i + 1) % apart.length]!
    const turn = (side.x - before.x) * (after.y - side.y) - (side.y - before.y) * (after.x - side.x)
    return Math.abs(turn) > 1
  })
}

/** Width of the narrowest notch: a side between two inward corners. */
export function notchMm(outline: readonly Corner[]): number {
  const n = outline.length
  const at = (i: number): Corner => outline[(i + n) % n]!
  const turnsIn = (i: number): boolean => {
    const [[ax, ay], [bx, by], [cx, cy]] = [at(i - 1), at(i), at(i + 1)]
    return (bx - ax) * (cy - by) - (by - ay) * (cx - bx) < 0
  }
  const widths = outline.map(([x, y], i) => {
    const [ex, ey] = at(i + 1)
    return turnsIn(i) && turnsIn(i + 1) ? Math.hypot(ex - x, ey - y) : Infinity
  })
  return Math.min(...widths)
}

/** Corners no sharper than this, in or out, and no two sides nearer than this: what a house is built with. */
const SHARPEST_DEG = 40
const LEAST_GAP = 700

function gapMm(a: Corner, [p, q]: [Corner, Corner]): number {
  const [dx, dy] = [q[0] - p[0], q[1] - p[1]]
  const share = ((a[0] - p[0]) * dx + (a[1] - p[1]) * dy) / (dx * dx + dy * dy)
  const t = Math.min(1, Math.max(0, share))
  return Math.hypot(a[0] - p[0] - t * dx, a[1] - p[1] - t * dy)
}

/** Whether a plan with moved corners is still one that somebody would build. */
export function isHouse(outline: Corner[]): boolean {
  const n = outline.length
  const at = (i: number): Corner => outline[(i + n) % n]!
  return outline.every((corner, i) => {
    const [before, after] = [at(i - 1), at(i + 1)]
    const turn = (p: Corner): number => Math.atan2(p[1] - corner[1], p[0] - corner[0])
    const opening = Math.abs(Math.sin((turn(before) - turn(after)) / 2))
    if (opening < Math.sin((SHARPEST_DEG / 2) * (Math.PI / 180))) return false
    return outline.every((_, k) => {
      if (k === i || (k + 1) % n === i) return true
      return gapMm(corner, [at(k), at(k + 1)]) >= LEAST_GAP
    })
  })
}
