import { Check, ChevronDown, Hand } from 'lucide-react'
import { isDone } from '../../../shared/day-sheets/day-pieces.ts'
import type { DayRoof, DaySheet } from '../../../shared/day-sheets/day-sheet-schemas.ts'
import type { DayTask } from '../../../shared/day-sheets/task-schemas.ts'
import {
  type MarkingCard,
  markingCardLines,
  markingCardOf,
} from '../../../shared/marking/marking-card.ts'
import { shareWords } from '../../../shared/marking/role-words.ts'
import { PlaningNote } from '../../drawings/marking-card-view.tsx'
import { CutLengthLine, CutNumbers, MarkingNumbers } from '../../drawings/marking-numbers.tsx'
import { useMay } from '../../lib/session.ts'
import { useTicks } from '../../lib/use-ticks.ts'
import { Badge } from '../../ui/badge.tsx'
import { CountStepper } from '../../ui/count-stepper.tsx'
import { taskPlaceId } from './jump-keys.tsx'
import { TaskControls } from './task-controls.tsx'

type Props = {
  task: DayTask
  roof: DayRoof | null
  roster: DaySheet['roster']
  /** Where it stands in the day's order while that is being changed; else null. */
  place: { index: number; count: number } | null
  /** The numbers of this line stand further up on the page. */
  numbersAbove: boolean
  /** Asks once before a tick on a day that is not today. */
  askFirst: (tick: () => void) => void
}

type NumbersProps = { task: DayTask; card: MarkingCard; numbersAbove: boolean }

/** Of more pieces than these the marks are put away. */
const mostMarks = 8
const workWords = { 'set-out': 'Set out', cut: 'Cut', stand: 'Stand' } as const

function cardOf(task: DayTask, roof: DayRoof | null): MarkingCard | null {
  const mark = task.cutLineMark
  if (!roof || mark === null) return null
  const hasLine = roof.spec.cutLines.some((line) => line.mark === mark)
  return hasLine ? markingCardOf(roof.spec, mark, roof.marking, task.memberMarks) : null
}

function TaskTitle({ task, card }: { task: DayTask; card: MarkingCard | null }) {
  if (!card) return <>{task.title}</>
  return (
    <>
      {workWords[task.work]} <span className="text-clay">{card.mark}</span> {card.name}
    </>
  )
}

function TaskHead({ task, card }: { task: DayTask; card: MarkingCard | null }) {
  return (
    <div className="flex flex-wrap items-start justify-between gap-x-4 gap-y-1">
      <h4 className="min-w-0 text-xl font-extrabold leading-tight print:text-base">
        <TaskTitle task={task} card={card} />
      </h4>
      <div className="flex flex-wrap gap-1">
        {task.handRaisedAt ? (
          <Badge kind="stop">
            <Hand size={16} aria-hidden /> Hand up
          </Badge>
        ) : null}
        {isDone(task) ? <Badge kind="leaf">Done</Badge> : null}
      </div>
    </div>
  )
}

/** One line of the day: what, how many, its numbers, who, and how far; one row once it is done. */
export function TaskCard(props: Props) {
  const { task, roof } = props
  const card = cardOf(task, roof)
  const border = isDone(task) ? 'border-leaf' : 'border-rule border-l-clay'
  return (
    <article
      id={taskPlaceId(task)}
      tabIndex={-1}
      className={`scroll-mt-2 rounded-md border border-l-8 bg-sheet break-inside-avoid print:border-l print:p-2 print:text-xs ${border} ${isDone(task) ? 'px-3' : 'p-3 sm:p-4'}`}
    >
      {isDone(task) && !task.handRaisedAt ? (
        <DoneRow {...props} card={card} />
      ) : (
        <OpenTask {...props} card={card} />
      )}
    </article>
  )
}

type CardProps = Props & { card: MarkingCard | null }

/** What is done takes no room; a tap still opens its numbers and its count. */
function DoneRow(props: CardProps) {
  const { task, card } = props
  return (
    <details className="group">
      <summary className="flex min-h-14 list-none items-center gap-2 print:min-h-0 [&::-webkit-details-marker]:hidden">
        <Check size={24} aria-hidden className="shrink-0 text-leaf" />
        <h4 className="min-w-0 flex-1 font-semibold leading-tight">
          <TaskTitle task={task} card={card} />
        </h4>
        <span className="shrink-0 text-base">
          {task.quantity === 1 ? 'Done' : `${task.doneCount} of ${task.quantity}`}
        </span>
        <ChevronDown
          size={22}
          aria-hidden
          className="shrink-0 group-open:rotate-180 print:hidden"
        />
      </summary>
      <div className="pb-3">
        <OpenTask {...props} showsTitle={false} />
      </div>
    </details>
  )
}

function OpenTask({ showsTitle = true, ...props }: CardProps & { showsTitle?: boolean }) {
  const { task, roof, roster, place, card } = props
  const mayOrder = useMay('day-sheet:write')
  const share = roof ? shareWords(roof.spec.members, task.memberMarks) : ''
  return (
    <>
      {showsTitle ? <TaskHead task={task} card={card} /> : null}
      {card ? (
        <p className="text-base print:text-xs">
          {card.section} · <span className="font-semibold">{share}</span>
          {task.memberMarks.length <= mostMarks ? ` · ${task.memberMarks.join(', ')}` : null}
        </p>
      ) : null}
      {card ? <TaskNumbers task={task} card={card} numbersAbove={props.numbersAbove} /> : null}
      <div className="mt-3 space-y-3 print:mt-1 print:space-y-0">
        {mayOrder ? (
          <>
            <TaskTicks task={task} askFirst={props.askFirst} />
            <TaskControls task={task} roster={roster} place={place} hasCard={card !== null} />
          </>
        ) : (
          <TaskState task={task} />
        )}
      </div>
    </>
  )
}

/** To cut: what the saw waits for, the rest a tap away. To stand: the length it is known by. */
function TaskNumbers({ task, card, numbersAbove }: NumbersProps) {
  const isFull = task.work === 'cut' && !numbersAbove && !isDone(task)
  return (
    <div className="mt-2 space-y-2 print:mt-1 print:space-y-1">
      {isFull ? (
        <div className="space-y-2 print:hidden">
          <CutNumbers card={card} />
          <PlaningNote card={card} />
        </div>
      ) : null}
      {isFull ? <PaperLines card={card} /> : null}
      <details className="group">
        <summary
          className={`flex min-h-14 list-none items-center gap-2 [&::-webkit-details-marker]:hidden ${isFull ? 'print:hidden' : 'print:min-h-0'}`}
        >
          {isFull ? null : <CutLengthLine card={card} />}
          <span className="flex items-center gap-1 whitespace-nowrap font-semibold text-chalk print:hidden">
            All numbers
            <ChevronDown size={22} aria-hidden className="shrink-0 group-open:rotate-180" />
          </span>
        </summary>
        <p className="text-base">{task.memberMarks.join(', ')}</p>
        <p className="text-base">{card.handWords}</p>
        {isFull ? null : <PlaningNote card={card} />}
        <MarkingNumbers card={card} />
      </details>
    </div>
  )
}

/** On paper a card is its lines, so that a day is not a ream. */
function PaperLines({ card }: { card: MarkingCard }) {
  const [first, ...lines] = markingCardLines(card).slice(1)
  return (
    <div className="hidden print:block">
      <p className="text-sm font-extrabold">{first}</p>
      {lines.map((line) => (
        <p key={line}>{line}</p>
      ))}
    </div>
  )
}

function TaskTicks({ task, askFirst }: Pick<Props, 'task' | 'askFirst'>) {
  const { count, unsent, step } = useTicks(task)
  return (
    <>
      <div className="print:hidden">
        <CountStepper
          label={task.title}
          count={count}
          total={task.quantity}
          unsent={unsent}
          onStep={(delta) => askFirst(() => step(delta))}
        />
      </div>
      <p className="hidden print:block">
        {count} of {task.quantity} done. {task.assignedTo?.name ?? ''}
      </p>
    </>
  )
}

/** For who only looks on. */
function TaskState({ task }: { task: DayTask }) {
  return (
    <p>
      <span className="numeral text-[1.75rem]">{task.doneCount}</span> of {task.quantity} done
      {task.assignedTo ? `, ${task.assignedTo.name}` : ', nobody yet'}
    </p>
  )
}
