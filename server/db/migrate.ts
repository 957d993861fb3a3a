import path from 'node:path'
import { fileURLToPath } from 'node:url'
import { migrate } from 'drizzle-orm/better-sqlite3/migrator'
import type { OpenDatabase } from './client.ts'

const migrationsFolder = path.join(path.dirname(fileURLToPath(import.meta.url)), '../../drizzle')

/**
 * Brings the database up to date.
 *
 * `foreign_keys` is off meanwhile: the pragma does nothing inside a migration's own transaction, and a
 * rebuilt table would take its children with it (drizzle-orm issue 5782).
 *
 * @throws Error when a row then points at nothing.
 */
export function migrateDatabase({ db, sqlite }: OpenDatabase): void {
  sqlite.pragma('foreign_keys = OFF')
  migrate(db, { migrationsFolder })
  const orphans = sqlite.pragma('foreign_key_check') as { table: string; rowid: number }[]
  const first = orphans[0]
  if (first)
    throw new Error(
      `After migrating, a row of ${first.table} points at nothing (${orphans.length} such rows).`,
    )
  sqlite.pragma('foreign_keys = ON')
}
