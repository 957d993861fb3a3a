import type { Roof } from '../../shared/roof/roof-types.ts'
import reference from '../fixtures/roofs.json' with { type: 'json' }
import { makeRoof, referenceRoof } from '../roof/support/roofs.ts'

export type BenchRoof = { name: string; roof: Roof }

/** tests/fixtures/roofs.json in everyday sections. */
export const referenceRoofs = (): BenchRoof[] =>
  reference.roofs.map((roof) => ({ name: roof.id, roof: referenceRoof(roof, everyday) }))

const everyday = { hipTop: 'lowered' } as const

/** Between wings; 64 corners stay within the 100 m that a plan may be long. */
const gapMm = 2400

/**
 * A house like a comb: a long main building with wings along one side, each with four corners of its
 * own, so 4 + 4 × wings corners. `alike`: all wings equal, so that much happens at one height.
 */
export function combHouse(corners: 8 | 16 | 32 | 64, alike: boolean): Roof {
  const wings = (corners - 4) / 4
  const steps = Array.from({ length: wings }, (_, i) => {
    // Any fixed widths and lengths that do not repeat soon; in mm, as a plan has them.
    const widthMm = alike ? 3400 : 3000 + ((i * 37) % 23) * 35
    const lengthMm = alike ? 4800 : 4000 + ((i * 53) % 29) * 70
    return { widthMm, lengthMm }
  })
  const outline: [number, number][] = []
  let x = gapMm
  for (const { widthMm, lengthMm } of steps) {
    outline.push([x, 0], [x, -lengthMm], [x + widthMm, -lengthMm], [x + widthMm, 0])
    x += widthMm + gapMm
  }
  outline.push([x, 0], [x, 7600], [0, 7600], [0, 0])
  return makeRoof(outline, Array<number>(outline.length).fill(25), everyday)
}
