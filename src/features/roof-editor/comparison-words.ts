import { roleWords, sectionWords } from '../../../shared/marking/role-words.ts'
import {
  type LineChange,
  type LineChangeKind,
  lineChangeKinds,
} from '../../../shared/revisions/compare-specs.ts'
import {
  formatLength,
  type LengthUnits,
  lengthUnitWord,
} from '../../../shared/units/format-length.ts'

export const changeWords: Record<LineChangeKind, string> = {
  gone: 'Gone',
  added: 'Added',
  longer: 'Longer',
  shorter: 'Shorter',
  'other-size': 'Other size',
  'other-cuts': 'Other cuts',
  more: 'More pieces',
  fewer: 'Fewer pieces',
  same: 'The same',
}

/** 'C1 Common rafter'; 'CR2, was CR3'. */
export function lineName({ role, before, after }: LineChange): string {
  const name = roleWords[role]
  const mark = (after ?? before)?.mark ?? ''
  const was = before && after && before.mark !== after.mark ? `, was ${before.mark}` : ''
  return `${mark} ${name}${was}`
}

const mmPerSixteenth = 25.4 / 16

/** A length as it is written, so that a difference is that of the two lengths one reads. */
function writtenMm(lengthMm: number, units: LengthUnits): number {
  const stepMm = units === 'mm' ? 1 : mmPerSixteenth
  return Math.round(lengthMm / stepMm) * stepMm
}

/** 'by 12 mm; x4 to x6': what differs, in the order it matters at the saw. */
export function differenceWords(change: LineChange, units: LengthUnits): string {
  const { before, after } = change
  if (!before || !after) return ''
  const [oldSize, newSize] = [sectionWords(before.section), sectionWords(after.section)]
  const byMm = writtenMm(after.cutLengthMm, units) - writtenMm(before.cutLengthMm, units)
  const parts = [
    oldSize === newSize ? '' : `${oldSize} to ${newSize}`,
    byMm === 0
      ? ''
      : `by ${[formatLength(Math.abs(byMm), units), lengthUnitWord(units)].filter(Boolean).join(' ')}`,
    change.kind === 'other-cuts' ? 'the length stays, bevels or notch differ' : '',
    before.quantity === after.quantity ? '' : `x${before.quantity} to x${after.quantity}`,
  ]
  return parts.filter(Boolean).join('; ')
}

/** '2 longer, 1 gone; 14 lines stay the same.' */
export function changeCounts(lines: readonly LineChange[]): string {
  const count = (kind: LineChangeKind) => lines.filter((line) => line.kind === kind).length
  const changed = lineChangeKinds
    .filter((kind) => kind !== 'same' && count(kind) > 0)
    .map((kind) => `${count(kind)} ${changeWords[kind].toLowerCase()}`)
  const same = count('same')
  const sameWords =
    same === 0
      ? 'no line stays the same.'
      : same === 1
        ? '1 line stays the same.'
        : `${same} lines stay the same.`
  return changed.length === 0 ? sameWords : `${changed.join(', ')}; ${sameWords}`
}
