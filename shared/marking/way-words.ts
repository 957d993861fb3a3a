import { footSide, pieceHand } from '../drawing/timber-hand.ts'
import { endCuts } from '../drawing/timber-shape.ts'
import type { CutLine, FrameSpec, Member, MemberRole } from '../roof/roof-types.ts'
import { ridgeWayWords } from './ridge-words.ts'
import { handCounts, piecesWords } from './role-words.ts'

/** Which way round a line's pieces are cut, and which way to look at them. */
export function wayWords(
  spec: FrameSpec,
  line: CutLine,
  member: Member,
  alike: readonly Member[],
): string {
  if (member.role === 'ridge') return ridgeWayWords(spec, member)
  const points = longPoints(member)
  if (points === null) return `No left or right, ${edgeUp(member.role)}.`
  if (lyingRoles.has(member.role)) return lyingWords(spec, line, member)
  const { left, right } = handCounts(alike)
  const words = `${points} looking up the ${upWhat(member.role)}, ${edgeUp(member.role)}`
  if (left > 0 && right > 0) return `Left hand: ${words}. Right hand: the same, mirrored.`
  return `${capital(words)}.`
}

/** "long point on the left"; both ends' where both have one, for they may be on different sides. */
function longPoints(member: Member): string | null {
  const hand = pieceHand(member)
  const foot = isTailOnly(member) ? null : footSide(member)
  if (!hand) return null
  if (hand.end === 'foot') return `foot's long point on the ${hand.side}`
  if (!foot) return `long point on the ${hand.side}`
  if (foot === hand.side) return `long points of head and foot on the ${foot}`
  return `head's long point on the ${hand.side}, foot's on the ${foot},`
}

/** A hip's or valley's tail follows its two eaves and is told by its own points. */
function isTailOnly({ role }: Member): boolean {
  return role === 'hip' || role === 'valley'
}

function edgeUp(role: MemberRole): string {
  return role === 'fascia' || role === 'barge' ? 'top edge up' : 'bow up'
}

/** Timbers that lie along or across the roof: neither end is up. */
const lyingRoles: ReadonlySet<MemberRole> = new Set(['underpurlin', 'collar-tie', 'fascia'])

/** Both ends look alike on the trestles, so one is named by what it meets. */
function lyingWords(spec: FrameSpec, line: CutLine, member: Member): string {
  const metAt = (end: 'head' | 'foot') => {
    const marks = endCuts(member, end).flatMap((cut) => [cut.against, ...cut.alsoAgainst])
    return spec.members.filter((one) => marks.includes(one.mark))
  }
  const whose = line.members.length > 1 ? ` of ${member.mark}` : ''
  const named = (['foot', 'head'] as const).find((end) => metAt(end).length > 0)
  const place = named ? `${capital(named)}${whose}: the end at ${piecesWords(metAt(named))}. ` : ''
  return `${place}Left and right looking along it from foot to head, ${edgeUp(member.role)}.`
}

function upWhat(role: MemberRole): string {
  if (role === 'hip' || role === 'broken-hip') return 'hip'
  if (role === 'valley') return 'valley'
  return role === 'barge' ? 'barge' : 'rafter'
}

function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1)
}
