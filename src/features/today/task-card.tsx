import { Hand } from 'lucide-react'
import { Link } from 'react-router-dom'
import { isDone } from '../../../shared/day-sheets/day-pieces.ts'
import type { DayRoof, DaySheet } from '../../../shared/day-sheets/day-sheet-schemas.ts'
import type { DayTask } from '../../../shared/day-sheets/task-schemas.ts'
import { type MarkingCard, markingCardOf } from '../../../shared/marking/marking-card.ts'
import { shareWords } from '../../../shared/marking/role-words.ts'
import { PlaningNote } from '../../drawings/marking-card-view.tsx'
import { MainNumbers, MarkingNumbers } from '../../drawings/marking-numbers.tsx'
import { useMay } from '../../lib/session.ts'
import { useTicks } from '../../lib/use-ticks.ts'
import { Badge } from '../../ui/badge.tsx'
import { buttonClass } from '../../ui/button.tsx'
import { CountStepper } from '../../ui/count-stepper.tsx'
import { Fold } from '../../ui/fold.tsx'
import { TaskControls } from './task-controls.tsx'

type Props = {
  task: DayTask
  roof: DayRoof | null
  roster: DaySheet['roster']
  /** Where it stands in the day's order; null for what is left over. */
  place: { index: number; count: number } | null
  /** The numbers of this line stand further up on the page. */
  numbersAbove: boolean
}

type NumbersProps = { task: DayTask; card: MarkingCard; numbersAbove: boolean }

const workWords = { 'set-out': 'Set out', cut: 'Cut', stand: 'Stand' } as const

function cardOf(task: DayTask, roof: DayRoof | null): MarkingCard | null {
  const mark = task.cutLineMark
  if (!roof || mark === null) return null
  const hasLine = roof.spec.cutLines.some((line) => line.mark === mark)
  return hasLine ? markingCardOf(roof.spec, mark, roof.marking) : null
}

function TaskHead({
  task,
  card,
  share,
}: {
  task: DayTask
  card: MarkingCard | null
  share: string
}) {
  return (
    <div className="flex flex-wrap items-start justify-between gap-x-4 gap-y-1">
      <div className="min-w-0">
        <h4 className="text-xl font-extrabold leading-tight print:text-base">
          {card ? (
            <>
              {workWords[task.work]} <span className="text-clay">{card.mark}</span> {card.name}
            </>
          ) : (
            task.title
          )}
        </h4>
        {card ? (
          <p>
            {card.section} · {share}
          </p>
        ) : null}
      </div>
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

/** One line of the day: what, how many, its numbers, who, and how far. */
export function TaskCard({ task, roof, roster, place, numbersAbove }: Props) {
  const mayOrder = useMay('day-sheet:write')
  const card = cardOf(task, roof)
  const share = roof ? shareWords(roof.spec.members, task.memberMarks) : ''
  return (
    <article
      className={`rounded-md border border-l-8 bg-sheet p-3 sm:p-4 break-inside-avoid print:border-l print:p-2 print:text-xs ${isDone(task) ? 'border-leaf' : 'border-rule border-l-clay'}`}
    >
      <TaskHead task={task} card={card} share={share} />
      {card ? (
        <p className="mt-1 text-base print:text-xs">
          {task.memberMarks.join(', ')}. {card.handWords}
        </p>
      ) : null}
      {card ? <TaskNumbers task={task} card={card} numbersAbove={numbersAbove} /> : null}
      <div className="mt-3 space-y-3 border-t border-rule pt-3 print:mt-1 print:pt-1">
        {mayOrder ? (
          <>
            <TaskTicks task={task} />
            <TaskControls task={task} roster={roster} place={place} />
            {card ? (
              <Link
                to={`/my-tasks/${task.id}`}
                className={`${buttonClass('plain', 'site')} w-full sm:w-auto print:hidden`}
              >
                Card with drawing
              </Link>
            ) : null}
          </>
        ) : (
          <TaskState task={task} />
        )}
      </div>
    </article>
  )
}

/** To cut: every number. To stand, when done or said above: the lengths, the rest a tap away. */
function TaskNumbers({ task, card, numbersAbove }: NumbersProps) {
  const isFull = task.work === 'cut' && !numbersAbove && !isDone(task)
  return (
    <div className="mt-3 space-y-3 print:mt-1 print:space-y-1">
      <PlaningNote card={card} />
      {isFull ? (
        <MarkingNumbers card={card} />
      ) : (
        <>
          <MainNumbers card={card} />
          <Fold title="All numbers">
            <MarkingNumbers card={card} />
          </Fold>
        </>
      )}
    </div>
  )
}

function TaskTicks({ task }: { task: DayTask }) {
  const { count, unsent, step } = useTicks(task)
  return (
    <>
      <div className="print:hidden">
        <CountStepper
          label={task.title}
          count={count}
          total={task.quantity}
          unsent={unsent}
          onStep={step}
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
