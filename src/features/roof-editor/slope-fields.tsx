import { type FormPlate, platesOfForm } from '../../../shared/revisions/form-outline.ts'
import { plateMeasures } from '../../../shared/revisions/roof-of-form.ts'
import { formatMm } from '../../../shared/units/format-length.ts'
import { ChoiceField, FieldGroup, MeasureField } from './form-fields.tsx'
import { fieldId, useRoofForm } from './roof-form-context.ts'

const overhangStarts = [
  ['frame', 'Frame'],
  ['brickwork', 'Brickwork'],
] as const

/** Pitch and overhangs for the whole roof, then what single plates have of their own. */
export function SlopeFields({ brickOffsetMm }: { brickOffsetMm: number }) {
  const { form } = useRoofForm()
  const plates = platesOfForm(form)
  const hasGables = plates.some((plate) => plate.side.finish === 'gable')
  return (
    <>
      <FieldGroup title="Pitch and overhang">
        <MeasureField path="pitchDeg" label="Pitch, degrees" />
        <MeasureField path="overhangMm" label="Eaves overhang, mm" />
        <ChoiceField
          path="overhangFrom"
          label="Overhang from"
          className={hasGables ? '' : 'col-span-2'}
          hint={
            form.overhangFrom === 'brickwork'
              ? `${formatMm(brickOffsetMm)} mm added for the brickwork (Firm settings).`
              : 'Level, from the plate’s outer face to the tail’s plumb cut.'
          }
          options={overhangStarts}
        />
        {hasGables ? <MeasureField path="vergeOverhangMm" label="Verge overhang, mm" /> : null}
      </FieldGroup>
      <FieldGroup
        title="Edges"
        note="Hip or gable, edge by edge, as numbered on the plan. Leave pitch and overhang empty to take those above."
      >
        <ol className="col-span-2 space-y-3">
          {plates.map((plate, i) => (
            <PlateFields key={plate.path} plate={plate} number={i + 1} />
          ))}
        </ol>
      </FieldGroup>
    </>
  )
}

const finishes = [
  ['eave', 'Eave'],
  ['gable', 'Gable'],
] as const
const endFinishes = [
  ['eave', 'Hip end'],
  ['gable', 'Gable end'],
] as const

function finishWords({ path }: FormPlate) {
  return path === 'sides.left' || path === 'sides.right' ? endFinishes : finishes
}

function PlateFields({ plate, number }: { plate: FormPlate; number: number }) {
  const { form, problemAt } = useRoofForm()
  const { path, side, name } = plate
  const taken = plateMeasures(form, {
    ...plate,
    side: { ...side, pitchDeg: '', overhangMm: '' },
  })
  const problem = problemAt(path)
  const title = form.shape === 'corners' ? `Edge ${number}` : `Edge ${number} · ${name}`
  return (
    <li id={fieldId(path)}>
      <fieldset>
        <legend className="mb-1 font-semibold">{title}</legend>
        <div className="grid grid-cols-[1.3fr_1fr_1fr] gap-2">
          <ChoiceField path={`${path}.finish`} label="Finish" options={finishWords(plate)} />
          {side.finish === 'eave' ? (
            <MeasureField path={`${path}.pitchDeg`} label="Pitch" placeholder={taken.pitchDeg} />
          ) : (
            <span />
          )}
          <MeasureField
            path={`${path}.overhangMm`}
            label="Overhang"
            placeholder={taken.overhangMm}
          />
        </div>
        {problem ? (
          <p role="alert" className="mt-1 text-sm font-semibold text-stop">
            {problem}
          </p>
        ) : null}
      </fieldset>
    </li>
  )
}
