import { and, eq } from 'drizzle-orm'
import { editFirmSchema, firmSchema, type FirmSettings } from '../../shared/firm/firm-schemas.ts'
import { currentUser } from '../auth/current-user.ts'
import type { Db, DbOrTx } from '../db/client.ts'
import { firm } from '../db/tables/firm-tables.ts'
import type { EventHub } from '../events/event-hub.ts'
import { type Api, send } from '../http/api.ts'
import { staleVersion } from '../http/app-error.ts'
import { parseInput } from '../http/parse-input.ts'
import { writeAudit } from '../lib/audit.ts'
import type { Clock } from '../lib/clock.ts'
import { readFirm } from './firm-store.ts'

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

export function firmRoutes(api: Api, deps: Deps): void {
  const { db, clock, events } = deps

  api.route('get', '/api/firm', 'firm:read', (_req, res) => {
    send(res, firmSchema, firmSettings(db))
  })

  api.route('put', '/api/firm', 'firm:write', (req, res) => {
    const user = currentUser(res)
    const { version, roofSettings, ...fields } = parseInput(editFirmSchema, req.body)
    const now = clock.now()
    const before = readFirm(db)
    db.transaction((tx) => {
      const changed = tx
        .update(firm)
        .set({ ...fields, roofSettings: { ...roofSettings, covering: null }, version: version + 1 })
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
