import { createHash } from 'node:crypto'
import { type RoofGlyphData, roofGlyphOf } from '../../shared/drawing/roof-glyph.ts'
import type { FormProblem } from '../../shared/revisions/form-typing.ts'
import { frameOfForm } from '../../shared/revisions/frame-of-form.ts'
import type { RoofForm } from '../../shared/revisions/roof-form.ts'
import { type FormFirm, typedRoof } from '../../shared/revisions/roof-of-form.ts'
import { engineVersion } from '../../shared/roof/roof-settings.ts'
import type { FrameSpec, Roof, RoofSettings } from '../../shared/roof/roof-types.ts'
import { canonicalJson } from './canonical-json.ts'

export type RevisionQuestion = {
  form: RoofForm
  firm: FormFirm
  /** Hash of what the newest revision was made from; null before the first. */
  latestHash: string | null
}

export type FramedRoof = {
  roof: Roof
  settings: RoofSettings
  spec: FrameSpec
  glyph: RoofGlyphData
  engineVersion: string
  /** Over roof, settings and engine version. */
  inputHash: string
}

export type PreparedRevision =
  | { kind: 'refused'; problems: FormProblem[] }
  /** The same input as the newest revision: nothing was framed. */
  | { kind: 'same' }
  | { kind: 'framed'; framed: FramedRoof }

/** Everything that issuing a draft works out, as plain data in and out: it can run in a thread. */
export function prepareRevision(question: RevisionQuestion): PreparedRevision {
  const { form, firm, latestHash } = question
  const { settings } = firm
  const typed = typedRoof(form, firm)
  const inputHash = hashOf(typed.drawn, settings)
  if (typed.problems.length === 0 && inputHash === latestHash) return { kind: 'same' }
  const { reading, spec } = frameOfForm(form, firm)
  if (reading.problems !== null) return { kind: 'refused', problems: reading.problems }
  if (spec === null) throw new Error('A roof without a fault was not framed.')
  const { roof } = reading
  const glyph = roofGlyphOf(spec, roof)
  return { kind: 'framed', framed: { roof, settings, spec, glyph, engineVersion, inputHash } }
}

function hashOf(roof: Roof, settings: RoofSettings): string {
  return createHash('sha256').update(canonicalJson({ roof, settings, engineVersion })).digest('hex')
}
