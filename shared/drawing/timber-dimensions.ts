import { formatLength, type LengthUnits } from '../units/format-length.ts'
import { heelOutAlongMm } from './timber-outline.ts'
import type { MeasuringPoint } from './timber-points.ts'
import { measuringPointWords } from './timber-points.ts'
import type { DrawnMember } from './timber-pose.ts'
import { edgeLengths } from './timber-shape.ts'
import type { DimensionWish } from './timber-texts.ts'
import type { TimberScale } from './timber-zones.ts'

/** From the heel line where there is one; from node to node for a ridge; else from end to end. */
export function dimensionWishes(
  member: DrawnMember,
  points: readonly MeasuringPoint[],
  scale: TimberScale,
  units: LengthUnits,
): DimensionWish[] {
  if (member.role === 'ridge') return ridgeDimensions(member, points, scale, units)
  if (member.birdsmouth)
    return [...tapeDimensions(points, scale, units), ...heelOutDimension(member, scale, units)]
  return edgeLengths(member).map(({ place, fromMm, toMm }, i) => ({
    texts: [`${place} ${formatLength(toMm - fromMm, units)}`],
    from: { x: scale.xPx(fromMm), y: 0 },
    to: { x: scale.xPx(toMm), y: 0 },
    isMain: i === 0,
  }))
}

/** A valley's heel line, from the plumb line through the plate corner. */
function heelOutDimension(
  member: DrawnMember,
  scale: TimberScale,
  units: LengthUnits,
): DimensionWish[] {
  const outMm = heelOutAlongMm(member)
  if (outMm < 0.5) return []
  return [
    {
      texts: [`heel line ${formatLength(outMm, units)}`],
      from: { x: scale.xPx(0), y: 0 },
      to: { x: scale.xPx(-outMm), y: 0 },
      isMain: false,
    },
  ]
}

/** Every reading of the tape, from the heel plumb line. */
function tapeDimensions(
  points: readonly MeasuringPoint[],
  scale: TimberScale,
  units: LengthUnits,
): DimensionWish[] {
  return points.map((point) => ({
    texts: measuringPointWords(point).map(
      (words) => `${words} ${formatLength(Math.abs(point.alongMm), units)}`,
    ),
    from: { x: scale.xPx(0), y: 0 },
    to: { x: scale.xPx(point.alongMm), y: 0 },
    isMain: point.end === 'head' && (point.name === 'long point' || point.name === 'cut'),
  }))
}

/** A ridge has no heel: its set-out length from node to node, and what runs past each. */
function ridgeDimensions(
  member: DrawnMember,
  points: readonly MeasuringPoint[],
  scale: TimberScale,
  units: LengthUnits,
): DimensionWish[] {
  const setOutMm = member.setOutLengthMm
  const span = (name: string, fromMm: number, toMm: number, isMain: boolean): DimensionWish[] =>
    Math.abs(toMm - fromMm) < 0.5
      ? []
      : [
          {
            texts: [`${name} ${formatLength(Math.abs(toMm - fromMm), units)}`],
            from: { x: scale.xPx(fromMm), y: 0 },
            to: { x: scale.xPx(toMm), y: 0 },
            isMain,
          },
        ]
  const ends = points.flatMap((point) => {
    const fromMm = point.end === 'head' ? setOutMm : 0
    const isPast = point.end === 'head' ? point.alongMm > fromMm : point.alongMm < fromMm
    return span(isPast ? 'past' : 'short', fromMm, point.alongMm, false)
  })
  return [...span('set-out', 0, setOutMm, true), ...ends]
}
