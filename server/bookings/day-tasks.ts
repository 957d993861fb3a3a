import { eq, inArray } from 'drizzle-orm'
import type { PlannedTask } from '../../shared/day-plan/day-plan.ts'
import type { DbOrTx } from '../db/client.ts'
import { tasks } from '../db/tables/booking-tables.ts'
import { newId } from '../lib/ids.ts'
import type { TaskRow } from './job-plan-store.ts'

type Alike = Pick<TaskRow, 'packageKey' | 'work' | 'cutLineMark'>

/** Two tasks are alike when they are the same work on the same line of the same package. */
const alikeKey = (task: Alike): string =>
  [task.packageKey, task.work, task.cutLineMark ?? ''].join(' ')

/** Who had each kind of task before, by day first and on any day of the job otherwise. */
export function assignmentsOf(rows: readonly TaskRow[]): {
  was(bookingDayId: string, task: Alike): string | null
} {
  const onDay = new Map<string, string>()
  const anywhere = new Map<string, string>()
  for (const row of rows) {
    if (row.assignedToId === null) continue
    onDay.set(`${row.bookingDayId} ${alikeKey(row)}`, row.assignedToId)
    anywhere.set(alikeKey(row), row.assignedToId)
  }
  return {
    was: (bookingDayId, task) =>
      onDay.get(`${bookingDayId} ${alikeKey(task)}`) ?? anywhere.get(alikeKey(task)) ?? null,
  }
}

/**
 * Makes a day hold the planned tasks and nothing else. A row that stays alike keeps its id, its assignment
 * and a raised hand; its first-piece check only while it is the same line of the same revision.
 * The day must not have been started: ticks hang on its rows.
 */
export function writeDayTasks(
  tx: DbOrTx,
  input: {
    bookingDayId: string
    existing: readonly TaskRow[]
    planned: readonly PlannedTask[]
    sameRevision: boolean
    assigneeOf: (task: PlannedTask) => string | null
  },
): void {
  const { bookingDayId, existing, planned, sameRevision, assigneeOf } = input
  const left = new Map(existing.map((row) => [alikeKey(row), row]))
  for (const [position, task] of planned.entries()) {
    const values = {
      position,
      packageKey: task.packageKey,
      work: task.work,
      cutLineMark: task.cutLineMark,
      memberMarks: task.memberMarks,
      title: task.title,
      quantity: task.quantity,
      plannedMinutes: Math.round(task.plannedMinutes),
      assignedToId: assigneeOf(task),
    }
    const row = left.get(alikeKey(task))
    left.delete(alikeKey(task))
    if (!row)
      tx.insert(tasks)
        .values({ id: newId(), bookingDayId, ...values })
        .run()
    else if (!sameRevision || differs(row, values)) {
      const firstPiece = sameRevision ? {} : { firstPieceAt: null, firstPieceById: null }
      tx.update(tasks)
        .set({ ...values, ...firstPiece, version: row.version + 1 })
        .where(eq(tasks.id, row.id))
        .run()
    }
  }
  const gone = [...left.values()].map((row) => row.id)
  if (gone.length > 0) tx.delete(tasks).where(inArray(tasks.id, gone)).run()
}

function differs(row: TaskRow, values: Partial<TaskRow>): boolean {
  return (Object.keys(values) as (keyof TaskRow)[]).some(
    (key) => JSON.stringify(row[key]) !== JSON.stringify(values[key]),
  )
}
