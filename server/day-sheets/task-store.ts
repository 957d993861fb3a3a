import { and, asc, eq, inArray, isNull, type SQL, sql } from 'drizzle-orm'
import { type Permission, permissionScope } from '../../shared/auth/permissions.ts'
import type { DayTask } from '../../shared/day-sheets/task-schemas.ts'
import { packagesInWords } from '../../shared/labour/package-words.ts'
import type { CurrentUser } from '../auth/current-user.ts'
import type { DbOrTx } from '../db/client.ts'
import { bookingDays, bookings, tasks, ticks } from '../db/tables/booking-tables.ts'
import { jobs } from '../db/tables/job-tables.ts'
import { people } from '../db/tables/people-tables.ts'
import type { Firm } from '../firm/firm-store.ts'
import { bookingDayVisible } from '../lib/visibility.ts'

/** Who asks, under which firm's calendar, and when. */
export type Viewer = { user: CurrentUser; firm: Firm; now: Date }

const doneCount = sql<number>`(select coalesce(sum(${ticks.delta}), 0) from ${ticks}
  where ${ticks.taskId} = ${tasks.id})`
const firstPieceBy = sql<string | null>`(select p.name from ${people} p
  where p.id = ${tasks.firstPieceById})`

const taskColumns = {
  task: tasks,
  day: bookingDays.day,
  doneCount,
  assignedName: people.name,
  firstPieceBy,
}

type TaskRow = {
  task: typeof tasks.$inferSelect
  day: string
  doneCount: number
  assignedName: string | null
  firstPieceBy: string | null
}

export function asDayTask(row: TaskRow): DayTask {
  const { task } = row
  return {
    id: task.id,
    bookingDayId: task.bookingDayId,
    day: row.day,
    position: task.position,
    packageKey: task.packageKey,
    packageTitle: packagesInWords([task.packageKey]) || 'Other work',
    work: task.work,
    cutLineMark: task.cutLineMark,
    memberMarks: task.memberMarks,
    title: task.title,
    quantity: task.quantity,
    doneCount: row.doneCount,
    plannedMinutes: task.plannedMinutes,
    assignedTo: task.assignedToId ? { id: task.assignedToId, name: row.assignedName ?? '' } : null,
    firstPiece: task.firstPieceAt
      ? { at: task.firstPieceAt.toISOString(), by: row.firstPieceBy ?? '' }
      : null,
    handRaisedAt: task.handRaisedAt?.toISOString() ?? null,
    version: task.version,
  }
}

function selectTasks(db: DbOrTx) {
  return db
    .select(taskColumns)
    .from(tasks)
    .innerJoin(bookingDays, eq(bookingDays.id, tasks.bookingDayId))
    .leftJoin(people, eq(people.id, tasks.assignedToId))
}

/** All tasks of some bookings, in day and working order. */
export function tasksOfBookings(
  db: DbOrTx,
  bookingIds: string[],
): (DayTask & { bookingId: string })[] {
  if (bookingIds.length === 0) return []
  return db
    .select({ ...taskColumns, bookingId: bookingDays.bookingId })
    .from(tasks)
    .innerJoin(bookingDays, eq(bookingDays.id, tasks.bookingDayId))
    .leftJoin(people, eq(people.id, tasks.assignedToId))
    .where(inArray(bookingDays.bookingId, bookingIds))
    .orderBy(asc(bookingDays.day), asc(tasks.position), asc(tasks.id))
    .all()
    .map((row) => ({ ...asDayTask(row), bookingId: row.bookingId }))
}

/** The right to a task as a condition over tasks, booking_days and bookings. */
function taskVisible({ user, firm, now }: Viewer, permission: Permission): SQL | undefined {
  return and(
    isNull(bookings.cancelledAt),
    bookingDayVisible(user, permission, firm, now),
    permissionScope(user.role, permission) === 'own' ? eq(tasks.assignedToId, user.id) : undefined,
  )
}

/** A task with its booking, looked up together with the right to it. */
export function findTask(db: DbOrTx, viewer: Viewer, permission: Permission, taskId: string) {
  return db
    .select({ ...taskColumns, booking: bookings, job: jobs, revisionId: bookingDays.revisionId })
    .from(tasks)
    .innerJoin(bookingDays, eq(bookingDays.id, tasks.bookingDayId))
    .innerJoin(bookings, eq(bookings.id, bookingDays.bookingId))
    .innerJoin(jobs, eq(jobs.id, bookings.jobId))
    .leftJoin(people, eq(people.id, tasks.assignedToId))
    .where(and(eq(tasks.id, taskId), taskVisible(viewer, permission)))
    .get()
}
export type FoundTask = NonNullable<ReturnType<typeof findTask>>

/** One task as it is now, after a change that the caller had the right to. */
export function readTask(db: DbOrTx, taskId: string): DayTask {
  const row = selectTasks(db).where(eq(tasks.id, taskId)).get()
  if (!row) throw new Error('A task was gone within its own transaction.')
  return asDayTask(row)
}

const assignedTo = (viewer: Viewer) =>
  and(eq(tasks.assignedToId, viewer.user.id), taskVisible(viewer, 'task:read'))

/** A person's own tasks of a day, with their booking and job, in working order. */
export function ownTasks(db: DbOrTx, viewer: Viewer, day: string) {
  return db
    .select({ ...taskColumns, booking: bookings, job: jobs, revisionId: bookingDays.revisionId })
    .from(tasks)
    .innerJoin(bookingDays, eq(bookingDays.id, tasks.bookingDayId))
    .innerJoin(bookings, eq(bookings.id, bookingDays.bookingId))
    .innerJoin(jobs, eq(jobs.id, bookings.jobId))
    .leftJoin(people, eq(people.id, tasks.assignedToId))
    .where(and(eq(bookingDays.day, day), assignedTo(viewer)))
    .orderBy(asc(bookings.startAt), asc(jobs.number), asc(tasks.position), asc(tasks.id))
    .all()
}

/** The nearest days before and after on which a person has tasks. */
export function ownTaskDays(db: DbOrTx, viewer: Viewer, day: string) {
  return db
    .select({
      previousDay: sql<
        string | null
      >`max(case when ${bookingDays.day} < ${day} then ${bookingDays.day} end)`,
      nextDay: sql<
        string | null
      >`min(case when ${bookingDays.day} > ${day} then ${bookingDays.day} end)`,
    })
    .from(tasks)
    .innerJoin(bookingDays, eq(bookingDays.id, tasks.bookingDayId))
    .innerJoin(bookings, eq(bookings.id, bookingDays.bookingId))
    .where(assignedTo(viewer))
    .get()
}
