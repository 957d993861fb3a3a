import { directionToBuilding, toBuilding, type Piece, type SawnPlane } from './rebuild-member.ts'
import type { Complain } from './report.ts'
import { boxesMeet, boxOf, type Flat, type Solid } from './solid-kit.ts'
import { cross, dot, length, sub, unit, type Vec } from './vec.ts'

/** A butt joint closes when the other piece is there within this over the bearing face. */
export const CLOSE_MM = 0.2
/** Just inside the cut: deeper, the face of a second cheek in nearly the same plane would show too. */
const FACE_MM = 0.001
/** How deep behind the cut a piece is still taken to be what the cut was meant to meet. */
const REACH_MM = 6
/** Below this share of a bearing face, what is open is an edge of a sloping top, not a gap. */
const CLOSED_SHARE = 0.97
const SPECK_MM2 = 25
/** A piece that is named must touch at all. */
const TOUCH_MM2 = 1
/** Two cheeks nearly in one plane touch each other's piece by a sliver that needs no name. */
const ASIDE_SHARE = 0.03

/** Lays a cut plane level at z = 0, the sawn piece under it. */
function layLevel(solid: Solid, normal: Vec, point: Vec): Solid {
  const helper: Vec = Math.abs(normal[2]) < 0.9 ? [0, 0, 1] : [1, 0, 0]
  const x = unit(cross(helper, normal))
  const y = cross(normal, x)
  const rows = [x, y, normal]
  const column = (i: 0 | 1 | 2): [number, number, number, number] => [
    rows[0]![i],
    rows[1]![i],
    rows[2]![i],
    0,
  ]
  const shift = rows.map((r) => -dot(r, point)) as [number, number, number]
  return solid.transform([...column(0), ...column(1), ...column(2), ...shift, 1])
}

const shared = (face: Flat, solid: Solid, heightMm: number): Flat =>
  face.intersect(solid.slice(heightMm))

function faceCorners(piece: Piece, sawn: SawnPlane): Vec[] {
  return piece.own
    .filter((p) => Math.abs(dot(sawn.normal, sub(p, sawn.point))) < 0.05)
    .map((p) => toBuilding(piece.pose, p))
}

type Bearing = {
  mark: string
  solid: Solid
  areaMm2: number
  touchMm2: number
  /** It was cut to fit this piece, so this piece need not name it. */
  buttsBack: boolean
}

/** The least opening at which the other pieces fill the face; REACH_MM when they never do. */
function openingMm(face: Flat, bearings: readonly Bearing[]): number {
  const covered = (h: number): number => {
    const parts = bearings.map((b) => shared(face, b.solid, h))
    return parts.reduce((sum, part) => sum + part.area(), 0)
  }
  // the tip of a piece can fill the face and yet be thinner than the reach
  const full = Math.max(covered(REACH_MM), covered(CLOSE_MM))
  if (full < SPECK_MM2) return REACH_MM
  for (let h = 0.05; h < REACH_MM; h *= 1.25) {
    if (covered(h) >= CLOSED_SHARE * Math.min(full, covered(h + 1))) return h
  }
  return REACH_MM
}

function checkCut(complain: Complain, piece: Piece, sawn: SawnPlane, others: Piece[]): void {
  const { cut } = sawn
  const { mark } = piece.member
  const normal = directionToBuilding(piece.pose, sawn.normal)
  const point = toBuilding(piece.pose, sawn.point)
  const face = layLevel(piece.solid, normal, point).slice(-FACE_MM)
  const say = (text: string, out: number, other?: string): void =>
    complain({ check: 'joint', marks: other === undefined ? [mark] : [mark, other], out, text })
  if (face.area() < SPECK_MM2) return say(`its ${cut.end} cut misses the timber, mm²`, face.area())

  const near = boxOf(faceCorners(piece, sawn), REACH_MM)
  const bearings: Bearing[] = others
    .filter((o) => o !== piece && boxesMeet(o.box, near))
    .map((o) => {
      const solid = layLevel(o.solid, normal, point)
      const areaMm2 = shared(face, solid, REACH_MM / 4).area()
      const touchMm2 = shared(face, solid, CLOSE_MM / 2).area()
      const buttsBack = o.member.cuts.some((c) => [c.against, ...c.alsoAgainst].includes(mark))
      return { mark: o.member.mark, solid, areaMm2, touchMm2, buttsBack }
    })
    .filter((b) => b.areaMm2 > TOUCH_MM2)
    .sort((a, b) => b.areaMm2 - a.areaMm2)

  const aside = Math.max(SPECK_MM2, ASIDE_SHARE * face.area())
  const listed = cut.against === null ? [] : [cut.against, ...cut.alsoAgainst]
  for (const name of listed) {
    if (bearings.some((b) => b.mark === name)) continue
    say(`its ${cut.end} cut is said to bear on it and does not`, 0, name)
  }
  for (const b of bearings) {
    if (listed.includes(b.mark) || b.buttsBack || b.touchMm2 < aside) continue
    say(`its ${cut.end} cut bears on it unsaid, mm²`, b.areaMm2, b.mark)
  }
  if (cut.against === null) {
    const free = cut.end !== 'head' || piece.member.role === 'ridge'
    return free ? undefined : say('its head cut is said to bear on nothing', 0)
  }
  const named = bearings.filter((b) => listed.includes(b.mark))
  const [most] = bearings
  const first = named.find((b) => b.mark === cut.against)
  if (most === undefined || first === undefined) return
  // What only stands behind a corner of the face, in no joint with it, is a void and not a gap.
  if (named.some((b) => b.areaMm2 - first.areaMm2 > aside)) {
    say(
      `its ${cut.end} cut has more bearing on it than on ${cut.against}, mm²`,
      most.areaMm2,
      most.mark,
    )
  }
  const opening = openingMm(face, named)
  if (opening > CLOSE_MM) say(`its ${cut.end} joint stands open, mm`, opening, first.mark)
}

/** Every cut that butts: closed within 0.2 mm over its bearing face, and on the pieces it names. */
export function checkJoints(complain: Complain, piece: Piece, others: Piece[]): void {
  for (const sawn of piece.sawn) {
    if (length(sawn.normal) > 0) checkCut(complain, piece, sawn, others)
  }
}
