import { expect, test } from 'vitest'

import { firm } from '../../server/db/tables/firm-tables.ts'
import { newFirm, readFirm } from '../../server/firm/firm-store.ts'
import { defaultLabourRates } from '../../shared/labour/default-labour-rates.ts'
import { createTestApp } from './harness.ts'

test('a firm stored before underpurlins and ties had minutes keeps its own and gets theirs', async () => {
  const app = await createTestApp()
  const { underpurlin, 'collar-tie': tie, fascia, barge, ...pieces } = defaultLabourRates.pieces
  const rates = {
    ...defaultLabourRates,
    pieces: { ...pieces, hip: { cutMinutes: 99, standMinutes: 9 } },
  }
  const { collarTieSpacingMm, ...roofSettings } = newFirm.roofSettings
  app.db
    .update(firm)
    .set({ labourRates: rates as never, roofSettings })
    .run()

  const read = readFirm(app.db)
  expect(read.labourRates.pieces).toMatchObject({ underpurlin, 'collar-tie': tie, fascia, barge })
  expect(read.labourRates.pieces.hip.cutMinutes).toBe(99)
  expect(read.roofSettings.collarTieSpacingMm).toBe(collarTieSpacingMm)

  const office = await app.agentFor(app.addPerson('office', 'Orla Brandt').email)
  const { body } = await office.get('/api/firm').expect(200)
  expect(body.labourRates.pieces.underpurlin).toEqual(underpurlin)
  await office.put('/api/firm').send(body).expect(200)
})
