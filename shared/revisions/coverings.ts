import type { Covering as CoveringKind } from '../jobs/job-schemas.ts'
import type { Covering, RoofSettings } from '../roof/roof-types.ts'

type CoveringFact = {
  name: string
  /** Null: no figure is held, so no caution is raised; the maker's instructions decide. */
  usualMinPitchDeg: number | null
  source: string
  /** From batten to batten up the slope, for counting metres only; null: none are counted. Common practice, no source. */
  usualGaugeMm: number | null
}

/** What a covering usually takes, for a caution only; local codes and the maker decide. */
export const coveringFacts: Record<CoveringKind, CoveringFact> = {
  tiles: {
    name: 'concrete or clay tiles',
    usualMinPitchDeg: 15,
    source:
      'Deemed range 15–35°: NCC 2019 volume 2, 3.5.2.1(c), an older edition; check the one in force',
    usualGaugeMm: 330,
  },
  sheet: {
    name: 'corrugated sheet',
    usualMinPitchDeg: 5,
    source: 'Common practice, no source',
    usualGaugeMm: 900,
  },
  shingles: {
    name: 'shingles',
    usualMinPitchDeg: null,
    source: 'No figure held',
    usualGaugeMm: null,
  },
  other: {
    name: 'another covering',
    usualMinPitchDeg: null,
    source: 'No figure held',
    usualGaugeMm: null,
  },
}

export function coveringOf(kind: CoveringKind): Covering | null {
  const { name, usualMinPitchDeg } = coveringFacts[kind]
  return usualMinPitchDeg === null ? null : { name, minPitchDeg: usualMinPitchDeg }
}

/** What a job's roof is framed under: the firm's settings with the job's covering and its usual battens. */
export function jobRoofSettings(firm: RoofSettings, kind: CoveringKind): RoofSettings {
  const { usualGaugeMm } = coveringFacts[kind]
  const battens = usualGaugeMm === null ? {} : { battenGaugeMm: usualGaugeMm }
  return { ...firm, ...battens, covering: coveringOf(kind) }
}
