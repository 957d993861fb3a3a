import type { Point2 } from '../roof/roof-types.ts'
import { outlineTurnedRound } from './outline-geometry.ts'

/** How a ready shape lies on the page: turned by quarters, and mirrored before that. */
export type WingLie = { turn: 'none' | 'left' | 'half' | 'right'; isMirrored: boolean }

/** A plate of a ready shape: where it starts, and which of the shape's own sides it is. */
export type WingPlate = { side: number; start: Point2 }

/** An L: two wings along the front and along the left side; the inner corner lies back right. */
export type LMeasures = {
  lengthMm: number
  widthMm: number
  frontWidthMm: number
  sideWidthMm: number
}

/** A main building with one wing at its back. */
export type TMeasures = {
  lengthMm: number
  widthMm: number
  wingWidthMm: number
  projectionMm: number
  /** From the main building's left end to the wing. */
  fromLeftMm: number
}

/** A front building with a wing back from each end. */
export type UMeasures = {
  lengthMm: number
  /** Front of the front building to the back of the left wing. */
  leftLengthMm: number
  rightLengthMm: number
  frontWidthMm: number
  leftWidthMm: number
  rightWidthMm: number
}

/** A main building with a wing straight through it. */
export type CrossMeasures = {
  lengthMm: number
  widthMm: number
  wingWidthMm: number
  backMm: number
  frontMm: number
  fromLeftMm: number
}

/** Corners counter-clockwise, as the shape lies before it is turned; mm, NaN where a measure is. */
export function lOutline({ lengthMm, widthMm, frontWidthMm, sideWidthMm }: LMeasures): Point2[] {
  return points([
    [0, 0],
    [lengthMm, 0],
    [lengthMm, frontWidthMm],
    [sideWidthMm, frontWidthMm],
    [sideWidthMm, widthMm],
    [0, widthMm],
  ])
}

export function tOutline(measures: TMeasures): Point2[] {
  const { lengthMm, widthMm, wingWidthMm, projectionMm, fromLeftMm } = measures
  const [from, to, back] = [fromLeftMm, fromLeftMm + wingWidthMm, widthMm + projectionMm]
  return points([
    [0, 0],
    [lengthMm, 0],
    [lengthMm, widthMm],
    [to, widthMm],
    [to, back],
    [from, back],
    [from, widthMm],
    [0, widthMm],
  ])
}

export function uOutline(measures: UMeasures): Point2[] {
  const { lengthMm, leftLengthMm, rightLengthMm, frontWidthMm } = measures
  const [from, to] = [measures.leftWidthMm, lengthMm - measures.rightWidthMm]
  return points([
    [0, 0],
    [lengthMm, 0],
    [lengthMm, rightLengthMm],
    [to, rightLengthMm],
    [to, frontWidthMm],
    [from, frontWidthMm],
    [from, leftLengthMm],
    [0, leftLengthMm],
  ])
}

export function crossOutline(measures: CrossMeasures): Point2[] {
  const { lengthMm, widthMm, wingWidthMm, backMm, frontMm, fromLeftMm } = measures
  const [from, to, mainBack] = [fromLeftMm, fromLeftMm + wingWidthMm, frontMm + widthMm]
  const back = mainBack + backMm
  return points([
    [0, frontMm],
    [from, frontMm],
    [from, 0],
    [to, 0],
    [to, frontMm],
    [lengthMm, frontMm],
    [lengthMm, mainBack],
    [to, mainBack],
    [to, back],
    [from, back],
    [from, mainBack],
    [0, mainBack],
  ])
}

function points(list: [number, number][]): Point2[] {
  return list.map(([x, y]) => ({ x, y }))
}

/**
 * A shape as it lies: mirrored left to right, turned, and moved so that its lowest corners touch both
 * axes. Each plate keeps the number of the side it was.
 */
export function laidOutline(outline: readonly Point2[], lie: WingLie): WingPlate[] {
  const plain = outline.map((start, side): WingPlate => ({ side, start }))
  const mirrored = lie.isMirrored ? mirroredPlates(plain) : plain
  const turned = mirrored.map(({ side, start }) => ({
    side,
    start: quarterTurned(start, lie.turn),
  }))
  const left = leastOf(turned.map(({ start }) => start.x))
  const low = leastOf(turned.map(({ start }) => start.y))
  return turned.map(({ side, start }) => ({
    side,
    start: { x: start.x - left, y: start.y - low },
  }))
}

/** The way a shape's own point goes, for what is drawn beside its outline. */
export function laidPoint(point: Point2, lie: WingLie): Point2 {
  return quarterTurned(lie.isMirrored ? { x: -point.x, y: point.y } : point, lie.turn)
}

function mirroredPlates(plates: readonly WingPlate[]): WingPlate[] {
  const { corners, edgeOf } = outlineTurnedRound(plates.map(({ start }) => start))
  return corners.map((corner, k) => ({
    side: edgeOf[k] ?? k,
    start: { x: -corner.x, y: corner.y },
  }))
}

function quarterTurned({ x, y }: Point2, turn: WingLie['turn']): Point2 {
  if (turn === 'left') return { x: -y, y: x }
  if (turn === 'half') return { x: -x, y: -y }
  return turn === 'right' ? { x: y, y: -x } : { x, y }
}

/** Of what can be read; a measure not typed yet moves nothing. */
function leastOf(values: number[]): number {
  const known = values.filter(Number.isFinite)
  return known.length > 0 ? Math.min(...known) : 0
}
