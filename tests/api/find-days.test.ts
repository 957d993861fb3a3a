import { expect, test } from 'vitest'
import type { Booking } from '../../shared/bookings/calendar-schemas.ts'
import type { Openings } from '../../shared/find-days/find-days-schemas.ts'
import { milestones } from '../../server/db/tables/milestone-tables.ts'
import { leave } from '../../server/db/tables/people-tables.ts'
import { newId } from '../../server/lib/ids.ts'
import { bookingFirm, fri, mon, thu, tue, wed } from './booking-kit.ts'

type Firm = Awaited<ReturnType<typeof bookingFirm>>

async function openingsOf(firm: Firm, jobId = firm.jobs.hillJob, query = '') {
  const answer = await firm.officeAgent.get(`/api/jobs/${jobId}/openings${query}`)
  expect(answer.status).toBe(200)
  return answer.body as Openings
}

/** One click: the job pencilled, what gives way moved with it. */
async function take(firm: Firm, found: Openings, index = 0): Promise<Booking[]> {
  const opening = found.openings[index]
  if (!opening) throw new Error('no such opening')
  const answer = await firm.officeAgent.post('/api/bookings/changes').send({
    changes: opening.moves.map(({ bookingId, version, daysAfter }) => ({
      bookingId,
      version,
      days: daysAfter,
    })),
    create: [
      {
        clientId: newId(),
        jobId: found.job.id,
        crewId: opening.crew.id,
        days: opening.days,
        state: 'pencilled',
      },
    ],
  })
  expect(answer.body).toHaveProperty('bookings')
  return (answer.body as { bookings: Booking[] }).bookings
}

const clashesOf = (booking: Booking) =>
  booking.days.flatMap((day) => day.flags).filter((flag) => flag.weight === 'clash')

test('each opening, once taken, holds all of the work and carries no clash', async () => {
  const firm = await bookingFirm()
  const found = await openingsOf(firm)
  expect(found.workMinutes).toBeGreaterThan(0)
  expect(found.openings.map((one) => one.crew.id)).toEqual(
    expect.arrayContaining([firm.crew.id, firm.otherCrew.id]),
  )
  expect(found.openings[0]).toMatchObject({ crew: { id: firm.crew.id }, moves: [] })
  expect(found.openings[0]?.days[0]).toBe(thu)
  expect(found.openings[0]?.why).toContain('the earliest there is')
  for (const index of found.openings.keys()) {
    const other = await bookingFirm()
    const [booking] = await take(other, await openingsOf(other), index)
    if (!booking) throw new Error('not booked')
    expect(booking.shortMinutes).toBe(0)
    expect(booking.emptyDays).toBe(0)
    expect(clashesOf(booking)).toEqual([])
  }
})

test('the first day waits for timber promised later, and is told of edge protection nobody has named a day for', async () => {
  const firm = await bookingFirm()
  const say = (kind: 'timber-on-site' | 'edge-protection-up', day: string | null) =>
    firm.app.db
      .insert(milestones)
      .values({
        id: newId(),
        jobId: firm.jobs.hillJob,
        kind,
        day,
        state: day ? 'promised' : 'asked',
        updatedAt: firm.app.clock.now(),
      })
      .run()
  say('timber-on-site', tue)
  say('edge-protection-up', null)
  const found = await openingsOf(firm)
  expect(found.earliest).toBe(tue)
  expect(found.openings[0]?.days[0]).toBe(tue)
  expect(found.waits).toMatchObject([
    { text: 'Timber on site: promised, Tue 8 Dec.', isDated: true },
    { isDated: false },
  ])
})

test('a pencilled booking gives way and is moved in the same press; a firm one stays', async () => {
  const firm = await bookingFirm()
  await firm.booked({ jobId: firm.jobs.bareJob, days: [thu], state: 'pencilled' })
  await firm.booked({ jobId: firm.jobs.creekJob, crewId: firm.otherCrew.id, state: 'firm' })
  const found = await openingsOf(firm)
  expect(found.openings[0]).toMatchObject({
    crew: { id: firm.crew.id },
    moves: [{ job: { number: 'QR-3' }, daysBefore: [thu] }],
  })
  expect(found.openings[0]?.why).toContain('QR-3 No plan yet, only pencilled, gives way')
  expect(found.openings.some((one) => one.moves.length === 0)).toBe(true)
  const [gaveWay, booking] = await take(firm, found)
  expect(booking?.allDays[0]).toBe(thu)
  expect(gaveWay?.allDays).toEqual(found.openings[0]?.moves[0]?.daysAfter)
  expect([gaveWay, booking].flatMap((one) => (one ? clashesOf(one) : []))).toEqual([])
})

test('a day on which nobody with a trade is there is passed over, and the reason is said', async () => {
  const firm = await bookingFirm()
  for (const { id } of [firm.people.lead, firm.people.otherLead]) {
    const away = { id: newId(), personId: id, startsOn: fri, endsOn: fri }
    firm.app.db.insert(leave).values(away).run()
  }
  const found = await openingsOf(firm, firm.jobs.hillJob, '?days=2')
  expect(found.dayCount).toBe(2)
  for (const opening of found.openings) expect(opening.days).not.toContain(fri)
  expect(found.openings[0]).toMatchObject({ days: [thu, mon], passedOver: [fri] })
  expect(found.openings[0]?.why).toContain('Passes over Fri 4 Dec')
})

test('without a roof to go by one day is looked for, or as many as are said', async () => {
  const firm = await bookingFirm()
  const one = await openingsOf(firm, firm.jobs.bareJob)
  expect(one).toMatchObject({ workMinutes: null, dayCount: 1 })
  expect(one.openings[0]?.days).toEqual([thu])
  const three = await openingsOf(firm, firm.jobs.bareJob, `?days=3&from=${wed}`)
  expect(three.openings[0]?.days).toEqual([wed, thu, fri])
})

test('a job that is not there is 404, and one marked complete is not placed', async () => {
  const firm = await bookingFirm()
  await firm.officeAgent.get(`/api/jobs/${newId()}/openings`).expect(404)
  const done = firm.kit.addJob({ number: 'QR-9', completedOn: '2026-11-30' })
  await firm.officeAgent.get(`/api/jobs/${done}/openings`).expect(409)
})
