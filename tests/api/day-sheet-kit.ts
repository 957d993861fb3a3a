import { eq } from 'drizzle-orm'
import { bookingDays, tasks } from '../../server/db/tables/booking-tables.ts'
import { roofRevisions } from '../../server/db/tables/job-tables.ts'
import { newId } from '../../server/lib/ids.ts'
import { createTestApp } from './harness.ts'
import { jobKit } from './jobs-kit.ts'

export type TaskRow = typeof tasks.$inferInsert

/** Wed 2 Dec 2026 is the day the tests stand on; the crew is booked Tue, Wed, Thu and the next Mon. */
export const days = {
  tuesday: '2026-12-01',
  wednesday: '2026-12-02',
  thursday: '2026-12-03',
  monday: '2026-12-07',
}

/** One crew on a 9.0 × 6.0 m hip roof, another crew that has nothing to do with it. */
export async function crewOnSite() {
  const app = await createTestApp()
  const kit = jobKit(app)
  const office = app.addPerson('office', 'Orla Brandt')
  const lead = app.addPerson('leading-hand', 'Tamsin Rook')
  const apprentice = app.addPerson('apprentice', 'Wim Casey')
  const otherLead = app.addPerson('leading-hand', 'Bex Arden')
  const otherApprentice = app.addPerson('apprentice', 'Ned Farrow')
  const crew = app.addCrew('Ridge crew', [lead.id, apprentice.id])
  const otherCrew = app.addCrew('Valley crew', [otherLead.id, otherApprentice.id])
  const jobId = kit.addJob({
    title: 'House at Lot 12',
    siteAddress: '12 Lantern Street, Marrow Creek',
    siteContactName: 'Pella Vance',
    siteContactPhone: '0491 570 156',
    customerName: 'Osric Hale',
    customerPhone: '0491 570 157',
    priceCents: 1_845_050,
    notes: 'Slow payer',
    crewNotes: 'Dog in the yard',
  })
  const revisionId = kit.addRevision(jobId, office.id)
  const booking = kit.addBooking(jobId, crew.id, Object.values(days))
  app.db.update(bookingDays).set({ revisionId }).run()
  const spec = app.db.select().from(roofRevisions).where(eq(roofRevisions.id, revisionId)).get()!
    .spec
  const [tuesday, wednesday, thursday, monday] = booking.dayIds as [string, string, string, string]

  function addTask(bookingDayId: string, changes: Partial<TaskRow> = {}): string {
    const id = newId()
    const line = spec.cutLines.find((one) => one.role === 'common')!
    app.db
      .insert(tasks)
      .values({
        id,
        bookingDayId,
        position: 0,
        packageKey: 'cut-commons',
        work: 'cut',
        cutLineMark: line.mark,
        memberMarks: line.members.slice(0, 3),
        title: `Cut common rafters ${line.mark}`,
        quantity: 3,
        plannedMinutes: 21,
        ...changes,
      })
      .run()
    return id
  }

  return {
    app,
    kit,
    spec,
    people: { office, lead, apprentice, otherLead, otherApprentice },
    crew,
    otherCrew,
    jobId,
    revisionId,
    booking,
    dayIds: { tuesday, wednesday, thursday, monday },
    addTask,
    tick: () => ({ id: newId(), delta: 1 }),
  }
}
