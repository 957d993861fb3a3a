import { ClipboardPaste, SquareDashedMousePointer } from 'lucide-react'
import { useState } from 'react'
import { heldWalk } from '../../../shared/revisions/form-walk.ts'
import { Button } from '../../ui/button.tsx'
import { Segmented } from '../../ui/segmented.tsx'
import { CornerFields } from './corner-fields.tsx'
import { withPastedCorners } from './outline-edits.ts'
import { PasteDialog } from './paste-dialog.tsx'
import { fieldId, useRoofForm } from './roof-form-context.ts'
import { WalkFields } from './walk-fields.tsx'

const ways = [
  { value: 'walk', label: 'Sides and turns' },
  { value: 'corners', label: 'Corners' },
] as const
type Way = (typeof ways)[number]['value']

/** One outline, entered whichever way the plan gives it; every way shows what the others made. */
export function OutlineFields() {
  const { form, problemAt, setForm } = useRoofForm()
  const walkProblem = problemAt('walk')
  const isEmpty = form.corners.every(({ x, y }) => x === '' && y === '')
  const [way, setWay] = useState<Way>(isEmpty || heldWalk(form) ? 'walk' : 'corners')
  const [isPasting, setIsPasting] = useState(false)
  return (
    <div className="col-span-2 space-y-3">
      <div className="flex flex-wrap items-center gap-2">
        <Segmented label="Enter the outline by" options={ways} value={way} onChange={setWay} />
        <Button kind="plain" onClick={() => setIsPasting(true)}>
          <ClipboardPaste size={18} aria-hidden /> Paste coordinates
        </Button>
        {isEmpty ? (
          <Button
            kind="plain"
            onClick={() => setForm(withPastedCorners(form, startingRectangle), 'start')}
          >
            <SquareDashedMousePointer size={18} aria-hidden /> Start with 10 × 8 m and drag
          </Button>
        ) : null}
      </div>
      <p className="text-sm text-ink-soft">Or drag its corners on the plan.</p>
      {way === 'walk' ? (
        <WalkFields />
      ) : (
        <>
          {walkProblem ? (
            <p id={fieldId('walk')} role="alert" className="text-sm font-semibold text-stop">
              {walkProblem}
            </p>
          ) : null}
          <CornerFields />
        </>
      )}
      <PasteDialog
        open={isPasting}
        onClose={() => setIsPasting(false)}
        onTake={(corners) => {
          setForm(withPastedCorners(form, corners), 'paste')
          setWay('corners')
        }}
      />
    </div>
  )
}

/** Something to take hold of on an empty drawing, plainly no one's house. */
const startingRectangle = [
  { x: 0, y: 0 },
  { x: 10_000, y: 0 },
  { x: 10_000, y: 8000 },
  { x: 0, y: 8000 },
]
