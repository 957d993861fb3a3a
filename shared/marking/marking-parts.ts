import { groupBy } from '../collections/group-by.ts'
import type { CutLine, FrameSpec, Member } from '../roof/roof-types.ts'
import {
  bevelOf,
  figureOf,
  lengthWords,
  type MarkingBevel,
  type MarkingFigure,
  type MarkingOptions,
} from './marking-figures.ts'
import { listWords } from './role-words.ts'

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
  const offset =
    mouth.heelOffsetMm > 0
      ? [figureOf('Heel moved out', mouth.heelOffsetMm, options, 'level, to clear both plates')]
      : []
  return {
    figures: [
      figureOf('Height over plate', mouth.standMm, options, 'plumb, top edge to heel'),
      figureOf('Heel', mouth.heelMm, options, 'plumb'),
      figureOf('Seat', mouth.seatMm, options, 'level'),
      figureOf('Depth', mouth.depthMm, options, 'square to the edge'),
      figureOf('Bearing', mouth.bearingMm, options, 'on the plate'),
      ...offset,
    ],
    bevels: [
      bevel('Heel, plumb', mouth.heelFromEdgeDeg),
      bevel('Seat, level', mouth.seatFromEdgeDeg),
    ],
  }
}

export function backingOf(member: Member, options: MarkingOptions): MarkingBevel[] {
  if (!member.backing) return []
  const { leftDeg, rightDeg } = member.backing
  const bevel = (label: string, fromSquareDeg: number) =>
    bevelOf(label, 'end', { fromEdgeDeg: 90 - fromSquareDeg, fromSquareDeg }, options)
  if (Math.abs(leftDeg - rightDeg) <= 0.05) return [bevel('Backing, both edges', leftDeg)]
  return [bevel('Backing, left edge', leftDeg), bevel('Backing, right edge', rightDeg)]
}

/** Pieces planed alike share a sentence. */
export function planingWords(spec: FrameSpec, line: CutLine, options: MarkingOptions): string[] {
  const ofLine = spec.planing.filter((one) => line.members.includes(one.mark))
  const groups = groupBy(
    ofLine,
    (one) => `${lengthWords(one.offMm, options)}|${one.side}|${one.end}`,
  )
  return [...groups].map(([key, pieces]) => {
    const [off = '', side = '', end = ''] = key.split('|')
    const marks = listWords(pieces.map((one) => one.mark))
    return `${marks}: plane ${off} off the ${side} top corner at the ${end}.`
  })
}
