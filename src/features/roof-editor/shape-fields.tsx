import { memo } from 'react'
import { MousePointerClick } from 'lucide-react'
import { asCorners, withTypedCorners } from '../../../shared/revisions/form-outline.ts'
import { type RoofShape, roofShapes } from '../../../shared/revisions/roof-form.ts'
import { isWingShape } from '../../../shared/revisions/wing-form.ts'
import { Button } from '../../ui/button.tsx'
import { ChoiceField, FieldGroup, MeasureField } from './form-fields.tsx'
import { OutlineFields } from './outline-fields.tsx'
import { fieldId, useRoofForm } from './roof-form-context.ts'
import { ShapeIcon } from './shape-icon.tsx'
import { WingFields } from './wing-fields.tsx'

const shapeNames: Record<RoofShape, string> = {
  rectangle: 'Rectangle',
  l: 'L',
  t: 'T',
  u: 'U',
  cross: 'Cross',
  'octagonal-end': 'Octagonal end',
  'splayed-end': 'Splayed end',
  corners: 'Any outline',
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
export const ShapeFields = memo(function ShapeFields() {
  const { form, problemAt } = useRoofForm()
  const problem = problemAt('shape')
  return (
    <FieldGroup title="Shape" note="Measured to the outer face of the top plates, in mm.">
      <ShapeChoice />
      {problem ? (
        <p role="alert" className="col-span-2 text-sm font-semibold text-stop">
          {problem}
        </p>
      ) : null}
      {form.shape === 'corners' ? <OutlineFields /> : <ShapeMeasures />}
    </FieldGroup>
  )
})

function ShapeChoice() {
  const { form, setText, setForm } = useRoofForm()
  const take = (shape: RoofShape) =>
    shape === 'corners' ? setForm(withTypedCorners(form), 'shape') : setText('shape', shape)
  return (
    <div
      id={fieldId('shape')}
      role="radiogroup"
      aria-label="Shape"
      className="col-span-2 grid grid-cols-4 gap-2"
    >
      {roofShapes.map((shape) => (
        <label
          key={shape}
          className={`flex min-h-16 flex-col items-center justify-center gap-1 rounded-md border px-1 py-2 text-center text-sm font-semibold leading-tight has-focus-visible:outline-3 has-focus-visible:outline-chalk ${shape === form.shape ? 'border-ink bg-ink text-sheet' : 'border-ink-soft bg-sheet'}`}
        >
          <input
            type="radio"
            name="shape"
            className="sr-only"
            checked={shape === form.shape}
            onChange={() => take(shape)}
          />
          <ShapeIcon shape={shape} />
          {shapeNames[shape]}
        </label>
      ))}
    </div>
  )
}

function ShapeMeasures() {
  const { form, setForm } = useRoofForm()
  const { shape } = form
  const corners = asCorners(form)
  return (
    <>
      {isWingShape(shape) ? (
        <WingFields shape={shape} />
      ) : (
        <>
          <MeasureField path="lengthMm" label="Length, mm" />
          <MeasureField path="widthMm" label="Width, mm" />
          <EndFields />
        </>
      )}
      {corners ? (
        <Button
          kind="quiet"
          className="col-span-2 justify-self-start px-0!"
          onClick={() => setForm(corners, 'shape')}
        >
          <MousePointerClick size={18} aria-hidden /> Go on from here with corners
        </Button>
      ) : null}
    </>
  )
}

function EndFields() {
  const { form } = useRoofForm()
  if (form.shape === 'rectangle') return null
  const isOctagonal = form.shape === 'octagonal-end'
  return (
    <>
      <ChoiceField path="lengthOf" label="Length is" options={lengthOfWords} />
      <ChoiceField
        path="endAt"
        label={isOctagonal ? 'Octagonal end at' : 'Splayed end at'}
        options={endWords}
      />
      {isOctagonal ? null : (
        <MeasureField
          path="splayMm"
          label="Splay, mm"
          hint="Back from the square corner, along side and end alike."
          className="col-span-2"
        />
      )}
    </>
  )
}
