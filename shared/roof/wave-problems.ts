import type { Joints } from './clusters.ts'
import type { RoofLines } from './roof-lines.ts'
import type { RoofProblem } from './roof-types.ts'
import { at } from './slopes.ts'
import type { PlateLines } from './slopes.ts'

const climbedTo = (gable: number, climber: string, remedy: string): RoofProblem => ({
  path: `edges.${gable}.finish`,
  message:
    `Edge ${gable + 1} is a gable, but ${climber} climbs to it and leaves no ridge: ` +
    `make the building longer, ${remedy}, or make edge ${gable + 1} an eave.`,
})

/** Why the slopes of an outline that is otherwise sound cannot be set out: gables climbed to, level breaks. */
export const waveProblems = ({ wave }: PlateLines): RoofProblem[] => {
  const { refusal } = wave
  if (refusal === null) return []
  if (refusal.reason === 'gable-reached') {
    const climber = at(refusal.edges, 0) + 1
    const remedy = `give edge ${climber} a steeper pitch`
    return [climbedTo(refusal.gable, `the slope of edge ${climber}`, remedy)]
  }
  if (refusal.reason === 'level-break') {
    const [a, b] = refusal.edges.toSorted((x, y) => x - y).map((edge) => edge + 1)
    const message =
      `Edges ${a} and ${b} face one way with different pitches, and their slopes come level with each ` +
      `other, which would need a level break in the slope: give edges ${a} and ${b} one pitch, or move one of them.`
    return [{ path: `edges.${at(refusal.edges, 1)}.pitchDeg`, message }]
  }
  const [edge] = refusal.edges
  const message = `The slopes that meet over edge ${(edge ?? 0) + 1} cannot be set out: move one of its corners a little.`
  return [{ path: `outline.${edge ?? 0}`, message }]
}

/** Whether a roof has gables that must have a ridge between them; a lean-to has a high wall in place of one. */
export const needsRidges = ({ edges, slopes }: PlateLines): boolean =>
  slopes.length > 1 && edges.some((edge) => edge.finish === 'gable')

/** Gables under which the roof leaves no ridge to run out to the verge. */
export const ridgeProblems = (
  plates: PlateLines,
  lines: RoofLines,
  { swallowed }: Joints,
): RoofProblem[] => {
  if (!needsRidges(plates)) return []
  return plates.edges.flatMap((edge) => {
    if (edge.finish !== 'gable') return []
    const sides = [edge.index, (edge.index + 1) % plates.edges.length]
    const verges = lines.lines.filter(
      (line) => line.kind === 'verge' && sides.some((n) => line.from === n),
    )
    const tops = new Set(verges.map((line) => line.to))
    const [top] = [...tops]
    const ridge = lines.lines.findIndex(
      (line) => line.kind === 'ridge' && (line.from === top || line.to === top),
    )
    if (tops.size === 1 && ridge >= 0 && !swallowed.has(ridge)) return []
    return [climbedTo(edge.index, "the far end's slope", 'give the far end a steeper pitch')]
  })
}
