import { asc, eq } from 'drizzle-orm'
import type { Booking } from '../../shared/bookings/calendar-schemas.ts'
import { roofGlyphOf } from '../../shared/drawing/roof-glyph.ts'
import { frameRoof } from '../../shared/roof/frame-roof.ts'
import { defaultSettings } from '../../shared/roof/roof-settings.ts'
import type { FrameSpec, Roof } from '../../shared/roof/roof-types.ts'
import { bookingDays, tasks, ticks } from '../../server/db/tables/booking-tables.ts'
import { roofRevisions } from '../../server/db/tables/job-tables.ts'
import { tickets } from '../../server/db/tables/people-tables.ts'
import { newId } from '../../server/lib/ids.ts'
import { makeRoof } from '../roof/support/roofs.ts'
import { type Agent, createTestApp } from './harness.ts'
import { jobKit } from './jobs-kit.ts'

/** The tests stand on Wed 2 Dec 2026, 10:00 in Brisbane. */
export const wed = '2026-12-02'
export const thu = '2026-12-03'
export const fri = '2026-12-04'
export const sat = '2026-12-05'
export const mon = '2026-12-07'
export const tue = '2026-12-08'

export const hipRoof = (pitchDeg = 25, longMm = 15_000, wideMm = 9_000): Roof =>
  makeRoof(
    [
      [0, 0],
      [longMm, 0],
      [longMm, wideMm],
      [0, wideMm],
    ],
    [pitchDeg, pitchDeg, pitchDeg, pitchDeg],
  )

const framed = new Map<string, FrameSpec>()

function frameOnce(roof: Roof): FrameSpec {
  const key = JSON.stringify(roof)
  const spec = framed.get(key) ?? frameRoof(roof)
  framed.set(key, spec)
  return spec
}

/** Office and two crews; two won jobs with a 15.0 × 9.0 m hip roof, one won without a roof. */
export async function bookingFirm() {
  const app = await createTestApp()
  const kit = jobKit(app)
  const office = app.addPerson('office', 'Orla Brandt')
  const lead = app.addPerson('leading-hand', 'Tamsin Rook')
  const apprentice = app.addPerson('apprentice', 'Wim Casey')
  const otherLead = app.addPerson('leading-hand', 'Bex Arden')
  const crew = app.addCrew('Plumb crew', [lead.id, apprentice.id])
  const otherCrew = app.addCrew('Rafter crew', [otherLead.id])
  const heights = [lead, apprentice, otherLead].map((person) => ({
    id: newId(),
    personId: person.id,
    kind: 'working-at-heights' as const,
    expiresOn: '2028-06-30',
  }))
  app.db.insert(tickets).values(heights).run()
  const won = { acceptedOn: '2026-11-20' }
  const hillJob = kit.addJob({ number: 'QR-1', title: 'Hill house', ...won })
  const creekJob = kit.addJob({ number: 'QR-2', title: 'Creek shed', wantedBy: mon, ...won })
  const bareJob = kit.addJob({ number: 'QR-3', title: 'No plan yet', ...won })

  function issue(jobId: string, sequence: number, roof: Roof): string {
    const id = newId()
    const spec = frameOnce(roof)
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
        engineVersion: '1',
        inputHash: id,
        issuedAt: app.clock.current,
        issuedById: office.id,
      })
      .run()
    return id
  }
  const hillRevision = issue(hillJob, 1, hipRoof())
  const creekRevision = issue(creekJob, 1, hipRoof(30))
  const officeAgent = await app.agentFor(office.email)

  async function book(changes: Record<string, unknown> = {}, agent: Agent = officeAgent) {
    const body = {
      clientId: newId(),
      jobId: hillJob,
      crewId: crew.id,
      startsOn: thu,
      state: 'pencilled',
      ...changes,
    }
    return agent.post('/api/bookings').send(body)
  }

  async function booked(changes: Record<string, unknown> = {}): Promise<Booking> {
    const answer = await book(changes)
    if (answer.status !== 201) throw new Error(JSON.stringify(answer.body))
    return answer.body as Booking
  }

  const taskRows = (bookingId: string) =>
    app.db
      .select({ task: tasks, day: bookingDays.day, revisionId: bookingDays.revisionId })
      .from(tasks)
      .innerJoin(bookingDays, eq(bookingDays.id, tasks.bookingDayId))
      .where(eq(bookingDays.bookingId, bookingId))
      .orderBy(asc(bookingDays.day), asc(tasks.position))
      .all()

  /** One piece of a task done. */
  function tick(taskId: string, delta = 1): void {
    const row = { id: newId(), taskId, personId: lead.id, delta, at: app.clock.current }
    app.db.insert(ticks).values(row).run()
  }

  return {
    app,
    kit,
    people: { office, lead, apprentice, otherLead },
    crew,
    otherCrew,
    jobs: { hillJob, creekJob, bareJob },
    revisions: { hillRevision, creekRevision },
    officeAgent,
    book,
    booked,
    issue,
    taskRows,
    tick,
  }
}

export const daysOf = (booking: { days: { day: string }[] }): string[] =>
  booking.days.map((d) => d.day)
