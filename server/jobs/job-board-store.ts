import { type SQL, sql } from 'drizzle-orm'
import { type Permission, roleMay } from '../../shared/auth/permissions.ts'
import { localDayOf } from '../../shared/calendar/local-time.ts'
import { type BoardQuery, boardPageSize } from '../../shared/jobs/job-schemas.ts'
import type { JobStage } from '../../shared/jobs/job-stage.ts'
import type { CurrentUser } from '../auth/current-user.ts'
import type { DbOrTx } from '../db/client.ts'
import type { Firm } from '../firm/firm-store.ts'
import { bookingDayVisible, jobVisible } from '../lib/visibility.ts'
import { stageSql } from './job-facts.ts'

export type Viewer = { user: CurrentUser; firm: Firm; now: Date }

const anyOrder = '9999-12-31'

function likePattern(text: string): string {
  return `%${text.replaceAll(/[\\%_]/g, (sign) => `\\${sign}`)}%`
}

/** Fields searched; who may not read a field cannot find by it. */
const searched: { column: SQL; permission: Permission }[] = [
  { column: sql`jobs.number`, permission: 'board:read' },
  { column: sql`jobs.title`, permission: 'board:read' },
  { column: sql`jobs.site_address`, permission: 'board:read' },
  { column: sql`jobs.site_contact_name`, permission: 'board:read' },
  { column: sql`jobs.customer_name`, permission: 'customer:read' },
]

/** Every word must be found somewhere. */
function matchesSearch(viewer: Viewer, text: string): SQL {
  const columns = searched.filter(({ permission }) => roleMay(viewer.user.role, permission))
  const words = text.split(/\s+/).filter(Boolean)
  if (words.length === 0) return sql`1 = 1`
  const conditions = words.map((word) => {
    const anywhere = columns.map(
      ({ column }) => sql`${column} like ${likePattern(word)} escape '\\'`,
    )
    return sql`(${sql.join(anywhere, sql` or `)})`
  })
  return sql.join(conditions, sql` and `)
}

function visibleDays(viewer: Viewer): SQL {
  return bookingDayVisible(viewer.user, 'board:read', viewer.firm, viewer.now)
}

function hasCrew(viewer: Viewer, crewId: string | undefined): SQL {
  if (!crewId) return sql`1 = 1`
  // Not `exists`: for each job that would walk all of the crew's bookings.
  return sql`jobs.id in (
    select bookings.job_id from bookings join booking_days on booking_days.booking_id = bookings.id
    where bookings.cancelled_at is null and bookings.crew_id = ${crewId} and ${visibleDays(viewer)})`
}

function isFound(viewer: Viewer, query: BoardQuery): SQL {
  return sql`${jobVisible(viewer.user, 'board:read', viewer.firm, viewer.now)}
    and ${matchesSearch(viewer, query.q)} and ${hasCrew(viewer, query.crew)}`
}

/** Jobs found that are not complete, each with its stage and what orders it within that. */
function openJobs(viewer: Viewer, query: BoardQuery): SQL {
  const today = localDayOf(viewer.now, viewer.firm.timeZone)
  return sql`
    select jobs.id as id, jobs.number as number, ${stageSql()} as stage,
      coalesce(
        (select min(booking_days.day) from bookings
          join booking_days on booking_days.booking_id = bookings.id
          where bookings.job_id = jobs.id and bookings.cancelled_at is null
            and booking_days.day >= ${today} and ${visibleDays(viewer)}),
        jobs.wanted_by, ${anyOrder}) as due_on
    from jobs where jobs.completed_on is null and ${isFound(viewer, query)}`
}

type Placed = { id: string; stage: JobStage }
type Counted = { stage: JobStage; count: number }

function readOpenPage(db: DbOrTx, viewer: Viewer, query: BoardQuery) {
  const found = openJobs(viewer, query)
  const ofStage = query.stage ? sql`stage = ${query.stage}` : sql`1 = 1`
  const page = db.all<Placed>(sql`
    with found as materialized (${found}),
    placed as (
      select id, stage, row_number() over (partition by stage order by due_on, number) as place
      from found where ${ofStage})
    select id, stage from placed
    where place > ${query.offset} and place <= ${query.offset + boardPageSize}
    order by stage, place`)
  const counts = db.all<Counted>(
    sql`select stage, count(*) as count from (${found}) group by stage`,
  )
  return { page, counts }
}

/** Years of them: read by the index of the day they were done, latest first, and never one by one. */
function readCompletePage(db: DbOrTx, viewer: Viewer, query: BoardQuery) {
  const found = sql`from jobs where jobs.completed_on is not null and ${isFound(viewer, query)}`
  const isAsked = query.stage === undefined || query.stage === 'complete'
  const page = isAsked
    ? db.all<Placed>(sql`
        select jobs.id as id, 'complete' as stage ${found}
        order by jobs.completed_on desc, coalesce(jobs.wanted_by, ${anyOrder}), jobs.number
        limit ${boardPageSize} offset ${query.offset}`)
    : []
  const { count } = db.get<{ count: number }>(sql`select count(*) as count ${found}`)
  return { page, counts: count > 0 ? [{ stage: 'complete' as const, count }] : [] }
}

/** One page of each stage asked for, soonest first (complete: latest first), and the count of every stage. */
export function readBoardPage(
  db: DbOrTx,
  viewer: Viewer,
  query: BoardQuery,
): { page: Placed[]; counts: Counted[] } {
  const open = readOpenPage(db, viewer, query)
  const complete = readCompletePage(db, viewer, query)
  return {
    page: [...open.page, ...complete.page],
    counts: [...open.counts, ...complete.counts],
  }
}

export function readStage(db: DbOrTx, jobId: string): JobStage {
  const row = db.get<{ stage: JobStage }>(
    sql`select ${stageSql()} as stage from jobs where jobs.id = ${jobId}`,
  )
  return row.stage
}
