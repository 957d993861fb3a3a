const letters = 26

/** 1 → A … 26 → Z, 27 → AA, as drawings are lettered. */
export function revisionLetter(sequence: number): string {
  if (!Number.isInteger(sequence) || sequence < 1) throw new RangeError('Revisions count from 1.')
  const last = String.fromCharCode(65 + ((sequence - 1) % letters))
  const before = Math.floor((sequence - 1) / letters)
  return before === 0 ? last : revisionLetter(before) + last
}

/** The letter of the revision before; null for the first. */
export function letterBefore(letter: string): string | null {
  const sequence = [...letter].reduce((sum, one) => sum * letters + one.charCodeAt(0) - 64, 0)
  return sequence > 1 ? revisionLetter(sequence - 1) : null
}
