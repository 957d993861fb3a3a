import { openDatabase } from '../db/client.ts'
import { isEmpty, seedDemo } from '../db/demo/seed-demo.ts'
import { migrateDatabase } from '../db/migrate.ts'
import { readEnv } from '../env.ts'
import { systemClock } from '../lib/clock.ts'

const database = openDatabase(readEnv(process.env).dataDir)
migrateDatabase(database)
if (isEmpty(database.db)) {
  await seedDemo(database.db, systemClock)
  console.log('The demo firm is in.')
} else {
  console.log('There is data here already; the demo goes into an empty database only.')
}
database.close()
