/**
 * A rafter is long and thin: it is drawn to one scale where something happens (tail, birdsmouth,
 * head) and broken between.
 */
export type TimberZoneWish = {
  /** What must be seen, from the heel plumb line along the timber. */
  fromMm: number
  toMm: number
  /** Plain timber to show on each side of it. */
  beforePx: number
  afterPx: number
}

export type TimberZone = { fromMm: number; toMm: number; startPx: number; endPx: number }

export type TimberScale = {
  pxPerMm: number
  zones: TimberZone[]
  xPx: (alongMm: number) => number
}

export const breakGapPx = 14

export type TimberScaleOptions = { startPx: number; endPx: number; maxPxPerMm: number }

/** The largest scale at which the wished zones, in order, fill the room; near zones run together. */
export function timberScale(
  wishes: readonly TimberZoneWish[],
  options: TimberScaleOptions,
): TimberScale {
  let kept = [...wishes].sort((a, b) => a.fromMm - b.fromMm)
  let pxPerMm = scaleFor(kept, options)
  for (let at = nearPair(kept, pxPerMm); at !== null; at = nearPair(kept, pxPerMm)) {
    kept = joinedAt(kept, at)
    pxPerMm = scaleFor(kept, options)
  }
  const sparePx = options.endPx - options.startPx - takenPx(kept, pxPerMm)
  const zones = laidOut(kept, pxPerMm, options.startPx, Math.max(0, sparePx))
  return { pxPerMm, zones, xPx: (alongMm) => placeAlong(zones, alongMm, pxPerMm) }
}

function scaleFor(zones: readonly TimberZoneWish[], options: TimberScaleOptions): number {
  const fixedPx = takenPx(zones, 0)
  const lengthMm = zones.reduce((sum, zone) => sum + zone.toMm - zone.fromMm, 0)
  const roomPx = Math.max(options.endPx - options.startPx - fixedPx, 60)
  return Math.min(options.maxPxPerMm, roomPx / Math.max(lengthMm, 1))
}

function takenPx(zones: readonly TimberZoneWish[], pxPerMm: number): number {
  return zones.reduce(
    (sum, zone) => sum + zone.beforePx + zone.afterPx + (zone.toMm - zone.fromMm) * pxPerMm,
    breakGapPx * (zones.length - 1),
  )
}

/** The first pair with nothing worth leaving out between them. */
function nearPair(zones: readonly TimberZoneWish[], pxPerMm: number): number | null {
  const at = zones.findIndex((zone, i) => {
    const next = zones[i + 1]
    if (!next) return false
    return (next.fromMm - zone.toMm) * pxPerMm <= zone.afterPx + breakGapPx + next.beforePx
  })
  return at < 0 ? null : at
}

function joinedAt(zones: readonly TimberZoneWish[], at: number): TimberZoneWish[] {
  const first = zones[at]
  const second = zones[at + 1]
  if (!first || !second) return [...zones]
  const joined = {
    fromMm: first.fromMm,
    toMm: Math.max(first.toMm, second.toMm),
    beforePx: first.beforePx,
    afterPx: second.toMm >= first.toMm ? second.afterPx : first.afterPx,
  }
  return [...zones.slice(0, at), joined, ...zones.slice(at + 2)]
}

/** Room left over at the largest scale shows more plain timber beside the breaks. */
function laidOut(
  zones: readonly TimberZoneWish[],
  pxPerMm: number,
  startPx: number,
  sparePx: number,
): TimberZone[] {
  const breaks = zones.length - 1
  const eachPx = breaks > 0 ? sparePx / (2 * breaks) : 0
  let atPx = startPx
  return zones.map((zone, i) => {
    const before = zone.beforePx + (i > 0 ? eachPx : 0)
    const after = zone.afterPx + (i < breaks ? eachPx : 0)
    const fromMm = zone.fromMm - before / pxPerMm
    const toMm = zone.toMm + after / pxPerMm
    const placed = { fromMm, toMm, startPx: atPx, endPx: atPx + (toMm - fromMm) * pxPerMm }
    atPx = placed.endPx + breakGapPx
    return placed
  })
}

function placeAlong(zones: readonly TimberZone[], alongMm: number, pxPerMm: number): number {
  const first = zones[0]
  const last = zones[zones.length - 1]
  if (!first || !last) return 0
  if (alongMm <= first.toMm) return first.startPx + (alongMm - first.fromMm) * pxPerMm
  for (const [i, zone] of zones.entries()) {
    if (alongMm <= zone.toMm && alongMm >= zone.fromMm)
      return zone.startPx + (alongMm - zone.fromMm) * pxPerMm
    const next = zones[i + 1]
    if (next && alongMm > zone.toMm && alongMm < next.fromMm) {
      const share = (alongMm - zone.toMm) / (next.fromMm - zone.toMm)
      return zone.endPx + (next.startPx - zone.endPx) * share
    }
  }
  return last.startPx + (alongMm - last.fromMm) * pxPerMm
}
