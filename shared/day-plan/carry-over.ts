import type { FrameSpec, Member } from '../roof/roof-types.ts'
import { memberShapeKey } from './member-shape.ts'
import { nothingDone, type DonePieces } from './day-plan.ts'

/** Pieces done to one revision, in the marks of another. */
export type CarriedOver = {
  done: DonePieces
  /** Marks, in the old revision, of pieces already cut that the new one has no place for. */
  cutButUnused: string[]
}

/**
 * Which pieces of `next` are there already, from what was done to `previous`: a piece cut serves any alike
 * piece, a piece stood serves only the alike one at its place. Set-out work carries over when the plates are
 * the same ones.
 */
export function carryOver(previous: FrameSpec, next: FrameSpec, done: DonePieces): CarriedOver {
  const shapes = countBy(previous.members.filter((m) => done.cut.has(m.mark)).map(memberShapeKey))
  const places = new Set(previous.members.filter((m) => done.stood.has(m.mark)).map(placeKey))
  const stood = new Set(next.members.filter((m) => places.has(placeKey(m))).map((m) => m.mark))
  const cut = new Set<string>()
  // Pieces that stand are taken first, so that a cut piece is not promised elsewhere while it stands.
  const standingFirst = [...next.members].sort(
    (a, b) => Number(stood.has(b.mark)) - Number(stood.has(a.mark)),
  )
  for (const member of standingFirst) {
    const left = shapes.get(memberShapeKey(member)) ?? 0
    if (left === 0) continue
    shapes.set(memberShapeKey(member), left - 1)
    cut.add(member.mark)
  }
  const cutButUnused = previous.members
    .filter((m) => done.cut.has(m.mark) && takeOne(shapes, memberShapeKey(m)))
    .map((m) => m.mark)
  const setOut = platesKey(previous) === platesKey(next) ? done.setOut : nothingDone.setOut
  return { done: { cut, stood, setOut }, cutButUnused }
}

function placeKey(member: Member): string {
  const { from, to } = member.axis
  const points = [from, to].map((p) => [p.x, p.y, p.z].map(Math.round).join())
  return `${memberShapeKey(member)} ${points.join(' ')}`
}

function platesKey(spec: FrameSpec): string {
  const ends = spec.lines
    .filter((line) => line.kind === 'eave' || line.kind === 'verge')
    .map((line) => [line.from, line.to].map((p) => `${Math.round(p.x)},${Math.round(p.y)}`).join())
  return ends.sort().join(' ')
}

function countBy(keys: readonly string[]): Map<string, number> {
  const counts = new Map<string, number>()
  for (const key of keys) counts.set(key, (counts.get(key) ?? 0) + 1)
  return counts
}

function takeOne(counts: Map<string, number>, key: string): boolean {
  const left = counts.get(key) ?? 0
  counts.set(key, left - 1)
  return left > 0
}
