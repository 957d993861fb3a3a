import { Trash2 } from 'lucide-react'
import { asCorners } from '../../../shared/revisions/form-outline.ts'
import { textAt, withText } from '../../../shared/revisions/form-paths.ts'
import { Button } from '../../ui/button.tsx'
import { Field } from '../../ui/field.tsx'
import { TextInput } from '../../ui/inputs.tsx'
import { PopPanel } from '../../ui/pop-panel.tsx'
import { useRoofForm } from './roof-form-context.ts'

type Props = {
  corner: number
  anchor: Element | null
  onTakeOut: () => void
  onClose: () => void
}

const leastCorners = 3

/** Where one corner stands, to the millimetre; typing makes a ready shape a list of corners. */
export function CornerPanel({ corner, anchor, onTakeOut, onClose }: Props) {
  const { form } = useRoofForm()
  const count = asCorners(form)?.corners.length ?? 0
  return (
    <PopPanel anchor={anchor} title={`Corner ${corner + 1}`} onClose={onClose}>
      <div className="grid grid-cols-2 gap-3">
        <PlaceField corner={corner} axis="x" label="x, to the right" />
        <PlaceField corner={corner} axis="y" label="y, up" />
      </div>
      <Button
        kind="danger"
        className="mt-3 w-full"
        disabled={count <= leastCorners}
        onClick={onTakeOut}
      >
        <Trash2 size={18} aria-hidden /> Take out this corner
      </Button>
    </PopPanel>
  )
}

function PlaceField({ corner, axis, label }: { corner: number; axis: 'x' | 'y'; label: string }) {
  const { form, problemAt, setForm } = useRoofForm()
  const path = `corners.${corner}.${axis}`
  const corners = asCorners(form)
  return (
    <Field label={label} error={problemAt(path)}>
      <TextInput
        inputMode="decimal"
        autoComplete="off"
        className="tabular-nums"
        maxLength={20}
        value={corners ? textAt(corners, path) : ''}
        onChange={(event) => {
          if (corners) setForm(withText(corners, path, event.target.value), path)
        }}
      />
    </Field>
  )
}
