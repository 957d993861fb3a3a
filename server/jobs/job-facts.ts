import { type SQL, sql } from 'drizzle-orm'
import { isWorkedDay } from '../day-logs/worked-days.ts'
import type { JobFacts } from '../../shared/jobs/job-stage.ts'
import { firstStage, stageTable } from '../../shared/jobs/job-stage.ts'

/** Conditions over one row of `jobs`; each walks an index. */
const standing = (state: 'pencilled' | 'firm'): SQL => sql`exists (
  select 1 from bookings b
  where b.job_id = jobs.id and b.cancelled_at is null and b.state = ${state})`

const conditions: Record<keyof JobFacts, SQL> = {
  isPriceSent: sql`jobs.price_sent_on is not null`,
  isAccepted: sql`jobs.accepted_on is not null`,
  hasPencilledBooking: standing('pencilled'),
  hasFirmBooking: standing('firm'),
  // A worked day stays worked, even when what is left of its booking is called off.
  isWorked: sql`exists (
    select 1 from bookings join booking_days on booking_days.booking_id = bookings.id
    where bookings.job_id = jobs.id and ${isWorkedDay})`,
  isMarkedComplete: sql`jobs.completed_on is not null`,
}

/** The stage table of shared/jobs as SQL over `jobs`. */
export function stageSql(): SQL {
  const whens = stageTable.map(({ stage, fact }) => sql`when ${conditions[fact]} then ${stage}`)
  return sql`(case ${sql.join(whens, sql` `)} else ${firstStage} end)`
}
