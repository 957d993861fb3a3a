import type { Point2, Roof } from '../../shared/roof/roof-types.ts'
import { combHouse, referenceRoofs } from './bench-roofs.ts'
import type { Engine } from './built-engine.ts'
import { growthExponent, median, mediansMs } from './timing.ts'

/** What is measured against what. */
type Rivals = { engine: Engine; library: (outline: readonly Point2[]) => () => unknown }
type Medians = { lines: number; whole: number; library: number }

const ms = (value: number) => value.toFixed(2).padStart(9)
const ratio = (value: number) => `× ${value.toFixed(2)}`.padStart(9)
const verdict = (isMet: boolean) => (isMet ? 'met' : 'NOT met')

/** Why a roof is not framed; null when it is. */
function whyNot({ roofProblems, frameRoof }: Engine, roof: Roof): string | null {
  try {
    const [problem] = roofProblems(roof)
    if (problem) return problem.message
    frameRoof(roof)
    return null
  } catch (error) {
    return error instanceof Error ? error.message : String(error)
  }
}

const measure = ({ engine, library }: Rivals, roof: Roof): Medians =>
  mediansMs({
    lines: () => engine.roofLines(engine.plateLines(roof)),
    whole: () => engine.frameRoof(roof),
    library: library(roof.outline),
  })

/** All of them first: the first one measured must not pay for the compiling. */
function warmUp({ engine, library }: Rivals, roofs: readonly Roof[]): void {
  for (let i = 0; i < 12; i++) {
    for (const roof of roofs) {
      engine.frameRoof(roof)
      library(roof.outline)()
    }
  }
}

const headings = `${'lines'.padStart(9)} ${'whole'.padStart(9)} ${'library'.padStart(9)}   whole / library`

/** The whole frame of each reference roof against the library's skeleton alone, on the same outline. */
export function benchReferences(rivals: Rivals): void {
  const { engine } = rivals
  console.log('\nReference roofs: median processor ms of our lines alone, the whole frame, and the')
  console.log('straight-skeleton package’s lines alone on the same outline (one pitch, no gables)')
  console.log(`  ${''.padEnd(30)} members ${headings}`)
  const roofs = referenceRoofs()
  const framed = roofs.filter(({ roof }) => whyNot(engine, roof) === null)
  warmUp(
    rivals,
    framed.map(({ roof }) => roof),
  )
  const ratios = roofs.flatMap(({ name, roof }) => {
    const reason = whyNot(engine, roof)
    if (reason !== null) {
      console.log(`  ${name.padEnd(30)} NOT FRAMED: ${reason}`)
      return []
    }
    const members = String(engine.frameRoof(roof).members.length).padStart(7)
    const { lines, whole, library: theirs } = measure(rivals, roof)
    console.log(
      `  ${name.padEnd(30)} ${members} ${ms(lines)} ${ms(whole)} ${ms(theirs)} ${ratio(whole / theirs)}`,
    )
    return [whole / theirs]
  })
  const within = ratios.filter((one) => one <= 1).length
  const isMet = roofs.length === ratios.length && within === ratios.length
  console.log(
    `  aim, the whole frame in no more time than the library’s lines: ${verdict(isMet)}; ` +
      `${within} of ${roofs.length} roofs, median ratio${ratio(median(ratios))}`,
  )
}

/** Growth with the number of corners, as the exponent of the closest power. */
export function benchGrowth(rivals: Rivals): void {
  const { engine } = rivals
  for (const alike of [false, true]) {
    console.log(
      `\nComb houses, wings ${alike ? 'all alike' : 'of different sizes'}: median processor ms`,
    )
    console.log(`  corners members ${headings}`)
    const points: (Medians & { n: number })[] = []
    for (const n of [8, 16, 32, 64] as const) {
      const roof = combHouse(n, alike)
      const reason = whyNot(engine, roof)
      if (reason !== null) {
        console.log(`  ${String(n).padStart(7)} NOT FRAMED: ${reason}`)
        continue
      }
      const members = String(engine.frameRoof(roof).members.length).padStart(7)
      const found = measure(rivals, roof)
      points.push({ n, ...found })
      const { lines, whole, library: theirs } = found
      console.log(
        `  ${String(n).padStart(7)} ${members} ${ms(lines)} ${ms(whole)} ${ms(theirs)} ${ratio(whole / theirs)}`,
      )
    }
    if (points.length < 4) continue
    const exponent = (key: keyof Medians) =>
      growthExponent(points.map((point) => ({ n: point.n, ms: point[key] })))
    const [lines, whole] = [exponent('lines'), exponent('whole')]
    console.log(
      `  growth from 8 to 64 corners, nᵖ: lines p = ${lines.toFixed(2)}, whole frame p = ${whole.toFixed(2)}, library p = ${exponent('library').toFixed(2)}`,
    )
    console.log(
      `  aim, p under 1.5: lines ${verdict(lines < 1.5)}, whole frame ${verdict(whole < 1.5)}`,
    )
  }
}
