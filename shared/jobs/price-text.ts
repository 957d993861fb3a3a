const pricePattern = /^\d{1,9}(\.\d{1,2})?$/

/**
 * Cents of a price typed in dollars ('18450', '$18,450.50', '18 450'); null for an empty text.
 * Undefined when it is not a price.
 */
export function priceCentsOf(text: string): number | null | undefined {
  const bare = text.trim().replace(/^\$/, '').replaceAll(/[,\s]/g, '')
  if (bare === '') return text.trim() === '' ? null : undefined
  if (!pricePattern.test(bare)) return undefined
  const [dollars = '0', cents = ''] = bare.split('.')
  return Number(dollars) * 100 + Number(cents.padEnd(2, '0'))
}

/** As it is typed again: '18450' or '18450.50'; empty for none. */
export function priceInputText(cents: number | null): string {
  if (cents === null) return ''
  return cents % 100 === 0 ? String(cents / 100) : (cents / 100).toFixed(2)
}

/** As it is read: '$18,450', '$18,450.50' or, for work left out, '−$450'. */
export function formatPrice(cents: number): string {
  if (cents < 0) return `−${formatPrice(-cents)}`
  const rest = cents % 100
  const dollars = Math.floor(cents / 100)
  const grouped = String(dollars).replace(/\B(?=(\d{3})+$)/g, ',')
  return rest === 0 ? `$${grouped}` : `$${grouped}.${String(rest).padStart(2, '0')}`
}
