import { expect, test } from 'vitest'
import { readCrewHours } from '../../server/bookings/crew-hours.ts'
import { crewLoans, leave, people, tickets } from '../../server/db/tables/people-tables.ts'
import { readFirm } from '../../server/firm/firm-store.ts'
import { newId } from '../../server/lib/ids.ts'
import { readCrewFacts } from '../../server/people/crew-facts.ts'
import { crewIdsOf, rosterOf } from '../../server/people/roster.ts'
import { eq } from 'drizzle-orm'
import { dayPlus } from '../../shared/calendar/days.ts'
import { createTestApp } from './harness.ts'

const thu = '2026-12-03'
const fri = '2026-12-04'
const mon = '2026-12-07'
const wed = '2026-12-09'
const span = { from: '2026-12-01', to: '2026-12-31' }

async function twoCrews() {
  const app = await createTestApp()
  const lead = app.addPerson('leading-hand', 'Tamsin Rook')
  const wil = app.addPerson('apprentice', 'Wil Osei')
  const bex = app.addPerson('leading-hand', 'Bex Arden')
  const adze = app.addCrew('Adze crew', [lead.id, wil.id])
  const bevel = app.addCrew('Bevel crew', [bex.id])
  const lend = (personId: string, crewId: string, day: string) =>
    app.db.insert(crewLoans).values({ id: newId(), personId, crewId, day }).run()
  const away = (personId: string, values: Partial<typeof leave.$inferInsert>) =>
    app.db
      .insert(leave)
      .values({ id: newId(), personId, startsOn: span.from, endsOn: span.to, ...values })
      .run()
  const names = (crewId: string, day: string) =>
    readCrewFacts(app.db, span)
      .on(crewId, day)
      .there.map((person) => person.name)
  return { app, lead, wil, bex, adze, bevel, lend, away, names }
}

test('a person borrowed for a day counts for the borrowing crew that day and not for the own one', async () => {
  const { app, wil, adze, bevel, lend, names } = await twoCrews()
  lend(wil.id, bevel.id, fri)
  expect(names(adze.id, thu)).toEqual(['Tamsin Rook', 'Wil Osei'])
  expect(names(bevel.id, thu)).toEqual(['Bex Arden'])
  expect(names(adze.id, fri)).toEqual(['Tamsin Rook'])
  expect(names(bevel.id, fri)).toEqual(['Bex Arden', 'Wil Osei'])
  const facts = readCrewFacts(app.db, span)
  expect(facts.on(adze.id, fri).lent).toEqual([
    { id: wil.id, name: 'Wil Osei', toCrewId: bevel.id },
  ])
  expect([facts.on(adze.id, fri).minutes, facts.on(bevel.id, fri).minutes]).toEqual([480, 960])
})

test('trade school each Wednesday takes the Wednesdays and leaves the other days', async () => {
  const { app, wil, adze, away, names } = await twoCrews()
  away(wil.id, { kind: 'trade-school', weekdays: [3] })
  expect(names(adze.id, mon)).toEqual(['Tamsin Rook', 'Wil Osei'])
  expect(names(adze.id, wed)).toEqual(['Tamsin Rook'])
  expect(readCrewFacts(app.db, span).on(adze.id, wed).away).toEqual([
    { id: wil.id, name: 'Wil Osei', kind: 'trade-school' },
  ])
})

test('own ordinary hours count instead of the firm’s on their weekdays', async () => {
  const { app, lead, adze } = await twoCrews()
  const hours = { weekHours: [8, 8, 8, 8, 4, 0, 0] }
  app.db.update(people).set(hours).where(eq(people.id, lead.id)).run()
  const facts = readCrewFacts(app.db, span)
  expect(facts.on(adze.id, thu).minutes).toBe(16 * 60)
  expect(facts.on(adze.id, fri).minutes).toBe(12 * 60)
})

test('whoever has no account any more counts nowhere, borrowed or not', async () => {
  const { app, wil, adze, bevel, lend, names } = await twoCrews()
  lend(wil.id, bevel.id, fri)
  app.db.update(people).set({ active: false }).where(eq(people.id, wil.id)).run()
  expect([names(adze.id, thu), names(bevel.id, fri)]).toEqual([['Tamsin Rook'], ['Bex Arden']])
})

test('the roster of a day, the hours of a span and the facts agree on every day of a month', async () => {
  const { app, wil, bex, lead, adze, bevel, lend, away } = await twoCrews()
  lend(wil.id, bevel.id, fri)
  lend(bex.id, adze.id, wed)
  away(wil.id, { kind: 'trade-school', weekdays: [3] })
  away(lead.id, { startsOn: '2026-12-14', endsOn: '2026-12-16' })
  const facts = readCrewFacts(app.db, span)
  const hours = readCrewHours(app.db, span, readFirm(app.db))
  for (let day = span.from; day <= span.to; day = dayPlus(day, 1)) {
    for (const crew of [adze, bevel]) {
      const roster = rosterOf(app.db, crew.id, day)
      const { there, away: gone, minutes } = facts.on(crew.id, day)
      const present = roster.filter((person) => !person.onLeave).map((person) => person.id)
      expect(there.map((person) => person.id)).toEqual(present)
      expect(gone).toHaveLength(roster.length - present.length)
      expect(hours.on(crew.id, day)).toMatchObject({ thereIds: present, minutes })
      for (const person of [lead, wil, bex]) {
        const counts = crewIdsOf(app.db, person.id, day).includes(crew.id)
        expect(counts).toBe(roster.some((one) => one.id === person.id))
      }
    }
  }
})

test('tickets are given with the last day they hold, none for whoever has none', async () => {
  const { app, wil, lead } = await twoCrews()
  app.db
    .insert(tickets)
    .values({ id: newId(), personId: wil.id, kind: 'working-at-heights', expiresOn: fri })
    .run()
  const facts = readCrewFacts(app.db, span)
  expect(facts.ticketsOf(wil.id)).toEqual([{ kind: 'working-at-heights', expiresOn: fri }])
  expect(facts.ticketsOf(lead.id)).toEqual([])
})
