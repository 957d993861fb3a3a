import type { Point2 } from '../roof/roof-types.ts'
import { mmText } from '../outline/outline-geometry.ts'
import { plainSide, type SideForm } from './form-parts.ts'
import type { CornerForm, RoofForm, SideKey } from './roof-form.ts'
import { lengthMmOfText } from './typed-measure.ts'
import { isWingShape } from './wing-form.ts'
import { wingPlates, wingSideNames } from './wing-measures.ts'

/** One plate of the roof as typed: where it starts, and the form path of what it has of its own. */
export type FormPlate = {
  /** 'sides.front', 'wings.l.sides.2' or 'corners.3'. */
  path: string
  name: string
  start: Point2
  side: SideForm
}

export const sideNames: Record<SideKey, string> = {
  front: 'Front',
  'front-right': 'Front right splay',
  right: 'Right end',
  'back-right': 'Back right splay',
  back: 'Back',
  'back-left': 'Back left splay',
  left: 'Left end',
  'front-left': 'Front left splay',
}

/**
 * How far the corners of a cut-off end lie back from its square corner, mm: half a regular octagon
 * across the width, or the splay as typed. 0 for a plain rectangle.
 */
export function endCutMm(form: RoofForm): number {
  if (form.shape === 'octagonal-end') return lengthMmOfText(form.widthMm) * (1 - Math.SQRT1_2)
  if (form.shape === 'splayed-end') return lengthMmOfText(form.splayMm)
  return 0
}

export function endsCut(form: RoofForm): { right: boolean; left: boolean } {
  if (form.shape !== 'octagonal-end' && form.shape !== 'splayed-end') {
    return { right: false, left: false }
  }
  return { right: form.endAt !== 'left', left: form.endAt !== 'right' }
}

/** Length of front and back between the cut-off ends, mm. */
export function straightSideMm(form: RoofForm): number {
  const lengthMm = lengthMmOfText(form.lengthMm)
  if (form.lengthOf !== 'overall') return lengthMm
  const { right, left } = endsCut(form)
  return lengthMm - endCutMm(form) * (Number(right) + Number(left))
}

/** The plates counter-clockwise from the front's left corner; NaN where a measure cannot be read. */
export function platesOfForm(form: RoofForm): FormPlate[] {
  if (form.shape === 'corners') {
    return form.corners.map((corner, i) => ({
      path: `corners.${i}`,
      name: `Plate ${i + 1}`,
      start: { x: lengthMmOfText(corner.x), y: lengthMmOfText(corner.y) },
      side: corner,
    }))
  }
  const { shape } = form
  if (isWingShape(shape)) {
    return wingPlates(form, shape).map(({ side, start }) => ({
      path: `wings.${shape}.sides.${side}`,
      name: wingSideNames[shape][side] ?? `Side ${side + 1}`,
      start,
      side: form.wings[shape].sides[side] ?? plainSide(),
    }))
  }
  return shapeCorners(form).map(([key, x, y]) => ({
    path: `sides.${key}`,
    name: sideNames[key],
    start: { x, y },
    side: form.sides[key],
  }))
}

function shapeCorners(form: RoofForm): [SideKey, number, number][] {
  const { right, left } = endsCut(form)
  const [wide, cut, side] = [lengthMmOfText(form.widthMm), endCutMm(form), straightSideMm(form)]
  const from = left ? cut : 0
  const to = from + side
  const rightEnd: [SideKey, number, number][] = right
    ? [
        ['front-right', to, 0],
        ['right', to + cut, cut],
        ['back-right', to + cut, wide - cut],
      ]
    : [['right', to, 0]]
  const leftEnd: [SideKey, number, number][] = left
    ? [
        ['back-left', from, wide],
        ['left', 0, wide - cut],
        ['front-left', 0, cut],
      ]
    : [['left', 0, wide]]
  return [['front', from, 0], ...rightEnd, ['back', to, wide], ...leftEnd]
}

/**
 * The form with its shape turned into typed corners, to be moved from there; each plate keeps its
 * finish, pitch and overhang. Corners that somebody typed already stay as they are.
 */
export function withTypedCorners(form: RoofForm): RoofForm {
  const isTyped = form.corners.some(({ x, y }) => x !== '' || y !== '')
  return (isTyped ? null : asCorners(form)) ?? { ...form, shape: 'corners' }
}

/** The plan on screen as a list of corners, over whatever the list held; null where it cannot be read. */
export function asCorners(form: RoofForm): RoofForm | null {
  if (form.shape === 'corners') return form
  const plates = platesOfForm(form)
  if (!plates.every(({ start }) => Number.isFinite(start.x + start.y))) return null
  const corners = plates.map(({ start, side }): CornerForm => ({
    ...side,
    x: mmText(start.x),
    y: mmText(start.y),
  }))
  return { ...form, shape: 'corners', corners }
}
