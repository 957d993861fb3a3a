import { memo, useCallback, useMemo, useState } from 'react'
import { platesOfForm } from '../../../shared/revisions/form-outline.ts'
import type { FormReading } from '../../../shared/revisions/roof-of-form.ts'
import { isWingShape } from '../../../shared/revisions/wing-form.ts'
import type { Roof } from '../../../shared/roof/roof-types.ts'
import type { LengthUnits } from '../../../shared/units/format-length.ts'
import { RoofPlan } from '../../drawings/roof-plan.tsx'
import { Field } from '../../ui/field.tsx'
import { Select } from '../../ui/inputs.tsx'
import { Segmented } from '../../ui/segmented.tsx'
import { Note } from '../../ui/states.tsx'
import { CornerPanel } from './corner-panel.tsx'
import { EdgePanel } from './edge-panel.tsx'
import { FaultList } from './fault-list.tsx'
import { OutlineDrawing } from './outline-drawing.tsx'
import { outlineFaults } from './outline-faults.ts'
import type { OutlinePart } from './outline-handles.tsx'
import { useRoofForm } from './roof-form-context.ts'
import type { RoofReading } from './use-framed-roof.ts'
import { useOutlineActions } from './use-outline-actions.ts'

const StillPlan = memo(RoofPlan)

const views = [
  { value: 'timbers', label: 'Timbers' },
  { value: 'outline', label: 'Outline' },
] as const
type View = (typeof views)[number]['value']

const grids = [100, 10, 1] as const

type Props = {
  /** As it is typed, and as it shows while typing goes on. */
  now: RoofReading
  steady: RoofReading
  units: LengthUnits
  selected: string | null
  onPick: (mark: string) => void
}

const maxHeightPx = 560

/** The plan of what is typed: its timbers to pick, or its outline to change. */
export function EditorPlan({ now, steady, units, selected, onPick }: Props) {
  const { form } = useRoofForm()
  const [chosen, setChosen] = useState<View | null>(null)
  const [gridMm, setGridMm] = useState<number>(grids[0])
  const outlined = outlineOf(now.reading)
  // What is wrong with an outline is put right on the outline, so that is what shows.
  const wanted = chosen ?? (steady.reading.roof ? 'timbers' : 'outline')
  const view = outlined.isWhole ? wanted : 'timbers'
  const { reading, framed } = view === 'outline' ? now : steady
  const faults = useFaults(reading)
  return (
    <div className="space-y-2">
      {outlined.isWhole ? (
        <div className="flex flex-wrap items-end justify-between gap-2">
          <Segmented
            label="What the plan shows"
            options={views}
            value={view}
            onChange={setChosen}
          />
          {view === 'outline' ? <GridField gridMm={gridMm} onChange={setGridMm} /> : null}
        </div>
      ) : null}
      {!outlined.isWhole && isWingShape(form.shape) ? (
        <p className="p-4 text-ink-soft">The plan is drawn here once its measures are typed.</p>
      ) : view === 'outline' ? (
        <OutlineEditor
          key={form.shape}
          roof={outlined.roof}
          spec={framed && framed.roof === reading.roof ? framed.spec : null}
          {...{ faults, units, gridMm }}
        />
      ) : (
        <TimberPlan {...{ reading, framed, units, selected, onPick }} />
      )}
      <FaultList faults={faults} />
      <StillToType reading={reading} />
      {reading.roof && framed?.message ? <Note kind="stop" title={framed.message} /> : null}
    </div>
  )
}

type TimberProps = RoofReading & Pick<Props, 'units' | 'selected' | 'onPick'>

function TimberPlan({ reading, framed, units, selected, onPick }: TimberProps) {
  const spec = reading.roof ? (framed?.spec ?? null) : null
  return (
    <StillPlan
      roof={spec && framed ? framed.roof : (reading.roof ?? reading.drawn)}
      spec={spec}
      layOut={spec ? framed?.layOut : undefined}
      mode="edit"
      units={units}
      problems={reading.roof ? undefined : reading.drawnProblems}
      selected={selected}
      label="Plan of the roof as typed"
      maxHeightPx={maxHeightPx}
      onPick={onPick}
    />
  )
}

/** The outline as typed, and whether all of it can be read. */
function outlineOf(reading: FormReading): { roof: Roof; isWhole: boolean } {
  const roof = reading.roof ?? reading.drawn
  return { roof, isWhole: roof.outline.length > 1 && roof.outline.every((p) => isKnown(p)) }
}

const isKnown = ({ x, y }: { x: number; y: number }) => Number.isFinite(x + y)

function useFaults(reading: FormReading) {
  const { form } = useRoofForm()
  return useMemo(() => {
    if (reading.roof) return []
    const problems = reading.problems.filter(({ isMissing }) => !isMissing)
    return outlineFaults(reading.drawn.outline, platesOfForm(form), {
      problems,
      drawn: reading.drawnProblems,
    })
  }, [reading, form])
}

function GridField({ gridMm, onChange }: { gridMm: number; onChange: (mm: number) => void }) {
  return (
    <Field label="Snap to" className="flex items-center gap-2 whitespace-nowrap [&>label]:mb-0">
      <Select value={gridMm} onChange={(event) => onChange(Number(event.target.value))}>
        {grids.map((mm) => (
          <option key={mm} value={mm}>
            {mm} mm
          </option>
        ))}
      </Select>
    </Field>
  )
}

type EditorProps = Pick<Parameters<typeof OutlineDrawing>[0], 'roof' | 'spec' | 'faults' | 'units'>

/** The drawing with the panel of whatever is picked on it. */
function OutlineEditor({ roof, spec, faults, units, gridMm }: EditorProps & { gridMm: number }) {
  const actions = useOutlineActions()
  const [picked, setPicked] = useState<{ part: OutlinePart; handle: Element | null } | null>(null)
  const close = () => setPicked(null)
  const pick = useCallback(
    (next: OutlinePart, handle: Element | null) => setPicked({ part: next, handle }),
    [],
  )
  const part = picked?.part ?? null
  return (
    <>
      <OutlineDrawing
        {...{ roof, spec, faults, units, gridMm, maxHeightPx, actions }}
        picked={part}
        onPick={pick}
      />
      {part?.kind === 'edge' ? (
        <EdgePanel
          key={part.index}
          edge={part.index}
          anchor={picked?.handle ?? null}
          units={units}
          onAddCorner={() => {
            close()
            actions.addOn(part.index)
          }}
          onClose={close}
        />
      ) : null}
      {part?.kind === 'corner' ? (
        <CornerPanel
          key={part.index}
          corner={part.index}
          anchor={picked?.handle ?? null}
          onTakeOut={() => {
            close()
            actions.takeOut(part.index)
          }}
          onClose={close}
        />
      ) : null}
      {part ? <SheetRoom /> : null}
    </>
  )
}

/** On a phone the panel is a sheet over the foot of the page: what it is about can be scrolled clear of it. */
function SheetRoom() {
  return <div aria-hidden className="h-[45dvh] sm:hidden" />
}

function StillToType({ reading }: { reading: FormReading }) {
  if (reading.problems === null) return null
  const missing = reading.problems.filter((problem) => problem.isMissing)
  const plain = /^Type the ([^:]*)\.$/
  const names = missing.flatMap(({ message }) => plain.exec(message)?.[1] ?? [])
  const sentences = missing.filter(({ message }) => !plain.test(message))
  return (
    <>
      {sentences.map(({ path, message }) => (
        <p key={path} className="font-semibold">
          {message}
        </p>
      ))}
      {names.length > 0 ? (
        <p className="text-ink-soft">Still to type: {names.join(', ')}.</p>
      ) : null}
    </>
  )
}
