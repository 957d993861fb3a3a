import { openDatabase } from '../db/client.ts'
import { migrateDatabase } from '../db/migrate.ts'
import { readEnv } from '../env.ts'
import { makeFirstAccount } from '../people/first-account.ts'

const [email, ...names] = process.argv.slice(2)
if (!email || names.length === 0) {
  console.error('Say who: npm run first-account -- name@firm.example First Last')
  process.exit(1)
}
const env = readEnv(process.env)
const database = openDatabase(env.dataDir)
migrateDatabase(database)
try {
  const token = makeFirstAccount(database.db, { email, name: names.join(' '), now: new Date() })
  console.log(
    `Open this within a week to choose a password:\n${env.appUrl}/set-password?token=${token}`,
  )
} catch (error) {
  console.error(error instanceof Error ? error.message : error)
  process.exitCode = 1
} finally {
  database.close()
}
