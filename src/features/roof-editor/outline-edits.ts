import { edgeLengthMm, mmText } from '../../../shared/outline/outline-geometry.ts'
import { asCorners } from '../../../shared/revisions/form-outline.ts'
import { mostCorners } from '../../../shared/revisions/form-parts.ts'
import type { CornerForm, RoofForm } from '../../../shared/revisions/roof-form.ts'
import { lengthMmOfText } from '../../../shared/revisions/typed-measure.ts'
import type { Point2 } from '../../../shared/roof/roof-types.ts'

/** What a person does to the outline on the drawing; a ready shape becomes a list of corners first. */

const leastCorners = 3
/** Shorter plates are refused, so a corner is not put where it would leave one. */
const leastEdgeMm = 300

export function withCornerAt(form: RoofForm, corner: number, at: Point2): RoofForm | null {
  const own = asCorners(form)
  const old = own?.corners[corner]
  if (!own || !old) return null
  const moved: CornerForm = { ...old, x: mmText(at.x), y: mmText(at.y) }
  if (moved.x === old.x && moved.y === old.y) return null
  return { ...own, corners: own.corners.with(corner, moved) }
}

/** The corner goes; the plate before it runs on to the next and keeps what it has of its own. */
export function withoutCorner(form: RoofForm, corner: number): RoofForm | null {
  const own = asCorners(form)
  if (!own || own.corners.length <= leastCorners) return null
  return { ...own, corners: own.corners.toSpliced(corner, 1) }
}

export function mayAddCorner(outline: readonly Point2[], edge: number): boolean {
  return outline.length < mostCorners && edgeLengthMm(outline, edge) >= 2 * leastEdgeMm
}

/** A corner in the middle of a plate; both halves keep what the plate has of its own. */
export function withCornerOn(form: RoofForm, edge: number): RoofForm | null {
  const own = asCorners(form)
  const [from, to] = [own?.corners[edge], own?.corners[(edge + 1) % own.corners.length]]
  if (!own || !from || !to || own.corners.length >= mostCorners) return null
  const [a, b] = [pointOf(from), pointOf(to)]
  const middle = { x: mmText((a.x + b.x) / 2), y: mmText((a.y + b.y) / 2) }
  return { ...own, corners: own.corners.toSpliced(edge + 1, 0, { ...from, ...middle }) }
}

function pointOf({ x, y }: CornerForm): Point2 {
  return { x: lengthMmOfText(x), y: lengthMmOfText(y) }
}

const samePlaceMm = 1

/** Corners from elsewhere; a plate between the same two corners as before keeps what it has of its own. */
export function withPastedCorners(form: RoofForm, corners: readonly Point2[]): RoofForm {
  const old = asCorners(form)?.corners ?? []
  const isSame = (a: Point2, b: Point2) => Math.hypot(a.x - b.x, a.y - b.y) <= samePlaceMm
  const plateOf = (from: Point2, to: Point2) =>
    old.find((corner, i) => {
      const next = old[(i + 1) % old.length]
      return next && isSame(pointOf(corner), from) && isSame(pointOf(next), to)
    })
  return {
    ...form,
    shape: 'corners',
    corners: corners.map((at, i): CornerForm => {
      const plate = plateOf(at, corners[(i + 1) % corners.length] ?? at)
      const { finish, pitchDeg, overhangMm } = plate ?? {
        finish: 'eave' as const,
        pitchDeg: '',
        overhangMm: '',
      }
      return { finish, pitchDeg, overhangMm, x: mmText(at.x), y: mmText(at.y) }
    }),
  }
}
