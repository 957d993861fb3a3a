import type { RoofProblem } from '../roof-types.ts'

type Loose = Record<string, unknown>

const isRecord = (value: unknown): value is Loose => typeof value === 'object' && value !== null

/** Timbers beside the frame: the field in `Roof.sections`, and what it is called. */
const besideNames: [string, string][] = [
  ['underpurlin', 'underpurlins'],
  ['collarTie', 'collar ties'],
  ['fascia', 'fascia'],
  ['barge', 'barges'],
]

const isWithin = (value: unknown, low: number, high: number): boolean =>
  typeof value === 'number' && Number.isFinite(value) && value >= low && value <= high

const sectionProblems = (name: string, words: string, section: unknown): RoofProblem[] =>
  (['thicknessMm', 'depthMm'] as const).flatMap((side) => {
    if (isRecord(section) && isWithin(section[side], 15, 400)) return []
    const word = side === 'depthMm' ? 'depth' : 'thickness'
    const message = `Give the ${words} a ${word} from 15 to 400 mm, or leave the size out.`
    return [{ path: `sections.${name}.${side}`, message }]
  })

/** What is wrong with the fields of the timbers beside the frame; all may be left out. Takes any value. */
export const besideProblems = (roof: unknown, settings: unknown): RoofProblem[] => {
  const fields = isRecord(roof) ? roof : {}
  const sections = isRecord(fields['sections']) ? fields['sections'] : {}
  const choices = isRecord(settings) ? settings : {}
  const optional = (path: string, value: unknown, low: number, high: number, message: string) =>
    value === undefined || isWithin(value, low, high) ? [] : [{ path, message }]
  return [
    ...besideNames.flatMap(([name, words]) => {
      const section = sections[name]
      return section === undefined ? [] : sectionProblems(name, words, section)
    }),
    ...optional(
      'collarTieHeightMm',
      fields['collarTieHeightMm'],
      1,
      20_000,
      'Give the collar ties a height over plate from 1 to 20000 mm, or leave it out.',
    ),
    ...optional(
      'settings.collarTieSpacingMm',
      choices['collarTieSpacingMm'],
      200,
      5000,
      'Settings: give collar ties a spacing from 200 to 5000 mm.',
    ),
    ...optional(
      'settings.battenGaugeMm',
      choices['battenGaugeMm'],
      50,
      3000,
      'Settings: give battens a gauge from 50 to 3000 mm.',
    ),
  ]
}
