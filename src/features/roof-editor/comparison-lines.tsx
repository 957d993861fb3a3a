import { sectionWords } from '../../../shared/marking/role-words.ts'
import type { LineChange, LineChangeKind } from '../../../shared/revisions/compare-specs.ts'
import {
  formatLength,
  type LengthUnits,
  lengthUnitWord,
} from '../../../shared/units/format-length.ts'
import { Badge } from '../../ui/badge.tsx'
import { changeWords, differenceWords, lineName } from './comparison-words.ts'

const badgeKinds: Record<LineChangeKind, 'plain' | 'clay' | 'chalk' | 'ochre'> = {
  gone: 'clay',
  added: 'chalk',
  longer: 'ochre',
  shorter: 'ochre',
  'other-size': 'ochre',
  'other-cuts': 'ochre',
  more: 'ochre',
  fewer: 'ochre',
  same: 'plain',
}

type Side = LineChange['before']

function sideWords(side: Side, units: LengthUnits): string {
  if (!side) return '–'
  const length = [formatLength(side.cutLengthMm, units), lengthUnitWord(units)]
    .filter(Boolean)
    .join(' ')
  return `${length}, x${side.quantity}, ${sectionWords(side.section)}`
}

const lineKey = ({ before, after }: LineChange): string =>
  `${before?.mark ?? ''}>${after?.mark ?? ''}`

type Props = { lines: readonly LineChange[]; units: LengthUnits; letters: [string, string] }

/** A table at the desk and on paper, cards on a phone. */
export function ComparisonLines({ lines, units, letters }: Props) {
  return (
    <>
      <ul className="space-y-2 sm:hidden print:hidden">
        {lines.map((line) => (
          <li key={lineKey(line)} className="rounded-md border border-rule p-3">
            <p className="flex flex-wrap items-center gap-2">
              <Badge kind={badgeKinds[line.kind]}>{changeWords[line.kind]}</Badge>
              <span className="font-extrabold">{lineName(line)}</span>
            </p>
            <p className="mt-1 font-semibold">{differenceWords(line, units)}</p>
            {line.before ? (
              <p>
                {letters[0]}: {sideWords(line.before, units)}
              </p>
            ) : null}
            {line.after ? (
              <p>
                {letters[1]}: {sideWords(line.after, units)}
              </p>
            ) : null}
          </li>
        ))}
      </ul>
      <table className="hidden w-full border-collapse text-left sm:table print:table">
        <thead>
          <tr className="border-b-2 border-ink-soft text-sm">
            <th scope="col" className="px-2 py-1">
              Line
            </th>
            <th scope="col" className="px-2 py-1">
              What
            </th>
            <th scope="col" className="px-2 py-1">
              Difference
            </th>
            <th scope="col" className="px-2 py-1">
              Revision {letters[0]}
            </th>
            <th scope="col" className="px-2 py-1">
              Revision {letters[1]}
            </th>
          </tr>
        </thead>
        <tbody>
          {lines.map((line) => (
            <tr key={lineKey(line)} className="break-inside-avoid border-b border-rule align-top">
              <th scope="row" className="px-2 py-1">
                {lineName(line)}
              </th>
              <td className="px-2 py-1">
                <Badge kind={badgeKinds[line.kind]}>{changeWords[line.kind]}</Badge>
              </td>
              <td className="px-2 py-1 font-semibold">{differenceWords(line, units)}</td>
              <td className="px-2 py-1 tabular-nums">{sideWords(line.before, units)}</td>
              <td className="px-2 py-1 tabular-nums">{sideWords(line.after, units)}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </>
  )
}
