import { memo, useState } from 'react'
import { formatDay } from '../../../shared/calendar/days.ts'
import { localDayOf } from '../../../shared/calendar/local-time.ts'
import { besideKeys, type SectionKey, sectionKeys } from '../../../shared/revisions/roof-form.ts'
import { isEmptySection } from '../../../shared/revisions/roof-of-form.ts'
import type { SizesTyped } from '../../../shared/revisions/sizes-typed.ts'
import { useSession } from '../../lib/session.ts'
import { Fold } from '../../ui/fold.tsx'
import { ChoiceField, FieldGroup, MeasureField } from './form-fields.tsx'
import { useRoofForm } from './roof-form-context.ts'

const sizesRule = 'Sized by span tables or an engineer, not by this program. Type what they say.'

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

type SizesProps = { sizesTyped: SizesTyped }

/** Every size is typed by a person; none is offered. Who typed it stands beside it. */
export const SectionFields = memo(function SectionFields({ sizesTyped }: SizesProps) {
  return (
    <FieldGroup title="Timber sizes" note={sizesRule}>
      {sectionKeys.map((key) => (
        <SectionPair key={key} name={key} sizesTyped={sizesTyped} />
      ))}
    </FieldGroup>
  )
})

/** Timbers that are set out only where a size is typed for them. */
export const BesideFields = memo(function BesideFields({ sizesTyped }: SizesProps) {
  const { form } = useRoofForm()
  const [wasUsed] = useState(() => besideKeys.some((key) => !isEmptySection(form.sections[key])))
  return (
    <section className="rounded-md border border-rule bg-sheet px-4">
      <Fold title="Timbers beside the frame" isOpen={wasUsed}>
        <p className="text-sm text-ink-soft">Empty: not set out. {sizesRule}</p>
        <div className="mt-3 grid grid-cols-2 gap-3 pb-4">
          {besideKeys.map((key) => (
            <SectionPair key={key} name={key} sizesTyped={sizesTyped} />
          ))}
          <MeasureField
            path="collarTieHeightMm"
            label="Collar tie height, mm"
            hint="Plate to the tie’s underside. Empty: in the upper third of the rise."
            className="col-span-2"
          />
        </div>
      </Fold>
    </section>
  )
})

function SectionPair({ name, sizesTyped }: { name: SectionKey } & SizesProps) {
  const { timeZone } = useSession().firm
  const typed = sizesTyped[name]
  const day = typed ? formatDay(localDayOf(new Date(typed.at), timeZone)) : ''
  const hint = sectionHints[name]
  return (
    <fieldset className="col-span-2">
      <legend className="mb-1 font-semibold">{sectionTitles[name]}</legend>
      <div className="grid grid-cols-2 gap-2">
        <MeasureField path={`sections.${name}.depthMm`} label="Depth, mm" />
        <MeasureField path={`sections.${name}.thicknessMm`} label="Thickness, mm" />
      </div>
      {typed ? (
        <p className="mt-1 text-sm text-ink-soft">{`Typed by ${typed.by}, ${day}.`}</p>
      ) : hint ? (
        <p className="mt-1 text-sm text-ink-soft">{hint}</p>
      ) : null}
    </fieldset>
  )
}

export const LayoutFields = memo(function LayoutFields() {
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
})

export const CutFields = memo(function CutFields() {
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
})
