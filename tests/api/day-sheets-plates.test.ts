import { expect, test } from 'vitest'
import { diagonalsToMeasure, planSidesMm } from '../../shared/day-sheets/plate-check.ts'
import { plateChecks } from '../../server/db/tables/job-tables.ts'
import { newId } from '../../server/lib/ids.ts'
import { crewOnSite } from './day-sheet-kit.ts'

// Diagonal of 9.0 × 6.0 m by Pythagoras: 10816.65.
const measured = (changes: Record<string, unknown> = {}) => ({
  id: newId(),
  letter: 'A',
  sidesMm: [9000, 6004, 8991, 6000],
  diagonals: [
    { from: 0, to: 2, lengthMm: 10817 },
    { from: 1, to: 3, lengthMm: 10830 },
  ],
  note: 'North plate bowed',
  ...changes,
})

test('plates measured on site end “from plan”, and say which lengths are more than 5 mm off', async () => {
  const site = await crewOnSite()
  const agent = await site.app.agentFor(site.people.lead.email)
  const url = `/api/jobs/${site.jobId}/plate-checks`
  const body = measured()
  const answer = await agent.post(url).send(body).expect(201)
  const { sides, diagonals } = answer.body.comparison
  expect(sides.map((side: { differs: boolean }) => side.differs)).toEqual([
    false,
    false,
    true,
    false,
  ])
  expect(sides[2]).toMatchObject({ planMm: 9000, measuredMm: 8991, offMm: -9 })
  expect(diagonals.map((one: { differs: boolean }) => one.differs)).toEqual([false, true])
  await agent.post(url).send(body).expect(201)
  expect(site.app.db.select().from(plateChecks).all()).toHaveLength(1)
  const sheet = (await agent.get('/api/day-sheets').expect(200)).body.sheets[0]
  expect(sheet.plates).toMatchObject({ takenBy: 'Tamsin Rook', differing: 2 })
  const latest = await agent.get(`${url}/A`).expect(200)
  expect(latest.body.check.comparison).toEqual(answer.body.comparison)
})

test('a check is refused field by field and leaves nothing behind', async () => {
  const site = await crewOnSite()
  const agent = await site.app.agentFor(site.people.lead.email)
  const refused = async (changes: Record<string, unknown>) => {
    const answer = await agent
      .post(`/api/jobs/${site.jobId}/plate-checks`)
      .send(measured(changes))
      .expect(400)
    return answer.body.issues.map((issue: { path: string }) => issue.path)
  }
  expect(await refused({ sidesMm: [9000, 6000, 9000] })).toEqual(['sidesMm'])
  expect(await refused({ sidesMm: [9000, 0, 9000, -6000] })).toEqual(['sidesMm.1', 'sidesMm.3'])
  expect(await refused({ diagonals: [] })).toEqual(['diagonals'])
  expect(await refused({ diagonals: [{ from: 0, to: 1, lengthMm: 9000 }] })).toEqual([
    'diagonals.0',
  ])
  expect(await refused({ letter: 'Z' })).toEqual(['letter'])
  expect(site.app.db.select().from(plateChecks).all()).toEqual([])
})

test('an apprentice may not record plates; another crew finds no such job', async () => {
  const site = await crewOnSite()
  const url = `/api/jobs/${site.jobId}/plate-checks`
  const apprentice = await site.app.agentFor(site.people.apprentice.email)
  await apprentice.post(url).send(measured()).expect(403)
  const other = await site.app.agentFor(site.people.otherLead.email)
  await other.post(url).send(measured()).expect(404)
  await other.get(`${url}/A`).expect(404)
})

test('a four-sided plan has two diagonals to measure, an eight-sided one a fan and a check', () => {
  expect(diagonalsToMeasure(3)).toEqual([])
  expect(diagonalsToMeasure(4)).toEqual([
    { from: 0, to: 2 },
    { from: 1, to: 3 },
  ])
  // n − 3 diagonals from one corner fix a polygon's shape.
  expect(diagonalsToMeasure(8)).toHaveLength(6)
  const square = [0, 1, 2, 3].map((i) => ({
    x: i === 1 || i === 2 ? 9000 : 0,
    y: i > 1 ? 6000 : 0,
  }))
  expect(planSidesMm(square)).toEqual([9000, 6000, 9000, 6000])
})
