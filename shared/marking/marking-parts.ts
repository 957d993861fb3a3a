import { groupBy } from '../collections/group-by.ts'
import { heelLineStandMm, heelOutAlongMm } from '../drawing/timber-outline.ts'
import { dishDepths, timberTop } from '../drawing/timber-shape.ts'
import type { FrameSpec, Member } from '../roof/roof-types.ts'
import {
  bevelOf,
  figureOf,
  lengthWords,
  type MarkingBevel,
  type MarkingFigure,
  type MarkingOptions,
} from './marking-figures.ts'
import { listWords } from './role-words.ts'

/** A valley is measured from the plumb line over the plate corner; its heel stands further out. */
export const cornerLine = 'the corner line'

export function furtherFigures(member: Member, options: MarkingOptions): MarkingFigure[] {
  const past = (mm: number) => (mm < 0 ? 'runs past' : 'taken off along the edge')
  const deduction = (label: string, mm: number) =>
    Math.abs(mm) < 0.05 ? [] : [figureOf(label, mm, options, past(mm))]
  return [
    ...deduction('Head deduction', member.headDeductionMm),
    ...deduction('Foot deduction', member.footDeductionMm),
    figureOf('Run', member.runMm, options, 'level'),
    figureOf('Rise', member.riseMm, options, 'plumb'),
  ]
}

export function birdsmouthOf(
  member: Member,
  options: MarkingOptions,
): { figures: MarkingFigure[]; bevels: MarkingBevel[] } | null {
  const mouth = member.birdsmouth
  if (!mouth) return null
  const bevel = (label: string, fromEdgeDeg: number) =>
    bevelOf(label, 'side', { fromEdgeDeg, fromSquareDeg: 90 - fromEdgeDeg }, options)
  const outMm = heelOutAlongMm(member)
  const offset =
    outMm > 0 ? [figureOf('Heel line', outMm, options, `down the edge from ${cornerLine}`)] : []
  return {
    figures: [
      ...offset,
      figureOf(
        'Height over plate',
        heelLineStandMm(member),
        options,
        'plumb down the heel line, top edge to seat',
      ),
      figureOf('Heel', mouth.heelMm, options, 'plumb'),
      figureOf('Seat', mouth.seatMm, options, 'level'),
      figureOf('Depth', mouth.depthMm, options, 'square to the edge'),
      figureOf('Bearing', mouth.bearingMm, options, 'on the plate'),
    ],
    bevels: [
      bevel('Heel, plumb', mouth.heelFromEdgeDeg),
      bevel('Seat, level', mouth.seatFromEdgeDeg),
    ],
  }
}

/** Backing, planed down to the edges; or the dish of a valley, down to the middle. */
export function backingOf(member: Member, options: MarkingOptions): MarkingBevel[] {
  if (!member.backing) return []
  const name = timberTop(member) === 'dished' ? 'Dish' : 'Backing'
  const leftDeg = Math.abs(member.backing.leftDeg)
  const rightDeg = Math.abs(member.backing.rightDeg)
  const bevel = (side: string, fromSquareDeg: number) =>
    bevelOf(`${name}, ${side}`, 'end', { fromEdgeDeg: 90 - fromSquareDeg, fromSquareDeg }, options)
  if (Math.abs(leftDeg - rightDeg) <= 0.05) return [bevel('both edges', leftDeg)]
  return [bevel('left edge', leftDeg), bevel('right edge', rightDeg)]
}

export function dropOf(member: Member, options: MarkingOptions): MarkingFigure | null {
  if (!droppedRoles.has(member.role)) return null
  if (member.dropMm > 0)
    return figureOf('Drop', member.dropMm, options, 'lowered, plumb, under the slopes')
  if (member.dropMm < 0)
    return figureOf(
      'Raised',
      -member.dropMm,
      options,
      'plumb: the square top before it is dished, over the line where the slopes meet',
    )
  return null
}

/** Timbers whose tops are set down (or up) to meet the slopes of both sides. */
const droppedRoles: ReadonlySet<Member['role']> = new Set(['ridge', 'hip', 'broken-hip', 'valley'])

/** A dished top is marked and cut while it is square; then the lines it is planed to. */
export function dishWords(member: Member, options: MarkingOptions): string | null {
  const dish = dishDepths(member)
  if (!dish) return null
  const edges =
    Math.abs(dish.leftMm - dish.rightMm) < 0.05
      ? `${lengthWords(dish.leftMm, options)} at both edges`
      : `${lengthWords(dish.leftMm, options)} at the left edge, ${lengthWords(dish.rightMm, options)} at the right`
  return `Mark and cut square, then dish to the lines: ${lengthWords(dish.middleMm, options)} deep along the middle, square to the top, ${edges}.`
}

/** Pieces, sides and ends planed alike share a sentence. */
export function planingWords(
  spec: FrameSpec,
  { members }: { members: readonly string[] },
  options: MarkingOptions,
): string[] {
  const ofLine = spec.planing.filter((one) => members.includes(one.mark))
  const corners = [...groupBy(ofLine, (one) => `${one.mark}|${one.end}`).values()].flatMap(
    (planings) => cornersOfEnd(planings, options),
  )
  const places = [
    ...groupBy(corners, (one) => `${one.mark}|${one.off}|${one.corner}`).values(),
  ].map((same) => ({ ...first(same), place: listWords(same.map((one) => `the ${one.end}`)) }))
  const groups = groupBy(places, (one) => `${one.off}|${one.corner}|${one.place}`)
  return [...groups.values()].map((same) => {
    const { off, corner, place } = first(same)
    return `${listWords(same.map((one) => one.mark))}: plane ${off} off ${corner} at ${place}.`
  })
}

type Planing = FrameSpec['planing'][number]

/** One piece's end: both corners in one when as much comes off each. */
function cornersOfEnd(planings: readonly Planing[], options: MarkingOptions) {
  const corners = planings.map(({ mark, end, side, offMm }) => ({
    mark,
    end,
    off: lengthWords(offMm, options),
    corner: `the ${side} top corner`,
  }))
  const isAlike = new Set(corners.map((one) => one.off)).size === 1
  const hasBoth = new Set(planings.map((one) => one.side)).size === 2
  return isAlike && hasBoth
    ? corners.slice(0, 1).map((one) => ({ ...one, corner: 'both top corners' }))
    : corners
}

function first<T>(list: readonly T[]): T {
  const [one] = list
  if (one === undefined) throw new RangeError('A group has at least one piece.')
  return one
}
