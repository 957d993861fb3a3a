import type { RoofProblem } from '../roof/roof-types.ts'
import type { FormPlate } from './form-outline.ts'
import type { FormProblem } from './form-typing.ts'
import { heldWalk } from './form-walk.ts'
import { besideKeys, type RoofForm } from './roof-form.ts'
import { isWingShape } from './wing-form.ts'
import { wingSidePaths } from './wing-measures.ts'

/** Faults of a roof, each at the field it was typed in; one a field. */
export function formProblemsOf(
  problems: readonly RoofProblem[],
  form: RoofForm,
  plates: FormPlate[],
): FormProblem[] {
  const byPath = new Map<string, FormProblem>()
  for (const { path, message } of problems) {
    const at = formPath(path, form, plates)
    if (!byPath.has(at)) byPath.set(at, { path: at, message, isMissing: false })
  }
  return [...byPath.values()]
}

/** The form's field of a path in `Roof`. */
export function formPath(path: string, form: RoofForm, plates: FormPlate[]): string {
  const [field = '', index = '', key = ''] = path.split('.')
  const plate = index === '' ? undefined : plates[Number(index)]
  if (field === 'outline') {
    if (form.shape !== 'corners') return shapePath(index, form, plates)
    return heldWalk(form) ? 'walk' : cornerPath(index, plate)
  }
  if (field === 'edges') return plate ? edgePath(key, plate) : wholePath(form)
  if (field === 'sections') return sectionPath(index, key, form)
  return path
}

function wholePath(form: RoofForm): string {
  return form.shape === 'corners' ? 'corners' : 'shape'
}

function cornerPath(index: string, plate: FormPlate | undefined): string {
  return plate ? `corners.${index}` : 'corners'
}

/** A ready shape has no typed corners: what is wrong at one is the measure of the plate before it. */
function shapePath(index: string, form: RoofForm, plates: FormPlate[]): string {
  const before = index === '' ? undefined : plates.at(Number(index) - 1)
  const { shape } = form
  if (isWingShape(shape)) {
    const side = Number(before?.path.split('.').at(-1) ?? 0)
    return wingSidePaths[shape][side] ?? 'lengthMm'
  }
  if (!before || before.path === 'sides.front' || before.path === 'sides.back') return 'lengthMm'
  const isEnd = before.path === 'sides.right' || before.path === 'sides.left'
  return isEnd || form.shape === 'octagonal-end' ? 'widthMm' : 'splayMm'
}

function edgePath(key: string, plate: FormPlate): string {
  const isOwn = (text: string) => text.trim() !== ''
  if (key === 'pitchDeg') {
    return isOwn(plate.side.pitchDeg) ? `${plate.path}.pitchDeg` : 'pitchDeg'
  }
  if (key === 'overhangMm') {
    if (isOwn(plate.side.overhangMm)) return `${plate.path}.overhangMm`
    return plate.side.finish === 'gable' ? 'vergeOverhangMm' : 'overhangMm'
  }
  if (key === 'finish') return `${plate.path}.finish`
  return plate.path
}

/** A section left empty was read as another's: the fault lies where a size was typed. */
function sectionPath(name: string, key: string, form: RoofForm): string {
  const suffix = key ? `.${key}` : ''
  if (besideKeys.some((key) => key === name)) return `sections.${name}${suffix}`
  const typedAs = (wanted: 'rafter' | 'hip' | 'ridge' | 'valley'): string => {
    const { depthMm, thicknessMm } = form.sections[wanted]
    const isEmpty = depthMm.trim() === '' && thicknessMm.trim() === ''
    if (!isEmpty || wanted === 'rafter' || wanted === 'ridge') return wanted
    return typedAs(wanted === 'valley' ? 'hip' : 'rafter')
  }
  const known = name === 'hip' || name === 'valley' || name === 'ridge' ? name : 'rafter'
  return `sections.${typedAs(known)}${suffix}`
}
