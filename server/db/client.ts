import { mkdirSync } from 'node:fs'
import path from 'node:path'
import Database from 'better-sqlite3'
import { type BetterSQLite3Database, drizzle } from 'drizzle-orm/better-sqlite3'
import { schema } from './schema.ts'

export type Db = BetterSQLite3Database<typeof schema>
/** A database or an open transaction on it: what stores take. */
export type DbOrTx = Db | Parameters<Parameters<Db['transaction']>[0]>[0]

export type OpenDatabase = { db: Db; sqlite: Database.Database; close(): void }

/** Opens the firm's database ('ridgehand.db' in the data folder, or ':memory:'). */
export function openDatabase(dataDir: string | ':memory:'): OpenDatabase {
  // For its owner only: password hashes, sessions and, in fake mail, links lie in it.
  if (dataDir !== ':memory:') mkdirSync(dataDir, { recursive: true, mode: 0o700 })
  const file = dataDir === ':memory:' ? dataDir : path.join(dataDir, 'ridgehand.db')
  const sqlite = new Database(file)
  sqlite.pragma('journal_mode = WAL')
  // A mail said to be sent, or told, must not be forgotten over a power cut.
  sqlite.pragma('synchronous = FULL')
  sqlite.pragma('busy_timeout = 5000')
  sqlite.pragma('foreign_keys = ON')
  return { db: drizzle(sqlite, { schema }), sqlite, close: () => sqlite.close() }
}
