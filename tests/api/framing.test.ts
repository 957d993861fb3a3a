import { afterEach, expect, test } from 'vitest'
import { audit } from '../../server/db/tables/audit-tables.ts'
import { jobs, roofRevisions } from '../../server/db/tables/job-tables.ts'
import { firm } from '../../server/db/tables/firm-tables.ts'
import { newId } from '../../server/lib/ids.ts'
import { createFramer, type Framer } from '../../server/revisions/framer.ts'
import { prepareRevision } from '../../server/revisions/prepare-revision.ts'
import { defaultSettings } from '../../shared/roof/roof-settings.ts'
import { typedForm } from '../revisions/typed-form.ts'
import { trouble } from './frame-trouble.ts'
import { type Agent, createTestApp } from './harness.ts'

const framers: Framer[] = []
afterEach(async () => {
  await Promise.all(framers.splice(0).map((framer) => framer.close()))
})

function troubled(changes: { limitMs?: number; threads?: number; mostWaiting?: number } = {}) {
  const script = new URL('./troubled-frame-thread.ts', import.meta.url)
  const framer = createFramer({ script, limitMs: 1500, threads: 1, ...changes })
  framers.push(framer)
  return framer
}

async function officeApp(framer: Framer) {
  const app = await createTestApp({ framer })
  const office = await app.agentFor(app.addPerson('office', 'Orla Brandt').email)
  const stamps = { createdAt: app.clock.current, updatedAt: app.clock.current }
  const addJob = (number: string) => {
    const id = newId()
    app.db
      .insert(jobs)
      .values({ id, number, title: `Roof ${number}`, covering: 'tiles', ...stamps })
      .run()
    return id
  }
  const written = () => ({
    revisions: app.db.select().from(roofRevisions).all().length,
    entries: app.db
      .select()
      .from(audit)
      .all()
      .filter((entry) => entry.action === 'roof issued').length,
  })
  return { app, office, addJob, written }
}

async function save(agent: Agent, jobId: string, plateWidthMm: string, version = 0) {
  const form = typedForm('rectangle', { plateWidthMm })
  const saved = await agent.put(`/api/jobs/${jobId}/roof`).send({ form, version }).expect(200)
  return saved.body.version as number
}

const issue = (agent: Agent, jobId: string, version: number) =>
  agent.post(`/api/jobs/${jobId}/revisions`).send({ version })

const nothing = { revisions: 0, entries: 0 }
const pauseMs = (ms: number) => new Promise((resolve) => setTimeout(resolve, ms))

test('other requests are answered while a roof that takes long is framed; given up, it leaves nothing', async () => {
  const { office, addJob, written } = await officeApp(troubled())
  const jobId = addJob('QR-1')
  const version = await save(office, jobId, trouble.endless)
  let isDone = false
  const slow = issue(office, jobId, version).then((answer) => {
    isDone = true
    return answer
  })
  await pauseMs(50)
  for (let i = 0; i < 5; i++) await office.get(`/api/jobs/${jobId}/roof`).expect(200)
  expect(isDone).toBe(false)
  const answer = await slow
  expect(answer.status).toBe(400)
  expect(answer.body.code).toBe('invalid_input')
  expect(answer.body.message).toMatch(/^This plan takes too long to frame, over 2 s\./)
  expect(written()).toEqual(nothing)
})

test.each([
  ['takes too long', trouble.endless, 400, 1500],
  ['takes too much memory', trouble.eatsMemory, 400, 20_000],
  ['ends its thread', trouble.dies, 500, 20_000],
  ['finds a fault of ours', trouble.throws, 500, 20_000],
])('after a roof that %s the next one is issued as ever', async (what, width, status, limitMs) => {
  const { office, addJob, written } = await officeApp(troubled({ limitMs }))
  const [bad, good] = [addJob('QR-1'), addJob('QR-2')]
  const badVersion = await save(office, bad, width)
  const goodVersion = await save(office, good, '90')
  // Asked at once: the second waits for the only thread, and for the one that takes its place.
  const [refused, issued] = await Promise.all([
    issue(office, bad, badVersion).then((answer) => answer),
    issue(office, good, goodVersion).then((answer) => answer),
  ])
  expect(refused.status).toBe(status)
  expect(refused.body.message).toContain(status === 400 ? what : 'Nothing was saved.')
  expect(JSON.stringify(refused.body)).not.toMatch(/without an end|thread/)
  expect(issued.status).toBe(201)
  expect(issued.body.revision.letter).toBe('A')
  expect(written()).toEqual({ revisions: 1, entries: 1 })
  const mended = await save(office, bad, '90', badVersion)
  expect((await issue(office, bad, mended)).status).toBe(201)
})

test('a draft or a firm’s setting changed while the roof is framed is not overtaken', async () => {
  const framer = troubled()
  const { app, office, addJob, written } = await officeApp(framer)
  const jobId = addJob('QR-1')
  let meanwhile: () => Promise<unknown> = () => Promise.resolve()
  const prepare = framer.prepare.bind(framer)
  framer.prepare = async (question) => {
    const prepared = await prepare(question)
    await meanwhile()
    return prepared
  }
  const version = await save(office, jobId, '90')
  meanwhile = () => save(office, jobId, '70', version)
  const stale = await issue(office, jobId, version).then((answer) => answer)
  expect(stale.status).toBe(409)
  expect(stale.body.message).toMatch(/^The roof was changed while/)
  expect(stale.body.detail.current.version).toBe(version + 1)
  meanwhile = async () => {
    const { roofSettings } = app.db.select().from(firm).get()!
    app.db
      .update(firm)
      .set({ roofSettings: { ...roofSettings, densityKgM3: 610 } })
      .run()
  }
  const other = await issue(office, jobId, version + 1).then((answer) => answer)
  expect(other.status).toBe(409)
  expect(other.body.message).toMatch(/settings/)
  expect(written()).toEqual(nothing)
  meanwhile = () => Promise.resolve()
  expect((await issue(office, jobId, version + 1)).status).toBe(201)
})

test('one roof issued twice at the same moment makes one revision', async () => {
  const { office, addJob, written } = await officeApp(troubled({ threads: 2 }))
  const jobId = addJob('QR-1')
  const version = await save(office, jobId, '90')
  const answers = await Promise.all([1, 2].map(() => issue(office, jobId, version).then((a) => a)))
  expect(answers.map((answer) => answer.status).sort()).toEqual([200, 201])
  expect(answers.map((answer) => answer.body.revision.letter)).toEqual(['A', 'A'])
  expect(written()).toEqual({ revisions: 1, entries: 1 })
})

test('when too many roofs wait, one more is told to come back', async () => {
  const { office, addJob, written } = await officeApp(troubled({ mostWaiting: 1 }))
  const jobId = addJob('QR-1')
  const version = await save(office, jobId, trouble.endless)
  const answers = await Promise.all(
    [1, 2, 3].map(() => issue(office, jobId, version).then((answer) => answer.status)),
  )
  expect(answers.sort()).toEqual([400, 400, 429])
  expect(written()).toEqual(nothing)
})

test('a server that closes waits for no roof, and refuses those still to be framed', async () => {
  const framer = troubled({ limitMs: 60_000 })
  const { office, addJob, written } = await officeApp(framer)
  const jobId = addJob('QR-1')
  const version = await save(office, jobId, trouble.endless)
  const pending = Promise.all([1, 2].map(() => issue(office, jobId, version).then((a) => a.status)))
  await pauseMs(300)
  await framer.close()
  expect(await pending).toEqual([500, 500])
  expect(written()).toEqual(nothing)
})

test('the thread that ships frames the same roof as one at hand', async () => {
  const framer = createFramer()
  framers.push(framer)
  framer.warm()
  const question = {
    form: typedForm(),
    firm: { brickOffsetMm: 110, settings: defaultSettings },
    latestHash: null,
  }
  const prepared = await framer.prepare(question)
  expect(prepared.kind).toBe('framed')
  expect(prepared).toEqual(prepareRevision(question))
  const latestHash = prepared.kind === 'framed' ? prepared.framed.inputHash : null
  expect(await framer.prepare({ ...question, latestHash })).toEqual({ kind: 'same' })
})
