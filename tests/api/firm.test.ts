import { expect, test } from 'vitest'
import { firm } from '../../server/db/tables/firm-tables.ts'
import { readFirm } from '../../server/firm/firm-store.ts'
import { isWorked, whyNotWorked, workedDaysFrom } from '../../shared/calendar/working-days.ts'
import { createTestApp } from './harness.ts'

async function office() {
  const app = await createTestApp()
  const agent = await app.agentFor(app.addPerson('office', 'Orla Brandt').email)
  const { body } = await agent.get('/api/firm').expect(200)
  const save = (changes: Record<string, unknown>) =>
    agent.put('/api/firm').send({ ...body, ...changes })
  return { app, agent, save }
}

test('a firm in Queensland does not work on the Friday of Christmas 2026', async () => {
  const { app, save } = await office()
  expect(isWorked(readFirm(app.db), '2026-12-25')).toBe(true)

  await save({ holidayCountry: 'AU', holidayState: 'QLD' }).expect(200)

  const read = readFirm(app.db)
  expect(whyNotWorked(read, '2026-12-25')).toBe('Christmas Day')
  // Boxing Day is a Saturday that year and moves to the Monday.
  expect(workedDaysFrom(read, '2026-12-24', 3)).toEqual(['2026-12-24', '2026-12-29', '2026-12-30'])
  expect(read.ownClosedDays).toEqual([])
})

test('a holiday worked all the same is a working day, on the weekday it moved to as well', async () => {
  const { app, save } = await office()
  await save({
    holidayCountry: 'AU',
    holidayState: 'QLD',
    holidaysWorked: ['Boxing Day'],
  }).expect(200)
  const read = readFirm(app.db)
  expect(isWorked(read, '2026-12-28')).toBe(true)
  expect(isWorked(read, '2026-12-25')).toBe(false)
})

test('a Christmas break typed once shuts all its days and is given back as typed', async () => {
  const { app, save } = await office()
  const breakTyped = { day: '2026-12-21', lastDay: '2027-01-08', name: 'Christmas break' }
  const { body } = await save({ ownClosedDays: [breakTyped] }).expect(200)
  expect(body.ownClosedDays).toEqual([breakTyped])
  expect(body).not.toHaveProperty('closedDays')
  expect(workedDaysFrom(readFirm(app.db), '2026-12-18', 2)).toEqual(['2026-12-18', '2027-01-11'])
})

test('a closed day stored before closures had a last day still shuts that day', async () => {
  const { app } = await office()
  app.db
    .update(firm)
    .set({ closedDays: [{ day: '2026-12-04', name: 'Show day' }] })
    .run()
  expect(whyNotWorked(readFirm(app.db), '2026-12-04')).toBe('Show day')
})

test('holidays of a far year are there when its span is asked for', async () => {
  const { app, save } = await office()
  await save({ holidayCountry: 'AU', holidayState: 'QLD' }).expect(200)
  const span = { from: '2041-04-01', to: '2041-04-30' }
  // Good Friday is 19 April 2041, Easter Sunday being the 21st (Gregorian computus, Meeus, chapter 8).
  expect(whyNotWorked(readFirm(app.db, span), '2041-04-19')).toBe('Good Friday')
})

test('a closure that ends before it begins, an unknown country and a state elsewhere are refused at their field', async () => {
  const { save } = await office()
  const backwards = { day: '2026-12-21', lastDay: '2026-12-20', name: 'Break' }
  const closure = await save({ ownClosedDays: [backwards] }).expect(400)
  expect(closure.body.issues[0].path).toBe('ownClosedDays.0.lastDay')
  const country = await save({ holidayCountry: 'XX' }).expect(400)
  expect(country.body.issues[0].path).toBe('holidayCountry')
  const state = await save({ holidayCountry: 'AU', holidayState: 'TX' }).expect(400)
  expect(state.body.issues[0].path).toBe('holidayState')
  const hours = await save({ weekHours: [8, 8, 8] }).expect(400)
  expect(hours.body.issues[0].path).toBe('weekHours')
})

test('the office sees the holidays of a place before it chooses it', async () => {
  const { agent } = await office()
  const { body } = await agent.get('/api/firm/holidays?country=AU&state=VIC&year=2026').expect(200)
  expect(body.states).toContainEqual({ code: 'VIC', name: 'Victoria' })
  expect(body.holidays).toContainEqual(expect.objectContaining({ day: '2026-11-03' }))
  await agent.get('/api/firm/holidays?country=AU&year=1066').expect(400)
})
