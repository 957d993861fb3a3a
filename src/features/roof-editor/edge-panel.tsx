import { Plus } from 'lucide-react'
import { edgeLengthMm } from '../../../shared/outline/outline-geometry.ts'
import { platesOfForm } from '../../../shared/revisions/form-outline.ts'
import { plateMeasures } from '../../../shared/revisions/roof-of-form.ts'
import { formatLength, type LengthUnits } from '../../../shared/units/format-length.ts'
import { Button } from '../../ui/button.tsx'
import { PopPanel } from '../../ui/pop-panel.tsx'
import { Segmented } from '../../ui/segmented.tsx'
import { MeasureField } from './form-fields.tsx'
import { mayAddCorner } from './outline-edits.ts'
import { useRoofForm } from './roof-form-context.ts'

type Props = {
  edge: number
  anchor: Element | null
  units: LengthUnits
  onAddCorner: () => void
  onClose: () => void
}

const finishes = [
  { value: 'eave', label: 'Eave' },
  { value: 'gable', label: 'Gable' },
] as const

/** What one plate edge has of its own, beside the edge on the drawing. */
export function EdgePanel({ edge, anchor, units, onAddCorner, onClose }: Props) {
  const { form, setText, problemAt } = useRoofForm()
  const plates = platesOfForm(form)
  const plate = plates[edge]
  if (!plate) return null
  const { path, side, name } = plate
  const outline = plates.map(({ start }) => start)
  const forAll = plateMeasures(form, { ...plate, side: { ...side, pitchDeg: '', overhangMm: '' } })
  const problem = problemAt(path) ?? problemAt(`${path}.finish`)
  const length = formatLength(edgeLengthMm(outline, edge), units)
  return (
    <PopPanel anchor={anchor} title={`Edge ${edge + 1} · ${length}`} onClose={onClose}>
      {form.shape === 'corners' ? null : <p className="-mt-2 mb-2 text-ink-soft">{name}</p>}
      <Segmented
        label={`Finish of edge ${edge + 1}`}
        options={finishes}
        value={side.finish}
        onChange={(finish) => setText(`${path}.finish`, finish)}
      />
      {problem ? (
        <p role="alert" className="mt-1 text-sm font-semibold text-stop">
          {problem}
        </p>
      ) : null}
      <div className="mt-3 grid grid-cols-2 gap-3">
        {side.finish === 'eave' ? (
          <MeasureField
            isCopy
            path={`${path}.pitchDeg`}
            label="Pitch, degrees"
            placeholder={forAll.pitchDeg}
          />
        ) : null}
        <MeasureField
          isCopy
          path={`${path}.overhangMm`}
          label={side.finish === 'gable' ? 'Verge overhang' : 'Overhang, mm'}
          placeholder={forAll.overhangMm}
        />
      </div>
      <p className="mt-1 text-sm text-ink-soft">Empty: as for the whole roof.</p>
      <Button
        kind="plain"
        className="mt-3 w-full"
        disabled={!mayAddCorner(outline, edge)}
        onClick={onAddCorner}
      >
        <Plus size={18} aria-hidden /> Put a corner on this edge
      </Button>
    </PopPanel>
  )
}
