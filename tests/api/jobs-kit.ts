import { roofGlyphOf } from '../../shared/drawing/roof-glyph.ts'
import { frameRoof } from '../../shared/roof/frame-roof.ts'
import { defaultSettings } from '../../shared/roof/roof-settings.ts'
import { bookingDays, bookings, tasks, ticks } from '../../server/db/tables/booking-tables.ts'
import { jobs, plateChecks, roofDrafts, roofRevisions } from '../../server/db/tables/job-tables.ts'
import { newId } from '../../server/lib/ids.ts'
import { makeRoof } from '../roof/support/roofs.ts'
import type { TestApp } from './harness.ts'

type Row = typeof jobs.$inferInsert

/** Rows straight into the tables, as the other parts of the program leave them. */
export function jobKit(app: TestApp) {
  const now = () => app.clock.current

  function addJob(changes: Partial<Row> = {}): string {
    const id = newId()
    const row = { id, number: id.slice(0, 8), title: 'House', covering: 'tiles' as const }
    app.db
      .insert(jobs)
      .values({ ...row, createdAt: now(), updatedAt: now(), ...changes })
      .run()
    return changes.id ?? id
  }

  function addBooking(
    jobId: string,
    crewId: string,
    days: string[],
    state: 'pencilled' | 'firm' = 'firm',
  ): { id: string; dayIds: string[] } {
    const id = newId()
    app.db
      .insert(bookings)
      .values({ id, jobId, crewId, state, uid: id, createdAt: now(), updatedAt: now() })
      .run()
    const dayIds = days.map((day) => {
      const dayId = newId()
      app.db.insert(bookingDays).values({ id: dayId, bookingId: id, day }).run()
      return dayId
    })
    return { id, dayIds }
  }

  function addRevision(jobId: string, issuedById: string, sequence = 1): string {
    const id = newId()
    const roof = makeRoof(
      [
        [0, 0],
        [9000, 0],
        [9000, 6000],
        [0, 6000],
      ],
      [25, 25, 25, 25],
    )
    const spec = frameRoof(roof)
    app.db
      .insert(roofRevisions)
      .values({
        id,
        jobId,
        sequence,
        letter: String.fromCharCode(64 + sequence),
        roof,
        settings: defaultSettings,
        spec,
        glyph: roofGlyphOf(spec, roof),
        engineVersion: 'test',
        inputHash: id,
        issuedAt: now(),
        issuedById,
      })
      .run()
    return id
  }

  function addDraft(jobId: string, updatedAt: Date): void {
    app.db.insert(roofDrafts).values({ jobId, form: {}, updatedAt }).run()
  }

  function addPlateCheck(jobId: string, revisionId: string, takenById: string): void {
    app.db
      .insert(plateChecks)
      .values({
        id: newId(),
        jobId,
        revisionId,
        sidesMm: [9000, 6000, 9000, 6000],
        diagonals: [],
        takenById,
        takenAt: now(),
      })
      .run()
  }

  function addTick(bookingDayId: string, personId: string): void {
    const taskId = newId()
    app.db
      .insert(tasks)
      .values({
        id: taskId,
        bookingDayId,
        position: 1,
        packageKey: 'set-out',
        work: 'set-out',
        cutLineMark: null,
        memberMarks: [],
        title: 'Set out plates',
        quantity: 1,
        plannedMinutes: 60,
      })
      .run()
    app.db.insert(ticks).values({ id: newId(), taskId, personId, delta: 1, at: now() }).run()
  }

  return { addJob, addBooking, addRevision, addDraft, addPlateCheck, addTick }
}

/** A body the office would send for a new job. */
export function newJobBody(changes: Record<string, unknown> = {}): Record<string, unknown> {
  return {
    id: newId(),
    title: 'House, Lot 12',
    covering: 'tiles',
    siteAddress: '12 Lantern Street, Marrow Creek',
    siteContactName: 'Pella Vance',
    siteContactPhone: '0491 570 156',
    customerName: 'Osric Hale',
    customerPhone: '0491 570 157',
    customerEmail: 'Osric.Hale@hale.example',
    price: '$18,450.50',
    wantedBy: '2026-12-18',
    notes: 'Wants a call before delivery',
    crewNotes: 'Dog in the yard',
    ...changes,
  }
}
