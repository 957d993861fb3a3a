import type { FrameSpec, Member } from '../../../shared/roof/roof-types.ts'

/** Cut lines by the marks' stems: C1a and C1b are pieces of C1. */
export function cutLinesOf(members: readonly Member[]): FrameSpec['cutLines'] {
  const stemOf = (member: Member): string => member.mark.replace(/[a-z]+$/, '')
  return [...new Set(members.map(stemOf))].map((mark) => {
    const alike = members.filter((member) => stemOf(member) === mark)
    const first = alike[0]!
    return {
      mark,
      role: first.role,
      section: first.section,
      cutLengthMm: first.cutLengthMm,
      quantity: alike.length,
      left: alike.filter(({ hand }) => hand === 'left').length,
      right: alike.filter(({ hand }) => hand === 'right').length,
      members: alike.map((member) => member.mark),
    }
  })
}

/** A spec of given members and nothing else: no lines, no totals, no cautions. */
export const bareSpec = (members: Member[], changes: Partial<FrameSpec> = {}): FrameSpec => ({
  standMm: 110,
  planes: [],
  lines: [],
  members,
  cutLines: cutLinesOf(members),
  totals: {
    roofAreaM2: 0,
    roofAreaWithEavesM2: 0,
    ridgeMm: 0,
    hipMm: 0,
    valleyMm: 0,
    eaveMm: 0,
    vergeMm: 0,
    bySection: [],
  },
  cautions: [],
  planing: [],
  rounding: { worstMm: 0, joint: null },
  ...changes,
})
