import { expect, test } from 'vitest'
import type { Calendar } from '../../shared/bookings/calendar-schemas.ts'
import { audit } from '../../server/db/tables/audit-tables.ts'
import { bookingDays, bookings, tasks } from '../../server/db/tables/booking-tables.ts'
import { leave } from '../../server/db/tables/people-tables.ts'
import { newId } from '../../server/lib/ids.ts'
import { bookingFirm, daysOf, fri, mon, sat, thu, tue, wed } from './booking-kit.ts'

const someId = '3f1c9a34-7f59-4c2b-9a53-0b1f4f0f9d11'

test('a booking without a number of days takes as many working days as the work needs', async () => {
  const firm = await bookingFirm()
  const booking = await firm.booked()
  // About 23 hours of work, fascia and tails included, for two people at 8 hours: two days.
  expect(daysOf(booking)).toEqual([thu, fri])
  expect(booking.shortMinutes).toBe(0)
  expect(booking.emptyDays).toBe(0)
  expect(booking.days[0]).toMatchObject({
    revisionLetter: 'A',
    availableMinutes: 960,
    peopleThere: 2,
    worked: false,
    flags: [],
  })
  expect(booking.days[0]!.holds).toMatch(/^Set out plates to /)
  expect(booking.days[0]!.plannedMinutes).toBeGreaterThan(900)
  expect(booking.days[1]!.holds).toMatch(/fascia and tails$/)
})

test('one person alone gets more days, and the weekend is stepped over', async () => {
  const firm = await bookingFirm()
  const booking = await firm.booked({ crewId: firm.otherCrew.id })
  expect(daysOf(booking)).toEqual([thu, fri, mon, ...daysOf(booking).slice(3)])
  expect(booking.shortMinutes).toBe(0)
  expect(booking.emptyDays).toBe(0)
})

test('a booking too short and one too long both say so', async () => {
  const firm = await bookingFirm()
  const short = await firm.booked({ workingDays: 1 })
  expect(short.shortMinutes).toBeGreaterThan(300)
  const long = await firm.booked({
    jobId: firm.jobs.creekJob,
    crewId: firm.otherCrew.id,
    workingDays: 6,
  })
  expect(long.shortMinutes).toBe(0)
  expect(long.emptyDays).toBeGreaterThan(0)
  expect(long.days.at(-1)!.holds).toBe('')
})

test('a second press with the same client id books nothing twice', async () => {
  const firm = await bookingFirm()
  const clientId = newId()
  const first = await firm.booked({ clientId })
  const second = await firm.booked({ clientId })
  expect(second.id).toBe(first.id)
  expect(firm.app.db.select().from(bookings).all()).toHaveLength(1)
})

test('two bookings of one job share its work: nothing is cut or stood twice', async () => {
  const firm = await bookingFirm()
  const first = await firm.booked({ workingDays: 1 })
  const second = await firm.booked({ crewId: firm.otherCrew.id, startsOn: mon })
  const rows = [...firm.taskRows(first.id), ...firm.taskRows(second.id)]
  for (const work of ['cut', 'stand'] as const) {
    const marks = rows.filter((r) => r.task.work === work).flatMap((r) => r.task.memberMarks)
    expect(new Set(marks).size).toBe(marks.length)
  }
  expect(second.shortMinutes).toBe(0)
  const again = await firm.officeAgent.get(`/api/bookings/${first.id}`).expect(200)
  expect(again.body.shortMinutes).toBe(0)
})

test('booking a crew twice on a day is refused with the job and the day, and nothing is written', async () => {
  const firm = await bookingFirm()
  await firm.booked()
  const before = {
    bookings: firm.app.db.select().from(bookings).all().length,
    days: firm.app.db.select().from(bookingDays).all().length,
    tasks: firm.app.db.select().from(tasks).all().length,
    audit: firm.app.db.select().from(audit).all().length,
  }
  const answer = await firm.book({ jobId: firm.jobs.creekJob, startsOn: fri, workingDays: 2 })
  expect(answer.status).toBe(409)
  expect(answer.body.message).toContain('Fri 4 Dec')
  expect(answer.body.message).toContain('QR-1 Hill house')
  expect(answer.body.detail).toMatchObject({
    kind: 'clash',
    clashes: [{ code: 'crew-twice', day: fri }],
  })
  expect({
    bookings: firm.app.db.select().from(bookings).all().length,
    days: firm.app.db.select().from(bookingDays).all().length,
    tasks: firm.app.db.select().from(tasks).all().length,
    audit: firm.app.db.select().from(audit).all().length,
  }).toEqual(before)
})

test('both are booked on purpose with a reason, which each day then shows', async () => {
  const firm = await bookingFirm()
  const hill = await firm.booked()
  const creek = await firm.booked({
    jobId: firm.jobs.creekJob,
    startsOn: fri,
    workingDays: 1,
    clashReason: 'Half a day each, next door',
  })
  expect(creek.clashReason).toBe('Half a day each, next door')
  expect(creek.days[0]!.flags).toContainEqual(
    expect.objectContaining({ code: 'crew-twice-on-purpose', weight: 'caution' }),
  )
  const other = await firm.officeAgent.get(`/api/bookings/${hill.id}`)
  expect(other.body.days[1].flags[0].text).toContain('QR-2 Creek shed')
  const blank = await firm.book({ jobId: firm.jobs.creekJob, startsOn: fri, clashReason: '  ' })
  expect(blank.status).toBe(400)
  expect(blank.body.issues[0].path).toBe('clashReason')
})

test('a day the firm does not work is refused until it is said to be worked', async () => {
  const firm = await bookingFirm()
  const answer = await firm.book({ startsOn: sat, workingDays: 1 })
  expect(answer.status).toBe(409)
  expect(answer.body.detail.clashes).toEqual([
    expect.objectContaining({ code: 'day-not-worked', day: sat }),
  ])
  const booking = await firm.booked({ startsOn: sat, workingDays: 2, evenIfNotWorked: true })
  expect(daysOf(booking)).toEqual([sat, mon])
  expect(booking.days[0]!.flags.map((f) => f.code)).toEqual(['day-not-worked'])
})

test('a job without an issued roof can be pencilled, and its days say so', async () => {
  const firm = await bookingFirm()
  const booking = await firm.booked({ jobId: firm.jobs.bareJob, workingDays: 2 })
  expect(booking.glyph).toBeNull()
  expect(booking.days.map((d) => d.flags.map((f) => f.code))).toEqual([['no-roof'], ['no-roof']])
  const firmly = await firm.book({ jobId: firm.jobs.bareJob, state: 'firm', startsOn: mon })
  expect(firmly.status).toBe(400)
  expect(firmly.body.issues[0].path).toBe('state')
})

test.each([
  [{ jobId: 'x' }, 'jobId'],
  [{ crewId: someId }, 'crewId'],
  [{ jobId: someId }, 'jobId'],
  [{ startsOn: '2026-02-30' }, 'startsOn'],
  [{ startsOn: undefined }, 'startsOn'],
  [{ workingDays: 0 }, 'workingDays'],
  [{ days: [] }, 'days'],
  [{ state: 'maybe' }, 'state'],
  [{ startAt: '7 am' }, 'startAt'],
  [{ gear: 'x'.repeat(501) }, 'gear'],
  [{ colour: 'red' }, 'colour'],
])('a booking with %j is refused at its field', async (changes, path) => {
  const firm = await bookingFirm()
  const answer = await firm.book(changes)
  expect(answer.status).toBe(400)
  expect(answer.body.issues.map((issue: { path: string }) => issue.path)).toContain(path)
  expect(firm.app.db.select().from(bookings).all()).toEqual([])
})

test('the calendar shows what is booked, with hours planned against hours there', async () => {
  const firm = await bookingFirm()
  await firm.booked({ state: 'firm', startAt: '06:30' })
  firm.app.db
    .insert(leave)
    .values({ id: newId(), personId: firm.people.apprentice.id, startsOn: fri, endsOn: fri })
    .run()
  const answer = await firm.officeAgent.get(`/api/calendar?from=${wed}&to=${tue}`).expect(200)
  const calendar = answer.body as Calendar
  expect(calendar.today).toBe(wed)
  expect(calendar.crews.map((c) => c.name)).toEqual(['Plumb crew', 'Rafter crew'])
  const [booking] = calendar.bookings
  expect(booking).toMatchObject({
    state: 'firm',
    startAt: '06:30',
    job: { number: 'QR-1', title: 'Hill house' },
    crew: { letter: 'P' },
    firstDay: thu,
    lastDay: fri,
    dayCount: 2,
  })
  expect(booking!.glyph!.lines.length).toBeGreaterThan(0)
  const friday = booking!.days[1]!
  expect(friday.availableMinutes).toBe(480)
  expect(friday.peopleThere).toBe(1)
  expect(friday.flags[0]).toMatchObject({ code: 'on-leave', text: 'On leave: Wim Casey.' })
})

test('the calendar asks the database the same few questions for one booking as for twenty', async () => {
  const firm = await bookingFirm()
  let queries = 0
  const { sqlite } = firm.app.database
  const prepare = sqlite.prepare.bind(sqlite)
  sqlite.prepare = ((source: string) => {
    queries++
    return prepare(source)
  }) as typeof sqlite.prepare
  const count = async () => {
    queries = 0
    await firm.officeAgent.get(`/api/calendar?from=${wed}&to=2027-02-10`).expect(200)
    return queries
  }
  await firm.booked({ workingDays: 1 })
  const withOne = await count()
  expect(withOne).toBeGreaterThan(5)
  for (let week = 1; week <= 9; week++) {
    const day = new Date(Date.parse(`${thu}T00:00:00Z`) + week * 7 * 86_400_000)
    const startsOn = day.toISOString().slice(0, 10)
    await firm.booked({ startsOn, workingDays: 2 })
    await firm.booked({ startsOn, workingDays: 2, crewId: firm.otherCrew.id })
  }
  expect(await count()).toBe(withOne)
})

test.each([
  ['from=2026-12-02', 'to'],
  ['from=2026-12-02&to=2026-12-01', 'to'],
  ['from=2026-12-02&to=2027-12-02', 'to'],
  ['from=soon&to=2026-12-02', 'from'],
])('a calendar asked for %s is refused at its field', async (query, path) => {
  const firm = await bookingFirm()
  const answer = await firm.officeAgent.get(`/api/calendar?${query}`).expect(400)
  expect(answer.body.issues[0].path).toBe(path)
})

test('jobs won and not booked stand by what they are wanted for, with the days each crew needs', async () => {
  const firm = await bookingFirm()
  const won = await firm.officeAgent.get('/api/calendar/unbooked').expect(200)
  expect(won.body.jobs.map((j: { number: string }) => j.number)).toEqual(['QR-2', 'QR-1', 'QR-3'])
  const [creek, , bare] = won.body.jobs
  expect(creek.workMinutes / 60).toBeGreaterThan(20)
  expect(creek.crewDays).toEqual([
    { crewId: firm.crew.id, days: 2 },
    { crewId: firm.otherCrew.id, days: 3 },
  ])
  expect(bare).toMatchObject({ workMinutes: null, glyph: null, revisionLetter: null })
  const booking = await firm.booked()
  const after = await firm.officeAgent.get('/api/calendar/unbooked')
  expect(after.body.jobs).toHaveLength(2)
  await firm.officeAgent
    .post(`/api/bookings/${booking.id}/cancel`)
    .send({ version: booking.version })
    .expect(200)
  expect((await firm.officeAgent.get('/api/calendar/unbooked')).body.jobs).toHaveLength(3)
})

test('a leading hand sees the own crew only, an apprentice no calendar, and neither books', async () => {
  const firm = await bookingFirm()
  const own = await firm.booked()
  const foreign = await firm.booked({
    jobId: firm.jobs.creekJob,
    crewId: firm.otherCrew.id,
    gear: 'Crane',
  })
  const lead = await firm.app.agentFor(firm.people.lead.email)
  const seen = await lead.get(`/api/calendar?from=${wed}&to=${tue}`).expect(200)
  expect(seen.body.bookings.map((b: { id: string }) => b.id)).toEqual([own.id])
  expect(seen.body.crews.map((c: { name: string }) => c.name)).toEqual(['Plumb crew'])
  await lead.get(`/api/bookings/${own.id}`).expect(200)
  const hidden = await lead.get(`/api/bookings/${foreign.id}`).expect(404)
  const missing = await lead.get(`/api/bookings/${someId}`).expect(404)
  expect(hidden.body.message).toBe(missing.body.message)
  await lead.get('/api/calendar/unbooked').expect(403)
  expect((await firm.book({ startsOn: mon }, lead)).status).toBe(403)
  await lead.patch(`/api/bookings/${own.id}`).send({ version: 1, state: 'firm' }).expect(403)
  const apprentice = await firm.app.agentFor(firm.people.apprentice.email)
  await apprentice.get(`/api/calendar?from=${wed}&to=${tue}`).expect(403)
  const nobody = await firm.app.agentFor()
  await nobody.get(`/api/calendar?from=${wed}&to=${tue}`).expect(401)
})
