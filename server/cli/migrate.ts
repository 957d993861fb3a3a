import { openDatabase } from '../db/client.ts'
import { migrateDatabase } from '../db/migrate.ts'
import { readEnv } from '../env.ts'

const database = openDatabase(readEnv(process.env).dataDir)
migrateDatabase(database)
database.close()
console.log('The database is up to date.')
