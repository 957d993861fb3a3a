import { outlineCrossings } from '../../../shared/outline/outline-geometry.ts'
import type { FormPlate } from '../../../shared/revisions/form-outline.ts'
import type { FormProblem } from '../../../shared/revisions/form-typing.ts'
import type { Point2 } from '../../../shared/roof/roof-types.ts'

/** Something wrong with the plan: numbered alike on the drawing and in the list under it. */
export type OutlineFault = {
  message: string
  /** Null: it has no one place on the plan, so it has no number either. */
  at:
    | { kind: 'corner' | 'edge'; index: number }
    | { kind: 'crossing'; edges: [number, number] }
    | null
  number: number | null
}

type Told = {
  problems: readonly Pick<FormProblem, 'path' | 'message'>[]
  /** The same faults as the engine named them, where it did. */
  drawn: readonly { path: string; message: string }[]
}

/** Every fault once, those with a place first and numbered. */
export function outlineFaults(
  outline: readonly Point2[],
  plates: readonly FormPlate[],
  { problems, drawn }: Told,
): OutlineFault[] {
  const engine = drawn.map(({ path, message }) => ({ message, at: placeInRoof(path) }))
  const known = new Set(engine.map(({ message }) => message))
  const typed = problems
    .filter(({ message }) => !known.has(message))
    .map(({ path, message }) => ({ message, at: placeInForm(path, plates) }))
  const crossing = crossingFaults(outline, [...engine, ...typed])
  const told = [...engine, ...typed].filter(({ message }) => !isCrossing(message))
  const all = [...crossing, ...told]
  const placed = all.filter(({ at }) => at !== null)
  return [
    ...placed.map((fault, i) => ({ ...fault, number: i + 1 })),
    ...all.filter(({ at }) => at === null).map((fault) => ({ ...fault, number: null })),
  ]
}

type Unnumbered = Omit<OutlineFault, 'number'>

const isCrossing = (message: string) => /^Edges \d+ and \d+ cross/.test(message)

/** Crossings are seen as they are drawn, before the rest of the roof is typed. */
function crossingFaults(outline: readonly Point2[], told: readonly Unnumbered[]): Unnumbered[] {
  if (!outline.every(({ x, y }) => Number.isFinite(x + y))) return []
  const found = outlineCrossings(outline)
  const said = told.filter(({ message }) => isCrossing(message))
  if (found.length === 0) return said
  return found.map(({ edges }) => ({
    message: `Edges ${edges[0] + 1} and ${edges[1] + 1} cross or touch: put the corners in order round the building.`,
    at: { kind: 'crossing', edges },
  }))
}

/** 'outline.3' is a corner, 'edges.2.pitchDeg' an edge; anything else has no place on the plan. */
function placeInRoof(path: string): Unnumbered['at'] {
  const [field, number] = path.split('.')
  const index = Number(number)
  if (number === undefined || !Number.isInteger(index)) return null
  if (field === 'outline') return { kind: 'corner', index }
  return field === 'edges' ? { kind: 'edge', index } : null
}

function placeInForm(path: string, plates: readonly FormPlate[]): Unnumbered['at'] {
  const index = plates.findIndex(
    (plate) => path === plate.path || path.startsWith(`${plate.path}.`),
  )
  if (index < 0) return null
  const isCorner = path.startsWith('corners.') && /^corners\.\d+(\.[xy])?$/.test(path)
  return { kind: isCorner ? 'corner' : 'edge', index }
}
