import type { FrameSpec, Roof } from '../../../shared/roof/roof-types.ts'
import { checkBeside } from './check-beside.ts'
import { checkCuts } from './check-cuts.ts'
import { checkJoints } from './check-joints.ts'
import { checkLayout } from './check-layout.ts'
import { checkLists, checkWeight } from './check-lists.ts'
import { checkNumbers } from './check-numbers.ts'
import { checkPlace, checkTop } from './check-place.ts'
import { checkPlaning } from './check-planing.ts'
import { checkRounding } from './check-rounding.ts'
import { checkSeat } from './check-seats.ts'
import { checkSurface } from './check-surface.ts'
import { Facets } from './facets.ts'
import type { Piece } from './rebuild-member.ts'
import { collector, type Complain, type Complaint } from './report.ts'
import { plainSettings, standUp, takeDown, type JudgeSettings, type Site } from './site.ts'
import { boxesMeet, type Solid, type SolidKit } from './solid-kit.ts'

/** Two pieces may share no more than this: a sliver from double-precision corners. */
const OVERLAP_MM3 = 5

function complainOfShared(complain: Complain, marks: string[], solid: Solid): void {
  const shared = solid.volume()
  if (shared > OVERLAP_MM3) {
    const points = solid.boundingBox()
    const at = points.min.map((low, i) => Math.round((low + points.max[i]!) / 2)).join(', ')
    complain({ check: 'overlap', marks, out: shared, text: `share timber about ${at}, mm³` })
  }
  solid.delete()
}

/** Timber that a piece shares with some others, and with the plates. */
export function checkOverlaps(
  complain: Complain,
  site: Site,
  piece: Piece,
  others: readonly Piece[],
): void {
  const { mark } = piece.member
  for (const other of others) {
    if (other === piece || !boxesMeet(piece.box, other.box)) continue
    complainOfShared(complain, [mark, other.member.mark], piece.solid.intersect(other.solid))
  }
  if (piece.box.min[2] < 0) {
    complainOfShared(complain, [mark, 'plates'], piece.solid.intersect(site.plates))
  }
}

function checkMarks(complain: Complain, spec: FrameSpec): void {
  const marks = spec.members.map((m) => m.mark)
  if (new Set(marks).size === marks.length) return
  const twice = marks.filter((mark, i) => marks.indexOf(mark) !== i)
  complain({ check: 'numbers', marks: twice, out: 0, text: 'mark used twice' })
}

/** Everything that can be said of one piece where it stands. */
export function checkPiece(complain: Complain, site: Site, facets: Facets, piece: Piece): void {
  checkNumbers(complain, site, piece)
  checkCuts(complain, site, piece)
  checkWeight(complain, piece, site.settings.densityKgM3)
  checkPlace(complain, site, piece)
  checkTop(complain, site, piece)
  checkPlaning(complain, site, piece)
  checkSeat(complain, site, piece)
  checkBeside(complain, site, facets, piece)
  checkJoints(complain, site, facets, piece)
}

/** What a spec says of the whole roof, before any timber is looked at. */
export function checkWhole(complain: Complain, site: Site): void {
  checkMarks(complain, site.spec)
  checkLists(complain, site.spec)
  checkSurface(complain, site)
  checkLayout(complain, site)
  checkRounding(complain, site)
}

/** Saws every member from its published numbers, stands the frame up and judges it. */
export function dryFit(
  kit: SolidKit,
  roof: Roof,
  spec: FrameSpec,
  settings: JudgeSettings = plainSettings,
): Complaint[] {
  const { complain, complaints } = collector()
  const site = standUp(kit, roof, spec, settings)
  const facets = new Facets()
  checkWhole(complain, site)
  site.pieces.forEach((piece, index) => {
    checkPiece(complain, site, facets, piece)
    checkOverlaps(complain, site, piece, site.pieces.slice(index + 1))
  })
  takeDown(site)
  return complaints
}
