import type { Point2, RoofProblem } from './roof-types.ts'
import { at, cornerOffLineMm, straightCornerMm } from './slopes.ts'
import { dot2, sub2, unit2 } from './vector.ts'

/** A gable this near to square with its slopes (cosine) is square: 0.1°. */
const squareCos = 0.00175

/** An edge as typed: anything may be in its fields. */
export type LooseEdge = { finish?: unknown; pitchDeg?: unknown }

export const isEdge = (value: unknown): value is LooseEdge =>
  typeof value === 'object' && value !== null

type Plan = { corners: Point2[]; edges: LooseEdge[] }

const direction = ({ corners }: Plan, k: number): Point2 =>
  unit2(sub2(at(corners, k + 1), at(corners, k)))

const number = ({ edges }: Plan, k: number): number => ((k + edges.length) % edges.length) + 1

const isGable = ({ edges }: Plan, k: number): boolean => at(edges, k).finish === 'gable'

const cornerOff = ({ corners }: Plan, k: number): number =>
  cornerOffLineMm(at(corners, k - 1), at(corners, k), at(corners, k + 1))

const isStraight = (plan: Plan, k: number): boolean =>
  Math.abs(cornerOff(plan, k)) < straightCornerMm

const isSquare = (plan: Plan, a: number, b: number): boolean =>
  Math.abs(dot2(direction(plan, a), direction(plan, b))) <= squareCos

/** What is wrong with a gable between two eaves. */
const gableProblem = (plan: Plan, k: number): string | null => {
  const name = `Edge ${k + 1} is a gable`
  if (isGable(plan, k - 1) || isGable(plan, k + 1)) {
    return `${name} that no slope meets at both ends: make the edge before it and the edge after it eaves.`
  }
  const inwards = [k, k + 1].find((n) => cornerOff(plan, n) <= -straightCornerMm)
  if (inwards !== undefined) {
    const corner = number(plan, inwards)
    return `${name}, but the plan turns inwards at its corner ${corner}: make edge ${k + 1} an eave, or move corner ${corner} out.`
  }
  const askew = [k - 1, k + 1].find((n) => !isSquare(plan, k, n))
  if (askew === undefined) return null
  return `${name}, but not square to the slope of edge ${number(plan, askew)}: make them square, or make edge ${k + 1} an eave.`
}

/** Corners where the plan turns, or where an eave and a gable meet in one line. */
const breaks = (plan: Plan): number[] =>
  plan.corners.flatMap((_, k) =>
    isStraight(plan, k) && isGable(plan, k) === isGable(plan, k - 1) ? [] : [k],
  )

/** A lean-to: one eave that its gables rise from squarely, to a high wall in line with it. */
const leanToProblems = (plan: Plan, eave: number): RoofProblem[] => {
  const turns = breaks(plan)
  const isRectangle = turns.length === 4 && turns.every((k) => isSquare(plan, k - 1, k))
  if (isRectangle) return []
  const message = `Edge ${eave + 1} is the only eave: a lean-to needs two sides square to it and a high wall in line with it. Draw a rectangle, or give a second edge an eave.`
  return [{ path: `edges.${eave}.finish`, message }]
}

/** What is wrong with eaves and gables as placed round a sound outline. */
export const finishProblems = (corners: Point2[], edges: LooseEdge[]): RoofProblem[] => {
  const plan = { corners, edges }
  const eaves = edges.flatMap((edge, k) => (edge.finish === 'gable' ? [] : [k]))
  const [first] = eaves
  if (first === undefined) {
    const message = 'Every edge is a gable: give at least two facing edges an eave and a pitch.'
    return [{ path: 'edges.0.finish', message }]
  }
  const pitches = eaves.flatMap((k): RoofProblem[] => {
    if (!isStraight(plan, k) || isGable(plan, k - 1)) return []
    if (at(edges, k - 1).pitchDeg === at(edges, k).pitchDeg) return []
    const message = `Edges ${number(plan, k - 1)} and ${k + 1} run in one line with two pitches: give both the same pitch.`
    return [{ path: `edges.${k}.pitchDeg`, message }]
  })
  const starts = eaves.filter((k) => !isStraight(plan, k) || isGable(plan, k - 1))
  if (pitches.length === 0 && starts.length === 1 && eaves.length < edges.length) {
    return leanToProblems(plan, first)
  }
  const gables = edges.flatMap((_, k): RoofProblem[] => {
    const message = isGable(plan, k) ? gableProblem(plan, k) : null
    return message === null ? [] : [{ path: `edges.${k}.finish`, message }]
  })
  return [...gables, ...pitches]
}
