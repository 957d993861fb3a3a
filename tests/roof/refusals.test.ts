import { describe, expect, test } from 'vitest'

import { buildPieces } from '../../shared/roof/build-pieces.ts'
import { frameRoof } from '../../shared/roof/frame-roof.ts'
import { cutJoints } from '../../shared/roof/joint-order.ts'
import { draftMember } from '../../shared/roof/members.ts'
import type { Piece } from '../../shared/roof/piece.ts'
import { RoofRefusedError, roofProblems, setOutRoof } from '../../shared/roof/roof-problems.ts'
import { defaultSettings } from '../../shared/roof/roof-settings.ts'
import type { Roof } from '../../shared/roof/roof-types.ts'
import { unmadeProblems } from '../../shared/roof/unmade.ts'
import { rectangle } from './support/plans.ts'
import { makeRoof } from './support/roofs.ts'

const plan = rectangle(9000, 6000)
const good = (): Roof => makeRoof(plan, [25, 25, 25, 25])
const changed = (change: (roof: Roof) => void): Roof => {
  const roof = structuredClone(good())
  change(roof)
  return roof
}

/** Source of every limit: the project's written agreement on what is refused. */
const refusals: [string, Roof, string, RegExp][] = [
  ['two corners', makeRoof(plan.slice(0, 2), [25, 25]), 'outline', /at least 3 corners/],
  [
    'edges that cross',
    makeRoof([plan[0]!, plan[2]!, plan[1]!, plan[3]!], [25, 25, 25, 25]),
    'outline.2',
    /Edges 1 and 3 cross or touch/,
  ],
  [
    'an edge under 300 mm',
    makeRoof(
      [
        [0, 0],
        [9000, 0],
        [9000, 250],
        [0, 6000],
      ],
      [25, 25, 25, 25],
    ),
    'outline.2',
    /Edge 2 is 250 mm long, under 300/,
  ],
  [
    'corners that run clockwise',
    makeRoof([...plan].reverse(), [25, 25, 25, 25]),
    'outline',
    /clockwise/,
  ],
  [
    'a gable at a corner that turns inwards',
    makeRoof(
      [
        [0, 0],
        [9000, 0],
        [9000, 6000],
        [5000, 6000],
        [5000, 9000],
        [0, 9000],
      ],
      [25, 25, 'gable', 25, 25, 25],
    ),
    'edges.2.finish',
    /Edge 3 is a gable.*turns inwards at its corner 4/,
  ],
  [
    'an outline over 100 m',
    makeRoof(
      [
        [0, 0],
        [101_000, 0],
        [101_000, 6000],
        [0, 6000],
      ],
      [25, 25, 25, 25],
    ),
    'outline',
    /over 100 m/,
  ],
  ['a pitch of 4°', makeRoof(plan, [25, 4, 25, 25]), 'edges.1.pitchDeg', /Edge 2.*5 to 60/],
  ['a pitch of 61°', makeRoof(plan, [61, 25, 25, 25]), 'edges.0.pitchDeg', /Edge 1.*5 to 60/],
  [
    'gables all round',
    makeRoof(plan, ['gable', 'gable', 'gable', 'gable']),
    'edges.0.finish',
    /Every edge is a gable/,
  ],
  [
    'a gable beside a gable',
    makeRoof(plan, [25, 'gable', 'gable', 25]),
    'edges.1.finish',
    /Edge 2 is a gable that no slope meets at both ends/,
  ],
  [
    'a gable out of square',
    makeRoof(
      [
        [0, 0],
        [9000, 0],
        [8500, 6000],
        [0, 6000],
      ],
      [25, 'gable', 25, 25],
    ),
    'edges.1.finish',
    /Edge 2 is a gable, but not square to the slope of edge 1/,
  ],
  [
    'a gable that the far end climbs to',
    makeRoof(
      [
        [0, 0],
        [2900, 0],
        [2900, 6000],
        [0, 6000],
      ],
      [25, 'gable', 25, 25],
    ),
    'edges.1.finish',
    /Edge 2 is a gable.*leaves no ridge/,
  ],
  [
    'two pitches in one line',
    makeRoof(
      [
        [0, 0],
        [4000, 0],
        [9000, 0],
        [9000, 6000],
        [0, 6000],
      ],
      [25, 30, 25, 25, 25],
    ),
    'edges.1.pitchDeg',
    /Edges 1 and 2 run in one line/,
  ],
  [
    'two walls that nearly touch',
    makeRoof(
      [
        [0, 0],
        [9000, 0],
        [9000, 6000],
        [4504, 6000],
        [4504, 2000],
        [4500, 6000],
        [0, 6000],
      ],
      [25, 25, 25, 25, 25, 25, 25],
    ),
    'outline.4',
    /Edges 3 and 5 are 4 mm apart/,
  ],
  [
    'a plan that doubles back on itself',
    makeRoof(
      [
        [0, 0],
        [9000, 0],
        [9000, 6000],
        [12000, 6000],
        [9000, 6090],
        [0, 6090],
      ],
      [25, 25, 25, 25, 25, 25],
    ),
    'outline.3',
    /Edges 3 and 4 touch.*doubles back on itself at corner 4/,
  ],
  [
    'a courtyard reached by a slit',
    makeRoof(
      [
        [0, 0],
        [12000, 0],
        [12000, 12000],
        [0, 12000],
        [0, 6000],
        [4000, 6000],
        [4000, 8000],
        [8000, 8000],
        [8000, 4000],
        [4000, 4000],
        [4000, 5998],
        [0, 5998],
      ],
      Array.from({ length: 12 }, () => 25),
    ),
    'outline.10',
    /Edges 4 and 11 are 2 mm apart.*courtyard/,
  ],
  [
    'a courtyard given as a hole',
    { ...good(), holes: [[{ x: 1, y: 1 }]] } as Roof,
    'holes',
    /courtyard.*not framed/,
  ],
  [
    'one eave over a plan that is no rectangle',
    makeRoof(
      [
        [0, 0],
        [9000, 0],
        [8000, 6000],
        [0, 6000],
      ],
      [25, 'gable', 'gable', 'gable'],
    ),
    'edges.0.finish',
    /Edge 1 is the only eave.*rectangle/,
  ],
  [
    'two eaves of different pitches whose slopes come level',
    makeRoof(
      [
        [0, 0],
        [12000, 0],
        [12000, 8000],
        [6000, 8000],
        [6000, 7000],
        [0, 7000],
      ],
      [25, 25, 25, 25, 35, 25],
    ),
    'edges.4.pitchDeg',
    /Edges 3 and 5 face one way with different pitches.*level break.*one pitch/,
  ],
  ['spacing 190', changed((r) => (r.maxSpacingMm = 190)), 'maxSpacingMm', /200 to 1200/],
  ['spacing 1201', changed((r) => (r.maxSpacingMm = 1201)), 'maxSpacingMm', /200 to 1200/],
  [
    'a hip 14 thick',
    changed((r) => (r.sections.hip.thicknessMm = 14)),
    'sections.hip.thicknessMm',
    /hip a thickness from 15 to 400/,
  ],
  [
    'a rafter 401 deep',
    changed((r) => (r.sections.rafter.depthMm = 401)),
    'sections.rafter.depthMm',
    /rafter a depth from 15 to 400/,
  ],
  ['a plate without width', changed((r) => (r.plateWidthMm = 0)), 'plateWidthMm', /plate/],
  [
    'a slope left with too little seat at the common height over plate',
    makeRoof(plan, [60, 5, 60, 5]),
    'edges.1.pitchDeg',
    /Edge 2.*under 38 mm/,
  ],
  [
    'a height over plate that leaves no seat',
    changed((r) => (r.standMm = 150)),
    'standMm',
    /lower the height over plate/,
  ],
]

describe('a roof is refused, with its field and what to change:', () => {
  test.each(refusals)('%s', (_name, roof, path, message) => {
    const found = roofProblems(roof).filter((problem) => problem.path === path)
    expect(found.map((problem) => problem.message).join()).toMatch(message)
    try {
      frameRoof(roof)
      expect.unreachable()
    } catch (error) {
      expect(error).toBeInstanceOf(RoofRefusedError)
      if (error instanceof RoofRefusedError) expect(error.problems).toEqual(roofProblems(roof))
    }
  })
})

test('a roof that can be framed has no problems', () => {
  expect(roofProblems(good())).toEqual([])
})

test('timbers that were never cut are refused, each by its place', () => {
  const roof = good()
  const setOut = setOutRoof(roof, defaultSettings)
  if (setOut.problems !== null) throw new Error('the plan is refused')
  const ground = { ...setOut, roof, settings: defaultSettings }
  const pieces = buildPieces(ground)
  const draft = (piece: Piece) => draftMember(ground, piece, 110, () => [])
  const found = unmadeProblems(ground, pieces.map(draft))
  expect(found).toHaveLength(pieces.length)
  expect(found.map(({ message }) => message).join(' ')).toMatch(
    /Edge 1: the common that starts 3000 mm along it meets nothing/,
  )
  cutJoints(ground, pieces)
  expect(unmadeProblems(ground, pieces.map(draft))).toEqual([])
})

describe('rubbish is refused and never thrown at', () => {
  const paths: (string | number)[][] = [
    ['outline'],
    ['outline', 1],
    ['outline', 1, 'x'],
    ['edges'],
    ['edges', 2],
    ['edges', 2, 'finish'],
    ['edges', 2, 'pitchDeg'],
    ['edges', 2, 'overhangMm'],
    ['plateWidthMm'],
    ['maxSpacingMm'],
    ['spacing'],
    ['sections'],
    ['sections', 'rafter'],
    ['sections', 'ridge', 'depthMm'],
    ['tail'],
    ['tailAllowanceMm'],
    ['hipTop'],
    ['valleyTop'],
  ]
  const rubbish = [NaN, Infinity, -Infinity, null, undefined, 'seven', {}, [], -1, 1e300]
  test.each(paths.map((path) => [path.join('.'), path] as const))('in %s', (_name, path) => {
    for (const bad of rubbish) {
      const roof: unknown = structuredClone(good())
      let holder = roof as Record<string | number, unknown>
      for (const step of path.slice(0, -1)) holder = holder[step] as typeof holder
      holder[path.at(-1)!] = bad
      expect(roofProblems(roof as Roof).length, String(bad)).toBeGreaterThan(0)
    }
  })

  test('in place of the whole roof or its settings', () => {
    for (const bad of [null, undefined, 7, 'roof', [], {}]) {
      expect(roofProblems(bad as unknown as Roof).length).toBeGreaterThan(0)
      if (bad !== undefined) expect(roofProblems(good(), bad as never).length).toBeGreaterThan(0)
    }
  })
})
