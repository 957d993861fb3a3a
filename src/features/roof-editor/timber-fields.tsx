import { type SectionKey, sectionKeys } from '../../../shared/revisions/roof-form.ts'
import { ChoiceField, FieldGroup, MeasureField } from './form-fields.tsx'

export const sizesRule =
  'Sized by span tables or an engineer, not by this program. Type what they say.'

const sectionTitles: Record<SectionKey, string> = {
  rafter: 'Rafter',
  hip: 'Hip',
  ridge: 'Ridge',
  valley: 'Valley',
  underpurlin: 'Underpurlins',
  collarTie: 'Collar ties',
  fascia: 'Fascia',
  barge: 'Barge boards',
}
const sectionHints: Partial<Record<SectionKey, string>> = {
  hip: 'Leave empty on a roof without hips.',
  valley: 'Leave empty on a roof without valleys.',
}

const bays = [
  ['even', 'All alike'],
  ['full', 'Full bays, the odd one last'],
] as const
const tails = [
  ['plumb', 'Plumb'],
  ['square', 'Square'],
] as const
const hipTops = [
  ['lowered', 'Lowered'],
  ['backed', 'Backed'],
] as const
const valleyTops = [
  ['square', 'Square'],
  ['dished', 'Dished'],
] as const

/** Every size is typed by a person; none is offered. */
export function SectionFields() {
  return (
    <FieldGroup title="Timber sizes" note={sizesRule}>
      {sectionKeys.map((key) => (
        <fieldset key={key} className="col-span-2">
          <legend className="mb-1 font-semibold">{sectionTitles[key]}</legend>
          <div className="grid grid-cols-2 gap-2">
            <MeasureField path={`sections.${key}.depthMm`} label="Depth, mm" />
            <MeasureField path={`sections.${key}.thicknessMm`} label="Thickness, mm" />
          </div>
          {sectionHints[key] ? (
            <p className="mt-1 text-sm text-ink-soft">{sectionHints[key]}</p>
          ) : null}
        </fieldset>
      ))}
    </FieldGroup>
  )
}

export function LayoutFields() {
  return (
    <FieldGroup title="Plates and spacing">
      <MeasureField path="plateWidthMm" label="Plate width, mm" />
      <MeasureField
        path="maxSpacingMm"
        label="Rafter spacing, mm"
        hint="Centre to centre, at most."
      />
      <ChoiceField
        path="spacing"
        label="Bays between stations"
        className="col-span-2"
        options={bays}
      />
    </FieldGroup>
  )
}

export function CutFields() {
  return (
    <FieldGroup title="Tails, hips and seats">
      <ChoiceField path="tail" label="Tail cut" options={tails} />
      <MeasureField
        path="tailAllowanceMm"
        label="Tail allowance, mm"
        hint="Left long, cut to a line on site."
      />
      <ChoiceField path="hipTop" label="Hip top" options={hipTops} />
      <ChoiceField path="valleyTop" label="Valley top" options={valleyTops} />
      <MeasureField
        path="standMm"
        label="Height over plate, mm"
        hint="Leave empty to have it worked out."
        className="col-span-2"
      />
    </FieldGroup>
  )
}
