import type { FrameSpec, Member } from '../roof/roof-types.ts'
import { piecesWords } from './role-words.ts'

/** Rafters count as standing at a node when their heads are this near it, square bays being wider. */
const atNodeMm = 150

/** Which end of a ridge board its lengths start from: both look alike on the trestles. */
export function ridgeWayWords(spec: FrameSpec, ridge: Member): string {
  const pieces = piecesAt(spec, ridge.axis.from)
  const place = pieces.length > 0 ? `First node: at ${piecesWords(pieces)}. ` : ''
  return `${place}Left and right looking along the ridge from its first node.`
}

/** The crown ends or, at a gable, the rafters that meet a node of the ridge. */
function piecesAt(spec: FrameSpec, node: Member['axis']['from']): Member[] {
  const near = spec.members.filter(({ role, axis }) => {
    const gapMm = Math.hypot(axis.to.x - node.x, axis.to.y - node.y)
    return (role === 'crown-end' || role === 'common') && gapMm <= atNodeMm
  })
  const crowns = near.filter((one) => one.role === 'crown-end')
  return crowns.length > 0 ? crowns : near
}
