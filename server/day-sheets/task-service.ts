import { and, asc, eq, sql } from 'drizzle-orm'
import type { ChangeTask, DayTask, NewTick } from '../../shared/day-sheets/task-schemas.ts'
import type { Db, DbOrTx } from '../db/client.ts'
import { tasks, ticks } from '../db/tables/booking-tables.ts'
import { AppError, invalidField, notFound, staleVersion } from '../http/app-error.ts'
import { writeAudit } from '../lib/audit.ts'
import { rosterOf } from '../people/roster.ts'
import { asDayTask, findTask, type FoundTask, readTask, type Viewer } from './task-store.ts'

function checkAssignee(db: DbOrTx, row: FoundTask, personId: string | null | undefined): void {
  if (!personId) return
  const person = rosterOf(db, row.booking.crewId, row.day).find((one) => one.id === personId)
  if (!person) throw invalidField('assignedToId', 'Pick somebody who is with the crew that day.')
  if (person.onLeave)
    throw invalidField('assignedToId', `${person.name} is on leave that day. Pick somebody else.`)
}

/** Puts a task at a place of its day's order; the others keep theirs among themselves. */
function moveTo(db: DbOrTx, row: FoundTask, position: number): void {
  const others = db
    .select({ id: tasks.id })
    .from(tasks)
    .where(and(eq(tasks.bookingDayId, row.task.bookingDayId), sql`${tasks.id} <> ${row.task.id}`))
    .orderBy(asc(tasks.position), asc(tasks.id))
    .all()
    .map((one) => one.id)
  const order = [...others.slice(0, position), row.task.id, ...others.slice(position)]
  order.forEach((id, i) => {
    db.update(tasks).set({ position: i }).where(eq(tasks.id, id)).run()
  })
}

/** Hands a task out, moves it in the day's order, or records that the first piece was tried. */
export function changeTask(db: Db, viewer: Viewer, taskId: string, change: ChangeTask): DayTask {
  const { user, now } = viewer
  return db.transaction((tx) => {
    const row = findTask(tx, viewer, 'day-sheet:write', taskId)
    if (!row) throw notFound('That task')
    if (row.task.version !== change.version) throw staleVersion(asDayTask(row))
    checkAssignee(tx, row, change.assignedToId)
    tx.update(tasks)
      .set({
        version: row.task.version + 1,
        ...(change.assignedToId === undefined ? {} : { assignedToId: change.assignedToId }),
        ...(change.firstPieceTried === undefined
          ? {}
          : {
              firstPieceAt: change.firstPieceTried ? now : null,
              firstPieceById: change.firstPieceTried ? user.id : null,
            }),
      })
      .where(eq(tasks.id, taskId))
      .run()
    if (change.position !== undefined) moveTo(tx, row, change.position)
    writeAudit(tx, {
      at: now,
      personId: user.id,
      action: 'task.change',
      entity: 'task',
      entityId: taskId,
      detail: { ...change },
    })
    return readTask(tx, taskId)
  })
}

/** The same tick sent again changes nothing; the id is the device's. */
function isSentAgain(db: DbOrTx, viewer: Viewer, taskId: string, tick: NewTick): boolean {
  const known = db.select().from(ticks).where(eq(ticks.id, tick.id)).get()
  if (!known) return false
  const isSame =
    known.taskId === taskId && known.personId === viewer.user.id && known.delta === tick.delta
  if (!isSame) throw new AppError('conflict', 'That tick was already used for something else.')
  return true
}

function checkCount(task: DayTask, delta: number): void {
  const next = task.doneCount + delta
  if (next < 0)
    throw new AppError('conflict', 'None of these is ticked, so none can be taken back.', {
      detail: { current: task },
    })
  if (next > task.quantity)
    throw new AppError('conflict', `All ${task.quantity} of these are ticked already.`, {
      detail: { current: task },
    })
}

/** One piece done, or one taken back. */
export function addTick(db: Db, viewer: Viewer, taskId: string, tick: NewTick): DayTask {
  const { user, now } = viewer
  return db.transaction(
    (tx) => {
      const row = findTask(tx, viewer, 'task:tick', taskId)
      if (!row) throw notFound('That task')
      if (isSentAgain(tx, viewer, taskId, tick)) return asDayTask(row)
      checkCount(asDayTask(row), tick.delta)
      tx.insert(ticks)
        .values({ id: tick.id, taskId, personId: user.id, delta: tick.delta, at: now })
        .run()
      writeAudit(tx, {
        at: now,
        personId: user.id,
        action: 'task.tick',
        entity: 'task',
        entityId: taskId,
        detail: { delta: tick.delta },
      })
      return readTask(tx, taskId)
    },
    { behavior: 'immediate' },
  )
}

/** Somebody is stuck and wants the leading hand, or no longer. */
export function raiseHand(db: Db, viewer: Viewer, taskId: string, raised: boolean): DayTask {
  const { user, now } = viewer
  return db.transaction((tx) => {
    const row = findTask(tx, viewer, 'task:tick', taskId)
    if (!row) throw notFound('That task')
    if ((row.task.handRaisedAt !== null) === raised) return asDayTask(row)
    tx.update(tasks)
      .set({ handRaisedAt: raised ? now : null })
      .where(eq(tasks.id, taskId))
      .run()
    writeAudit(tx, {
      at: now,
      personId: user.id,
      action: raised ? 'task.raise-hand' : 'task.lower-hand',
      entity: 'task',
      entityId: taskId,
    })
    return readTask(tx, taskId)
  })
}
