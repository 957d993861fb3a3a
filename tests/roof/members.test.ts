import { describe, expect, test } from 'vitest'

import { frameRoof } from '../../shared/roof/frame-roof.ts'
import { defaultSettings } from '../../shared/roof/roof-settings.ts'
import type { FrameSpec, Member, MemberRole, Roof } from '../../shared/roof/roof-types.ts'
import { rectangle } from './support/plans.ts'
import { makeRoof, regularOutline } from './support/roofs.ts'

/** Source of the rules checked here: the project's written agreement on layout, joints and outputs. */
const plan = rectangle(9000, 6000)
const ofRole = (spec: FrameSpec, role: MemberRole): Member[] =>
  spec.members.filter((m) => m.role === role)
const head = (member: Member) => member.cuts.filter((cut) => cut.end === 'head')
const tail = (member: Member) => member.cuts.filter((cut) => cut.end === 'tail')

describe('layout', () => {
  const stations = (roof: Roof) =>
    frameRoof(roof)
      .members.filter((m) => m.planes[0] === 0 && m.planes.length === 1)
      .map((m) => m.axis.from.x)
      .sort((a, b) => a - b)
  const gabled = (changes: Parameters<typeof makeRoof>[2]) =>
    makeRoof(plan, [25, 'gable', 25, 'gable'], changes)

  test('rafters stand flush inside each gable, the bays between them even', () => {
    const found = stations(gabled({ spacing: 'even' }))
    expect(found[0]).toBeCloseTo(22.5, 6)
    expect(found.at(-1)).toBeCloseTo(8977.5, 6)
    expect(found).toHaveLength(16)
    const bays = found.slice(1).map((x, k) => x - found[k]!)
    for (const bay of bays) expect(bay).toBeCloseTo(8955 / 15, 6)
  })

  test('full bays leave the odd one last, and both slopes count from the same end', () => {
    const spec = frameRoof(gabled({ spacing: 'full' }))
    const along = (plane: number) =>
      ofRole(spec, 'common')
        .filter((m) => m.planes[0] === plane)
        .map((m) => m.axis.from.x)
        .sort((a, b) => a - b)
    expect(along(0)[1]! - along(0)[0]!).toBeCloseTo(600, 6)
    along(0).forEach((x, k) => expect(along(1)[k]).toBeCloseTo(x, 6))
  })

  test('creepers fall by one constant difference: the spacing, up the slope', () => {
    const spec = frameRoof(makeRoof(plan, [22.5, 35, 22.5, 35]))
    const lengths = ofRole(spec, 'creeper')
      .filter((m) => m.planes[0] === 0 && m.hand === 'right')
      .map((m) => m.setOutLengthMm)
      .sort((a, b) => b - a)
    expect(lengths.length).toBeGreaterThan(1)
    // tan 35 / tan 22.5 of rise to run along the plate, over cos 22.5, from plane geometry
    const tan = (deg: number) => Math.tan((deg * Math.PI) / 180)
    const difference = ((600 * tan(35)) / tan(22.5)) * Math.hypot(1, tan(22.5))
    lengths.slice(1).forEach((mm, k) => expect(lengths[k]! - mm).toBeCloseTo(difference, 6))
  })

  test('creepers shorter than the setting are left out', () => {
    const roof = makeRoof(plan, [25, 25, 25, 25])
    const short = frameRoof(roof, { ...defaultSettings, minCreeperMm: 700 })
    expect(Math.min(...ofRole(short, 'creeper').map((m) => m.setOutLengthMm))).toBeGreaterThan(700)
    expect(short.members.length).toBeLessThan(frameRoof(roof).members.length)
  })
})

describe('joints', () => {
  test('at unequal pitches the two cheeks of a hip cross its centre line at different places', () => {
    const hips = ofRole(frameRoof(makeRoof(plan, [22.5, 35, 22.5, 35])), 'hip')
    for (const hip of hips) {
      const [a, b] = head(hip)
      expect(head(hip)).toHaveLength(2)
      expect(Math.abs(a!.alongMm - b!.alongMm)).toBeGreaterThan(10)
      expect(hip.headDeductionMm).toBeCloseTo(
        hip.setOutLengthMm - Math.max(a!.alongMm, b!.alongMm),
        6,
      )
      expect(hip.hand).not.toBeNull()
    }
  })

  test('a gable ridge runs out to the verge', () => {
    const spec = frameRoof(makeRoof(plan, [30, 'gable', 30, 'gable'], { overhangMm: 320 }))
    const [ridge] = ofRole(spec, 'ridge')
    expect(ridge!.cutLengthMm).toBeCloseTo(9640, 6)
    expect([ridge!.headDeductionMm, ridge!.footDeductionMm]).toEqual([
      expect.closeTo(-320, 6),
      expect.closeTo(-320, 6),
    ])
  })

  test('the crown end bears on the ridge first, then on the centring pair beside it', () => {
    const spec = frameRoof(makeRoof(plan, [25, 25, 25, 25]))
    for (const crown of ofRole(spec, 'crown-end')) {
      const [cut] = head(crown)
      expect(cut!.against).toBe('R1')
      expect(cut!.alsoAgainst.map((mark) => mark[0])).toEqual(['C', 'C'])
    }
  })

  test('over a splay the crown end butts the foot of the broken hip, which runs half a rafter past its node', () => {
    const spec = frameRoof(
      makeRoof(
        [
          [0, 0],
          [9000, 0],
          [10200, 1200],
          [10200, 4800],
          [9000, 6000],
          [0, 6000],
        ],
        [25, 25, 25, 25, 25, 'gable'],
      ),
    )
    const broken = ofRole(spec, 'broken-hip')
    expect(broken).toHaveLength(2)
    for (const member of broken) {
      const past = -member.footDeductionMm * Math.cos((member.pitchDeg * Math.PI) / 180)
      expect(past).toBeCloseTo(22.5, 6)
      const crown = ofRole(spec, 'crown-end').find((m) => head(m)[0]!.against === member.mark)
      expect(head(crown!)).toHaveLength(1)
    }
  })

  test('on a pyramid one pair butts in line, the pair square to it butts its sides, the hips go between', () => {
    const spec = frameRoof(makeRoof(rectangle(5000, 5000), [30, 30, 30, 30]))
    const deductions = ofRole(spec, 'crown-end').map((m) => [m.planes[0], m.headDeductionMm])
    const cos = Math.cos(Math.PI / 6)
    expect(deductions.filter(([, mm]) => Math.abs(mm!) < 1e-6).map(([p]) => p)).toEqual([0, 2])
    for (const [plane, mm] of deductions) {
      if (plane === 1 || plane === 3) expect(mm).toBeCloseTo(22.5 / cos, 6)
    }
    for (const hip of ofRole(spec, 'hip')) expect(head(hip)).toHaveLength(2)
  })

  test('on a triangle, with no two in line, the crown ends are mitred on the planes between them', () => {
    const side = 6000
    const spec = frameRoof(
      makeRoof(
        [
          [0, 0],
          [side, 0],
          [side / 2, (side * Math.sqrt(3)) / 2],
        ],
        [30, 30, 30],
      ),
    )
    for (const crown of ofRole(spec, 'crown-end')) {
      expect(crown.headDeductionMm).toBeCloseTo(0, 6)
      expect(head(crown).map((cut) => cut.bladeTiltDeg)).toEqual([
        expect.closeTo(30, 6),
        expect.closeTo(30, 6),
      ])
    }
  })
})

describe('tails, tops and lengths', () => {
  test('a hip tail has two cheeks, one for each eave; a rafter tail is square across', () => {
    const spec = frameRoof(makeRoof(plan, [25, 25, 25, 25]))
    for (const hip of ofRole(spec, 'hip')) {
      expect(
        tail(hip)
          .map((cut) => cut.longSide)
          .sort(),
      ).toEqual(['left', 'right'])
    }
    for (const common of ofRole(spec, 'common')) {
      expect(tail(common).map((cut) => cut.longSide)).toEqual(['none'])
      expect(common.tailLengthMm).toBeCloseTo(450 / Math.cos((25 * Math.PI) / 180), 6)
    }
  })

  test('a square tail stands at 90° to the edge and ends the top where the plumb one does', () => {
    const spec = frameRoof(makeRoof(plan, [25, 25, 25, 25], { tail: 'square' }))
    const [common] = ofRole(spec, 'common')
    expect(tail(common!)[0]!.face.fromEdgeDeg).toBeCloseTo(90, 6)
    expect(common!.tailLengthMm).toBeCloseTo(450 / Math.cos((25 * Math.PI) / 180), 6)
  })

  test('cut length reaches from long point to long point, the plumb tail and the allowance included', () => {
    const spec = frameRoof(makeRoof(plan, [25, 25, 25, 25], { tailAllowanceMm: 60 }))
    const [common] = ofRole(spec, 'common')
    const reach = common!.setOutLengthMm - common!.headDeductionMm + common!.tailLengthMm
    const heelPiece = 140 * Math.tan((25 * Math.PI) / 180)
    expect(common!.cutLengthMm).toBeCloseTo(reach + heelPiece + 60, 6)
    expect(common!.weightKg).toBeCloseTo(common!.cutLengthMm * 45 * 140 * 550e-9, 6)
  })

  test('a backed hip is not dropped and carries both backing angles; a lowered one the larger drop', () => {
    const backed = frameRoof(makeRoof(plan, [22.5, 35, 22.5, 35], { hipTop: 'backed' }))
    const lowered = frameRoof(makeRoof(plan, [22.5, 35, 22.5, 35], { hipTop: 'lowered' }))
    const [hip] = ofRole(backed, 'hip')
    expect(hip!.dropMm).toBe(0)
    expect(hip!.backing!.leftDeg).not.toBeCloseTo(hip!.backing!.rightDeg, 1)
    const [other] = ofRole(lowered, 'hip')
    expect(other!.backing).toBeNull()
    const tan = (deg: number) => Math.tan((deg * Math.PI) / 180)
    // across the hip the steeper slope falls by tan 35 × the sine between hip and its plate's square
    const steep = tan(35) * Math.cos(Math.atan2(tan(22.5), tan(35)))
    expect(other!.dropMm).toBeCloseTo(17.5 * steep, 3)
  })
})

describe('cautions', () => {
  const codes = (roof: Roof, settings = defaultSettings) =>
    frameRoof(roof, settings).cautions.map((c) => c.code)
  const plain = (changes: Parameters<typeof makeRoof>[2] = {}) =>
    makeRoof(plan, [25, 25, 25, 25], changes)

  test('an ordinary hip roof and an ordinary splayed pitch raise none', () => {
    expect(codes(plain())).toEqual([])
    expect(codes(plain({ hipTop: 'lowered', tail: 'square' }))).toEqual([])
  })

  // Common practice, no source: the short cut is known for octagonal ends and splays at 45° only.
  test('the short cut for a diagonal crown end is spoken of at octagonal ends and nowhere else', () => {
    const irregular = [
      [0, 0],
      [9000, 0],
      [9000, 7000],
      [0, 6000],
    ] as const
    const pentagon = regularOutline(5, 5000)
    const octagon = regularOutline(8, 5000)
    const pitched = (outline: readonly (readonly [number, number])[]) =>
      codes(
        makeRoof(
          outline,
          outline.map(() => 25),
        ),
      )
    expect(pitched(irregular)).not.toContain('crown-bevel-shortcut')
    expect(pitched(pentagon)).not.toContain('crown-bevel-shortcut')
    expect(pitched(octagon)).toContain('crown-bevel-shortcut')
  })

  test('unequal pitches with one overhang say how to level the eaves', () => {
    const { cautions } = frameRoof(makeRoof(plan, [25, 30, 25, 30]))
    const uneven = cautions.filter((c) => c.code === 'eaves-not-level')
    expect(uneven).toHaveLength(4)
    // 450 × tan 25 / tan 30 = 363
    expect(uneven[0]!.remedy).toContain('363 mm on edge 4')
    expect(uneven[0]!.remedy).toMatch(/it does not size it\.$/)
  })

  test('a low height over plate is a deep birdsmouth', () => {
    expect(codes(plain({ standMm: 90 }))).toContain('birdsmouth-deep')
  })

  test('a shallow ridge, a long ridge, a flat pitch and a long overhang are each named', () => {
    const shallow = plain()
    shallow.sections.ridge.depthMm = 140
    expect(codes(shallow)).toEqual(['section-shallow'])
    expect(codes(plain(), { ...defaultSettings, longestStockMm: 3000 })).toEqual([
      'longer-than-stock',
    ])
    const covering = { name: 'Concrete tiles', minPitchDeg: 26 }
    expect(codes(plain(), { ...defaultSettings, covering })).toContain('pitch-below-covering')
    expect(codes(plain({ overhangMm: 1200 }))).toContain('overhang-long')
  })

  test('a blade past the saw is named with the way round it', () => {
    const { cautions } = frameRoof(plain(), { ...defaultSettings, sawMaxTiltDeg: 44 })
    const past = cautions.find((c) => c.code === 'past-saw')
    expect(past?.remedy).toContain("within the saw's manual")
  })
})
