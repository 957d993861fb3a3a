import { ArrowDown, ArrowUp, Hand } from 'lucide-react'
import { Link } from 'react-router-dom'
import type { DaySheet } from '../../../shared/day-sheets/day-sheet-schemas.ts'
import type { DayTask } from '../../../shared/day-sheets/task-schemas.ts'
import { Button, buttonClass } from '../../ui/button.tsx'
import { Select } from '../../ui/inputs.tsx'
import { useTaskChange } from './use-task-change.ts'

type Props = {
  task: DayTask
  roster: DaySheet['roster']
  /** Where it stands, while the order is being changed. */
  place: { index: number; count: number } | null
  hasCard: boolean
}

type AssignProps = Pick<Props, 'task' | 'roster'> & {
  change: ReturnType<typeof useTaskChange>['change']
}

function AssignSelect({ task, roster, change }: AssignProps) {
  const there = roster.filter((person) => !person.onLeave)
  const assigned = task.assignedTo
  const isGone = assigned !== null && !there.some((person) => person.id === assigned.id)
  return (
    <Select
      aria-label="Who does it"
      className="min-h-14 min-w-0 flex-1"
      value={assigned?.id ?? ''}
      disabled={change.isPending}
      onChange={(event) => change.mutate({ assignedToId: event.target.value || null })}
    >
      <option value="">Nobody yet</option>
      {there.map((person) => (
        <option key={person.id} value={person.id}>
          {person.name}
        </option>
      ))}
      {isGone ? <option value={assigned.id}>{assigned.name} (not there)</option> : null}
    </Select>
  )
}

/** Hand out, try the first piece, answer a raised hand; the order is put away. */
export function TaskControls({ task, roster, place, hasCard }: Props) {
  const { change, hand } = useTaskChange(task)
  return (
    <div className="space-y-3 print:hidden">
      {task.handRaisedAt ? (
        <Button
          kind="danger"
          size="site"
          className="w-full"
          busy={hand.isPending}
          onClick={() => hand.mutate(false)}
        >
          <Hand size={22} aria-hidden />
          Seen to, lower the hand
        </Button>
      ) : null}
      {task.work === 'cut' ? <FirstPiece task={task} change={change} /> : null}
      {place ? <OrderKeys task={task} place={place} change={change} /> : null}
      <div className="flex items-center gap-2">
        <AssignSelect task={task} roster={roster} change={change} />
        {hasCard ? (
          <Link to={`/my-tasks/${task.id}`} className={`${buttonClass('plain', 'site')} shrink-0`}>
            Card<span className="sr-only"> with drawing, {task.title}</span>
          </Link>
        ) : null}
      </div>
    </div>
  )
}

function FirstPiece({ task, change }: Pick<AssignProps, 'task' | 'change'>) {
  return (
    <label className="flex min-h-14 items-center gap-3 rounded-md border border-ink-soft px-3 font-semibold">
      <input
        type="checkbox"
        className="h-7 w-7 shrink-0 accent-clay"
        checked={task.firstPiece !== null}
        disabled={change.isPending}
        onChange={(event) => change.mutate({ firstPieceTried: event.target.checked })}
      />
      <span>
        First piece tried
        {task.firstPiece ? (
          <span className="block text-sm font-normal">by {task.firstPiece.by}</span>
        ) : null}
      </span>
    </label>
  )
}

type OrderProps = Pick<AssignProps, 'task' | 'change'> & { place: { index: number; count: number } }

function OrderKeys({ task, place, change }: OrderProps) {
  return (
    <div className="flex gap-2">
      <Button
        kind="plain"
        size="site"
        className="flex-1"
        aria-label={`Earlier in the day: ${task.title}`}
        disabled={place.index === 0}
        busy={change.isPending}
        onClick={() => change.mutate({ position: place.index - 1 })}
      >
        <ArrowUp size={22} aria-hidden />
        Earlier
      </Button>
      <Button
        kind="plain"
        size="site"
        className="flex-1"
        aria-label={`Later in the day: ${task.title}`}
        disabled={place.index === place.count - 1}
        busy={change.isPending}
        onClick={() => change.mutate({ position: place.index + 1 })}
      >
        <ArrowDown size={22} aria-hidden />
        Later
      </Button>
    </div>
  )
}
