import { crossingOf } from '../bevel.ts'
import type { Timber } from '../bevel.ts'
import type { DraftMember } from '../members.ts'
import type { Section } from '../roof-types.ts'
import { at } from '../slopes.ts'
import type { Slope } from '../slopes.ts'
import { along3 } from '../vector.ts'
import { besideMember, lyingTimber, turnedTimber } from './beside-member.ts'
import type { EndCut } from './beside-member.ts'
import type { BesideGround } from './beside-ground.ts'
import { clearOf, lineObstacles } from './clear-of.ts'
import type { Obstacle, Trimmed } from './clear-of.ts'
import { faceAreaMm2 } from './end-faces.ts'
import type { EndFace } from './end-faces.ts'
import { levelRuns, sharedRuns } from './level-runs.ts'
import type { LevelRun } from './level-runs.ts'
import { borderStop, facesEnd, squareStop } from './purlin-stops.ts'
import type { Stop } from './purlin-stops.ts'
import { leastBearingMm2, sharedFaceMm2 } from './shared-face.ts'
import { slopeAxes, topPlanePoint } from './slope-axes.ts'

/** Spans that are over the setting by less than this are not. */
const spanSlackMm = 1e-6

/**
 * How far up a slope, mm along the rafters from the plate line, its rows of underpurlins lie: the fewest
 * that leave no span of the longest rafter over the setting, evenly. Source of the rule: the firm's own
 * setting; that one row halves a rafter is common practice.
 */
export const purlinRowsMm = (longestRafterMm: number, maxSpanMm: number): number[] => {
  const spans = Math.max(1, Math.ceil((longestRafterMm - spanSlackMm) / maxSpanMm))
  return Array.from({ length: spans - 1 }, (_, k) => (longestRafterMm * (k + 1)) / spans)
}

/** The longest way from a slope's plate line up to a rafter's head, mm along the slope. */
export const longestRafterMm = (ground: BesideGround, slope: Slope): number => {
  const heads = ground.drafts
    .filter((draft) => draft.piece.line === null && draft.planes[0] === slope.index)
    .map((draft) => (draft.piece.head.z / slope.tan) * Math.hypot(1, slope.tan))
  return Math.max(0, ...heads)
}

/** Plan of a row's timber, mm inside the plate line: its axis, and its outermost and innermost corners. */
const rowPlan = (ground: BesideGround, slope: Slope, section: Section, rowMm: number) => {
  const { sin, cos } = slopeAxes(slope)
  const axisMm = rowMm * cos + ground.roof.sections.rafter.depthMm * sin
  const halfMm = (section.thicknessMm / 2) * cos
  return { axisMm, outerMm: axisMm - halfMm, innerMm: axisMm + halfMm + section.depthMm * sin }
}

/** Where a row runs: clear of the plates, and inside the slope over its whole width. */
const rowRuns = (ground: BesideGround, slope: Slope, section: Section, rowMm: number) => {
  const { lines, roof } = ground
  const face = at(lines.faces, slope.index)
  const { axisMm, outerMm, innerMm } = rowPlan(ground, slope, section, rowMm)
  if (outerMm < roof.plateWidthMm) return []
  return sharedRuns([axisMm, outerMm, innerMm].map((inMm) => levelRuns(lines, slope, face, inMm)))
}

/** A row's timber along the whole slope, its origin abreast of the slope's first corner. */
const layRow = (ground: BesideGround, slope: Slope, section: Section, rowMm: number): Timber => {
  const { along, upSlope, normal, cos } = slopeAxes(slope)
  const top = topPlanePoint(slope, ground.standMm, 0, rowMm * cos)
  const origin = along3(top, normal, -ground.roof.sections.rafter.depthMm)
  return lyingTimber({ origin, direction: along, left: upSlope, up: normal }, section)
}

/** The lengths of one row, each between what its run ends on, and square where two would run together. */
const rowLengths = (
  ground: BesideGround,
  slope: Slope,
  timber: Timber,
  runs: LevelRun[],
  obstacles: readonly Obstacle[],
): Trimmed[] => {
  const stops = (borders: number[], upper: boolean): Stop[] =>
    borders
      .map((border) => borderStop(ground, slope, timber, border, upper))
      .filter(({ plane }) => facesEnd(plane, timber))
  const between = (a: LevelRun | undefined, b: LevelRun | undefined, upper: boolean): Stop[] => {
    if (a === undefined || b === undefined) return []
    const middle = along3(timber.origin, timber.direction, (a.toMm + b.fromMm) / 2)
    return [squareStop(timber, middle, upper)]
  }
  return runs.flatMap((run, k) =>
    clearOf(
      timber,
      [...stops(run.fromBorders, false), ...between(runs[k - 1], run, false)],
      [...stops(run.toBorders, true), ...between(run, runs[k + 1], true)],
      obstacles,
      ground.settings.minCreeperMm,
    ),
  )
}

/** Heads are where the rarer cut is: square ends first, then valleys, then hips. */
const ranks = { square: 0, valley: 1, hip: 2 }

/** The face that an end is known by, and the place along the timber of the centre of what it meets. */
const endOf = (timber: Timber, faces: EndFace<Stop>[]) => {
  const main = faces.reduce((a, b) => (faceAreaMm2(b.corners) > faceAreaMm2(a.corners) ? b : a))
  return {
    faces,
    rank: ranks[main.cut.kind],
    centreMm: crossingOf(main.cut.centre, timber).baseMm,
  }
}

const endCut = (end: EndCut['end'], { cut, corners }: EndFace<Stop>): EndCut => {
  const { plane, bearing } = cut
  const bears =
    bearing !== null && sharedFaceMm2(corners, bearing.face, plane.normal) > leastBearingMm2
  return { end, plane, bears: bears ? [bearing.piece] : [] }
}

const purlinOf = (
  ground: BesideGround,
  slope: Slope,
  timber: Timber,
  trimmed: Trimmed,
  id: number,
): DraftMember => {
  const [from, to] = [endOf(timber, trimmed.from), endOf(timber, trimmed.to)]
  const turned = from.rank > to.rank
  const [foot, head] = turned ? [to, from] : [from, to]
  const origin = along3(timber.origin, timber.direction, foot.centreMm)
  return besideMember(ground.settings, {
    id,
    role: 'underpurlin',
    timber: { ...(turned ? turnedTimber(timber) : timber), origin },
    thicknessMm: 2 * timber.halfMm,
    lengthMm: Math.abs(to.centreMm - from.centreMm),
    cuts: [
      ...head.faces.map((face) => endCut('head', face)),
      ...foot.faces.map((face) => endCut('foot', face)),
    ],
    dropMm: ground.roof.sections.rafter.depthMm / slopeAxes(slope).cos,
    planes: [slope.index],
    topInSlope: true,
  })
}

/**
 * Underpurlins, row by row and slope by slope: the top lies against the undersides of the rafters (in
 * the slope's plane, set down by the rafters' depth square to it), from hip or valley to hip or valley,
 * cut against their side faces, and at a gable square at the outer face of its wall, so that it carries
 * the rafter flush inside the gable. A ridge that comes out under the slope stops it. True lengths:
 * joins go over supports. mm, degrees, kg.
 */
export const underpurlins = (ground: BesideGround, firstId: number): DraftMember[] => {
  const section = ground.roof.sections.underpurlin
  if (section === undefined) return []
  const obstacles = lineObstacles(ground.drafts)
  const made: DraftMember[] = []
  for (const slope of ground.plates.slopes) {
    const rows = purlinRowsMm(longestRafterMm(ground, slope), ground.settings.maxRafterSpanMm)
    for (const rowMm of rows) {
      const timber = layRow(ground, slope, section, rowMm)
      const runs = rowRuns(ground, slope, section, rowMm)
      for (const trimmed of rowLengths(ground, slope, timber, runs, obstacles)) {
        made.push(purlinOf(ground, slope, timber, trimmed, firstId + made.length))
      }
    }
  }
  return made
}
