import { expect, test } from 'vitest'
import { calendarSchema } from '../../shared/bookings/calendar-schemas.ts'
import { bookingFirm, fri, mon, sat, thu, wed } from './booking-kit.ts'

type Firm = Awaited<ReturnType<typeof bookingFirm>>

const hoursOf = async (firm: Firm, email: string) => {
  const agent = await firm.app.agentFor(email)
  const answer = await agent.get(`/api/calendar?from=${wed}&to=${mon}`).expect(200)
  return calendarSchema.parse(answer.body).crewHours
}

test('the office sees each crew’s hours on each day, booked or not', async () => {
  const firm = await bookingFirm()
  await firm.booked({ days: [thu] })
  const hours = await hoursOf(firm, firm.people.office.email)
  const of = (crewId: string, day: string) =>
    hours.find((one) => one.crewId === crewId && one.day === day)
  // Two in the one crew and one in the other, eight hours each: the firm of the tests.
  expect(of(firm.crew.id, fri)).toMatchObject({ availableMinutes: 960, peopleThere: 2 })
  expect(of(firm.otherCrew.id, fri)).toMatchObject({ availableMinutes: 480, peopleThere: 1 })
  expect(hours).toHaveLength(12)
  expect(
    hours
      .filter((one) => one.day === sat)
      .map((one) => one.crewId)
      .sort(),
  ).toEqual([firm.crew.id, firm.otherCrew.id].sort())
})

test('a leading hand sees the hours of the days the own crew is booked, and of no other crew', async () => {
  const firm = await bookingFirm()
  await firm.booked({ days: [thu] })
  await firm.booked({ jobId: firm.jobs.creekJob, crewId: firm.otherCrew.id, days: [fri] })
  const hours = await hoursOf(firm, firm.people.lead.email)
  expect(hours).toEqual([{ crewId: firm.crew.id, day: thu, availableMinutes: 960, peopleThere: 2 }])
})
