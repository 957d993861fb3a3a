import { audit } from '../db/tables/audit-tables.ts'
import type { DbOrTx } from '../db/client.ts'

export type AuditEntry = {
  at: Date
  personId: string | null
  action: string
  entity: string
  entityId: string
  detail?: Record<string, unknown>
}

/** Written in the same transaction as the change it tells of. */
export function writeAudit(db: DbOrTx, entry: AuditEntry): void {
  db.insert(audit)
    .values({ ...entry, detail: entry.detail ?? {} })
    .run()
}
