import type { DraftMember, FrameDraft } from '../members.ts'
import type { Point3, Section } from '../roof-types.ts'
import { at, slopeHeightMm } from '../slopes.ts'
import { add2, distance2, dot2, left2, scale2, sub2 } from '../vector.ts'
import type { Plane } from '../vector.ts'
import { besideMember, lyingTimber } from './beside-member.ts'
import type { EndCut } from './beside-member.ts'
import type { BesideGround } from './beside-ground.ts'
import { runsInto } from './clear-of.ts'
import { endFaces } from './end-faces.ts'
import { slopeAxes } from './slope-axes.ts'

/** Collar ties: upper third of the rise, at most 1.2 m apart: IRC R802.3.1, as quoted by a secondary page. */
const upperThird = 2 / 3
export const defaultTieSpacingMm = 1200

/** Rafters whose sides are this near to one plane stand opposite each other. */
const sideMm = 0.05
/** Heads of opposite rafters lie this near together, but for what the ridge's set-out leaves. */
const headMm = 0.5
const slackMm = 0.5
/** A tie shorter than this along its top is no tie. */
const leastTieMm = 300

/** Two commons that meet at a ridge; `alongMm` says where, along the ridge's direction. */
type Pair = { a: FrameDraft; b: FrameDraft; alongMm: number }
/** The pairs over two slopes, in order. */
export type PairRow = {
  slopes: [number, number]
  ridgeDir: { x: number; y: number }
  pairs: Pair[]
}

const soleSlope = (draft: FrameDraft): number => draft.planes[0] ?? -1

/** All pairs of commons that meet at a ridge, gathered by their two slopes. */
export const commonPairs = (ground: BesideGround): PairRow[] => {
  const commons = ground.drafts.filter((draft) => draft.role === 'common')
  const rows: PairRow[] = []
  commons.forEach((a, k) => {
    for (const b of commons.slice(k + 1)) {
      if (dot2(a.piece.dir, b.piece.dir) > -1 + 1e-9) continue
      if (distance2(a.piece.head, b.piece.head) > headMm) continue
      const aside = dot2(left2(a.piece.dir), sub2(b.piece.head, a.piece.head))
      if (Math.abs(aside) > sideMm) continue
      const slopes: [number, number] = [soleSlope(a), soleSlope(b)]
      let row = rows.find((r) => r.slopes[0] === slopes[0] && r.slopes[1] === slopes[1])
      if (row === undefined) {
        row = { slopes, ridgeDir: left2(a.piece.dir), pairs: [] }
        rows.push(row)
      }
      row.pairs.push({ a, b, alongMm: dot2(row.ridgeDir, a.piece.head) })
    }
  })
  rows.forEach((row) => row.pairs.sort((p, q) => p.alongMm - q.alongMm))
  return rows
}

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

/** Heights that a tie must keep out of, mm over the plate. */
type Band = { lowMm: number; highMm: number }

const purlinBands = (ground: BesideGround, row: PairRow, purlins: DraftMember[]): Band[] =>
  purlins
    .filter((purlin) => row.slopes.some((slope) => purlin.planes.includes(slope)))
    .map((purlin) => {
      const { sin, cos } = slopeAxes(at(ground.plates.slopes, purlin.planes[0] ?? 0))
      const lean = purlin.timber.halfMm * sin
      const { z } = purlin.timber.origin
      return { lowMm: z - purlin.section.depthMm * cos - lean, highMm: z + lean }
    })

/**
 * How high the ties of a row lie, underside over the plate: as asked for, as they are set out (null where
 * the ridge leaves no room), and the most that the ridge leaves room for (null where underpurlins take it).
 */
export type TieHeight = { askedMm: number; heightMm: number | null; mostMm: number | null }

export const tieHeight = (
  ground: BesideGround,
  row: PairRow,
  section: Section,
  purlins: DraftMember[],
): TieHeight => {
  const heads = row.pairs.map((pair) => pair.a.piece.head.z)
  const riseMm = Math.min(...heads)
  const askedMm = ground.roof.collarTieHeightMm ?? riseMm * upperThird
  const bands = purlinBands(ground, row, purlins).sort((a, b) => a.lowMm - b.lowMm)
  const meets = (mm: number, band: Band) =>
    mm + section.depthMm > band.lowMm + 1e-6 && mm < band.highMm - 1e-6
  let heightMm = askedMm
  for (const band of bands) if (meets(heightMm, band)) heightMm = band.highMm
  const over = ground.drafts.filter((d) => d.role === 'ridge' && sharesRow(d, row))
  const ridgeMm = Math.min(
    Infinity,
    ...over.map((ridge) => ridge.timber.origin.z - ridge.section.depthMm),
  )
  const mostMm = ridgeMm - section.depthMm
  return {
    askedMm,
    heightMm: heightMm <= mostMm + 1e-6 ? heightMm : null,
    mostMm: bands.some((band) => meets(mostMm, band)) ? null : mostMm,
  }
}

const sharesRow = (ridge: FrameDraft, row: PairRow): boolean =>
  row.slopes.every((slope) => ridge.planes.includes(slope))

/** A tie beside one side of a pair of commons, as a timber between the planes of their tops. */
const layTie = (
  ground: BesideGround,
  row: PairRow,
  pair: Pair,
  section: Section,
  heightMm: number,
  side: 1 | -1,
) => {
  const { plates, standMm } = ground
  const offMm = (side * (ground.roof.sections.rafter.thicknessMm + section.thicknessMm)) / 2
  const topMm = heightMm + section.depthMm
  const centre = add2(pair.a.piece.head, scale2(row.ridgeDir, offMm))
  const end = (draft: FrameDraft): Point3 => {
    const slope = at(plates.slopes, soleSlope(draft))
    const backMm = (slopeHeightMm(slope, centre) + standMm - topMm) / slope.tan
    return { ...add2(centre, scale2(slope.inward, -backMm)), z: topMm }
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
      direction: { ...dir, z: 0 },
      left: { ...left, z: 0 },
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
  row: PairRow,
  section: Section,
  { timber, cuts, alongMm }: ReturnType<typeof layTie>,
): boolean => {
  const faces = [
    ...endFaces(timber, cuts.slice(0, 1), true),
    ...endFaces(timber, cuts.slice(1), false),
  ]
  const apartMm = (ground.roof.sections.rafter.thicknessMm + section.thicknessMm) / 2
  return ground.drafts.every((draft) => {
    if (draft.piece.line !== null) return !runsInto(timber, faces, draft)
    if (!row.slopes.includes(soleSlope(draft))) return true
    return Math.abs(dot2(row.ridgeDir, draft.piece.head) - alongMm) >= apartMm - sideMm
  })
}

/** The tie of a pair, on the side towards the row's middle or else on the other; null where neither has room. */
const tieOf = (
  ground: BesideGround,
  row: PairRow,
  pair: Pair,
  section: Section,
  heightMm: number,
  id: number,
): DraftMember | null => {
  const middleMm = (at(row.pairs, 0).alongMm + at(row.pairs, -1).alongMm) / 2
  const inwards = pair.alongMm <= middleMm ? 1 : -1
  const sides: (1 | -1)[] = inwards === 1 ? [1, -1] : [-1, 1]
  const laid = sides
    .map((side) => layTie(ground, row, pair, section, heightMm, side))
    .find((tie) => tie.lengthMm >= leastTieMm && isFree(ground, row, section, tie))
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
  const made: DraftMember[] = []
  for (const row of commonPairs(ground)) {
    const { heightMm } = tieHeight(ground, row, section, purlins)
    if (heightMm === null) continue
    const alongMm = row.pairs.map((pair) => pair.alongMm)
    for (const place of tiedPlaces(alongMm, spacingMm)) {
      const tie = tieOf(ground, row, at(row.pairs, place), section, heightMm, firstId + made.length)
      if (tie !== null) made.push(tie)
    }
  }
  return made
}
