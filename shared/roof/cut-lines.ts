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
}
const roleOrder = Object.keys(letters)

/** What makes two pieces alike: lengths in `alikeMm`, angles in `alikeDeg`, both as plain numbers. */
type Likeness = { words: string; mm: number[]; deg: number[] }

const flipped = (side: 'left' | 'right' | 'none', mirror: boolean) =>
  !mirror || side === 'none' ? side : side === 'left' ? 'right' : 'left'

const sideRank = { left: 0, none: 1, right: 2 }

/** The numbers of a piece as cut, or of its mirror image. */
const likeness = (member: DraftMember, mirror: boolean): Likeness => {
  const ends: Cut['end'][] = ['head', 'foot', 'tail']
  const cuts = member.cuts
    .map((cut) => ({ ...cut, longSide: flipped(cut.longSide, mirror) }))
    .sort(
      (a, b) =>
        ends.indexOf(a.end) - ends.indexOf(b.end) ||
        sideRank[a.longSide] - sideRank[b.longSide] ||
        a.alongMm - b.alongMm,
    )
  const mouth = member.birdsmouth
  const backing = member.backing
  const sides = backing === null ? [] : [backing.leftDeg, backing.rightDeg]
  return {
    words: [member.role, mouth === null, ...cuts.map((cut) => cut.end + cut.longSide)].join(),
    mm: [
      member.setOutLengthMm,
      member.cutLengthMm,
      member.dropMm,
      ...(mouth === null ? [] : [mouth.heelMm, mouth.seatMm, mouth.heelOffsetMm]),
      ...cuts.flatMap((c) => [c.alongMm, c.longPointFromHeelMm, c.shortPointFromHeelMm]),
    ],
    deg: [
      member.pitchDeg,
      ...(mirror ? sides.reverse() : sides),
      ...cuts.flatMap((c) => [c.face.fromEdgeDeg, c.edge.fromEdgeDeg, c.bladeTiltDeg]),
    ],
  }
}

const within = (a: number[], b: number[], tolerance: number) =>
  a.every((value, k) => Math.abs(value - (b[k] ?? Infinity)) <= tolerance)

const alike = (a: Likeness, b: Likeness) =>
  a.words === b.words && within(a.mm, b.mm, alikeMm) && within(a.deg, b.deg, alikeDeg)

type Group = { first: Likeness; members: DraftMember[] }

const grouped = (members: DraftMember[]): Group[] => {
  const groups: Group[] = []
  for (const member of members) {
    const straight = likeness(member, false)
    const mirrored = likeness(member, true)
    const found = groups.find((g) => alike(straight, g.first) || alike(mirrored, g.first))
    if (found === undefined) groups.push({ first: straight, members: [member] })
    else found.members.push(member)
  }
  return groups
}

/** a, b … z, aa, ab …: which piece of its line a member is. */
export const suffix = (place: number): string => {
  const letter = String.fromCharCode(97 + (place % 26))
  return place < 26 ? letter : suffix(Math.floor(place / 26) - 1) + letter
}

export type MarkedMembers = { members: Member[]; cutLines: CutLine[]; markOf: Map<number, string> }

const finished = (member: DraftMember, markOf: Map<number, string>): Member => {
  const mark = (piece: number) => markOf.get(piece) ?? ''
  const { piece, timber: _timber, cuts, ...numbers } = member
  return {
    mark: mark(piece.id),
    ...numbers,
    cuts: cuts.map(({ bears, listed: _listed, ...cut }) => {
      const [first, ...rest] = bears.map(mark)
      return { ...cut, against: first ?? null, alsoAgainst: rest }
    }),
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
  const cutLines = groups.flatMap(({ members }): CutLine[] => {
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
  const order = new Map(drafts.map((draft) => [draft.piece.id, draft]))
  const members = groups.flatMap((group) =>
    group.members.flatMap((m) => {
      const draft = order.get(m.piece.id)
      return draft === undefined ? [] : [finished(draft, markOf)]
    }),
  )
  return { members, cutLines, markOf }
}
