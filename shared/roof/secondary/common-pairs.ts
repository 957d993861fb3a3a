import type { DraftMember, FrameDraft } from '../members.ts'
import type { Section } from '../roof-types.ts'
import { at } from '../slopes.ts'
import { distance2, dot2, left2, sub2 } from '../vector.ts'
import type { BesideGround } from './beside-ground.ts'
import { slopeAxes } from './slope-axes.ts'

/** Collar ties lie in the upper third of the rise: IRC R802.3.1, as quoted by a secondary page. */
const upperThird = 2 / 3

/** Rafters whose sides are this near to one plane stand opposite each other. */
export const sideMm = 0.05
/** Heads of opposite rafters lie this near together, but for what the ridge's set-out leaves. */
const headMm = 0.5

/** Two commons that meet at a ridge; `alongMm` says where, along the ridge's direction. */
export type Pair = { a: FrameDraft; b: FrameDraft; alongMm: number }
/** The pairs over two slopes, in order. */
export type PairRow = {
  slopes: [number, number]
  ridgeDir: { x: number; y: number }
  pairs: Pair[]
}

export const soleSlope = (draft: FrameDraft): number => draft.planes[0] ?? -1

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
