import { desc, eq } from 'drizzle-orm'
import { expect, test } from 'vitest'
import { audit } from '../../server/db/tables/audit-tables.ts'
import { bookingDays, bookings } from '../../server/db/tables/booking-tables.ts'
import { firm } from '../../server/db/tables/firm-tables.ts'
import { jobs, plateChecks, roofDrafts, roofRevisions } from '../../server/db/tables/job-tables.ts'
import { newId } from '../../server/lib/ids.ts'
import { createRevisionService } from '../../server/revisions/revision-service.ts'
import { coveringOf } from '../../shared/revisions/coverings.ts'
import { withText } from '../../shared/revisions/form-paths.ts'
import { formOfShape, type RoofForm } from '../../shared/revisions/roof-form.ts'
import { frameRoof } from '../../shared/roof/frame-roof.ts'
import { typedForm } from '../revisions/typed-form.ts'
import { type Agent, createTestApp, type TestApp } from './harness.ts'

function addJob(app: TestApp, number = 'QR-1'): string {
  const id = newId()
  const stamps = { createdAt: app.clock.current, updatedAt: app.clock.current }
  app.db
    .insert(jobs)
    .values({ id, number, title: `Roof ${number}`, covering: 'tiles', ...stamps })
    .run()
  return id
}

const latestRevision = (app: TestApp, jobId: string) =>
  app.db
    .select()
    .from(roofRevisions)
    .where(eq(roofRevisions.jobId, jobId))
    .orderBy(desc(roofRevisions.sequence))
    .get()

/** Puts a crew on a job for one day, firm. */
function book(app: TestApp, jobId: string, crewId: string, day: string): void {
  const id = newId()
  const stamps = { createdAt: app.clock.current, updatedAt: app.clock.current }
  app.db
    .insert(bookings)
    .values({ id, jobId, crewId, state: 'firm', uid: `${id}@ridgehand`, ...stamps })
    .run()
  app.db.insert(bookingDays).values({ id: newId(), bookingId: id, day, revisionId: null }).run()
}

async function officeApp() {
  const app = await createTestApp()
  const person = app.addPerson('office', 'Orla Brandt')
  const office = await app.agentFor(person.email)
  return { app, person, office, jobId: addJob(app) }
}

async function save(agent: Agent, jobId: string, form: RoofForm, version: number) {
  const saved = await agent.put(`/api/jobs/${jobId}/roof`).send({ form, version }).expect(200)
  return saved.body.version as number
}

const issue = (agent: Agent, jobId: string, version: number) =>
  agent.post(`/api/jobs/${jobId}/revisions`).send({ version })

test('a job without a roof opens an empty editor that would issue A', async () => {
  const { office, jobId } = await officeApp()
  const { body } = await office.get(`/api/jobs/${jobId}/roof`).expect(200)
  expect(body).toMatchObject({ draft: null, revisions: [], nextLetter: 'A', brickOffsetMm: 110 })
  expect(body.settings.covering).toEqual(coveringOf('tiles'))
})

test('a draft keeps what was typed, wrong values included', async () => {
  const { app, office, jobId } = await officeApp()
  const form = typedForm('rectangle', { widthMm: 'six metres' })
  expect(await save(office, jobId, form, 0)).toBe(1)
  const { body } = await office.get(`/api/jobs/${jobId}/roof`).expect(200)
  expect(body.draft).toMatchObject({ version: 1, form })
  const entry = app.db.select().from(audit).where(eq(audit.entityId, jobId)).get()
  expect(entry).toMatchObject({ action: 'roof draft saved', entity: 'job' })
})

test('a draft saved over somebody else’s is refused with theirs, and theirs stays', async () => {
  const { office, jobId } = await officeApp()
  const theirs = typedForm('rectangle', { pitchDeg: '30' })
  await save(office, jobId, typedForm(), 0)
  await save(office, jobId, theirs, 1)
  for (const version of [0, 1]) {
    const stale = await office
      .put(`/api/jobs/${jobId}/roof`)
      .send({ form: typedForm(), version })
      .expect(409)
    expect(stale.body.detail.current).toMatchObject({ version: 2, form: theirs })
  }
  const { body } = await office.get(`/api/jobs/${jobId}/roof`).expect(200)
  expect(body.draft.form).toEqual(theirs)
})

test('a draft that is not the form is refused with the field, and nothing is kept', async () => {
  const { app, office, jobId } = await officeApp()
  const bad = { ...typedForm(), spacing: 'loose', extra: 1 }
  const answer = await office
    .put(`/api/jobs/${jobId}/roof`)
    .send({ form: bad, version: 0 })
    .expect(400)
  const paths = answer.body.issues.map((one: { path: string }) => one.path)
  expect(paths).toContain('form.spacing')
  expect(app.db.select().from(roofDrafts).all()).toEqual([])
})

test('the office issues A, changes the pitch and issues B; A never changes', async () => {
  const { app, person, office, jobId } = await officeApp()
  const heard: string[] = []
  app.events.subscribe((event) => heard.push(event.topic))
  const first = await issue(office, jobId, await save(office, jobId, typedForm(), 0)).expect(201)
  expect(first.body).toMatchObject({
    issued: true,
    revision: { letter: 'A', issuedBy: person.name },
  })
  const before = app.db.select().from(roofRevisions).all()
  const steeper = typedForm('rectangle', { pitchDeg: '30' })
  const second = await issue(office, jobId, await save(office, jobId, steeper, 1)).expect(201)
  expect(second.body.revision.letter).toBe('B')
  const rows = app.db.select().from(roofRevisions).orderBy(roofRevisions.sequence).all()
  expect(rows[0]).toEqual(before[0])
  expect(rows.map((row) => row.letter)).toEqual(['A', 'B'])
  expect(latestRevision(app, jobId)?.letter).toBe('B')
  expect(heard).toEqual(['roof', 'roof'])
  const { body } = await office.get(`/api/jobs/${jobId}/roof`).expect(200)
  expect(body.revisions.map((one: { letter: string }) => one.letter)).toEqual(['B', 'A'])
  expect(body.nextLetter).toBe('C')
})

test('an issued revision holds the frame of just that roof and those settings', async () => {
  const { app, office, jobId } = await officeApp()
  await issue(office, jobId, await save(office, jobId, typedForm(), 0)).expect(201)
  const row = latestRevision(app, jobId)!
  expect(row.spec).toEqual(JSON.parse(JSON.stringify(frameRoof(row.roof, row.settings))))
  const { body } = await office.get(`/api/jobs/${jobId}/revisions/A`).expect(200)
  expect(body.spec).toEqual(row.spec)
  // Source: fixtures/roofs.json, hip-rectangle: 54.0 m² of plan at 25° is 59.58 m² of slope.
  expect(body.spec.totals.roofAreaM2).toBeCloseTo(59.5824, 3)
})

test('the same roof issued again makes no second revision and says which it is', async () => {
  const { app, office, jobId } = await officeApp()
  await issue(office, jobId, await save(office, jobId, typedForm(), 0)).expect(201)
  const sameInOtherWords = typedForm('rectangle', { lengthMm: '9.0 m', pitchDeg: '25.0' })
  const version = await save(office, jobId, sameInOtherWords, 1)
  const again = await issue(office, jobId, version).expect(200)
  expect(again.body).toMatchObject({ issued: false, revision: { letter: 'A' } })
  expect(app.db.select().from(roofRevisions).all()).toHaveLength(1)
})

test('changed firm settings make the same roof another revision', async () => {
  const { app, office, jobId } = await officeApp()
  const version = await save(office, jobId, typedForm(), 0)
  await issue(office, jobId, version).expect(201)
  const settings = app.db.select().from(firm).get()!.roofSettings
  app.db
    .update(firm)
    .set({ roofSettings: { ...settings, densityKgM3: 600 } })
    .run()
  const next = await issue(office, jobId, version).expect(201)
  expect(next.body.revision.letter).toBe('B')
})

test('a bad roof is refused field by field and issues nothing', async () => {
  const { app, office, jobId } = await officeApp()
  const bad = typedForm('rectangle', { pitchDeg: '70', maxSpacingMm: '1500' })
  const refused = await issue(office, jobId, await save(office, jobId, bad, 0)).expect(400)
  const paths = refused.body.issues.map((one: { path: string }) => one.path)
  expect(paths.sort()).toEqual(['maxSpacingMm', 'pitchDeg'])
  const empty = await issue(office, jobId, await save(office, jobId, formOfShape('corners'), 1))
  expect(empty.status).toBe(400)
  expect(empty.body.issues[0]).toMatchObject({ path: 'corners.0.x' })
  expect(app.db.select().from(roofRevisions).all()).toEqual([])
})

test('issuing a draft that has moved on, or is not there, is refused', async () => {
  const { app, office, jobId } = await officeApp()
  await issue(office, jobId, 1).expect(409)
  await save(office, jobId, typedForm(), 0)
  await save(office, jobId, withText(typedForm(), 'pitchDeg', '30'), 1)
  const stale = await issue(office, jobId, 1).expect(409)
  expect(stale.body.detail.current.version).toBe(2)
  await office.post(`/api/jobs/${jobId}/revisions`).send({ version: 2, letter: 'Z' }).expect(400)
  expect(app.db.select().from(roofRevisions).all()).toEqual([])
})

test('when the booked days cannot take the revision, none is issued', async () => {
  const { app, person, office, jobId } = await officeApp()
  const version = await save(office, jobId, typedForm(), 0)
  const service = createRevisionService({
    ...app.deps,
    takeRevision: () => {
      throw new Error('no day takes it')
    },
  })
  const user = { ...person, role: 'office' as const }
  await expect(service.issue(user, jobId, version)).rejects.toThrow('no day takes it')
  expect(app.db.select().from(roofRevisions).all()).toEqual([])
  expect(app.db.select().from(audit).where(eq(audit.action, 'roof issued')).all()).toEqual([])
})

test('plates count as measured from the first check that stands against the revision', async () => {
  const { app, person, office, jobId } = await officeApp()
  await issue(office, jobId, await save(office, jobId, typedForm(), 0)).expect(201)
  const before = await office.get(`/api/jobs/${jobId}/revisions/A`).expect(200)
  expect(before.body.platesMeasured).toBe(false)
  app.db
    .insert(plateChecks)
    .values({
      id: newId(),
      jobId,
      revisionId: latestRevision(app, jobId)!.id,
      sidesMm: [9000, 6000, 9000, 6000],
      diagonals: [],
      takenById: person.id,
      takenAt: app.clock.current,
    })
    .run()
  const after = await office.get(`/api/jobs/${jobId}/revisions/A`).expect(200)
  expect(after.body.platesMeasured).toBe(true)
})

test('a crew reads the roof of its own job and of no other', async () => {
  const { app, office, jobId } = await officeApp()
  const otherJobId = addJob(app, 'QR-2')
  for (const id of [jobId, otherJobId]) {
    await issue(office, id, await save(office, id, typedForm(), 0)).expect(201)
  }
  const lead = app.addPerson('leading-hand', 'Tamsin Rook')
  const apprentice = app.addPerson('apprentice', 'Ned Pascoe')
  const stranger = app.addPerson('leading-hand', 'Cato Lunt')
  const own = app.addCrew('Heron', [lead.id, apprentice.id])
  app.addCrew('Plover', [stranger.id])
  book(app, jobId, own.id, '2026-12-02')
  for (const person of [lead, apprentice]) {
    const agent = await app.agentFor(person.email)
    const { body } = await agent.get(`/api/jobs/${jobId}/revisions/A`).expect(200)
    expect(body.letter).toBe('A')
    await agent.get(`/api/jobs/${otherJobId}/revisions/A`).expect(404)
    await agent.get(`/api/jobs/${jobId}/roof`).expect(403)
    await agent.put(`/api/jobs/${jobId}/roof`).send({ form: typedForm(), version: 1 }).expect(403)
    await issue(agent, jobId, 1).expect(403)
  }
  const foreign = await app.agentFor(stranger.email)
  const refused = await foreign.get(`/api/jobs/${jobId}/revisions/A`).expect(404)
  const missing = await foreign.get(`/api/jobs/${newId()}/revisions/A`).expect(404)
  expect(refused.body.message).toBe(missing.body.message)
})

test('an apprentice reads a roof from the reminder until seven days after', async () => {
  const { app, office, jobId } = await officeApp()
  await issue(office, jobId, await save(office, jobId, typedForm(), 0)).expect(201)
  const apprentice = app.addPerson('apprentice', 'Ned Pascoe')
  const crew = app.addCrew('Heron', [apprentice.id])
  book(app, jobId, crew.id, '2026-12-03')
  const agent = await app.agentFor(apprentice.email)
  const at = async (instant: string, status: number) => {
    app.clock.current = new Date(instant)
    await agent.get(`/api/jobs/${jobId}/revisions/A`).expect(status)
  }
  // Brisbane is UTC+10; the reminder goes at 15:00 the working day before.
  await at('2026-12-02T04:59:00Z', 404)
  await at('2026-12-02T05:01:00Z', 200)
  await at('2026-12-10T02:00:00Z', 200)
  await at('2026-12-11T02:00:00Z', 404)
})

test('signed out sees none of it, and addresses that name nothing are missing', async () => {
  const { app, office, jobId } = await officeApp()
  const nobody = await app.agentFor()
  await nobody.get(`/api/jobs/${jobId}/roof`).expect(401)
  await nobody.get(`/api/jobs/${jobId}/revisions/A`).expect(401)
  await nobody.put(`/api/jobs/${jobId}/roof`).send({}).expect(401)
  await issue(nobody, jobId, 1).expect(401)
  await office.get('/api/jobs/none/roof').expect(404)
  await office.get(`/api/jobs/${newId()}/roof`).expect(404)
  await office.get(`/api/jobs/${jobId}/revisions/A`).expect(404)
  await office.get(`/api/jobs/${jobId}/revisions/a1`).expect(404)
  await office.put(`/api/jobs/${newId()}/roof`).send({ form: typedForm(), version: 0 }).expect(404)
})
