import { Plus, Trash2 } from 'lucide-react'
import { Fragment, type KeyboardEvent } from 'react'
import { mostCorners } from '../../../shared/revisions/form-parts.ts'
import {
  heldWalk,
  walkClosings,
  type WalkClosing,
  walkShown,
  walkWithSides,
  withWalk,
} from '../../../shared/revisions/form-walk.ts'
import { angleDegOfText } from '../../../shared/revisions/typed-measure.ts'
import {
  emptyWalkSide,
  type TurnKind,
  turnKinds,
  type WalkForm,
  type WalkSideForm,
} from '../../../shared/revisions/walk-form.ts'
import { formatMm } from '../../../shared/units/format-length.ts'
import { Button } from '../../ui/button.tsx'
import { Field } from '../../ui/field.tsx'
import { Select, TextInput } from '../../ui/inputs.tsx'
import { fieldId, useRoofForm } from './roof-form-context.ts'

const turnWords: Record<TurnKind, string> = {
  left: 'Left, square',
  right: 'Right, square',
  straight: 'Straight on',
  'left-by': 'Left by …',
  'right-by': 'Right by …',
}

/** The outline as one walks round it: so far, then a turn, and so on back to the start. */
export function WalkFields() {
  const { form, problemAt, setForm } = useRoofForm()
  const walk = walkShown(form)
  const held = heldWalk(form)
  const isClosed = held ? held.walk.isClosed : walk.sides.length > 2
  const take = (next: WalkForm, what: string) => setForm(withWalk(form, next), what)
  const setSide = (i: number, part: Partial<WalkSideForm>, what: string) => {
    const old = walk.sides[i]
    if (old) take({ ...walk, sides: walk.sides.with(i, { ...old, ...part }) }, `walk.${i}.${what}`)
  }
  const add = () => take({ ...walk, sides: [...walk.sides, emptyWalkSide()] }, 'walk.add')
  const problem = problemAt('walk')
  return (
    <div id={fieldId('walk')} className="space-y-3">
      <p className="text-sm text-ink-soft">
        Each side’s length, then the turn at its end. Side 1 runs to the right of the page.
      </p>
      <ol className="space-y-3" onKeyDown={(event) => goOnByEnter(event, add)}>
        {walk.sides.map((side, i) => (
          <WalkRow
            key={i}
            index={i}
            side={side}
            isLast={isClosed && i === walk.sides.length - 1}
            onChange={(part, what) => setSide(i, part, what)}
            onTakeOut={
              walk.sides.length > 1
                ? () => take({ ...walk, sides: walk.sides.toSpliced(i, 1) }, `walk.${i}.out`)
                : null
            }
          />
        ))}
      </ol>
      {problem ? (
        <p role="alert" className="text-sm font-semibold text-stop">
          {problem}
        </p>
      ) : null}
      <div className="flex flex-wrap gap-2">
        <Button kind="plain" disabled={walk.sides.length >= mostCorners} onClick={add}>
          <Plus size={18} aria-hidden /> Add a side
        </Button>
      </div>
      <WalkEnd />
    </div>
  )
}

type RowProps = {
  index: number
  side: WalkSideForm
  /** The side that comes back to the start: its turn is settled. */
  isLast: boolean
  onChange: (part: Partial<WalkSideForm>, what: string) => void
  onTakeOut: (() => void) | null
}

function WalkRow({ index, side, isLast, onChange, onTakeOut }: RowProps) {
  const { problemAt } = useRoofForm()
  const path = `walk.sides.${index}`
  const isBy = side.turn === 'left-by' || side.turn === 'right-by'
  return (
    <li className="grid grid-cols-[1fr_1.2fr_auto] items-start gap-2">
      <div id={fieldId(`${path}.lengthMm`)}>
        <Field label={`Side ${index + 1}, mm`} error={problemAt(`${path}.lengthMm`)}>
          <TextInput
            inputMode="decimal"
            autoComplete="off"
            data-walk-length
            className="tabular-nums"
            maxLength={20}
            value={side.lengthMm}
            onChange={(event) => onChange({ lengthMm: event.target.value }, 'lengthMm')}
          />
        </Field>
      </div>
      {isLast ? (
        <p className="mt-7 flex min-h-11 items-center text-sm text-ink-soft">Back to corner 1</p>
      ) : (
        <div>
          <Field label="Then turn">
            <Select
              aria-label={`Turn after side ${index + 1}`}
              value={side.turn}
              onChange={(event) => {
                const turn = turnKinds.find((kind) => kind === event.target.value)
                if (turn) onChange({ turn }, 'turn')
              }}
            >
              {turnKinds.map((turn) => (
                <option key={turn} value={turn}>
                  {turnWords[turn]}
                </option>
              ))}
            </Select>
          </Field>
          {isBy ? (
            <div id={fieldId(`${path}.turnDeg`)} className="mt-1">
              <Field label="Degrees" error={problemAt(`${path}.turnDeg`)}>
                <TextInput
                  inputMode="decimal"
                  autoComplete="off"
                  aria-label={`Degrees turned after side ${index + 1}`}
                  className="tabular-nums"
                  maxLength={20}
                  value={side.turnDeg}
                  onChange={(event) => onChange({ turnDeg: event.target.value }, 'turnDeg')}
                />
              </Field>
            </div>
          ) : null}
        </div>
      )}
      <button
        type="button"
        aria-label={`Take out side ${index + 1}`}
        disabled={onTakeOut === null}
        onClick={() => onTakeOut?.()}
        className="mt-7 flex h-11 w-11 items-center justify-center rounded-md border border-transparent text-stop disabled:text-ink-soft disabled:opacity-50"
      >
        <Trash2 size={20} aria-hidden />
      </button>
    </li>
  )
}

/** Whether it comes back to the start, and what would close it. */
function WalkEnd() {
  const { form, setForm } = useRoofForm()
  const held = heldWalk(form)
  if (!held || held.unread || held.sides.length < 2) return null
  const { walk } = held
  if (walk.isClosed) {
    const off = walk.gapMm >= 0.1 ? ` within ${walk.gapMm.toFixed(1)} mm` : ''
    return (
      <p role="status" className="font-semibold text-leaf">
        {`The outline closes${off}.`}
      </p>
    )
  }
  const startDeg = angleDegOfText(form.walk.startDeg)
  const closings = walkClosings(held, Number.isNaN(startDeg) ? 0 : startDeg)
  return (
    <div role="status" className="rounded-md border border-l-8 border-ochre px-3 py-2">
      <p className="font-semibold">
        {`Open by ${formatMm(walk.gapMm)} mm: the end lies ${awayWords(walk.gap)} of corner 1.`}
      </p>
      <div className="mt-2 flex flex-wrap gap-2">
        {closings.map((closing) => (
          <Fragment key={closing.kind}>
            <Button
              kind="plain"
              onClick={() =>
                setForm(withWalk(form, walkWithSides(walkShown(form), closing.sides)), 'walk.close')
              }
            >
              {closingWords(closing, held.sides.length)}
            </Button>
          </Fragment>
        ))}
      </div>
    </div>
  )
}

/** Where the end lies as seen from the start: the gap runs the other way. */
function awayWords(gap: { x: number; y: number }): string {
  const words = [
    Math.abs(gap.x) >= 0.5 ? `${formatMm(Math.abs(gap.x))} ${gap.x < 0 ? 'right' : 'left'}` : '',
    Math.abs(gap.y) >= 0.5 ? `${formatMm(Math.abs(gap.y))} ${gap.y < 0 ? 'above' : 'below'}` : '',
  ]
  return words.filter(Boolean).join(' and ')
}

function closingWords(closing: WalkClosing, count: number): string {
  if (closing.kind === 'stretch') {
    const [before, last] = closing.lengthsMm.map(formatMm)
    return `Close it: side ${count - 1} to ${before}, side ${count} to ${last}`
  }
  const turned = closing.isTurnChanged
    ? ` after a turn of ${Math.round(Math.abs(closing.turnLeftDeg) * 10) / 10}° ${closing.turnLeftDeg < 0 ? 'right' : 'left'}`
    : ''
  return `Close it with a side of ${formatMm(closing.lengthMm)} mm${turned}`
}

/** Enter in a length goes on to the next side, and adds one after the last that is typed. */
function goOnByEnter(event: KeyboardEvent<HTMLOListElement>, add: () => void): void {
  if (event.key !== 'Enter' || !(event.target instanceof HTMLInputElement)) return
  if (event.target.dataset['walkLength'] === undefined) return
  event.preventDefault()
  const list = event.currentTarget
  const inputs = () => [...list.querySelectorAll<HTMLInputElement>('[data-walk-length]')]
  const next = inputs().indexOf(event.target) + 1
  if (inputs()[next]) inputs()[next]?.focus()
  else if (event.target.value.trim() !== '') {
    add()
    requestAnimationFrame(() => inputs()[next]?.focus())
  }
}
