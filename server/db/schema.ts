import * as auditTables from './tables/audit-tables.ts'
import * as bookingTables from './tables/booking-tables.ts'
import * as firmTables from './tables/firm-tables.ts'
import * as jobTables from './tables/job-tables.ts'
import * as mailTables from './tables/mail-tables.ts'
import * as peopleTables from './tables/people-tables.ts'

/** All tables, for the client. */
export const schema = {
  ...auditTables,
  ...bookingTables,
  ...firmTables,
  ...jobTables,
  ...mailTables,
  ...peopleTables,
}
