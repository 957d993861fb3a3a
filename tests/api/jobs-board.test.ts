import { sql } from 'drizzle-orm'
import { expect, test } from 'vitest'
import { jobs } from '../../server/db/tables/job-tables.ts'
import { newId } from '../../server/lib/ids.ts'
import { createTestApp } from './harness.ts'
import { jobKit } from './jobs-kit.ts'

async function boardApp() {
  const app = await createTestApp()
  const orla = app.addPerson('office', 'Orla Brandt')
  const crew = app.addCrew('Kestrel', [])
  return { app, kit: jobKit(app), orla, crew, office: await app.agentFor(orla.email) }
}

type Card = { id: string; number: string; stage: string; missing: string[] }
const numbers = (body: { jobs: Card[] }) => body.jobs.map((job) => job.number)

test('a card carries its roof, its next booking and what is missing', async () => {
  const { kit, orla, crew, office } = await boardApp()
  const id = kit.addJob({ number: 'QR-1', priceCents: 1, acceptedOn: '2026-12-01' })
  kit.addBooking(id, crew.id, ['2026-11-20'])
  const ahead = kit.addBooking(id, crew.id, ['2026-12-03', '2026-12-04'], 'pencilled')
  kit.addRevision(id, orla.id, 1)
  const latest = kit.addRevision(id, orla.id, 2)
  const [card] = (await office.get('/api/jobs').expect(200)).body.jobs
  expect(card).toMatchObject({
    stage: 'firm',
    latestLetter: 'B',
    hasDraft: false,
    missing: ['site-address', 'site-contact', 'plate-check'],
    nextBooking: {
      id: ahead.id,
      state: 'pencilled',
      startsOn: '2026-12-03',
      endsOn: '2026-12-04',
      dayCount: 2,
      crew: { name: 'Kestrel', letter: 'K' },
    },
  })
  expect(card.glyph.outline).toHaveLength(4)
  kit.addPlateCheck(id, latest, orla.id)
  kit.addDraft(id, new Date('2026-12-03T00:00:00Z'))
  const [after] = (await office.get('/api/jobs')).body.jobs
  expect(after.hasDraft).toBe(true)
  expect(after.missing).toEqual(['site-address', 'roof-not-issued', 'site-contact'])
})

test('plates measured to an earlier revision are not measured to the latest', async () => {
  const { kit, orla, crew, office } = await boardApp()
  const id = kit.addJob()
  kit.addBooking(id, crew.id, ['2026-12-03'])
  kit.addPlateCheck(id, kit.addRevision(id, orla.id, 1), orla.id)
  expect((await office.get(`/api/jobs/${id}`)).body.arePlatesMeasured).toBe(true)
  kit.addRevision(id, orla.id, 2)
  expect((await office.get(`/api/jobs/${id}`)).body.arePlatesMeasured).toBe(false)
})

test('search finds by number, title, site and contact, every word somewhere', async () => {
  const { kit, office } = await boardApp()
  kit.addJob({ number: 'QR-1', title: 'House', siteAddress: '12 Lantern Street, Marrow Creek' })
  kit.addJob({ number: 'QR-2', title: 'Hall 100%', siteContactName: 'Pella Vance' })
  const find = async (q: string) => numbers((await office.get('/api/jobs').query({ q })).body)
  expect(await find('qr-2')).toEqual(['QR-2'])
  expect(await find('marrow house')).toEqual(['QR-1'])
  expect(await find('pella')).toEqual(['QR-2'])
  expect(await find('pella lantern')).toEqual([])
  expect(await find('100%')).toEqual(['QR-2'])
  expect(await find('%')).toEqual(['QR-2'])
  expect(await find('_')).toEqual([])
})

test('stage and crew filters leave the counts of the other stages standing', async () => {
  const { app, kit, crew, office } = await boardApp()
  const others = app.addCrew('Plover', [])
  kit.addJob({ number: 'QR-1' })
  kit.addBooking(kit.addJob({ number: 'QR-2' }), crew.id, ['2026-12-03'])
  kit.addBooking(kit.addJob({ number: 'QR-3' }), others.id, ['2026-12-03'])
  const firm = (await office.get('/api/jobs?stage=firm')).body
  expect(numbers(firm)).toEqual(['QR-2', 'QR-3'])
  expect(firm.counts).toMatchObject({ enquiry: 1, firm: 2, complete: 0 })
  expect(numbers((await office.get(`/api/jobs?crew=${others.id}`)).body)).toEqual(['QR-3'])
  expect((await office.get('/api/jobs?stage=lost').expect(400)).body.issues[0].path).toBe('stage')
  expect((await office.get('/api/jobs?sort=price').expect(400)).body.issues[0].path).toBe('sort')
})

test('a called-off booking neither books a job nor shows on its card', async () => {
  const { app, kit, crew, office } = await boardApp()
  const id = kit.addJob({ acceptedOn: '2026-12-01' })
  const booking = kit.addBooking(id, crew.id, ['2026-12-03'])
  app.db.run(sql`update bookings set cancelled_at = 1 where id = ${booking.id}`)
  const [card] = (await office.get('/api/jobs')).body.jobs
  expect(card).toMatchObject({ stage: 'won', nextBooking: null })
  expect(card.missing).toContain('booking')
})

test('within a stage the soonest comes first, completed ones latest first', async () => {
  const { kit, crew, office } = await boardApp()
  kit.addBooking(kit.addJob({ number: 'late' }), crew.id, ['2026-12-09'])
  kit.addBooking(kit.addJob({ number: 'soon' }), crew.id, ['2026-11-02', '2026-12-03'])
  kit.addJob({ number: 'old', completedOn: '2026-10-01' })
  kit.addJob({ number: 'new', completedOn: '2026-11-30' })
  kit.addJob({ number: 'wanted', wantedBy: '2026-12-20' })
  kit.addJob({ number: 'whenever' })
  const { body } = await office.get('/api/jobs')
  const of = (stage: string) =>
    numbers({ jobs: body.jobs.filter((job: Card) => job.stage === stage) })
  expect(of('firm')).toEqual(['soon', 'late'])
  expect(of('complete')).toEqual(['new', 'old'])
  expect(of('enquiry')).toEqual(['wanted', 'whenever'])
})

test('ten thousand jobs come a page a stage, each once, in a bounded number of queries', async () => {
  const { app, kit, crew, office } = await boardApp()
  const at = app.clock.current
  const rows = Array.from({ length: 10_000 }, (_, i) => ({
    id: newId(),
    number: `QR-${i}`,
    title: `House ${i}`,
    covering: 'tiles' as const,
    completedOn: i % 10 === 0 ? null : '2026-01-05',
    createdAt: at,
    updatedAt: at,
  }))
  for (let from = 0; from < rows.length; from += 1000) {
    app.db
      .insert(jobs)
      .values(rows.slice(from, from + 1000))
      .run()
  }
  app.database.sqlite.transaction(() => {
    for (let i = 0; i < 100; i++) kit.addBooking(rows[i * 10]!.id, crew.id, ['2026-12-03'])
    for (const row of rows) if (row.completedOn) kit.addBooking(row.id, crew.id, ['2026-01-05'])
  })()
  const first = (await office.get('/api/jobs').expect(200)).body
  expect(first.counts).toMatchObject({ enquiry: 900, firm: 100, complete: 9000 })
  expect(first.jobs).toHaveLength(120)
  expect(first.nextOffset).toBe(40)

  const seen = new Set<string>()
  for (let offset: number | null = 0; offset !== null;) {
    const { body } = await office.get('/api/jobs').query({ stage: 'firm', offset })
    for (const job of body.jobs) seen.add(job.id)
    offset = body.nextOffset
  }
  expect(seen.size).toBe(100)

  // Looked up crew by job this took 40 s; once for all jobs, well under one.
  const startedAt = performance.now()
  const ofCrew = (await office.get('/api/jobs').query({ crew: crew.id })).body
  expect(ofCrew.counts).toMatchObject({ enquiry: 0, firm: 100, complete: 9000 })
  expect(performance.now() - startedAt).toBeLessThan(5000)

  const countQueries = async (query: string) => {
    let statements = 0
    const prepare = app.database.sqlite.prepare.bind(app.database.sqlite)
    app.database.sqlite.prepare = (source) => {
      statements++
      return prepare(source)
    }
    await office.get(`/api/jobs${query}`).expect(200)
    app.database.sqlite.prepare = prepare
    return statements
  }
  const forAll = await countQueries('')
  expect(forAll).toBeGreaterThan(5)
  expect(await countQueries('?q=House+10&stage=firm')).toBeLessThanOrEqual(forAll)
})
