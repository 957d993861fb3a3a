import type { Point2 } from '../roof/roof-types.ts'
import { outlineSignedArea2, outlineTurnedRound } from './outline-geometry.ts'

export type PastedUnit = 'mm' | 'm'
export type PastedProblem = { line: number; message: string }

export type Pasted = {
  /** Counter-clockwise, mm. Empty while anything is wrong. */
  corners: Point2[]
  unit: PastedUnit
  isUnitGuessed: boolean
  /** It ran clockwise and was turned round. */
  wasTurned: boolean
  /** A last line that repeats the first was left out. */
  wasClosed: boolean
  problems: PastedProblem[]
}

/** A house is under 200 m and over 200 mm: a span below this is in metres. */
const largestMetres = 200
const sameMm = 0.5

/**
 * Reads corners as people copy them from a plan: one corner a line, x then y, parted by a comma, a
 * semicolon, a tab or spaces; decimal points or commas. Lines without a figure (a heading) are left out.
 */
export function cornersOfPaste(text: string, wanted: PastedUnit | 'guess' = 'guess'): Pasted {
  const lines = text.split(/\r\n|\r|\n/)
  const read = lines.flatMap((line, i) =>
    /\d/.test(line) ? [{ line: i + 1, ...pairOfLine(line) }] : [],
  )
  const problems = read.flatMap(({ line, message }) => (message ? [{ line, message }] : []))
  const pairs = read.flatMap(({ line, pair }) => (pair ? [{ line, ...pair }] : []))
  const unit = wanted === 'guess' ? unitOf(pairs) : wanted
  const scaled = pairs.map(({ line, x, y }) => ({
    line,
    x: tidyMm(unit === 'm' ? x * 1000 : x),
    y: tidyMm(unit === 'm' ? y * 1000 : y),
  }))
  const { corners, wasClosed } = withoutClosing(scaled)
  const all = problems.length > 0 ? problems : cornerProblems(corners, read.length)
  const isClockwise = outlineSignedArea2(corners) < 0
  const round = isClockwise ? outlineTurnedRound(corners).corners : corners
  return {
    corners: all.length > 0 ? [] : round.map(({ x, y }) => ({ x, y })),
    unit,
    isUnitGuessed: wanted === 'guess',
    wasTurned: isClockwise,
    wasClosed,
    problems: all,
  }
}

type Pair = { x: number; y: number }

function pairOfLine(line: string): { pair: Pair | null; message: string | null } {
  const bare = line.trim().replace(/^(?:corner\s*)?\d+\s*[:)]\s*/i, '')
  const parts = partsOf(bare)
  if (parts === null || parts.length !== 2) {
    const found = parts === null ? 'can be read two ways' : `has ${countWords(parts.length)}`
    const way = 'put x and y on it, with a semicolon between them'
    return { pair: null, message: `“${shortened(line)}” ${found}: ${way}.` }
  }
  const [x = NaN, y = NaN] = parts.map(numberOf)
  if (Number.isFinite(x) && Number.isFinite(y)) return { pair: { x, y }, message: null }
  const bad = parts.find((part) => Number.isNaN(numberOf(part))) ?? ''
  return { pair: null, message: `“${shortened(bad)}” is not a number: type x and y in figures.` }
}

/** Null where a comma might part x and y or stand in a number. */
function partsOf(line: string): string[] | null {
  const trimmed = (list: string[]) => list.map((part) => part.trim()).filter((part) => part !== '')
  for (const mark of [';', '\t']) if (line.includes(mark)) return trimmed(line.split(mark))
  const spaced = trimmed(line.split(/\s+/))
  const commas = line.split(',').length - 1
  // '1,5 2,5' and '1.5, 2.5' can be read one way; '1,5,2' and '1,5' between spaces cannot.
  if (commas === 0) return spaced
  if (commas === 1) return trimmed(line.split(','))
  const isDecimalPair = spaced.length === 2 && spaced.every((part) => /^[^,]+,[^,]+$/.test(part))
  if (isDecimalPair) return spaced
  const spacedCommas = line.split(/,\s+|\s+,/)
  return spacedCommas.length === 2 ? trimmed(spacedCommas) : null
}

function numberOf(text: string): number {
  const plain = text.replace('−', '-').replace(/^[xy]\s*=?\s*/i, '')
  const bare = plain.replace(/\s*(mm|m)$/i, '').replace(',', '.')
  return /^[-+]?(\d+[.]?\d*|[.]\d+)$/.test(bare) ? Number(bare) : NaN
}

function unitOf(pairs: readonly Pair[]): PastedUnit {
  const span = (values: number[]) => Math.max(...values) - Math.min(...values)
  const across = Math.max(span(pairs.map((p) => p.x)), span(pairs.map((p) => p.y)))
  return across < largestMetres ? 'm' : 'mm'
}

type PastedCorner = Point2 & { line: number }

function withoutClosing(corners: PastedCorner[]): { corners: PastedCorner[]; wasClosed: boolean } {
  const [first, last] = [corners[0], corners.at(-1)]
  const wasClosed = corners.length > 1 && !!first && !!last && isSame(first, last)
  return { corners: wasClosed ? corners.slice(0, -1) : corners, wasClosed }
}

const isSame = (a: Point2, b: Point2) => Math.hypot(a.x - b.x, a.y - b.y) < sameMm

const leastCorners = 3
const mostCorners = 64

function cornerProblems(corners: readonly PastedCorner[], linesRead: number): PastedProblem[] {
  const doubled = corners.flatMap((corner, i): PastedProblem[] => {
    const before = corners[i - 1]
    if (!before || !isSame(before, corner)) return []
    const message = `The same corner as line ${before.line}: take one of them out.`
    return [{ line: corner.line, message }]
  })
  if (doubled.length > 0) return doubled
  if (linesRead > 0 && corners.length < leastCorners) {
    const message = `An outline needs at least ${leastCorners} corners.`
    return [{ line: corners.at(-1)?.line ?? 1, message }]
  }
  const over = corners[mostCorners]
  return over ? [{ line: over.line, message: `A plan has at most ${mostCorners} corners.` }] : []
}

/** Metres times a thousand, without the dust of binary fractions. */
function tidyMm(mm: number): number {
  return Math.round(mm * 1000) / 1000
}

function countWords(count: number): string {
  return count === 1 ? 'only one figure' : `${count} figures`
}

function shortened(text: string): string {
  const bare = text.trim().replaceAll(/\s+/g, ' ')
  return bare.length > 24 ? `${bare.slice(0, 23)}…` : bare
}
