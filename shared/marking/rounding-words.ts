import type { FrameSpec } from '../roof/roof-types.ts'
import type { MarkingOptions } from './marking-figures.ts'

/** Under this a joint is as good as closed, mm. */
const closedMm = 0.05

/**
 * What marking to the firm's steps costs at the joint that suffers most, in plain words: "Marked to the
 * nearest mm and half degree, the worst joint is 0.8 mm out: CR3 on H1."
 */
export function roundingWords(
  { rounding }: Pick<FrameSpec, 'rounding'>,
  { roundMm, roundDeg }: Pick<MarkingOptions, 'roundMm' | 'roundDeg'>,
): string {
  const marked = `Marked to the nearest ${lengthStep(roundMm)} and ${angleStep(roundDeg)}`
  const { worstMm, joint } = rounding
  if (joint === null || worstMm < closedMm) return `${marked}, every joint closes.`
  return `${marked}, the worst joint is ${worstMm.toFixed(1)} mm out: ${joint[0]} on ${joint[1]}.`
}

function lengthStep(roundMm: number): string {
  return roundMm === 1 ? 'mm' : `${roundMm} mm`
}

function angleStep(roundDeg: number): string {
  if (roundDeg === 1) return 'degree'
  if (roundDeg === 0.5) return 'half degree'
  return roundDeg === 0.25 ? 'quarter degree' : `${roundDeg}°`
}
