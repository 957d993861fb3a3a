import { lengthWords, type MarkingOptions } from '../../../shared/marking/marking-figures.ts'
import { planingWords } from '../../../shared/marking/marking-parts.ts'
import { sectionWords } from '../../../shared/marking/role-words.ts'
import type { FrameSpec } from '../../../shared/roof/roof-types.ts'
import { Note } from '../../ui/states.tsx'

type Props = { spec: FrameSpec; options: MarkingOptions }

/** Areas, line lengths and timber by section. */
export function SpecTotals({ spec, options }: Props) {
  const { totals } = spec
  const lengths = [
    ['Ridge', totals.ridgeMm],
    ['Hips', totals.hipMm],
    ['Valleys', totals.valleyMm],
    ['Eaves', totals.eaveMm],
    ['Verges', totals.vergeMm],
  ] as const
  const rows: [string, string][] = [
    ['Roof area with eaves', `${totals.roofAreaWithEavesM2.toFixed(1)} m²`],
    ['Roof area to the plates', `${totals.roofAreaM2.toFixed(1)} m²`],
    ...lengths
      .filter(([, mm]) => mm > 0)
      .map(([name, mm]): [string, string] => [name, lengthWords(mm, options)]),
    ['Height over plate', lengthWords(spec.standMm, options)],
  ]
  return (
    <div className="grid gap-x-8 gap-y-4 xl:grid-cols-2">
      <dl className="divide-y divide-rule">
        {rows.map(([name, text]) => (
          <div key={name} className="flex justify-between gap-3 py-1">
            <dt>{name}</dt>
            <dd className="font-semibold tabular-nums">{text}</dd>
          </div>
        ))}
      </dl>
      <table className="h-fit w-full border-collapse">
        <thead>
          <tr className="border-b-2 border-ink-soft text-right text-sm">
            <th scope="col" className="py-1 pr-2 text-left">
              Section
            </th>
            <th scope="col" className="px-2 py-1">
              Pieces
            </th>
            <th scope="col" className="px-2 py-1">
              Length
            </th>
            <th scope="col" className="py-1 pl-2">
              Weight
            </th>
          </tr>
        </thead>
        <tbody>
          {totals.bySection.map((total) => (
            <tr key={sectionWords(total.section)} className="border-b border-rule text-right">
              <th scope="row" className="py-1 pr-2 text-left font-semibold tabular-nums">
                {sectionWords(total.section)}
              </th>
              <td className="px-2 py-1 tabular-nums">{total.pieces}</td>
              <td className="px-2 py-1 tabular-nums">{(total.lengthMm / 1000).toFixed(1)} m</td>
              <td className="py-1 pl-2 tabular-nums">{Math.round(total.weightKg)} kg</td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  )
}

/** What to look at again, each with what would answer it. */
export function SpecCautions({ spec }: Pick<Props, 'spec'>) {
  if (spec.cautions.length === 0) return <p className="text-ink-soft">No cautions on this roof.</p>
  return (
    <ul className="space-y-2">
      {spec.cautions.map((caution) => (
        <li key={`${caution.code}${caution.members.join()}${caution.text}`}>
          <Note kind="caution" title={`Caution: ${caution.text}`}>
            <p className="text-sm">{caution.remedy}</p>
            {caution.members.length > 0 ? (
              <p className="text-sm text-ink-soft">On {caution.members.join(', ')}</p>
            ) : null}
          </Note>
        </li>
      ))}
    </ul>
  )
}

/** Corners to plane, and what rounding the marks costs at the worst joint. */
export function SpecFit({ spec, options }: Props) {
  const { joint, worstMm } = spec.rounding
  const planing = spec.cutLines.flatMap((line) => planingWords(spec, line, options))
  return (
    <div className="space-y-2">
      {planing.length > 0 ? (
        <ul className="list-disc pl-5">
          {planing.map((words) => (
            <li key={words}>{words}</li>
          ))}
        </ul>
      ) : (
        <p>No corner stands over a neighbouring slope: nothing to plane.</p>
      )}
      <p>
        Marked to {options.roundMm} mm and {options.roundDeg}°, the worst joint is{' '}
        {worstMm.toFixed(1)} mm out{joint ? `: ${joint[0]} on ${joint[1]}` : ''}.
      </p>
    </div>
  )
}
