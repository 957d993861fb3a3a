import { Check, Pencil } from 'lucide-react'
import { type MilestoneState, milestoneStates } from '../../../shared/milestones/milestone-kinds.ts'
import {
  isMilestoneKept,
  milestoneNames,
  milestoneStateNames,
} from '../../../shared/milestones/milestone-rules.ts'
import type {
  Milestone,
  MilestoneConflict,
  SetMilestone,
} from '../../../shared/milestones/milestone-schemas.ts'
import { useMay, useSession } from '../../lib/session.ts'
import { Badge } from '../../ui/badge.tsx'
import { Button } from '../../ui/button.tsx'
import { Segmented } from '../../ui/segmented.tsx'
import { Note } from '../../ui/states.tsx'
import { dayText, unbroken } from './day-words.ts'
import { MilestoneForm } from './milestone-form.tsx'
import { useMilestone } from './use-set-milestone.ts'

const stateOptions: { value: MilestoneState | ''; label: string }[] = milestoneStates.map(
  (value) => ({ value, label: milestoneStateNames[value] }),
)

type Shown = Partial<Pick<Milestone, 'day' | 'state' | 'broughtBy' | 'note'>>

/** 'Thu 4 Dec, Creek Timber', or what is still to be said. */
function wordsOf({ day, broughtBy, note }: Shown, today: string): string {
  const parts = [day ? unbroken(dayText(day, today)) : 'No day yet', broughtBy, note]
  return parts.filter(Boolean).join(', ')
}

function StateBadge({ state }: { state: Milestone['state'] }) {
  const kind = state === 'done' ? 'leaf' : state === 'promised' ? 'chalk' : 'plain'
  return (
    <Badge kind={kind}>
      {state === 'done' ? <Check size={14} aria-hidden /> : null}
      {milestoneStateNames[state]}
    </Badge>
  )
}

/** Both versions, and a way on with either. */
function ChangedMeanwhile(props: {
  conflict: MilestoneConflict
  busy: boolean
  onMine: () => void
  onTheirs: () => void
}) {
  const { conflict, busy, onMine, onTheirs } = props
  const { today } = useSession().firm
  const sent: SetMilestone = conflict.sent
  const mine: Shown = { ...conflict.current, ...definedOf(sent) }
  const line = (shown: Shown) =>
    `${milestoneStateNames[shown.state ?? 'guessed']}: ${wordsOf(shown, today)}`
  return (
    <div role="alert" className="mt-2">
      <Note kind="caution" title="Somebody else changed this">
        <dl className="mt-1 grid gap-x-4 sm:grid-cols-[auto_1fr]">
          <dt className="font-semibold">There now</dt>
          <dd>{line(conflict.current)}</dd>
          <dt className="font-semibold">Yours</dt>
          <dd>{line(mine)}</dd>
        </dl>
        <div className="mt-2 flex flex-wrap gap-2">
          <Button kind="plain" onClick={onTheirs}>
            Keep what is there
          </Button>
          <Button kind="plain" busy={busy} onClick={onMine}>
            Save mine
          </Button>
        </div>
      </Note>
    </div>
  )
}

function definedOf({ day, state, broughtBy, note }: SetMilestone): Shown {
  return {
    ...(day === undefined ? {} : { day }),
    ...(state === undefined ? {} : { state }),
    ...(broughtBy === undefined ? {} : { broughtBy }),
    ...(note === undefined ? {} : { note }),
  }
}

function EditableRow({ jobId, milestone }: { jobId: string; milestone: Milestone }) {
  const { today } = useSession().firm
  const edit = useMilestone(jobId, milestone)
  const name = milestoneNames[milestone.kind]
  const isKept = isMilestoneKept(milestone)
  const { conflict } = edit
  const press = (state: MilestoneState | '') => {
    if (state === '') return
    // A guess is of a day, and a promise mostly: without one the form asks for it.
    if (milestone.day === null && state !== 'done' && !edit.base) edit.open()
    if (isKept || state !== 'guessed') edit.press(state)
  }
  return (
    <li className="py-2">
      <div className="flex flex-wrap items-center gap-x-3 gap-y-1">
        <div className="min-w-44 flex-1">
          <h3 className="font-semibold">{name}</h3>
          <p className="text-ink-soft [overflow-wrap:anywhere]">
            {isKept ? wordsOf(milestone, today) : 'Nothing said yet'}
          </p>
        </div>
        <Button
          kind="quiet"
          className="w-11 px-0! sm:order-last"
          aria-expanded={edit.base !== null}
          aria-label={`${name}: day and who brings it`}
          title="Day and who brings it"
          onClick={edit.base ? edit.shut : edit.open}
        >
          <Pencil size={18} aria-hidden />
        </Button>
        <Segmented
          dense
          label={name}
          options={stateOptions}
          value={isKept ? milestone.state : ''}
          onChange={press}
        />
      </div>
      {conflict ? (
        <ChangedMeanwhile
          conflict={conflict}
          busy={edit.busy}
          onMine={() => edit.sendOver(conflict)}
          onTheirs={edit.takeTheirs}
        />
      ) : null}
      {edit.base ? (
        <MilestoneForm
          milestone={edit.base}
          error={edit.error}
          busy={edit.busy}
          onSave={edit.save}
          onCancel={edit.shut}
        />
      ) : null}
    </li>
  )
}

/** One thing the job waits for: its day, who brings it, and how sure that is. */
export function MilestoneRow({ jobId, milestone }: { jobId: string; milestone: Milestone }) {
  const { today } = useSession().firm
  const mayWrite = useMay('milestone:write')
  if (mayWrite) return <EditableRow jobId={jobId} milestone={milestone} />
  return (
    <li className="flex items-center justify-between gap-x-3 py-2">
      <div className="min-w-0 flex-1">
        <h3 className="font-semibold">{milestoneNames[milestone.kind]}</h3>
        <p className="[overflow-wrap:anywhere]">{wordsOf(milestone, today)}</p>
      </div>
      <StateBadge state={milestone.state} />
    </li>
  )
}
