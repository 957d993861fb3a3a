import { buildPieces } from './build-pieces.ts'
import type { Ground } from './build-pieces.ts'
import { cautionsOf } from './cautions.ts'
import { bearings, segmentIndex } from './contacts.ts'
import { markMembers } from './cut-lines.ts'
import { cutJoints } from './joint-order.ts'
import { draftMember } from './members.ts'
import type { FrameDraft } from './members.ts'
import { markedEnds, openEnds } from './open-ends.ts'
import { planingOf } from './planing.ts'
import { publishedLines, publishedPlanes } from './published-lines.ts'
import { RoofRefusedError, setOutRoof } from './roof-problems.ts'
import { defaultSettings } from './roof-settings.ts'
import type { FrameSpec, Roof, RoofSettings } from './roof-types.ts'
import { worstRounding } from './rounding.ts'
import { besideFrame } from './secondary/beside-frame.ts'
import type { BesideGround } from './secondary/beside-ground.ts'
import { coveringTotals } from './secondary/covering-totals.ts'
import { commonStandMm } from './stand.ts'
import { roofTotals } from './totals.ts'
import { unmadeProblems } from './unmade.ts'

/** Cuts all joints and gives every piece its numbers. */
const draftMembers = (ground: Ground, standMm: number) => {
  const pieces = buildPieces(ground)
  const { placedAt, standsFree, openPieces } = cutJoints(ground, pieces)
  const segments = segmentIndex(pieces)
  const drafts = pieces.map((piece): FrameDraft =>
    draftMember(ground, piece, standMm, (cut) => {
      if (cut.listed === null) return []
      if (cut.end === 'tail') {
        const isValley = (other: number) => pieces[other]?.role === 'valley'
        return bearings(pieces, segments, piece, cut.end, cut.listed, isValley)
      }
      if (standsFree(piece.id, cut.end)) return []
      const list = cut.end === 'head' ? piece.headCuts : piece.footCuts
      const mate = list[cut.listed]?.mitreWith ?? null
      const own = placedAt(piece.id, cut.end)
      const mayBear = (other: number) => other === mate || placedAt(other, null) < own
      return bearings(pieces, segments, piece, cut.end, cut.listed, mayBear)
    }),
  )
  return { drafts, ends: openEnds(ground.roof, pieces, segments, openPieces) }
}

/**
 * The frame spec of a roof: slopes, lines, every member with its cuts, cut lines, totals, cautions,
 * corners to plane and the joint error that rounding causes. mm, degrees, m², kg; what each field means
 * is fixed by the types. Pure and deterministic; some milliseconds for a house.
 * @throws {RoofRefusedError} with `problems` (field and sentence) when the roof cannot be framed as typed.
 */
export const frameRoof = (roof: Roof, settings: RoofSettings = defaultSettings): FrameSpec => {
  const setOut = setOutRoof(roof, settings)
  if (setOut.problems !== null) throw new RoofRefusedError(setOut.problems)
  const { plates, lines, joints } = setOut
  const ground: Ground = { roof, settings, plates, lines, joints }
  const standMm = commonStandMm(roof, plates.slopes)
  const { drafts, ends } = draftMembers(ground, standMm)
  const unmade = unmadeProblems(ground, drafts)
  if (unmade.length > 0) throw new RoofRefusedError(unmade)
  const standing: BesideGround = { ...ground, standMm, drafts }
  const beside = besideFrame(standing)
  const all = [...drafts, ...beside.drafts]
  const { members, cutLines, markOf } = markMembers(all)
  const open = markedEnds(ends, markOf)
  const planes = publishedPlanes(plates, lines)
  const published = publishedLines(plates, lines)
  return {
    standMm,
    planes,
    lines: published,
    members,
    cutLines,
    totals: {
      ...roofTotals(planes, published, members),
      covering: coveringTotals(standing, planes, members),
    },
    cautions: [...cautionsOf(ground, standMm, members, open), ...beside.cautions],
    planing: planingOf(drafts, plates, lines, standMm, markOf),
    rounding: worstRounding(all, settings, markOf),
  }
}
