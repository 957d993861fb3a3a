import { mkdtempSync, rmSync, statSync } from 'node:fs'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { expect, test } from 'vitest'
import { openDatabase } from '../../server/db/client.ts'
import { jobs } from '../../server/db/tables/job-tables.ts'
import { bookingDays } from '../../server/db/tables/booking-tables.ts'
import { newId } from '../../server/lib/ids.ts'
import { createTestApp } from './harness.ts'
import { newJobBody } from './jobs-kit.ts'
import { crewOnSite } from './day-sheet-kit.ts'

async function officeApp() {
  const app = await createTestApp()
  const agent = await app.agentFor(app.addPerson('office', 'Orla Brandt').email)
  return { app, agent }
}

const messageOf = (answer: { body: { message?: string } }) => answer.body.message ?? ''

test.each(['text/plain', 'application/x-www-form-urlencoded', 'multipart/form-data; boundary=x'])(
  'a write in a form’s own content type (%s) is refused, since another site can send that unasked',
  async (type) => {
    const { app, agent } = await officeApp()
    const invited = app.addPerson('apprentice', 'Wim Casey')
    const answer = await agent
      .post(`/api/people/${invited.id}/invitation`)
      .set('Content-Type', type)
      .send('{}')
    expect(answer.status).toBe(400)
    expect(messageOf(answer)).toMatch(/JSON/)
  },
)

test('an origin that is nobody’s is refused', async () => {
  const { agent } = await officeApp()
  await agent.post('/api/jobs').set('Origin', 'null').send(newJobBody()).expect(403)
  await agent.post('/api/jobs').set('Sec-Fetch-Site', 'same-site').send(newJobBody()).expect(403)
})

test('a body or an address that cannot be read is the sender’s fault, and the answer says nothing of ours', async () => {
  const { agent } = await officeApp()
  const answers = [
    await agent
      .post('/api/jobs')
      .set('Content-Type', 'application/json; charset=nonsense')
      .send('{}'),
    await agent
      .post('/api/jobs')
      .set('Content-Type', 'application/json')
      .set('Content-Encoding', 'nonsense')
      .send('{}'),
    await agent.post('/api/jobs').set('Content-Type', 'application/json').send('{"title": '),
    await agent.post('/api/jobs').send({ title: 'x'.repeat(600_000) }),
    await agent.get('/api/jobs/%E0%A4%A'),
    await agent.post('/api/jobs').set('Content-Type', 'application/json').send('['.repeat(200_000)),
    await agent.get('/api/jobs?q=a&q=b'),
    await agent.get('/api/jobs?__proto__=a'),
  ]
  expect(answers.map((answer) => answer.status)).toEqual(answers.map(() => 400))
  for (const answer of answers) {
    expect(Object.keys(answer.body as object).sort()).toEqual([
      'code',
      'issues',
      'message',
      'requestId',
    ])
    expect(JSON.stringify(answer.body)).not.toMatch(/node_modules|at \/|SqliteError|stack/)
  }
})

test('a day far beyond any job is refused at its field, wherever a day is asked', async () => {
  const site = await crewOnSite()
  const agent = await site.app.agentFor(site.people.office.email)
  const far = ['0000-01-01', '0001-01-01', '9999-12-31']
  for (const day of far) {
    const booking = {
      clientId: newId(),
      jobId: site.jobId,
      crewId: site.crew.id,
      state: 'pencilled',
    }
    const answers = [
      await agent.get(`/api/day-sheets?day=${day}`),
      await agent.get(`/api/my-tasks?day=${day}`),
      await agent.get(`/api/calendar?from=${day}&to=${day}`),
      await agent.post('/api/bookings').send({ ...booking, startsOn: day }),
      await agent.post('/api/bookings').send({ ...booking, days: [day], evenIfNotWorked: true }),
      await agent
        .patch(`/api/bookings/${site.booking.id}`)
        .send({ version: 1, move: { from: '2026-12-07', to: day } }),
      await agent
        .put(`/api/people/${site.people.apprentice.id}/crew`)
        .send({ crewId: null, from: day }),
      await agent
        .post(`/api/people/${site.people.apprentice.id}/leave`)
        .send({ startsOn: day, endsOn: day, reason: '' }),
    ]
    expect(answers.map((answer) => answer.status)).toEqual(answers.map(() => 400))
  }
  expect(site.app.db.select().from(bookingDays).all()).toHaveLength(4)
})

test('what is one line on paper and in a mail’s subject is typed as one line', async () => {
  const { app, agent } = await officeApp()
  const twoLines = 'House\r\nBcc: all@elsewhere.example'
  const crew = app.addCrew('Ridge crew', [])
  const firm = (await agent.get('/api/firm').expect(200)).body as Record<string, unknown>
  const person = { email: 'n@quillback.example', phone: '', role: 'apprentice', crewId: null }
  const answers = [
    ['title', await agent.post('/api/jobs').send(newJobBody({ title: twoLines }))],
    ['siteAddress', await agent.post('/api/jobs').send(newJobBody({ siteAddress: twoLines }))],
    [
      'siteContactName',
      await agent.post('/api/jobs').send(newJobBody({ siteContactName: twoLines })),
    ],
    ['name', await agent.post('/api/people').send({ ...person, name: twoLines })],
    ['name', await agent.put('/api/firm').send({ ...firm, name: twoLines })],
    [
      'name',
      await agent.put(`/api/crews/${crew.id}`).send({ name: twoLines, letter: 'R', colour: 1 }),
    ],
  ] as const
  for (const [field, answer] of answers) {
    expect(answer.status).toBe(400)
    const issues = answer.body.issues as { path: string; message: string }[]
    expect(issues.find((issue) => issue.path === field)?.message).toMatch(/one line/)
  }
  expect(app.db.select().from(jobs).all()).toEqual([])
})

test('a percent sign, an underscore or a quote in a search is only itself', async () => {
  const { agent } = await officeApp()
  await agent
    .post('/api/jobs')
    .send(newJobBody({ title: 'Shed' }))
    .expect(201)
  await agent
    .post('/api/jobs')
    .send(newJobBody({ title: '100% slate_roof \\ O’Hara"s' }))
    .expect(201)
  for (const q of ['100%', 'slate_', '\\', 'O’Hara"s']) {
    const { body } = await agent.get('/api/jobs').query({ q }).expect(200)
    expect(body.jobs.map((job: { title: string }) => job.title)).toEqual([
      '100% slate_roof \\ O’Hara"s',
    ])
  }
  const found = await agent.get('/api/messages').query({ q: "%' or 1=1 --" }).expect(200)
  expect(found.body.messages).toEqual([])
})

test('the data folder is for its owner only: it holds password hashes, sessions and links', () => {
  const parent = mkdtempSync(path.join(tmpdir(), 'ridgehand-data-'))
  const dir = path.join(parent, 'data')
  openDatabase(dir).close()
  expect(statSync(dir).mode & 0o077).toBe(0)
  rmSync(parent, { recursive: true, force: true })
})

test('a page runs our own scripts only, stands in no other page, and gives its address to nobody', async () => {
  const { agent } = await officeApp()
  const { headers } = await agent.get('/api/session').expect(200)
  const policy = String(headers['content-security-policy'])
  expect(policy).toContain("default-src 'self'")
  expect(policy).toMatch(/script-src 'self'(;|$)/)
  expect(policy).toContain("frame-ancestors 'none'")
  expect(policy).toContain("base-uri 'none'")
  expect(headers['x-content-type-options']).toBe('nosniff')
  expect(headers['referrer-policy']).toBe('no-referrer')
  expect(headers['cache-control']).toBe('no-store')
  expect(headers['x-powered-by']).toBeUndefined()
})
