import { memo } from 'react'
import { type FormPlate, platesOfForm } from '../../../shared/revisions/form-outline.ts'
import { plateMeasures } from '../../../shared/revisions/roof-of-form.ts'
import { formatMm } from '../../../shared/units/format-length.ts'
import { ChoiceBox, ChoiceField, FieldGroup, MeasureBox, MeasureField } from './form-fields.tsx'
import { fieldId, type RoofFormHandle, useRoofForm } from './roof-form-context.ts'

const overhangStarts = [
  ['frame', 'Frame'],
  ['brickwork', 'Brickwork'],
] as const

/** Pitch and overhangs for the whole roof, then what single plates have of their own. */
export const SlopeFields = memo(function SlopeFields({ brickOffsetMm }: { brickOffsetMm: number }) {
  const handle = useRoofForm()
  const { form } = handle
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
        note="Hip or gable, edge by edge, as numbered on the plan; or tap an edge there. Leave pitch and overhang empty to take those above."
      >
        <ol className="col-span-2 space-y-3">
          {plates.map((plate, i) => (
            <PlateFields
              key={plate.path}
              {...plateProps(handle, plate)}
              number={i + 1}
              setText={handle.setText}
            />
          ))}
        </ol>
      </FieldGroup>
    </>
  )
})

const finishes = [
  ['eave', 'Eave'],
  ['gable', 'Gable'],
] as const
const endFinishes = [
  ['eave', 'Hip end'],
  ['gable', 'Gable end'],
] as const

function finishWords(path: string) {
  return path === 'sides.left' || path === 'sides.right' ? endFinishes : finishes
}

/** Reads what one plate shows and hands it on, so that a key elsewhere leaves its fields alone. */
function plateProps({ form, problemAt, hintAt }: RoofFormHandle, plate: FormPlate) {
  const { path, side, name } = plate
  const forAll = plateMeasures(form, { ...plate, side: { ...side, pitchDeg: '', overhangMm: '' } })
  return {
    path,
    name: form.shape === 'corners' ? '' : name,
    finish: side.finish,
    pitchDeg: side.pitchDeg,
    overhangMm: side.overhangMm,
    pitchForAll: forAll.pitchDeg,
    overhangForAll: forAll.overhangMm,
    problem: problemAt(path),
    finishProblem: problemAt(`${path}.finish`),
    pitchProblem: problemAt(`${path}.pitchDeg`),
    overhangProblem: problemAt(`${path}.overhangMm`),
    pitchHint: hintAt(`${path}.pitchDeg`),
    overhangHint: hintAt(`${path}.overhangMm`),
  }
}

type PlateProps = ReturnType<typeof plateProps> & {
  number: number
  setText: (path: string, text: string) => void
}

/** Drawn again only when it changes itself: a plan has up to 64 of them. */
const PlateFields = memo(function PlateFields(props: PlateProps) {
  const { path, name, number, finish, problem, setText } = props
  return (
    <li id={fieldId(path)}>
      <fieldset>
        <legend className="mb-1 font-semibold">
          {name ? `Edge ${number} · ${name}` : `Edge ${number}`}
        </legend>
        <div className="grid grid-cols-[1.3fr_1fr_1fr] gap-2">
          <ChoiceBox
            path={`${path}.finish`}
            label="Finish"
            options={finishWords(path)}
            text={finish}
            problem={props.finishProblem}
            setText={setText}
          />
          {finish === 'eave' ? (
            <MeasureBox
              path={`${path}.pitchDeg`}
              label="Pitch"
              placeholder={props.pitchForAll}
              text={props.pitchDeg}
              hint={props.pitchHint}
              problem={props.pitchProblem}
              setText={setText}
            />
          ) : (
            <span />
          )}
          <MeasureBox
            path={`${path}.overhangMm`}
            label="Overhang"
            placeholder={props.overhangForAll}
            text={props.overhangMm}
            hint={props.overhangHint}
            problem={props.overhangProblem}
            setText={setText}
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
})
