import type { RoofProblem } from '../roof/roof-types.ts'
import type { DrawingPoint, Segment } from './drawing-geometry.ts'
import { pointAlong } from './drawing-geometry.ts'
import type { DrawableRoof, PlanView } from './plan-view.ts'

/** A problem marked where it is: at a corner, or on the middle of a plate with the plate picked out. */
export type PlanProblem = { problem: RoofProblem; at: DrawingPoint; edge: Segment | null }

export type PlanProblems = {
  drawn: PlanProblem[]
  /** Those of no one place, such as a section or the spacing. */
  elsewhere: RoofProblem[]
}

export function planProblems(
  problems: readonly RoofProblem[],
  roof: DrawableRoof,
  view: PlanView,
): PlanProblems {
  const drawn: PlanProblem[] = []
  const elsewhere: RoofProblem[] = []
  for (const problem of problems) {
    const place = problemPlace(problem.path, roof, view)
    if (place) drawn.push({ problem, ...place })
    else elsewhere.push(problem)
  }
  return { drawn, elsewhere }
}

function problemPlace(path: string, roof: DrawableRoof, view: PlanView) {
  const [field, number] = path.split('.')
  const at = roof.indexes.indexOf(Number(number))
  const corner = roof.outline[at]
  const next = roof.outline[(at + 1) % roof.outline.length]
  if (number === undefined || !corner || !next) return null
  if (field === 'outline') return { at: view.place(corner), edge: null }
  if (field !== 'edges') return null
  const edge = { from: view.place(corner), to: view.place(next) }
  return { at: pointAlong(edge, 0.5), edge }
}
