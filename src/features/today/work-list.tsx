import { ArrowDownUp } from 'lucide-react'
import { useState } from 'react'
import type { DayRoof, DaySheet } from '../../../shared/day-sheets/day-sheet-schemas.ts'
import type { DayTask } from '../../../shared/day-sheets/task-schemas.ts'
import { formatDay } from '../../../shared/calendar/days.ts'
import { cutOneFirst } from '../../../shared/marking/marking-card.ts'
import { roundingWords } from '../../../shared/marking/rounding-words.ts'
import { useMay } from '../../lib/session.ts'
import { useDayAsk } from '../../lib/use-day-ask.tsx'
import { Button } from '../../ui/button.tsx'
import { TaskCard } from './task-card.tsx'

type Props = { sheet: DaySheet; roof: DayRoof | null; today: string }

type Run = { title: string; tasks: { task: DayTask; index: number }[] }

/** Neighbouring tasks of one package, in the day's order. */
function packageRuns(tasks: readonly DayTask[]): Run[] {
  const runs: Run[] = []
  tasks.forEach((task, index) => {
    const last = runs.at(-1)
    if (last?.title === task.packageTitle) last.tasks.push({ task, index })
    else runs.push({ title: task.packageTitle, tasks: [{ task, index }] })
  })
  return runs
}

/** Tasks whose line has already been shown with its numbers. */
function repeatedLines(tasks: readonly DayTask[]): Set<string> {
  const seen = new Set<string>()
  const repeated = new Set<string>()
  for (const { id, cutLineMark } of tasks) {
    if (cutLineMark === null) continue
    if (seen.has(cutLineMark)) repeated.add(id)
    seen.add(cutLineMark)
  }
  return repeated
}

/** Everything to cut and stand, in order, left over first. */
export function WorkList({ sheet, roof, today }: Props) {
  const { askFirst, question } = useDayAsk(sheet.day, today)
  const { tasks, leftOver, roster } = sheet
  const mayOrder = useMay('day-sheet:write')
  const [isOrdering, setOrdering] = useState(false)
  const repeated = repeatedLines([...leftOver, ...tasks])
  const show = (task: DayTask, place: { index: number; count: number } | null) => (
    <TaskCard
      key={task.id}
      task={task}
      roof={roof}
      roster={roster}
      place={isOrdering ? place : null}
      numbersAbove={repeated.has(task.id)}
      askFirst={askFirst}
    />
  )
  return (
    <section
      aria-label="Work of the day"
      className="space-y-5 print:columns-2 print:gap-4 print:space-y-3"
    >
      <div>
        <p className="text-xl font-extrabold">{cutOneFirst}</p>
        {roof ? (
          <p className="text-base print:text-xs">{roundingWords(roof.spec, roof.marking)}</p>
        ) : null}
      </div>
      {question}
      {leftOver.length > 0 ? (
        <div className="space-y-3 print:space-y-2">
          <h3 className="text-lg font-extrabold break-after-avoid">
            Left over from {[...new Set(leftOver.map((task) => formatDay(task.day)))].join(', ')}
          </h3>
          {leftOver.map((task) => show(task, null))}
        </div>
      ) : null}
      {packageRuns(tasks).map((run) => (
        <div key={`${run.title} ${run.tasks[0]?.index}`} className="space-y-3 print:space-y-2">
          <h3 className="text-lg font-extrabold break-after-avoid">{run.title}</h3>
          {run.tasks.map(({ task, index }) => show(task, { index, count: tasks.length }))}
        </div>
      ))}
      {mayOrder && tasks.length > 1 ? (
        <Button
          kind="plain"
          size="site"
          className="w-full print:hidden"
          aria-pressed={isOrdering}
          onClick={() => setOrdering(!isOrdering)}
        >
          <ArrowDownUp size={22} aria-hidden />
          {isOrdering ? 'The order is right' : 'Change the order'}
        </Button>
      ) : null}
      {tasks.length === 0 && leftOver.length === 0 ? (
        <p>
          {sheet.revision
            ? 'No work is planned for this day.'
            : 'The roof of this job is not issued yet, so there is nothing to cut from. Ask the office.'}
        </p>
      ) : null}
    </section>
  )
}
