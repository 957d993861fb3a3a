import type { DraftMember, FrameDraft } from '../members.ts'
import type { Point3, Section } from '../roof-types.ts'
import { at, slopeHeightMm } from '../slopes.ts'
import { add2, dot2, point3, scale2 } from '../vector.ts'
import type { Plane } from '../vector.ts'
import { besideMember, lyingTimber } from './beside-member.ts'
import type { EndCut } from './beside-member.ts'
import type { BesideGround } from './beside-ground.ts'
import { lineObstacles, runsInto } from './clear-of.ts'
import type { Obstacle } from './clear-of.ts'
import { commonPairs, sideMm, soleSlope, tieHeight } from './common-pairs.ts'
import type { Pair, PairRow } from './common-pairs.ts'
import { endFaces } from './end-faces.ts'
import { slopeAxes } from './slope-axes.ts'

/** Collar ties stand at most 1.2 m apart: IRC R802.3.1, as quoted by a secondary page. */
export const defaultTieSpacingMm = 1200

const slackMm = 0.5
/** A tie shorter than this along its top is no tie. */
const leastTieMm = 300

/** Places to tie: the first, then each as far on as the spacing lets, and the last. */
export const tiedPlaces = (alongMm: number[], spacingMm: number): number[] => {
  const places: number[] = []
  alongMm.forEach((_, k) => {
    const last = places[places.length - 1]
    const next = alongMm[k + 1]
    if (last === undefined || next === undefined) places.push(k)
    else if (next - at(alongMm, last) > spacingMm + slackMm) places.push(k)
  })
  return places
}

/** The ties of one row, before any is laid. */
type TieRow = { row: PairRow; section: Section; heightMm: number; obstacles: readonly Obstacle[] }

/** A tie beside one side of a pair of commons, as a timber between the planes of their tops. */
const layTie = (
  ground: BesideGround,
  { row, section, heightMm }: TieRow,
  pair: Pair,
  side: 1 | -1,
) => {
  const { plates, standMm } = ground
  const offMm = (side * (ground.roof.sections.rafter.thicknessMm + section.thicknessMm)) / 2
  const topMm = heightMm + section.depthMm
  const centre = add2(pair.a.piece.head, scale2(row.ridgeDir, offMm))
  const end = (draft: FrameDraft): Point3 => {
    const slope = at(plates.slopes, soleSlope(draft))
    const backMm = (slopeHeightMm(slope, centre) + standMm - topMm) / slope.tan
    return point3(add2(centre, scale2(slope.inward, -backMm)), topMm)
  }
  const plane = (draft: FrameDraft, point: Point3): Plane => ({
    point,
    normal: slopeAxes(at(plates.slopes, soleSlope(draft))).normal,
  })
  const [from, to] = [end(pair.a), end(pair.b)]
  const { dir, left } = pair.a.piece
  const cuts: EndCut[] = [
    { end: 'head', plane: plane(pair.b, to), bears: [] },
    { end: 'foot', plane: plane(pair.a, from), bears: [] },
  ]
  const timber = lyingTimber(
    {
      origin: from,
      direction: point3(dir, 0),
      left: point3(left, 0),
      up: { x: 0, y: 0, z: 1 },
    },
    section,
  )
  return {
    timber,
    cuts,
    lengthMm: dot2(dir, { x: to.x - from.x, y: to.y - from.y }),
    alongMm: pair.alongMm + offMm,
  }
}

/** Whether a tie finds its place free: no other rafter of its slopes there, no hip or ridge that it runs into. */
const isFree = (
  ground: BesideGround,
  { row, section, obstacles }: TieRow,
  { timber, cuts, alongMm }: ReturnType<typeof layTie>,
): boolean => {
  const faces = [
    ...endFaces(timber, cuts.slice(0, 1), true),
    ...endFaces(timber, cuts.slice(1), false),
  ]
  const apartMm = (ground.roof.sections.rafter.thicknessMm + section.thicknessMm) / 2
  if (obstacles.some((one) => runsInto(timber, faces, one))) return false
  return ground.drafts.every((draft) => {
    if (draft.piece.line !== null) return true
    if (!row.slopes.includes(soleSlope(draft))) return true
    return Math.abs(dot2(row.ridgeDir, draft.piece.head) - alongMm) >= apartMm - sideMm
  })
}

/** The tie of a pair, on the side towards the row's middle or else on the other; null where neither has room. */
const tieOf = (ground: BesideGround, ties: TieRow, pair: Pair, id: number): DraftMember | null => {
  const { row, section } = ties
  const middleMm = (at(row.pairs, 0).alongMm + at(row.pairs, -1).alongMm) / 2
  const inwards = pair.alongMm <= middleMm ? 1 : -1
  const sides: (1 | -1)[] = inwards === 1 ? [1, -1] : [-1, 1]
  const laid = sides
    .map((side) => layTie(ground, ties, pair, side))
    .find((tie) => tie.lengthMm >= leastTieMm && isFree(ground, ties, tie))
  if (laid === undefined) return null
  return besideMember(ground.settings, {
    id,
    role: 'collar-tie',
    timber: laid.timber,
    thicknessMm: section.thicknessMm,
    lengthMm: laid.lengthMm,
    cuts: laid.cuts,
    dropMm: 0,
    planes: [...row.slopes],
  })
}

/**
 * Collar ties, each beside a pair of commons that meet at a ridge, its face on their side faces, its
 * ends cut in the planes of the rafters' tops so that nothing stands over them. The row's underside is
 * at the typed height over the plate, else at two thirds of the ridge's rise; where underpurlins are in
 * the way it rests on them. Rows that the ridge leaves no room for are left out. mm, degrees, kg.
 */
export const collarTies = (
  ground: BesideGround,
  purlins: DraftMember[],
  firstId: number,
): DraftMember[] => {
  const section = ground.roof.sections.collarTie
  if (section === undefined) return []
  const spacingMm = ground.settings.collarTieSpacingMm ?? defaultTieSpacingMm
  const obstacles = lineObstacles(ground.drafts)
  const made: DraftMember[] = []
  for (const row of commonPairs(ground)) {
    const { heightMm } = tieHeight(ground, row, section, purlins)
    if (heightMm === null) continue
    const ties = { row, section, heightMm, obstacles }
    const alongMm = row.pairs.map((pair) => pair.alongMm)
    for (const place of tiedPlaces(alongMm, spacingMm)) {
      const tie = tieOf(ground, ties, at(row.pairs, place), firstId + made.length)
      if (tie !== null) made.push(tie)
    }
  }
  return made
}
