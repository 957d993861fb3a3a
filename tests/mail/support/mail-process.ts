/** A process that only sends mail, slowly, until it is killed or has nothing left: see killed-process.test.ts. */
import { setTimeout as wait } from 'node:timers/promises'
import { createTransport } from 'nodemailer'
import { pino } from 'pino'
import { createFakeMailTransport } from '../../../fakes/mail/fake-mail-transport.ts'
import { openDatabase } from '../../../server/db/client.ts'
import { createEventHub } from '../../../server/events/event-hub.ts'
import { createMailWorker } from '../../../server/mail/mail-worker.ts'

const [dataDir = '', mailDir = '', instant = ''] = process.argv.slice(2)
const database = openDatabase(dataDir)
const fake = createTransport(createFakeMailTransport({ dir: mailDir }))

const worker = createMailWorker({
  db: database.db,
  clock: { now: () => new Date(instant) },
  transport: {
    async sendMail(mail) {
      await fake.sendMail(mail)
      // The server has it, the answer is still on its way: where a kill hurts most.
      await wait(120)
    },
    close: () => undefined,
  },
  appUrl: 'http://ridgehand.test',
  mailFrom: 'Ridgehand <roofs@ridgehand.example>',
  log: pino({ level: 'silent' }),
  events: createEventHub(),
})

await worker.runOnce()
database.close()
