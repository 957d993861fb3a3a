import { ArrowDown, ArrowUp, Hand } from 'lucide-react'
import type { DaySheet } from '../../../shared/day-sheets/day-sheet-schemas.ts'
import type { DayTask } from '../../../shared/day-sheets/task-schemas.ts'
import { Button } from '../../ui/button.tsx'
import { Field } from '../../ui/field.tsx'
import { Select } from '../../ui/inputs.tsx'
import { useTaskChange } from './use-task-change.ts'

type Props = {
  task: DayTask
  roster: DaySheet['roster']
  place: { index: number; count: number } | null
}

type AssignProps = Pick<Props, 'task' | 'roster'> & {
  change: ReturnType<typeof useTaskChange>['change']
}

function AssignSelect({ task, roster, change }: AssignProps) {
  const there = roster.filter((person) => !person.onLeave)
  const assigned = task.assignedTo
  const isGone = assigned !== null && !there.some((person) => person.id === assigned.id)
  return (
    <Field label="Who does it">
      <Select
        className="min-h-14"
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
    </Field>
  )
}

/** Hand out, try the first piece, put in order, answer a raised hand. */
export function TaskControls({ task, roster, place }: Props) {
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
      <AssignSelect task={task} roster={roster} change={change} />
      <div className="flex flex-wrap items-center gap-2">
        {task.work === 'cut' ? (
          <label className="flex min-h-14 flex-1 items-center gap-3 rounded-md border border-ink-soft px-3 font-semibold">
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
        ) : null}
        {place ? (
          <>
            <Button
              kind="plain"
              size="site"
              aria-label={`${task.title}: earlier in the day`}
              disabled={place.index === 0}
              busy={change.isPending}
              onClick={() => change.mutate({ position: place.index - 1 })}
            >
              <ArrowUp size={22} aria-hidden />
            </Button>
            <Button
              kind="plain"
              size="site"
              aria-label={`${task.title}: later in the day`}
              disabled={place.index === place.count - 1}
              busy={change.isPending}
              onClick={() => change.mutate({ position: place.index + 1 })}
            >
              <ArrowDown size={22} aria-hidden />
            </Button>
          </>
        ) : null}
      </div>
    </div>
  )
}
