import { endCutMm, endsCut, type FormPlate, straightSideMm } from './form-outline.ts'
import { type RoofForm, type SectionKey, sectionKeys } from './roof-form.ts'
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
}

type Field = { path: string; text: string; what: string; kind: 'length' | 'angle' }

/** Measures left out or not readable, and ends that leave nothing; the roof itself is judged after. */
export function typingProblems(form: RoofForm, plates: FormPlate[]): FormProblem[] {
  const fields = [
    ...shapeFields(form),
    ...plateFields(form, plates),
    ...layoutFields(form),
    ...sectionFields(form, plates),
  ]
  const unread = fields.flatMap(fieldProblem)
  return unread.length > 0 ? unread : shapeProblems(form)
}

function fieldProblem({ path, text, what, kind }: Field): FormProblem[] {
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

function shapeFields(form: RoofForm): Field[] {
  if (form.shape === 'corners') {
    return form.corners.flatMap((corner, i): Field[] => [
      { path: `corners.${i}.x`, text: corner.x, what: `x of corner ${i + 1}`, kind: 'length' },
      { path: `corners.${i}.y`, text: corner.y, what: `y of corner ${i + 1}`, kind: 'length' },
    ])
  }
  const fields: Field[] = [
    { path: 'lengthMm', text: form.lengthMm, what: 'length', kind: 'length' },
    { path: 'widthMm', text: form.widthMm, what: 'width', kind: 'length' },
  ]
  if (form.shape === 'splayed-end') {
    fields.push({ path: 'splayMm', text: form.splayMm, what: 'splay', kind: 'length' })
  }
  return fields
}

/** Own measures of a plate where typed; the ones for all where a plate leans on them. */
function plateFields(form: RoofForm, plates: FormPlate[]): Field[] {
  const eaves = plates.filter((plate) => plate.side.finish === 'eave')
  const gables = plates.filter((plate) => plate.side.finish === 'gable')
  const leans = (list: FormPlate[], key: 'pitchDeg' | 'overhangMm') =>
    list.some((plate) => plate.side[key].trim() === '')
  const own = plates.flatMap((plate): Field[] => {
    const { pitchDeg, overhangMm, finish } = plate.side
    const fields: Field[] = []
    if (finish === 'eave' && pitchDeg.trim() !== '') {
      fields.push({ path: `${plate.path}.pitchDeg`, text: pitchDeg, what: 'pitch', kind: 'angle' })
    }
    if (overhangMm.trim() !== '') {
      const path = `${plate.path}.overhangMm`
      fields.push({ path, text: overhangMm, what: 'overhang', kind: 'length' })
    }
    return fields
  })
  const forAll: Field[] = []
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

function layoutFields(form: RoofForm): Field[] {
  const fields: Field[] = [
    { path: 'plateWidthMm', text: form.plateWidthMm, what: 'plate width', kind: 'length' },
    { path: 'maxSpacingMm', text: form.maxSpacingMm, what: 'rafter spacing', kind: 'length' },
    { path: 'tailAllowanceMm', text: form.tailAllowanceMm, what: 'tail allowance', kind: 'length' },
  ]
  if (form.standMm.trim() !== '') {
    fields.push({ path: 'standMm', text: form.standMm, what: 'height over plate', kind: 'length' })
  }
  return fields
}

function sectionFields(form: RoofForm, plates: FormPlate[]): Field[] {
  const mayBeEmpty: Record<SectionKey, boolean> = {
    rafter: false,
    ridge: false,
    hip: !hasHips(plates),
    valley: true,
  }
  return sectionKeys.flatMap((key): Field[] => {
    const { depthMm, thicknessMm } = form.sections[key]
    if (mayBeEmpty[key] && depthMm.trim() === '' && thicknessMm.trim() === '') return []
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

/** A hip rises wherever two eaves meet at a corner; gables on either side leave none. */
export function hasHips(plates: FormPlate[]): boolean {
  return plates.some((plate, i) => {
    const next = plates[(i + 1) % plates.length]
    return plate.side.finish === 'eave' && next?.side.finish === 'eave'
  })
}

function problem(path: string, message: string): FormProblem {
  return { path, message, isMissing: false }
}

const largestLikelyMetres = 100

/** Measures of a ready shape that leave no plan at all. */
function shapeProblems(form: RoofForm): FormProblem[] {
  if (form.shape === 'corners') return []
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
