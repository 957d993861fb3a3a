import type { Facets } from './facets.ts'
import { directionToBuilding, toBuilding, type Piece } from './rebuild-member.ts'
import type { Complain } from './report.ts'
import type { Site } from './site.ts'
import { heightOn, isFrameMember, isHipLike, isRafter } from './slopes.ts'
import { boxesMeet, boxOf } from './solid-kit.ts'
import { distanceToStretch } from './surface.ts'
import { cosDeg, dot, scale, sub, toDeg, type Vec } from './vec.ts'

const TOUCH_MM = 0.2
const PLACE_TOL_MM = 0.01
const LEVEL_TOL_MM = 0.01
const FACING = cosDeg(2)

type Say = (text: string, out: number, other?: string) => void

const topCorners = (piece: Piece): Vec[] => {
  const half = piece.member.section.thicknessMm / 2
  return [0, piece.member.setOutLengthMm].flatMap((along) =>
    [-half, half].map((left) => toBuilding(piece.pose, [along, left, 0])),
  )
}

/** Stand less drop over its slope at both ends; a collar tie's ends lie in the tops of its two slopes. */
function judgeHeight(say: Say, site: Site, piece: Piece): void {
  const { member } = piece
  const ends = [member.axis.from, member.axis.to]
  ends.forEach((p, i) => {
    const plane = member.planes[member.role === 'collar-tie' ? i : 0] ?? member.planes[0]!
    const wanted = heightOn(site.surface.slopes[plane]!, p.x, p.y) + site.spec.standMm
    const out = p.z - (wanted - member.dropMm)
    if (Math.abs(out) > PLACE_TOL_MM) say('is not stand less drop over its slope, mm', out)
  })
}

/** Its top lies on the undersides of the rafters: the slope, set down by a rafter's depth square to it. */
function judgePurlin(say: Say, site: Site, piece: Piece): void {
  const slope = site.surface.slopes[piece.member.planes[0]!]!
  const plumbDepth = site.roof.sections.rafter.depthMm * Math.hypot(1, slope.tan)
  for (const [x, y, z] of topCorners(piece)) {
    const out = z - (heightOn(slope, x, y) + site.spec.standMm - plumbDepth)
    if (Math.abs(out) > TOUCH_MM) say('its top is not on the undersides of its rafters, mm', out)
  }
  const carried = site.pieces.filter(
    (o) =>
      isRafter(o.member) &&
      o.member.planes[0] === piece.member.planes[0] &&
      boxesMeet(boxOf(o.corners, 0), boxOf(piece.corners, TOUCH_MM)),
  )
  if (carried.length === 0) say('carries no rafter', 0)
}

/** Level, and flat against the side faces of a rafter of each of its slopes. */
function judgeTie(say: Say, site: Site, facets: Facets, piece: Piece): void {
  const { member } = piece
  if (Math.abs(member.riseMm) > LEVEL_TOL_MM) say('is not level, mm', member.riseMm)
  const half = member.section.thicknessMm / 2
  for (const plane of member.planes) {
    const gaps = site.pieces
      .filter((o) => isRafter(o.member) && o.member.planes[0] === plane)
      .filter((o) => boxesMeet(boxOf(o.corners, 1), piece.box))
      .flatMap((o) =>
        [-1, 1].flatMap((side) => {
          const normal = directionToBuilding(piece.pose, [0, side, 0])
          const point = toBuilding(piece.pose, [0, side * half, 0])
          return facets
            .facing(o, scale(normal, -1), FACING)
            .map((facet) => Math.abs(dot(normal, sub(facet.frame.point, point))))
        }),
      )
    const out = Math.min(Infinity, ...gaps)
    if (out > TOUCH_MM) say(`lies beside no rafter of slope ${plane}, mm`, out)
  }
}

/** Its back lies on the tail cuts of the rafters of its slope, or at least a hip's or valley's tail holds it. */
function judgeFascia(say: Say, site: Site, piece: Piece): void {
  const { member } = piece
  const half = member.section.thicknessMm / 2
  const near = boxOf(piece.corners, 1)
  let met = site.pieces.filter(
    (o) =>
      isHipLike(o.member) && o.member.planes.includes(member.planes[0]!) && boxesMeet(o.box, near),
  ).length
  for (const other of site.pieces) {
    if (!isRafter(other.member) || other.member.planes[0] !== member.planes[0]) continue
    if (!boxesMeet(other.box, near)) continue
    const tail = other.sawn.find((s) => s.cut.end === 'tail' && s.cut.against === null)
    if (tail === undefined) continue
    const normal = directionToBuilding(other.pose, tail.normal)
    const faces = dot(normal, piece.pose.left) > 0 ? -half : half
    const back = toBuilding(piece.pose, [0, faces, 0])
    const out = dot(normal, sub(back, toBuilding(other.pose, tail.point)))
    const turn = toDeg(Math.acos(Math.min(1, Math.abs(dot(normal, piece.pose.left)))))
    met += 1
    if (Math.abs(out) > TOUCH_MM || turn > 0.01)
      say('its back is not on the tail, mm', out, other.member.mark)
  }
  if (met === 0) say('is on no tail, mm long', member.setOutLengthMm)
}

/** Its back stands on the verge line of a gable. */
function judgeBarge(say: Say, site: Site, piece: Piece): void {
  const { roof } = site
  const half = piece.member.section.thicknessMm / 2
  const { from, to } = piece.member.axis
  const offs = roof.edges.map((edge, i) => {
    if (edge.finish !== 'gable') return Infinity
    const [a, b] = [roof.outline[i]!, roof.outline[(i + 1) % roof.outline.length]!]
    const gaps = [from, to].map((p) => distanceToStretch([a.x, a.y], [b.x, b.y], p.x, p.y))
    return Math.max(...gaps.map((gap) => Math.abs(gap - edge.overhangMm - half)))
  })
  const out = Math.min(...offs)
  if (out > PLACE_TOL_MM) say('its back is on no verge line, mm', out)
}

/** The timbers beside the frame: where they lie and what they lie on. */
export function checkBeside(complain: Complain, site: Site, facets: Facets, piece: Piece): void {
  const { member } = piece
  if (isFrameMember(member)) return
  const say: Say = (text, out, other) => {
    const marks = other === undefined ? [member.mark] : [member.mark, other]
    complain({ check: 'beside', marks, out, text })
  }
  const inSlope =
    member.role === 'underpurlin' || (member.role === 'fascia' && site.roof.tail === 'square')
  if ((member.topInSlope === true) !== inSlope) say('lies the wrong way up', 0)
  judgeHeight(say, site, piece)
  if (member.role === 'underpurlin') judgePurlin(say, site, piece)
  if (member.role === 'collar-tie') judgeTie(say, site, facets, piece)
  if (member.role === 'fascia') judgeFascia(say, site, piece)
  if (member.role === 'barge') judgeBarge(say, site, piece)
}
