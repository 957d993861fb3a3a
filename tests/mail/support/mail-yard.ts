import { eq } from 'drizzle-orm'
import { createTransport } from 'nodemailer'
import { createFakeMailTransport } from '../../../fakes/mail/fake-mail-transport.ts'
import { bookingDays, bookings, tasks } from '../../../server/db/tables/booking-tables.ts'
import { firm } from '../../../server/db/tables/firm-tables.ts'
import { jobs, roofRevisions } from '../../../server/db/tables/job-tables.ts'
import { outbox } from '../../../server/db/tables/mail-tables.ts'
import { crewMembers, leave, people } from '../../../server/db/tables/people-tables.ts'
import { newId } from '../../../server/lib/ids.ts'
import { createMailWorker } from '../../../server/mail/mail-worker.ts'
import type { MailTransport } from '../../../server/mail/transport.ts'
import { roofGlyphOf } from '../../../shared/drawing/roof-glyph.ts'
import { frameRoof } from '../../../shared/roof/frame-roof.ts'
import { defaultSettings } from '../../../shared/roof/roof-settings.ts'
import type { FrameSpec } from '../../../shared/roof/roof-types.ts'
import { createTestApp } from '../../api/harness.ts'
import { makeRoof } from '../../roof/support/roofs.ts'

export type MailYard = Awaited<ReturnType<typeof createMailYard>>
export type Work = 'set-out' | 'cut' | 'stand'

/** Brisbane has no summer time; Wed 2 Dec 2026, 10:00 there unless told otherwise. */
const usualNow = new Date('2026-12-02T00:00:00Z')

/** A firm with one crew of two, one job with an issued 9.0 × 6.0 m hip roof, and a worker with a fake server. */
export async function createMailYard(options: { now?: Date; timeZone?: string } = {}) {
  const app = await createTestApp({ now: options.now ?? usualNow })
  const { db, clock } = app
  if (options.timeZone)
    db.update(firm).set({ timeZone: options.timeZone }).where(eq(firm.id, 1)).run()

  const office = app.addPerson('office', 'Orla Brandt')
  const lead = app.addPerson('leading-hand', 'Tamsin Rook')
  const apprentice = app.addPerson('apprentice', 'Bede Farrow')
  const crew = app.addCrew('Amber', [lead.id, apprentice.id])
  const otherHand = app.addPerson('leading-hand', 'Ivo Lark')
  const otherCrew = app.addCrew('Birch', [otherHand.id])

  const fake = createFakeMailTransport({ dir: null })

  function worker(transport: MailTransport = createTransport(fake)) {
    return createMailWorker({
      db,
      clock,
      transport,
      appUrl: app.env.appUrl,
      mailFrom: app.env.mailFrom,
      log: app.log,
      events: app.events,
    })
  }

  function addJob(changes: Partial<typeof jobs.$inferInsert> = {}): string {
    const id = newId()
    db.insert(jobs)
      .values({
        id,
        number: `QR-${100 + db.select().from(jobs).all().length}`,
        title: 'Hip roof',
        siteAddress: '12 Kiln Road, Marrow Creek',
        accessNotes: 'Gate on the left',
        siteContactName: 'Nell Ashby',
        siteContactPhone: '07 5550 1234',
        covering: 'tiles',
        createdAt: clock.current,
        updatedAt: clock.current,
        ...changes,
      })
      .run()
    return id
  }

  function addRevision(
    jobId: string,
    sequence = 1,
    pitchDeg = 25,
  ): { id: string; spec: FrameSpec } {
    const id = newId()
    const corners: [number, number][] = [
      [0, 0],
      [9000, 0],
      [9000, 6000],
      [0, 6000],
    ]
    const roof = makeRoof(corners, [pitchDeg, pitchDeg, pitchDeg, pitchDeg])
    const spec = frameRoof(roof)
    const letter = String.fromCharCode(64 + sequence)
    db.insert(roofRevisions)
      .values({
        id,
        jobId,
        sequence,
        letter,
        roof,
        settings: defaultSettings,
        spec,
        glyph: roofGlyphOf(spec, roof),
        engineVersion: 'test',
        inputHash: id,
        issuedAt: clock.current,
        issuedById: office.id,
      })
      .run()
    return { id, spec }
  }

  const job = addJob()
  const revision = addRevision(job)

  function addTask(dayId: string, work: Work, mark: string | null, spec = revision.spec): string {
    const id = newId()
    const line = spec.cutLines.find((one) => one.mark === mark)
    db.insert(tasks)
      .values({
        id,
        bookingDayId: dayId,
        position: db.select().from(tasks).all().length,
        packageKey: work,
        work,
        cutLineMark: mark,
        memberMarks: line?.members ?? [],
        title: mark === null ? 'Set out the plates' : `${work} ${mark}`,
        quantity: line?.quantity ?? 1,
        plannedMinutes: 30,
      })
      .run()
    return id
  }

  function addDay(bookingId: string, day: string, revisionId: string | null): string {
    const id = newId()
    db.insert(bookingDays).values({ id, bookingId, day, revisionId }).run()
    return id
  }

  /** A booking of the job; every line of the cut list is cut on its first day and stood on its last. */
  function book(
    days: string[],
    changes: Partial<typeof bookings.$inferInsert> = {},
  ): { id: string; dayIds: string[] } {
    const id = newId()
    db.insert(bookings)
      .values({
        id,
        jobId: job,
        crewId: crew.id,
        state: 'firm',
        uid: id,
        createdAt: clock.current,
        updatedAt: clock.current,
        ...changes,
      })
      .run()
    const dayIds = days.map((day) => addDay(id, day, revision.id))
    const [first, last] = [dayIds[0], dayIds[dayIds.length - 1]]
    if (first && last) {
      addTask(first, 'set-out', null)
      for (const line of revision.spec.cutLines) {
        addTask(first, 'cut', line.mark)
        addTask(last, 'stand', line.mark)
      }
    }
    return { id, dayIds }
  }

  const mails = () => db.select().from(outbox).all()

  return {
    ...app,
    office,
    lead,
    apprentice,
    otherHand,
    crew,
    otherCrew,
    fake,
    worker,
    job,
    revision,
    addJob,
    addRevision,
    addTask,
    addDay,
    book,
    mails,
    mailOf: (key: string) => mails().find((mail) => mail.key === key),
    failMail: (key: string) =>
      db.update(outbox).set({ state: 'failed', attempts: 21 }).where(eq(outbox.key, key)).run(),
    setFirm: (change: Partial<typeof firm.$inferInsert>) =>
      db.update(firm).set(change).where(eq(firm.id, 1)).run(),
    setBooking: (id: string, change: Partial<typeof bookings.$inferInsert>) =>
      db.update(bookings).set(change).where(eq(bookings.id, id)).run(),
    moveDay: (dayId: string, day: string) =>
      db.update(bookingDays).set({ day }).where(eq(bookingDays.id, dayId)).run(),
    putOnLeave: (personId: string, day: string) =>
      db.insert(leave).values({ id: newId(), personId, startsOn: day, endsOn: day }).run(),
    setPerson: (id: string, change: Partial<typeof people.$inferInsert>) =>
      db.update(people).set(change).where(eq(people.id, id)).run(),
    joinCrew: (crewId: string, personId: string) =>
      db
        .insert(crewMembers)
        .values({ id: newId(), crewId, personId, startsOn: '2026-01-01', endsOn: null })
        .run(),
    at: (instant: string) => {
      clock.current = new Date(instant)
    },
    sentTo: (email: string) => fake.sent.filter((mail) => mail.to === email),
  }
}
