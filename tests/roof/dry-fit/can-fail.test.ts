import { beforeAll, describe, expect, test } from 'vitest'

import { frameRoof } from '../../../shared/roof/frame-roof.ts'
import type { Cut, FrameSpec, Member, MemberRole } from '../../../shared/roof/roof-types.ts'
import { makeRoof } from '../support/roofs.ts'
import { reportLines } from './report.ts'
import { loadSolidKit, type SolidKit } from './solid-kit.ts'
import { dryFit } from './stand-up.ts'

/** A dry fit that never complains proves nothing: one published number is bent at a time. */
const BEND_MM = 1
const BEND_DEG = 0.5

const roof = makeRoof(
  [
    [0, 0],
    [5400, 0],
    [5400, 4200],
    [0, 4200],
  ],
  [25, 25, 25, 25],
  { maxSpacingMm: 900 },
)

let kit: SolidKit
let sound: FrameSpec
beforeAll(async () => {
  kit = await loadSolidKit()
  sound = frameRoof(roof)
})

const head = (member: Member): Cut => member.cuts.find((cut) => cut.end === 'head')!
const tail = (member: Member): Cut => member.cuts.find((cut) => cut.end === 'tail')!

type Bend = [field: string, role: MemberRole, bend: (member: Member) => void]
type SpecBend = [field: string, bend: (spec: FrameSpec) => void]

/** Every number by 1 mm or 0.5°, on the role where it matters most. */
const bends: Bend[] = [
  ['section.thicknessMm', 'common', (m) => (m.section.thicknessMm += BEND_MM)],
  ['section.depthMm', 'common', (m) => (m.section.depthMm += BEND_MM)],
  ['axis.from.x', 'crown-end', (m) => (m.axis.from.x += BEND_MM)],
  ['axis.from.z', 'common', (m) => (m.axis.from.z += BEND_MM)],
  ['axis.to.z', 'hip', (m) => (m.axis.to.z += BEND_MM)],
  ['riseMm', 'common', (m) => (m.riseMm += BEND_MM)],
  ['runMm', 'creeper', (m) => (m.runMm += BEND_MM)],
  ['pitchDeg', 'hip', (m) => (m.pitchDeg += BEND_DEG)],
  ['setOutLengthMm', 'creeper', (m) => (m.setOutLengthMm += BEND_MM)],
  ['headDeductionMm', 'hip', (m) => (m.headDeductionMm += BEND_MM)],
  ['headDeductionMm', 'ridge', (m) => (m.headDeductionMm += BEND_MM)],
  ['footDeductionMm', 'ridge', (m) => (m.footDeductionMm += BEND_MM)],
  ['tailLengthMm', 'common', (m) => (m.tailLengthMm += BEND_MM)],
  ['cutLengthMm', 'hip', (m) => (m.cutLengthMm += BEND_MM)],
  ['dropMm', 'ridge', (m) => (m.dropMm += BEND_MM)],
  ['backing.leftDeg', 'hip', (m) => (m.backing!.leftDeg += BEND_DEG)],
  ['backing.rightDeg', 'hip', (m) => (m.backing!.rightDeg -= BEND_DEG)],
  ['weightKg', 'common', (m) => (m.weightKg *= 1.05)],
  ['hand', 'creeper', (m) => (m.hand = m.hand === 'left' ? 'right' : 'left')],
  ['birdsmouth.seatMm', 'common', (m) => (m.birdsmouth!.seatMm += BEND_MM)],
  ['birdsmouth.heelMm', 'common', (m) => (m.birdsmouth!.heelMm += BEND_MM)],
  ['birdsmouth.depthMm', 'common', (m) => (m.birdsmouth!.depthMm += BEND_MM)],
  ['birdsmouth.standMm', 'hip', (m) => (m.birdsmouth!.standMm += BEND_MM)],
  ['birdsmouth.bearingMm', 'hip', (m) => (m.birdsmouth!.bearingMm += BEND_MM)],
  ['birdsmouth.heelOffsetMm', 'hip', (m) => (m.birdsmouth!.heelOffsetMm += BEND_MM)],
  ['birdsmouth.seatFromEdgeDeg', 'common', (m) => (m.birdsmouth!.seatFromEdgeDeg += BEND_DEG)],
  ['birdsmouth.heelFromEdgeDeg', 'common', (m) => (m.birdsmouth!.heelFromEdgeDeg += BEND_DEG)],
  ['head alongMm', 'hip', (m) => (head(m).alongMm += BEND_MM)],
  ['head alongMm', 'creeper', (m) => (head(m).alongMm -= BEND_MM)],
  ['head face angle', 'hip', (m) => (head(m).face.fromEdgeDeg += BEND_DEG)],
  ['head edge angle', 'hip', (m) => (head(m).edge.fromEdgeDeg += BEND_DEG)],
  ['head edge angle', 'creeper', (m) => (head(m).edge.fromEdgeDeg -= BEND_DEG)],
  ['head edge angle from square', 'creeper', (m) => (head(m).edge.fromSquareDeg += BEND_DEG)],
  ['head edge angle, other top', 'hip', (m) => (head(m).edgeOtherTop!.fromEdgeDeg += BEND_DEG)],
  ['head long side', 'creeper', (m) => (head(m).longSide = swap(head(m).longSide))],
  ['head long point', 'creeper', (m) => (head(m).longPointFromHeelMm += BEND_MM)],
  ['head short point', 'hip', (m) => (head(m).shortPointFromHeelMm += BEND_MM)],
  ['head blade tilt', 'creeper', (m) => (head(m).bladeTiltDeg += BEND_DEG)],
  ['head past the saw', 'hip', (m) => (head(m).pastSaw = !head(m).pastSaw)],
  ['head against', 'common', (m) => (head(m).against = m.mark)],
  ['tail alongMm', 'common', (m) => (tail(m).alongMm -= BEND_MM)],
  ['tail face angle', 'hip', (m) => (tail(m).face.fromEdgeDeg += BEND_DEG)],
  ['tail edge angle', 'hip', (m) => (tail(m).edge.fromEdgeDeg += BEND_DEG)],
]

const specBends: SpecBend[] = [
  ['standMm', (spec) => (spec.standMm += BEND_MM)],
  ['worst error by rounding', (spec) => (spec.rounding.worstMm += 0.1)],
  ['planing', (spec) => (spec.planing[0]!.offMm += BEND_MM)],
  ['planing left out', (spec) => spec.planing.pop()],
  ['quantity of a cut line', (spec) => (spec.cutLines[0]!.quantity += 1)],
  ['length of a cut line', (spec) => (spec.cutLines[0]!.cutLengthMm += BEND_MM)],
  ['hands of a cut line', (spec) => (spec.cutLines.at(-1)!.left += 1)],
  ['roof area', (spec) => (spec.totals.roofAreaM2 += 0.1)],
  ['ridge in all', (spec) => (spec.totals.ridgeMm += BEND_MM)],
  ['hips in all', (spec) => (spec.totals.hipMm += BEND_MM)],
  ['length of a section', (spec) => (spec.totals.bySection[0]!.lengthMm += BEND_MM)],
  ['a mark used twice', (spec) => (spec.members[0]!.mark = spec.members[1]!.mark)],
  ['a rafter left out', (spec) => spec.members.splice(spec.members.findIndex(isCommon), 1)],
]

function isCommon(member: Member): boolean {
  return member.role === 'common'
}

function swap(side: Cut['longSide']): Cut['longSide'] {
  return side === 'left' ? 'right' : 'left'
}

describe('the dry fit complains of a bent number', () => {
  test('and not of a sound spec', () => {
    expect(reportLines(dryFit(kit, roof, sound))).toEqual([])
  })

  test.each(bends)('%s of a %s, and names it', (_field, role, bend) => {
    const spec = structuredClone(sound)
    const member = spec.members.find((m) => m.role === role)!
    bend(member)
    const named = dryFit(kit, roof, spec).filter((c) => c.marks.includes(member.mark))
    expect(named).not.toEqual([])
  })

  test.each(specBends)('%s of the spec', (_field, bend) => {
    const spec = structuredClone(sound)
    bend(spec)
    expect(dryFit(kit, roof, spec)).not.toEqual([])
  })
})
