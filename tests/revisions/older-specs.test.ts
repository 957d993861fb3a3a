import { expect, test } from 'vitest'

import { firmSchema } from '../../shared/firm/firm-schemas.ts'
import {
  frameSpecSchema,
  roofSchema,
  roofSettingsSchema,
} from '../../shared/revisions/frame-spec-schema.ts'
import { frameRoof } from '../../shared/roof/frame-roof.ts'
import { defaultSettings } from '../../shared/roof/roof-settings.ts'
import { openDatabase } from '../../server/db/client.ts'
import { migrateDatabase } from '../../server/db/migrate.ts'
import { readFirm } from '../../server/firm/firm-store.ts'
import { makeRoof } from '../roof/support/roofs.ts'

const roof = makeRoof(
  [
    [0, 0],
    [9000, 0],
    [9000, 6000],
    [0, 6000],
  ],
  [25, 32, 25, 'gable'],
)

test('a spec stored before the timbers beside the frame had names still reads', () => {
  const spec = frameRoof(roof)
  const { covering, ...totals } = spec.totals
  const cautions = spec.cautions.map(({ answers, ...rest }) => ({ rest, answers }))
  expect(covering).toBeDefined()
  expect(cautions.some((caution) => caution.answers !== undefined)).toBe(true)
  const older = { ...spec, totals, cautions: cautions.map((caution) => caution.rest) }
  const stored: unknown = JSON.parse(JSON.stringify(older))
  expect(frameSpecSchema.parse(stored)).toEqual(stored)
})

test('a spec with every new field comes through whole', () => {
  const sections = {
    ...roof.sections,
    underpurlin: { thicknessMm: 75, depthMm: 150 },
    collarTie: { thicknessMm: 35, depthMm: 90 },
    fascia: { thicknessMm: 30, depthMm: 190 },
    barge: { thicknessMm: 30, depthMm: 190 },
  }
  const full = { ...roof, tail: 'square' as const, sections, collarTieHeightMm: 900 }
  const settings = { ...defaultSettings, maxRafterSpanMm: 2000, battenGaugeMm: 330 }
  const spec = frameRoof(full, settings)
  expect(new Set(spec.members.map((m) => m.role)).size).toBeGreaterThanOrEqual(8)
  expect(frameSpecSchema.parse(spec)).toEqual(spec)
  expect(roofSchema.parse(full)).toEqual(full)
  expect(roofSettingsSchema.parse(settings)).toEqual(settings)
})

test('settings stored before collar ties and battens were set still read and still frame', () => {
  const { collarTieSpacingMm, ...older } = defaultSettings
  expect(collarTieSpacingMm).toBe(1200)
  expect(roofSettingsSchema.parse(older)).toEqual(older)
  const sections = { ...roof.sections, collarTie: { thicknessMm: 35, depthMm: 90 } }
  const ties = frameRoof({ ...roof, sections }, older).members.filter(
    (m) => m.role === 'collar-tie',
  )
  expect(ties.length).toBeGreaterThan(0)
})

test('a firm’s settings as a new installation has them pass its schema', () => {
  const database = openDatabase(':memory:')
  migrateDatabase(database)
  const settings = firmSchema.parse(readFirm(database.db))
  database.close()
  expect(settings.roofSettings.collarTieSpacingMm).toBe(1200)
})
