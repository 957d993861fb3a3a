import { cautionOf, wholeMm } from '../caution-words.ts'
import type { DraftMember } from '../members.ts'
import type { Caution, CautionAnswer } from '../roof-types.ts'
import { at } from '../slopes.ts'
import type { BesideGround } from './beside-ground.ts'
import { commonPairs, tieHeight } from './common-pairs.ts'
import type { PairRow, TieHeight } from './common-pairs.ts'

const height = (value: number): CautionAnswer[] =>
  value > 0 ? [{ path: 'collarTieHeightMm', value, unit: 'mm' }] : []

const edgesWords = (ground: BesideGround, row: PairRow): string =>
  row.slopes.map((slope) => at(at(ground.plates.slopes, slope).edges, 0) + 1).join(' and ')

const noRoom = (ground: BesideGround, row: PairRow, { askedMm, mostMm }: TieHeight): Caution => {
  const most = mostMm === null ? null : Math.floor(mostMm)
  return cautionOf(
    'collar-tie-moved',
    [],
    `Collar ties at ${wholeMm(askedMm)} mm over the plate find no room under the ridge between edges ${edgesWords(ground, row)}; none are set out there.`,
    most === null || most <= 0
      ? 'Shallower ties, or none.'
      : `They have room at a height over plate of at most ${most} mm.`,
    most === null ? [] : height(most),
  )
}

const moved = (askedMm: number, heightMm: number): Caution => {
  const clear = Math.ceil(heightMm - 1e-6)
  return cautionOf(
    'collar-tie-moved',
    [],
    `Collar ties at ${wholeMm(askedMm)} mm over the plate would run into the underpurlins; they are set out resting on them.`,
    `At a height over plate of ${clear} mm they are clear of them.`,
    height(clear),
  )
}

/** What became of collar ties that could not lie at the height asked for. */
export const tieCautions = (ground: BesideGround, purlins: DraftMember[]): Caution[] => {
  const section = ground.roof.sections.collarTie
  if (section === undefined) return []
  const typed = ground.roof.collarTieHeightMm !== undefined
  return commonPairs(ground).flatMap((row) => {
    const found = tieHeight(ground, row, section, purlins)
    if (found.heightMm === null) return [noRoom(ground, row, found)]
    const isMoved = typed && found.heightMm > found.askedMm + 1e-6
    return isMoved ? [moved(found.askedMm, found.heightMm)] : []
  })
}
