import { expect, test } from 'vitest'
import { createMailYard } from './support/mail-yard.ts'

// Brisbane is UTC+10 all the year. Wed 2 Dec 2026; the firm's hour is 15:00, work starts at 07:00.

test('the reminder goes at the firm’s hour of the day before, and not a minute earlier', async () => {
  const yard = await createMailYard()
  yard.book(['2026-12-03'])
  const worker = yard.worker()
  yard.at('2026-12-02T04:59:59Z')
  await worker.runOnce()
  expect(yard.fake.sent).toHaveLength(0)
  yard.at('2026-12-02T05:00:00Z')
  await worker.runOnce()
  expect(yard.fake.sent.map((mail) => mail.to).sort()).toEqual(
    [yard.apprentice.email, yard.lead.email].sort(),
  )
})

test('Monday’s reminder goes on Friday, and a closed Friday moves it to Thursday', async () => {
  const yard = await createMailYard({ now: new Date('2026-12-03T00:00:00Z') })
  yard.book(['2026-12-07'])
  const worker = yard.worker()
  yard.at('2026-12-03T05:00:00Z')
  await worker.runOnce()
  expect(yard.fake.sent).toHaveLength(0)
  yard.at('2026-12-04T05:00:00Z')
  await worker.runOnce()
  expect(yard.fake.sent).toHaveLength(2)

  const closed = await createMailYard({ now: new Date('2026-12-03T00:00:00Z') })
  closed.setFirm({ closedDays: [{ day: '2026-12-04', name: 'Show day' }] })
  closed.book(['2026-12-07'])
  const early = closed.worker()
  closed.at('2026-12-03T04:59:00Z')
  await early.runOnce()
  expect(closed.fake.sent).toHaveLength(0)
  closed.at('2026-12-03T05:00:00Z')
  await early.runOnce()
  expect(closed.fake.sent).toHaveLength(2)
})

test('in Sydney the hour stays 15:00 on the wall across both changes of the clock', async () => {
  // IANA tz database: Australia/Sydney goes to UTC+11 on Sun 4 Oct 2026 and back to UTC+10 on Sun 4 Apr 2027.
  const spring = await createMailYard({
    now: new Date('2026-10-02T00:00:00Z'),
    timeZone: 'Australia/Sydney',
  })
  spring.book(['2026-10-05'])
  spring.book(['2026-10-06'])
  const worker = spring.worker()
  spring.at('2026-10-02T04:59:00Z')
  await worker.runOnce()
  expect(spring.fake.sent).toHaveLength(0)
  spring.at('2026-10-02T05:00:00Z')
  await worker.runOnce()
  expect(spring.fake.sent).toHaveLength(2)
  // 07:00 on Monday is in summer time already: Sunday 20:00 UTC.
  expect(spring.mailOf(`reminder:${spring.lead.id}:2026-10-05`)?.notAfter?.toISOString()).toBe(
    '2026-10-04T20:00:00.000Z',
  )
  spring.at('2026-10-05T03:59:00Z')
  await worker.runOnce()
  expect(spring.fake.sent).toHaveLength(2)
  spring.at('2026-10-05T04:00:00Z')
  await worker.runOnce()
  expect(spring.fake.sent).toHaveLength(4)

  const autumn = await createMailYard({
    now: new Date('2027-04-02T00:00:00Z'),
    timeZone: 'Australia/Sydney',
  })
  autumn.book(['2027-04-05'])
  const later = autumn.worker()
  autumn.at('2027-04-02T03:59:00Z')
  await later.runOnce()
  expect(autumn.fake.sent).toHaveLength(0)
  autumn.at('2027-04-02T04:00:00Z')
  await later.runOnce()
  expect(autumn.fake.sent).toHaveLength(2)
  expect(autumn.mailOf(`reminder:${autumn.lead.id}:2027-04-05`)?.notAfter?.toISOString()).toBe(
    '2027-04-04T21:00:00.000Z',
  )
})

test('what is booked, or made firm, after the hour goes out at once', async () => {
  const yard = await createMailYard()
  const worker = yard.worker()
  yard.at('2026-12-02T09:30:00Z')
  await worker.runOnce()
  const pencilled = yard.book(['2026-12-03'], { state: 'pencilled' })
  await worker.runOnce()
  expect(yard.fake.sent).toHaveLength(0)
  yard.setBooking(pencilled.id, { state: 'firm' })
  await worker.runOnce()
  expect(yard.fake.sent).toHaveLength(2)
})

test('a late worker still sends before work starts, and not after', async () => {
  const late = await createMailYard()
  late.book(['2026-12-03'])
  late.at('2026-12-02T20:59:59Z')
  await late.worker().runOnce()
  expect(late.fake.sent).toHaveLength(2)

  const tooLate = await createMailYard()
  tooLate.book(['2026-12-03'])
  tooLate.at('2026-12-02T21:00:00Z')
  await tooLate.worker().runOnce()
  expect(tooLate.fake.sent).toHaveLength(0)
})

test('a reminder that could not be sent before work started is dropped and says so', async () => {
  const yard = await createMailYard()
  yard.book(['2026-12-03'])
  const worker = yard.worker()
  yard.fake.failNext(2)
  yard.at('2026-12-02T20:30:00Z')
  await worker.runOnce()
  yard.at('2026-12-02T21:00:00Z')
  await worker.runOnce()
  expect(yard.fake.sent).toHaveLength(0)
  expect(yard.mails().map((mail) => mail.state)).toEqual(['dropped', 'dropped'])
  expect(yard.mails()[0]?.lastError).toBe('Work had started before it could be sent.')
})

test('one person gets one mail a day, over repeated runs, restarts and two bookings', async () => {
  const yard = await createMailYard()
  yard.book(['2026-12-03', '2026-12-04'])
  const second = yard.addJob({ title: 'Garage', siteAddress: '3 Mill Lane, Marrow Creek' })
  yard.book(['2026-12-03'], { jobId: second, startAt: '13:00' })
  yard.at('2026-12-02T05:00:00Z')
  const worker = yard.worker()
  await worker.runOnce()
  await worker.runOnce()
  await yard.worker().runOnce()
  yard.at('2026-12-02T06:00:00Z')
  await yard.worker().runOnce()
  const mine = yard.sentTo(yard.lead.email)
  expect(mine).toHaveLength(1)
  expect(mine[0]?.text).toContain('12 Kiln Road')
  expect(mine[0]?.text).toContain('3 Mill Lane')
  expect(mine[0]?.subject).toBe('Thu 3 Dec, 07:00: 12 Kiln Road, Marrow Creek and 1 more')
})

test('nobody on leave, left or of another crew is mailed, and pencilled bookings mail nobody', async () => {
  const yard = await createMailYard()
  yard.book(['2026-12-03'])
  yard.book(['2026-12-03'], { crewId: yard.otherCrew.id, state: 'pencilled' })
  yard.book(['2026-12-03'], { crewId: yard.otherCrew.id, cancelledAt: yard.clock.current })
  yard.putOnLeave(yard.apprentice.id, '2026-12-03')
  yard.at('2026-12-02T05:00:00Z')
  await yard.worker().runOnce()
  expect(yard.fake.sent.map((mail) => mail.to)).toEqual([yard.lead.email])
  expect(yard.fake.sent[0]?.text).not.toContain('Bede Farrow')

  const left = await createMailYard()
  left.book(['2026-12-03'])
  left.setPerson(left.lead.id, { active: false })
  left.at('2026-12-02T05:00:00Z')
  await left.worker().runOnce()
  expect(left.fake.sent.map((mail) => mail.to)).toEqual([left.apprentice.email])
})

test('a day booked, taken off before its mail left, and booked again still has its one reminder', async () => {
  const yard = await createMailYard()
  const booking = yard.book(['2026-12-03'])
  const worker = yard.worker()
  yard.fake.failNext(2)
  yard.at('2026-12-02T05:00:00Z')
  await worker.runOnce()
  yard.setBooking(booking.id, { cancelledAt: yard.clock.current })
  yard.at('2026-12-02T05:10:00Z')
  await worker.runOnce()
  expect(yard.mails().map((mail) => mail.state)).toEqual(['dropped', 'dropped'])
  yard.book(['2026-12-03'])
  await worker.runOnce()
  expect(yard.sentTo(yard.lead.email)).toHaveLength(1)
  expect(yard.sentTo(yard.apprentice.email)).toHaveLength(1)
})
