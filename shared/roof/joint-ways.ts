import { isRisingAt } from './broken-foot.ts'
import type { FootWay } from './broken-foot.ts'
import type { Ground } from './build-pieces.ts'
import type { Box } from './convex.ts'
import { grownBox, polygonBox } from './convex.ts'
import type { JointWay } from './joint-phases.ts'
import type { Piece } from './piece.ts'
import { at } from './slopes.ts'
import { distance2 } from './vector.ts'

/** Joints nearer than this may have timbers of one in the way of another's. */
const nearMm = 1000

type JointGroup = { joints: number[]; box: Box }

/** Joints in groups whose timbers may meet, in the order of their lowest number. */
export const jointGroups = (ground: Ground): JointGroup[] => {
  const { joints } = ground.joints
  const owner = joints.map((_, k) => k)
  joints.forEach((joint, k) => {
    for (let other = 0; other < k; other++) {
      if (owner[other] === owner[k]) continue
      if (distance2(joint.point, at(joints, other).point) > nearMm) continue
      const [from, to] = [
        Math.max(at(owner, other), at(owner, k)),
        Math.min(at(owner, other), at(owner, k)),
      ]
      owner.forEach((id, n) => {
        if (id === from) owner[n] = to
      })
    }
  })
  return joints.flatMap((_, root) => {
    if (owner[root] !== root) return []
    const members = owner.flatMap((id, k) => (id === root ? [k] : []))
    const box = polygonBox(members.map((k) => at(joints, k).point))
    return [{ joints: members, box: grownBox(box, nearMm) }]
  })
}

const footWays: FootWay[] = ['fitted', 'flush', 'parted', 'sides', 'crown', 'stand']

/**
 * Other ways to make a joint, those nearest the usual order first: another foot for the broken hip
 * that starts there, one piece after all others or before them, then two changes at once.
 */
export const waysToTry = (pieces: Piece[], joint: number): JointWay[] => {
  const isRidge = (p: Piece) => p.role === 'ridge'
  const meets = (p: Piece) => p.headJoint === joint || p.footJoint === joint
  const heads = pieces.filter((p) => meets(p) && !isRidge(p)).map((p) => p.id)
  const hasRidge = pieces.some((p) => isRidge(p) && (meets(p) || p.through.includes(joint)))
  const feet = !hasRidge && pieces.some((p) => isRisingAt(p, joint)) ? footWays : []
  const moved = (foot: FootWay): JointWay[] => [
    ...heads.map((last) => ({ foot, first: null, last })),
    ...heads.map((first) => ({ foot, first, last: null })),
  ]
  return [
    ...feet.map((foot) => ({ foot, first: null, last: null })),
    ...moved('usual'),
    ...feet.flatMap(moved),
    ...heads.flatMap((first) =>
      heads.flatMap((last): JointWay[] => (first === last ? [] : [{ foot: 'usual', first, last }])),
    ),
  ]
}
