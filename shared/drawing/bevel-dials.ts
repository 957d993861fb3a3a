import type { Angle, Cut, Member } from '../roof/roof-types.ts'

/** One setting of the bevel: where it is laid and what it is set to. */
export type BevelDialData = {
  /** Stands at the cut in the drawing too. */
  letter: string
  title: string
  /** Which face of the timber the bevel is laid on. */
  where: 'side' | 'top' | 'end'
  angle: Angle
  /** Blade tilt and other things to know before sawing. */
  notes: string[]
  /** What it marks, so that the drawing can put the letter there. */
  at: 'head' | 'foot' | 'tail' | 'seat' | 'heel' | 'backing'
  /** For a bevel across the top: the side of its long point. */
  longSide: 'left' | 'right' | 'none'
  bladeTiltDeg: number | null
  pastSaw: boolean
}

type LooseDial = Omit<BevelDialData, 'letter'>

const sameDeg = 0.05
const endNames = { head: 'Head', foot: 'Foot', tail: 'Tail' } as const

/** Every bevel of a timber once, in the order it is marked: birdsmouth, tail, head, backing. */
export function bevelDialsOf(member: Member): BevelDialData[] {
  const dials = [
    ...birdsmouthDials(member),
    ...member.cuts.filter((cut) => cut.end !== 'head').flatMap(cutDials),
    ...member.cuts.filter((cut) => cut.end === 'head').flatMap(cutDials),
    ...backingDials(member),
  ]
  return withoutRepeats(dials).map((dial, i) => ({ ...dial, letter: letterFor(i) }))
}

/** "plumb cut" when it follows the plumb line down the side, "square cut" when square to the edge. */
export function cutWords(member: Member, cut: Cut): string {
  if (Math.abs(cut.face.fromSquareDeg) <= sameDeg) return 'square cut'
  return Math.abs(cut.face.fromSquareDeg - member.pitchDeg) <= sameDeg ? 'plumb cut' : 'cut'
}

function cutDials(cut: Cut, _: number, cuts: readonly Cut[]): LooseDial[] {
  const name = endNames[cut.end]
  const cheek = cuts.length > 1 ? `, ${cut.longSide === 'left' ? 'right' : 'left'} cheek` : ''
  const common = { at: cut.end, longSide: cut.longSide, pastSaw: cut.pastSaw }
  const isSquareAcross = Math.abs(cut.edge.fromSquareDeg) <= sameDeg
  const down: LooseDial = {
    ...common,
    title: `${name}, down the side`,
    where: 'side',
    angle: cut.face,
    notes: isSquareAcross ? ['Square across the top'] : [],
    bladeTiltDeg: null,
  }
  const across: LooseDial = {
    ...common,
    title: `${name}, across the top${cheek}`,
    where: 'top',
    angle: cut.edge,
    notes: [],
    bladeTiltDeg: cut.bladeTiltDeg,
  }
  return isSquareAcross ? [down] : [down, across]
}

function birdsmouthDials(member: Member): LooseDial[] {
  if (!member.birdsmouth) return []
  const { seatFromEdgeDeg, heelFromEdgeDeg } = member.birdsmouth
  const dial = (at: 'seat' | 'heel', fromEdgeDeg: number): LooseDial => ({
    at,
    title: at === 'seat' ? 'Birdsmouth seat' : 'Birdsmouth heel',
    where: 'side',
    angle: { fromEdgeDeg, fromSquareDeg: 90 - fromEdgeDeg },
    notes: [],
    longSide: 'none',
    bladeTiltDeg: null,
    pastSaw: false,
  })
  return [dial('heel', heelFromEdgeDeg), dial('seat', seatFromEdgeDeg)]
}

function backingDials(member: Member): LooseDial[] {
  if (!member.backing) return []
  const { leftDeg, rightDeg } = member.backing
  const isSame = Math.abs(leftDeg - rightDeg) <= sameDeg
  const dial = (side: string, fromSquareDeg: number): LooseDial => ({
    at: 'backing',
    title: side === '' ? 'Backing, both edges' : `Backing, ${side} edge`,
    where: 'end',
    angle: { fromEdgeDeg: 90 - fromSquareDeg, fromSquareDeg },
    notes: ['Planed off the top, from the side face'],
    longSide: 'none',
    bladeTiltDeg: null,
    pastSaw: false,
  })
  return isSame ? [dial('', leftDeg)] : [dial('left', leftDeg), dial('right', rightDeg)]
}

/** Bevels set alike at one end are one dial: two equal cheeks, two tail cuts. */
function withoutRepeats(dials: readonly LooseDial[]): LooseDial[] {
  const kept: LooseDial[] = []
  for (const dial of dials) {
    const same = kept.findIndex((one) => isSameSetting(one, dial))
    const found = kept[same]
    if (!found) kept.push(dial)
    else if (dial.where === 'top')
      kept[same] = { ...found, title: bothCheeks(found.title), longSide: 'none' }
  }
  return kept
}

function isSameSetting(a: LooseDial, b: LooseDial): boolean {
  return (
    a.at === b.at &&
    a.where === b.where &&
    a.at !== 'backing' &&
    Math.abs(a.angle.fromEdgeDeg - b.angle.fromEdgeDeg) <= sameDeg
  )
}

function bothCheeks(title: string): string {
  return title.replace(/, (left|right) cheek$/, ', both cheeks')
}

function letterFor(i: number): string {
  return String.fromCharCode('A'.charCodeAt(0) + i)
}
