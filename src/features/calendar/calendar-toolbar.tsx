import { ChevronLeft, ChevronRight, Maximize, Minimize, Redo2, Undo2 } from 'lucide-react'
import { Button } from '../../ui/button.tsx'
import { Select } from '../../ui/inputs.tsx'
import { Segmented } from '../../ui/segmented.tsx'
import { useBookingMoves } from './booking-moves-context.ts'
import {
  type CalendarView,
  stepOf,
  titleOf,
  type useCalendarAddress,
  weekCounts,
} from './calendar-address.ts'

const views: readonly { value: CalendarView; label: string }[] = [
  { value: 'month', label: 'Month' },
  { value: 'week', label: 'Week' },
  { value: 'crews', label: 'Crew weeks' },
]

type Address = ReturnType<typeof useCalendarAddress>

const squareClass = 'w-11 px-0!'

function UndoButtons() {
  const { undo, redo, undoWords, redoWords, isPending } = useBookingMoves()
  return (
    <>
      <Button
        kind="plain"
        className={squareClass}
        aria-label={undoWords ? `Undo: ${undoWords}` : 'Undo'}
        title={undoWords ? `Undo: ${undoWords}` : 'Nothing to undo'}
        disabled={!undoWords || isPending}
        onClick={() => undo()}
      >
        <Undo2 size={20} aria-hidden />
      </Button>
      <Button
        kind="plain"
        className={squareClass}
        aria-label={redoWords ? `Redo: ${redoWords}` : 'Redo'}
        title={redoWords ? `Redo: ${redoWords}` : 'Nothing to redo'}
        disabled={!redoWords || isPending}
        onClick={() => redo()}
      >
        <Redo2 size={20} aria-hidden />
      </Button>
    </>
  )
}

function WeekCount({ address }: { address: Address }) {
  return (
    <label className="inline-flex items-center gap-2">
      <span className="sr-only">Weeks shown</span>
      <Select
        value={String(address.weeks)}
        onChange={(e) => address.go({ weeks: Number(e.target.value) })}
      >
        {weekCounts.map((count) => (
          <option key={count} value={count}>
            {count} weeks
          </option>
        ))}
      </Select>
    </label>
  )
}

type Props = {
  address: Address
  mayEdit: boolean
  isNarrow: boolean
  onWall: (on: boolean) => void
}

/** What is shown, from when, and what can be taken back. */
export function CalendarToolbar({ address, mayEdit, isNarrow, onWall }: Props) {
  const { view, on, weeks, isWall, today, go } = address
  const step = (direction: -1 | 1) => go({ on: stepOf(view, on, direction) })
  const unit = view === 'month' ? 'month' : 'week'
  return (
    <div className="mb-3 flex flex-wrap items-center gap-2">
      <Button
        kind="plain"
        className={squareClass}
        aria-label={`The ${unit} before`}
        onClick={() => step(-1)}
      >
        <ChevronLeft size={20} aria-hidden />
      </Button>
      <Button kind="plain" onClick={() => go({ on: today })}>
        Today
      </Button>
      <Button
        kind="plain"
        className={squareClass}
        aria-label={`The ${unit} after`}
        onClick={() => step(1)}
      >
        <ChevronRight size={20} aria-hidden />
      </Button>
      {isWall ? null : (
        <Segmented
          label="Show"
          options={views}
          value={view}
          onChange={(next) => go({ view: next })}
        />
      )}
      {view === 'crews' ? <WeekCount address={address} /> : null}
      {mayEdit ? <UndoButtons /> : null}
      {view === 'crews' && !isNarrow ? (
        <Button kind="plain" onClick={() => onWall(!isWall)}>
          {isWall ? <Minimize size={20} aria-hidden /> : <Maximize size={20} aria-hidden />}
          {isWall ? 'Leave full screen' : 'Full screen'}
        </Button>
      ) : null}
      <h2 aria-live="polite" className="w-full text-xl font-extrabold sm:ml-2 sm:w-auto">
        {titleOf(view, on, weeks)}
      </h2>
    </div>
  )
}
