import { frameRoof } from '../roof/frame-roof.ts'
import { RoofRefusedError } from '../roof/roof-problems.ts'
import type { FrameSpec, Roof } from '../roof/roof-types.ts'
import { platesOfForm } from './form-outline.ts'
import { formProblemsOf } from './form-problem-paths.ts'
import type { RoofForm } from './roof-form.ts'
import { type FormFirm, type FormReading, refusedReading, roofOfForm } from './roof-of-form.ts'
import { unsizedProblems } from './unsized-sections.ts'

export type FormFrame = { reading: FormReading; spec: FrameSpec | null }

/** The frame of a typed roof, or what is wrong with it, field by field and place by place. */
export function frameOfForm(form: RoofForm, firm: FormFirm): FormFrame {
  const reading = roofOfForm(form, firm)
  if (!reading.roof) return { reading, spec: null }
  return framed(form, reading.roof, firm)
}

function framed(form: RoofForm, roof: Roof, { settings }: FormFirm): FormFrame {
  try {
    const spec = frameRoof(roof, settings)
    const unsized = unsizedProblems(form, spec)
    if (unsized.length > 0) return { reading: refusedReading(roof, unsized, []), spec: null }
    return { reading: { roof, problems: null }, spec }
  } catch (error) {
    if (!(error instanceof RoofRefusedError)) throw error
    const problems = formProblemsOf(error.problems, form, platesOfForm(form))
    return { reading: refusedReading(roof, problems, error.problems), spec: null }
  }
}
