import type { DraftMember } from '../members.ts'
import type { Caution } from '../roof-types.ts'
import { barges } from './barges.ts'
import type { BesideGround } from './beside-ground.ts'
import { collarTies } from './collar-ties.ts'
import { fascias } from './fascias.ts'
import { tieCautions } from './tie-cautions.ts'
import { underpurlins } from './underpurlins.ts'

/**
 * The timbers beside the frame whose sections are typed, cut to a frame that stands: underpurlins,
 * collar ties, barges, fascias, numbered on from the frame's pieces; and what could not be set out as
 * asked. mm, degrees, kg. Pure; roofs that can be framed never fail here.
 */
export const besideFrame = (
  ground: BesideGround,
): { drafts: DraftMember[]; cautions: Caution[] } => {
  const purlins = underpurlins(ground, ground.drafts.length)
  const ties = collarTies(ground, purlins, ground.drafts.length + purlins.length)
  const before = [...purlins, ...ties]
  const boards = barges(ground, ground.drafts.length + before.length)
  const level = fascias(ground, boards, ground.drafts.length + before.length + boards.length)
  return {
    drafts: [...before, ...boards.map(({ draft }) => draft), ...level],
    cautions: tieCautions(ground, purlins),
  }
}
