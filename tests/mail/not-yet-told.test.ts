import { expect, test } from 'vitest'
import type { NotYetTold } from '../../shared/notices/notice-schemas.ts'
import { createMailYard } from './support/mail-yard.ts'

// Wed 2 Dec 2026, 10:00 in Brisbane; the next reminder hour is 15:00 (05:00 UTC).

async function yardAhead(days: string[]) {
  const yard = await createMailYard()
  const booking = yard.book(days)
  const office = await yard.agentFor(yard.office.email)
  const worker = yard.worker()
  const list = async (): Promise<NotYetTold['people']> =>
    (await office.get('/api/notices').expect(200)).body.people
  const tell = (people: { id: string; days: string[] }[], status = 202) =>
    office.post('/api/notices').send({ people }).expect(status)
  const tellAll = async () => {
    const people = (await list()).map((one) => ({ id: one.id, days: one.days.map((d) => d.day) }))
    await tell(people)
    await worker.runOnce()
  }
  return { yard, booking, office, worker, list, tell, tellAll }
}

test('a firm day ahead is listed for each of the crew, and Tell them sends one mail a person with days and numbers', async () => {
  const { yard, list, tellAll } = await yardAhead(['2026-12-08', '2026-12-09'])
  const before = await list()
  expect(before.map((one) => one.name)).toEqual(['Bede Farrow', 'Tamsin Rook'])
  expect(before[0]?.days.map((one) => [one.day, one.isNew, one.changes])).toEqual([
    ['2026-12-08', true, ['New: QR-100 Hip roof, start 07:00.']],
    ['2026-12-09', true, ['New: QR-100 Hip roof, start 07:00.']],
  ])
  await tellAll()
  expect(yard.fake.sent.map((mail) => mail.to).sort()).toEqual(
    [yard.apprentice.email, yard.lead.email].sort(),
  )
  expect(yard.fake.sent[0]?.subject).toBe('New: Tue 8 Dec and Wed 9 Dec')
  expect(yard.fake.sent[0]?.text).toContain('12 Kiln Road, Marrow Creek')
  expect(yard.fake.sent[0]?.text).toContain('Cut length 3853 mm')
  expect(await list()).toEqual([])
})

test('a day told early still has its reminder on the working day before', async () => {
  const { yard, worker, tellAll } = await yardAhead(['2026-12-08'])
  await tellAll()
  expect(yard.fake.sent).toHaveLength(2)
  yard.at('2026-12-07T05:00:00Z')
  await worker.runOnce()
  expect(yard.sentTo(yard.lead.email)[1]?.subject).toBe(
    'Tue 8 Dec, 07:00: 12 Kiln Road, Marrow Creek',
  )
})

test('a day moved away and back again is not on the list', async () => {
  const { yard, booking, list, tellAll } = await yardAhead(['2026-12-08'])
  await tellAll()
  yard.moveDay(booking.dayIds[0]!, '2026-12-10')
  expect((await list())[0]?.days.map((one) => one.day)).toEqual(['2026-12-08', '2026-12-10'])
  yard.moveDay(booking.dayIds[0]!, '2026-12-08')
  expect(await list()).toEqual([])
})

test('a day moved several times is told once, from where it was to where it is', async () => {
  const { yard, booking, tellAll } = await yardAhead(['2026-12-08'])
  await tellAll()
  for (const day of ['2026-12-10', '2026-12-11', '2026-12-14'])
    yard.moveDay(booking.dayIds[0]!, day)
  await tellAll()
  const [, notice] = yard.sentTo(yard.lead.email)
  expect(notice?.subject).toBe('Change: Tue 8 Dec and Mon 14 Dec')
  expect(notice?.text).toContain('QR-100 Hip roof: moved, now on Mon 14 Dec.')
  expect(notice?.text).not.toContain('10 Dec')
})

test('two days told that change together make one notice a person when the hold runs out', async () => {
  const { yard, booking, worker, tellAll } = await yardAhead(['2026-12-08', '2026-12-09'])
  await tellAll()
  yard.setBooking(booking.id, { startAt: '09:00' })
  yard.at('2026-12-02T01:00:00Z')
  await worker.runOnce()
  yard.at('2026-12-02T01:15:00Z')
  await worker.runOnce()
  expect(yard.sentTo(yard.lead.email).map((mail) => mail.subject)).toEqual([
    'New: Tue 8 Dec and Wed 9 Dec',
    'Change: Tue 8 Dec and Wed 9 Dec',
  ])
})

test('a change that the hold will send says when it goes by itself', async () => {
  const { yard, booking, worker, list, tellAll } = await yardAhead(['2026-12-08'])
  await tellAll()
  yard.setBooking(booking.id, { startAt: '09:00' })
  yard.at('2026-12-02T01:00:00Z')
  await worker.runOnce()
  expect((await list())[0]?.days[0]?.goesAt).toBe('2026-12-02T01:15:00.000Z')
})

test('lines that move from day to day before the reminder are nothing to tell', async () => {
  const { yard, booking, list, tellAll } = await yardAhead(['2026-12-08'])
  await tellAll()
  yard.addTask(booking.dayIds[0]!, 'cut', 'R1')
  expect(await list()).toEqual([])
})

test('pressed twice, Tell them sends one mail; what is on its way is marked', async () => {
  const { yard, worker, list, tell } = await yardAhead(['2026-12-08'])
  const people = [{ id: yard.lead.id, days: ['2026-12-08'] }]
  expect((await tell(people)).body).toEqual({ mails: 1 })
  expect((await tell(people)).body).toEqual({ mails: 0 })
  const listed = await list()
  expect(listed.find((one) => one.id === yard.lead.id)?.days[0]?.isOnItsWay).toBe(true)
  await worker.runOnce()
  expect(yard.sentTo(yard.lead.email)).toHaveLength(1)
  await tell(people, 409)
})

test('a notice that had been given up goes when the office presses again', async () => {
  const { yard, worker, tell } = await yardAhead(['2026-12-08'])
  const people = [{ id: yard.lead.id, days: ['2026-12-08'] }]
  await tell(people)
  const key = `change:${yard.lead.id}:2026-12-08:1`
  yard.failMail(key)
  expect((await tell(people)).body).toEqual({ mails: 1 })
  await worker.runOnce()
  expect(yard.sentTo(yard.lead.email)).toHaveLength(1)
})

test('pencilled days and days whose reminder is due are not for this list', async () => {
  const { yard, booking, worker, list } = await yardAhead(['2026-12-03'])
  expect(await list()).toHaveLength(2)
  yard.setBooking(booking.id, { state: 'pencilled' })
  expect(await list()).toEqual([])
  yard.setBooking(booking.id, { state: 'firm' })
  yard.at('2026-12-02T05:00:00Z')
  expect(await list()).toEqual([])
  await worker.runOnce()
  expect(yard.fake.sent.map((mail) => mail.subject)).toEqual(
    Array(2).fill('Thu 3 Dec, 07:00: 12 Kiln Road, Marrow Creek'),
  )
})

test('somebody without an address is listed, to be texted or called', async () => {
  const { yard, list } = await yardAhead(['2026-12-08'])
  yard.setPerson(yard.lead.id, { email: '', phone: '0491 570 156' })
  const lead = (await list()).find((one) => one.id === yard.lead.id)
  expect(lead?.hasNoEmail).toBe(true)
  expect(lead?.textIt?.words).toContain('Tue 8 Dec: New: QR-100 Hip roof, start 07:00.')
})
