import { ownHeight, backingOfSlopes } from './own-slopes.ts'
import { toBuilding, toOwn, type Piece } from './rebuild-member.ts'
import type { Complain } from './report.ts'
import type { Site } from './site.ts'
import {
  distanceAlong,
  distanceIn,
  heightOn,
  isAlongLine,
  isFrameMember,
  isRafter,
  slopeOfEdge,
} from './slopes.ts'
import { distanceToRim, distanceToStretch } from './surface.ts'
import { cosDeg, tanDeg, toDeg, toVec, type Vec } from './vec.ts'

const PLACE_TOL_MM = 0.01
/** Nodes nearer than this are one. */
const ON_LINE_MM = 0.5
const TOP_TOL_MM = 0.2
const ANGLE_TOL_DEG = 0.001

type Say = (text: string, out: number) => void

/** Both ends lie over a set-out line of its own slopes, the foot perhaps on its plate line run on. */
function checkEnds(say: Say, site: Site, piece: Piece): void {
  const { member } = piece
  const { faces } = site.surface
  const own = member.planes.map((index) => faces[index]!)
  for (const [name, p] of Object.entries(member.axis)) {
    const rims = own.map((face) => distanceToRim(face.plan, p.x, p.y))
    const plates = name === 'from' ? own.map((f) => Math.abs(distanceIn(f.slope, p.x, p.y))) : []
    const out = Math.min(...rims, ...plates)
    if (out > PLACE_TOL_MM) say(`axis.${name} is over no line of its slopes, mm`, out)
  }
  if (!isRafter(member)) return
  const turn = member.pitchDeg - toDeg(Math.atan(own[0]!.slope.tan))
  if (Math.abs(turn) > ANGLE_TOL_DEG) say('its pitch is not its slope’s, degrees', turn)
}

/** Each slope that a hip, valley or ridge names lies along it: two corners of it, or more, are on its line. */
function checkBeside(say: Say, site: Site, piece: Piece): void {
  const { from, to } = piece.member.axis
  for (const index of piece.member.planes) {
    const gaps = site.surface.faces[index]!.plan.map(([x, y]) =>
      distanceToStretch([from.x, from.y], [to.x, to.y], x, y),
    )
    const [, second = Infinity] = gaps.sort((a, b) => a - b)
    if (second > ON_LINE_MM) say(`slope ${index} does not lie along it, mm`, second)
  }
}

/** A rafter that comes down to a valley starts from a valley's centre line. */
function checkFromValley(say: Say, site: Site, piece: Piece): void {
  const { member } = piece
  const foot = member.cuts.find((cut) => cut.end === 'foot' && cut.against !== null)
  if (foot === undefined || !isRafter(member)) return
  const met = site.spec.members.find((m) => m.mark === foot.against)
  if (met?.role !== 'valley') return
  const { x, y } = member.axis.from
  const gaps = site.spec.lines
    .filter((line) => line.kind === 'valley' && line.planes.includes(member.planes[0]!))
    .map(({ from, to }) => distanceToStretch([from.x, from.y], [to.x, to.y], x, y))
  const out = Math.min(Infinity, ...gaps)
  if (out > PLACE_TOL_MM) say('comes down to a valley and starts off its centre line, mm', out)
}

/** How far a heel is from the outer face, run on, of the plate of its slope that it stands before or nearest to. */
function offPlates(site: Site, plane: number, heel: { x: number; y: number }): number {
  const { outline } = site.roof
  const offs = site.spec.planes[plane]!.edges.map((edge) => {
    const slope = slopeOfEdge(site.roof, edge)
    const end = outline[(edge + 1) % outline.length]!
    const along = distanceAlong(slope, heel.x, heel.y)
    const beyond = Math.max(0, -along, along - distanceAlong(slope, end.x, end.y))
    return { beyond, off: Math.abs(distanceIn(slope, heel.x, heel.y)) }
  })
  // at the corner between two plates it is on both
  const nearest = Math.min(...offs.map(({ beyond }) => beyond)) + PLACE_TOL_MM
  return Math.min(...offs.filter(({ beyond }) => beyond <= nearest).map(({ off }) => off))
}

/** `axis` stands over the set-out lines by the stand less the drop, and starts on the plate face. */
export function checkPlace(complain: Complain, site: Site, piece: Piece): void {
  const { member } = piece
  if (!isFrameMember(member)) return
  const { spec, surface } = site
  const say: Say = (text, out) => complain({ check: 'place', marks: [member.mark], out, text })
  for (const [name, p] of Object.entries(member.axis)) {
    const slopes =
      member.role === 'ridge' ? [] : member.planes.map((index) => surface.slopes[index]!)
    const heights = slopes.map((slope) => heightOn(slope, p.x, p.y))
    if (slopes.length === 0) heights.push(ownHeight(piece, surface, toOwn(piece.pose, toVec(p))))
    for (const height of heights) {
      const out = p.z - (height + spec.standMm - member.dropMm)
      if (Math.abs(out) <= PLACE_TOL_MM) continue
      say(`axis.${name} is not stand less drop over its slope, mm`, out)
    }
  }
  checkEnds(say, site, piece)
  if (isAlongLine(member)) checkBeside(say, site, piece)
  checkFromValley(say, site, piece)
  if (member.birdsmouth !== null) {
    const heel = member.axis.from
    const out = Math.max(...member.planes.map((index) => offPlates(site, index, heel)))
    if (out > PLACE_TOL_MM) say('its heel is not on the outer plate face, mm', out)
    // the plate's top is at 0; that `axis.from` stands where the roof wants it is looked at above
    const stand = member.birdsmouth.standMm - heel.z
    if (Math.abs(stand) > PLACE_TOL_MM) say('its stand is not its height over plate, mm', stand)
  }
  const backing = backingOfSlopes(piece, surface)
  if (member.backing !== null && backing !== null) {
    const left = member.backing.leftDeg - backing.leftDeg
    const right = member.backing.rightDeg - backing.rightDeg
    const out = Math.abs(left) > Math.abs(right) ? left : right
    if (Math.abs(out) > ANGLE_TOL_DEG) say('its backing is not its slopes’, degrees', out)
  }
}

/** Height of the planed top over the bar's square top edge, `left` of the centre line. */
export function topUp(piece: Piece, left: number): number {
  const { member } = piece
  const { backing } = member
  if (backing === null) return 0
  const deg = left > 0 ? backing.leftDeg : backing.rightDeg
  const middle = member.role === 'valley' ? member.dropMm * cosDeg(member.pitchDeg) : 0
  return Math.min(0, middle - Math.abs(left) * tanDeg(deg))
}

/** No top arris over its own slopes, and none sunk under both of them. */
export function checkTop(complain: Complain, site: Site, piece: Piece): void {
  const { member } = piece
  if (!isFrameMember(member)) return
  const { surface, spec } = site
  const marks = [member.mark]
  const over = (own: Vec): number =>
    toBuilding(piece.pose, own)[2] - ownHeight(piece, surface, own) - spec.standMm
  const half = member.section.thicknessMm / 2
  const along = [0, member.setOutLengthMm]
  const lines = [-half, 0, half].map((left) =>
    along.map((at) => over([at, left, topUp(piece, left)])),
  )
  // over a valley the roof is lowest on the centre line, where no corner of the timber may be
  const proud = Math.max(...piece.own.map(over), ...lines.flat())
  if (proud > TOP_TOL_MM) {
    complain({ check: 'top edge', marks, out: proud, text: 'stands over its own slopes, mm' })
  }
  // where a slope rises away from a hip its side of the top stays square, under that slope
  const rises = (deg: number | undefined): boolean =>
    member.role !== 'valley' && deg !== undefined && deg < 0
  const lies = [
    ...(rises(member.backing?.rightDeg) ? [] : lines[0]!),
    ...(rises(member.backing?.leftDeg) ? [] : lines[2]!),
  ]
  if (member.role === 'valley' && member.backing === null) lies.push(...lines[1]!)
  // a square top touches its slopes by one arris or by its centre line; a planed one lies in both
  const mayHang = isAlongLine(member) && member.backing === null
  const sunk = mayHang ? Math.max(...lies) : Math.min(...lies)
  if (sunk < -TOP_TOL_MM) {
    complain({ check: 'top edge', marks, out: sunk, text: 'lies under its own slopes, mm' })
  }
}
