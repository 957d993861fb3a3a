import { expect, test } from 'vitest'
import type { Landings } from '../../shared/clashes/clash-schemas.ts'
import type { ClashList } from '../../shared/clashes/clash-list-schemas.ts'
import { dayPlus } from '../../shared/calendar/days.ts'
import { bookingFirm, mon, thu, wed } from './booking-kit.ts'

type Firm = Awaited<ReturnType<typeof bookingFirm>>

async function queriesOf(firm: Firm, path: string): Promise<{ count: number; body: unknown }> {
  const { sqlite } = firm.app.database
  const prepare = sqlite.prepare.bind(sqlite)
  const counted = { count: 0 }
  sqlite.prepare = ((source: string) => {
    counted.count++
    return prepare(source)
  }) as typeof sqlite.prepare
  const { body } = await firm.officeAgent.get(path).expect(200)
  sqlite.prepare = prepare
  return { count: counted.count, body: body as unknown }
}

/** Bookings of two days each, one after another on both crews, straight into the tables. */
function bookMany(firm: Firm, from: number, to: number): void {
  for (let i = from; i < to; i++) {
    const jobId = firm.kit.addJob({ number: `X-${i}`, title: `House ${i}` })
    const first = dayPlus(mon, 2 * Math.floor(i / 2))
    const crewId = i % 2 === 0 ? firm.crew.id : firm.otherCrew.id
    firm.kit.addBooking(jobId, crewId, [first, dayPlus(first, 1)], 'pencilled')
  }
}

test('clashes of 500 bookings take as many queries as those of two: the list, the calendar and the landings', async () => {
  const firm = await bookingFirm()
  const hill = await firm.booked()
  bookMany(firm, 0, 1)
  const paths = [
    '/api/clashes',
    `/api/calendar?from=${wed}&to=2027-01-31`,
    `/api/bookings/${hill.id}/landings?from=${wed}&to=2027-01-31&day=${thu}`,
    `/api/jobs/${firm.jobs.creekJob}/landings?from=${wed}&to=2027-01-31`,
  ]
  const few: number[] = []
  for (const path of paths) few.push((await queriesOf(firm, path)).count)
  bookMany(firm, 1, 500)
  const many: number[] = []
  for (const path of paths) many.push((await queriesOf(firm, path)).count)
  expect(many).toEqual(few)
  expect(Math.max(...many)).toBeLessThan(40)
  const { clashes } = (await queriesOf(firm, '/api/clashes')).body as ClashList
  expect(new Set(clashes.map((clash) => clash.bookingId)).size).toBe(500)
  const landings = (await queriesOf(firm, paths[2] ?? '')).body as Landings
  // 61 days, two crews.
  expect(landings.landings).toHaveLength(122)
})
