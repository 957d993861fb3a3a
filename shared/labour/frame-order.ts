import type { FrameSpec, Member, MemberRole } from '../roof/roof-types.ts'

const planDistance = (a: { x: number; y: number }, b: { x: number; y: number }): number =>
  Math.hypot(a.x - b.x, a.y - b.y)

const headAgainst = (member: Member): string =>
  member.cuts.find((cut) => cut.end === 'head')?.against ?? ''

export function marksOf(spec: FrameSpec, ...roles: MemberRole[]): Set<string> {
  return new Set(spec.members.filter((m) => roles.includes(m.role)).map((m) => m.mark))
}

/**
 * The commons that hold a ridge while the rest are stood: at each end of each ridge, on each of its slopes,
 * the one nearest the end.
 */
export function centringCommons(spec: FrameSpec): Set<string> {
  const commons = spec.members.filter((m) => m.role === 'common')
  const marks = new Set<string>()
  for (const ridge of spec.members.filter((m) => m.role === 'ridge')) {
    const onRidge = commons.filter((m) => headAgainst(m) === ridge.mark)
    for (const end of [ridge.axis.from, ridge.axis.to]) {
      for (const plane of ridge.planes) {
        const nearest = onRidge
          .filter((m) => m.planes.includes(plane))
          .sort((a, b) => planDistance(a.axis.to, end) - planDistance(b.axis.to, end))[0]
        if (nearest) marks.add(nearest.mark)
      }
    }
  }
  return marks
}

/**
 * Two alike rafters to cut and try before the rest: a pair of commons facing each other where there is one,
 * else any two alike, else one. Without commons, crown ends serve.
 */
export function firstPair(spec: FrameSpec): string[] {
  const role: MemberRole = spec.members.some((m) => m.role === 'common') ? 'common' : 'crown-end'
  const byMark = new Map(spec.members.map((m) => [m.mark, m]))
  const lines = spec.cutLines
    .filter((line) => line.role === role)
    .sort((a, b) => b.quantity - a.quantity)
  const centring = centringCommons(spec)
  for (const line of lines) {
    const members = line.members.flatMap((mark) => byMark.get(mark) ?? [])
    const first = members.find((m) => centring.has(m.mark)) ?? members[0]
    const facing = members
      .filter((m) => m !== first && !m.planes.some((p) => first?.planes.includes(p)))
      .sort((a, b) =>
        first ? planDistance(a.axis.to, first.axis.to) - planDistance(b.axis.to, first.axis.to) : 0,
      )[0]
    if (first && facing) return [first.mark, facing.mark]
  }
  return lines[0]?.members.slice(0, 2) ?? []
}

/** Marks of a line so that opposed pieces follow one another: by what they meet, left then right. */
export function inOpposedPairs(spec: FrameSpec, marks: readonly string[]): string[] {
  const byMark = new Map(spec.members.map((m) => [m.mark, m]))
  const keyOf = (mark: string): string => {
    const member = byMark.get(mark)
    return member ? `${headAgainst(member)} ${member.hand ?? ''}` : ''
  }
  return [...marks].sort((a, b) => (keyOf(a) < keyOf(b) ? -1 : keyOf(a) > keyOf(b) ? 1 : 0))
}
