import type { FrameSpec, Section } from '../../../shared/roof/roof-types.ts'
import type { Piece } from './rebuild-member.ts'
import type { Complain } from './report.ts'

const ALIKE_MM = 0.1
const SUM_TOL = 0.01
const MM3_PER_M3 = 1e9
/** Two ways to one figure. */
const SAME_SHARE = 1e-6

const isSection = (a: Section, b: Section): boolean =>
  a.thicknessMm === b.thicknessMm && a.depthMm === b.depthMm

/** The cut list holds every member once, and its lengths, hands and counts are the members'. */
function checkCutLines(complain: Complain, spec: FrameSpec): void {
  const say = (mark: string, text: string, out = 0): void =>
    complain({ check: 'numbers', marks: [mark], out, text })
  const listed = spec.cutLines.flatMap((line) => line.members)
  for (const { mark } of spec.members) {
    const times = listed.filter((m) => m === mark).length
    if (times !== 1) say(mark, 'times in the cut list', times)
  }
  for (const line of spec.cutLines) {
    const members = spec.members.filter((m) => line.members.includes(m.mark))
    if (line.quantity !== members.length) say(line.mark, 'quantity of its cut line', line.quantity)
    for (const hand of ['left', 'right'] as const) {
      const count = members.filter((m) => m.hand === hand).length
      if (line[hand] !== count) say(line.mark, `${hand} hands of its cut line`, line[hand])
    }
    for (const member of members) {
      const out = member.cutLengthMm - line.cutLengthMm
      if (Math.abs(out) > ALIKE_MM) say(member.mark, `longer than its cut line ${line.mark}`, out)
      if (member.role !== line.role) say(member.mark, `not the role of its cut line ${line.mark}`)
      if (!isSection(member.section, line.section)) {
        say(member.mark, `not the section of its cut line ${line.mark}`)
      }
    }
  }
}

function checkTotals(complain: Complain, spec: FrameSpec): void {
  const near = (text: string, found: number, wanted: number): void => {
    if (Math.abs(found - wanted) <= SUM_TOL) return
    complain({ check: 'numbers', marks: ['totals'], out: found - wanted, text })
  }
  const sum = (values: number[]): number => values.reduce((a, b) => a + b, 0)
  for (const total of spec.totals.bySection) {
    const { section, pieces, lengthMm, weightKg } = total
    const members = spec.members.filter((m) => isSection(m.section, section))
    const name = `${section.thicknessMm} × ${section.depthMm}`
    near(`pieces of ${name}`, pieces, members.length)
    near(`length of ${name}`, lengthMm, sum(members.map((m) => m.cutLengthMm)))
    near(`weight of ${name}`, weightKg, sum(members.map((m) => m.weightKg)))
  }
  near('pieces in all', sum(spec.totals.bySection.map((t) => t.pieces)), spec.members.length)
  const along = (...kinds: string[]): number =>
    sum(spec.lines.filter((l) => kinds.includes(l.kind)).map((l) => l.trueLengthMm))
  near('ridge', spec.totals.ridgeMm, along('ridge'))
  near('hips', spec.totals.hipMm, along('hip', 'broken-hip'))
  near('valleys', spec.totals.valleyMm, along('valley'))
  near('eaves', spec.totals.eaveMm, along('eave'))
  near('verges', spec.totals.vergeMm, along('verge'))
  near('roof area', spec.totals.roofAreaM2, sum(spec.planes.map((p) => p.areaM2)))
  const withEaves = sum(spec.planes.map((p) => p.areaWithEavesM2))
  near('roof area with eaves', spec.totals.roofAreaWithEavesM2, withEaves)
}

/** A piece is charged and carried as the bar it is cut from; what is sawn off weighs nothing extra. */
export function checkWeight(complain: Complain, piece: Piece, densityKgM3: number): void {
  const { section, cutLengthMm, weightKg, mark } = piece.member
  const bar = (section.thicknessMm * section.depthMm * cutLengthMm * densityKgM3) / MM3_PER_M3
  const finished = (piece.solid.volume() * densityKgM3) / MM3_PER_M3
  if (Math.abs(weightKg - bar) <= bar * SAME_SHARE && finished <= bar * (1 + SAME_SHARE)) return
  const text = `weighs ${weightKg.toFixed(3)} kg; its bar ${bar.toFixed(3)}, finished ${finished.toFixed(3)}`
  complain({ check: 'numbers', marks: [mark], out: weightKg - bar, text })
}

export function checkLists(complain: Complain, spec: FrameSpec): void {
  checkCutLines(complain, spec)
  checkTotals(complain, spec)
}
