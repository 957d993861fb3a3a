import { createTransport } from 'nodemailer'
import { asc, desc, eq } from 'drizzle-orm'
import type { CurrentUser } from '../../server/auth/current-user.ts'
import { takeRevision } from '../../server/bookings/replan.ts'
import { seedDemo } from '../../server/db/demo/seed-demo.ts'
import { demoPassword } from '../../server/db/demo/demo-people.ts'
import { bookingDays, bookings, tasks } from '../../server/db/tables/booking-tables.ts'
import { jobs, roofDrafts } from '../../server/db/tables/job-tables.ts'
import { outbox } from '../../server/db/tables/mail-tables.ts'
import { crews, people } from '../../server/db/tables/people-tables.ts'
import { issueAtOnce } from '../../server/revisions/issue-revision.ts'
import { saveDraft } from '../../server/revisions/revision-service.ts'
import { withText } from '../../shared/revisions/form-paths.ts'
import { roofFormSchema } from '../../shared/revisions/roof-form.ts'
import { createFakeMailTransport } from '../../fakes/mail/fake-mail-transport.ts'
import { createMailWorker } from '../../server/mail/mail-worker.ts'
import { type ServedApp, serveTestApp } from './browser.ts'

export const demoSignIn = (key: string) => ({
  email: `${key}@quillback.example`,
  password: demoPassword,
})

/** A worker on the served app's own clock and a fake that keeps nothing on disk. */
export function mailFor(app: ServedApp) {
  const fake = createFakeMailTransport({ dir: null })
  const worker = createMailWorker({
    db: app.db,
    clock: app.clock,
    transport: createTransport(fake),
    appUrl: app.url,
    mailFrom: app.env.mailFrom,
    log: app.log,
    events: app.events,
  })
  return { fake, worker }
}

/** The demo firm on a real port, one roof issued twice, its reminders sent for the day after. */
export async function serveDemo(now?: Date) {
  const app = await serveTestApp(now ? { now } : {})
  await seedDemo(app.db, app.clock)
  // The studio came out wider than its plan.
  reviseRoof(app, 'QR-103', { widthMm: '6400' })
  const mail = mailFor(app)
  // Half past three, for the reminders of the day after to have gone.
  app.clock.current = new Date(app.clock.current.getTime() + 5.5 * 3_600_000)
  await mail.worker.runOnce()
  return { ...app, mail }
}

type Db = ServedApp['db']

export function jobIdOf(db: Db, number: string): string {
  return db.select({ id: jobs.id }).from(jobs).where(eq(jobs.number, number)).get()?.id ?? ''
}

export function bookingIdOf(db: Db, number: string): string {
  return (
    db
      .select({ id: bookings.id })
      .from(bookings)
      .where(eq(bookings.jobId, jobIdOf(db, number)))
      .get()?.id ?? ''
  )
}

export function dayIdOf(db: Db, number: string, day: string): string {
  const rows = db
    .select({ id: bookingDays.id, day: bookingDays.day })
    .from(bookingDays)
    .where(eq(bookingDays.bookingId, bookingIdOf(db, number)))
    .all()
  return rows.find((row) => row.day === day)?.id ?? ''
}

export function personIdOf(db: Db, key: string): string {
  const { email } = demoSignIn(key)
  return db.select({ id: people.id }).from(people).where(eq(people.email, email)).get()?.id ?? ''
}

export function crewIdOf(db: Db, letter: string): string {
  return db.select({ id: crews.id }).from(crews).where(eq(crews.letter, letter)).get()?.id ?? ''
}

/** The roof of a job issued once more, with a field or two typed anew. */
export function reviseRoof(app: ServedApp, number: string, texts: Record<string, string>): void {
  const jobId = jobIdOf(app.db, number)
  const user: CurrentUser = {
    ...demoSignIn('marnie'),
    id: personIdOf(app.db, 'marnie'),
    name: 'Marnie Quill',
    role: 'office',
  }
  const draft = app.db.select().from(roofDrafts).where(eq(roofDrafts.jobId, jobId)).get()
  if (!draft) throw new Error(`${number} has no roof.`)
  const form = Object.entries(texts).reduce(
    (typed, [path, text]) => withText(typed, path, text),
    roofFormSchema.parse(draft.form),
  )
  saveDraft(app, user, jobId, { form, version: draft.version })
  issueAtOnce({ ...app, takeRevision }, { user, jobId, version: draft.version + 1 })
}

/** The newest mail. */
export function messageIdOf(db: Db): string {
  return db.select({ id: outbox.id }).from(outbox).orderBy(desc(outbox.createdAt)).get()?.id ?? ''
}

/** A task of the day that a person was handed. */
export function taskIdOf(db: Db, email: string, dayId: string): string {
  const person = db.select({ id: people.id }).from(people).where(eq(people.email, email)).get()
  const rows = db
    .select({
      id: tasks.id,
      who: tasks.assignedToId,
      mark: tasks.cutLineMark,
      position: tasks.position,
    })
    .from(tasks)
    .where(eq(tasks.bookingDayId, dayId))
    .orderBy(asc(tasks.position))
    .all()
  return rows.find((row) => row.who === person?.id && row.mark !== null)?.id ?? ''
}
