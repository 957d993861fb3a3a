import { readFileSync } from 'node:fs'
import { describe, expect, test } from 'vitest'

import corners from '../../fixtures/corners.json' with { type: 'json' }
import handbook from '../../fixtures/handbook.json' with { type: 'json' }
import reference from '../../fixtures/roofs.json' with { type: 'json' }
import table from '../../fixtures/steel-square.json' with { type: 'json' }

/**
 * Which test holds which figure of the fixtures, so that none is left lying. A figure is held where the
 * named file reads it; what no test can hold has its reason here.
 */
const here = new URL('.', import.meta.url)
const textOf = (file: string): string => readFileSync(new URL(file, here), 'utf8')

/** Paths of all that is given in a list of cases, lists counted as one place. */
function pathsOf(value: unknown, path = ''): string[] {
  if (Array.isArray(value)) return value.flatMap((item) => pathsOf(item, path))
  if (typeof value !== 'object' || value === null) return [path]
  return Object.entries(value).flatMap(([key, inner]) =>
    pathsOf(inner, path === '' ? key : `${path}.${key}`),
  )
}
const unique = (list: string[]): string[] => [...new Set(list)].sort()

/** A path of the fixture, and how the file that holds it writes it. */
type Held = Record<string, string>

const bevel = (path: string, written: string): Held =>
  Object.fromEntries(
    ['face_from_edge', 'edge_from_edge', 'tilt'].map((part) => [`${path}.${part}`, written]),
  )

const cornerFields: Held = {
  'in.interior_deg': 'given.interior_deg',
  'in.pitch1_deg': 'pitch1_deg',
  'in.pitch2_deg': 'pitch2_deg',
  'in.spacing_mm': 'given.spacing_mm',
  'in.hip_or_valley_thickness_mm': 'hip_or_valley_thickness_mm',
  'in.overhang1_mm': 'overhang1_mm',
  'out.hip_pitch_deg': 'out.hip_pitch_deg',
  'out.hip_length_per_m_of_run1': 'out.hip_length_per_m_of_run1',
  'out.hip_overhang_length_mm_if_equal_overhang': 'out.hip_overhang_length_mm_if_equal_overhang',
  'out.dihedral_deg': 'out.dihedral_deg',
  ...Object.fromEntries(
    [1, 2].flatMap((side) => [
      [`out.hip_plan_from_plate${side}_deg`, `out.hip_plan_from_plate${side}_deg`],
      [`out.hip_to_rafter${side}_in_roof_plane_deg`, '_in_roof_plane_deg'],
      [`out.creeper${side}_difference_mm`, 'out[`creeper${side}_difference_mm`]'],
      [
        `out.creeper${side}_deduction_mm_along_length`,
        'out[`creeper${side}_deduction_mm_along_length`]',
      ],
      [`out.backing${side}_deg`, 'backing'],
      ...Object.entries(bevel(`out.hip_to_rafter${side}`, 'out[`hip_to_rafter${side}`]')),
      ...Object.entries(bevel(`out.creeper${side}_to_hip`, 'out[`creeper${side}_to_hip`]')),
    ]),
  ),
}
/** Given for hips alone; a valley's follow from its backings (valley-corners.test.ts says how). */
const hipDrops: Held = { 'out.drop1_mm': 'out.drop1_mm', 'out.drop2_mm': 'out.drop2_mm' }

const roofFields: Held = {
  id: 'roof.id',
  title: '$title',
  outline_mm: 'referenceRoof(',
  edges: 'roof.edges',
  'edges.pitch_deg': 'referenceRoof(',
  'lines.kind': 'wanted.kind',
  'lines.frm': 'wanted.frm',
  'lines.to': 'wanted.to',
  'lines.edges': 'wanted.edges',
  'lines.plan_length_mm': 'wanted.plan_length_mm',
  'lines.true_length_mm': 'wanted.true_length_mm',
  'lines.pitch_deg': 'wanted.pitch_deg',
  nodes: 'roof.nodes',
  slope_area_m2: 'roof.slope_area_m2',
  plan_area_m2: 'roof.plan_area_m2',
}

const squareFields: Held = {
  rise_in_per_12: 'row.rise_in_per_12',
  common_per_ft: 'common_per_ft:',
  hip_per_ft: 'hip_per_ft:',
  jack_diff_16: 'jack_diff_16:',
  jack_diff_24: 'jack_diff_24:',
  side_cut_jack: 'side_cut_jack:',
  side_cut_hip: 'side_cut_hip:',
}

const isIn = (file: string, held: Held): string[] => {
  const text = textOf(file)
  return Object.entries(held).flatMap(([path, written]) => (text.includes(written) ? [] : [path]))
}

describe('every figure of a list is read by the test that holds it:', () => {
  const hipPaths = unique(
    corners.cases.filter((c) => c.in.interior_deg < 180).flatMap((c) => pathsOf(c)),
  )
  const valleyPaths = unique(
    corners.cases.filter((c) => c.in.interior_deg > 180).flatMap((c) => pathsOf(c)),
  )

  test('corners, hips', () => {
    expect(hipPaths).toEqual(unique(Object.keys({ ...cornerFields, ...hipDrops })))
    expect(isIn('corners.test.ts', { ...cornerFields, ...hipDrops })).toEqual([])
  })

  test('corners, valleys', () => {
    expect(valleyPaths).toEqual(unique(Object.keys(cornerFields)))
    const written = Object.fromEntries(
      Object.entries(cornerFields).map(([path, text]) => [
        path,
        // read for both sides at once
        path.includes('hip_plan_from_plate') ? 'hip_plan_from_plate' : text,
      ]),
    )
    expect(isIn('valley-corners.test.ts', written)).toEqual([])
  })

  test('reference roofs', () => {
    const nodeless = reference.roofs.map((roof) => ({ ...roof, nodes: 0 }))
    expect(unique(nodeless.flatMap((roof) => pathsOf(roof)))).toEqual(
      unique(Object.keys(roofFields)),
    )
    expect(isIn('roofs.test.ts', roofFields)).toEqual([])
  })

  test('the steel square’s table', () => {
    const rows = table.rows.map(({ provenance, ...row }) => {
      expect(Object.keys(provenance).length).toBe(Object.keys(row).length - 1)
      return row
    })
    expect(unique(rows.flatMap((row) => pathsOf(row)))).toEqual(unique(Object.keys(squareFields)))
    expect(isIn('steel-square.test.ts', squareFields)).toEqual([])
  })
})

/** Handbook figures that are held as text, or cannot be held, each with how or why. */
const handbookNotes: Record<string, string> = {
  'army-common-8in12-10ft.unit_in_text': 'held as 14 + 5/12',
  'army-common-8in12-10ft.with_tail': 'held as 156 in',
  'hodgson-hip-rise10.hip_rise_per_12_hip_run_text': 'held as 7 + 1/17',
  'hodgson-hip-rise10.jack_side_cut_pair': 'held as 12 : 15.625',
  'hodgson-hip-rise10.hip_side_cut_pair': 'held as 17 : 19.75',
  'hodgson-unequal-18x28-rise9.side_cut_1': 'held as the pair it names',
  'hodgson-unequal-18x28-rise9.side_cut_2': 'held as the pair it names',
  'hodgson-octagon-jack.side_cut_pair': 'held as 5 : 15',
  'griffith-hip-run-unequal-5-8.B_text': 'held as 38° 40′',
  'griffith-octagon.octagon_hip_run_per_12': 'held as 13',
  'griffith-octagon.tangent_on_12': 'held as 5',
  'griffith-octagon.backing': 'held as 5 in 12 of half the thickness',
  'griffith-octagon.backing_in_text': 'the same 5/12, again',
  'radford-hip-p3-6in12.jack_difference_16_or_printed': 'held as 18 in',
  'radford-p4-10in12.common_plumb': 'held as 12 and 10',
  'radford-p4-10in12.jack_side_cut_pair': 'held as 12 : 15 7/12',
  'radford-p4-10in12.octagon_jack_side_cut_pair': 'held as 5 : 15 7/12',
  'radford-p4-10in12.octagon_hip_plumb': 'held as 13 and 10',
  'radford-p4-10in12.hip_plumb': 'held as 17 and 10',
  'radford-p4-10in12.hip_side_cut_pair': 'held as 17 : 19 3/4',
  'radford-p4-10in12.cripple_reduction': 'held as 35 √2 at both ends together',
  'rrr-35deg.square_blade_tongue':
    'held pair by pair; the purlin’s in secondary/purlin-bevels.test.ts',
  'nav-valley-jacks-cripples.valley_jacks_9_10': 'held as one difference',
  'nav-valley-jacks-cripples.valley_jacks_11_12': 'held as the same difference once more',
  'nav-valley-jacks-cripples.valley_cripple_13': 'held as two differences',
  'nav-valley-jacks-cripples.valley_cripple_14': 'held as two differences more',
  'nav-valley-jacks-cripples.hip_jack_shortening': 'held as half of 35 √2',
  'nav-valley-jacks-cripples.valley_jack_shortening':
    'held at the valley; at the ridge a creeper stands square, so it loses half the plain thickness',
  'nav-valley-jacks-cripples.cripple': 'held at both ends',
  'nav-hip-shortening.against_commons': 'held as half of 45 √2',
  'nav-hip-shortening.against_ridge': 'held on a valley: hips bear on commons here',
  'nav-backing-drop.rule': 'held as 8 : 17 of half the thickness',
  'au-residential-18deg.underpurlin_at_m': 'held in secondary/underpurlins.test.ts',
  'refresher-ridge-36x24.double_cheek_add_each_end': 'held as half of 45 at each end',
  'refresher-ridge-36x24.single_cheek_add_each_end':
    'for hips against the ridge’s end; here the ridge runs through to the commons',
  'king-hip-ridge.ridge': 'for hips against the ridge’s end, as above',
  'griffith-hip-ridge.ridge': 'for hips against the ridge’s end, as above',
  'irc-notch-quarter.end_notch_quarter_text':
    'a building code’s limit for notches; the program sets birdsmouths by a third of the depth',
  'army-takeoff-28in.10ft': 'stock cutting, which the program does not do',
  'army-takeoff-28in.12ft': 'stock cutting, which the program does not do',
  'csp-wikipedia.optimum': 'stock cutting, which the program does not do',
  'csp-wikipedia.printed_lower_bound': 'stock cutting, which the program does not do',
  'csp-wikipedia.waste_pct': 'stock cutting, which the program does not do',
  'csp-gilmore-gomory-chvatal.lp': 'stock cutting, which the program does not do',
  'csp-gilmore-gomory-chvatal.optimum': 'stock cutting, which the program does not do',
  'binpack-u120_00.optimum': 'stock cutting, which the program does not do',
}

describe('handbooks', () => {
  const files = [
    'handbook-lengths.test.ts',
    'handbook-hips.test.ts',
    'handbook-valleys.test.ts',
    '../secondary/purlin-bevels.test.ts',
  ]
  /** The tests of those files, each as its text. */
  const bodies = files.flatMap((file) => textOf(file).split(/^\s*(?:test|describe)[.(]/m))
  const about = (id: string): string => bodies.filter((body) => body.includes(`'${id}'`)).join('\n')
  const held = (id: string, key: string): boolean => {
    const text = about(id)
    const written = [`'results.${key}'`, `'results.${key}.`, `\`results.${key}.`]
    // a length given in feet and inches as well is named so where it is held
    const asText = key === 'length_text' && /length as text|'results\.length_in'/.test(text)
    return asText || written.some((way) => text.includes(way))
  }

  test('every result of every example is held, or noted with how or why', () => {
    const loose = handbook.examples.flatMap(({ id, results }) =>
      Object.keys(results)
        .filter((key) => !held(id, key))
        .map((key) => `${id}.${key}`),
    )
    expect(loose.sort()).toEqual(Object.keys(handbookNotes).sort())
  })

  test('what is noted as held is in a test that names its example', () => {
    const named = Object.entries(handbookNotes)
      .filter(([, note]) => /^held (as|pair|at|on)|^the same/.test(note))
      .map(([path]) => path.split('.')[0]!)
    expect(unique(named).filter((id) => about(id) === '')).toEqual([])
  })
})
