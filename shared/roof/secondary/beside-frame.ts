import type { DraftMember } from '../members.ts'
import { barges } from './barges.ts'
import type { BesideGround } from './beside-ground.ts'
import { collarTies } from './collar-ties.ts'
import { fascias } from './fascias.ts'
import { underpurlins } from './underpurlins.ts'

/**
 * The timbers beside the frame whose sections are typed, cut to a frame that stands: underpurlins,
 * collar ties, barges, fascias, numbered on from the frame's pieces. mm, degrees, kg. Pure; roofs that
 * can be framed never fail here.
 */
export const besideFrame = (ground: BesideGround): DraftMember[] => {
  const purlins = underpurlins(ground, ground.drafts.length)
  const ties = collarTies(ground, purlins, ground.drafts.length + purlins.length)
  const before = [...purlins, ...ties]
  const boards = barges(ground, ground.drafts.length + before.length)
  const level = fascias(ground, boards, ground.drafts.length + before.length + boards.length)
  return [...before, ...boards.map(({ draft }) => draft), ...level]
}
