/** What a firm reads its tape in. */
export type LengthUnits = 'mm' | 'feet-inches'

const mmPerInch = 25.4
const sixteenthsPerInch = 16
const sixteenthsPerFoot = 12 * sixteenthsPerInch

const notKnown = '–'

/** Whole millimetres without thousands separators: 3290.6 → '3291'. */
export function formatMm(lengthMm: number): string {
  if (!Number.isFinite(lengthMm)) return notKnown
  const roundedMm = Math.round(Math.abs(lengthMm))
  return roundedMm > 0 && lengthMm < 0 ? `−${roundedMm}` : `${roundedMm}`
}

/** Feet, inches and sixteenths in lowest terms: 3290.6 → `10' 9 9/16"`. */
export function formatFeetInches(lengthMm: number): string {
  if (!Number.isFinite(lengthMm)) return notKnown
  const sixteenths = Math.round((Math.abs(lengthMm) / mmPerInch) * sixteenthsPerInch)
  const feet = Math.floor(sixteenths / sixteenthsPerFoot)
  const rest = sixteenths - feet * sixteenthsPerFoot
  const inches = Math.floor(rest / sixteenthsPerInch)
  const fraction = fractionText(rest - inches * sixteenthsPerInch)
  const inchParts = [inches > 0 || fraction === '' ? `${inches}` : '', fraction].filter(Boolean)
  const sign = sixteenths > 0 && lengthMm < 0 ? '−' : ''
  return `${sign}${feet > 0 ? `${feet}' ` : ''}${inchParts.join(' ')}"`
}

/** A length as the firm reads it; the unit is written beside it by the caller (`lengthUnitWord`). */
export function formatLength(lengthMm: number, units: LengthUnits): string {
  return units === 'mm' ? formatMm(lengthMm) : formatFeetInches(lengthMm)
}

/** The small unit beside a number; feet and inches carry their own. */
export function lengthUnitWord(units: LengthUnits): string {
  return units === 'mm' ? 'mm' : ''
}

function fractionText(sixteenths: number): string {
  if (sixteenths === 0) return ''
  let top = sixteenths
  let bottom = sixteenthsPerInch
  while (top % 2 === 0) {
    top /= 2
    bottom /= 2
  }
  return `${top}/${bottom}`
}
