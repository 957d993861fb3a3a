import type { Caution } from '../roof/roof-types.ts'
import type { DayTask } from './task-schemas.ts'

type Share = Pick<DayTask, 'work' | 'memberMarks' | 'quantity' | 'doneCount'>

export function isDone(task: Pick<DayTask, 'quantity' | 'doneCount'>): boolean {
  return task.doneCount >= task.quantity
}

/** Ticks count pieces, they do not name them: a line is taken in its own order. */
export function doneMembers(task: Share): string[] {
  return task.memberMarks.slice(0, Math.max(0, task.doneCount))
}

/**
 * For the plan of a day: what is done (stood on any day so far, or cut where the day asks no more of it) and
 * what is due.
 */
export function planMarks(
  today: readonly Share[],
  onAnyDay: readonly Share[],
): { due: string[]; done: string[] } {
  const stood = new Set(onAnyDay.filter((t) => t.work === 'stand').flatMap(doneMembers))
  const toStand = new Set(today.filter((t) => t.work === 'stand').flatMap((t) => t.memberMarks))
  const cutOnly = today
    .filter((t) => t.work === 'cut')
    .flatMap(doneMembers)
    .filter((mark) => !toStand.has(mark))
  const done = new Set([...stood, ...cutOnly])
  const due = new Set(today.flatMap((t) => t.memberMarks).filter((mark) => !done.has(mark)))
  return { due: [...due], done: [...done] }
}

/** Unfinished tasks of earlier days, less those whose pieces have since been planned again. */
export function leftOverOf<Task extends Share>(
  earlier: readonly Task[],
  fromTodayOn: readonly Share[],
): Task[] {
  const key = (work: string, mark: string) => `${work} ${mark}`
  const planned = new Set(fromTodayOn.flatMap((t) => t.memberMarks.map((m) => key(t.work, m))))
  return earlier.filter((task) => {
    if (isDone(task)) return false
    const open = task.memberMarks.slice(Math.max(0, task.doneCount))
    return open.length === 0 || open.some((mark) => !planned.has(key(task.work, mark)))
  })
}

/** Cautions that concern what is handled that day; one without members concerns the whole roof. */
export function cautionsOf(cautions: readonly Caution[], tasks: readonly Share[]): Caution[] {
  const today = new Set(tasks.flatMap((task) => task.memberMarks))
  return cautions.filter(
    ({ members }) => members.length === 0 || members.some((mark) => today.has(mark)),
  )
}
