import type { DraftMember } from '../members.ts'
import type { Section } from '../roof-types.ts'
import { at } from '../slopes.ts'
import type { Slope } from '../slopes.ts'
import { along3 } from '../vector.ts'
import { besideMember, lyingTimber, turnedTimber } from './beside-member.ts'
import type { BesideGround } from './beside-ground.ts'
import { levelRuns, sharedRuns } from './level-runs.ts'
import type { LevelRun } from './level-runs.ts'
import { purlinEnd } from './purlin-ends.ts'
import type { PurlinEnd } from './purlin-ends.ts'
import { slopeAxes, topPlanePoint } from './slope-axes.ts'

/** Spans that are over the setting by less than this are not. */
const spanSlackMm = 1e-6

/**
 * How far up a slope, mm along the rafters from the plate line, its rows of underpurlins lie: the fewest
 * that leave no span of the longest rafter over the setting, evenly. Source of the rule: roof.md and the
 * firm's setting; the half of a rafter that one row makes of it is common practice.
 */
export const purlinRowsMm = (longestRafterMm: number, maxSpanMm: number): number[] => {
  const spans = Math.max(1, Math.ceil((longestRafterMm - spanSlackMm) / maxSpanMm))
  return Array.from({ length: spans - 1 }, (_, k) => (longestRafterMm * (k + 1)) / spans)
}

/** The longest way from a slope's plate line up to a rafter's head, mm along the slope. */
export const longestRafterMm = (ground: BesideGround, slope: Slope): number => {
  const heads = ground.drafts
    .filter((draft) => draft.planes.length === 1 && draft.planes[0] === slope.index)
    .map((draft) => (draft.piece.head.z / Math.max(slope.tan, 1e-9)) * Math.hypot(1, slope.tan))
  return Math.max(0, ...heads)
}

/** Plan of a row's timber, mm inside the plate line: its axis, and its outermost and innermost corners. */
const rowPlan = (ground: BesideGround, slope: Slope, section: Section, rowMm: number) => {
  const { sin, cos } = slopeAxes(slope)
  const axisMm = rowMm * cos + ground.roof.sections.rafter.depthMm * sin
  const halfMm = (section.thicknessMm / 2) * cos
  return { axisMm, outerMm: axisMm - halfMm, innerMm: axisMm + halfMm + section.depthMm * sin }
}

/** Where the rows of a slope run, each clear of the plates and inside the slope over its whole width. */
export const purlinRuns = (ground: BesideGround, slope: Slope, section: Section) => {
  const { lines, roof, settings } = ground
  const face = at(lines.faces, slope.index)
  const rows = purlinRowsMm(longestRafterMm(ground, slope), settings.maxRafterSpanMm)
  return rows.flatMap((rowMm) => {
    const { axisMm, outerMm, innerMm } = rowPlan(ground, slope, section, rowMm)
    if (outerMm < roof.plateWidthMm) return []
    const runs = [axisMm, outerMm, innerMm].map((inMm) => levelRuns(lines, slope, face, inMm))
    return sharedRuns(runs).map((run) => ({ rowMm, run }))
  })
}

/** Heads are where the rarer cut is: square ends first, then valleys, then hips. */
const endRank = (end: PurlinEnd): number =>
  end.kind === 'gable' ? 0 : end.kind === 'valley' ? 1 : 2

/** One length of underpurlin between what it meets; null where too little is left of it. */
const purlinOf = (
  ground: BesideGround,
  slope: Slope,
  section: Section,
  rowMm: number,
  run: LevelRun,
  id: number,
): DraftMember | null => {
  const { roof, settings, standMm } = ground
  const axes = slopeAxes(slope)
  const depthMm = roof.sections.rafter.depthMm
  const top = topPlanePoint(slope, standMm, run.fromMm, rowMm * axes.cos)
  const start = along3(top, axes.normal, -depthMm)
  const ahead = lyingTimber(
    { origin: start, direction: axes.along, left: axes.upSlope, up: axes.normal },
    section,
  )
  const from = purlinEnd(ground, slope, ahead, run.fromBorders, false)
  const to = purlinEnd(ground, slope, ahead, run.toBorders, true)
  if (from === null || to === null) return null
  const lengthMm = to.centreMm - from.centreMm
  if (lengthMm < settings.minCreeperMm || to.nearestMm <= from.nearestMm) return null
  const turned = endRank(from) > endRank(to)
  const [foot, head] = turned ? [to, from] : [from, to]
  const origin = along3(start, axes.along, foot.centreMm)
  return besideMember(settings, {
    id,
    role: 'underpurlin',
    timber: { ...(turned ? turnedTimber(ahead) : ahead), origin },
    thicknessMm: section.thicknessMm,
    lengthMm,
    cuts: [
      ...head.cuts.map((cut) => ({ ...cut, end: 'head' as const })),
      ...foot.cuts.map((cut) => ({ ...cut, end: 'foot' as const })),
    ],
    dropMm: depthMm / axes.cos,
    planes: [slope.index],
    topInSlope: true,
  })
}

/**
 * Underpurlins, row by row and slope by slope: the top lies against the undersides of the rafters (in
 * the slope's plane, set down by the rafters' depth square to it), from hip or valley to hip or valley,
 * cut against their side faces, and at a gable square at the outer face of its wall, so that it carries
 * the rafter flush inside the gable. True lengths: joins go over supports. mm, degrees, kg.
 */
export const underpurlins = (ground: BesideGround, firstId: number): DraftMember[] => {
  const section = ground.roof.sections.underpurlin
  if (section === undefined) return []
  const made: DraftMember[] = []
  for (const slope of ground.plates.slopes) {
    for (const { rowMm, run } of purlinRuns(ground, slope, section)) {
      const purlin = purlinOf(ground, slope, section, rowMm, run, firstId + made.length)
      if (purlin !== null) made.push(purlin)
    }
  }
  return made
}
