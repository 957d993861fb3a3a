import { pieceHand } from '../drawing/timber-hand.ts'
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
  const hand = pieceHand(member)
  const { left, right } = handCounts(alike)
  if (lyingRoles.has(member.role)) return lyingWords(spec, line, member)
  if (!hand) return 'No left or right, bow up.'
  const point = hand.end === 'head' ? 'long point' : "foot's long point"
  const up = `looking up the ${upWhat(member.role)}`
  if (left > 0 && right > 0)
    return `Left hand: ${point} on the left ${up}, bow up. Right hand: the same, mirrored.`
  return `${capital(point)} on the ${hand.side} ${up}, bow up.`
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
  const up = member.role === 'fascia' ? 'top edge up' : 'bow up'
  return `${place}Left and right looking along it from foot to head, ${up}.`
}

function upWhat(role: MemberRole): string {
  if (role === 'hip' || role === 'broken-hip') return 'hip'
  if (role === 'valley') return 'valley'
  return role === 'barge' ? 'barge' : 'rafter'
}

function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1)
}
