import { and, eq } from 'drizzle-orm'
import { editFirmSchema, firmSchema, type FirmSettings } from '../../shared/firm/firm-schemas.ts'
import { holidaysQuerySchema, publicHolidaysSchema } from '../../shared/firm/holiday-schemas.ts'
import { localDayOf } from '../../shared/calendar/local-time.ts'
import { currentUser } from '../auth/current-user.ts'
import type { Db, DbOrTx } from '../db/client.ts'
import { firm } from '../db/tables/firm-tables.ts'
import type { EventHub } from '../events/event-hub.ts'
import { type Api, send } from '../http/api.ts'
import { invalidField, staleVersion } from '../http/app-error.ts'
import { parseInput } from '../http/parse-input.ts'
import { writeAudit } from '../lib/audit.ts'
import type { Clock } from '../lib/clock.ts'
import { type Firm, readFirm } from './firm-store.ts'
import { holidayCountries, holidayStates, publicHolidays } from './public-holidays.ts'

type Deps = {
  db: Db
  clock: Clock
  events: EventHub
  replanUpcoming: (tx: DbOrTx, now: Date) => void
}

/** The firm as its settings screen edits it; the covering belongs to a job, not to the firm. */
export function firmSettings(db: DbOrTx): FirmSettings {
  return firmSchema.parse(readFirm(db))
}

function yearNow(firm: Firm, clock: Clock): number {
  return Number(localDayOf(clock.now(), firm.timeZone).slice(0, 4))
}

/** @throws AppError 400 for a country or state that holidays are not known of. */
function checkHolidayPlace(place: Pick<FirmSettings, 'holidayCountry' | 'holidayState'>): void {
  const { holidayCountry, holidayState } = place
  const has = (places: { code: string }[], code: string) => places.some((one) => one.code === code)
  if (holidayCountry === null) {
    if (holidayState !== null) throw invalidField('holidayState', 'Choose the country first.')
    return
  }
  if (!has(holidayCountries(), holidayCountry))
    throw invalidField('holidayCountry', 'Choose a country from the list.')
  if (holidayState !== null && !has(holidayStates(holidayCountry), holidayState))
    throw invalidField('holidayState', 'Choose a state from the list, or none.')
}

export function firmRoutes(api: Api, deps: Deps): void {
  const { db, clock, events } = deps

  api.route('get', '/api/firm', 'firm:read', (_req, res) => {
    send(res, firmSchema, firmSettings(db))
  })

  api.route('get', '/api/firm/holidays', 'firm:read', (req, res) => {
    const { country, state = null, year } = parseInput(holidaysQuerySchema, req.query)
    const asked = year ?? yearNow(readFirm(db), clock)
    const countries = holidayCountries()
    const known = country !== undefined && countries.some(({ code }) => code === country)
    send(res, publicHolidaysSchema, {
      year: asked,
      countries,
      states: known ? holidayStates(country) : [],
      holidays: known ? publicHolidays(country, state, asked) : [],
    })
  })

  api.route('put', '/api/firm', 'firm:write', (req, res) => {
    const user = currentUser(res)
    const { version, roofSettings, ownClosedDays, ...fields } = parseInput(editFirmSchema, req.body)
    checkHolidayPlace(fields)
    const now = clock.now()
    const before = readFirm(db)
    db.transaction((tx) => {
      const changed = tx
        .update(firm)
        .set({
          ...fields,
          closedDays: ownClosedDays,
          roofSettings: { ...roofSettings, covering: null },
          version: version + 1,
        })
        .where(and(eq(firm.id, before.id), eq(firm.version, version)))
        .run()
      if (changed.changes === 0) throw staleVersion(firmSettings(tx))
      writeAudit(tx, {
        at: now,
        personId: user.id,
        action: 'firm changed',
        entity: 'firm',
        entityId: String(before.id),
      })
      deps.replanUpcoming(tx, now)
    })
    events.publish({ topic: 'firm' })
    send(res, firmSchema, firmSettings(db))
  })
}
