import type { Angle, Cut, Member } from '../roof/roof-types.ts'
import { timberTop } from './timber-shape.ts'

/** What a bevel marks; the drawing puts its letter there. */
export type BevelPlace = 'heel' | 'seat' | 'tail' | 'foot' | 'head' | 'backing'

/** One setting of the bevel, and everything on this timber that is marked with it. */
export type BevelDialData = {
  /** Stands at the cut in the drawing too. */
  letter: string
  title: string
  /** Which face of the timber the bevel is laid on. */
  where: 'side' | 'top' | 'end'
  angle: Angle
  /** 'heel', 'head, left cheek' … in the order of marking. */
  uses: string[]
  places: BevelPlace[]
  /** For a bevel across the top: the side of its long point. */
  longSide: 'left' | 'right' | 'none'
  bladeTiltDeg: number | null
  pastSaw: boolean
  /** The bevel were the top the other way: square for backed, backed for square. */
  otherTop: { title: string; fromEdgeDeg: number } | null
}

type LooseDial = Omit<BevelDialData, 'letter'>

const sameDeg = 0.05

/** Every bevel of a timber once, in the order it is marked: heel, seat, tail, head, backing. */
export function bevelDialsOf(member: Member): BevelDialData[] {
  const ends = [
    member.cuts.filter((cut) => cut.end !== 'head'),
    member.cuts.filter((cut) => cut.end === 'head'),
  ]
  const cutDials = ends.flatMap((cuts) =>
    cuts.flatMap((cut) => [sideDial(member, cut), ...topDials(member, cut, cuts)]),
  )
  const dials = [...birdsmouthDials(member), ...cutDials, ...backingDials(member)]
  return gathered(dials).map((dial, i) => ({ ...dial, letter: letterFor(i) }))
}

/**
 * "plumb cut" when it follows the plumb line down the side, "square cut" when square to the edge, "mitre"
 * when square to the edge and not square across.
 */
export function cutWords(member: Member, cut: Cut): string {
  if (Math.abs(cut.face.fromSquareDeg) <= sameDeg)
    return cut.longSide === 'none' ? 'square cut' : 'mitre'
  if (member.role === 'collar-tie') return 'splay cut'
  return isPlumb(member, cut) ? 'plumb cut' : 'cut'
}

/**
 * The bevel down the side. Both ends of a collar tie follow the rafters' slope and run out below, so one
 * setting, turned over, marks both.
 */
export function faceAngle(member: Pick<Member, 'role'>, cut: Cut): Angle {
  const { fromEdgeDeg } = cut.face
  if (member.role !== 'collar-tie' || fromEdgeDeg <= 90) return cut.face
  return { fromEdgeDeg: 180 - fromEdgeDeg, fromSquareDeg: fromEdgeDeg - 90 }
}

function isPlumb(member: Member, cut: Cut): boolean {
  return Math.abs(cut.face.fromSquareDeg - member.pitchDeg) <= sameDeg
}

function sideDial(member: Member, cut: Cut): LooseDial {
  const words = cutWords(member, cut)
  const titles: Record<string, string> = {
    'plumb cut': 'Plumb bevel',
    'square cut': 'Square',
    mitre: 'Square',
    'splay cut': 'Splay, longer below',
  }
  return {
    title: titles[words] ?? 'Bevel down the side',
    where: 'side',
    angle: faceAngle(member, cut),
    uses: [cut.end],
    places: [cut.end],
    longSide: 'none',
    bladeTiltDeg: null,
    pastSaw: false,
    otherTop: null,
  }
}

function topDials(member: Member, cut: Cut, beside: readonly Cut[]): LooseDial[] {
  if (cut.longSide === 'none') return []
  const cheek = beside.length > 1 ? `, ${cut.longSide === 'left' ? 'right' : 'left'} cheek` : ''
  const otherTop = otherTopWords(member)
  return [
    {
      title: 'Edge bevel',
      where: 'top',
      angle: cut.edge,
      uses: [`${cut.end}${cheek}`],
      places: [cut.end],
      longSide: cut.longSide,
      bladeTiltDeg: cut.bladeTiltDeg,
      pastSaw: cut.pastSaw,
      otherTop: cut.edgeOtherTop
        ? { title: otherTop, fromEdgeDeg: cut.edgeOtherTop.fromEdgeDeg }
        : null,
    },
  ]
}

function otherTopWords(member: Member): string {
  const top = timberTop(member)
  if (top === 'backed') return 'On a square top'
  return member.role === 'valley' ? 'On a dished top' : 'On a backed top'
}

function birdsmouthDials(member: Member): LooseDial[] {
  if (!member.birdsmouth) return []
  const { seatFromEdgeDeg, heelFromEdgeDeg } = member.birdsmouth
  const dial = (place: 'seat' | 'heel', fromEdgeDeg: number): LooseDial => ({
    title: place === 'seat' ? 'Seat bevel' : 'Plumb bevel',
    where: 'side',
    angle: { fromEdgeDeg, fromSquareDeg: 90 - fromEdgeDeg },
    uses: [place],
    places: [place],
    longSide: 'none',
    bladeTiltDeg: null,
    pastSaw: false,
    otherTop: null,
  })
  return [dial('heel', heelFromEdgeDeg), dial('seat', seatFromEdgeDeg)]
}

function backingDials(member: Member): LooseDial[] {
  if (!member.backing) return []
  const title = timberTop(member) === 'dished' ? 'Dish' : 'Backing'
  const leftDeg = Math.abs(member.backing.leftDeg)
  const rightDeg = Math.abs(member.backing.rightDeg)
  const dial = (use: string, fromSquareDeg: number): LooseDial => ({
    title,
    where: 'end',
    angle: { fromEdgeDeg: 90 - fromSquareDeg, fromSquareDeg },
    uses: [use],
    places: ['backing'],
    longSide: 'none',
    bladeTiltDeg: null,
    pastSaw: false,
    otherTop: null,
  })
  if (Math.abs(leftDeg - rightDeg) <= sameDeg) return [dial('both edges', leftDeg)]
  return [dial('left edge', leftDeg), dial('right edge', rightDeg)].filter(
    (one) => one.angle.fromSquareDeg > sameDeg,
  )
}

/** A bevel is set once and used for all that is marked with it. */
function gathered(dials: readonly LooseDial[]): LooseDial[] {
  const kept: LooseDial[] = []
  for (const dial of dials) {
    const at = kept.findIndex((one) => isSameSetting(one, dial))
    const found = kept[at]
    if (found) kept[at] = together(found, dial)
    else kept.push(dial)
  }
  return kept.map((dial) => ({ ...dial, uses: withBothCheeks(dial.uses) }))
}

function isSameSetting(a: LooseDial, b: LooseDial): boolean {
  const tiltGapDeg = Math.abs((a.bladeTiltDeg ?? 0) - (b.bladeTiltDeg ?? 0))
  return (
    a.where === b.where &&
    a.where !== 'end' &&
    Math.abs(a.angle.fromEdgeDeg - b.angle.fromEdgeDeg) <= sameDeg &&
    tiltGapDeg <= sameDeg &&
    a.pastSaw === b.pastSaw
  )
}

function together(a: LooseDial, b: LooseDial): LooseDial {
  return {
    ...a,
    uses: [...new Set([...a.uses, ...b.uses])],
    places: [...new Set([...a.places, ...b.places])],
    longSide: a.longSide === b.longSide ? a.longSide : 'none',
  }
}

function withBothCheeks(uses: readonly string[]): string[] {
  const both = (end: string) =>
    uses.includes(`${end}, left cheek`) && uses.includes(`${end}, right cheek`)
  const named = uses.map((use) => {
    const [end = use, cheek] = use.split(', ')
    return cheek && both(end) ? `${end}, both cheeks` : use
  })
  return [...new Set(named)]
}

function letterFor(i: number): string {
  return String.fromCharCode('A'.charCodeAt(0) + i)
}
