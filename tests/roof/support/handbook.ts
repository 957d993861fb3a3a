import handbook from '../../fixtures/handbook.json' with { type: 'json' }

/**
 * One worked example as printed. Throws when the fixture lacks it: a renamed entry must not turn a
 * check into nothing.
 */
export function example(id: string): { source: string; number: (path: string) => number } {
  const found = handbook.examples.find((e) => e.id === id)
  if (found === undefined) throw new Error(`tests/fixtures/handbook.json has no ${id}`)
  const number = (path: string): number => {
    const value = path
      .split('.')
      .reduce<unknown>((at, key) => (at as Record<string, unknown> | undefined)?.[key], found)
    if (typeof value !== 'number') throw new Error(`${id} prints no number at ${path}`)
    return value
  }
  return { source: found.source, number }
}

export const allExamples: string[] = handbook.examples.map((e) => e.id)
