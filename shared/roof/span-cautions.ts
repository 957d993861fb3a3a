import type { Ground } from './build-pieces.ts'
import { cautionAbout, isRafter, standsBeside, wholeMm } from './caution-words.ts'
import type { Caution, Member, Point2 } from './roof-types.ts'
import { at, insideMm } from './slopes.ts'
import type { Slope } from './slopes.ts'
import { dot2, radians, sub2 } from './vector.ts'

/** Where a member lies on a slope: along the plate, mm. */
const alongMm = (slope: Slope, p: Point2): number => dot2(slope.along, sub2(p, slope.origin))

/** How far up a slope, mm along the rafters, a row of underpurlins carries the rafter over it; null beside it. */
const rowUnderMm = (ground: Ground, slope: Slope, rafter: Member, purlin: Member) => {
  const [a, b] = [alongMm(slope, purlin.axis.from), alongMm(slope, purlin.axis.to)]
  const own = alongMm(slope, rafter.axis.to)
  if (own < Math.min(a, b) || own > Math.max(a, b)) return null
  const pitch = radians(slope.pitchDeg)
  const depthMm = ground.roof.sections.rafter.depthMm
  const inMm = insideMm(slope, purlin.axis.from) - depthMm * Math.sin(pitch)
  return inMm / Math.cos(pitch)
}

/** The longest part of a rafter between plate or foot, rows of underpurlins, and head, mm along it. */
export const longestSpanMm = (ground: Ground, rafter: Member, purlins: Member[]): number => {
  const slope = at(ground.plates.slopes, rafter.planes[0] ?? 0)
  const cos = Math.cos(radians(slope.pitchDeg))
  const foot = insideMm(slope, rafter.axis.from) / cos
  const head = insideMm(slope, rafter.axis.to) / cos
  const rows = purlins.flatMap((purlin) =>
    purlin.planes[0] === slope.index ? (rowUnderMm(ground, slope, rafter, purlin) ?? []) : [],
  )
  const held = [foot, ...rows.filter((mm) => mm > foot && mm < head), head].sort((a, b) => a - b)
  return Math.max(...held.map((mm, k) => mm - (held[k - 1] ?? mm)))
}

/** Rafters that span further than the firm's setting, between underpurlins where they are set out. */
export const spanLong = (ground: Ground, members: Member[]): Caution[] => {
  const mostMm = ground.settings.maxRafterSpanMm
  const rows = members.filter((m) => m.role === 'underpurlin')
  const span = new Map(
    members.filter(isRafter).map((m) => [m.mark, longestSpanMm(ground, m, rows)]),
  )
  const spanOf = (m: Member) => span.get(m.mark) ?? 0
  const purlins = ground.roof.sections.underpurlin !== undefined
  return cautionAbout(
    'rafter-span-long',
    members.filter((m) => spanOf(m) > mostMm + 0.01),
    (m) =>
      purlins
        ? `${m.mark} spans ${wholeMm(spanOf(m))} mm where no row of underpurlins reaches under it, over the ${wholeMm(mostMm)} mm set for one span.`
        : `${m.mark} spans ${wholeMm(spanOf(m))} mm from plate to head, over the ${wholeMm(mostMm)} mm set for one span.`,
    purlins
      ? 'Have it carried there, or use a deeper rafter.'
      : 'Underpurlins or a deeper rafter will be wanted; with a size typed for underpurlins their rows are set out.',
  )
}

/** Members longer than any stock: the frame's own, then those that are joined as a matter of course. */
export const longerThanStock = (ground: Ground, members: Member[]): Caution[] => {
  const stockMm = ground.settings.longestStockMm
  const long = members.filter((m) => m.cutLengthMm > stockMm + 1e-6)
  const text = (m: Member) =>
    `${m.mark} is ${wholeMm(m.cutLengthMm)} mm long, the longest stock ${wholeMm(stockMm)} mm.`
  return [
    ...cautionAbout(
      'longer-than-stock',
      long.filter((m) => !standsBeside(m)),
      text,
      'Order it long, or have a join over a support designed.',
    ),
    ...cautionAbout(
      'longer-than-stock',
      long.filter(standsBeside),
      text,
      'Join underpurlins over a strut or prop, fascias and barges on a rafter; the length given is the whole run.',
    ),
  ]
}
