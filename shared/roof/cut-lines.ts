import { gather } from './lists.ts'
import type { DraftMember } from './members.ts'
import type { Cut, CutLine, Member, MemberRole } from './roof-types.ts'

/** Pieces alike within these are one line of the cut list. */
const alikeMm = 0.1
const alikeDeg = 0.01

/** First letters of the trade terms, in building order. */
const letters: Record<MemberRole, string> = {
  ridge: 'R',
  common: 'C',
  'crown-end': 'CE',
  hip: 'H',
  'broken-hip': 'BH',
  valley: 'V',
  creeper: 'CR',
  'valley-creeper': 'VC',
  'cripple-creeper': 'CC',
  underpurlin: 'UP',
  'collar-tie': 'CT',
  fascia: 'F',
  barge: 'B',
}
const roleOrder = Object.keys(letters)

/** What makes two pieces alike: lengths in `alikeMm`, angles in `alikeDeg`, both as plain numbers. */
type Likeness = { words: string; mm: number[]; deg: number[] }

const sideRanks = { left: -1, none: 0, right: 1 }
const endRanks = { head: 0, foot: 1, tail: 2 }

/** The numbers of a piece as cut, or of its mirror image. */
const likeness = (member: DraftMember, mirror: boolean): Likeness => {
  const turn = mirror ? -1 : 1
  const ranked = member.cuts.map((cut) => ({
    cut,
    end: endRanks[cut.end],
    side: sideRanks[cut.longSide] * turn,
  }))
  ranked.sort((a, b) => a.end - b.end || a.side - b.side || a.cut.alongMm - b.cut.alongMm)
  const { birdsmouth, backing } = member
  const mm = [member.setOutLengthMm, member.cutLengthMm, member.dropMm]
  const deg = [member.pitchDeg]
  if (birdsmouth !== null) mm.push(birdsmouth.heelMm, birdsmouth.seatMm, birdsmouth.heelOffsetMm)
  if (backing !== null) {
    const { leftDeg, rightDeg } = backing
    deg.push(...(mirror ? [rightDeg, leftDeg] : [leftDeg, rightDeg]))
  }
  let words = `${member.role} ${birdsmouth === null}`
  for (const { cut, end, side } of ranked) {
    words += ` ${end}${side}`
    mm.push(cut.alongMm, cut.longPointFromHeelMm, cut.shortPointFromHeelMm)
    deg.push(cut.face.fromEdgeDeg, cut.edge.fromEdgeDeg, cut.bladeTiltDeg)
  }
  return { words, mm, deg }
}

const within = (a: number[], b: number[], tolerance: number) =>
  a.every((value, k) => Math.abs(value - (b[k] ?? Infinity)) <= tolerance)

const alike = (a: Likeness, b: Likeness) =>
  a.words === b.words && within(a.mm, b.mm, alikeMm) && within(a.deg, b.deg, alikeDeg)

type Group = { straight: Likeness; mirrored: Likeness; members: DraftMember[] }

const grouped = (members: DraftMember[]): Group[] => {
  const groups: Group[] = []
  // pieces alike have the same words, straight or mirrored
  const byWords = new Map<string, Group[]>()
  const withWords = (words: string): Group[] => {
    const known = byWords.get(words) ?? []
    byWords.set(words, known)
    return known
  }
  for (const member of members) {
    const straight = likeness(member, false)
    const known = withWords(straight.words)
    const found = known.find((g) => alike(straight, g.straight) || alike(straight, g.mirrored))
    if (found !== undefined) {
      found.members.push(member)
      continue
    }
    const group = { straight, mirrored: likeness(member, true), members: [member] }
    groups.push(group)
    known.push(group)
    if (group.mirrored.words !== straight.words) withWords(group.mirrored.words).push(group)
  }
  return groups
}

/** a, b … z, aa, ab …: which piece of its line a member is. */
export const suffix = (place: number): string => {
  const letter = String.fromCharCode(97 + (place % 26))
  return place < 26 ? letter : suffix(Math.floor(place / 26) - 1) + letter
}

type MarkedMembers = { members: Member[]; cutLines: CutLine[]; markOf: Map<number, string> }

const finished = (draft: DraftMember, markOf: Map<number, string>): Member => {
  const mark = (piece: number) => markOf.get(piece) ?? ''
  return {
    mark: mark(draft.piece.id),
    role: draft.role,
    topInSlope: draft.topInSlope,
    hand: draft.hand,
    section: draft.section,
    axis: draft.axis,
    riseMm: draft.riseMm,
    runMm: draft.runMm,
    pitchDeg: draft.pitchDeg,
    setOutLengthMm: draft.setOutLengthMm,
    headDeductionMm: draft.headDeductionMm,
    footDeductionMm: draft.footDeductionMm,
    tailLengthMm: draft.tailLengthMm,
    cutLengthMm: draft.cutLengthMm,
    cuts: draft.cuts.map((cut) => finishedCut(cut, mark)),
    birdsmouth: draft.birdsmouth,
    backing: draft.backing,
    dropMm: draft.dropMm,
    planes: draft.planes,
    weightKg: draft.weightKg,
  }
}

const finishedCut = (cut: DraftMember['cuts'][number], mark: (piece: number) => string): Cut => {
  const [against, ...alsoAgainst] = cut.bears.map(mark)
  return {
    end: cut.end,
    plane: cut.plane,
    against: against ?? null,
    alsoAgainst,
    alongMm: cut.alongMm,
    longSide: cut.longSide,
    longPointFromHeelMm: cut.longPointFromHeelMm,
    shortPointFromHeelMm: cut.shortPointFromHeelMm,
    face: cut.face,
    edge: cut.edge,
    edgeOtherTop: cut.edgeOtherTop,
    bladeTiltDeg: cut.bladeTiltDeg,
    pastSaw: cut.pastSaw,
  }
}

/**
 * Marks all members and gathers those alike, mirror images too, into cut lines: the trade term's first
 * letters and a number, longest first (`CR3`). A line's mark is painted on the timber; its members
 * are `CR3a`, `CR3b` …, a single piece is plain `CR3`.
 */
export const markMembers = (drafts: DraftMember[]): MarkedMembers => {
  const groups = grouped(drafts).sort((a, b) => {
    const [x, y] = [a.members[0], b.members[0]]
    if (x === undefined || y === undefined) return 0
    const order = roleOrder.indexOf(x.role) - roleOrder.indexOf(y.role)
    return order || y.cutLengthMm - x.cutLengthMm || x.piece.id - y.piece.id
  })
  const counts = new Map<MemberRole, number>()
  const markOf = new Map<number, string>()
  const cutLines = gather(groups, ({ members }): CutLine[] => {
    const [first] = members
    if (first === undefined) return []
    const number = (counts.get(first.role) ?? 0) + 1
    counts.set(first.role, number)
    const mark = `${letters[first.role]}${number}`
    const marks = members.map((member, k) => {
      const own = members.length === 1 ? mark : mark + suffix(k)
      markOf.set(member.piece.id, own)
      return own
    })
    return [
      {
        mark,
        role: first.role,
        section: { ...first.section },
        cutLengthMm: first.cutLengthMm,
        quantity: members.length,
        left: members.filter((m) => m.hand === 'left').length,
        right: members.filter((m) => m.hand === 'right').length,
        members: marks,
      },
    ]
  })
  const members = gather(groups, (group) => group.members.map((draft) => finished(draft, markOf)))
  return { members, cutLines, markOf }
}
