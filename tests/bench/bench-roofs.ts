import { readFileSync } from 'node:fs'
import path from 'node:path'
import type { Roof, RoofEdge } from '../../shared/roof/roof-types.ts'
import { roofProblems } from '../../shared/roof/roof-problems.ts'

type Fixture = {
  roofs: {
    id: string
    outline_mm: [number, number][]
    edges: ('gable' | { pitch_deg: number })[]
  }[]
}

const section = (thicknessMm: number, depthMm: number) => ({ thicknessMm, depthMm })

/** The reference roofs that frame, in everyday sections; the first one is what the others are held against. */
export function benchRoofs(): { name: string; roof: Roof }[] {
  const file = path.join(import.meta.dirname, '../fixtures/roofs.json')
  const { roofs } = JSON.parse(readFileSync(file, 'utf8')) as Fixture
  return roofs
    .map(({ id, outline_mm, edges }) => ({
      name: id,
      roof: {
        outline: outline_mm.map(([x, y]) => ({ x, y })),
        edges: edges.map((edge): RoofEdge =>
          edge === 'gable'
            ? { finish: 'gable', overhangMm: 300 }
            : { finish: 'eave', pitchDeg: edge.pitch_deg, overhangMm: 450 },
        ),
        plateWidthMm: 90,
        maxSpacingMm: 600,
        spacing: 'even',
        sections: {
          rafter: section(45, 140),
          hip: section(35, 190),
          valley: section(35, 190),
          ridge: section(35, 190),
        },
        tail: 'plumb',
        tailAllowanceMm: 0,
        hipTop: 'lowered',
        valleyTop: 'square',
      } satisfies Roof,
    }))
    .filter(({ roof }) => roofProblems(roof).length === 0)
}
