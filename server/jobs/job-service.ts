import type { z } from 'zod'
import { type Day, formatDay } from '../../shared/calendar/days.ts'
import { localDayOf } from '../../shared/calendar/local-time.ts'
import {
  type BoardQuery,
  boardPageSize,
  type ChangeJob,
  type createJobSchema,
  type JobFactName,
  jobFactNames,
  type JobFields,
} from '../../shared/jobs/job-schemas.ts'
import { type JobStage, jobStages } from '../../shared/jobs/job-stage.ts'
import type { boardSchema, jobSchema } from '../../shared/jobs/job-views.ts'
import type { CurrentUser } from '../auth/current-user.ts'
import type { Db, DbOrTx } from '../db/client.ts'
import type { EventHub } from '../events/event-hub.ts'
import { readFirm } from '../firm/firm-store.ts'
import { AppError, invalidField, notFound } from '../http/app-error.ts'
import { writeAudit } from '../lib/audit.ts'
import type { Clock } from '../lib/clock.ts'
import { readBoardPage, readStage, type Viewer } from './job-board-store.ts'
import { readCrews, readRelated } from './job-related.ts'
import {
  findJob,
  insertJob,
  isNumberTaken,
  type JobColumns,
  type JobRow,
  jobsById,
  nextJobNumber,
  updateJob,
} from './job-store.ts'
import { jobAnswer, jobCard } from './job-view.ts'

export type JobDeps = { db: Db; clock: Clock; events: EventHub }
export type JobService = ReturnType<typeof createJobService>
type JobAnswer = z.input<typeof jobSchema>

function columnsOf(fields: Partial<JobFields>): JobColumns {
  const { price, ...rest } = fields
  return price === undefined ? rest : { ...rest, priceCents: price }
}

/** What happened cannot have happened on a day still to come. */
function refuseDaysToCome(columns: JobColumns, today: Day): void {
  for (const name of jobFactNames) {
    const day = columns[name]
    if (day && day > today) {
      throw invalidField(name, `${formatDay(day)} is still to come. Give the day it happened.`)
    }
  }
}

function refuseTakenNumber(db: DbOrTx, number: string, jobId: string): void {
  if (isNumberTaken(db, number, jobId)) {
    throw invalidField('number', `Another job has the number ${number}. Choose a different one.`)
  }
}

function changedKeys(row: JobRow, columns: JobColumns): string[] {
  const keys = Object.keys(columns) as (keyof JobColumns)[]
  return keys.filter((key) => columns[key] !== undefined && columns[key] !== row[key])
}

function readJobAnswer(db: DbOrTx, viewer: Viewer, row: JobRow): JobAnswer {
  const related = readRelated(db, viewer, [row.id], { latestRevisionOnly: false })
  return jobAnswer(viewer, readStage(db, row.id), row, related(row.id))
}

function readBoard(db: DbOrTx, viewer: Viewer, query: BoardQuery): z.input<typeof boardSchema> {
  const { page, counts } = readBoardPage(db, viewer, query)
  const ids = page.map((row) => row.id)
  const rows = jobsById(db, ids)
  const related = readRelated(db, viewer, ids, { latestRevisionOnly: true })
  const countOf = new Map(counts.map((row) => [row.stage, row.count]))
  const count = (stage: JobStage) => countOf.get(stage) ?? 0
  const longest = Math.max(...(query.stage ? [count(query.stage)] : jobStages.map(count)))
  const nextOffset = query.offset + boardPageSize
  return {
    jobs: page.flatMap(({ id, stage }) => {
      const row = rows.get(id)
      return row ? [jobCard(viewer, stage, row, related(id))] : []
    }),
    counts: Object.fromEntries(jobStages.map((stage) => [stage, count(stage)])) as Record<
      JobStage,
      number
    >,
    crews: readCrews(db, viewer),
    nextOffset: longest > nextOffset ? nextOffset : null,
  }
}

/** Writes the change in the transaction it is given. @throws AppError 404, 400 at a field, 409 with both versions. */
function changeJob(
  tx: DbOrTx,
  viewer: Viewer,
  jobId: string,
  change: { version: number; columns: JobColumns; yours: Record<string, unknown>; action: string },
): JobAnswer {
  const { version, columns, yours, action } = change
  const row = findJob(tx, viewer, 'job:write', jobId)
  if (!row) throw notFound('This job')
  if (row.version !== version) {
    throw new AppError(
      'conflict',
      'Somebody else changed this job since you opened it. Look at what is there now, then save again.',
      { detail: { current: readJobAnswer(tx, viewer, row), yours } },
    )
  }
  refuseDaysToCome(columns, localDayOf(viewer.now, viewer.firm.timeZone))
  const changed = changedKeys(row, columns)
  if (columns.number === '') {
    throw invalidField('number', 'A job keeps a number. Type one, like the one it had.')
  }
  if (columns.number && columns.number !== row.number) refuseTakenNumber(tx, columns.number, jobId)
  if (changed.length > 0) {
    updateJob(tx, jobId, version, columns, viewer.now)
    writeAudit(tx, {
      at: viewer.now,
      personId: viewer.user.id,
      action,
      entity: 'job',
      entityId: jobId,
      detail: { changed },
    })
  }
  const after = findJob(tx, viewer, 'job:write', jobId)
  if (!after) throw notFound('This job')
  return readJobAnswer(tx, viewer, after)
}

/** @throws AppError 400 at a field; 409 when this id was saved before with other words. */
function createJob(tx: DbOrTx, viewer: Viewer, input: z.output<typeof createJobSchema>): JobAnswer {
  const { id, ...fields } = input
  const columns = columnsOf(fields)
  const before = findJob(tx, viewer, 'job:write', id)
  if (before) {
    if (!columns.number) delete columns.number
    if (changedKeys(before, columns).length === 0) return readJobAnswer(tx, viewer, before)
    throw new AppError(
      'conflict',
      `This job was saved before as ${before.number}. Open it there and make your change again.`,
      { detail: { current: readJobAnswer(tx, viewer, before), yours: fields } },
    )
  }
  refuseDaysToCome(columns, localDayOf(viewer.now, viewer.firm.timeZone))
  if (columns.number) refuseTakenNumber(tx, columns.number, id)
  const number = columns.number || nextJobNumber(tx, viewer.firm.name)
  insertJob(tx, {
    ...columns,
    id,
    number,
    title: input.title,
    covering: input.covering,
    createdAt: viewer.now,
    updatedAt: viewer.now,
  })
  writeAudit(tx, {
    at: viewer.now,
    personId: viewer.user.id,
    action: 'job.create',
    entity: 'job',
    entityId: id,
    detail: { number },
  })
  const made = findJob(tx, viewer, 'job:write', id)
  if (!made) throw notFound('This job')
  return readJobAnswer(tx, viewer, made)
}

export function createJobService({ db, clock, events }: JobDeps) {
  const viewerOf = (user: CurrentUser): Viewer => ({ user, firm: readFirm(db), now: clock.now() })
  const write = (work: (tx: DbOrTx) => JobAnswer): JobAnswer => {
    const answer = db.transaction((tx) => work(tx), { behavior: 'immediate' })
    events.publish({ topic: 'jobs' })
    return answer
  }
  return {
    board: (user: CurrentUser, query: BoardQuery) => readBoard(db, viewerOf(user), query),
    read(user: CurrentUser, jobId: string): JobAnswer {
      const viewer = viewerOf(user)
      const row = findJob(db, viewer, 'job:read', jobId)
      if (!row) throw notFound('This job')
      return readJobAnswer(db, viewer, row)
    },
    create: (user: CurrentUser, input: z.output<typeof createJobSchema>) =>
      write((tx) => createJob(tx, viewerOf(user), input)),
    change(user: CurrentUser, jobId: string, { version, ...fields }: ChangeJob): JobAnswer {
      const change = { version, columns: columnsOf(fields), yours: fields, action: 'job.change' }
      return write((tx) => changeJob(tx, viewerOf(user), jobId, change))
    },
    setFact(
      user: CurrentUser,
      jobId: string,
      fact: JobFactName,
      { version, on }: { version: number; on: Day | null },
    ): JobAnswer {
      const columns = { [fact]: on }
      const change = { version, columns, yours: columns, action: `job.${fact}` }
      return write((tx) => changeJob(tx, viewerOf(user), jobId, change))
    },
  }
}
