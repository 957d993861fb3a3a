import type { FormProblem } from './form-typing.ts'
import type { RoofForm } from './roof-form.ts'
import type { WingShape } from './wing-form.ts'
import { wingFigures, type WingFigures, wingMeasures } from './wing-measures.ts'

type Found = { letter: string; message: string }

/** Measures of an L, T, U or cross that do not make one. */
export function wingProblems(form: RoofForm, shape: WingShape): FormProblem[] {
  const figures = wingFigures(form, shape)
  const found = checks[shape](figures)
  return found.flatMap(({ letter, message }) => {
    const measure = wingMeasures[shape].find((each) => each.letter === letter)
    return measure ? [{ path: measure.path, message, isMissing: false }] : []
  })
}

const checks: Record<WingShape, (figures: WingFigures) => Found[]> = {
  l: ({ A, B, C, D }) => [
    ...narrower('C', C, 'Wing 1', B, 'the width over all'),
    ...narrower('D', D, 'Wing 2', A, 'the length over all'),
  ],
  t: ({ A, C, E }) => beside('E', E, C, A, 'wing'),
  u: ({ A, B, C, D, E, F }) => [
    ...(D + E < A
      ? []
      : [
          {
            letter: 'E',
            message: `Wings ${mm(D)} and ${mm(E)} wide leave nothing between them in ${mm(A)} mm: make one narrower.`,
          },
        ]),
    ...narrower('C', C, 'The middle', Math.min(B, F), 'the shorter wing'),
  ],
  cross: ({ A, C, F }) => beside('F', F, C, A, 'wings'),
}

function narrower(letter: string, own: number, name: string, all: number, what: string): Found[] {
  if (own < all) return []
  return [
    {
      letter,
      message: `${name}, ${mm(own)} mm wide, takes up all of ${what}, ${mm(all)} mm: make it narrower.`,
    },
  ]
}

/** A wing stands clear of both ends of its main building. */
function beside(letter: string, fromMm: number, wideMm: number, allMm: number, name: string) {
  const is = name === 'wings' ? 'stand' : 'stands'
  if (wideMm >= allMm) {
    const message = `The ${name} ${name === 'wings' ? 'are' : 'is'} as wide as the main building is long: type a width under ${mm(allMm)}.`
    return [{ letter: 'C', message }]
  }
  const mostMm = allMm - wideMm
  if (fromMm > 0 && fromMm < mostMm) return []
  const isFlush = fromMm === 0 || fromMm === mostMm
  const message =
    isFlush && name === 'wing'
      ? 'The wing stands flush with the end of the main building: take the L for that.'
      : `The ${name} ${is} past the main building: type a distance between 0 and ${mm(mostMm)} mm.`
  return [{ letter, message }]
}

const mm = (value: number) => String(Math.round(value))
