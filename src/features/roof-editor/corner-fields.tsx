import { Plus, Repeat, Trash2 } from 'lucide-react'
import { outlineTurnedRound } from '../../../shared/outline/outline-geometry.ts'
import { mostCorners } from '../../../shared/revisions/form-parts.ts'
import { emptyCorner, type RoofForm } from '../../../shared/revisions/roof-form.ts'
import { Button } from '../../ui/button.tsx'
import { MeasureField } from './form-fields.tsx'
import { fieldId, useRoofForm } from './roof-form-context.ts'

const leastCorners = 3

/** The list read the other way round; each plate keeps its finish, pitch and overhang. */
function turnedRound({ corners }: RoofForm): RoofForm['corners'] {
  const round = outlineTurnedRound(corners)
  return round.corners.map(({ x, y }, k) => ({
    ...(corners[round.edgeOf[k] ?? k] ?? emptyCorner),
    x,
    y,
  }))
}

/** The corners of any outline, counter-clockwise. */
export function CornerFields() {
  const { form, problemAt, setForm } = useRoofForm()
  const { corners } = form
  const problem = problemAt('corners')
  return (
    <div id={fieldId('corners')} className="space-y-2">
      <p className="text-sm text-ink-soft">
        Counter-clockwise: the building on your left as you go round. x to the right, y up.
      </p>
      {problem ? (
        <p role="alert" className="text-sm font-semibold text-stop">
          {problem}
        </p>
      ) : null}
      <ol className="space-y-2">
        {corners.map((_, i) => (
          <li key={i} id={fieldId(`corners.${i}`)}>
            <div className="grid grid-cols-[1fr_1fr_auto] items-start gap-2">
              <MeasureField path={`corners.${i}.x`} label={`Corner ${i + 1}, x`} />
              <MeasureField path={`corners.${i}.y`} label={`Corner ${i + 1}, y`} />
              <button
                type="button"
                aria-label={`Take out corner ${i + 1}`}
                disabled={corners.length <= leastCorners}
                onClick={() =>
                  setForm({ ...form, corners: corners.toSpliced(i, 1) }, `corners.${i}.out`)
                }
                className="mt-7 flex h-11 w-11 items-center justify-center rounded-md border border-transparent text-stop disabled:text-ink-soft disabled:opacity-50"
              >
                <Trash2 size={20} aria-hidden />
              </button>
            </div>
            <CornerProblem path={`corners.${i}`} />
          </li>
        ))}
      </ol>
      <div className="flex flex-wrap gap-2">
        <Button
          kind="plain"
          disabled={corners.length >= mostCorners}
          onClick={() => setForm({ ...form, corners: [...corners, { ...emptyCorner }] }, 'corners')}
        >
          <Plus size={18} aria-hidden /> Add a corner
        </Button>
        <Button
          kind="plain"
          onClick={() => setForm({ ...form, corners: turnedRound(form) }, 'turn')}
        >
          <Repeat size={18} aria-hidden /> Turn the list round
        </Button>
      </div>
    </div>
  )
}

function CornerProblem({ path }: { path: string }) {
  const problem = useRoofForm().problemAt(path)
  return problem ? (
    <p role="alert" className="mt-1 text-sm font-semibold text-stop">
      {problem}
    </p>
  ) : null
}
