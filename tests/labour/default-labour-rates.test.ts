import { describe, expect, test } from 'vitest'
import { defaultLabourRates } from '../../shared/labour/default-labour-rates.ts'
import { workPackagesOf } from '../../shared/labour/work-packages.ts'
import { labourMinutes } from '../../shared/labour/work-step.ts'
import type { Roof } from '../../shared/roof/roof-types.ts'
import { framedOnce } from '../roof/support/framed.ts'
import { rectangle } from '../roof/support/plans.ts'
import { makeRoof } from '../roof/support/roofs.ts'

// Source: labour to cut and pitch, an estimating textbook's figure 13.55 (excerpt seen, title not): 18.5–35 h
// per 1000 board feet, converted to 7.8–12.7 h/m³ for gable rafters and 9.3–14.8 h/m³ for hip roofs. It is
// for rafters cut and pitched, so fascia and tails are left out. It is an average over ordinary houses: a
// small pyramid, all short pieces, lies above it and is not held to it.
const hipRange = [9.3, 14.8] as const
const gableRange = [7.8, 12.7] as const

function cutAndPitchMinutes(roof: Roof): { minutes: number; volumeM3: number } {
  const spec = framedOnce(roof)
  const packages = workPackagesOf(spec, defaultLabourRates).filter((p) => p.key !== 'tails')
  const volumeMm3 = spec.members.reduce(
    (sum, m) => sum + m.cutLengthMm * m.section.thicknessMm * m.section.depthMm,
    0,
  )
  return { minutes: labourMinutes(packages), volumeM3: volumeMm3 / 1e9 }
}

function hoursPerM3(roof: Roof): number {
  const { minutes, volumeM3 } = cutAndPitchMinutes(roof)
  return minutes / 60 / volumeM3
}

const hipRoof = (longMm: number, wideMm: number, pitchDeg: number): Roof =>
  makeRoof(rectangle(longMm, wideMm), [pitchDeg, pitchDeg, pitchDeg, pitchDeg])
const gableRoof = (longMm: number, wideMm: number, pitchDeg: number): Roof =>
  makeRoof(rectangle(longMm, wideMm), [pitchDeg, 'gable', pitchDeg, 'gable'])

const plans = [
  [9000, 6000],
  [12000, 8000],
  [15000, 9000],
  [18000, 8000],
] as const
const cases = plans.flatMap(([long, wide]) =>
  [22.5, 25, 30].map((pitch) => [long, wide, pitch] as const),
)

describe('the labour a new firm starts from', () => {
  test.each(cases)('a %i × %i mm hip roof at %f° takes hours per m³ in range', (...size) => {
    const hours = hoursPerM3(hipRoof(...size))
    expect(hours).toBeGreaterThanOrEqual(hipRange[0])
    expect(hours).toBeLessThanOrEqual(hipRange[1])
  })

  test.each(cases)('a %i × %i mm gable roof at %f° takes hours per m³ in range', (...size) => {
    const hours = hoursPerM3(gableRoof(...size))
    expect(hours).toBeGreaterThanOrEqual(gableRange[0])
    expect(hours).toBeLessThanOrEqual(gableRange[1])
  })

  test('a hip roof takes about a third more labour than a gable roof over the same plan', () => {
    // Source: 'hip roof about 30 % more labour than a gable', old estimating text, seen.
    const ratios = cases.map(
      (size) =>
        cutAndPitchMinutes(hipRoof(...size)).minutes /
        cutAndPitchMinutes(gableRoof(...size)).minutes,
    )
    const mean = ratios.reduce((a, b) => a + b, 0) / ratios.length
    expect(mean).toBeGreaterThan(1.2)
    expect(mean).toBeLessThan(1.4)
  })
})
