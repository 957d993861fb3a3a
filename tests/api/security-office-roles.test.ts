import { eq } from 'drizzle-orm'
import { expect, test } from 'vitest'
import { bookings } from '../../server/db/tables/booking-tables.ts'
import { milestones } from '../../server/db/tables/milestone-tables.ts'
import { crewLoans, leave, people, tickets } from '../../server/db/tables/people-tables.ts'
import { rainOffs } from '../../server/db/tables/rain-off-tables.ts'
import { variations } from '../../server/db/tables/variation-tables.ts'
import { newId } from '../../server/lib/ids.ts'
import type { Agent } from './harness.ts'
import { crewOnSite, days } from './day-sheet-kit.ts'

/** What is between a person and the office, or another crew's, wherever in an answer it would stand. */
const officeOnly = {
  customer: 'Osric Hale',
  customerPhone: '0491 570 157',
  notes: 'Slow payer',
  clashReason: 'Promised before the customer pays',
  leaveReason: 'Knee operation',
  leaveKind: 'sick',
  ticketNumber: 'WAH 4471',
  ticketDay: '2026-11-17',
  ticketDayInWords: '17 Nov',
  loanNote: 'Bex wants rid of him',
  colleaguePhone: '0491 570 158',
  mailDomain: 'quillback.example',
  variation: 'Skylight trimmed in',
  variationPrice: '45678',
  otherJob: 'Wintle Lane shed',
  otherRain: 'Creek is over the road',
  otherLead: 'Bex Arden',
}

function otherCrewsDays({ app, kit, office, otherCrew }: Site & { office: Agent }) {
  const jobId = kit.addJob({ title: officeOnly.otherJob })
  const booking = kit.addBooking(jobId, otherCrew.id, Object.values(days))
  const asked = { crewId: otherCrew.id, fromDay: days.thursday, workingDays: 1 }
  app.db
    .insert(rainOffs)
    .values({ id: newId(), ...asked, reason: officeOnly.otherRain, state: 'asked' })
    .run()
  return { jobId, booking, office }
}
type Site = Awaited<ReturnType<typeof crewOnSite>>

/** A crew with somebody sick, a lapsed ticket, somebody borrowed, two jobs on purpose and a late delivery. */
async function fullSite() {
  const site = await crewOnSite()
  const { app, kit, crew, jobId, people: who } = site
  const office = await app.agentFor(who.office.email)
  app.db.update(people).set({ phone: officeOnly.colleaguePhone }).run()
  app.db.update(bookings).set({ clashReason: officeOnly.clashReason }).run()
  kit.addBooking(kit.addJob({ title: 'Second job of the day' }), crew.id, [days.wednesday])
  const other = otherCrewsDays({ ...site, office })
  const sick = { startsOn: days.thursday, endsOn: days.thursday, kind: 'sick' as const }
  const at = { jobId, updatedAt: app.clock.current }
  app.db
    .insert(leave)
    .values({ id: newId(), personId: who.apprentice.id, ...sick, reason: officeOnly.leaveReason })
    .run()
  app.db
    .insert(tickets)
    .values({
      id: newId(),
      personId: who.apprentice.id,
      kind: 'working-at-heights',
      number: officeOnly.ticketNumber,
      expiresOn: officeOnly.ticketDay,
    })
    .run()
  app.db
    .insert(crewLoans)
    .values({
      id: newId(),
      personId: who.otherApprentice.id,
      crewId: crew.id,
      day: days.wednesday,
      note: officeOnly.loanNote,
    })
    .run()
  app.db
    .insert(milestones)
    .values({ id: newId(), ...at, kind: 'timber-on-site', state: 'promised', day: '2026-12-09' })
    .run()
  app.db
    .insert(variations)
    .values({
      id: newId(),
      jobId,
      sequence: 1,
      reason: officeOnly.variation,
      priceCents: Number(officeOnly.variationPrice),
      createdById: who.office.id,
      createdAt: app.clock.current,
    })
    .run()
  return { ...site, office, other }
}
type FullSite = Awaited<ReturnType<typeof fullSite>>

/** Every address that the office's new screens and those on site read. */
function addresses({ jobId, booking, dayIds, crew, people: who }: FullSite): string[] {
  const span = `from=${days.tuesday}&to=${days.monday}`
  return [
    '/api/jobs',
    `/api/jobs/${jobId}`,
    `/api/jobs/${jobId}/milestones`,
    `/api/jobs/${jobId}/variations`,
    `/api/jobs/${jobId}/hours`,
    `/api/jobs/${jobId}/openings`,
    `/api/jobs/${jobId}/landings?${span}`,
    `/api/jobs/${jobId}/revisions/A/against/A`,
    `/api/calendar?${span}`,
    '/api/calendar/unbooked',
    `/api/bookings/${booking.id}`,
    `/api/bookings/${booking.id}/landings?${span}&day=${days.thursday}`,
    '/api/clashes',
    '/api/rain-offs',
    `/api/rain-offs/preview?crew=${crew.id}&day=${days.thursday}&days=1`,
    '/api/notices',
    '/api/hours',
    '/api/hours.csv',
    '/api/people',
    `/api/people/${who.apprentice.id}`,
    '/api/crews',
    `/api/crews/${crew.id}/people`,
    '/api/firm/holidays',
    ...Object.values(dayIds).map((id) => `/api/day-sheets/${id}/log`),
    ...Object.values(days).map((day) => `/api/day-sheets?day=${day}`),
  ]
}

/** All answers as one text, the person's own address left out. */
async function everythingSeen(site: FullSite, agent: Agent, ownEmail: string): Promise<string> {
  const texts: string[] = []
  for (const address of addresses(site)) {
    const answer = await agent.get(address)
    expect(answer.status, address).toBeLessThan(500)
    texts.push(answer.text)
  }
  return texts.join('\n').replaceAll(ownEmail, '')
}

function found(text: string): string[] {
  return Object.entries(officeOnly).flatMap(([name, words]) => (text.includes(words) ? [name] : []))
}

test('the office finds all of it, so the words looked for are really there', async () => {
  const site = await fullSite()
  const text = await everythingSeen(site, site.office, site.people.office.email)
  expect(Object.keys(officeOnly).filter((name) => !found(text).includes(name))).toEqual([])
})

test('neither a leading hand nor an apprentice is told why somebody is away, when a card lapsed, what the office noted, or what another crew does', async () => {
  const site = await fullSite()
  for (const { email } of [site.people.lead, site.people.apprentice]) {
    const text = await everythingSeen(site, await site.app.agentFor(email), email)
    expect(text).toContain('House at Lot 12')
    expect(found(text)).toEqual([])
  }
})

test('a leading hand is told of the crew’s clashes all the same, without dates and reasons', async () => {
  const site = await fullSite()
  const { body } = await (await site.app.agentFor(site.people.lead.email)).get('/api/clashes')
  const texts = (body.clashes as { text: string }[]).map((one) => one.text).join(' ')
  expect(texts).toContain('Wim Casey: working at heights lapsed.')
  expect(texts).toContain('Away: Wim Casey.')
  expect(texts).toContain('on purpose.')
})

test('somebody lent for a day sees that crew’s day and no other of it, and not the own crew’s', async () => {
  const site = await fullSite()
  const { otherApprentice } = site.people
  site.app.db
    .update(people)
    .set({ role: 'leading-hand' })
    .where(eq(people.id, otherApprentice.id))
    .run()
  const agent = await site.app.agentFor(otherApprentice.email)
  await agent.get(`/api/day-sheets/${site.dayIds.wednesday}/log`).expect(200)
  await agent.get(`/api/day-sheets/${site.dayIds.thursday}/log`).expect(404)
  const own = site.other.booking.dayIds
  await agent.get(`/api/day-sheets/${own[1]}/log`).expect(404)
  await agent.get(`/api/day-sheets/${own[2]}/log`).expect(200)
  const { body } = await agent.get('/api/clashes').expect(200)
  const days = (body.clashes as { bookingId: string; days: string[] }[])
    .filter((one) => one.bookingId === site.booking.id)
    .flatMap((one) => one.days)
  expect(new Set(days)).toEqual(new Set(['2026-12-02']))
})
