import { outlineSignedArea2 } from '../outline/outline-geometry.ts'
import type { Point2 } from '../roof/roof-types.ts'
import type { FormPlate } from './form-outline.ts'
import { besideKeys, type RoofForm, type SectionKey, sectionKeys } from './roof-form.ts'
import { shapeFields, shapeProblems } from './shape-typing.ts'
import { angleDegOfText, lengthMmOfText } from './typed-measure.ts'

/** What is wrong at one field of the form, and what to do about it. */
export type FormProblem = {
  path: string
  message: string
  /** Nothing typed there yet: no fault while a person is still typing elsewhere. */
  isMissing: boolean
}

export const sectionNames: Record<SectionKey, string> = {
  rafter: 'rafter',
  hip: 'hip',
  ridge: 'ridge',
  valley: 'valley',
  underpurlin: 'underpurlin',
  collarTie: 'collar tie',
  fascia: 'fascia',
  barge: 'barge',
}

export type TypedField = { path: string; text: string; what: string; kind: 'length' | 'angle' }

/** Measures left out or not readable, and ends that leave nothing; the roof itself is judged after. */
export function typingProblems(form: RoofForm, plates: FormPlate[]): FormProblem[] {
  const plan = shapeFields(form).flatMap(fieldProblem)
  const others = [
    ...plateFields(form, plates),
    ...layoutFields(form),
    ...sectionFields(form, plates),
  ].flatMap(fieldProblem)
  return [...(plan.length > 0 ? plan : shapeProblems(form)), ...others]
}

function fieldProblem({ path, text, what, kind }: TypedField): FormProblem[] {
  if (text.trim() === '') return [{ path, message: `Type the ${what}.`, isMissing: true }]
  const value = kind === 'angle' ? angleDegOfText(text) : lengthMmOfText(text)
  if (!Number.isNaN(value)) return []
  const how = kind === 'angle' ? 'in degrees, like 22.5' : 'in mm, like 4250'
  return [
    {
      path,
      message: `“${text.trim()}” is not a number. Type the ${what} ${how}.`,
      isMissing: false,
    },
  ]
}

/** Own measures of a plate where typed; the ones for all where a plate leans on them. */
function plateFields(form: RoofForm, plates: FormPlate[]): TypedField[] {
  const eaves = plates.filter((plate) => plate.side.finish === 'eave')
  const gables = plates.filter((plate) => plate.side.finish === 'gable')
  const leans = (list: FormPlate[], key: 'pitchDeg' | 'overhangMm') =>
    list.some((plate) => plate.side[key].trim() === '')
  const own = plates.flatMap((plate): TypedField[] => {
    const { pitchDeg, overhangMm, finish } = plate.side
    const fields: TypedField[] = []
    if (finish === 'eave' && pitchDeg.trim() !== '') {
      fields.push({ path: `${plate.path}.pitchDeg`, text: pitchDeg, what: 'pitch', kind: 'angle' })
    }
    if (overhangMm.trim() !== '') {
      const path = `${plate.path}.overhangMm`
      fields.push({ path, text: overhangMm, what: 'overhang', kind: 'length' })
    }
    return fields
  })
  const forAll: TypedField[] = []
  if (leans(eaves, 'pitchDeg')) {
    forAll.push({ path: 'pitchDeg', text: form.pitchDeg, what: 'pitch', kind: 'angle' })
  }
  if (leans(eaves, 'overhangMm')) {
    const what = 'overhang at the eaves'
    forAll.push({ path: 'overhangMm', text: form.overhangMm, what, kind: 'length' })
  }
  if (leans(gables, 'overhangMm')) {
    const what = 'overhang at the verges'
    forAll.push({ path: 'vergeOverhangMm', text: form.vergeOverhangMm, what, kind: 'length' })
  }
  return [...forAll, ...own]
}

function layoutFields(form: RoofForm): TypedField[] {
  const fields: TypedField[] = [
    { path: 'plateWidthMm', text: form.plateWidthMm, what: 'plate width', kind: 'length' },
    { path: 'maxSpacingMm', text: form.maxSpacingMm, what: 'rafter spacing', kind: 'length' },
    { path: 'tailAllowanceMm', text: form.tailAllowanceMm, what: 'tail allowance', kind: 'length' },
  ]
  if (form.standMm.trim() !== '') {
    fields.push({ path: 'standMm', text: form.standMm, what: 'height over plate', kind: 'length' })
  }
  if (form.collarTieHeightMm.trim() !== '') {
    const what = 'height of the collar ties'
    fields.push({ path: 'collarTieHeightMm', text: form.collarTieHeightMm, what, kind: 'length' })
  }
  return fields
}

/** Every section of the frame that the plan needs; the others where either figure is typed. */
function sectionFields(form: RoofForm, plates: FormPlate[]): TypedField[] {
  const isNeeded = (key: SectionKey) =>
    key === 'rafter' ||
    key === 'ridge' ||
    (key === 'hip' && hasHips(plates)) ||
    (key === 'valley' && hasValleys(plates))
  return [...sectionKeys, ...besideKeys].flatMap((key): TypedField[] => {
    const { depthMm, thicknessMm } = form.sections[key]
    if (!isNeeded(key) && depthMm.trim() === '' && thicknessMm.trim() === '') return []
    const path = `sections.${key}`
    const name = sectionNames[key]
    return [
      { path: `${path}.depthMm`, text: depthMm, what: `depth of the ${name}`, kind: 'length' },
      {
        path: `${path}.thicknessMm`,
        text: thicknessMm,
        what: `thickness of the ${name}`,
        kind: 'length',
      },
    ]
  })
}

/** Neighbouring plates run in one line within this (sine): neither hip nor valley between them. */
const straightSine = 1e-3

/** A hip rises wherever two eaves meet at an outer corner; gables on either side leave none. */
export function hasHips(plates: FormPlate[]): boolean {
  return cornersOfEaves(plates).some((sine) => !(Math.abs(sine) < straightSine) && !(sine < 0))
}

/** A valley rises wherever two eaves meet at an inner corner. */
export function hasValleys(plates: FormPlate[]): boolean {
  return cornersOfEaves(plates).some((sine) => sine <= -straightSine)
}

/** Sine of the turn at each corner between two eaves: over 0 outer, under 0 inner, NaN not typed yet. */
function cornersOfEaves(plates: FormPlate[]): number[] {
  const at = (i: number) => plates[(i + plates.length) % plates.length]
  // A list in clockwise order is refused elsewhere; its outer corners are still outer.
  const way = outlineSignedArea2(plates.map(({ start }) => start)) < 0 ? -1 : 1
  return plates.flatMap((plate, i) => {
    const [before, after] = [at(i - 1), at(i + 1)]
    if (plate.side.finish !== 'eave' || before?.side.finish !== 'eave' || !after) return []
    return [way * turnSine(before.start, plate.start, after.start)]
  })
}

function turnSine(before: Point2, corner: Point2, after: Point2): number {
  const [ux, uy] = [corner.x - before.x, corner.y - before.y]
  const [vx, vy] = [after.x - corner.x, after.y - corner.y]
  return (ux * vy - uy * vx) / (Math.hypot(ux, uy) * Math.hypot(vx, vy))
}
