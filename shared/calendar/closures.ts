import { type Day, dayPlus } from './days.ts'

/** Days a firm shuts: one, or all up to `lastDay`. */
export type Closure = { day: Day; lastDay?: Day | null | undefined; name: string }

/** No closure is longer than this. */
export const longestClosureDays = 120

/** Each day of some closures with its name, as a working calendar has them. */
export function closureDays(closures: readonly Closure[]): { day: Day; name: string }[] {
  return closures.flatMap(({ day, lastDay, name }) => {
    const days: { day: Day; name: string }[] = []
    const last = lastDay ?? day
    for (let at = day; at <= last && days.length < longestClosureDays; at = dayPlus(at, 1))
      days.push({ day: at, name })
    return days
  })
}
