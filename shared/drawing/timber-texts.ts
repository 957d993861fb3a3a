import type { DrawnMember } from './timber-pose.ts'
import { formatLength, type LengthUnits } from '../units/format-length.ts'
import type { DrawingPoint, Segment } from './drawing-geometry.ts'
import { heelLineStandMm } from './timber-outline.ts'
import { textWidthPx } from './text-size.ts'

export const timberTextPx = 13

/** A word below or above the timber, with a fine line to what it names. */
export type TimberCallout = {
  text: string
  letter: string | null
  x: number
  baselineY: number
  widthPx: number
  leader: Segment
}

export type CalloutWish = {
  text: string
  letter: string | null
  anchor: DrawingPoint
  /** Which way the words run from what they name. */
  lean: 'left' | 'middle' | 'right'
}

const leanShare = { left: -1, middle: 0, right: 1 } as const

/** A dimension from the heel plumb line (or the whole length), its text above its line. */
export type TimberDimension = {
  text: string
  fromX: number
  toX: number
  lineY: number
  textX: number
  /** Where the extension lines start: the measured points. */
  fromY: number
  toY: number
  isMain: boolean
}

export type DimensionWish = {
  /** From the fullest wording to the shortest; the first that fits its line is taken. */
  texts: string[]
  from: DrawingPoint
  to: DrawingPoint
  isMain: boolean
}

export const dimensionRowPx = 22
export const calloutRowPx = 20
const letterRoomPx = 20
const apartPx = 5

/**
 * Words in rows below the timber: each under what it names, the next row where they would touch. Heel
 * and seat come nearest, so that no fine line runs through the words of the ends.
 */
export function placeCallouts(
  wishes: readonly CalloutWish[],
  topY: number,
  widthPx: number,
): { callouts: TimberCallout[]; heightPx: number } {
  const rows: { from: number; to: number }[][] = []
  const callouts = [...wishes]
    .sort((a, b) => Number(isEnd(a)) - Number(isEnd(b)) || a.anchor.x - b.anchor.x)
    .map((wish): TimberCallout => {
      const width = textWidthPx(wish.text, timberTextPx) + (wish.letter ? letterRoomPx : 0)
      const wantedX = wish.anchor.x + leanShare[wish.lean] * (width / 2 - 6)
      const x = Math.min(Math.max(wantedX, width / 2 + 2), widthPx - width / 2 - 2)
      const leaderX = Math.min(Math.max(wish.anchor.x, x - width / 2 + 4), x + width / 2 - 4)
      const row = freeRow(rows, x - width / 2 - apartPx, x + width / 2 + apartPx)
      const baselineY = topY + row * calloutRowPx + timberTextPx
      return {
        text: wish.text,
        letter: wish.letter,
        x,
        baselineY,
        widthPx: width,
        leader: { from: wish.anchor, to: { x: leaderX, y: baselineY - timberTextPx } },
      }
    })
  return { callouts, heightPx: rows.length * calloutRowPx }
}

function isEnd(wish: CalloutWish): boolean {
  return wish.lean === 'middle'
}

/** Dimensions in rows above the timber, the shortest nearest to it. */
export function placeDimensions(
  wishes: readonly DimensionWish[],
  widthPx: number,
): { dimensions: TimberDimension[]; heightPx: number } {
  const rows: { from: number; to: number }[][] = []
  const spanPx = (wish: DimensionWish) => Math.abs(wish.to.x - wish.from.x)
  const rowed = [...wishes]
    .sort((a, b) => spanPx(a) - spanPx(b))
    .map((wish) => {
      const text = fittingText(wish.texts, spanPx(wish))
      const half = textWidthPx(text, timberTextPx) / 2 + 2
      const middle = (wish.from.x + wish.to.x) / 2
      const textX = Math.min(Math.max(middle, half), widthPx - half)
      const from = Math.min(wish.from.x, wish.to.x, textX - half)
      const to = Math.max(wish.from.x, wish.to.x, textX + half)
      return { wish, text, textX, row: freeRow(rows, from + 1, to - 1) }
    })
  const heightPx = rows.length * dimensionRowPx
  const dimensions = rowed.map(({ wish, text, textX, row }): TimberDimension => ({
    text,
    fromX: wish.from.x,
    toX: wish.to.x,
    fromY: wish.from.y,
    toY: wish.to.y,
    lineY: heightPx - row * dimensionRowPx - 3,
    textX,
    isMain: wish.isMain,
  }))
  return { dimensions, heightPx }
}

function fittingText(texts: readonly string[], spanPx: number): string {
  const fits = texts.find((text) => textWidthPx(text, timberTextPx) + 4 <= spanPx)
  return fits ?? texts.at(-1) ?? ''
}

/** The first row with nothing in the way, taken. */
function freeRow(rows: { from: number; to: number }[][], from: number, to: number): number {
  const free = rows.findIndex((row) => row.every((one) => one.to <= from || one.from >= to))
  if (free >= 0) {
    rows[free]?.push({ from, to })
    return free
  }
  rows.push([{ from, to }])
  return rows.length - 1
}

/** The height over plate in words, as it is down the heel line; empty with no birdsmouth. */
export function overPlateText(member: DrawnMember, units: LengthUnits): string {
  return member.birdsmouth ? `over plate ${formatLength(heelLineStandMm(member), units)}` : ''
}
