import { formatDay } from '../../shared/calendar/days.ts'
import { localDayOf } from '../../shared/calendar/local-time.ts'
import type { MilestoneKind } from '../../shared/milestones/milestone-kinds.ts'
import type {
  JobMilestones,
  Milestone,
  MilestoneConflict,
  SetMilestone,
} from '../../shared/milestones/milestone-schemas.ts'
import type { CurrentUser } from '../auth/current-user.ts'
import type { Db, DbOrTx } from '../db/client.ts'
import type { EventHub } from '../events/event-hub.ts'
import { readFirm } from '../firm/firm-store.ts'
import { AppError, invalidField, notFound } from '../http/app-error.ts'
import { findJob } from '../jobs/job-store.ts'
import { writeAudit } from '../lib/audit.ts'
import type { Clock } from '../lib/clock.ts'
import { readMilestone, readMilestones, writeMilestone } from './milestone-store.ts'

export type MilestoneDeps = { db: Db; clock: Clock; events: EventHub }

function staleMilestone(current: Milestone, sent: SetMilestone): AppError {
  const detail: MilestoneConflict = { kind: 'stale', current, sent }
  return new AppError(
    'conflict',
    'Somebody else changed this since you opened it. Look at what is there now, then set it again.',
    { detail },
  )
}

function changedKeys(before: Milestone, after: Milestone): string[] {
  const keys = ['day', 'state', 'broughtBy', 'note'] as const
  return keys.filter((key) => before[key] !== after[key])
}

export function createMilestoneService({ db, clock, events }: MilestoneDeps) {
  const viewerOf = (tx: DbOrTx, user: CurrentUser) => ({
    user,
    firm: readFirm(tx),
    now: clock.now(),
  })

  function change(
    tx: DbOrTx,
    user: CurrentUser,
    { jobId, kind }: { jobId: string; kind: MilestoneKind },
    input: SetMilestone,
  ): JobMilestones {
    const viewer = viewerOf(tx, user)
    if (!findJob(tx, viewer, 'milestone:write', jobId)) throw notFound('This job')
    const before = readMilestone(tx, jobId, kind)
    if (before.version !== input.version) throw staleMilestone(before, input)
    const after: Milestone = {
      ...before,
      day: input.day === undefined ? before.day : input.day,
      state: input.state ?? before.state,
      broughtBy: input.broughtBy ?? before.broughtBy,
      note: input.note ?? before.note,
    }
    refuseDoneAhead(after, localDayOf(viewer.now, viewer.firm.timeZone))
    const changed = changedKeys(before, after)
    if (changed.length > 0) {
      writeMilestone(tx, jobId, after, viewer.now)
      writeAudit(tx, {
        at: viewer.now,
        personId: user.id,
        action: 'job.milestone',
        entity: 'job',
        entityId: jobId,
        detail: { kind, changed },
      })
    }
    return { milestones: readMilestones(tx, jobId) }
  }

  return {
    /** @throws AppError 404 when the job is not there or not this user's to see. */
    read(user: CurrentUser, jobId: string): JobMilestones {
      if (!findJob(db, viewerOf(db, user), 'job:read', jobId)) throw notFound('This job')
      return { milestones: readMilestones(db, jobId) }
    },
    /** @throws AppError 404; 400 at the day; 409 with both versions. */
    set(
      user: CurrentUser,
      which: { jobId: string; kind: MilestoneKind },
      input: SetMilestone,
    ): JobMilestones {
      const answer = db.transaction((tx) => change(tx, user, which, input), {
        behavior: 'immediate',
      })
      events.publish({ topic: 'jobs' })
      return answer
    },
  }
}

function refuseDoneAhead({ state, day }: Milestone, today: string): void {
  if (state === 'done' && day !== null && day > today)
    throw invalidField('day', `${formatDay(day)} is still to come. Give the day it was done.`)
}
