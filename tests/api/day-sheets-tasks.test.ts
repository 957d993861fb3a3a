import { eq } from 'drizzle-orm'
import { expect, test } from 'vitest'
import { tasks, ticks } from '../../server/db/tables/booking-tables.ts'
import { audit } from '../../server/db/tables/audit-tables.ts'
import { leave } from '../../server/db/tables/people-tables.ts'
import { newId } from '../../server/lib/ids.ts'
import { crewOnSite, days } from './day-sheet-kit.ts'

test('a tick sent twice by a phone with a poor line counts once', async () => {
  const site = await crewOnSite()
  const taskId = site.addTask(site.dayIds.wednesday, { assignedToId: site.people.apprentice.id })
  const agent = await site.app.agentFor(site.people.apprentice.email)
  const tick = site.tick()
  const heard: string[] = []
  site.app.events.subscribe((event) => heard.push(event.topic))
  const first = await agent.post(`/api/tasks/${taskId}/ticks`).send(tick).expect(200)
  const again = await agent.post(`/api/tasks/${taskId}/ticks`).send(tick).expect(200)
  expect(first.body.task.doneCount).toBe(1)
  expect(again.body.task.doneCount).toBe(1)
  expect(site.app.db.select().from(ticks).all()).toHaveLength(1)
  expect(heard).toContain('day-sheet')
})

test('no count goes under none or over all of a line', async () => {
  const site = await crewOnSite()
  const taskId = site.addTask(site.dayIds.wednesday, { assignedToId: site.people.apprentice.id })
  const agent = await site.app.agentFor(site.people.apprentice.email)
  const send = (delta: number) =>
    agent.post(`/api/tasks/${taskId}/ticks`).send({ id: newId(), delta })
  const under = await send(-1).expect(409)
  expect(under.body.message).toBe('None of these is ticked, so none can be taken back.')
  for (let i = 0; i < 3; i++) await send(1).expect(200)
  const over = await send(1).expect(409)
  expect(over.body.message).toBe('All 3 of these are ticked already.')
  const back = await send(-1).expect(200)
  expect(back.body.task.doneCount).toBe(2)
  await send(2).expect(400)
})

test('a tick’s id cannot be used for another task', async () => {
  const site = await crewOnSite()
  const a = site.addTask(site.dayIds.wednesday)
  const b = site.addTask(site.dayIds.wednesday, { position: 1 })
  const agent = await site.app.agentFor(site.people.lead.email)
  const tick = site.tick()
  await agent.post(`/api/tasks/${a}/ticks`).send(tick).expect(200)
  await agent.post(`/api/tasks/${b}/ticks`).send(tick).expect(409)
})

test('an apprentice opens and ticks own tasks only', async () => {
  const site = await crewOnSite()
  const own = site.addTask(site.dayIds.wednesday, { assignedToId: site.people.apprentice.id })
  const mate = site.addTask(site.dayIds.wednesday, { assignedToId: site.people.lead.id })
  const open = site.addTask(site.dayIds.wednesday)
  const agent = await site.app.agentFor(site.people.apprentice.email)
  await agent.get(`/api/tasks/${own}`).expect(200)
  for (const taskId of [mate, open]) {
    await agent.get(`/api/tasks/${taskId}`).expect(404)
    await agent.post(`/api/tasks/${taskId}/ticks`).send(site.tick()).expect(404)
    await agent.post(`/api/tasks/${taskId}/hand`).send({ raised: true }).expect(404)
  }
  await agent.patch(`/api/tasks/${own}`).send({ version: 1, position: 0 }).expect(403)
  const mine = await agent.get('/api/my-tasks').expect(200)
  expect(mine.body.places).toHaveLength(1)
  expect(mine.body.places[0].tasks.map((task: { id: string }) => task.id)).toEqual([own])
  // Seven days after the day it is over.
  site.app.clock.current = new Date('2026-12-10T04:00:00Z')
  await agent.get(`/api/tasks/${own}`).expect(404)
  await agent.post(`/api/tasks/${own}/ticks`).send(site.tick()).expect(404)
})

test('a task’s card carries the numbers of the stored spec', async () => {
  const site = await crewOnSite()
  const hips = site.spec.cutLines.find((line) => line.role === 'hip')!
  const taskId = site.addTask(site.dayIds.wednesday, {
    cutLineMark: hips.mark,
    memberMarks: hips.members,
    quantity: hips.quantity,
  })
  const agent = await site.app.agentFor(site.people.lead.email)
  const { body } = await agent.get(`/api/tasks/${taskId}`).expect(200)
  const member = site.spec.members.find((one) => one.mark === body.card.drawnMark)!
  expect(body.member).toMatchObject(JSON.parse(JSON.stringify(member)))
  expect(body.card.cutLength.valueMm).toBe(hips.cutLengthMm)
  expect(body.card.setOutLength.valueMm).toBe(member.setOutLengthMm)
  expect(body.place).toMatchObject({ revisionLetter: 'A', platesMeasured: false })
})

test('set-out work has a task but no card', async () => {
  const site = await crewOnSite()
  const taskId = site.addTask(site.dayIds.wednesday, {
    work: 'set-out',
    cutLineMark: null,
    memberMarks: [],
    quantity: 1,
  })
  const agent = await site.app.agentFor(site.people.lead.email)
  const { body } = await agent.get(`/api/tasks/${taskId}`).expect(200)
  expect(body).toMatchObject({ card: null, member: null })
})

test('the leading hand hands tasks to who is there that day, and to nobody else', async () => {
  const site = await crewOnSite()
  const taskId = site.addTask(site.dayIds.wednesday)
  const agent = await site.app.agentFor(site.people.lead.email)
  const hand = (version: number, assignedToId: string | null) =>
    agent.patch(`/api/tasks/${taskId}`).send({ version, assignedToId })
  const given = await hand(1, site.people.apprentice.id).expect(200)
  expect(given.body.task).toMatchObject({ version: 2, assignedTo: { name: 'Wim Casey' } })
  const foreign = await hand(2, site.people.otherApprentice.id).expect(400)
  expect(foreign.body.issues[0].path).toBe('assignedToId')
  const stale = await hand(1, null).expect(409)
  expect(stale.body.detail.current.version).toBe(2)
  const freed = await hand(2, null).expect(200)
  expect(freed.body.task.assignedTo).toBeNull()
  site.app.db
    .insert(leave)
    .values({
      id: newId(),
      personId: site.people.apprentice.id,
      startsOn: days.wednesday,
      endsOn: days.wednesday,
    })
    .run()
  const away = await hand(3, site.people.apprentice.id).expect(400)
  expect(away.body.issues[0].message).toContain('on leave')
  const actions = site.app.db.select().from(audit).where(eq(audit.entityId, taskId)).all()
  expect(actions).toHaveLength(2)
})

test('a task moved up takes its place and the others keep their order', async () => {
  const site = await crewOnSite()
  const ids = [0, 1, 2].map((position) => site.addTask(site.dayIds.wednesday, { position }))
  const agent = await site.app.agentFor(site.people.lead.email)
  await agent.patch(`/api/tasks/${ids[2]}`).send({ version: 1, position: 0 }).expect(200)
  const { body } = await agent.get('/api/day-sheets').expect(200)
  const order = body.sheets[0].tasks.map((task: { id: string }) => task.id)
  expect(order).toEqual([ids[2], ids[0], ids[1]])
})

test('the first piece tried is recorded with who and when, and can be taken back', async () => {
  const site = await crewOnSite()
  const taskId = site.addTask(site.dayIds.wednesday)
  const agent = await site.app.agentFor(site.people.lead.email)
  const tried = await agent
    .patch(`/api/tasks/${taskId}`)
    .send({ version: 1, firstPieceTried: true })
    .expect(200)
  expect(tried.body.task.firstPiece).toEqual({ at: '2026-12-02T00:00:00.000Z', by: 'Tamsin Rook' })
  const again = await agent
    .patch(`/api/tasks/${taskId}`)
    .send({ version: 2, firstPieceTried: false })
    .expect(200)
  expect(again.body.task.firstPiece).toBeNull()
})

test('a raised hand shows on the day sheet until it is lowered', async () => {
  const site = await crewOnSite()
  const taskId = site.addTask(site.dayIds.wednesday, { assignedToId: site.people.apprentice.id })
  const apprentice = await site.app.agentFor(site.people.apprentice.email)
  const lead = await site.app.agentFor(site.people.lead.email)
  await apprentice.post(`/api/tasks/${taskId}/hand`).send({ raised: true }).expect(200)
  const seen = await lead.get('/api/day-sheets').expect(200)
  expect(seen.body.sheets[0].tasks[0].handRaisedAt).not.toBeNull()
  const lowered = await lead.post(`/api/tasks/${taskId}/hand`).send({ raised: false }).expect(200)
  expect(lowered.body.task.handRaisedAt).toBeNull()
})

test('a bad body changes nothing', async () => {
  const site = await crewOnSite()
  const taskId = site.addTask(site.dayIds.wednesday)
  const agent = await site.app.agentFor(site.people.lead.email)
  const before = site.app.db.select().from(tasks).all()
  await agent.patch(`/api/tasks/${taskId}`).send({ version: 1 }).expect(400)
  await agent.patch(`/api/tasks/${taskId}`).send({ version: 1, quantity: 9 }).expect(400)
  await agent.post(`/api/tasks/${taskId}/ticks`).send({ id: 'x', delta: 1 }).expect(400)
  await agent.post(`/api/tasks/${taskId}/hand`).send({}).expect(400)
  expect(site.app.db.select().from(tasks).all()).toEqual(before)
  expect(site.app.db.select().from(ticks).all()).toEqual([])
})
