import { outlineProblems } from './outline-problems.ts'
import { roofJoints } from './clusters.ts'
import type { Joints } from './clusters.ts'
import { plateLines } from './plate-lines.ts'
import { roofLines } from './roof-lines.ts'
import type { RoofLines } from './roof-lines.ts'
import { defaultSettings } from './roof-settings.ts'
import type { Roof, RoofProblem, RoofSettings } from './roof-types.ts'
import { besideProblems } from './secondary/beside-problems.ts'
import { at } from './slopes.ts'
import type { PlateLines } from './slopes.ts'
import { commonStandMm, leastSeatMm, rafterSeatMm } from './stand.ts'
import { needsRidges, ridgeProblems, waveProblems } from './wave-problems.ts'

/** Thrown by `frameRoof`; `problems` says field by field what to change. */
export class RoofRefusedError extends Error {
  readonly problems: RoofProblem[]

  constructor(problems: RoofProblem[]) {
    super(problems.map((problem) => problem.message).join(' '))
    this.name = 'RoofRefusedError'
    this.problems = problems
  }
}

type Loose = Record<string, unknown>

const isRecord = (value: unknown): value is Loose => typeof value === 'object' && value !== null
const fieldOf = (value: unknown, name: string): unknown =>
  isRecord(value) ? value[name] : undefined
const isNumber = (value: unknown): value is number =>
  typeof value === 'number' && Number.isFinite(value)

/** A number in a range, or the sentence for its field. */
const inRange = (
  path: string,
  value: unknown,
  low: number,
  high: number,
  words: string,
): RoofProblem[] =>
  isNumber(value) && value >= low && value <= high ? [] : [{ path, message: words }]

const oneOf = (path: string, value: unknown, choices: string[], name: string): RoofProblem[] =>
  typeof value === 'string' && choices.includes(value)
    ? []
    : [{ path, message: `Choose ${name}: ${choices.join(' or ')}.` }]

const edgeProblems = (edge: unknown, index: number): RoofProblem[] => {
  const name = `Edge ${index + 1}`
  const overhang = inRange(
    `edges.${index}.overhangMm`,
    fieldOf(edge, 'overhangMm'),
    0,
    3000,
    `${name}: give its overhang in mm, from 0 to 3000.`,
  )
  const finish = fieldOf(edge, 'finish')
  if (finish === 'gable') return overhang
  if (finish !== 'eave') {
    const message = `${name}: say whether it is an eave or a gable.`
    return [{ path: `edges.${index}.finish`, message }, ...overhang]
  }
  const words = `${name}: give a pitch from 5 to 60 degrees.`
  return [
    ...inRange(`edges.${index}.pitchDeg`, fieldOf(edge, 'pitchDeg'), 5, 60, words),
    ...overhang,
  ]
}

const sectionProblems = (roof: Loose): RoofProblem[] =>
  ['rafter', 'hip', 'valley', 'ridge'].flatMap((name) => {
    const section = fieldOf(roof['sections'], name)
    return (['thicknessMm', 'depthMm'] as const).flatMap((side) => {
      const word = side === 'depthMm' ? 'depth' : 'thickness'
      const words = `Give the ${name} a ${word} from 15 to 400 mm.`
      return inRange(`sections.${name}.${side}`, fieldOf(section, side), 15, 400, words)
    })
  })

const choiceProblems = (roof: Loose): RoofProblem[] => {
  const stand = roof['standMm']
  return [
    ...inRange(
      'plateWidthMm',
      roof['plateWidthMm'],
      1,
      1000,
      'Give the plate a width up to 1000 mm.',
    ),
    ...inRange(
      'maxSpacingMm',
      roof['maxSpacingMm'],
      200,
      1200,
      'Give a rafter spacing from 200 to 1200 mm.',
    ),
    ...oneOf('spacing', roof['spacing'], ['even', 'full'], 'how bays are divided'),
    ...sectionProblems(roof),
    ...oneOf('tail', roof['tail'], ['plumb', 'square'], 'the tail cut'),
    ...inRange(
      'tailAllowanceMm',
      roof['tailAllowanceMm'],
      0,
      2000,
      'Give a tail allowance from 0 to 2000 mm.',
    ),
    ...oneOf('hipTop', roof['hipTop'], ['backed', 'lowered'], 'the top of the hips'),
    ...oneOf('valleyTop', roof['valleyTop'], ['square', 'dished'], 'the top of the valleys'),
    ...(stand === undefined
      ? []
      : inRange(
          'standMm',
          stand,
          1,
          800,
          'Give a height over plate from 1 to 800 mm, or leave it out.',
        )),
  ]
}

const settingsProblems = (settings: unknown): RoofProblem[] => {
  const rows: [keyof RoofSettings, number, number, string][] = [
    ['sawMaxTiltDeg', 1, 90, 'the saw a tilt from 1 to 90 degrees'],
    ['minCreeperMm', 1, 5000, 'the shortest creeper a length from 1 to 5000 mm'],
    ['longestStockMm', 300, 50000, 'the longest stock a length from 300 to 50000 mm'],
    ['densityKgM3', 50, 2000, 'the timber a density from 50 to 2000 kg/m³'],
    ['roundMm', 0.01, 50, 'lengths a rounding from 0.01 to 50 mm'],
    ['roundDeg', 0.01, 10, 'angles a rounding from 0.01 to 10 degrees'],
    ['maxRafterSpanMm', 300, 20000, 'rafters a span from 300 to 20000 mm'],
  ]
  return rows.flatMap(([name, low, high, words]) =>
    inRange(`settings.${name}`, fieldOf(settings, name), low, high, `Settings: give ${words}.`),
  )
}

const holeProblems = (holes: unknown): RoofProblem[] =>
  holes === undefined || holes === null || (Array.isArray(holes) && holes.length === 0)
    ? []
    : [
        {
          path: 'holes',
          message:
            'A courtyard, a hole in the plan, is not framed: leave it out, or frame each wing round it as a roof of its own.',
        },
      ]

/** Slopes whose rafters would find too little seat at the common height over plate. */
const seatProblems = (roof: Roof, { slopes }: PlateLines): RoofProblem[] => {
  const standMm = commonStandMm(roof, slopes)
  return slopes.flatMap((slope) => {
    const seatMm = rafterSeatMm(roof, slope.pitchDeg, standMm)
    if (seatMm >= leastSeatMm - 1e-9) return []
    const edge = at(slope.edges, 0)
    const found = Math.max(0, Math.floor(seatMm))
    const typed = roof.standMm !== undefined
    const way = typed
      ? 'lower the height over plate or use a deeper rafter'
      : 'bring the pitches nearer together, or use a deeper rafter or a wider plate'
    return [
      {
        path: typed ? 'standMm' : `edges.${edge}.pitchDeg`,
        message:
          `Edge ${edge + 1}: at a height over plate of ${Math.round(standMm)} mm its rafters would seat ` +
          `${found} mm on the plate, under ${leastSeatMm} mm: ${way}.`,
      },
    ]
  })
}

/** What is wrong with the fields of a roof one by one, whatever was typed; nothing is set out yet. */
const fieldProblems = (roof: Roof, settings: RoofSettings): RoofProblem[] => {
  const input: unknown = roof
  if (!isRecord(input))
    return [{ path: '', message: 'Give a roof: its corners, edges and sections.' }]
  const edges: unknown = input['edges']
  const list: unknown[] = Array.isArray(edges) ? edges : []
  const shape = outlineProblems(input['outline'], list)
  return [
    ...shape,
    ...holeProblems(input['holes']),
    ...list.slice(0, 64).flatMap(edgeProblems),
    ...choiceProblems(input),
    ...settingsProblems(settings),
    ...besideProblems(roof, settings),
  ]
}

/** The plate lines of a roof that can be set out, or what keeps it from that. */
type Plated = { problems: RoofProblem[] } | { problems: null; plates: PlateLines }

const platedRoof = (roof: Roof, settings: RoofSettings): Plated => {
  const fields = fieldProblems(roof, settings)
  if (fields.length > 0) return { problems: fields }
  const plates = plateLines(roof)
  const problems = [seatProblems(roof, plates), waveProblems(plates)].find((p) => p.length > 0)
  return problems === undefined ? { problems: null, plates } : { problems }
}

/** The lines of a roof that can be framed, or what keeps it from that. */
type SetOut =
  | { problems: RoofProblem[] }
  | { problems: null; plates: PlateLines; lines: RoofLines; joints: Joints }

/** Sets out the lines of a roof, once for its problems and its frame. */
export const setOutRoof = (roof: Roof, settings: RoofSettings): SetOut => {
  const plated = platedRoof(roof, settings)
  if (plated.problems !== null) return plated
  const { plates } = plated
  const lines = roofLines(plates)
  const joints = roofJoints(roof, lines)
  const problems = ridgeProblems(plates, lines, joints)
  return problems.length > 0 ? { problems } : { problems: null, plates, lines, joints }
}

/**
 * Everything that keeps a roof, as typed, from being framed: one entry a field, its path in `Roof`
 * (settings under `settings.`) and a sentence that names the edge or corner, counted from 1, and says
 * what to change. Empty when `frameRoof` will frame it. Takes any value whatever, never throws.
 */
export const roofProblems = (
  roof: Roof,
  settings: RoofSettings = defaultSettings,
): RoofProblem[] => {
  const plated = platedRoof(roof, settings)
  if (plated.problems !== null) return plated.problems
  const { plates } = plated
  if (!needsRidges(plates)) return []
  const lines = roofLines(plates)
  return ridgeProblems(plates, lines, roofJoints(roof, lines))
}
