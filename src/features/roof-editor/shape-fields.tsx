import { type RoofShape, roofShapes } from '../../../shared/revisions/roof-form.ts'
import { withTypedCorners } from '../../../shared/revisions/form-outline.ts'
import { ChoiceField, FieldGroup, MeasureField } from './form-fields.tsx'
import { CornerFields } from './corner-fields.tsx'
import { fieldId, useRoofForm } from './roof-form-context.ts'

const shapeNames: Record<RoofShape, string> = {
  rectangle: 'Rectangle',
  'octagonal-end': 'Octagonal end',
  'splayed-end': 'Splayed end',
  corners: 'Type the corners',
}

const endWords = [
  ['right', 'Right'],
  ['left', 'Left'],
  ['both', 'Both'],
] as const

const lengthOfWords = [
  ['straight-side', 'Straight side'],
  ['overall', 'Over all'],
] as const

/** Which plan it is, and how big. */
export function ShapeFields() {
  const { form, problemAt, setText, setForm } = useRoofForm()
  const take = (shape: RoofShape) =>
    shape === 'corners' ? setForm(withTypedCorners(form), 'shape') : setText('shape', shape)
  const hasCutEnd = form.shape === 'octagonal-end' || form.shape === 'splayed-end'
  const problem = problemAt('shape')
  return (
    <FieldGroup title="Shape" note="Measured to the outer face of the top plates, in mm.">
      <div
        id={fieldId('shape')}
        role="radiogroup"
        aria-label="Shape"
        className="col-span-2 grid grid-cols-2 gap-2"
      >
        {roofShapes.map((shape) => (
          <label
            key={shape}
            className={`flex min-h-11 items-center justify-center rounded-md border px-2 text-center font-semibold leading-tight has-focus-visible:outline-3 has-focus-visible:outline-chalk ${shape === form.shape ? 'border-ink bg-ink text-sheet' : 'border-ink-soft bg-sheet'}`}
          >
            <input
              type="radio"
              name="shape"
              className="sr-only"
              checked={shape === form.shape}
              onChange={() => take(shape)}
            />
            {shapeNames[shape]}
          </label>
        ))}
      </div>
      {problem ? (
        <p role="alert" className="col-span-2 text-sm font-semibold text-stop">
          {problem}
        </p>
      ) : null}
      {form.shape === 'corners' ? (
        <CornerFields />
      ) : (
        <>
          <MeasureField path="lengthMm" label="Length, mm" />
          <MeasureField path="widthMm" label="Width, mm" />
        </>
      )}
      {hasCutEnd ? (
        <>
          <ChoiceField path="lengthOf" label="Length is" options={lengthOfWords} />
          <ChoiceField
            path="endAt"
            label={form.shape === 'octagonal-end' ? 'Octagonal end at' : 'Splayed end at'}
            options={endWords}
          />
        </>
      ) : null}
      {form.shape === 'splayed-end' ? (
        <MeasureField
          path="splayMm"
          label="Splay, mm"
          hint="Back from the square corner, along side and end alike."
          className="col-span-2"
        />
      ) : null}
    </FieldGroup>
  )
}
