import { expect, test } from 'vitest'
import { eq } from 'drizzle-orm'
import { outbox } from '../../server/db/tables/mail-tables.ts'
import { crewMembers, leave } from '../../server/db/tables/people-tables.ts'
import { issuePasswordToken } from '../../server/auth/password-links.ts'
import { rosterOf } from '../../server/people/roster.ts'
import { fri, mon, thu, wed } from './booking-kit.ts'
import { jobKit } from './jobs-kit.ts'
import { twoCrewFirm } from './people-kit.ts'

test('trade school each Wednesday is one entry, and takes the Wednesdays only', async () => {
  const { app, agent, apprentice, adze } = await twoCrewFirm()
  const { body } = await agent
    .post(`/api/people/${apprentice.id}/leave`)
    .send({
      startsOn: '2026-12-01',
      endsOn: '2027-11-30',
      kind: 'trade-school',
      weekdays: [3, 3],
      reason: 'Block 2',
    })
    .expect(201)
  expect(body.leave).toMatchObject([{ kind: 'trade-school', weekdays: [3], reason: 'Block 2' }])
  const away = (day: string) =>
    rosterOf(app.db, adze.id, day).find((one) => one.id === apprentice.id)?.onLeave
  expect([wed, thu, '2026-12-09'].map(away)).toEqual([true, false, true])
})

test('weekdays that do not lie in the span, or none at all, are refused', async () => {
  const { app, agent, apprentice } = await twoCrewFirm()
  const send = (weekdays: unknown) =>
    agent
      .post(`/api/people/${apprentice.id}/leave`)
      .send({ startsOn: thu, endsOn: fri, kind: 'leave', weekdays, reason: '' })
  for (const weekdays of [[3], [], [8], ['Wed']]) {
    const { body } = await send(weekdays).expect(400)
    expect(body.issues[0].path).toMatch(/^weekdays/)
  }
  expect(app.db.select().from(leave).all()).toEqual([])
})

test('own ordinary hours are kept against a version; without them the firm’s are shown', async () => {
  const { agent, lead } = await twoCrewFirm()
  const path = `/api/people/${lead.id}`
  expect((await agent.get(path).expect(200)).body).toMatchObject({
    weekHours: null,
    firmWeekHours: [8, 8, 8, 8, 8, 0, 0],
  })
  const weekHours = [8, 8, 8, 8, 4.5, 0, 0]
  const put = (body: object) => agent.put(`${path}/hours`).send(body)
  expect((await put({ weekHours, version: 1 }).expect(200)).body).toMatchObject({
    weekHours,
    version: 2,
  })
  await put({ weekHours: null, version: 1 }).expect(409)
  for (const wrong of [[8, 8], [8, 8, 8, 8, 8, 0, -1], [25, 8, 8, 8, 8, 0, 0], 'all']) {
    await put({ weekHours: wrong, version: 2 }).expect(400)
  }
  expect((await put({ weekHours: null, version: 2 }).expect(200)).body.weekHours).toBeNull()
})

test('who was in which crew stays to be read, and a move taken back leaves no seam', async () => {
  const { app, agent, apprentice, adze, bevel } = await twoCrewFirm()
  const move = (crewId: string | null, from: string) =>
    agent.put(`/api/people/${apprentice.id}/crew`).send({ crewId, from }).expect(200)
  await move(bevel.id, mon)
  const { body } = await agent.get(`/api/people/${apprentice.id}`).expect(200)
  expect(body).toMatchObject({
    crewId: adze.id,
    nextMove: { crewId: bevel.id, from: mon },
    memberships: [
      { crewId: bevel.id, startsOn: mon, endsOn: null },
      { crewId: adze.id, startsOn: '2026-01-01', endsOn: '2026-12-06' },
    ],
  })
  const { body: crew } = await agent.get(`/api/crews/${adze.id}/people`).expect(200)
  expect(crew.members).toMatchObject([
    { name: 'Tamsin Rook', endsOn: null },
    { name: 'Wil Osei', endsOn: '2026-12-06' },
  ])
  await move(adze.id, mon)
  const rows = app.db
    .select()
    .from(crewMembers)
    .where(eq(crewMembers.personId, apprentice.id))
    .all()
  expect(rows).toMatchObject([{ crewId: adze.id, startsOn: '2026-01-01', endsOn: null }])
})

test('the link to sign in is said to be on its way, good until its day, over, or stuck', async () => {
  const { app, agent } = await twoCrewFirm()
  const person = { name: 'Jun Pell', email: 'jun@quillback.example', phone: '', role: 'apprentice' }
  const { body: made } = await agent
    .post('/api/people')
    .send({ ...person, crewId: null })
    .expect(201)
  const linkNow = async () => (await agent.get(`/api/people/${made.id}`).expect(200)).body.link
  const setMail = (values: Partial<typeof outbox.$inferInsert>) =>
    app.db.update(outbox).set(values).where(eq(outbox.personId, made.id)).run()
  expect(await linkNow()).toEqual({ state: 'waiting', sentAt: null, worksUntil: null })
  await agent.post(`/api/people/${made.id}/invitation`).expect(409)

  issuePasswordToken(app.db, made.id, app.clock.current, 168)
  setMail({ state: 'sent', sentAt: app.clock.current })
  expect(await linkNow()).toEqual({
    state: 'works',
    sentAt: app.clock.current.toISOString(),
    worksUntil: '2026-12-09T00:00:00.000Z',
  })
  app.clock.current = new Date('2026-12-09T00:00:01Z')
  expect(await linkNow()).toMatchObject({ state: 'ended', worksUntil: null })
  setMail({ state: 'failed', sentAt: null })
  expect(await linkNow()).toMatchObject({ state: 'failed' })
  await agent.post(`/api/people/${made.id}/invitation`).expect(202)
  expect(await linkNow()).toMatchObject({ state: 'waiting' })
  const { body } = await agent.get('/api/people').expect(200)
  const seeded = (body.people as { name: string; link: unknown }[]).find(
    (one) => one.name === 'Bex Arden',
  )
  expect(seeded?.link).toMatchObject({ state: 'none' })
})

test('no word of a password, a session or a link’s token is in what the office gets of people', async () => {
  const { agent, lead } = await twoCrewFirm()
  const list = await agent.get('/api/people').expect(200)
  const one = await agent.get(`/api/people/${lead.id}`).expect(200)
  const stale = await agent
    .put(`/api/people/${lead.id}/hours`)
    .send({ weekHours: null, version: 9 })
    .expect(409)
  for (const answer of [list, one, stale])
    expect(JSON.stringify(answer.body)).not.toMatch(/password|argon|sessionEpoch|token/i)
})

test('a crew is stood down once nobody is in it, and then takes nobody', async () => {
  const { app, agent, otherLead, apprentice, bevel } = await twoCrewFirm()
  const put = (active: boolean) =>
    agent.put(`/api/crews/${bevel.id}`).send({ name: 'Bevel crew', letter: 'B', colour: 2, active })
  const move = (id: string, crewId: string | null) =>
    agent.put(`/api/people/${id}/crew`).send({ crewId, from: wed })
  expect((await put(false).expect(400)).body.issues[0].path).toBe('active')
  await move(otherLead.id, null).expect(200)
  const kit = jobKit(app)
  kit.addBooking(kit.addJob({}), bevel.id, [fri])
  expect((await put(false).expect(400)).body.issues[0].message).toMatch(/days booked/)
  app.clock.current = new Date('2026-12-07T00:00:00Z')
  await put(false).expect(200)
  const to = { crewId: bevel.id, from: '2026-12-08' }
  const refused = await agent.put(`/api/people/${apprentice.id}/crew`).send(to).expect(400)
  expect(refused.body.issues[0].path).toBe('crewId')
  await put(true).expect(200)
  await agent.put(`/api/people/${apprentice.id}/crew`).send(to).expect(200)
})
