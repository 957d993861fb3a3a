import { eq } from 'drizzle-orm'
import { expect, test } from 'vitest'
import { roofRevisions } from '../../server/db/tables/job-tables.ts'
import { keptIssuedRoofs, readIssuedRoofs } from '../../server/revisions/issued-roofs.ts'
import { bookingFirm } from './booking-kit.ts'

test('an issued roof is read once, is what the database holds, and cannot be written to', async () => {
  const { app, revisions } = await bookingFirm()
  const id = revisions.hillRevision
  const read = keptIssuedRoofs()
  const first = read(app.db, [id]).get(id)!
  expect(first).toEqual(readIssuedRoofs(app.db, [id]).get(id))
  app.db.update(roofRevisions).set({ letter: 'Z' }).where(eq(roofRevisions.id, id)).run()
  expect(read(app.db, [id, id]).get(id)).toBe(first)
  expect(() => {
    first.spec.members[0]!.cuts[0]!.alongMm = 0
  }).toThrow(TypeError)
})

test('of more roofs than are kept, those not asked for longest are read anew', async () => {
  const { app, revisions } = await bookingFirm()
  const [a, b] = [revisions.hillRevision, revisions.creekRevision]
  const third = app.db.select().from(roofRevisions).where(eq(roofRevisions.id, a)).get()!
  const c = 'third'
  app.db
    .insert(roofRevisions)
    .values({ ...third, id: c, sequence: 2 })
    .run()
  const read = keptIssuedRoofs(2)
  const of = (id: string) => read(app.db, [id]).get(id)
  const [firstA, firstB] = [of(a), of(b)]
  expect(of(a)).toBe(firstA)
  of(c)
  expect(of(a)).toBe(firstA)
  expect(of(b)).not.toBe(firstB)
  expect(of(b)).toEqual(firstB)
})

test('a revision that is not there stays not there, and is found once it is', async () => {
  const { app, revisions } = await bookingFirm()
  const read = keptIssuedRoofs()
  expect(read(app.db, ['none']).size).toBe(0)
  const row = app.db
    .select()
    .from(roofRevisions)
    .where(eq(roofRevisions.id, revisions.hillRevision))
    .get()!
  app.db
    .insert(roofRevisions)
    .values({ ...row, id: 'none', sequence: 2 })
    .run()
  expect(read(app.db, ['none']).get('none')?.sequence).toBe(2)
})
