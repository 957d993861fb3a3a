import type { MarkingOptions } from '../../../shared/marking/marking-figures.ts'
import type { RoofSettings } from '../../../shared/roof/roof-types.ts'
import { useSession } from '../../lib/session.ts'

/** How this firm writes numbers on timber. */
export function useMarkingOptions(settings: RoofSettings): MarkingOptions {
  const { lengthUnits } = useSession().firm
  const { roundMm, roundDeg, sawMaxTiltDeg } = settings
  return { units: lengthUnits, roundMm, roundDeg, sawMaxTiltDeg }
}
