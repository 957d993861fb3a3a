import { describe, expect, test } from 'vitest'

import { tiedPlaces } from '../../../shared/roof/secondary/collar-ties.ts'
import type { Roof } from '../../../shared/roof/roof-types.ts'
import { rectangle } from '../support/plans.ts'
import { makeRoof } from '../support/roofs.ts'
import { endOf, framed, membersOf, sin, tan, withSizes } from './sized.ts'

const gableRoof = (changes: Partial<Roof> = {}, pitches = [25, 25]) => ({
  ...withSizes(
    makeRoof(rectangle(9000, 8000), [pitches[0]!, 'gable', pitches[1]!, 'gable']),
    'collarTie',
  ),
  ...changes,
})

describe('how many', () => {
  test('the first pair, each as far on as 1.2 m lets, and the last', () => {
    // Source of the 1.2 m: IRC R802.3.1, as quoted by a secondary page.
    expect(tiedPlaces([0, 600, 1200, 1800, 2400, 3000], 1200)).toEqual([0, 2, 4, 5])
    expect(tiedPlaces([0, 700, 1400], 1200)).toEqual([0, 1, 2])
    expect(tiedPlaces([500], 1200)).toEqual([0])
  })

  test('a 9.0 m gable roof with rafters at 597 mm ties every second pair', () => {
    // 8955 mm between the flush rafters in 15 bays of 597 mm; at most 1200 mm apart is every second
    // pair: 8, and the last
    const ties = membersOf(framed(gableRoof()), 'collar-tie')
    expect(ties).toHaveLength(9)
    const along = ties.map((tie) => tie.axis.from.x).sort((a, b) => a - b)
    expect(Math.max(...along.slice(1).map((x, k) => x - along[k]!))).toBeLessThan(1200.5)
  })

  test('a hip roof ties the pairs on its ridge', () => {
    const roof = withSizes(makeRoof(rectangle(12_000, 8000), Array(4).fill(25)), 'collarTie')
    const ties = membersOf(framed(roof), 'collar-tie')
    // ridge 4000 mm from 4000 to 8000, rafters at 571 mm or less: the pairs at both ends are tied
    const along = ties.map((tie) => tie.axis.from.x)
    expect(Math.min(...along)).toBeCloseTo(4000 + 22.5 + 17.5, 6)
    expect(Math.max(...along)).toBeCloseTo(8000 - 22.5 - 17.5, 6)
  })

  test('a pyramid has no ridge and no ties', () => {
    const roof = withSizes(makeRoof(rectangle(5000, 5000), Array(4).fill(30)), 'collarTie')
    expect(membersOf(framed(roof), 'collar-tie')).toEqual([])
  })
})

describe('each one', () => {
  test('lies in the upper third: its underside at two thirds of the rise', () => {
    // Source: collar ties in the upper third, IRC R802.3.1, as quoted by a secondary page.
    const [tie] = membersOf(framed(gableRoof()), 'collar-tie')
    expect(tie!.axis.from.z).toBeCloseTo((2 / 3) * 4000 * tan(25) + 90, 6)
  })

  test('is as long at its top as the rafters’ top planes are apart there', () => {
    // Second derivation: at height z the planes are at inside = (z − stand) / tan from their plates.
    const spec = framed(gableRoof({ collarTieHeightMm: 1000 }, [25, 32]))
    const [tie] = membersOf(spec, 'collar-tie')
    const inside = (pitch: number) => (1090 - spec.standMm) / tan(pitch)
    expect(tie!.setOutLengthMm).toBeCloseTo(8000 - inside(25) - inside(32), 6)
    // its lower corners reach further, by its depth over the tangent at each end
    expect(tie!.cutLengthMm).toBeCloseTo(tie!.setOutLengthMm + 90 / tan(25) + 90 / tan(32), 6)
  })

  test('is cut in the slopes: face bevel the pitch at the foot, its supplement at the head', () => {
    const [tie] = membersOf(framed(gableRoof({}, [25, 32])), 'collar-tie')
    const faces = [endOf(tie!, 'foot'), endOf(tie!, 'head')].map((cut) => cut.face.fromEdgeDeg)
    expect(faces[0]).toBeCloseTo(25, 9)
    expect(faces[1]).toBeCloseTo(180 - 32, 9)
    expect(tie!.cuts.map((cut) => [cut.longSide, cut.bladeTiltDeg])).toEqual([
      ['none', 0],
      ['none', 0],
    ])
    expect(tie!.hand).toBeNull()
  })

  test('stands beside a pair of commons, its face on theirs', () => {
    const spec = framed(gableRoof())
    const commons = membersOf(spec, 'common')
    for (const tie of membersOf(spec, 'collar-tie')) {
      const off = commons.map((c) => Math.abs(c.axis.to.x - tie.axis.from.x))
      expect(Math.min(...off)).toBeCloseTo((45 + 35) / 2, 6)
    }
  })
})

describe('room', () => {
  const purlined = (changes: Partial<Roof> = {}) => {
    const roof = withSizes(
      makeRoof(rectangle(9000, 8000), [25, 'gable', 25, 'gable']),
      'collarTie',
      'underpurlin',
    )
    return { ...roof, ...changes }
  }

  test('a typed height that runs into the underpurlins rests on them instead, and says so', () => {
    // row at half of 4413.5: its top's upper edge is half its 75 mm up the slope from its axis
    const spec = framed(purlined({ collarTieHeightMm: 900 }))
    const [purlin] = membersOf(spec, 'underpurlin')
    const top = purlin!.axis.from.z + 37.5 * sin(25)
    const [tie] = membersOf(spec, 'collar-tie')
    expect(tie!.axis.from.z - 90).toBeCloseTo(top, 6)
    const caution = spec.cautions.find((c) => c.code === 'collar-tie-moved')
    expect(caution?.answers).toEqual([
      { path: 'collarTieHeightMm', value: Math.ceil(top), unit: 'mm' },
    ])
  })

  test('the height that the caution names answers it', () => {
    const said = framed(purlined({ collarTieHeightMm: 900 })).cautions.find(
      (c) => c.code === 'collar-tie-moved',
    )
    const value = said!.answers![0]!.value
    const spec = framed(purlined({ collarTieHeightMm: value }))
    expect(spec.cautions.map((c) => c.code)).not.toContain('collar-tie-moved')
    expect(membersOf(spec, 'collar-tie')[0]!.axis.from.z).toBeCloseTo(value + 90, 6)
  })

  test('no ties above the ridge’s underside, and what height would leave room', () => {
    const spec = framed(gableRoof({ collarTieHeightMm: 1800 }))
    expect(membersOf(spec, 'collar-tie')).toEqual([])
    const [ridge] = membersOf(spec, 'ridge')
    const most = Math.floor(ridge!.axis.from.z - 190 - 90)
    const caution = spec.cautions.find((c) => c.code === 'collar-tie-moved')
    expect(caution?.answers).toEqual([{ path: 'collarTieHeightMm', value: most, unit: 'mm' }])
    const again = framed(gableRoof({ collarTieHeightMm: most }))
    expect(membersOf(again, 'collar-tie')).toHaveLength(9)
  })
})
