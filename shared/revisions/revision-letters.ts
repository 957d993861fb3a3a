const letters = 26

/** 1 → A … 26 → Z, 27 → AA, as drawings are lettered. */
export function revisionLetter(sequence: number): string {
  if (!Number.isInteger(sequence) || sequence < 1) throw new RangeError('Revisions count from 1.')
  const last = String.fromCharCode(65 + ((sequence - 1) % letters))
  const before = Math.floor((sequence - 1) / letters)
  return before === 0 ? last : revisionLetter(before) + last
}
