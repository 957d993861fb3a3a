import { eq } from 'drizzle-orm'
import { type Closure, closureDays } from '../../shared/calendar/closures.ts'
import type { Day } from '../../shared/calendar/days.ts'
import { defaultLabourRates } from '../../shared/labour/default-labour-rates.ts'
import { defaultSettings } from '../../shared/roof/roof-settings.ts'
import type { DbOrTx } from '../db/client.ts'
import { firm } from '../db/tables/firm-tables.ts'
import { publicHolidays } from './public-holidays.ts'

type FirmRow = typeof firm.$inferSelect

export type Firm = Omit<FirmRow, 'closedDays'> & {
  /** Every day the firm is shut: its own and the public holidays of the years asked for. */
  closedDays: { day: Day; name: string }[]
  /** Its own, as typed. */
  ownClosedDays: Closure[]
}

const firmId = 1

/** What a new installation starts from, before the office has filled in its own. */
export const newFirm: typeof firm.$inferInsert = {
  id: firmId,
  name: 'Your firm',
  phone: '',
  timeZone: 'Australia/Brisbane',
  reminderAt: '15:00',
  changeHoldMinutes: 15,
  startAt: '07:00',
  hoursPerDay: 8,
  workingWeekdays: [1, 2, 3, 4, 5],
  closedDays: [],
  brickOffsetMm: 110,
  lengthUnits: 'mm',
  roofSettings: defaultSettings,
  labourRates: defaultLabourRates,
}

/** Public holidays are always there for these years round the present one. */
const yearsRound = { back: 2, ahead: 3 }

const yearOf = (day: Day): number => Number(day.slice(0, 4))

function yearsFor(span: { from: Day; to: Day } | undefined): number[] {
  const present = new Date().getUTCFullYear()
  const years = new Set<number>()
  for (let y = present - yearsRound.back; y <= present + yearsRound.ahead; y++) years.add(y)
  // The year after as well: who looks for the next working day looks past the end.
  if (span) for (let y = yearOf(span.from); y <= yearOf(span.to) + 1; y++) years.add(y)
  return [...years].sort((a, b) => a - b)
}

function holidaysOff(row: FirmRow, years: readonly number[]): { day: Day; name: string }[] {
  const { holidayCountry, holidayState, holidaysWorked } = row
  if (holidayCountry === null) return []
  return years
    .flatMap((year) => publicHolidays(holidayCountry, holidayState, year))
    .filter(({ holiday }) => !holidaysWorked.includes(holiday))
    .map(({ day, name }) => ({ day, name }))
}

/** A row stored before a piece or a setting had a name starts from the default for it. */
function asFirm(row: FirmRow, years: readonly number[]): Firm {
  const { closedDays, ...rest } = row
  const pieces = { ...defaultLabourRates.pieces, ...row.labourRates.pieces }
  const packageMinutes = {
    ...defaultLabourRates.packageMinutes,
    ...row.labourRates.packageMinutes,
  }
  return {
    ...rest,
    closedDays: [...closureDays(closedDays), ...holidaysOff(row, years)],
    ownClosedDays: closedDays,
    roofSettings: { ...defaultSettings, ...row.roofSettings },
    labourRates: { ...defaultLabourRates, ...row.labourRates, pieces, packageMinutes },
  }
}

/**
 * The firm's one row; made when it is not there. Its `closedDays` have the public holidays of the years
 * round the present one; who asks about other years gives the span.
 */
export function readFirm(db: DbOrTx, span?: { from: Day; to: Day }): Firm {
  const years = yearsFor(span)
  const found = db.select().from(firm).where(eq(firm.id, firmId)).get()
  if (found) return asFirm(found, years)
  db.insert(firm).values(newFirm).onConflictDoNothing().run()
  const made = db.select().from(firm).where(eq(firm.id, firmId)).get()
  if (!made) throw new Error('The firm row could not be made.')
  return asFirm(made, years)
}
