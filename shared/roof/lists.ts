/**
 * What `of` gives for each item, in one list. The same as `flatMap`, which V8 runs some twenty times
 * slower than this; for what is done timber by timber.
 */
export const gather = <T, U>(
  list: readonly T[],
  of: (item: T, index: number) => readonly U[],
): U[] => {
  const found: U[] = []
  list.forEach((item, k) => found.push(...of(item, k)))
  return found
}
