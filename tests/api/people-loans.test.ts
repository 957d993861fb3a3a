import { expect, test } from 'vitest'
import { crewLoans } from '../../server/db/tables/people-tables.ts'
import { readFirm } from '../../server/firm/firm-store.ts'
import { peopleToTell, toldDayOf } from '../../server/mail/told-day.ts'
import { rosterOf } from '../../server/people/roster.ts'
import { bookingFirm, fri, thu, wed } from './booking-kit.ts'
import { crewOnSite, days } from './day-sheet-kit.ts'
import { missingId, twoCrewFirm } from './people-kit.ts'

test('a person is lent for a day, and is back with the own crew when that is taken back', async () => {
  const { app, agent, apprentice, adze, bevel } = await twoCrewFirm()
  const names = (crewId: string) => rosterOf(app.db, crewId, fri).map((person) => person.name)
  const made = await agent
    .post(`/api/people/${apprentice.id}/loans`)
    .send({ crewId: bevel.id, day: fri, note: 'Long ridge' })
    .expect(201)
  expect([names(adze.id), names(bevel.id)]).toEqual([['Tamsin Rook'], ['Bex Arden', 'Wil Osei']])
  const { body: person } = await agent.get(`/api/people/${apprentice.id}`).expect(200)
  expect(person).toMatchObject({ crewId: adze.id, lentToId: null, loans: [made.body] })
  const { body: crew } = await agent.get(`/api/crews/${bevel.id}/people`).expect(200)
  expect(crew.loans).toMatchObject([{ name: 'Wil Osei', day: fri, note: 'Long ridge' }])
  await agent.delete(`/api/people/${missingId}/loans/${made.body.id}`).expect(404)
  await agent.delete(`/api/people/${apprentice.id}/loans/${made.body.id}`).expect(200)
  expect([names(adze.id), names(bevel.id)]).toEqual([['Tamsin Rook', 'Wil Osei'], ['Bex Arden']])
})

test('nobody is lent twice on a day, to the own crew, on a day past or on a day away', async () => {
  const { app, agent, apprentice, adze, bevel } = await twoCrewFirm()
  const third = app.addCrew('Cleat crew', [])
  const lend = (crewId: string, day: string) =>
    agent.post(`/api/people/${apprentice.id}/loans`).send({ crewId, day, note: '' })
  const fieldOf = async (crewId: string, day: string) =>
    (await lend(crewId, day).expect(400)).body.issues[0].path as string
  await lend(bevel.id, thu).expect(201)
  expect(await fieldOf(third.id, thu)).toBe('day')
  expect(await fieldOf(adze.id, fri)).toBe('crewId')
  expect(await fieldOf(bevel.id, '2026-12-01')).toBe('day')
  expect(await fieldOf(missingId, fri)).toBe('crewId')
  await agent
    .post(`/api/people/${apprentice.id}/leave`)
    .send({ startsOn: fri, endsOn: fri, reason: '' })
    .expect(201)
  expect(await fieldOf(bevel.id, fri)).toBe('day')
  expect(app.db.select().from(crewLoans).all()).toHaveLength(1)
})

test('a loan of a day past stays as it was', async () => {
  const { app, agent, apprentice, bevel } = await twoCrewFirm()
  const made = await agent
    .post(`/api/people/${apprentice.id}/loans`)
    .send({ crewId: bevel.id, day: wed, note: '' })
    .expect(201)
  app.clock.current = new Date('2026-12-03T00:00:00Z')
  await agent.delete(`/api/people/${apprentice.id}/loans/${made.body.id}`).expect(404)
})

test('a borrowed apprentice sees the borrowing crew’s sheet that day and not the own one; other days stay', async () => {
  const site = await crewOnSite()
  const { app, people: who, otherCrew, kit } = site
  const otherJob = kit.addJob({ title: 'Wintle Lane shed' })
  kit.addBooking(otherJob, otherCrew.id, [days.wednesday])
  const office = await app.agentFor(who.office.email)
  const theirs = await app.agentFor(who.apprentice.email)
  const titles = async (day: string) => {
    const { body } = await theirs.get(`/api/day-sheets?day=${day}`).expect(200)
    return (body.sheets as { job: { title: string } }[]).map((sheet) => sheet.job.title)
  }
  const own = await titles(days.wednesday)
  expect(own).not.toContain('Wintle Lane shed')
  await office
    .post(`/api/people/${who.apprentice.id}/loans`)
    .send({ crewId: otherCrew.id, day: days.wednesday, note: '' })
    .expect(201)
  expect(await titles(days.wednesday)).toEqual(['Wintle Lane shed'])
  expect(await titles(days.tuesday)).toEqual(own)
})

test('the hours of both crews follow a loan, and what a lent person was handed is handed to nobody', async () => {
  const firm = await bookingFirm()
  const { app, officeAgent, people: who } = firm
  const booking = await firm.booked({ startsOn: thu, workingDays: 2, state: 'firm' })
  const task = firm.taskRows(booking.id).find((row) => row.day === thu)!.task
  await officeAgent
    .patch(`/api/tasks/${task.id}`)
    .send({ version: task.version, assignedToId: who.apprentice.id })
    .expect(200)
  await officeAgent
    .post(`/api/people/${who.apprentice.id}/loans`)
    .send({ crewId: firm.otherCrew.id, day: thu, note: '' })
    .expect(201)
  const { body } = await officeAgent.get(`/api/bookings/${booking.id}`).expect(200)
  const minutes = (body.days as { availableMinutes: number }[]).map((d) => d.availableMinutes)
  expect(minutes).toEqual([480, 960])
  const handed = firm.taskRows(booking.id).filter((row) => row.day === thu)
  expect(handed.map((row) => row.task.assignedToId)).toEqual(handed.map(() => null))
  expect(handed.reduce((sum, row) => sum + row.task.plannedMinutes, 0)).toBeLessThanOrEqual(480)
  expect(rosterOf(app.db, firm.otherCrew.id, thu)).toHaveLength(2)
})

test('a borrowed person is reminded of the borrowing crew’s job, not of the own crew’s', async () => {
  const firm = await bookingFirm()
  const { app, officeAgent, people: who } = firm
  await firm.booked({ startsOn: thu, workingDays: 1, state: 'firm' })
  const creek = { jobId: firm.jobs.creekJob, crewId: firm.otherCrew.id }
  await firm.booked({ ...creek, startsOn: thu, workingDays: 1, state: 'firm' })
  const told = () => toldDayOf(app.db, readFirm(app.db), who.apprentice.id, thu)
  expect(told().bookings.map((one) => one.jobTitle)).toEqual(['Hill house'])
  await officeAgent
    .post(`/api/people/${who.apprentice.id}/loans`)
    .send({ crewId: firm.otherCrew.id, day: thu, note: '' })
    .expect(201)
  expect(told().bookings.map((one) => one.jobTitle)).toEqual(['Creek shed'])
  expect(peopleToTell(app.db, thu)).toContain(who.apprentice.id)
})
