import { beforeAll, describe, expect, test } from 'vitest'

import { frameRoof } from '../../../shared/roof/frame-roof.ts'
import type { FrameSpec, Member } from '../../../shared/roof/roof-types.ts'
import { makeRoof } from '../support/roofs.ts'
import { collector, reportLines, type Complaint } from './report.ts'
import { standUp, takeDown } from './site.ts'
import { loadSolidKit, type SolidKit } from './solid-kit.ts'
import { checkWhole, dryFit } from './stand-up.ts'

/** What a spec says of the whole roof, bent one figure at a time. */
const roof = makeRoof(
  [
    [0, 0],
    [7600, 0],
    [7600, 4200],
    [3600, 4200],
    [3600, 7000],
    [0, 7000],
  ],
  [25, 25, 25, 25, 'gable', 25],
  { maxSpacingMm: 900 },
)

let kit: SolidKit
let sound: FrameSpec
beforeAll(async () => {
  kit = await loadSolidKit()
  sound = frameRoof(roof)
})

const isCommon = (member: Member): boolean => member.role === 'common'
const isValleyCreeper = (member: Member): boolean => member.role === 'valley-creeper'
const leaveOut = (spec: FrameSpec, which: (member: Member) => boolean): void => {
  spec.members.splice(spec.members.findIndex(which), 1)
}

/** The whole dry fit where timber has to be looked at, else what needs none. */
function judged(spec: FrameSpec, check: Complaint['check']): Complaint[] {
  if (['place', 'planing'].includes(check)) return dryFit(kit, roof, spec)
  const { complain, complaints } = collector()
  const site = standUp(kit, roof, spec)
  checkWhole(complain, site)
  takeDown(site)
  return complaints
}

type SpecBend = [field: string, check: Complaint['check'], bend: (spec: FrameSpec) => void]
const bends: SpecBend[] = [
  ['height over plate', 'place', (spec) => (spec.standMm += 1)],
  ['pitch of a slope', 'surface', (spec) => (spec.planes[0]!.pitchDeg += 0.5)],
  ['area of a slope', 'surface', (spec) => (spec.planes[0]!.areaM2 += 0.01)],
  ['corner of a slope, across', 'surface', (spec) => (spec.planes[0]!.polygon[2]!.x += 1)],
  ['corner of a slope, up', 'surface', (spec) => (spec.planes[0]!.polygon[2]!.z += 1)],
  ['length of a line in plan', 'surface', (spec) => (spec.lines[0]!.planLengthMm += 1)],
  ['true length of a line', 'surface', (spec) => (spec.lines[0]!.trueLengthMm += 1)],
  ['pitch of a line', 'surface', (spec) => (spec.lines[0]!.pitchDeg += 0.5)],
  ['end of a line', 'surface', (spec) => (spec.lines[0]!.to.z += 1)],
  ['angle between two slopes', 'surface', (spec) => (spec.lines[0]!.dihedralDeg! += 0.5)],
  ['worst error by rounding', 'rounding', (spec) => (spec.rounding.worstMm += 0.1)],
  ['joint of the worst error', 'rounding', (spec) => (spec.rounding.joint = ['H1', 'R1'])],
  ['planing', 'planing', (spec) => (spec.planing[0]!.offMm += 1)],
  ['planing left out', 'planing', (spec) => spec.planing.pop()],
  ['quantity of a cut line', 'numbers', (spec) => (spec.cutLines[0]!.quantity += 1)],
  ['length of a cut line', 'numbers', (spec) => (spec.cutLines[0]!.cutLengthMm += 1)],
  ['hands of a cut line', 'numbers', (spec) => (spec.cutLines.at(-1)!.left += 1)],
  ['roof area', 'numbers', (spec) => (spec.totals.roofAreaM2 += 0.1)],
  ['roof area with eaves', 'numbers', (spec) => (spec.totals.roofAreaWithEavesM2 += 0.1)],
  ['ridge in all', 'numbers', (spec) => (spec.totals.ridgeMm += 1)],
  ['hips in all', 'numbers', (spec) => (spec.totals.hipMm += 1)],
  ['valleys in all', 'numbers', (spec) => (spec.totals.valleyMm += 1)],
  ['eaves in all', 'numbers', (spec) => (spec.totals.eaveMm += 1)],
  ['verges in all', 'numbers', (spec) => (spec.totals.vergeMm += 1)],
  ['pieces of a section', 'numbers', (spec) => (spec.totals.bySection[0]!.pieces += 1)],
  ['length of a section', 'numbers', (spec) => (spec.totals.bySection[0]!.lengthMm += 1)],
  ['weight of a section', 'numbers', (spec) => (spec.totals.bySection[0]!.weightKg += 0.1)],
  ['a mark used twice', 'numbers', (spec) => (spec.members[0]!.mark = spec.members[1]!.mark)],
  ['a rafter left out', 'layout', (spec) => leaveOut(spec, isCommon)],
  ['a valley creeper left out', 'layout', (spec) => leaveOut(spec, isValleyCreeper)],
]

describe('the dry fit complains of a bent figure of the whole roof', () => {
  test('and not of a sound spec', () => {
    expect(reportLines(dryFit(kit, roof, sound))).toEqual([])
  })

  test.each(bends)('%s: by %s', (_field, check, bend) => {
    const spec = structuredClone(sound)
    bend(spec)
    expect(judged(spec, check).map((c) => c.check)).toContain(check)
  })
})
