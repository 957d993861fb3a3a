import type { Point2 } from '../roof/roof-types.ts'
import {
  crossOutline,
  laidOutline,
  lOutline,
  tOutline,
  uOutline,
  type WingLie,
} from '../outline/wing-outlines.ts'
import type { RoofForm } from './roof-form.ts'
import { lengthMmOfText } from './typed-measure.ts'
import type { WingShape } from './wing-form.ts'

/** A measure of a ready shape: the letter it has on the sketch, its field, and what to call it. */
export type WingMeasure = {
  letter: string
  path: string
  label: string
  /** In 'Type the …'. */
  what: string
  /** What holds while it is empty; absent where it must be typed. */
  ifEmpty?: string
}

const mainLength = { letter: 'A', path: 'lengthMm' }
const mainWidth = { letter: 'B', path: 'widthMm' }
const inTheMiddle = 'Empty: in the middle.'

export const wingMeasures: Record<WingShape, WingMeasure[]> = {
  l: [
    { ...mainLength, label: 'Length over all', what: 'length over all' },
    { ...mainWidth, label: 'Width over all', what: 'width over all' },
    { ...of('C', 'l.frontWidthMm'), label: 'Width of wing 1', what: 'width of wing 1' },
    { ...of('D', 'l.sideWidthMm'), label: 'Width of wing 2', what: 'width of wing 2' },
  ],
  t: [
    { ...mainLength, label: 'Main length', what: 'length of the main building' },
    { ...mainWidth, label: 'Main width', what: 'width of the main building' },
    { ...of('C', 't.wingWidthMm'), label: 'Wing width', what: 'width of the wing' },
    { ...of('D', 't.projectionMm'), label: 'Wing projection', what: 'projection of the wing' },
    {
      ...of('E', 't.fromLeftMm'),
      label: 'Wing from the end',
      what: 'distance of the wing from the end',
      ifEmpty: inTheMiddle,
    },
  ],
  u: [
    { ...mainLength, label: 'Length over all', what: 'length over all' },
    { ...mainWidth, label: 'Wing 1 over all', what: 'length of wing 1 over all' },
    { ...of('C', 'u.frontWidthMm'), label: 'Width of the middle', what: 'width of the middle' },
    { ...of('D', 'u.leftWidthMm'), label: 'Width of wing 1', what: 'width of wing 1' },
    { ...of('E', 'u.rightWidthMm'), label: 'Width of wing 2', what: 'width of wing 2' },
    {
      ...of('F', 'u.rightLengthMm'),
      label: 'Wing 2 over all',
      what: 'length of wing 2 over all',
      ifEmpty: 'Empty: as long as wing 1.',
    },
  ],
  cross: [
    { ...mainLength, label: 'Main length', what: 'length of the main building' },
    { ...mainWidth, label: 'Main width', what: 'width of the main building' },
    { ...of('C', 'cross.wingWidthMm'), label: 'Width of the wings', what: 'width of the wings' },
    { ...of('D', 'cross.backMm'), label: 'Wing 1 projection', what: 'projection of wing 1' },
    {
      ...of('E', 'cross.frontMm'),
      label: 'Wing 2 projection',
      what: 'projection of wing 2',
      ifEmpty: 'Empty: as wing 1.',
    },
    {
      ...of('F', 'cross.fromLeftMm'),
      label: 'Wings from the end',
      what: 'distance of the wings from the end',
      ifEmpty: inTheMiddle,
    },
  ],
}

function of(letter: string, path: string) {
  return { letter, path: `wings.${path}` }
}

/** What each plate is called, by the shape's own sides. */
export const wingSideNames: Record<WingShape, string[]> = {
  l: [
    'Long side of wing 1',
    'End of wing 1',
    'Inner side of wing 1',
    'Inner side of wing 2',
    'End of wing 2',
    'Long side of wing 2',
  ],
  t: [
    'Long side of the main',
    'End of the main',
    'Main, beside the wing',
    'Side of the wing',
    'End of the wing',
    'Side of the wing',
    'Main, beside the wing',
    'End of the main',
  ],
  u: [
    'Long side of the middle',
    'Outer side of wing 2',
    'End of wing 2',
    'Inner side of wing 2',
    'Inner side of the middle',
    'Inner side of wing 1',
    'End of wing 1',
    'Outer side of wing 1',
  ],
  cross: [
    'Main, beside wing 2',
    'Side of wing 2',
    'End of wing 2',
    'Side of wing 2',
    'Main, beside wing 2',
    'End of the main',
    'Main, beside wing 1',
    'Side of wing 1',
    'End of wing 1',
    'Side of wing 1',
    'Main, beside wing 1',
    'End of the main',
  ],
}

/** The field that makes a side as short or long as it is. */
export const wingSidePaths: Record<WingShape, string[]> = {
  l: ['lengthMm', 'C', 'D', 'C', 'D', 'widthMm'].map(pathIn('l')),
  t: ['lengthMm', 'widthMm', 'E', 'D', 'C', 'D', 'E', 'widthMm'].map(pathIn('t')),
  u: ['lengthMm', 'F', 'E', 'C', 'lengthMm', 'C', 'D', 'widthMm'].map(pathIn('u')),
  cross: ['F', 'E', 'C', 'E', 'F', 'widthMm', 'F', 'D', 'C', 'D', 'F', 'widthMm'].map(
    pathIn('cross'),
  ),
}

function pathIn(shape: WingShape) {
  return (name: string) => wingMeasures[shape].find(({ letter }) => letter === name)?.path ?? name
}

/** The figures of a shape, by letter; what stands for an empty one is put in. NaN where one cannot be read. */
export type WingFigures = Record<'A' | 'B' | 'C' | 'D' | 'E' | 'F', number>

export function wingFigures(form: RoofForm, shape: WingShape): WingFigures {
  const { l, t, u, cross } = form.wings
  const [A, B] = [lengthMmOfText(form.lengthMm), lengthMmOfText(form.widthMm)]
  const read = lengthMmOfText
  const or = (text: string, other: number) => (text.trim() === '' ? other : read(text))
  if (shape === 'l') {
    return { A, B, C: read(l.frontWidthMm), D: read(l.sideWidthMm), E: NaN, F: NaN }
  }
  if (shape === 't') {
    const [C, D] = [read(t.wingWidthMm), read(t.projectionMm)]
    return { A, B, C, D, E: or(t.fromLeftMm, (A - C) / 2), F: NaN }
  }
  if (shape === 'u') {
    const C = read(u.frontWidthMm)
    const [D, E] = [read(u.leftWidthMm), read(u.rightWidthMm)]
    return { A, B, C, D, E, F: or(u.rightLengthMm, B) }
  }
  const [C, D] = [read(cross.wingWidthMm), read(cross.backMm)]
  return { A, B, C, D, E: or(cross.frontMm, D), F: or(cross.fromLeftMm, (A - C) / 2) }
}

/** Corners as the shape lies before it is turned. */
export function wingOutlineOf(shape: WingShape, figures: WingFigures): Point2[] {
  const { A, B, C, D, E, F } = figures
  if (shape === 'l') {
    return lOutline({ lengthMm: A, widthMm: B, frontWidthMm: C, sideWidthMm: D })
  }
  if (shape === 't') {
    const wing = { wingWidthMm: C, projectionMm: D, fromLeftMm: E }
    return tOutline({ lengthMm: A, widthMm: B, ...wing })
  }
  if (shape === 'u') {
    const lengths = { lengthMm: A, leftLengthMm: B, rightLengthMm: F }
    return uOutline({ ...lengths, frontWidthMm: C, leftWidthMm: D, rightWidthMm: E })
  }
  const wings = { wingWidthMm: C, backMm: D, frontMm: E, fromLeftMm: F }
  return crossOutline({ lengthMm: A, widthMm: B, ...wings })
}

export function wingLie(form: RoofForm): WingLie {
  return { turn: form.wings.turn, isMirrored: form.wings.mirrored === 'yes' }
}

/** The plates of a ready shape as it lies; NaN where a measure cannot be read. */
export function wingPlates(form: RoofForm, shape: WingShape) {
  return laidOutline(wingOutlineOf(shape, wingFigures(form, shape)), wingLie(form))
}
