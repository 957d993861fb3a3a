import { type Day, formatDay } from '../../shared/calendar/days.ts'
import { localDayOf } from '../../shared/calendar/local-time.ts'
import type {
  ChangeVariation,
  CreateVariation,
  JobVariations,
} from '../../shared/variations/variation-schemas.ts'
import type { CurrentUser } from '../auth/current-user.ts'
import type { Db, DbOrTx } from '../db/client.ts'
import type { EventHub } from '../events/event-hub.ts'
import { readFirm } from '../firm/firm-store.ts'
import { AppError, invalidField, notFound } from '../http/app-error.ts'
import { findJob, type JobRow } from '../jobs/job-store.ts'
import { writeAudit } from '../lib/audit.ts'
import type { Clock } from '../lib/clock.ts'
import {
  insertVariation,
  nextSequence,
  readJobOfVariation,
  readVariationRow,
  readVariations,
  updateVariation,
  type VariationRow,
} from './variation-store.ts'

export type VariationDeps = { db: Db; clock: Clock; events: EventHub }
type Columns = Partial<
  Pick<VariationRow, 'reason' | 'priceCents' | 'askedOn' | 'agreedOn' | 'agreedBy' | 'withdrawnOn'>
>

function columnsOf({ reason, price, askedOn, agreed, withdrawnOn }: ChangeVariation): Columns {
  return {
    ...(reason === undefined ? {} : { reason }),
    ...(price === undefined ? {} : { priceCents: price }),
    ...(askedOn === undefined ? {} : { askedOn }),
    ...(agreed === undefined ? {} : { agreedOn: agreed?.on ?? null, agreedBy: agreed?.by ?? '' }),
    ...(withdrawnOn === undefined ? {} : { withdrawnOn }),
  }
}

function changedKeys(row: VariationRow, columns: Columns): string[] {
  const keys = Object.keys(columns) as (keyof Columns)[]
  return keys.filter((key) => columns[key] !== row[key])
}

/** @throws AppError 400 at a field, or 409 where the yes it had would come to stand for something else. */
function checkChange(row: VariationRow, columns: Columns, today: Day): void {
  const after = { ...row, ...columns }
  const isOther = after.reason !== row.reason || after.priceCents !== row.priceCents
  if (row.agreedOn !== null && after.agreedOn !== null && isOther)
    throw new AppError(
      'conflict',
      'The builder said yes to it as it stands. Take the yes back first, or add another variation.',
    )
  if (after.agreedOn !== null && after.priceCents === null)
    throw invalidField('price', 'Give the price the builder says yes to.')
  const happened: [string, Day | null][] = [
    ['askedOn', after.askedOn],
    ['agreed.on', after.agreedOn],
    ['withdrawnOn', after.withdrawnOn],
  ]
  for (const [path, day] of happened)
    if (day !== null && day > today)
      throw invalidField(path, `${formatDay(day)} is still to come. Give the day it happened.`)
}

export function createVariationService({ db, clock, events }: VariationDeps) {
  function jobOf(
    tx: DbOrTx,
    user: CurrentUser,
    permission: 'price:read' | 'variation:write',
    jobId: string,
  ): JobRow {
    const viewer = { user, firm: readFirm(tx), now: clock.now() }
    const job = findJob(tx, viewer, permission, jobId)
    if (!job) throw notFound('This job')
    return job
  }

  const answerOf = (tx: DbOrTx, job: JobRow): JobVariations => ({
    priceCents: job.priceCents,
    variations: readVariations(tx, job.id),
  })

  function write(
    user: CurrentUser,
    jobId: string,
    work: (tx: DbOrTx, today: Day) => { action: string; detail: Record<string, unknown> } | null,
  ): JobVariations {
    const now = clock.now()
    const answer = db.transaction(
      (tx) => {
        const job = jobOf(tx, user, 'variation:write', jobId)
        const done = work(tx, localDayOf(now, readFirm(tx).timeZone))
        if (done)
          writeAudit(tx, { at: now, personId: user.id, entity: 'job', entityId: jobId, ...done })
        return answerOf(tx, job)
      },
      { behavior: 'immediate' },
    )
    events.publish({ topic: 'jobs' })
    return answer
  }

  return {
    read: (user: CurrentUser, jobId: string): JobVariations =>
      answerOf(db, jobOf(db, user, 'price:read', jobId)),

    /** The same id again makes no second one. @throws AppError 404, or 409 when another job has it. */
    create(user: CurrentUser, jobId: string, input: CreateVariation): JobVariations {
      return write(user, jobId, (tx) => {
        const takenBy = readJobOfVariation(tx, input.id)
        if (takenBy === jobId) return null
        if (takenBy !== undefined)
          throw new AppError('conflict', 'That variation was added already, to another job.')
        const sequence = nextSequence(tx, jobId)
        insertVariation(tx, {
          id: input.id,
          jobId,
          sequence,
          reason: input.reason,
          priceCents: input.price,
          createdById: user.id,
          createdAt: clock.now(),
        })
        return { action: 'variation added', detail: { sequence } }
      })
    },

    /** @throws AppError 404; 400 at a field; 409 with both versions, or where a yes would be bent. */
    change(user: CurrentUser, jobId: string, id: string, input: ChangeVariation): JobVariations {
      return write(user, jobId, (tx, today) => {
        const row = readVariationRow(tx, jobId, id)
        if (!row) throw notFound('This variation')
        if (row.version !== input.version) {
          const current = readVariations(tx, jobId).find((one) => one.id === id)
          throw new AppError(
            'conflict',
            'Somebody else changed this variation since you opened it. Look at it as it is now, then make your change again.',
            { detail: { kind: 'stale', current, sent: input } },
          )
        }
        const columns = columnsOf(input)
        const changed = changedKeys(row, columns)
        if (changed.length === 0) return null
        checkChange(row, columns, today)
        updateVariation(tx, row, columns)
        return { action: 'variation changed', detail: { sequence: row.sequence, changed } }
      })
    },
  }
}
