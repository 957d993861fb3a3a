import { roofProblems } from '../roof/roof-problems.ts'
import type {
  Roof,
  RoofEdge,
  RoofProblem,
  RoofSections,
  RoofSettings,
  Section,
} from '../roof/roof-types.ts'
import { type FormPlate, platesOfForm } from './form-outline.ts'
import { formProblemsOf } from './form-problem-paths.ts'
import { type FormProblem, typingProblems } from './form-typing.ts'
import { besideKeys, type RoofForm, type SectionForm } from './roof-form.ts'
import { angleDegOfText, lengthMmOfText } from './typed-measure.ts'

/** What a firm and job bring to a typed roof. */
export type FormFirm = {
  /** Added to an overhang measured from brickwork. */
  brickOffsetMm: number
  settings: RoofSettings
}

export type FormReading =
  | { roof: Roof; problems: null }
  | {
      roof: null
      /** Each at its form field: 'sections.rafter.depthMm', 'sides.left.pitchDeg', 'corners.2'. */
      problems: FormProblem[]
      /** For the drawing only: NaN where a measure cannot be read. */
      drawn: Roof
      /** The same faults at their places in `drawn`. */
      drawnProblems: RoofProblem[]
    }

/**
 * Reads the form into a roof that can be framed, or says at each field what to change.
 * The browser runs it while a person types, the server before it issues: one code, one answer.
 */
export function roofOfForm(form: RoofForm, firm: FormFirm): FormReading {
  const typed = typedRoof(form, firm)
  if (typed.problems.length > 0) return refusedReading(typed.drawn, typed.problems, [])
  const found = roofProblems(typed.drawn, firm.settings)
  return found.length > 0
    ? refusedReading(typed.drawn, formProblemsOf(found, form, platesOfForm(form)), found)
    : { roof: typed.drawn, problems: null }
}

/** What can be read at a keystroke, without any geometry of the roof. */
export type TypedRoof = { drawn: Roof; problems: FormProblem[] }

export function typedRoof(form: RoofForm, { brickOffsetMm }: Pick<FormFirm, 'brickOffsetMm'>) {
  const plates = platesOfForm(form)
  const drawn = roofAsTyped(form, plates, brickOffsetMm)
  return { drawn, problems: typingProblems(form, plates) } satisfies TypedRoof
}

export function refusedReading(
  drawn: Roof,
  problems: FormProblem[],
  drawnProblems: RoofProblem[],
): FormReading {
  return { roof: null, problems, drawn, drawnProblems }
}

function roofAsTyped(form: RoofForm, plates: FormPlate[], brickOffsetMm: number): Roof {
  const standMm = form.standMm.trim() === '' ? {} : { standMm: lengthMmOfText(form.standMm) }
  const collarTie =
    form.collarTieHeightMm.trim() === '' || isEmptySection(form.sections.collarTie)
      ? {}
      : { collarTieHeightMm: lengthMmOfText(form.collarTieHeightMm) }
  return {
    outline: plates.map((plate) => plate.start),
    edges: plates.map((plate) => edgeAsTyped(form, plate, brickOffsetMm)),
    plateWidthMm: lengthMmOfText(form.plateWidthMm),
    maxSpacingMm: lengthMmOfText(form.maxSpacingMm),
    spacing: form.spacing,
    sections: sectionsAsTyped(form),
    tail: form.tail,
    tailAllowanceMm: lengthMmOfText(form.tailAllowanceMm),
    hipTop: form.hipTop,
    valleyTop: form.valleyTop,
    ...standMm,
    ...collarTie,
  }
}

/** What counts for a plate: its own measure, or the one typed for all. */
export function plateMeasures(form: RoofForm, plate: FormPlate): SideTexts {
  const { finish, pitchDeg, overhangMm } = plate.side
  const forAll = finish === 'gable' ? form.vergeOverhangMm : form.overhangMm
  return { pitchDeg: pitchDeg.trim() || form.pitchDeg, overhangMm: overhangMm.trim() || forAll }
}
type SideTexts = { pitchDeg: string; overhangMm: string }

function edgeAsTyped(form: RoofForm, plate: FormPlate, brickOffsetMm: number): RoofEdge {
  const texts = plateMeasures(form, plate)
  const fromFrameMm = form.overhangFrom === 'brickwork' ? brickOffsetMm : 0
  const overhangMm = lengthMmOfText(texts.overhangMm) + fromFrameMm
  return plate.side.finish === 'gable'
    ? { finish: 'gable', overhangMm }
    : { finish: 'eave', pitchDeg: angleDegOfText(texts.pitchDeg), overhangMm }
}

/**
 * A hip or valley left empty takes the size typed for the rafter or hip: `typingProblems` lets it be
 * empty only where the roof has none, so nothing is ever cut to it.
 */
function sectionsAsTyped(form: RoofForm): RoofSections {
  const rafter = sectionAsTyped(form.sections.rafter)
  const hip = isEmptySection(form.sections.hip) ? rafter : sectionAsTyped(form.sections.hip)
  const valley = isEmptySection(form.sections.valley) ? hip : sectionAsTyped(form.sections.valley)
  const beside = besideKeys.filter((key) => !isEmptySection(form.sections[key]))
  return {
    rafter,
    hip,
    valley,
    ridge: sectionAsTyped(form.sections.ridge),
    ...Object.fromEntries(beside.map((key) => [key, sectionAsTyped(form.sections[key])])),
  }
}

function sectionAsTyped(section: SectionForm): Section {
  return {
    thicknessMm: lengthMmOfText(section.thicknessMm),
    depthMm: lengthMmOfText(section.depthMm),
  }
}

export function isEmptySection(section: SectionForm): boolean {
  return section.depthMm.trim() === '' && section.thicknessMm.trim() === ''
}
