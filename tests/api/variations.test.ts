import { expect, test } from 'vitest'
import { newId } from '../../server/lib/ids.ts'
import { variationState, variationTotals } from '../../shared/variations/variation-rules.ts'
import type { JobVariations } from '../../shared/variations/variation-schemas.ts'
import { bookingFirm } from './booking-kit.ts'

async function jobWithVariation(price = '450') {
  const firm = await bookingFirm()
  const jobId = firm.jobs.hillJob
  const at = `/api/jobs/${jobId}/variations`
  const id = newId()
  const add = (input: object, status = 201) => firm.officeAgent.post(at).send(input).expect(status)
  const change = async (input: object, status = 200) =>
    (await firm.officeAgent.patch(`${at}/${id}`).send(input).expect(status)).body
  const added = await add({ id, reason: 'Skylight trimmed in', price })
  return { ...firm, at, id, add, change, added: added.body as JobVariations }
}

test('a variation has a reason and a price, and is agreed by the builder’s yes with day and name', async () => {
  const { change, added } = await jobWithVariation()
  expect(added.variations[0]).toMatchObject({ sequence: 1, priceCents: 45_000, agreedOn: null })
  expect(variationState(added.variations[0]!)).toBe('to-ask')
  const asked: JobVariations = await change({ version: 1, askedOn: '2026-12-01' })
  expect(variationState(asked.variations[0]!)).toBe('asked')
  const agreed: JobVariations = await change({
    version: 2,
    agreed: { on: '2026-12-02', by: 'Nell Ashby' },
  })
  expect(variationState(agreed.variations[0]!)).toBe('agreed')
  expect(agreed.variations[0]).toMatchObject({ agreedOn: '2026-12-02', agreedBy: 'Nell Ashby' })
})

test('what the builder said yes to does not change under the yes', async () => {
  const { change } = await jobWithVariation()
  await change({ version: 1, agreed: { on: '2026-12-02', by: 'Nell Ashby' } })
  const refused = await change({ version: 2, price: '900' }, 409)
  expect(refused.message).toContain('Take the yes back first')
  await change({ version: 2, agreed: null })
  const after: JobVariations = await change({ version: 3, price: '900' })
  expect(after.variations[0]!.priceCents).toBe(90_000)
})

test('a yes without a name, without a price or on a day to come is refused at its field', async () => {
  const { change } = await jobWithVariation('')
  const issuesOf = async (input: object) =>
    (await change({ version: 1, ...input }, 400)).issues.map((one: { path: string }) => one.path)
  expect(await issuesOf({ agreed: { on: '2026-12-02', by: ' ' } })).toEqual(['agreed.by'])
  expect(await issuesOf({ agreed: { on: '2026-12-02', by: 'Nell' } })).toEqual(['price'])
  expect(await issuesOf({ price: '10', agreed: { on: '2026-12-03', by: 'Nell' } })).toEqual([
    'agreed.on',
  ])
})

test('an older version is refused with both, and sending the first twice makes one', async () => {
  const { change, add, id, at, officeAgent } = await jobWithVariation()
  await change({ version: 1, reason: 'Two skylights trimmed in' })
  const stale = await change({ version: 1, reason: 'No skylight' }, 409)
  expect(stale.detail.current.reason).toBe('Two skylights trimmed in')
  expect(stale.detail.sent.reason).toBe('No skylight')
  await add({ id, reason: 'Skylight trimmed in', price: '450' })
  expect((await officeAgent.get(at).expect(200)).body.variations).toHaveLength(1)
})

test('work left out is priced below nothing, and a price that is none is refused', async () => {
  const { add, added } = await jobWithVariation('-1,200.50')
  expect(added.variations[0]!.priceCents).toBe(-120_050)
  for (const price of ['-', 'ten', '1.234'])
    await add({ id: newId(), reason: 'Left out', price }, 400)
})

test('a variation of one job is not found under another', async () => {
  const { id, jobs, officeAgent } = await jobWithVariation()
  await officeAgent
    .patch(`/api/jobs/${jobs.bareJob}/variations/${id}`)
    .send({ version: 1, reason: 'Elsewhere' })
    .expect(404)
})

test('only what is agreed is added to the price; what is withdrawn counts nowhere', () => {
  const none = { askedOn: null, agreedOn: null, withdrawnOn: null }
  const totals = variationTotals(1_000_000, [
    { ...none, priceCents: 45_000, agreedOn: '2026-12-02' },
    { ...none, priceCents: -10_000, agreedOn: '2026-12-02' },
    { ...none, priceCents: 20_000, askedOn: '2026-12-01' },
    { ...none, priceCents: 7_000 },
    { ...none, priceCents: 99_000, agreedOn: '2026-12-02', withdrawnOn: '2026-12-02' },
    { ...none, priceCents: null },
  ])
  expect(totals).toEqual({ agreedCents: 35_000, openCents: 27_000, wholeCents: 1_035_000 })
})
