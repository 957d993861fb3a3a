import type { FrameSpec } from '../roof/roof-types.ts'
import type { MarkingOptions } from './marking-figures.ts'

/** What was worked out for a tape in mm is not promised for a coarser one. */
const sixteenths = 'A sixteenth of an inch is 1.6 mm: allow more where the tape reads sixteenths.'

/** Under this a joint is as good as closed, mm. */
const closedMm = 0.05

/**
 * What marking to the firm's steps costs at the joint that suffers most, in plain words: "Marked to the
 * nearest mm and half degree, the worst joint is 0.8 mm out: CR3 on H1."
 */
export function roundingWords(
  { rounding }: Pick<FrameSpec, 'rounding'>,
  { roundMm, roundDeg, units }: Pick<MarkingOptions, 'roundMm' | 'roundDeg' | 'units'>,
): string {
  const marked = `Marked to the nearest ${lengthStep(roundMm)} and ${angleStep(roundDeg)}`
  const { worstMm, joint } = rounding
  if (joint === null || worstMm < closedMm) return `${marked}, every joint closes.`
  const worst = `${marked}, the worst joint is ${worstMm.toFixed(1)} mm out: ${joint[0]} on ${joint[1]}.`
  return units === 'feet-inches' ? `${worst} ${sixteenths}` : worst
}

function lengthStep(roundMm: number): string {
  return roundMm === 1 ? 'mm' : `${roundMm} mm`
}

function angleStep(roundDeg: number): string {
  if (roundDeg === 1) return 'degree'
  if (roundDeg === 0.5) return 'half degree'
  return roundDeg === 0.25 ? 'quarter degree' : `${roundDeg}°`
}
