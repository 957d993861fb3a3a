export function quantile(sorted: readonly number[], q: number): number {
  return sorted[Math.min(sorted.length - 1, Math.floor(q * sorted.length))] ?? Number.NaN
}

export const median = (times: readonly number[]): number =>
  quantile(
    [...times].sort((a, b) => a - b),
    0.5,
  )

type Limits = { warmUps: number; mostRuns: number; leastRuns: number; budgetMs: number }
const everyday: Limits = { warmUps: 8, mostRuns: 60, leastRuns: 7, budgetMs: 3000 }

/** Processor time that this process has taken: other programs on the machine do not count. */
export function takenMs(): number {
  const { user, system } = process.cpuUsage()
  return (user + system) / 1000
}

/**
 * Medians of the processor milliseconds of several pieces of work, each run in turn, so that what slows
 * the machine down for a while weighs on all of them alike.
 */
export function mediansMs<Name extends string>(
  work: Record<Name, () => unknown>,
  limits: Partial<Limits> = {},
): Record<Name, number> {
  const { warmUps, mostRuns, leastRuns, budgetMs } = { ...everyday, ...limits }
  const names = Object.keys(work) as Name[]
  const times = new Map<Name, number[]>(names.map((name) => [name, []]))
  const began = performance.now()
  for (let i = 0; i < warmUps; i++) for (const name of names) work[name]()
  for (let i = 0; i < mostRuns; i++) {
    if (i >= leastRuns && performance.now() - began > budgetMs) break
    for (const name of names) {
      const started = takenMs()
      work[name]()
      times.get(name)?.push(takenMs() - started)
    }
  }
  return Object.fromEntries(names.map((name) => [name, median(times.get(name) ?? [])])) as Record<
    Name,
    number
  >
}

/** The exponent p of the time ≈ c · nᵖ that lies closest to the points, by least squares of logarithms. */
export function growthExponent(points: readonly { n: number; ms: number }[]): number {
  const logs = points.map(({ n, ms }) => ({ x: Math.log(n), y: Math.log(ms) }))
  const mean = (values: number[]) => values.reduce((sum, v) => sum + v, 0) / values.length
  const [mx, my] = [mean(logs.map(({ x }) => x)), mean(logs.map(({ y }) => y))]
  const across = logs.reduce((sum, { x, y }) => sum + (x - mx) * (y - my), 0)
  const spread = logs.reduce((sum, { x }) => sum + (x - mx) ** 2, 0)
  return across / spread
}
