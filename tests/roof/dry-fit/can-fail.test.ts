import { afterAll, beforeAll, describe, expect, test } from 'vitest'

import { frameRoof } from '../../../shared/roof/frame-roof.ts'
import { defaultSettings } from '../../../shared/roof/roof-settings.ts'
import type { Cut, Member, MemberRole, Roof } from '../../../shared/roof/roof-types.ts'
import type { makeRoof } from '../support/roofs.ts'
import { hollowReferences, referenceRoof } from '../support/roofs.ts'
import { Facets } from './facets.ts'
import { fieldRules, numberPaths, type BentBy, type FieldRule } from './numeric-fields.ts'
import { rebuildMember } from './rebuild-member.ts'
import { collector, reportLines, type Complaint } from './report.ts'
import { standUp, takeDown, type Site } from './site.ts'
import { loadSolidKit, type SolidKit } from './solid-kit.ts'
import { checkOverlaps, checkPiece, dryFit } from './stand-up.ts'
import { sinDeg } from './vec.ts'

/**
 * A dry fit that never complains proves nothing. Each number that a member publishes is bent, one at a
 * time, on every role that has it and at every end, and the check named for it must name the member.
 */
const BEND_MM = 1
const BEND_DEG = 0.5
const BEND_SHARE = 0.001

const beside = {
  underpurlin: { thicknessMm: 45, depthMm: 90 },
  collarTie: { thicknessMm: 35, depthMm: 90 },
  fascia: { thicknessMm: 20, depthMm: 180 },
  barge: { thicknessMm: 20, depthMm: 180 },
}
const shortSpans = { ...defaultSettings, maxRafterSpanMm: 2000 }

function reference(id: string, changes: Parameters<typeof makeRoof>[2]): Roof {
  const found = hollowReferences.find((roof) => roof.id === id)
  if (found === undefined) throw new Error(`tests/fixtures/roofs.json has no ${id}`)
  const roof = referenceRoof(found, { maxSpacingMm: 900, ...changes })
  return { ...roof, sections: { ...roof.sections, ...beside } }
}

/** Every role between them, planed and square tops, plumb and square tails. */
const roofs: Roof[] = [
  reference('T-narrow-wing', { hipTop: 'backed', valleyTop: 'dished', tail: 'plumb' }),
  reference('L-narrow-wing', {
    hipTop: 'lowered',
    valleyTop: 'square',
    tail: 'square',
    maxSpacingMm: 600,
  }),
]

const allRoles: MemberRole[] = [
  'barge',
  'broken-hip',
  'collar-tie',
  'common',
  'creeper',
  'cripple-creeper',
  'crown-end',
  'fascia',
  'hip',
  'ridge',
  'underpurlin',
  'valley',
  'valley-creeper',
]

let kit: SolidKit
let sites: Site[]
beforeAll(async () => {
  kit = await loadSolidKit()
  sites = roofs.map((roof) => standUp(kit, roof, frameRoof(roof, shortSpans)))
})
afterAll(() => sites.forEach(takeDown))

/** What is said of one member when it is other than the spec's, everything else as it was. */
function saidOf(site: Site, index: number, member: Member): Complaint[] {
  const { complain, complaints } = collector()
  const piece = rebuildMember(kit, member, site.surface.slopes)
  const members = site.spec.members.with(index, member)
  const pieces = site.pieces.with(index, piece)
  const bent = { ...site, spec: { ...site.spec, members }, pieces }
  checkPiece(complain, bent, new Facets(), piece)
  checkOverlaps(complain, bent, piece, [])
  piece.solid.delete()
  return complaints.filter((c) => c.marks.includes(member.mark))
}

const bentNumber = (value: number, by: BentBy): number => {
  if (by === 'mm') return value + BEND_MM
  if (by === 'deg') return value + BEND_DEG
  if (by === 'turn') return value + sinDeg(BEND_DEG)
  return value * (1 + BEND_SHARE)
}

type Holder = Record<string, unknown>

/** Bends the number at a path; false where this member has none there. */
function bend(holder: Holder, path: string, by: BentBy): boolean {
  const keys = path.split('.')
  const last = keys.pop()!
  const inner = keys.reduce<Holder | null>(
    (at, key) => (at?.[key] ?? null) as Holder | null,
    holder,
  )
  const value = inner?.[last]
  if (inner === null || typeof value !== 'number') return false
  inner[last] = bentNumber(value, by)
  return true
}

type Bent = { site: Site; index: number; member: Member; what: string }

/** One member of each role that has the number, bent there: each end's first cut for a cut's number. */
function bentMembers(site: Site, { path, by }: FieldRule): Bent[] {
  const found = new Map<string, Bent>()
  site.spec.members.forEach((sound, index) => {
    const add = (what: string, change: (member: Member) => boolean): void => {
      if (found.has(what)) return
      const member = structuredClone(sound)
      if (change(member)) found.set(what, { site, index, member, what })
    }
    const { role } = sound
    if (by === 'slope') {
      const other = site.spec.planes.findIndex((_, plane) => !sound.planes.includes(plane))
      add(role, (member) => (member.planes[0] = other) >= 0)
    } else if (!path.startsWith('cuts.')) {
      add(role, (member) => bend(member as unknown as Holder, path, by))
    } else {
      sound.cuts.forEach(({ end, longSide }, cut) => {
        const square = longSide === 'none' ? 'square ' : ''
        add(`${role}, ${square}${end}`, (member) =>
          bend(member.cuts[cut] as unknown as Holder, path.slice('cuts.'.length), by),
        )
      })
    }
  })
  return [...found.values()]
}

describe('every number of a member is caught when it is bent', () => {
  test('a sound frame with every role of timber is complained of in nothing', () => {
    const roles = new Set(sites.flatMap((site) => site.spec.members.map((m) => m.role)))
    expect([...roles].sort()).toEqual(allRoles)
    for (const site of sites) {
      expect(reportLines(dryFit(kit, site.roof, site.spec))).toEqual([])
    }
  })

  test('the list of numbers is the one that real members have', () => {
    const members = sites.flatMap((site) => site.spec.members)
    const found = new Set(members.flatMap((member) => numberPaths(member)))
    expect(fieldRules.map((rule) => rule.path).sort()).toEqual([...found].sort())
  })

  test.each(fieldRules)('$path: $caught', (rule) => {
    const bent = sites.flatMap((site) => bentMembers(site, rule))
    expect(bent.length).toBeGreaterThan(0)
    const unseen = bent.filter(({ site, index, member }) => {
      const said = saidOf(site, index, member)
      return !said.some((c) => rule.check.includes(c.check) && rule.says.test(c.text))
    })
    expect(unseen.map(({ member, what }) => `${member.mark}: ${what}`)).toEqual([])
  })
})

const swapped = (side: Cut['longSide']): Cut['longSide'] => (side === 'left' ? 'right' : 'left')
const headOf = (member: Member): Cut => member.cuts.find((cut) => cut.end === 'head')!

/** What is no number, on a role where it matters. */
const otherBends: [field: string, role: MemberRole, bend: (member: Member) => void][] = [
  ['role', 'creeper', (m) => (m.role = 'hip')],
  ['hand', 'valley-creeper', (m) => (m.hand = m.hand === 'left' ? 'right' : 'left')],
  ['long side', 'creeper', (m) => (headOf(m).longSide = swapped(headOf(m).longSide))],
  ['past the saw', 'hip', (m) => (headOf(m).pastSaw = !headOf(m).pastSaw)],
  ['what its head bears on', 'common', (m) => (headOf(m).against = m.mark)],
  ['head bearing on nothing', 'creeper', (m) => (headOf(m).against = null)],
  ['what its foot bears on', 'valley-creeper', (m) => (m.cuts.at(-1)!.against = null)],
  ['also bearing on', 'crown-end', (m) => headOf(m).alsoAgainst.push('H1')],
  ['top in slope', 'underpurlin', (m) => (m.topInSlope = false)],
  ['a cut left out', 'valley', (m) => m.cuts.pop()],
  ['a birdsmouth left out', 'common', (m) => (m.birdsmouth = null)],
  ['a dished top left square', 'valley', (m) => (m.backing = null)],
]

describe('what is no number is caught too', () => {
  test.each(otherBends)('%s of a %s', (_field, role, change) => {
    const site = sites[0]!
    const index = site.spec.members.findIndex((m) => m.role === role)
    const member = structuredClone(site.spec.members[index]!)
    change(member)
    expect(saidOf(site, index, member)).not.toEqual([])
  })
})
