import { topUp } from './check-place.ts'
import { toBuilding, type Piece } from './rebuild-member.ts'
import type { Complain } from './report.ts'
import type { Site } from './site.ts'
import { isFrameMember } from './slopes.ts'
import { distanceInside, surfaceHeight, type Plan, type Surface } from './surface.ts'
import { dot, sub, type Vec } from './vec.ts'

const PLANING_TOL_MM = 0.2
const ON_CENTRE_MM = 0.01

/** From where to where a line along the top is timber; null where the cuts leave none of it. */
function timberOn(piece: Piece, left: number, up: number): readonly [number, number] | null {
  let [low, high] = [-Infinity, Infinity]
  for (const { normal, point } of piece.sawn) {
    const off = dot(normal, sub([0, left, up], point))
    if (normal[0] > 0) high = Math.min(high, -off / normal[0])
    else low = Math.max(low, -off / normal[0])
  }
  return low < high ? [low, high] : null
}

/** Where two stretches of the plan cross, as a share of the first. */
function crossingShare(a: Plan, b: Plan, c: Plan, d: Plan): number | null {
  const [rx, ry, sx, sy] = [b[0] - a[0], b[1] - a[1], d[0] - c[0], d[1] - c[1]]
  const size = rx * sy - ry * sx
  if (Math.abs(size) < 1e-9) return null
  const [qx, qy] = [c[0] - a[0], c[1] - a[1]]
  const share = (qx * sy - qy * sx) / size
  const other = (qx * ry - qy * rx) / size
  return share > 0 && share < 1 && other >= 0 && other <= 1 ? share : null
}

/**
 * The places along both arrises and the centre line that pass over a line of the roof. Between its
 * corners a top can only stand proud there: over a valley the roof is lowest.
 */
function crossings(piece: Piece, surface: Surface): Vec[] {
  const half = piece.member.section.thicknessMm / 2
  const found: Vec[] = []
  for (const left of [-half, 0, half]) {
    const up = topUp(piece, left)
    const reach = timberOn(piece, left, up)
    if (reach === null) continue
    const [low, high] = reach
    const [a, b] = [
      toBuilding(piece.pose, [low, left, up]),
      toBuilding(piece.pose, [high, left, up]),
    ]
    for (const { plan } of surface.faces) {
      plan.forEach((c, i) => {
        const share = crossingShare([a[0], a[1]], [b[0], b[1]], c, plan[(i + 1) % plan.length]!)
        if (share !== null) found.push([low + share * (high - low), left, up])
      })
    }
  }
  return found
}

/** A corner over a neighbouring slope must be in the published planing, by what it stands over. */
export function checkPlaning(complain: Complain, site: Site, piece: Piece): void {
  const { mark } = piece.member
  if (!isFrameMember(piece.member)) return
  const { spec, surface } = site
  const middle = piece.member.setOutLengthMm / 2
  // over an overhang a member keeps to its own slopes, and is judged by them
  const tops = [...piece.own, ...crossings(piece, surface)].flatMap((own) => {
    const [x, y, z] = toBuilding(piece.pose, own)
    if (distanceInside(surface.roof, x, y) < -ON_CENTRE_MM) return []
    return [{ own, over: z - surfaceHeight(surface, x, y) - spec.standMm }]
  })
  for (const end of ['head', 'foot'] as const) {
    for (const side of ['left', 'right'] as const) {
      const listed = spec.planing.filter((p) => p.mark === mark && p.end === end && p.side === side)
      const off = Math.max(0, ...listed.map((p) => p.offMm))
      const proud = Math.max(
        0,
        ...tops
          .filter(({ own }) => (end === 'head' ? own[0] > middle : own[0] <= middle))
          .filter(({ own }) => (side === 'left' ? own[1] > -ON_CENTRE_MM : own[1] < ON_CENTRE_MM))
          .map(({ over }) => over),
      )
      const out = proud - off
      if (Math.abs(out) <= PLANING_TOL_MM) continue
      const text = `${end} ${side} corner stands ${proud.toFixed(2)} over the roof, planing takes ${off.toFixed(2)}, mm`
      complain({ check: 'planing', marks: [mark], out, text })
    }
  }
}
