import { mmText, outlineSignedArea2, outlineTurnedRound } from '../outline/outline-geometry.ts'
import {
  closedMm,
  sidesOfOutline,
  type Walk,
  walkOfSides,
  type WalkSide,
} from '../outline/sides-and-turns.ts'
import type { Point2 } from '../roof/roof-types.ts'
import { plainSide, type SideForm } from './form-parts.ts'
import type { CornerForm, RoofForm } from './roof-form.ts'
import { angleDegOfText, lengthMmOfText } from './typed-measure.ts'
import { emptyWalkSide, type WalkForm, type WalkSideForm } from './walk-form.ts'

/** What of a typed walk can be read, up to the first side that cannot. */
export type WalkReading = {
  sides: WalkSide[]
  walk: Walk
  /** Number of the first side that cannot be read, and which of its fields; null when all can. */
  unread: { side: number; field: 'lengthMm' | 'turnDeg' } | null
}

function readWalk(form: WalkForm, start: Point2): WalkReading {
  const typed = typedSides(form)
  const sides: WalkSide[] = []
  let unread: WalkReading['unread'] = null
  for (const [i, side] of typed.entries()) {
    const lengthMm = lengthMmOfText(side.lengthMm)
    if (!(lengthMm > 0)) {
      unread = { side: i, field: 'lengthMm' }
      break
    }
    const turnLeftDeg = turnLeftDegOf(side)
    const isLast = i === typed.length - 1
    // The turn after the last side is settled by where the first one heads.
    sides.push({ lengthMm, turnLeftDeg: Number.isNaN(turnLeftDeg) ? 0 : turnLeftDeg })
    if (Number.isNaN(turnLeftDeg) && !isLast) {
      unread = { side: i, field: 'turnDeg' }
      break
    }
  }
  return { sides, walk: walkOfSides(sides, start, startDegOf(form)), unread }
}

/** Without the empty lines at the end, which nobody has come to yet. */
function typedSides({ sides }: WalkForm): WalkSideForm[] {
  const last = sides.findLastIndex(({ lengthMm }) => lengthMm.trim() !== '')
  return sides.slice(0, last + 1)
}

function startDegOf({ startDeg }: WalkForm): number {
  const deg = angleDegOfText(startDeg)
  return Number.isNaN(deg) ? 0 : deg
}

function turnLeftDegOf({ turn, turnDeg }: WalkSideForm): number {
  if (turn === 'left') return 90
  if (turn === 'right') return -90
  if (turn === 'straight') return 0
  const deg = angleDegOfText(turnDeg)
  return turn === 'left-by' ? deg : -deg
}

function startOf(form: RoofForm): Point2 {
  const [first] = form.corners
  const at = { x: lengthMmOfText(first?.x ?? ''), y: lengthMmOfText(first?.y ?? '') }
  return Number.isFinite(at.x + at.y) ? at : { x: 0, y: 0 }
}

/** A walk's corners counter-clockwise, and the walked side of each plate. */
function platesOfWalk({ corners }: Walk): { start: Point2; side: number }[] {
  if (outlineSignedArea2(corners) >= 0) return corners.map((start, side) => ({ start, side }))
  const round = outlineTurnedRound(corners)
  return round.corners.map((start, k) => ({ start, side: round.edgeOf[k] ?? k }))
}

/** The typed walk where the corners still are what it made of them; null where they were moved since. */
export function heldWalk(form: RoofForm): WalkReading | null {
  if (form.shape !== 'corners' || typedSides(form.walk).length === 0) return null
  const reading = readWalk(form.walk, startOf(form))
  const plates = platesOfWalk(reading.walk)
  const isHeld =
    plates.length === form.corners.length &&
    plates.every(({ start }, i) => {
      const corner = form.corners[i]
      return corner?.x === mmText(start.x) && corner.y === mmText(start.y)
    })
  return isHeld ? reading : null
}

/**
 * The sides and turns to show: as typed while they hold, otherwise worked out from the corners; each with
 * what its plate has of its own now.
 */
export function walkShown(form: RoofForm): WalkForm {
  const held = heldWalk(form)
  if (held) return withFinishes(form.walk, form.corners, platesOfWalk(held.walk))
  const outline = form.corners.map(({ x, y }) => ({
    x: lengthMmOfText(x),
    y: lengthMmOfText(y),
  }))
  const isRead = outline.length > 2 && outline.every(({ x, y }) => Number.isFinite(x + y))
  if (!isRead) return { startDeg: '0', sides: [emptyWalkSide()] }
  const { startDeg, sides } = sidesOfOutline(outline)
  const walk = { startDeg: degText(startDeg), sides: sides.map(sideFormOf) }
  return withFinishes(
    walk,
    form.corners,
    outline.map((_, side) => ({ side })),
  )
}

function withFinishes(
  walk: WalkForm,
  corners: readonly CornerForm[],
  plates: readonly { side: number }[],
): WalkForm {
  const own = new Map(plates.map(({ side }, i) => [side, corners[i]]))
  return {
    ...walk,
    sides: walk.sides.map((typed, i) => {
      const corner = own.get(i)
      return corner ? { ...typed, side: sideOf(corner) } : typed
    }),
  }
}

function sideOf({ finish, pitchDeg, overhangMm }: SideForm): SideForm {
  return { finish, pitchDeg, overhangMm }
}

/** A walked side as a person would type it. */
function sideFormOf({ lengthMm, turnLeftDeg }: WalkSide): WalkSideForm {
  return { lengthMm: mmText(lengthMm), ...turnFormOf(turnLeftDeg), side: plainSide() }
}

function turnFormOf(turnLeftDeg: number): Pick<WalkSideForm, 'turn' | 'turnDeg'> {
  const text = degText(Math.abs(turnLeftDeg))
  const isLeft = turnLeftDeg > 0
  if (text === '90') return { turn: isLeft ? 'left' : 'right', turnDeg: '' }
  if (text === '0') return { turn: 'straight', turnDeg: '' }
  return { turn: isLeft ? 'left-by' : 'right-by', turnDeg: text }
}

/** To a ten-thousandth of a degree: under 0.04 mm on a side of 20 m. */
function degText(deg: number): string {
  return String(Math.round(deg * 10_000) / 10_000 + 0)
}

/** The form with its corners walked anew; each plate takes what its side has of its own. */
export function withWalk(form: RoofForm, walk: WalkForm): RoofForm {
  const reading = readWalk(walk, startOf(form))
  const corners = platesOfWalk(reading.walk).map(({ start, side }): CornerForm => ({
    ...(walk.sides[side]?.side ?? plainSide()),
    x: mmText(start.x),
    y: mmText(start.y),
  }))
  return { ...form, shape: 'corners', walk, corners }
}

/** A way to close a walk that stands open, with the sides it leads to. */
export type WalkClosing =
  | {
      kind: 'add'
      lengthMm: number
      turnLeftDeg: number
      isTurnChanged: boolean
      sides: WalkSide[]
    }
  | { kind: 'stretch'; lengthsMm: [number, number]; sides: WalkSide[] }

const leastClosingMm = 1
const sameTurnDeg = 0.05

/** What would close the walk: its last two sides made longer or shorter, or one more side. */
export function walkClosings({ sides, walk }: WalkReading, startDeg: number): WalkClosing[] {
  const last = sides.at(-1)
  if (walk.isClosed || !last || sides.length < 2) return []
  const { turnLeftDeg } = walk.closing
  const isTurnChanged = Math.abs(turnLeftDeg - last.turnLeftDeg) > sameTurnDeg
  const closing: WalkSide = { lengthMm: walk.gapMm, turnLeftDeg: walk.closing.lastTurnLeftDeg }
  const add: WalkClosing = {
    kind: 'add',
    lengthMm: walk.gapMm,
    turnLeftDeg,
    isTurnChanged,
    sides: [...sides.slice(0, -1), { ...last, turnLeftDeg }, closing],
  }
  const stretched = stretchedSides(sides, walk, startDeg)
  if (!stretched) return [add]
  return isTurnChanged || sides.length > 3 ? [stretched, add] : [add, stretched]
}

/** The last two sides keep their directions and change their lengths, where that can close the walk. */
function stretchedSides(
  sides: readonly WalkSide[],
  walk: Walk,
  startDeg: number,
): WalkClosing | null {
  const [before, last] = [sides.at(-2), sides.at(-1)]
  if (!before || !last || sides.length < 3) return null
  const headingDeg = sides.slice(0, -1).reduce((deg, side) => deg + side.turnLeftDeg, startDeg)
  const rad = (deg: number) => (deg * Math.PI) / 180
  const [a, b] = [rad(headingDeg - before.turnLeftDeg), rad(headingDeg)]
  const sine = Math.sin(b - a)
  if (Math.abs(sine) < 0.01) return null
  const { x, y } = walk.gap
  const first = before.lengthMm + (x * Math.sin(b) - y * Math.cos(b)) / sine
  const second = last.lengthMm + (y * Math.cos(a) - x * Math.sin(a)) / sine
  if (!(first >= leastClosingMm && second >= leastClosingMm)) return null
  return {
    kind: 'stretch',
    lengthsMm: [first, second],
    sides: [...sides.slice(0, -2), { ...before, lengthMm: first }, { ...last, lengthMm: second }],
  }
}

/** The walk with other sides: a side that stays the same keeps its text as typed. */
export function walkWithSides(walk: WalkForm, sides: readonly WalkSide[]): WalkForm {
  const typed = typedSides(walk)
  return {
    ...walk,
    sides: sides.map((side, i) => {
      const old = typed[i]
      if (!old) return sideFormOf(side)
      const isLength = Math.abs(lengthMmOfText(old.lengthMm) - side.lengthMm) < closedMm / 100
      const isTurn = Math.abs(turnLeftDegOf(old) - side.turnLeftDeg) < sameTurnDeg
      return {
        lengthMm: isLength ? old.lengthMm : mmText(side.lengthMm),
        ...(isTurn ? { turn: old.turn, turnDeg: old.turnDeg } : turnFormOf(side.turnLeftDeg)),
        side: old.side,
      }
    }),
  }
}
