import type { Variation } from './variation-schemas.ts'

export type VariationState = 'not-priced' | 'to-ask' | 'asked' | 'agreed' | 'withdrawn'

export const variationStateNames: Record<VariationState, string> = {
  'not-priced': 'Not priced',
  'to-ask': 'To ask for',
  asked: 'Asked for',
  agreed: 'Agreed',
  withdrawn: 'Withdrawn',
}

type Facts = Pick<Variation, 'priceCents' | 'askedOn' | 'agreedOn' | 'withdrawnOn'>

/** Where a variation stands follows from its facts. */
export function variationState({
  priceCents,
  askedOn,
  agreedOn,
  withdrawnOn,
}: Facts): VariationState {
  if (withdrawnOn !== null) return 'withdrawn'
  if (agreedOn !== null) return 'agreed'
  if (askedOn !== null) return 'asked'
  return priceCents === null ? 'not-priced' : 'to-ask'
}

export type VariationTotals = {
  agreedCents: number
  /** Priced, standing, without a yes. */
  openCents: number
  /** The job's price and what was agreed on top; null while the job has no price. */
  wholeCents: number | null
}

export function variationTotals(
  jobPriceCents: number | null,
  variations: readonly Facts[],
): VariationTotals {
  const sum = (states: VariationState[]) =>
    variations
      .filter((one) => states.includes(variationState(one)))
      .reduce((cents, one) => cents + (one.priceCents ?? 0), 0)
  const agreedCents = sum(['agreed'])
  return {
    agreedCents,
    openCents: sum(['to-ask', 'asked']),
    wholeCents: jobPriceCents === null ? null : jobPriceCents + agreedCents,
  }
}
