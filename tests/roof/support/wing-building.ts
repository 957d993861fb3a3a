import { frameRoof } from '../../../shared/roof/frame-roof.ts'
import type { FrameSpec, Member } from '../../../shared/roof/roof-types.ts'
import { near, ofRole } from './members.ts'
import { makeRoof } from './roofs.ts'

type Changes = Parameters<typeof makeRoof>[2]
type Plan = [number, number][]

function valleyAt(spec: FrameSpec, corner: readonly number[]): Member {
  const [x, y] = corner
  const valley = ofRole(spec, 'valley').find((m) => near(m.axis.from, { x: x!, y: y! }))
  if (valley === undefined) throw new Error(`no valley starts at ${x}, ${y}`)
  return valley
}

/** A wing square to a wider main building, gables at all ends; the valley on the wing's right. */
export function wingedBuilding(
  wingSpanMm: number,
  pitches: { mainDeg: number; wingDeg: number },
  changes: Changes = {},
): { spec: FrameSpec; valley: Member } {
  const { mainDeg, wingDeg } = pitches
  const wide = 2 * wingSpanMm
  const [from, to] = [wingSpanMm, 2 * wingSpanMm]
  const plan: Plan = [
    [0, 0],
    [3 * wingSpanMm, 0],
    [3 * wingSpanMm, wide],
    [to, wide],
    [to, wide + wingSpanMm],
    [from, wide + wingSpanMm],
    [from, wide],
    [0, wide],
  ]
  const edges = [mainDeg, 'gable', mainDeg, wingDeg, 'gable', wingDeg, mainDeg, 'gable'] as const
  const spec = frameRoof(makeRoof(plan, edges, changes))
  return { spec, valley: valleyAt(spec, plan[3]!) }
}

/**
 * An L of one pitch, hipped at its outer corner, gables at both ends; the wing stands on the left end of
 * the main building. A wing narrower than the main building has a broken hip over its ridge.
 */
export function lBuilding(
  pitchDeg: number,
  widths: { mainMm: number; wingMm: number },
  changes: Changes = {},
): { spec: FrameSpec; valley: Member } {
  const { mainMm, wingMm } = widths
  const plan: Plan = [
    [0, 0],
    [wingMm + mainMm, 0],
    [wingMm + mainMm, mainMm],
    [wingMm, mainMm],
    [wingMm, 2 * mainMm],
    [0, 2 * mainMm],
  ]
  const p = pitchDeg
  const spec = frameRoof(makeRoof(plan, [p, 'gable', p, p, 'gable', p], changes))
  return { spec, valley: valleyAt(spec, plan[3]!) }
}
