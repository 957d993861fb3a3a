import * as auditTables from './tables/audit-tables.ts'
import * as bookingTables from './tables/booking-tables.ts'
import * as dayLogTables from './tables/day-log-tables.ts'
import * as firmTables from './tables/firm-tables.ts'
import * as jobTables from './tables/job-tables.ts'
import * as mailTables from './tables/mail-tables.ts'
import * as milestoneTables from './tables/milestone-tables.ts'
import * as peopleTables from './tables/people-tables.ts'
import * as rainOffTables from './tables/rain-off-tables.ts'
import * as variationTables from './tables/variation-tables.ts'

/** All tables, for the client. */
export const schema = {
  ...auditTables,
  ...bookingTables,
  ...dayLogTables,
  ...firmTables,
  ...jobTables,
  ...mailTables,
  ...milestoneTables,
  ...peopleTables,
  ...rainOffTables,
  ...variationTables,
}
