import { expect, test } from 'vitest'
import { audit } from '../../server/db/tables/audit-tables.ts'
import { jobs } from '../../server/db/tables/job-tables.ts'
import { newId } from '../../server/lib/ids.ts'
import { createTestApp } from './harness.ts'
import { jobKit, newJobBody } from './jobs-kit.ts'

/** A firm with one person of each role, the two on site in one crew. */
async function firmApp() {
  const app = await createTestApp()
  const orla = app.addPerson('office', 'Orla Brandt')
  const tamsin = app.addPerson('leading-hand', 'Tamsin Rook')
  const wil = app.addPerson('apprentice', 'Wil Sayer')
  const crew = app.addCrew('Kestrel', [tamsin.id, wil.id])
  const kit = jobKit(app)
  return {
    app,
    kit,
    crew,
    people: { orla, tamsin, wil },
    office: await app.agentFor(orla.email),
    leadingHand: await app.agentFor(tamsin.email),
    apprentice: await app.agentFor(wil.email),
    signedOut: await app.agentFor(),
  }
}

const guardedKeys = [
  'priceCents',
  'priceSentOn',
  'acceptedOn',
  'customerName',
  'customerPhone',
  'customerEmail',
  'notes',
  'draft',
]

test('the office writes a job down and reads back what it typed', async () => {
  const { office } = await firmApp()
  const made = await office.post('/api/jobs').send(newJobBody()).expect(201)
  expect(made.body).toMatchObject({
    number: 'YF-101',
    title: 'House, Lot 12',
    stage: 'enquiry',
    priceCents: 1_845_050,
    customerEmail: 'osric.hale@hale.example',
    wantedBy: '2026-12-18',
    version: 1,
    revisions: [],
    bookings: [],
    missing: ['roof'],
  })
  const read = await office.get(`/api/jobs/${made.body.id}`).expect(200)
  expect(read.body).toEqual(made.body)
})

test('job numbers go on from the highest of the firm, and a typed one stands', async () => {
  const { office } = await firmApp()
  const typed = await office
    .post('/api/jobs')
    .send(newJobBody({ number: 'YF-240' }))
    .expect(201)
  expect(typed.body.number).toBe('YF-240')
  const next = await office.post('/api/jobs').send(newJobBody()).expect(201)
  expect(next.body.number).toBe('YF-241')
  const taken = await office
    .post('/api/jobs')
    .send(newJobBody({ number: 'yf-240' }))
    .expect(400)
  expect(taken.body.issues[0].path).toBe('number')
})

test('pressing save twice makes one job', async () => {
  const { app, office } = await firmApp()
  const body = newJobBody()
  const first = await office.post('/api/jobs').send(body).expect(201)
  const second = await office.post('/api/jobs').send(body).expect(201)
  expect(second.body).toEqual(first.body)
  expect(app.db.select().from(jobs).all()).toHaveLength(1)
  await office
    .post('/api/jobs')
    .send({ ...body, title: 'Another house' })
    .expect(409)
})

test.each([
  ['title', { title: '  ' }],
  ['covering', { covering: 'thatch' }],
  ['price', { price: 'about 18000' }],
  ['wantedBy', { wantedBy: '2026-02-30' }],
  ['customerEmail', { customerEmail: 'osric' }],
  ['siteContactPhone', { siteContactPhone: 'ask Pella' }],
  ['acceptedOn', { acceptedOn: '2026-12-03' }],
  ['id', { id: 'one' }],
  ['colour', { colour: 'red' }],
])('a bad %s is refused at its field and nothing is written', async (field, change) => {
  const { app, office } = await firmApp()
  const answer = await office.post('/api/jobs').send(newJobBody(change)).expect(400)
  expect(answer.body.issues.map((issue: { path: string }) => issue.path)).toContain(field)
  expect(app.db.select().from(jobs).all()).toHaveLength(0)
  expect(app.db.select().from(audit).all()).toHaveLength(0)
})

test('a change with a wrong field leaves the other fields as they were', async () => {
  const { office } = await firmApp()
  const { body: job } = await office.post('/api/jobs').send(newJobBody())
  const answer = await office
    .patch(`/api/jobs/${job.id}`)
    .send({ version: 1, title: 'Shed', completedOn: '2027-01-01' })
    .expect(400)
  expect(answer.body.issues[0].path).toBe('completedOn')
  expect((await office.get(`/api/jobs/${job.id}`)).body).toEqual(job)
})

test('a change touches only the fields that are sent, and an empty one is cleared', async () => {
  const { app, office } = await firmApp()
  const { body: job } = await office.post('/api/jobs').send(newJobBody())
  const changed = await office
    .patch(`/api/jobs/${job.id}`)
    .send({ version: 1, price: '', siteContactPhone: '' })
    .expect(200)
  expect(changed.body).toMatchObject({ priceCents: null, siteContactPhone: '', version: 2 })
  expect(changed.body.customerName).toBe('Osric Hale')
  const last = app.db.select().from(audit).all().at(-1)
  expect(last).toMatchObject({ action: 'job.change', entityId: job.id })
  expect(last?.detail['changed']).toEqual(['siteContactPhone', 'priceCents'])
})

test('a stale change is refused with what is there now and what was sent', async () => {
  const { office } = await firmApp()
  const { body: job } = await office.post('/api/jobs').send(newJobBody())
  await office.patch(`/api/jobs/${job.id}`).send({ version: 1, title: 'Theirs' }).expect(200)
  const stale = await office
    .patch(`/api/jobs/${job.id}`)
    .send({ version: 1, title: 'Mine' })
    .expect(409)
  expect(stale.body.detail.current).toMatchObject({ title: 'Theirs', version: 2 })
  expect(stale.body.detail.yours).toEqual({ title: 'Mine' })
  expect((await office.get(`/api/jobs/${job.id}`)).body.title).toBe('Theirs')
})

test('price sent, accepted and complete are one press each and can be taken back', async () => {
  const { office } = await firmApp()
  const { body: job } = await office.post('/api/jobs').send(newJobBody())
  const fact = (name: string, version: number, on: string | null) =>
    office.put(`/api/jobs/${job.id}/facts/${name}`).send({ version, on })
  expect((await fact('priceSentOn', 1, '2026-12-02')).body.stage).toBe('priced')
  expect((await fact('acceptedOn', 2, '2026-12-02')).body.stage).toBe('won')
  expect((await fact('completedOn', 3, '2026-12-02')).body.stage).toBe('complete')
  expect((await fact('completedOn', 4, null)).body.stage).toBe('won')
  const stale = await fact('acceptedOn', 4, null)
  expect(stale.status).toBe(409)
  expect(stale.body.detail.current.version).toBe(5)
  expect((await fact('paidOn', 5, null)).status).toBe(404)
  const tomorrow = await fact('completedOn', 5, '2026-12-03')
  expect(tomorrow.body.issues[0].path).toBe('completedOn')
})

test('the stage follows the bookings and the first tick', async () => {
  const { kit, crew, people, office } = await firmApp()
  const id = kit.addJob({ acceptedOn: '2026-12-01' })
  const stage = async () => (await office.get(`/api/jobs/${id}`)).body.stage
  expect(await stage()).toBe('won')
  kit.addBooking(id, crew.id, ['2026-12-10'], 'pencilled')
  expect(await stage()).toBe('pencilled')
  const firm = kit.addBooking(id, crew.id, ['2026-12-01', '2026-12-02'])
  expect(await stage()).toBe('firm')
  kit.addTick(firm.dayIds[0]!, people.wil.id)
  expect(await stage()).toBe('on-site')
})

test('a leading hand reads the jobs of the own crew without price, customer or office notes', async () => {
  const { kit, crew, office, leadingHand } = await firmApp()
  const { body: job } = await office.post('/api/jobs').send(newJobBody())
  kit.addBooking(job.id, crew.id, ['2026-12-03'])
  const seen = (await leadingHand.get(`/api/jobs/${job.id}`).expect(200)).body
  for (const key of guardedKeys) expect(seen).not.toHaveProperty(key)
  expect(seen).toMatchObject({ siteContactPhone: '0491 570 156', crewNotes: 'Dog in the yard' })
  const whole = JSON.stringify((await leadingHand.get('/api/jobs')).body) + JSON.stringify(seen)
  for (const secret of ['Osric', 'hale.example', '570 157', '1845050', 'call before delivery']) {
    expect(whole).not.toContain(secret)
  }
  const forOffice = (await office.get(`/api/jobs/${job.id}`)).body
  for (const key of guardedKeys) expect(forOffice).toHaveProperty(key)
})

test('a leading hand cannot find a job by its customer, the office can', async () => {
  const { kit, crew, office, leadingHand } = await firmApp()
  const { body: job } = await office.post('/api/jobs').send(newJobBody())
  kit.addBooking(job.id, crew.id, ['2026-12-03'])
  expect((await office.get('/api/jobs?q=osric')).body.jobs).toHaveLength(1)
  expect((await leadingHand.get('/api/jobs?q=osric')).body.jobs).toHaveLength(0)
  expect((await leadingHand.get('/api/jobs?q=lantern')).body.jobs).toHaveLength(1)
})

test('a job of another crew, one too far ahead and one that is not there answer alike', async () => {
  const { app, kit, crew, leadingHand } = await firmApp()
  const others = app.addCrew('Plover', [])
  const foreign = kit.addJob()
  kit.addBooking(foreign, others.id, ['2026-12-03'])
  const farAhead = kit.addJob()
  kit.addBooking(farAhead, crew.id, ['2026-12-31'])
  const answers = []
  for (const id of [foreign, farAhead, newId(), 'nonsense']) {
    const answer = await leadingHand.get(`/api/jobs/${id}`)
    expect(answer.status).toBe(404)
    const { requestId, ...rest } = answer.body
    expect(requestId).toBeTruthy()
    answers.push(rest)
  }
  expect(new Set(answers.map((answer) => JSON.stringify(answer))).size).toBe(1)
  expect((await leadingHand.get('/api/jobs')).body.jobs).toEqual([])
})

test('a leading hand sees only the own crew’s bookings of a shared job, and only the own crew to filter by', async () => {
  const { app, kit, crew, office, leadingHand } = await firmApp()
  const others = app.addCrew('Plover', [])
  const id = kit.addJob()
  kit.addBooking(id, crew.id, ['2026-12-04'])
  kit.addBooking(id, others.id, ['2026-12-03'])
  const crewsOf = (body: { bookings: { crew: { name: string } }[] }) =>
    body.bookings.map((booking) => booking.crew.name)
  expect(crewsOf((await office.get(`/api/jobs/${id}`)).body)).toEqual(['Plover', 'Kestrel'])
  expect(crewsOf((await leadingHand.get(`/api/jobs/${id}`)).body)).toEqual(['Kestrel'])
  const board = (await leadingHand.get('/api/jobs')).body
  expect(board.jobs[0].nextBooking.crew.name).toBe('Kestrel')
  expect(board.crews.map((c: { name: string }) => c.name)).toEqual(['Kestrel'])
  expect((await leadingHand.get(`/api/jobs?crew=${others.id}`)).body.jobs).toEqual([])
})

test('only the office writes, the apprentice reads no job, and nobody signed out does', async () => {
  const { kit, crew, leadingHand, apprentice, signedOut } = await firmApp()
  const id = kit.addJob()
  kit.addBooking(id, crew.id, ['2026-12-02'])
  const fact = { version: 1, on: '2026-12-02' }
  for (const [agent, status] of [
    [leadingHand, 403],
    [apprentice, 403],
    [signedOut, 401],
  ] as const) {
    await agent.post('/api/jobs').send(newJobBody()).expect(status)
    await agent.patch(`/api/jobs/${id}`).send({ version: 1, title: 'Mine' }).expect(status)
    await agent.put(`/api/jobs/${id}/facts/completedOn`).send(fact).expect(status)
  }
  for (const path of ['/api/jobs', `/api/jobs/${id}`]) {
    await apprentice.get(path).expect(403)
    await signedOut.get(path).expect(401)
    await leadingHand.get(path).expect(200)
  }
})

test('a change to a job that is not there answers as missing', async () => {
  const { office } = await firmApp()
  await office.patch(`/api/jobs/${newId()}`).send({ version: 1, title: 'Mine' }).expect(404)
  await office.patch('/api/jobs/nonsense').send({}).expect(404)
})

test('every change tells the open screens, a refused one does not', async () => {
  const { app, office } = await firmApp()
  const heard: string[] = []
  app.events.subscribe((event) => heard.push(event.topic))
  const { body: job } = await office.post('/api/jobs').send(newJobBody())
  expect(heard).toEqual(['jobs'])
  await office.patch(`/api/jobs/${job.id}`).send({ version: 7, title: 'Mine' }).expect(409)
  expect(heard).toEqual(['jobs'])
})
