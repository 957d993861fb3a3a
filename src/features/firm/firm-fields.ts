import type { FirmSettings } from '../../../shared/firm/firm-schemas.ts'

export type FirmSectionProps = {
  firm: FirmSettings
  onChange: (firm: FirmSettings) => void
  issueAt: (path: string) => string | undefined
}

export const gridClass = 'grid gap-3 sm:grid-cols-2 xl:grid-cols-3'

export type NumberField<Key extends string> = {
  key: Key
  label: string
  unit: string
  hint?: string
}

export const roofFields: NumberField<keyof FirmSettings['roofSettings']>[] = [
  {
    key: 'sawMaxTiltDeg',
    label: 'Saw tilts to',
    unit: '°',
    hint: 'Past this a bevel is flagged with the way round it.',
  },
  {
    key: 'minCreeperMm',
    label: 'Shortest creeper',
    unit: 'mm',
    hint: 'Set-out length; shorter ones are left out.',
  },
  { key: 'longestStockMm', label: 'Longest stock', unit: 'mm' },
  {
    key: 'maxRafterSpanMm',
    label: 'Longest rafter span',
    unit: 'mm',
    hint: 'From the span tables or the engineer for your timber.',
  },
  {
    key: 'collarTieSpacingMm',
    label: 'Collar ties no further apart than',
    unit: 'mm',
    hint: 'Set out where a size is typed for them.',
  },
  { key: 'densityKgM3', label: 'Timber weighs', unit: 'kg/m³' },
  { key: 'roundMm', label: 'Lengths are marked to', unit: 'mm' },
  { key: 'roundDeg', label: 'Bevels are marked to', unit: '°' },
]

export const labourFields: NumberField<
  Exclude<keyof FirmSettings['labourRates'], 'pieces' | 'packageMinutes' | 'startUpMinutes'>
>[] = [
  { key: 'setOutMinutes', label: 'Check and set out plates, once', unit: 'min' },
  { key: 'setOutMinutesPerPlateM', label: 'and for each metre of plate', unit: 'min' },
  { key: 'firstPairMinutes', label: 'Cut and try the first pair', unit: 'min' },
  { key: 'braceRidgeMinutes', label: 'Brace a ridge', unit: 'min' },
  { key: 'tailLineMinutesPerEaveM', label: 'Tails to a line, each metre of eave', unit: 'min' },
]

export const weekdays = ['Mon', 'Tue', 'Wed', 'Thu', 'Fri', 'Sat', 'Sun'] as const
