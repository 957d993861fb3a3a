import { memo, useCallback, useEffect, useRef } from 'react'
import { Plus, Repeat, Trash2 } from 'lucide-react'
import { outlineTurnedRound } from '../../../shared/outline/outline-geometry.ts'
import { mostCorners } from '../../../shared/revisions/form-parts.ts'
import { emptyCorner, type RoofForm } from '../../../shared/revisions/roof-form.ts'
import { Button } from '../../ui/button.tsx'
import { MeasureBox } from './form-fields.tsx'
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
  const { form, problemAt, setText, setForm } = useRoofForm()
  const { corners } = form
  const problem = problemAt('corners')
  const now = useRef(form)
  useEffect(() => {
    now.current = form
  }, [form])
  const takeOut = useCallback(
    (i: number) => {
      const left = now.current.corners.toSpliced(i, 1)
      setForm({ ...now.current, corners: left }, `corners.${i}.out`)
    },
    [setForm],
  )
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
        {corners.map(({ x, y }, i) => (
          <CornerRow
            key={i}
            index={i}
            x={x}
            y={y}
            problem={problemAt(`corners.${i}`)}
            problemX={problemAt(`corners.${i}.x`)}
            problemY={problemAt(`corners.${i}.y`)}
            setText={setText}
            onTakeOut={corners.length > leastCorners ? takeOut : null}
          />
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

type RowProps = {
  index: number
  x: string
  y: string
  problem: string | undefined
  problemX: string | undefined
  problemY: string | undefined
  setText: (path: string, text: string) => void
  onTakeOut: ((index: number) => void) | null
}

/** Drawn again only when it changes itself: a plan has up to 64 of them. */
const CornerRow = memo(function CornerRow(props: RowProps) {
  const { index, x, y, problem, problemX, problemY, setText, onTakeOut } = props
  const path = `corners.${index}`
  const name = `Corner ${index + 1}`
  return (
    <li id={fieldId(path)}>
      <div className="grid grid-cols-[1fr_1fr_auto] items-start gap-2">
        <MeasureBox
          path={`${path}.x`}
          label={`${name}, x`}
          text={x}
          problem={problemX}
          setText={setText}
        />
        <MeasureBox
          path={`${path}.y`}
          label={`${name}, y`}
          text={y}
          problem={problemY}
          setText={setText}
        />
        <button
          type="button"
          aria-label={`Take out corner ${index + 1}`}
          disabled={onTakeOut === null}
          onClick={() => onTakeOut?.(index)}
          className="mt-7 flex h-11 w-11 items-center justify-center rounded-md border border-transparent text-stop disabled:text-ink-soft disabled:opacity-50"
        >
          <Trash2 size={20} aria-hidden />
        </button>
      </div>
      {problem ? (
        <p role="alert" className="mt-1 text-sm font-semibold text-stop">
          {problem}
        </p>
      ) : null}
    </li>
  )
})
