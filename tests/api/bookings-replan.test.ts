import { eq } from 'drizzle-orm'
import { expect, test } from 'vitest'
import { comparisonSchema } from '../../shared/revisions/comparison-schemas.ts'
import type { Issued } from '../../shared/revisions/revision-schemas.ts'
import { replanBooking, replanUpcoming, takeRevision } from '../../server/bookings/replan.ts'
import { bookings, tasks } from '../../server/db/tables/booking-tables.ts'
import { leave } from '../../server/db/tables/people-tables.ts'
import { newId } from '../../server/lib/ids.ts'
import { rosterOf } from '../../server/people/roster.ts'
import { readCrewHours } from '../../server/bookings/crew-hours.ts'
import { typedForm } from '../revisions/typed-form.ts'
import { bookingFirm, fri, hipRoof, mon, thu, wed } from './booking-kit.ts'

const nextMorning = new Date('2026-12-02T20:00:00Z')

test('a new revision is taken by the days not worked, and worked days keep what they were cut to', async () => {
  const firm = await bookingFirm()
  const { db, clock } = firm.app
  const booking = await firm.booked({ startsOn: wed, workingDays: 3 })
  const before = firm.taskRows(booking.id)
  firm.tick(before[0]!.task.id)
  const revisionId = firm.issue(firm.jobs.hillJob, 2, hipRoof(27.5))
  const taken = db.transaction((tx) => takeRevision(tx, firm.jobs.hillJob, revisionId, clock.now()))
  expect(taken).toEqual({ daysTaken: 2, cutButUnused: [] })
  const after = firm.taskRows(booking.id)
  const onWed = (rows: typeof before) => rows.filter((r) => r.day === wed)
  expect(onWed(after)).toEqual(onWed(before))
  expect(onWed(after)[0]!.revisionId).toBe(firm.revisions.hillRevision)
  const ahead = after.filter((r) => r.day > wed)
  expect(ahead.length).toBeGreaterThan(0)
  expect(new Set(ahead.map((r) => r.revisionId))).toEqual(new Set([revisionId]))
})

test('pieces already cut that no longer fit are listed, and cut anew to the new revision', async () => {
  const firm = await bookingFirm()
  const { db, clock } = firm.app
  const booking = await firm.booked({ startsOn: wed, workingDays: 3 })
  const commons = firm
    .taskRows(booking.id)
    .find((r) => r.task.work === 'cut' && r.task.packageKey === 'cut-commons')!
  firm.tick(commons.task.id, 2)
  const revisionId = firm.issue(firm.jobs.hillJob, 2, hipRoof(27.5))
  const taken = db.transaction((tx) => takeRevision(tx, firm.jobs.hillJob, revisionId, clock.now()))
  expect(taken.cutButUnused).toEqual([
    { revisionId: firm.revisions.hillRevision, marks: commons.task.memberMarks.slice(0, 2) },
  ])
})

test('the office is told which cut pieces a new revision has no place for, and which one they were cut to', async () => {
  const firm = await bookingFirm()
  const issue = async (version: number, pitchDeg: string) => {
    const form = typedForm('rectangle', { pitchDeg })
    const at = `/api/jobs/${firm.jobs.bareJob}`
    await firm.officeAgent.put(`${at}/roof`).send({ form, version }).expect(200)
    const answer = await firm.officeAgent
      .post(`${at}/revisions`)
      .send({ version: version + 1 })
      .expect(201)
    return answer.body as Issued
  }
  expect((await issue(0, '25')).cutButUnused).toEqual([])
  const booking = await firm.booked({ jobId: firm.jobs.bareJob, startsOn: wed, workingDays: 3 })
  const commons = firm
    .taskRows(booking.id)
    .find((r) => r.task.work === 'cut' && r.task.packageKey === 'cut-commons')!
  firm.tick(commons.task.id, 2)
  const marks = commons.task.memberMarks.slice(0, 2)
  expect((await issue(1, '30')).cutButUnused).toEqual([{ letter: 'A', marks }])
  // The same can be read again at any time, whichever way round the two are asked for.
  const at = `/api/jobs/${firm.jobs.bareJob}/revisions`
  const compared = comparisonSchema.parse(
    (await firm.officeAgent.get(`${at}/A/against/B`).expect(200)).body,
  )
  expect([compared.before.letter, compared.after.letter]).toEqual(['A', 'B'])
  expect(compared.cutButUnused).toEqual([{ letter: 'A', marks }])
  expect(compared.lines.find((line) => line.role === 'common')?.kind).toBe('longer')
  await firm.officeAgent.get(`${at}/A/against/C`).expect(404)
})

test('a revision that leaves a line alike keeps what was cut of it', async () => {
  const firm = await bookingFirm()
  const { db, clock } = firm.app
  const booking = await firm.booked({ startsOn: wed, workingDays: 3 })
  const commons = firm
    .taskRows(booking.id)
    .find((r) => r.task.work === 'cut' && r.task.packageKey === 'cut-commons')!
  firm.tick(commons.task.id, 3)
  // Longer by two metres: the commons stay what they were.
  const revisionId = firm.issue(firm.jobs.hillJob, 2, hipRoof(25, 17_000))
  const taken = db.transaction((tx) => takeRevision(tx, firm.jobs.hillJob, revisionId, clock.now()))
  expect(taken.cutButUnused).toEqual([])
})

test('the first roof issued fills the days of a pencilled booking', async () => {
  const firm = await bookingFirm()
  const { db, clock } = firm.app
  const booking = await firm.booked({ jobId: firm.jobs.bareJob, workingDays: 2 })
  expect(firm.taskRows(booking.id)).toEqual([])
  const revisionId = firm.issue(firm.jobs.bareJob, 1, hipRoof())
  db.transaction((tx) => takeRevision(tx, firm.jobs.bareJob, revisionId, clock.now()))
  const seen = await firm.officeAgent.get(`/api/bookings/${booking.id}`).expect(200)
  expect(seen.body.days[0]).toMatchObject({ revisionLetter: 'A', flags: [] })
  expect(firm.taskRows(booking.id).length).toBeGreaterThan(5)
})

test('leave shortens the day, and what it held goes on to the next', async () => {
  const firm = await bookingFirm()
  const { db, clock } = firm.app
  const booking = await firm.booked({ workingDays: 3 })
  db.insert(leave)
    .values({ id: newId(), personId: firm.people.apprentice.id, startsOn: thu, endsOn: fri })
    .run()
  db.transaction((tx) => replanUpcoming(tx, clock.now()))
  const minutesOn = (day: string) =>
    firm
      .taskRows(booking.id)
      .filter((r) => r.day === day)
      .reduce((sum, r) => sum + r.task.plannedMinutes, 0)
  expect(minutesOn(thu)).toBeLessThanOrEqual(480)
  expect(minutesOn(mon)).toBeGreaterThan(0)
})

test('a started day is frozen when the crew shrinks', async () => {
  const firm = await bookingFirm()
  const { db, clock } = firm.app
  const booking = await firm.booked({ startsOn: wed, workingDays: 3 })
  const before = firm.taskRows(booking.id).filter((r) => r.day === wed)
  firm.tick(before[1]!.task.id)
  db.insert(leave)
    .values({ id: newId(), personId: firm.people.apprentice.id, startsOn: wed, endsOn: fri })
    .run()
  db.transaction((tx) => replanBooking(tx, booking.id, clock.now()))
  expect(firm.taskRows(booking.id).filter((r) => r.day === wed)).toEqual(before)
})

test('the morning after, what was not ticked is planned again and what was ticked is not', async () => {
  const firm = await bookingFirm()
  const { db, clock } = firm.app
  const booking = await firm.booked({ startsOn: wed, workingDays: 3 })
  const commons = firm
    .taskRows(booking.id)
    .find((r) => r.task.work === 'cut' && r.task.packageKey === 'cut-commons')!
  firm.tick(commons.task.id, 3)
  clock.current = nextMorning
  db.transaction((tx) => replanUpcoming(tx, clock.now()))
  const again = firm
    .taskRows(booking.id)
    .filter((r) => r.day > wed && r.task.work === 'cut')
    .flatMap((r) => r.task.memberMarks)
  const [done, open] = [commons.task.memberMarks.slice(0, 3), commons.task.memberMarks.slice(3)]
  expect(again).toEqual(expect.arrayContaining(open))
  expect(again.filter((mark) => done.includes(mark))).toEqual([])
})

test('planning again with nothing changed touches no row', async () => {
  const firm = await bookingFirm()
  const { db, clock } = firm.app
  const booking = await firm.booked()
  const before = firm.taskRows(booking.id)
  db.transaction((tx) => replanUpcoming(tx, clock.now()))
  expect(firm.taskRows(booking.id)).toEqual(before)
  expect(db.select().from(bookings).where(eq(bookings.id, booking.id)).get()!.version).toBe(1)
})

test('cancelling one of two bookings of a job hands its work to the other', async () => {
  const firm = await bookingFirm()
  const first = await firm.booked({ workingDays: 1 })
  const second = await firm.booked({ crewId: firm.otherCrew.id, startsOn: mon, workingDays: 1 })
  expect(firm.taskRows(second.id)[0]!.task.packageKey).not.toBe('set-out-plates')
  await firm.officeAgent.post(`/api/bookings/${first.id}/cancel`).send({ version: 1 }).expect(200)
  expect(firm.taskRows(second.id)[0]!.task.packageKey).toBe('set-out-plates')
  const left = firm.app.db.select({ id: tasks.id }).from(tasks).all()
  expect(left.length).toBeGreaterThan(0)
})

test('the hours of a crew agree with its roster on every day of a span', async () => {
  const firm = await bookingFirm()
  const { db } = firm.app
  db.insert(leave)
    .values({ id: newId(), personId: firm.people.lead.id, startsOn: thu, endsOn: fri })
    .run()
  const hours = readCrewHours(
    db,
    { from: wed, to: mon },
    { hoursPerDay: 7.6, workingWeekdays: [1, 2, 3, 4, 5], weekHours: null },
  )
  for (const day of [wed, thu, fri, mon]) {
    const roster = rosterOf(db, firm.crew.id, day)
    const there = roster.filter((p) => !p.onLeave)
    expect(hours.on(firm.crew.id, day)).toEqual({
      thereIds: expect.arrayContaining(there.map((p) => p.id)) as string[],
      away: roster.filter((p) => p.onLeave).map((p) => p.name),
      minutes: Math.round(there.length * 7.6 * 60),
    })
  }
})
