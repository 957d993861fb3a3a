import type { Angle } from '../roof/roof-types.ts'
import { formatAngle } from '../units/format-angle.ts'
import { formatLength, type LengthUnits, lengthUnitWord } from '../units/format-length.ts'

/** How numbers are written: the firm's units, and what tape and bevel are marked to. */
export type MarkingOptions = {
  units: LengthUnits
  roundMm: number
  roundDeg: number
  /** How far the saw's blade tilts, when it is known. */
  sawMaxTiltDeg?: number
}

/** A length to read off. `valueMm` is exact; only `text` is rounded. */
export type MarkingFigure = {
  label: string
  valueMm: number
  text: string
  /** 'mm', or empty where the text carries its own. */
  unit: string
  /** Where it is measured from, or empty. */
  note: string
}

/** An angle to set, both ways. The texts sum to 90° as the exact values do. */
export type MarkingBevel = Angle & {
  label: string
  /** Which face of the timber the bevel is laid on. */
  where: 'side' | 'top' | 'end'
  fromEdgeText: string
  fromSquareText: string
}

function roundedTo(value: number, step: number): number {
  return step > 0 ? Math.round(value / step) * step : value
}

export function lengthText(lengthMm: number, options: MarkingOptions): string {
  const mm = options.units === 'mm' ? roundedTo(lengthMm, options.roundMm) : lengthMm
  return formatLength(mm, options.units)
}

/** `3291 mm`, for running text. */
export function lengthWords(lengthMm: number, options: MarkingOptions): string {
  return [lengthText(lengthMm, options), lengthUnitWord(options.units)].filter(Boolean).join(' ')
}

export function figureOf(
  label: string,
  lengthMm: number,
  options: MarkingOptions,
  note = '',
): MarkingFigure {
  return {
    label,
    valueMm: lengthMm,
    text: lengthText(lengthMm, options),
    unit: lengthUnitWord(options.units),
    note,
  }
}

type AngleOptions = Pick<MarkingOptions, 'roundDeg'>

export function angleText(angleDeg: number, options: AngleOptions): string {
  return formatAngle(angleDeg, options.roundDeg)
}

export function bevelOf(
  label: string,
  where: MarkingBevel['where'],
  angle: Angle,
  options: AngleOptions,
): MarkingBevel {
  const edgeDeg = roundedTo(angle.fromEdgeDeg, options.roundDeg)
  return {
    label,
    where,
    fromEdgeDeg: angle.fromEdgeDeg,
    fromSquareDeg: angle.fromSquareDeg,
    fromEdgeText: angleText(edgeDeg, options),
    fromSquareText: angleText(Math.abs(90 - edgeDeg), options),
  }
}

/** '25.0° from square, 65.0° from the edge'. */
export function bevelWords(bevel: MarkingBevel): string {
  return `${bevel.fromSquareText} ${squareWord(bevel)}, ${bevel.fromEdgeText} from the ${edgeWord(bevel)}`
}

/** Under this a bevel is square, degrees. */
const squareDeg = 0.05

/** A line down the side usually leans towards the foot; past square, towards the head. */
export function squareWord(bevel: Pick<MarkingBevel, 'fromSquareDeg'>): string {
  return bevel.fromSquareDeg < -squareDeg ? 'past square, towards the head' : 'from square'
}

/** What the second reading is taken from: backing is read on the end of the timber. */
export function edgeWord({ where }: Pick<MarkingBevel, 'where'>): 'edge' | 'side' {
  return where === 'end' ? 'side' : 'edge'
}
