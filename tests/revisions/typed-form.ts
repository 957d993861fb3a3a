import { withText } from '../../shared/revisions/form-paths.ts'
import { formOfShape, type RoofForm, type RoofShape } from '../../shared/revisions/roof-form.ts'

/** A form filled in by hand: 9.0 × 6.0 m at 25°, 450 overhang, hips all round. */
export function typedForm(
  shape: RoofShape = 'rectangle',
  texts: Record<string, string> = {},
): RoofForm {
  const typed = {
    lengthMm: '9000',
    widthMm: '6000',
    pitchDeg: '25',
    overhangMm: '450',
    vergeOverhangMm: '300',
    'sections.rafter.depthMm': '140',
    'sections.rafter.thicknessMm': '45',
    'sections.hip.depthMm': '190',
    'sections.hip.thicknessMm': '35',
    'sections.ridge.depthMm': '190',
    'sections.ridge.thicknessMm': '35',
    ...texts,
  }
  return Object.entries(typed).reduce(
    (form, [path, text]) => withText(form, path, text),
    formOfShape(shape),
  )
}
