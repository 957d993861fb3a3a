import type { Caution, CautionAnswer, CautionCode } from '../roof/roof-types.ts'
import { platesOfForm } from './form-outline.ts'
import { formPath } from './form-problem-paths.ts'
import type { RoofForm } from './roof-form.ts'

const words: Partial<Record<CautionCode, (value: string) => string>> = {
  'birdsmouth-deep': (value) => `${value} or more leaves two thirds of every rafter.`,
  'hip-thin-over-seat': (value) =>
    `${value} or less leaves as much over the seat as on the rafters.`,
  'section-shallow': (value) => `${value} or more would bear fully.`,
  'eaves-not-level': (value) => `${value} would level the eaves.`,
  'overhang-long': (value) => `${value} or less is not long for the span.`,
  'pitch-below-covering': (value) => `${value} and up is usual for the covering.`,
}

/**
 * What would answer the cautions, said at the fields where a person could type it; by form path. Nothing is
 * typed for anybody.
 */
export function answerHints(
  form: RoofForm,
  cautions: readonly Pick<Caution, 'code' | 'answers'>[],
  { brickOffsetMm }: { brickOffsetMm: number },
): Map<string, string> {
  const plates = platesOfForm(form)
  const hints = new Map<string, Set<string>>()
  for (const { code, answers = [] } of cautions) {
    for (const answer of answers) {
      const text = answerText(answer, form, brickOffsetMm)
      if (text === null) continue
      const own = ownPath(code, answer, plates)
      const path = own ?? formPath(answer.path, form, plates)
      const said = (words[code] ?? ((value) => `${value} would answer a caution.`))(text)
      hints.set(path, (hints.get(path) ?? new Set()).add(said))
    }
  }
  return new Map([...hints].map(([path, said]) => [path, [...said].join(' ')]))
}

/** To level two eaves one of them changes, not all: the answer belongs to its own field. */
function ownPath(
  code: CautionCode,
  { path }: CautionAnswer,
  plates: readonly { path: string }[],
): string | null {
  const [field, index, key] = path.split('.')
  if (code !== 'eaves-not-level' || field !== 'edges') return null
  const plate = plates[Number(index)]
  return plate ? `${plate.path}.${key}` : null
}

/** As it would be typed: an overhang measured from brickwork is less by the firm's offset. */
function answerText(answer: CautionAnswer, form: RoofForm, brickOffsetMm: number): string | null {
  const isFromBrick = form.overhangFrom === 'brickwork' && answer.path.endsWith('overhangMm')
  const value = Math.round((answer.value - (isFromBrick ? brickOffsetMm : 0)) * 10) / 10
  if (value < 0) return null
  return answer.unit === 'deg' ? `${value}°` : `${value} mm`
}
