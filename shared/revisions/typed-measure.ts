/**
 * Reads a length as people copy it from a plan, in mm: '9000', '9 000', '9000 mm', '9.0 m', '22,5'.
 * NaN when it is not one, or may be read two ways ('9,000'): never a guess.
 */
export function lengthMmOfText(text: string): number {
  const match = /^(.*?)\s*(mm|m)?$/i.exec(text.trim())
  const value = plainNumber(match?.[1] ?? '')
  return match?.[2]?.toLowerCase() === 'm' ? value * 1000 : value
}

/** '25', '22.5°'; NaN when it is not an angle. */
export function angleDegOfText(text: string): number {
  return plainNumber(text.trim().replace(/\s*(°|deg)$/i, ''))
}

function plainNumber(text: string): number {
  const plain = text.replace('−', '-').replaceAll(/(\d)\s(?=\d)/g, '$1')
  return /^-?(\d+([.]\d*|,\d{1,2})?|[.]\d+)$/.test(plain) ? Number(plain.replace(',', '.')) : NaN
}
