import { expect, test } from 'vitest'
import type { Milestone } from '../../shared/milestones/milestone-schemas.ts'
import { audit } from '../../server/db/tables/audit-tables.ts'
import { bookingFirm, fri, wed } from './booking-kit.ts'

async function milestoneFirm() {
  const firm = await bookingFirm()
  const path = `/api/jobs/${firm.jobs.hillJob}/milestones`
  const set = (kind: string, body: Record<string, unknown>) =>
    firm.officeAgent.put(`${path}/${kind}`).send(body)
  const read = async (kind: string): Promise<Milestone> => {
    const answer = await firm.officeAgent.get(path).expect(200)
    const { milestones } = answer.body as { milestones: Milestone[] }
    return milestones.find((one) => one.kind === kind)!
  }
  return { ...firm, path, set, read }
}

test('a job starts with six milestones nobody has said anything of', async () => {
  const firm = await milestoneFirm()
  const answer = await firm.officeAgent.get(firm.path).expect(200)
  expect(answer.body.milestones.map((one: Milestone) => one.kind)).toEqual([
    'frames-up',
    'edge-protection-up',
    'timber-on-site',
    'frame-inspection',
    'fascia-and-gutter',
    'roof-cover',
  ])
  for (const one of answer.body.milestones)
    expect(one).toMatchObject({ state: 'guessed', day: null, broughtBy: '', version: 0 })
})

test('timber is promised for a day by the yard, and what was not sent stays', async () => {
  const firm = await milestoneFirm()
  await firm.set('timber-on-site', { version: 0, day: fri, broughtBy: 'Creek Timber' }).expect(200)
  await firm.set('timber-on-site', { version: 1, state: 'promised' }).expect(200)
  expect(await firm.read('timber-on-site')).toEqual({
    kind: 'timber-on-site',
    state: 'promised',
    day: fri,
    broughtBy: 'Creek Timber',
    note: '',
    version: 2,
  })
  const lines = firm.app.db.select().from(audit).all()
  expect(lines.map((line) => line.action)).toEqual(['job.milestone', 'job.milestone'])
})

test('setting what is already so changes nothing and leaves the version', async () => {
  const firm = await milestoneFirm()
  await firm.set('frames-up', { version: 0, state: 'asked' }).expect(200)
  await firm.set('frames-up', { version: 1, state: 'asked' }).expect(200)
  expect((await firm.read('frames-up')).version).toBe(1)
})

test('a write from an older version is refused with both versions, and nothing is written', async () => {
  const firm = await milestoneFirm()
  await firm.set('frames-up', { version: 0, state: 'promised', day: fri }).expect(200)
  const sent = { version: 0, state: 'asked' }
  const answer = await firm.set('frames-up', sent)
  expect(answer.status).toBe(409)
  expect(answer.body.detail).toMatchObject({
    kind: 'stale',
    current: { state: 'promised', day: fri, version: 1 },
    sent,
  })
  expect((await firm.read('frames-up')).state).toBe('promised')
})

test('nothing is done on a day still to come', async () => {
  const firm = await milestoneFirm()
  const answer = await firm.set('frames-up', { version: 0, state: 'done', day: fri })
  expect(answer.status).toBe(400)
  expect(answer.body.issues[0].path).toBe('day')
  await firm.set('frames-up', { version: 0, state: 'done', day: wed }).expect(200)
})

test('a leading hand reads those of own jobs only and sets none; an apprentice reads none', async () => {
  const firm = await milestoneFirm()
  const lead = await firm.app.agentFor(firm.people.lead.email)
  const apprentice = await firm.app.agentFor(firm.people.apprentice.email)
  await lead.get(firm.path).expect(404)
  await firm.booked()
  await lead.get(firm.path).expect(200)
  await lead.put(`${firm.path}/frames-up`).send({ version: 0, state: 'done' }).expect(403)
  await apprentice.get(firm.path).expect(403)
})

test('there is no other kind of milestone', async () => {
  const firm = await milestoneFirm()
  await firm.set('moon-up', { version: 0, state: 'done' }).expect(404)
  const answer = await firm.set('frames-up', { version: 0, state: 'hoped' })
  expect(answer.status).toBe(400)
})
