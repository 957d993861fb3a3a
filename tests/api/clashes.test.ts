import { eq } from 'drizzle-orm'
import { expect, test } from 'vitest'
import type { Clash, Landings } from '../../shared/clashes/clash-schemas.ts'
import type { ClashList } from '../../shared/clashes/clash-list-schemas.ts'
import type { Booking } from '../../shared/bookings/calendar-schemas.ts'
import { bookingDays, bookings } from '../../server/db/tables/booking-tables.ts'
import { toldDays } from '../../server/db/tables/mail-tables.ts'
import { leave, tickets } from '../../server/db/tables/people-tables.ts'
import { newId } from '../../server/lib/ids.ts'
import { type Agent } from './harness.ts'
import { bookingFirm, daysOf, fri, hipRoof, mon, sat, thu, tue, wed } from './booking-kit.ts'

type Firm = Awaited<ReturnType<typeof bookingFirm>>

async function landingsOf(firm: Firm, path: string): Promise<Landings['landings']> {
  const answer = await firm.officeAgent.get(path).expect(200)
  return (answer.body as Landings).landings
}

const landingsPath = (booking: Booking, query: string): string =>
  `/api/bookings/${booking.id}/landings?${query}`

const codesAt = (
  landings: Landings['landings'],
  crew: { id: string },
  day: string,
): string[] | null => {
  const found = landings.find((one) => one.crewId === crew.id && one.day === day)
  return found ? found.clashes.map((clash) => `${clash.weight} ${clash.code}`) : null
}

async function list(agent: Agent): Promise<ClashList> {
  const answer = await agent.get('/api/clashes').expect(200)
  return answer.body as ClashList
}

async function flagsOf(firm: Firm, booking: Booking): Promise<Clash[]> {
  const answer = await firm.officeAgent.get(`/api/bookings/${booking.id}`).expect(200)
  return (answer.body as Booking).days.flatMap((day) => day.flags)
}

const setMilestone = (firm: Firm, kind: string, body: Record<string, unknown>) =>
  firm.officeAgent.put(`/api/jobs/${firm.jobs.hillJob}/milestones/${kind}`).send(body).expect(200)

test('before a drop each crew and day of the span says what would stand in the way there', async () => {
  const firm = await bookingFirm()
  const hill = await firm.booked()
  await firm.booked({
    jobId: firm.jobs.creekJob,
    crewId: firm.otherCrew.id,
    startsOn: mon,
    workingDays: 1,
  })
  const landings = await landingsOf(
    firm,
    landingsPath(hill, `from=2026-11-30&to=2026-12-08&day=${thu}`),
  )
  // Days before today cannot be: two crews on each of the seven days from Wed 2 Dec on.
  expect(landings).toHaveLength(14)
  expect(codesAt(landings, firm.crew, '2026-12-01')).toBeNull()
  expect(codesAt(landings, firm.crew, thu)).toEqual([])
  expect(codesAt(landings, firm.crew, tue)).toEqual([])
  expect(codesAt(landings, firm.crew, sat)).toEqual(['caution day-not-worked'])
  // Two days of two people are too much for two days of one; the second day is the creek's.
  expect(codesAt(landings, firm.otherCrew, fri)).toEqual(['clash crew-twice', 'caution too-short'])
  const friday = landings.find((one) => one.crewId === firm.otherCrew.id && one.day === fri)
  expect(friday?.clashes[0]).toMatchObject({
    day: mon,
    text: 'Rafter crew is also on QR-2 Creek shed.',
  })
})

test('taken hold of at its second day, only what that day and those after it run into is said', async () => {
  const firm = await bookingFirm()
  const hill = await firm.booked()
  await firm.booked({ jobId: firm.jobs.creekJob, startsOn: tue, workingDays: 1 })
  await firm.booked({
    jobId: firm.jobs.bareJob,
    startsOn: thu,
    workingDays: 1,
    clashReason: 'Half a day each',
  })
  const landings = await landingsOf(firm, landingsPath(hill, `from=${wed}&to=${tue}&day=${fri}`))
  expect(codesAt(landings, firm.crew, mon)).toEqual([])
  expect(codesAt(landings, firm.crew, tue)).toEqual(['clash crew-twice'])
})

test('a booking begun lands with no other crew, and its worked day cannot be taken hold of', async () => {
  const firm = await bookingFirm()
  const hill = await firm.booked({ state: 'firm', startsOn: wed })
  firm.tick(firm.taskRows(hill.id)[0]!.task.id)
  const landings = await landingsOf(firm, landingsPath(hill, `from=${wed}&to=${tue}&day=${thu}`))
  expect(new Set(landings.map((one) => one.crewId))).toEqual(new Set([firm.crew.id]))
  const worked = await firm.officeAgent.get(landingsPath(hill, `from=${wed}&to=${tue}&day=${wed}`))
  expect(worked.status).toBe(400)
  expect(worked.body.message).toBe('Wed 2 Dec has been worked and stays.')
  const gone = await firm.officeAgent.get(landingsPath(hill, `from=${wed}&to=${tue}&day=${mon}`))
  expect(gone.body.issues[0].path).toBe('day')
})

test('a job not booked lands on as many days as its work fills', async () => {
  const firm = await bookingFirm()
  await firm.booked({ jobId: firm.jobs.creekJob, startsOn: mon, workingDays: 1 })
  const path = `/api/jobs/${firm.jobs.hillJob}/landings?from=${thu}&to=${tue}`
  const landings = await landingsOf(firm, path)
  expect(codesAt(landings, firm.crew, thu)).toEqual([])
  // About 23 hours for two people: the second day is Monday.
  expect(codesAt(landings, firm.crew, fri)).toEqual(['clash crew-twice'])
  const real = await firm.book({ startsOn: fri })
  expect(real.status).toBe(409)
  expect(real.body.detail.clashes[0].day).toBe(mon)
})

test('a job waits for its frames: landings before them are clashes, from their day on none', async () => {
  const firm = await bookingFirm()
  await setMilestone(firm, 'frames-up', { version: 0, state: 'promised', day: mon })
  const path = `/api/jobs/${firm.jobs.hillJob}/landings?from=${thu}&to=${tue}`
  const landings = await landingsOf(firm, path)
  expect(codesAt(landings, firm.crew, fri)).toEqual(['clash before-frames'])
  expect(codesAt(landings, firm.crew, mon)).toEqual([])
})

test('landings ask for a span of at most a hundred days, its days in order, and are the office’s alone', async () => {
  const firm = await bookingFirm()
  const hill = await firm.booked()
  for (const query of [
    `from=${tue}&to=${wed}&day=${thu}`,
    `from=${wed}&to=2027-06-01&day=${thu}`,
    `from=${wed}&to=${tue}`,
  ])
    await firm.officeAgent.get(landingsPath(hill, query)).expect(400)
  const lead = await firm.app.agentFor(firm.people.lead.email)
  await lead.get(landingsPath(hill, `from=${wed}&to=${tue}&day=${thu}`)).expect(403)
})

test('a first day before promised timber is a clash in the list, on the booking and nowhere else', async () => {
  const firm = await bookingFirm()
  const hill = await firm.booked()
  expect((await list(firm.officeAgent)).clashes).toEqual([])
  await setMilestone(firm, 'timber-on-site', {
    version: 0,
    state: 'promised',
    day: mon,
    broughtBy: 'Creek Timber',
  })
  const { clashes, bookings: concerned, today } = await list(firm.officeAgent)
  expect(today).toBe(wed)
  expect(clashes).toEqual([
    {
      bookingId: hill.id,
      code: 'before-timber',
      weight: 'clash',
      days: [thu],
      text: 'Timber is promised for Mon 7 Dec, after the first day.',
      wayOut: 'Start on Mon 7 Dec or later, or get an earlier day from Creek Timber.',
    },
  ])
  expect(concerned.map((one) => one.job.number)).toEqual(['QR-1'])
  expect((await flagsOf(firm, hill)).map((flag) => flag.code)).toEqual(['before-timber'])
  await setMilestone(firm, 'timber-on-site', { version: 1, state: 'done', day: wed })
  expect((await list(firm.officeAgent)).clashes).toEqual([])
})

test('a ticket that lapses between two days of a booking is a clash on the second only', async () => {
  const firm = await bookingFirm()
  const hill = await firm.booked()
  firm.app.db
    .update(tickets)
    .set({ expiresOn: thu })
    .where(eq(tickets.personId, firm.people.apprentice.id))
    .run()
  expect(await flagsOf(firm, hill)).toEqual([
    expect.objectContaining({
      code: 'ticket-lapsed',
      weight: 'clash',
      day: fri,
      text: 'Wim Casey: working at heights lapsed Thu 3 Dec.',
    }),
  ])
})

test('a leading hand’s list has own crew’s days only, without dates of tickets or why somebody is away', async () => {
  const firm = await bookingFirm()
  await firm.booked()
  await firm.booked({
    jobId: firm.jobs.creekJob,
    crewId: firm.otherCrew.id,
    startsOn: thu,
    workingDays: 1,
  })
  firm.app.db.delete(tickets).where(eq(tickets.personId, firm.people.otherLead.id)).run()
  firm.app.db
    .update(tickets)
    .set({ expiresOn: thu })
    .where(eq(tickets.personId, firm.people.apprentice.id))
    .run()
  firm.app.db
    .insert(leave)
    .values({
      id: newId(),
      personId: firm.people.apprentice.id,
      startsOn: thu,
      endsOn: thu,
      kind: 'sick',
    })
    .run()
  const office = await list(firm.officeAgent)
  expect(office.clashes.map((clash) => clash.text)).toContain('Off sick: Wim Casey.')
  expect(office.bookings).toHaveLength(2)
  const lead = await list(await firm.app.agentFor(firm.people.lead.email))
  expect(lead.bookings.map((one) => one.job.number)).toEqual(['QR-1'])
  expect(lead.clashes.map((clash) => clash.text)).toEqual([
    'Away: Wim Casey.',
    'Wim Casey: working at heights lapsed.',
  ])
  expect(lead.clashes[0]!.wayOut).toBe('Ask the office.')
  await (await firm.app.agentFor(firm.people.apprentice.email)).get('/api/clashes').expect(403)
})

test('a crew told roof A before roof B was issued is to be told again; a day left at A is a clash', async () => {
  const firm = await bookingFirm()
  const hill = await firm.booked({ state: 'firm' })
  const told = (revision: string) => ({
    bookings: [{ bookingId: hill.id, revision, lines: [] }],
  })
  firm.app.db
    .insert(toldDays)
    .values({
      id: newId(),
      personId: firm.people.lead.id,
      day: thu,
      contentHash: 'told',
      content: told('A'),
      toldAt: firm.app.clock.current,
    })
    .run()
  expect(await flagsOf(firm, hill)).toEqual([])
  const revisionB = firm.issue(firm.jobs.hillJob, 2, hipRoof(27))
  // Issued, and the days not yet planned to it.
  expect((await flagsOf(firm, hill)).map((flag) => [flag.day, flag.weight, flag.text])).toEqual([
    [thu, 'clash', 'Planned to roof A; the newest is B.'],
    [fri, 'clash', 'Planned to roof A; the newest is B.'],
  ])
  firm.app.db.update(bookingDays).set({ revisionId: revisionB }).run()
  expect((await flagsOf(firm, hill)).map((flag) => [flag.day, flag.weight, flag.text])).toEqual([
    [thu, 'caution', 'The crew was told roof A; it is B now.'],
  ])
  firm.app.db
    .update(toldDays)
    .set({ content: told('B') })
    .run()
  expect(await flagsOf(firm, hill)).toEqual([])
})

test('what is amiss on several days in the same words is one line of the list', async () => {
  const firm = await bookingFirm()
  const bare = await firm.booked({ jobId: firm.jobs.bareJob, workingDays: 3 })
  const { clashes } = await list(firm.officeAgent)
  expect(clashes).toHaveLength(1)
  expect(clashes[0]).toMatchObject({ code: 'no-roof', weight: 'caution', days: daysOf(bare) })
})

test('a cancelled booking stands in nobody’s way, and neither does a day that is over', async () => {
  const firm = await bookingFirm()
  const hill = await firm.booked()
  await firm.booked({ jobId: firm.jobs.creekJob, startsOn: thu, clashReason: 'Next door' })
  expect((await list(firm.officeAgent)).clashes.length).toBeGreaterThan(0)
  firm.app.db
    .update(bookings)
    .set({ cancelledAt: firm.app.clock.current })
    .where(eq(bookings.id, hill.id))
    .run()
  expect((await list(firm.officeAgent)).clashes).toEqual([])
  await firm.booked({ jobId: firm.jobs.bareJob, startsOn: fri, workingDays: 1, clashReason: 'x' })
  firm.app.clock.current = new Date('2026-12-20T00:00:00Z')
  expect((await list(firm.officeAgent)).clashes).toEqual([])
})
