import { eq } from 'drizzle-orm'
import fc from 'fast-check'
import { createBookingService } from '../../server/bookings/booking-service.ts'
import { createCalendarService } from '../../server/bookings/calendar-service.ts'
import { readJobDays, readJobTasks } from '../../server/bookings/job-plan-store.ts'
import { replanJob } from '../../server/bookings/replan.ts'
import { bookingDays, bookings, tasks, ticks } from '../../server/db/tables/booking-tables.ts'
import { firm as firmTable } from '../../server/db/tables/firm-tables.ts'
import { roofRevisions } from '../../server/db/tables/job-tables.ts'
import { crewLoans, crewMembers, leave, people } from '../../server/db/tables/people-tables.ts'
import { rainOffs } from '../../server/db/tables/rain-off-tables.ts'
import { AppError } from '../../server/http/app-error.ts'
import { newId } from '../../server/lib/ids.ts'
import { createRainOffService } from '../../server/rain-offs/rain-off-service.ts'
import { dayPlus, isoWeekday } from '../../shared/calendar/days.ts'
import { roofGlyphOf } from '../../shared/drawing/roof-glyph.ts'
import { defaultLabourRates } from '../../shared/labour/default-labour-rates.ts'
import { packageKeys } from '../../shared/labour/work-step.ts'
import { defaultSettings } from '../../shared/roof/roof-settings.ts'
import type { FrameSpec } from '../../shared/roof/roof-types.ts'
import { createTestApp } from '../api/harness.ts'
import { jobKit } from '../api/jobs-kit.ts'
import { framedOnce } from '../roof/support/framed.ts'
import { lPlan, rectangle } from '../roof/support/plans.ts'
import { makeRoof } from '../roof/support/roofs.ts'
import type { SeenDay, SeenFirm, SeenJob, SeenTask } from './plan-rules.ts'

/** Wed 16 Dec 2026, 10:00 in Brisbane: Christmas lies ahead. */
const now = new Date('2026-12-16T00:00:00Z')
const today = '2026-12-16'

/** Source: Holidays Act 1983 (Qld), as in tests/calendar/public-holidays.test.ts; New Year's Day is in it too. */
const queenslandHolidays = ['2026-12-25', '2026-12-26', '2026-12-28', '2027-01-01']

const plan = rectangle(9000, 6000)
/** Real roofs; the last of each row is the one that a revision makes of it. */
const roofs = [
  [makeRoof(plan, [25, 25, 25, 25]), makeRoof(rectangle(9600, 6000), [25, 25, 25, 25])],
  [makeRoof(plan, [30, 'gable', 30, 'gable']), makeRoof(plan, [32, 'gable', 32, 'gable'])],
  [makeRoof(lPlan, [25, 25, 25, 25, 25, 25]), makeRoof(lPlan, [25, 'gable', 25, 25, 25, 25])],
] as const
const jobCount = roofs.length
const personCount = 6
const crewCount = 3

const ahead = (max: number) => fc.integer({ min: 0, max }).map((days) => dayPlus(today, days))
const aPerson = fc.nat(personCount - 1)
const aCrew = fc.nat(crewCount - 1)

export const aRandomFirm = fc.record({
  /** Which crew each person is in. */
  crewOf: fc.array(aCrew, { minLength: personCount, maxLength: personCount }),
  weekHours: fc.array(fc.option(fc.constant<number[]>([8, 8, 8, 8, 6, 4, 0])), {
    minLength: personCount,
    maxLength: personCount,
  }),
  leave: fc.array(
    fc.record({
      person: aPerson,
      startsOn: ahead(12),
      days: fc.nat(5),
      weekdays: fc.constantFrom<(number[] | null)[]>(null, null, [3], [1, 5]),
    }),
    { maxLength: 5 },
  ),
  loans: fc.uniqueArray(fc.record({ person: aPerson, crew: aCrew, day: ahead(14) }), {
    maxLength: 3,
    selector: ({ person, day }) => `${person} ${day}`,
  }),
  closed: fc.uniqueArray(ahead(18), { maxLength: 3 }),
  keepsHolidays: fc.boolean(),
  workingWeekdays: fc.constantFrom<number[][]>([1, 2, 3, 4, 5], [1, 2, 3, 4, 5, 6], [2, 3, 4]),
  startUpMinutes: fc.constantFrom(0, 0, 20),
  packageMinutes: fc.constantFrom(0, 25),
  bookings: fc.array(
    fc.record({
      job: fc.nat(jobCount - 1),
      crew: aCrew,
      startsOn: ahead(14),
      workingDays: fc.integer({ min: 1, max: 4 }),
    }),
    { minLength: 2, maxLength: 6 },
  ),
  /** Ticks on the tasks of the first booked days, and whom tasks are given to. */
  ticks: fc.array(fc.record({ task: fc.nat(12), pieces: fc.integer({ min: 1, max: 5 }) }), {
    maxLength: 4,
  }),
  given: fc.array(aPerson, { maxLength: 6 }),
})
export type RandomFirm = typeof aRandomFirm extends fc.Arbitrary<infer T> ? T : never

/** A firm of six people, three crews and three jobs with real roofs, to be laid out anew for each random one. */
export async function firmToLay() {
  const app = await createTestApp({ now })
  const kit = jobKit(app)
  const office = { ...app.addPerson('office', 'Orla Brandt'), role: 'office' as const }
  const peopleIds = Array.from(
    { length: personCount },
    (_, i) =>
      app.addPerson(i < crewCount ? 'leading-hand' : 'apprentice', `Hand ${'abcdef'[i]}`).id,
  )
  const crewIds = ['Adze crew', 'Batten crew', 'Cleat crew'].map((name) => app.addCrew(name, []).id)
  const jobIds = roofs.map((_, i) =>
    kit.addJob({ number: `QR-${i + 1}`, title: 'House', acceptedOn: '2026-11-20' }),
  )
  const specs = new Map<string, FrameSpec>()
  const calendar = createCalendarService(app.deps)
  const bookingService = createBookingService({ ...app.deps, calendar })
  const rain = createRainOffService({ ...app.deps, calendar })

  /** Revision A with sequence 1, B with 2. */
  function issue(job: number, sequence: 1 | 2): void {
    const roof = roofs[job]![sequence - 1]!
    const spec = framedOnce(roof)
    const id = newId()
    specs.set(id, spec)
    const letter = sequence === 1 ? 'A' : 'B'
    const jobId = jobIds[job]!
    const made = { id, jobId, sequence, letter, roof, spec, settings: defaultSettings }
    app.db
      .insert(roofRevisions)
      .values({
        ...made,
        glyph: roofGlyphOf(spec, roof),
        engineVersion: '1',
        inputHash: id,
        issuedAt: now,
        issuedById: office.id,
      })
      .run()
  }

  const tick = (taskId: string) =>
    app.db
      .insert(ticks)
      .values({ id: newId(), taskId, personId: peopleIds[0]!, delta: 1, at: now })
      .run()
  const replanAll = () => jobIds.forEach((id) => replanJob(app.db, id, app.clock.now()))

  function book(random: RandomFirm): void {
    for (const { job, crew, startsOn, workingDays } of random.bookings) {
      const what = { jobId: jobIds[job]!, crewId: crewIds[crew]!, startsOn, workingDays }
      const made = { clientId: newId(), state: 'pencilled' as const, clashReason: 'Two jobs' }
      try {
        bookingService.create(office, { ...what, ...made })
      } catch (error) {
        // A first day that is not worked is refused, and that booking is not made.
        if (!(error instanceof AppError) || error.code !== 'conflict') throw error
      }
    }
  }

  function lay(random: RandomFirm): void {
    const { db } = app
    app.clock.current = now
    for (const table of [
      rainOffs,
      ticks,
      tasks,
      bookingDays,
      bookings,
      leave,
      crewLoans,
      crewMembers,
    ])
      db.delete(table).run()
    db.delete(roofRevisions).run()
    specs.clear()
    jobIds.forEach((_, job) => issue(job, 1))
    const closedDays = random.closed.map((day) => ({ day, name: 'Closed' }))
    const packageMinutes = Object.fromEntries(
      packageKeys.map((key) => [key, random.packageMinutes]),
    ) as typeof defaultLabourRates.packageMinutes
    const { startUpMinutes, keepsHolidays, workingWeekdays } = random
    const labourRates = { ...defaultLabourRates, startUpMinutes, packageMinutes }
    const country = keepsHolidays ? { holidayCountry: 'AU', holidayState: 'QLD' } : {}
    const none = { holidayCountry: null, holidayState: null }
    db.update(firmTable)
      .set({ closedDays, workingWeekdays: [...workingWeekdays], labourRates, ...none, ...country })
      .run()
    for (const [i, personId] of peopleIds.entries()) {
      const [weekHours, crewId] = [random.weekHours[i] ?? null, crewIds[random.crewOf[i]!]!]
      db.update(people).set({ weekHours }).where(eq(people.id, personId)).run()
      const from = { startsOn: '2026-01-01', endsOn: null }
      db.insert(crewMembers)
        .values({ id: newId(), crewId, personId, ...from })
        .run()
    }
    for (const { person, crew, day } of random.loans)
      db.insert(crewLoans)
        .values({ id: newId(), personId: peopleIds[person]!, crewId: crewIds[crew]!, day })
        .run()
    for (const { person, startsOn, days, weekdays } of random.leave) {
      const span = {
        startsOn,
        endsOn: dayPlus(startsOn, days),
        weekdays: weekdays && [...weekdays],
      }
      db.insert(leave)
        .values({ id: newId(), personId: peopleIds[person]!, ...span })
        .run()
    }
    book(random)
    const laid = db.select({ id: tasks.id, quantity: tasks.quantity }).from(tasks)
    const rows = laid.innerJoin(bookingDays, eq(bookingDays.id, tasks.bookingDayId))
    const inOrder = rows.orderBy(bookingDays.day, tasks.position, tasks.id).all()
    for (const [i, person] of random.given.entries())
      db.update(tasks)
        .set({ assignedToId: peopleIds[person]! })
        .where(eq(tasks.id, inOrder[i]?.id ?? ''))
        .run()
    for (const { task, pieces } of random.ticks) {
      const row = inOrder[task]
      for (let i = 0; row && i < Math.min(pieces, row.quantity); i++) tick(row.id)
    }
    replanAll()
  }

  function seenTasks(jobId: string): SeenTask[] {
    const tickRows = app.db.select().from(ticks).orderBy(ticks.id).all()
    return readJobTasks(app.db, jobId).map((row) => {
      const own = tickRows.filter((each) => each.taskId === row.id)
      const { id, packageKey, work, memberMarks, plannedMinutes, assignedToId } = row
      return {
        ...{ id, dayId: row.bookingDayId, packageKey, work, memberMarks, plannedMinutes },
        assignedToId,
        ticked: own.reduce((sum, each) => sum + each.delta, 0),
        tickIds: own.map((each) => each.id),
      }
    })
  }

  function seenJob(job: number): SeenJob {
    const jobId = jobIds[job]!
    const all = seenTasks(jobId)
    const days = readJobDays(app.db, jobId).map(
      ({ id, bookingId, crewId, day, revisionId }): SeenDay => ({
        ...{ id, bookingId, crewId, day, revisionId },
        tasks: all.filter((t) => t.dayId === id),
      }),
    )
    const rows = app.db.select().from(bookings).where(eq(bookings.jobId, jobId)).all()
    const revisions = app.db
      .select({ id: roofRevisions.id })
      .from(roofRevisions)
      .where(eq(roofRevisions.jobId, jobId))
      .orderBy(roofRevisions.sequence)
      .all()
      .map(({ id }) => id)
    return {
      days,
      shortMinutes: rows.reduce((sum, row) => sum + row.shortMinutes, 0),
      revisionId: revisions.at(-1)!,
      specs: new Map(revisions.map((id) => [id, specs.get(id)!])),
    }
  }

  /** The firm from what was drawn for it: leave, loans and hours worked out once more, by hand. */
  function seenFirm(random: RandomFirm): SeenFirm {
    const { workingWeekdays, closed, keepsHolidays, startUpMinutes } = random
    const isAway = (person: number, day: string) =>
      random.leave.some(
        (l) =>
          l.person === person &&
          l.startsOn <= day &&
          day <= dayPlus(l.startsOn, l.days) &&
          (l.weekdays === null || l.weekdays.includes(isoWeekday(day))),
      )
    const crewAt = (person: number, day: string) =>
      random.loans.find((l) => l.person === person && l.day === day)?.crew ?? random.crewOf[person]
    const packageMinutes = Object.fromEntries(
      packageKeys.map((key) => [key, random.packageMinutes]),
    ) as typeof defaultLabourRates.packageMinutes
    return {
      today,
      workingWeekdays: [...workingWeekdays],
      daysOff: [...closed, ...(keepsHolidays ? queenslandHolidays : [])],
      rates: { ...defaultLabourRates, startUpMinutes, packageMinutes },
      crewOn(crewId, day) {
        const there = peopleIds.flatMap((_, i) =>
          crewIds[crewAt(i, day)!] === crewId && !isAway(i, day) ? [i] : [],
        )
        // Eight hours is what the firm works; a person's own stand beside it.
        const hours = there.map((i) => random.weekHours[i]?.[isoWeekday(day) - 1] ?? 8)
        const minutes = hours.reduce((sum, own) => sum + own * 60, 0)
        return {
          personIds: there.map((i) => peopleIds[i]!),
          minutes: minutes - startUpMinutes * there.length,
        }
      },
    }
  }

  /** Moves a crew on from today; false when nothing had to move. */
  function rainOff(crew: number, workingDays: number): boolean {
    const [crewId, free] = [crewIds[crew]!, 'keep' as const]
    const shown = rain.preview({ crew: crewId, day: today, days: workingDays, free })
    if (shown.moves.length === 0) return false
    const seen = shown.moves.map(({ bookingId, version, daysAfter }) => ({
      ...{ bookingId, version, daysAfter },
    }))
    const asked = { crewId, fromDay: today, workingDays, useFreeDays: false, reason: '', seen }
    rain.make(office, { clientId: newId(), ...asked })
    return true
  }

  const seenJobs = (): SeenJob[] => jobIds.map((_, job) => seenJob(job))
  /** Each roof is issued anew, and the days not worked take it. */
  const reviseAll = () => {
    jobIds.forEach((_, job) => issue(job, 2))
    replanAll()
  }
  return { lay, seenJobs, seenFirm, rainOff, reviseAll, close: app.close }
}
