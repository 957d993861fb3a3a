import { count, eq } from 'drizzle-orm'
import { type Day, dayPlus } from '../../../shared/calendar/days.ts'
import { instantAt, localDayOf } from '../../../shared/calendar/local-time.ts'
import { previousWorkedDay, workedDaysFrom } from '../../../shared/calendar/working-days.ts'
import type { CurrentUser } from '../../auth/current-user.ts'
import { hashPassword } from '../../auth/passwords.ts'
import { createBookingService } from '../../bookings/booking-service.ts'
import { createCalendarService } from '../../bookings/calendar-service.ts'
import { takeRevision } from '../../bookings/replan.ts'
import { createEventHub } from '../../events/event-hub.ts'
import { readFirm } from '../../firm/firm-store.ts'
import type { Clock } from '../../lib/clock.ts'
import { newId } from '../../lib/ids.ts'
import { issueAtOnce } from '../../revisions/issue-revision.ts'
import { saveDraft } from '../../revisions/revision-service.ts'
import type { Db } from '../client.ts'
import { firm as firmTable } from '../tables/firm-tables.ts'
import { jobs, plateChecks, roofRevisions } from '../tables/job-tables.ts'
import { crewMembers, crews, people } from '../tables/people-tables.ts'
import { closeDemoDays } from './demo-day-logs.ts'
import type { DemoJob } from './demo-job.ts'
import { demoJobs } from './demo-jobs.ts'
import { insertDemoMilestones } from './demo-milestones.ts'
import {
  type DemoCrewLetter,
  demoCrews,
  demoEmail,
  demoFirm,
  demoPassword,
  demoPeople,
} from './demo-people.ts'
import { demoRoofs } from './demo-roofs.ts'
import { tickDemoTasks } from './demo-ticks.ts'
import { seedDemoTime } from './demo-time.ts'
import { tellDemoDays } from './demo-told.ts'

export function isEmpty(db: Db): boolean {
  return (db.select({ n: count() }).from(people).get()?.n ?? 0) === 0
}

/** The n-th working day from `today`, 0 being today or the first working day after it. */
function workingDay(db: Db, today: Day, n: number): Day {
  const calendar = readFirm(db)
  const ahead = workedDaysFrom(calendar, today, Math.max(n, 0) + 1)
  const first = ahead[0] ?? today
  if (n >= 0) return ahead[n] ?? first
  let day = first
  for (let back = 0; back < -n; back++) day = previousWorkedDay(calendar, day) ?? day
  return day
}

function seedPeople(db: Db, passwordHash: string, now: Date, from: Day): Map<string, string> {
  const ids = new Map<string, string>()
  db.transaction((tx) => {
    for (const crew of demoCrews) {
      const id = newId()
      ids.set(crew.letter, id)
      tx.insert(crews)
        .values({ id, ...crew })
        .run()
    }
    for (const person of demoPeople) {
      const id = newId()
      ids.set(person.key, id)
      tx.insert(people)
        .values({
          id,
          name: person.name,
          email: demoEmail(person),
          phone: person.phone,
          role: person.role,
          passwordHash,
          createdAt: now,
        })
        .run()
      const crewId = person.crew ? ids.get(person.crew) : undefined
      if (crewId) {
        tx.insert(crewMembers)
          .values({ id: newId(), crewId, personId: id, startsOn: from, endsOn: null })
          .run()
      }
    }
  })
  return ids
}

const daysAgo = (today: Day, days: number | null) => (days === null ? null : dayPlus(today, -days))

function insertJob(db: Db, job: DemoJob, today: Day, now: Date): string {
  const id = newId()
  const { title, number, siteAddress, accessNotes, siteContactName, siteContactPhone } = job
  const { customerName, customerPhone, customerEmail, covering, notes, crewNotes } = job
  db.insert(jobs)
    .values({
      id,
      number,
      title,
      siteAddress,
      accessNotes,
      siteContactName,
      siteContactPhone,
      customerName,
      customerPhone,
      customerEmail,
      covering,
      notes,
      crewNotes,
      wantedBy: job.wantedInDays === null ? null : dayPlus(today, job.wantedInDays),
      priceCents: job.priceDollars === null ? null : job.priceDollars * 100,
      priceSentOn: daysAgo(today, job.priceSentAgo),
      acceptedOn: daysAgo(today, job.acceptedAgo),
      createdAt: now,
      updatedAt: now,
    })
    .run()
  return id
}

/** A check that agrees with the plan, as the leading hand would record it. */
function insertPlateCheck(db: Db, jobId: string, takenById: string, takenAt: Date): void {
  const revision = db.select().from(roofRevisions).where(eq(roofRevisions.jobId, jobId)).get()
  if (!revision) return
  const { outline } = revision.roof
  const between = (from: number, to: number) => {
    const [a, b] = [outline[from], outline[to % outline.length]]
    return a && b ? Math.round(Math.hypot(b.x - a.x, b.y - a.y)) : 0
  }
  db.insert(plateChecks)
    .values({
      id: newId(),
      jobId,
      revisionId: revision.id,
      sidesMm: outline.map((_, i) => between(i, i + 1)),
      diagonals: [
        { from: 0, to: 2, lengthMm: between(0, 2) },
        { from: 1, to: 3, lengthMm: between(1, 3) },
      ],
      note: 'Taken before the first cut.',
      takenById,
      takenAt,
    })
    .run()
}

/**
 * Fills an empty database with the demo firm, through the same services as the screens: roofs are
 * issued, bookings booked and days planned as a person would have done a few days ago.
 */
export async function seedDemo(db: Db, clock: Clock): Promise<void> {
  const passwordHash = await hashPassword(demoPassword)
  // All or nothing: a demo cut short would count as data the next time.
  db.transaction(() => seedAll(db, clock, passwordHash))
}

function seedAll(db: Db, clock: Clock, passwordHash: string): void {
  const { timeZone } = demoFirm
  const now = clock.now()
  const today = localDayOf(now, timeZone)
  readFirm(db)
  db.update(firmTable).set(demoFirm).run()
  const ids = seedPeople(db, passwordHash, now, dayPlus(today, -400))
  seedDemoTime(db, { ids, today, loanDay: workingDay(db, today, 10) })
  const office: CurrentUser = {
    id: ids.get('marnie') ?? '',
    name: 'Marnie Quill',
    email: 'marnie@quillback.example',
    role: 'office',
  }
  // Plans look ahead only, so each job is booked by a clock that stands before its first day.
  const past = { current: now, now: () => past.current }
  const events = createEventHub()
  const deps = { db, clock: past, events }
  const bookings = createBookingService({ ...deps, calendar: createCalendarService(deps) })
  for (const job of demoJobs) {
    const jobId = insertJob(db, job, today, now)
    const firstDay = workingDay(db, today, Math.min(job.booking?.fromWorkingDay ?? 0, 0))
    past.current = instantAt(dayPlus(firstDay, -2), '09:00', timeZone)
    if (job.roof) saveDraft(deps, office, jobId, { form: demoRoofs[job.roof], version: 0 })
    if (job.issued) issueAtOnce({ ...deps, takeRevision }, { user: office, jobId, version: 1 })
    if (job.booking) {
      bookings.create(office, {
        clientId: newId(),
        jobId,
        crewId: ids.get(job.booking.crew) ?? '',
        startsOn: workingDay(db, today, job.booking.fromWorkingDay),
        workingDays: job.booking.days,
        state: job.booking.state,
        gear: job.booking.gear,
      })
      const { fromWorkingDay } = job.booking
      insertDemoMilestones(
        db,
        { id: jobId, number: job.number },
        { dayOf: (n) => workingDay(db, today, fromWorkingDay + n), today, now },
      )
      const crew = crewOf(ids, job.booking.crew)
      if (job.platesMeasured) {
        insertPlateCheck(db, jobId, crew[0] ?? '', instantAt(firstDay, '07:20', timeZone))
      }
      tickDemoTasks(db, { jobId, done: job.booking.done, before: today, crew, timeZone })
    }
    db.update(jobs)
      .set({ completedOn: daysAgo(today, job.completedAgo) })
      .where(eq(jobs.id, jobId))
      .run()
  }
  closeDemoDays(db, { today })
  tellDemoDays(db, { firm: readFirm(db), until: workingDay(db, today, 2), now })
}

/** The leading hand first. */
function crewOf(ids: Map<string, string>, letter: DemoCrewLetter): string[] {
  return demoPeople
    .filter((person) => person.crew === letter)
    .map((person) => ids.get(person.key) ?? '')
}
