import { emptyCorner, formOfShape, type RoofForm } from '../../shared/revisions/roof-form.ts'
import type { Roof } from '../../shared/roof/roof-types.ts'
import { combHouse } from './bench-roofs.ts'
import type { Engine } from './built-engine.ts'
import { quantile, takenMs } from './timing.ts'

const keystrokes = 500
const frameMs = 16

function formOf(roof: Roof, pitchDeg: string): RoofForm {
  const corners = roof.outline.map(({ x, y }) => ({ ...emptyCorner, x: String(x), y: String(y) }))
  return { ...formOfShape('corners'), corners, pitchDeg, overhangMm: '450' }
}

/**
 * What the editor works out before it can paint after a key: what is typed, read. The frame is worked
 * out beside the screen. Painting itself is the browser's and is not in here.
 */
export function benchKeystroke({ typedRoof }: Engine): void {
  console.log('\nA key typed in the editor: processor ms to read the form')
  for (const corners of [8, 64] as const) {
    const roof = combHouse(corners, false)
    const times = Array.from({ length: keystrokes }, (_, i) => {
      const form = formOf(roof, String(20 + (i % 20)))
      const began = takenMs()
      typedRoof(form, { brickOffsetMm: 110 })
      return takenMs() - began
    })
    const sorted = times.slice(100).sort((a, b) => a - b)
    const [median, most] = [quantile(sorted, 0.5), quantile(sorted, 1)]
    console.log(
      `  ${String(corners).padStart(2)} corners: median ${median.toFixed(2)}, most ${most.toFixed(2)}; ` +
        `aim, never over ${frameMs} ms: ${most <= frameMs ? 'met' : 'NOT met'}`,
    )
  }
}
