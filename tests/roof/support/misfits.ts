export type Row = [name: string, found: number, expected: number, tolerance: number]

/** What is further off than its tolerance, in words; an empty list when all agree. */
export function misfits(rows: readonly Row[]): string[] {
  return rows
    .filter(([, found, expected, tolerance]) => !(Math.abs(found - expected) <= tolerance))
    .map(([name, found, expected]) => `${name}: ${found} for ${expected}`)
}
