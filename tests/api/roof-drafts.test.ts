import { cpSync, mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { drizzle } from 'drizzle-orm/better-sqlite3'
import { migrate } from 'drizzle-orm/better-sqlite3/migrator'
import { eq } from 'drizzle-orm'
import { expect, test } from 'vitest'
import { openDatabase } from '../../server/db/client.ts'
import { migrateDatabase } from '../../server/db/migrate.ts'
import { jobs, roofDrafts, roofRevisions } from '../../server/db/tables/job-tables.ts'
import { newId } from '../../server/lib/ids.ts'
import { readDraft } from '../../server/revisions/revision-store.ts'
import { withText } from '../../shared/revisions/form-paths.ts'
import type { RoofForm } from '../../shared/revisions/roof-form.ts'
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

const save = (agent: Agent, jobId: string, form: RoofForm, version: number) =>
  agent.put(`/api/jobs/${jobId}/roof`).send({ form, version }).expect(200)

/** A form as it was stored before L, T, U and cross, sides and turns, and timbers beside the frame. */
function formOfOld(): unknown {
  const { rafter, hip, ridge, valley } = typedForm().sections
  const since = ['wings', 'walk', 'collarTieHeightMm']
  const old = Object.entries({ ...typedForm(), sections: { rafter, hip, ridge, valley } })
  return Object.fromEntries(old.filter(([key]) => !since.includes(key)))
}

test('a draft with wings, a walk and timbers beside the frame is kept as typed', async () => {
  const app = await createTestApp()
  const person = app.addPerson('office', 'Orla Brandt')
  const office = await app.agentFor(person.email)
  const jobId = addJob(app)
  const form = typedForm('t', {
    'wings.t.wingWidthMm': '4,5 m',
    'wings.t.sides.4.finish': 'gable',
    'wings.mirrored': 'yes',
    'sections.fascia.depthMm': '190',
    collarTieHeightMm: '1200',
  })
  const side = { lengthMm: '9000', turn: 'left-by' as const, turnDeg: '45' }
  const walked: RoofForm = {
    ...form,
    walk: { startDeg: '0', sides: [{ ...side, side: form.sides.front }] },
  }
  await save(office, jobId, walked, 0)
  const { body } = await office.get(`/api/jobs/${jobId}/roof`).expect(200)
  expect(body.draft.form).toEqual(walked)
  const bad = { ...walked, wings: { ...walked.wings, turn: 'upside down' } }
  await office.put(`/api/jobs/${jobId}/roof`).send({ form: bad, version: 1 }).expect(400)
})

test('a draft stored before those fields opens, saves and issues; so does a screen left open since', async () => {
  const app = await createTestApp()
  const person = app.addPerson('office', 'Orla Brandt')
  const office = await app.agentFor(person.email)
  const jobId = addJob(app)
  app.db
    .insert(roofDrafts)
    .values({ jobId, form: formOfOld(), updatedAt: app.clock.current, version: 3 })
    .run()
  const { body } = await office.get(`/api/jobs/${jobId}/roof`).expect(200)
  expect(body.draft).toMatchObject({ form: typedForm(), version: 3, sizesTyped: {} })
  const old = { form: formOfOld(), version: 3 }
  const saved = await office.put(`/api/jobs/${jobId}/roof`).send(old).expect(200)
  const version = saved.body.version as number
  await office.post(`/api/jobs/${jobId}/revisions`).send({ version }).expect(201)
})

test('each size says who typed it and when, and a revision carries it on', async () => {
  const app = await createTestApp()
  const orla = app.addPerson('office', 'Orla Brandt')
  const maren = app.addPerson('office', 'Maren Tolhurst')
  const jobId = addJob(app)
  const first = await app.agentFor(orla.email)
  const saved = await save(first, jobId, typedForm(), 0)
  const byOrla = { by: 'Orla Brandt', at: '2026-12-02T00:00:00.000Z' }
  expect(saved.body.sizesTyped).toEqual({ rafter: byOrla, hip: byOrla, ridge: byOrla })

  app.clock.current = new Date('2026-12-03T00:00:00Z')
  const second = await app.agentFor(maren.email)
  const deeper = withText(typedForm(), 'sections.hip.depthMm', '240')
  const steeper = withText(withText(deeper, 'pitchDeg', '30'), 'sections.ridge.depthMm', ' 190')
  const byMaren = { by: 'Maren Tolhurst', at: '2026-12-03T00:00:00.000Z' }
  const changed = await save(second, jobId, steeper, 1)
  expect(changed.body.sizesTyped).toEqual({ rafter: byOrla, hip: byMaren, ridge: byOrla })
  const opened = await first.get(`/api/jobs/${jobId}/roof`).expect(200)
  expect(opened.body.draft.sizesTyped).toEqual(changed.body.sizesTyped)

  await second.post(`/api/jobs/${jobId}/revisions`).send({ version: 2 }).expect(201)
  const emptied = ['sections.hip.depthMm', 'sections.hip.thicknessMm'].reduce(
    (form, path) => withText(form, path, ''),
    steeper,
  )
  const after = await save(first, jobId, emptied, 2)
  expect(after.body.sizesTyped).toEqual({ rafter: byOrla, ridge: byOrla })
  const revision = await first.get(`/api/jobs/${jobId}/revisions/A`).expect(200)
  expect(revision.body.sizesTyped).toEqual({ rafter: byOrla, hip: byMaren, ridge: byOrla })
})

test('nobody can say that somebody else typed a size', async () => {
  const app = await createTestApp()
  const person = app.addPerson('office', 'Orla Brandt')
  const office = await app.agentFor(person.email)
  const jobId = addJob(app)
  const sizesTyped = { rafter: { by: 'An engineer', at: '2026-12-01T00:00:00.000Z' } }
  await office
    .put(`/api/jobs/${jobId}/roof`)
    .send({ form: typedForm(), version: 0, sizesTyped })
    .expect(400)
})

test('a database with drafts and revisions of before is brought up to date with all of them', async () => {
  const drizzleDir = path.join(import.meta.dirname, '../../drizzle')
  const oldDir = mkdtempSync(path.join(tmpdir(), 'ridgehand-'))
  mkdirSync(path.join(oldDir, 'meta'))
  const journal = JSON.parse(readFileSync(path.join(drizzleDir, 'meta/_journal.json'), 'utf8')) as {
    entries: unknown[]
  }
  const first = { ...journal, entries: journal.entries.slice(0, 1) }
  writeFileSync(path.join(oldDir, 'meta/_journal.json'), JSON.stringify(first))
  cpSync(path.join(drizzleDir, '0000_first.sql'), path.join(oldDir, '0000_first.sql'))
  const database = openDatabase(':memory:')
  migrate(drizzle(database.sqlite), { migrationsFolder: oldDir })
  rmSync(oldDir, { recursive: true })
  const { sqlite, db } = database
  const form = JSON.stringify(formOfOld())
  sqlite.exec(`insert into people (id, name, email, role, phone, created_at)
    values ('p', 'Orla Brandt', 'orla@quillback.example', 'office', '', 0)`)
  sqlite.exec(`insert into jobs (id, number, title, covering, created_at, updated_at)
    values ('j', 'QR-1', 'House', 'tiles', 0, 0)`)
  sqlite
    .prepare(`insert into roof_drafts (job_id, form, updated_at, version) values ('j', ?, 0, 7)`)
    .run(form)
  sqlite.exec(`insert into roof_revisions (id, job_id, sequence, letter, roof, settings, spec, glyph,
    engine_version, input_hash, issued_at, issued_by_id)
    values ('r', 'j', 1, 'A', '{}', '{}', '{}', '{}', '2', 'h', 0, 'p')`)
  migrateDatabase(database)
  expect(readDraft(db, 'j')).toMatchObject({ form: typedForm(), version: 7, sizesTyped: {} })
  const revision = db.select().from(roofRevisions).where(eq(roofRevisions.id, 'r')).get()
  expect(revision).toMatchObject({ letter: 'A', engineVersion: '2', sizesTyped: {} })
})
