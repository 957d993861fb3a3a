import type { Roof } from '../../../shared/roof/roof-types.ts'
import type { Complain } from './report.ts'
import type { Site } from './site.ts'
import { bordersOf, levelStrips, squareStrips, type Border, type Strip } from './slope-strips.ts'
import { distanceAlong, distanceIn, isRafter } from './slopes.ts'
import { cosDeg } from './vec.ts'

const LOOSE_MM = 0.01
/** Heights are looked at just over and just under each place where something starts or ends. */
const BESIDE_MM = 0.5

type Rafter = { mark: string; along: number; low: number; high: number }
type Say = (marks: string[], text: string, out: number) => void

type SlopeLayout = {
  name: string
  borders: Border[]
  rafters: Rafter[]
  pitchDeg: number
  maxSpacingMm: number
  spacing: Roof['spacing']
  thicknessMm: number
  minCreeperMm: number
  /** A rafter whose centre line is nearer than this to the end of its slope has no room there. */
  besideHipMm: number
}

function layoutOf(site: Site, index: number): SlopeLayout {
  const { roof, spec } = site
  const face = site.surface.faces[index]!
  const rafters = spec.members
    .filter((m) => isRafter(m) && m.planes[0] === index)
    .map(({ mark, axis }) => ({
      mark,
      along: distanceAlong(face.slope, axis.from.x, axis.from.y),
      low: distanceIn(face.slope, axis.from.x, axis.from.y),
      high: distanceIn(face.slope, axis.to.x, axis.to.y),
    }))
    .sort((a, b) => a.along - b.along)
  return {
    name: `slope ${index}`,
    borders: bordersOf(roof, face),
    rafters,
    pitchDeg: spec.planes[index]!.pitchDeg,
    maxSpacingMm: roof.maxSpacingMm,
    spacing: roof.spacing,
    thicknessMm: roof.sections.rafter.thicknessMm,
    minCreeperMm: site.settings.minCreeperMm,
    besideHipMm: (roof.sections.rafter.thicknessMm + roof.sections.hip.thicknessMm) / 2,
  }
}

/** A hip or valley that runs nearer to the rafter's way than 1 in this would rip it lengthwise. */
const RIP = 6

/**
 * Set-out length of a rafter that would stand here; 0 where it has no room: a hip or valley would leave
 * less than half of it, or run along its foot.
 */
function setOutAt(layout: SlopeLayout, along: number, inward: number): number {
  const { borders, besideHipMm } = layout
  const strip = squareStrips(borders, along).find((s) => s.low < inward && inward < s.high)
  if (strip === undefined) return 0
  const half = (strip.high - strip.low) / 2
  const hasRoom = [-besideHipMm, besideHipMm].every((aside) =>
    squareStrips(borders, along + aside).some(
      (s) =>
        Math.min(s.high, strip.high) - Math.max(s.low, strip.low) > half &&
        Math.abs(s.low - strip.low) < RIP * besideHipMm,
    ),
  )
  return hasRoom ? (strip.high - strip.low) / cosDeg(layout.pitchDeg) : 0
}

const isLong = (layout: SlopeLayout, along: number, inward: number): boolean =>
  setOutAt(layout, along, inward) > layout.minCreeperMm + LOOSE_MM

/** From a border to the first rafter beside it. */
function judgeEnd(
  say: Say,
  layout: SlopeLayout,
  inward: number,
  border: Border,
  at: number,
  rafter: Rafter,
): void {
  const gap = Math.abs(rafter.along - at)
  if (border.isVerge) {
    const out = gap - layout.thicknessMm / 2
    if (Math.abs(out) > LOOSE_MM) say([rafter.mark], 'does not stand flush in the gable, mm', out)
    return
  }
  if (gap <= layout.maxSpacingMm + LOOSE_MM) return
  const next = rafter.along + Math.sign(at - rafter.along) * layout.maxSpacingMm
  if (!isLong(layout, next, inward)) return
  say([rafter.mark], 'a rafter is missing beside it, mm', setOutAt(layout, next, inward))
}

/** Where rafters are left out of a bay: evenly, or in full bays from either side. */
function leftOut(layout: SlopeLayout, from: number, to: number): number[][] {
  const { maxSpacingMm: most } = layout
  const bays = Math.ceil((to - from) / most - LOOSE_MM)
  const places = (step: number): number[] =>
    Array.from({ length: bays - 1 }, (_, k) => step * (k + 1))
  if (layout.spacing === 'even') return [places((to - from) / bays).map((mm) => from + mm)]
  return [places(most).map((mm) => from + mm), places(most).map((mm) => to - mm)]
}

/** Two rafters that follow each other, where between them none is long enough to be cut. */
function judgeBay(say: Say, layout: SlopeLayout, inward: number, a: Rafter, b: Rafter): void {
  const bay = b.along - a.along
  if (bay <= layout.maxSpacingMm + LOOSE_MM) return
  const missing = leftOut(layout, a.along, b.along)
  const wrongly = missing.every((places) => places.some((along) => isLong(layout, along, inward)))
  if (wrongly) say([a.mark, b.mark], 'bay between them, mm', bay)
}

/** A stretch with no rafter at all: wider than a bay of places long enough for one. */
function judgeBare(say: Say, layout: SlopeLayout, inward: number, strip: Strip): void {
  const step = layout.maxSpacingMm / 10
  let run = 0
  for (let along = strip.low + step / 2; along < strip.high; along += step) {
    run = isLong(layout, along, inward) ? run + step : 0
    if (run <= layout.maxSpacingMm + step) continue
    return say([layout.name], `no rafter at ${inward.toFixed(0)} in from the plate, mm`, run)
  }
}

/**
 * The rule: follow a level line of the slope at any height. Where it crosses the slope, what carries
 * the battens are the rafters that pass there, and the hips, valleys and broken hips at its ends.
 * No two that follow each other stand further apart than the spacing, and from the last one to a hip or
 * valley it is no further either; only where a rafter between would be under the shortest creeper may
 * it be left out. In a gable the last one stands flush with the wall.
 */
function judgeLevel(say: Say, layout: SlopeLayout, inward: number): void {
  for (const strip of levelStrips(layout.borders, inward)) {
    const here = layout.rafters.filter(
      (r) =>
        r.along > strip.low - LOOSE_MM &&
        r.along < strip.high + LOOSE_MM &&
        r.low < inward &&
        inward < r.high,
    )
    const [first, last] = [here[0], here.at(-1)]
    if (first === undefined || last === undefined) {
      judgeBare(say, layout, inward, strip)
      continue
    }
    judgeEnd(say, layout, inward, strip.lowBorder, strip.low, first)
    judgeEnd(say, layout, inward, strip.highBorder, strip.high, last)
    here.slice(1).forEach((rafter, i) => judgeBay(say, layout, inward, here[i]!, rafter))
  }
}

/** Nodes nearer together than this many rafters are one joint, with one rafter for all of them. */
const JOINT_RAFTERS = 4

/** A rafter stands at every node where a square line of the slope ends, or at the joint it is in. */
function judgeNodes(say: Say, layout: SlopeLayout): void {
  const reach = JOINT_RAFTERS * layout.thicknessMm
  layout.borders.forEach((border, i) => {
    const before = layout.borders.at(i - 1)!
    const { along, inward } = border.a
    if (inward < BESIDE_MM || border.isVerge || before.isVerge) return
    const beside = [inward - BESIDE_MM, inward + BESIDE_MM].filter((mm) =>
      squareStrips(layout.borders, along).some((s) => s.low < mm && mm < s.high),
    )
    const [ending] = beside
    // a square line that runs on past the node needs no rafter there
    if (ending === undefined || beside.length > 1 || !isLong(layout, along, ending)) return
    const near = layout.rafters.some(
      (r) => Math.abs(r.along - along) < reach && r.low < ending && ending < r.high + reach,
    )
    if (near) return
    say([layout.name], `no rafter stands at its node ${along.toFixed(0)} along, mm in`, inward)
  })
}

function levelsOf(layout: SlopeLayout): number[] {
  const marked = [
    ...layout.borders.map((border) => border.a.inward),
    ...layout.rafters.flatMap((rafter) => [rafter.low, rafter.high]),
  ]
    .sort((a, b) => a - b)
    .filter((mm, i, all) => i === 0 || mm - all[i - 1]! > LOOSE_MM)
  const beside = marked.flatMap((mm) => [mm - BESIDE_MM, mm + BESIDE_MM])
  const between = marked.slice(1).map((mm, i) => (mm + marked[i]!) / 2)
  const touches = (level: number): boolean =>
    marked.some((mm) => Math.abs(mm - level) < BESIDE_MM - LOOSE_MM)
  return [...beside, ...between].filter((mm) => mm > 0 && !touches(mm))
}

/** No bay wider than the spacing at any height, none left out, a rafter at every node and gable. */
export function checkLayout(complain: Complain, site: Site): void {
  site.spec.planes.forEach((_, index) => {
    const layout = layoutOf(site, index)
    const said = new Set<string>()
    const say: Say = (marks, text, out) => {
      const key = `${marks.join()} ${text}`
      if (said.has(key)) return
      said.add(key)
      complain({ check: 'layout', marks, out, text })
    }
    const middle = layout.borders.find((border) => border.isPlate)
    if (layout.rafters.length === 0 && middle !== undefined) {
      const along = (middle.a.along + middle.b.along) / 2
      if (isLong(layout, along, BESIDE_MM)) say([layout.name], 'has no rafters', 0)
    }
    for (const inward of levelsOf(layout)) judgeLevel(say, layout, inward)
    judgeNodes(say, layout)
  })
}
