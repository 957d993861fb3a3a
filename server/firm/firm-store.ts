import { eq } from 'drizzle-orm'
import { defaultLabourRates } from '../../shared/labour/default-labour-rates.ts'
import { defaultSettings } from '../../shared/roof/roof-settings.ts'
import type { DbOrTx } from '../db/client.ts'
import { firm } from '../db/tables/firm-tables.ts'

export type Firm = typeof firm.$inferSelect

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

/** A row stored before a piece or a setting had a name starts from the default for it. */
function withDefaults(row: Firm): Firm {
  const pieces = { ...defaultLabourRates.pieces, ...row.labourRates.pieces }
  return {
    ...row,
    roofSettings: { ...defaultSettings, ...row.roofSettings },
    labourRates: { ...defaultLabourRates, ...row.labourRates, pieces },
  }
}

/** The firm's one row; made when it is not there. */
export function readFirm(db: DbOrTx): Firm {
  const found = db.select().from(firm).where(eq(firm.id, firmId)).get()
  if (found) return withDefaults(found)
  db.insert(firm).values(newFirm).onConflictDoNothing().run()
  const made = db.select().from(firm).where(eq(firm.id, firmId)).get()
  if (!made) throw new Error('The firm row could not be made.')
  return made
}
