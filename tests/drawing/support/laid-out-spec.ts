import type { Cut, FrameSpec, Member, MemberRole, Point3 } from '../../../shared/roof/roof-types.ts'
import { bareSpec } from '../../roof/support/bare-spec.ts'
import type { ReferenceRoof } from '../../roof/support/roofs.ts'

/**
 * A frame laid out on the lines of a reference roof (tests/fixtures/roofs.json) by the tests alone: hips,
 * valleys and ridges along their lines, rafters square to the plates. Its ends are square plumb cuts; it
 * is for drawings of any plan, not for a saw.
 */
export function laidOutSpec(reference: ReferenceRoof, spacingMm = 600): FrameSpec {
  const marks = markMaker()
  const members = [
    ...reference.lines.flatMap((line) => lineMember(line, marks)),
    ...rafters(reference, spacingMm, marks),
  ]
  return bareSpec(members, {
    lines: reference.lines.map((line) => ({
      kind: line.kind.replace(' ', '-') as FrameSpec['lines'][number]['kind'],
      from: pointOf(line.frm),
      to: pointOf(line.to),
      planLengthMm: line.plan_length_mm,
      trueLengthMm: line.true_length_mm,
      pitchDeg: line.pitch_deg,
      planes: [],
    })),
  })
}

type Line = ReferenceRoof['lines'][number]
type Marks = (role: MemberRole) => string

const letters: Partial<Record<MemberRole, string>> = {
  ridge: 'R',
  hip: 'H',
  'broken-hip': 'BH',
  valley: 'V',
  common: 'C',
  creeper: 'CR',
  'valley-creeper': 'VC',
  'cripple-creeper': 'CC',
}

function markMaker(): Marks {
  const counts = new Map<MemberRole, number>()
  return (role) => {
    const count = (counts.get(role) ?? 0) + 1
    counts.set(role, count)
    return `${letters[role] ?? role}${Math.ceil(count / 2)}${count % 2 ? 'a' : 'b'}`
  }
}

const pointOf = ([x, y, z]: number[]): Point3 => ({ x: x!, y: y!, z: z! })

function lineMember(line: Line, marks: Marks): Member[] {
  if (line.kind === 'verge') return []
  const role = line.kind.replace(' ', '-') as MemberRole
  const tailMm = role === 'hip' || role === 'valley' ? 600 : 0
  return [memberOf(role, marks(role), pointOf(line.frm), pointOf(line.to), tailMm)]
}

type Crossing = { inwardMm: number; kind: string; z: number }

/** Square lines of each eave, every spacing, between the lines that they cross. */
function rafters(reference: ReferenceRoof, spacingMm: number, marks: Marks): Member[] {
  const outline = reference.outline_mm
  return outline.flatMap((corner, e) => {
    if (typeof reference.edges[e] === 'string') return []
    const [ax, ay] = corner as [number, number]
    const [bx, by] = outline[(e + 1) % outline.length] as [number, number]
    const length = Math.hypot(bx - ax, by - ay)
    const along = { x: (bx - ax) / length, y: (by - ay) / length }
    const inward = { x: -along.y, y: along.x }
    const lines = reference.lines.filter((line) => line.edges.includes(e))
    const found: Member[] = []
    for (let s = spacingMm / 2 + 7; s < length; s += spacingMm) {
      const at = { x: ax + along.x * s, y: ay + along.y * s }
      const above = lines
        .flatMap((line) => crossing(line, at, along, inward))
        .sort((a, b) => a.inwardMm - b.inwardMm)
      const stops: Crossing[] = [{ inwardMm: 0, kind: 'plate', z: 0 }, ...above]
      for (let i = 0; i + 1 < stops.length; i += 2) {
        const low = stops[i]!
        const high = stops[i + 1]!
        if (high.inwardMm - low.inwardMm < 300) continue
        const point = ({ inwardMm, z }: Crossing): Point3 => ({
          x: at.x + inward.x * inwardMm,
          y: at.y + inward.y * inwardMm,
          z,
        })
        const role = roleBetween(low.kind, high.kind)
        const tailMm = low.kind === 'plate' ? 490 : 0
        found.push(memberOf(role, marks(role), point(low), point(high), tailMm))
      }
    }
    return found
  })
}

function crossing(
  line: Line,
  at: { x: number; y: number },
  along: { x: number; y: number },
  inward: { x: number; y: number },
): Crossing[] {
  const offset = ([x, y]: number[]) => (x! - at.x) * along.x + (y! - at.y) * along.y
  const from = offset(line.frm)
  const to = offset(line.to)
  if (from * to >= 0) return []
  const share = from / (from - to)
  const mix = (i: number) => line.frm[i]! + (line.to[i]! - line.frm[i]!) * share
  const inwardMm = (mix(0) - at.x) * inward.x + (mix(1) - at.y) * inward.y
  return inwardMm > 1 ? [{ inwardMm, kind: line.kind, z: mix(2) }] : []
}

function roleBetween(low: string, high: string): MemberRole {
  if (low === 'valley') return high === 'ridge' ? 'valley-creeper' : 'cripple-creeper'
  return high === 'ridge' ? 'common' : 'creeper'
}

/** A timber from point to point, its ends square plumb cuts. */
function memberOf(
  role: MemberRole,
  mark: string,
  from: Point3,
  to: Point3,
  tailMm: number,
): Member {
  const runMm = Math.hypot(to.x - from.x, to.y - from.y)
  const riseMm = to.z - from.z
  const lengthMm = Math.hypot(runMm, riseMm)
  const pitchDeg = (Math.atan2(riseMm, runMm) * 180) / Math.PI
  const ahead = { x: (to.x - from.x) / runMm, y: (to.y - from.y) / runMm, z: 0 }
  const cut = (end: Cut['end'], alongMm: number): Cut => {
    const share = alongMm / lengthMm
    const sign = end === 'head' ? 1 : -1
    return {
      end,
      plane: {
        point: {
          x: from.x + (to.x - from.x) * share,
          y: from.y + (to.y - from.y) * share,
          z: from.z + riseMm * share,
        },
        normal: { x: sign * ahead.x, y: sign * ahead.y, z: 0 },
      },
      against: null,
      alsoAgainst: [],
      alongMm,
      longSide: 'none',
      longPointFromHeelMm: alongMm,
      shortPointFromHeelMm: alongMm,
      face: { fromEdgeDeg: 90 - pitchDeg, fromSquareDeg: pitchDeg },
      edge: { fromEdgeDeg: 90, fromSquareDeg: 0 },
      edgeOtherTop: null,
      bladeTiltDeg: 0,
      pastSaw: false,
    }
  }
  return {
    mark,
    role,
    hand: null,
    section: { thicknessMm: 45, depthMm: 140 },
    axis: { from, to },
    riseMm,
    runMm,
    pitchDeg,
    setOutLengthMm: lengthMm,
    headDeductionMm: 0,
    footDeductionMm: 0,
    tailLengthMm: tailMm,
    cutLengthMm: lengthMm + tailMm,
    cuts: [
      cut('head', lengthMm - 20),
      cut(tailMm > 0 ? 'tail' : 'foot', tailMm > 0 ? -tailMm : 20),
    ],
    birdsmouth: null,
    backing: null,
    dropMm: 0,
    planes: [],
    weightKg: 0,
  }
}
