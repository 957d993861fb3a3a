import { type Walk } from '../outline/sides-and-turns.ts'
import { endCutMm, endsCut, straightSideMm } from './form-outline.ts'
import type { FormProblem, TypedField } from './form-typing.ts'
import { textAt } from './form-paths.ts'
import { heldWalk, type WalkReading } from './form-walk.ts'
import type { RoofForm } from './roof-form.ts'
import { lengthMmOfText } from './typed-measure.ts'
import { isWingShape, type WingShape } from './wing-form.ts'
import { wingMeasures } from './wing-measures.ts'
import { wingProblems } from './wing-problems.ts'

/** The measures that make the plan, as typed. */
export function shapeFields(form: RoofForm): TypedField[] {
  const { shape } = form
  if (shape === 'corners') return cornerFields(form)
  if (isWingShape(shape)) return wingFields(form, shape)
  const fields: TypedField[] = [
    { path: 'lengthMm', text: form.lengthMm, what: 'length', kind: 'length' },
    { path: 'widthMm', text: form.widthMm, what: 'width', kind: 'length' },
  ]
  if (shape === 'splayed-end') {
    fields.push({ path: 'splayMm', text: form.splayMm, what: 'splay', kind: 'length' })
  }
  return fields
}

/** Corners that a walk made are always read; what is wrong is wrong with the walk. */
function cornerFields(form: RoofForm): TypedField[] {
  if (heldWalk(form)) return []
  return form.corners.flatMap((corner, i): TypedField[] => [
    { path: `corners.${i}.x`, text: corner.x, what: `x of corner ${i + 1}`, kind: 'length' },
    { path: `corners.${i}.y`, text: corner.y, what: `y of corner ${i + 1}`, kind: 'length' },
  ])
}

function wingFields(form: RoofForm, shape: WingShape): TypedField[] {
  return wingMeasures[shape].flatMap(({ path, what, ifEmpty }): TypedField[] => {
    const text = textAt(form, path)
    return ifEmpty && text.trim() === '' ? [] : [{ path, text, what, kind: 'length' }]
  })
}

function problem(path: string, message: string): FormProblem {
  return { path, message, isMissing: false }
}

const largestLikelyMetres = 100

/** Measures of a plan that leave no plan at all, or one that stands open. */
export function shapeProblems(form: RoofForm): FormProblem[] {
  const { shape } = form
  if (shape === 'corners') return walkProblems(form)
  if (isWingShape(shape)) {
    const small = wingFields(form, shape).flatMap(({ path, text, what }) =>
      path.endsWith('fromLeftMm') ? [] : sideProblems(path, what, lengthMmOfText(text)),
    )
    return small.length > 0 ? small : wingProblems(form, shape)
  }
  const [lengthMm, widthMm] = [lengthMmOfText(form.lengthMm), lengthMmOfText(form.widthMm)]
  return [
    ...sideProblems('lengthMm', 'length', lengthMm),
    ...sideProblems('widthMm', 'width', widthMm),
    ...(form.shape === 'splayed-end' ? splayProblems(endCutMm(form), widthMm) : []),
    ...overallProblems(form),
  ]
}

/** A house is not 9 mm long: whoever typed that meant metres. */
function sideProblems(path: string, what: string, sideMm: number): FormProblem[] {
  if (!(sideMm > 0)) return [problem(path, `The ${what} must be more than 0 mm.`)]
  if (sideMm >= largestLikelyMetres) return []
  const typed = Math.round(sideMm * 1000)
  return [problem(path, `The ${what} is in mm: for ${sideMm} m type ${typed}.`)]
}

function splayProblems(splayMm: number, widthMm: number): FormProblem[] {
  if (!(splayMm > 0)) return [problem('splayMm', 'The splay must be more than 0 mm.')]
  if (2 * splayMm < widthMm) return []
  const sizes = `Two splays of ${Math.round(splayMm)} mm leave nothing of an end ${Math.round(widthMm)} mm wide.`
  return [problem('splayMm', `${sizes} Type a smaller splay.`)]
}

function overallProblems(form: RoofForm): FormProblem[] {
  const { right, left } = endsCut(form)
  if (form.lengthOf !== 'overall' || straightSideMm(form) > 0) return []
  const endsMm = Math.round(endCutMm(form) * (Number(right) + Number(left)))
  const message = `The ${form.shape === 'octagonal-end' ? 'octagonal' : 'splayed'} end alone takes ${endsMm} mm. Type a longer length over all.`
  return [problem('lengthMm', message)]
}

function walkProblems(form: RoofForm): FormProblem[] {
  const reading = heldWalk(form)
  if (!reading) return []
  const { unread } = reading
  if (unread) return [unreadProblem(form, unread)]
  return reading.walk.isClosed ? [] : [openProblem(reading.walk)]
}

function unreadProblem(
  form: RoofForm,
  { side, field }: NonNullable<WalkReading['unread']>,
): FormProblem {
  const path = `walk.sides.${side}.${field}`
  const text = textAt(form, path).trim()
  const isAngle = field === 'turnDeg'
  const what = isAngle ? `angle of the turn after side ${side + 1}` : `length of side ${side + 1}`
  if (text === '') return { path, message: `Type the ${what}.`, isMissing: true }
  const how = isAngle ? 'in degrees, like 45' : 'in mm, like 4250'
  return { ...problem(path, `“${text}” does not say the ${what}. Type it ${how}.`) }
}

function openProblem({ corners, gapMm }: Walk): FormProblem {
  const message =
    corners.length < 4
      ? 'Type the next side of the outline.'
      : `The outline is open by ${Math.round(gapMm)} mm: type the next side, or close it.`
  return { path: 'walk', message, isMissing: true }
}
