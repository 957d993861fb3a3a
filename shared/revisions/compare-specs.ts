import { memberShapeKey } from '../day-plan/member-shape.ts'
import type { CutLine, FrameSpec, MemberRole, Section } from '../roof/roof-types.ts'

export const lineChangeKinds = [
  'gone',
  'added',
  'longer',
  'shorter',
  'other-size',
  'other-cuts',
  'more',
  'fewer',
  'same',
] as const
export type LineChangeKind = (typeof lineChangeKinds)[number]

type LineSide = { mark: string; section: Section; cutLengthMm: number; quantity: number }

/** One line of the cut list in an older and a newer revision. */
export type LineChange = {
  kind: LineChangeKind
  role: MemberRole
  before: LineSide | null
  after: LineSide | null
  /** After less before; 0 where one of them is missing. */
  byMm: number
}

type Line = CutLine & { shape: string }

/**
 * Two issued roofs line by line: lines alike are paired first, whatever they are called; then those of the
 * same role and mark; then those of the same role, nearest in length. What is left is gone or added.
 *
 * @param sameLengthMm lengths closer than this are the same to the tape: the firm's rounding.
 */
export function compareSpecs(
  before: FrameSpec,
  after: FrameSpec,
  { sameLengthMm }: { sameLengthMm: number },
): LineChange[] {
  const older = linesOf(before)
  const newer = linesOf(after)
  const pairs = [
    ...takePairs(older, newer, (a, b) => (a.shape === b.shape ? 0 : null)),
    ...takePairs(older, newer, (a, b) => (a.role === b.role && a.mark === b.mark ? 0 : null)),
    ...takePairs(older, newer, (a, b) =>
      a.role === b.role ? Math.abs(a.cutLengthMm - b.cutLengthMm) : null,
    ),
  ]
  const changes = [
    ...pairs.map(([a, b]) => changeOf(a, b, sameLengthMm)),
    ...older.map((a): LineChange => alone('gone', a)),
    ...newer.map((b): LineChange => alone('added', b)),
  ]
  const place = new Map([...before.cutLines, ...after.cutLines].map((line, i) => [line.mark, i]))
  const placeOf = (one: LineChange) => place.get((one.after ?? one.before)?.mark ?? '') ?? 0
  return changes.sort((a, b) => placeOf(a) - placeOf(b))
}

function linesOf(spec: FrameSpec): Line[] {
  const members = new Map(spec.members.map((member) => [member.mark, member]))
  return spec.cutLines.map((line) => {
    const first = members.get(line.members[0] ?? '')
    return { ...line, shape: first ? memberShapeKey(first) : line.mark }
  })
}

/** Takes the nearest pairs out of both lists; `distance` null: no pair. */
function takePairs(
  older: Line[],
  newer: Line[],
  distance: (a: Line, b: Line) => number | null,
): [Line, Line][] {
  const possible = older
    .flatMap((a) => newer.map((b) => ({ a, b, far: distance(a, b) })))
    .filter((one): one is { a: Line; b: Line; far: number } => one.far !== null)
    .sort((x, y) => x.far - y.far)
  const taken = new Set<Line>()
  const pairs: [Line, Line][] = []
  for (const { a, b } of possible) {
    if (taken.has(a) || taken.has(b)) continue
    taken.add(a).add(b)
    pairs.push([a, b])
  }
  for (const [a, b] of pairs) {
    older.splice(older.indexOf(a), 1)
    newer.splice(newer.indexOf(b), 1)
  }
  return pairs
}

const sideOf = ({ mark, section, cutLengthMm, quantity }: Line): LineSide => ({
  mark,
  section,
  cutLengthMm,
  quantity,
})

function alone(kind: 'gone' | 'added', line: Line): LineChange {
  const side = sideOf(line)
  const sides = kind === 'gone' ? { before: side, after: null } : { before: null, after: side }
  return { kind, role: line.role, ...sides, byMm: 0 }
}

function kindOf(a: Line, b: Line, byMm: number, sameLengthMm: number): LineChangeKind {
  const isSize =
    a.section.depthMm === b.section.depthMm && a.section.thicknessMm === b.section.thicknessMm
  if (!isSize) return 'other-size'
  if (Math.abs(byMm) >= sameLengthMm) return byMm > 0 ? 'longer' : 'shorter'
  if (a.shape !== b.shape) return 'other-cuts'
  if (a.quantity !== b.quantity) return b.quantity > a.quantity ? 'more' : 'fewer'
  return 'same'
}

function changeOf(a: Line, b: Line, sameLengthMm: number): LineChange {
  const byMm = b.cutLengthMm - a.cutLengthMm
  const kind = kindOf(a, b, byMm, sameLengthMm)
  return { kind, role: b.role, before: sideOf(a), after: sideOf(b), byMm }
}
