import { lengthWords, type MarkingOptions } from '../../../shared/marking/marking-figures.ts'
import { planingWords } from '../../../shared/marking/marking-parts.ts'
import { sectionWords } from '../../../shared/marking/role-words.ts'
import type { CoveringTotals, FrameSpec } from '../../../shared/roof/roof-types.ts'
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
  const rows: Row[] = [
    ['Roof area with eaves', areaWords(totals.roofAreaWithEavesM2)],
    ['Roof area to the plates', areaWords(totals.roofAreaM2)],
    ...lengths
      .filter(([, mm]) => mm > 0)
      .map(([name, mm]): Row => [name, lengthWords(mm, options)]),
    ['Height over plate', lengthWords(spec.standMm, options)],
  ]
  return (
    <div className="grid gap-x-8 gap-y-4 xl:grid-cols-2">
      <div className="space-y-4">
        <Rows rows={rows} />
        {totals.covering ? <CoveringRows covering={totals.covering} /> : null}
      </div>
      <SectionTable totals={totals} />
    </div>
  )
}

type Row = [string, string]

const areaWords = (areaM2: number) => `${areaM2.toFixed(1)} m²`
const metreWords = (mm: number) => `${(mm / 1000).toFixed(1)} m`

function Rows({ rows }: { rows: readonly Row[] }) {
  return (
    <dl className="divide-y divide-rule">
      {rows.map(([name, text]) => (
        <div key={name} className="flex justify-between gap-3 py-1">
          <dt>{name}</dt>
          <dd className="font-semibold tabular-nums">{text}</dd>
        </div>
      ))}
    </dl>
  )
}

/** What the roofer, the plumber and the yard ask for; what a roof has none of is left out. */
function CoveringRows({ covering }: { covering: CoveringTotals }) {
  const lengths = [
    ['Battens', covering.battenMm ?? 0],
    ['Ridge capping', covering.ridgeCappingMm],
    ['Hip capping', covering.hipCappingMm],
    ['Valley lining', covering.valleyLiningMm],
    ['Gutter', covering.gutterMm],
    ['Fascia', covering.fasciaMm],
    ['Barge', covering.bargeMm],
  ] as const
  const rows: Row[] = [
    ['Covering', areaWords(covering.coveringAreaM2)],
    ['Underlay', areaWords(covering.underlayAreaM2)],
    ...lengths.filter(([, mm]) => mm > 0).map(([name, mm]): Row => [name, metreWords(mm)]),
  ]
  return (
    <div>
      <h3 className="font-extrabold">Covering and trim</h3>
      <Rows rows={rows} />
      <p className="mt-1 text-sm text-ink-soft">Net: laps and waste are not in these.</p>
    </div>
  )
}

function SectionTable({ totals }: Pick<FrameSpec, 'totals'>) {
  return (
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
            <td className="px-2 py-1 tabular-nums">{metreWords(total.lengthMm)}</td>
            <td className="py-1 pl-2 tabular-nums">{Math.round(total.weightKg)} kg</td>
          </tr>
        ))}
      </tbody>
    </table>
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

/** Corners to plane. */
export function SpecFit({ spec, options }: Props) {
  const planing = spec.cutLines.flatMap((line) => planingWords(spec, line, options))
  if (planing.length === 0)
    return <p>No corner stands over a neighbouring slope: nothing to plane.</p>
  return (
    <ul className="list-disc pl-5">
      {planing.map((words) => (
        <li key={words}>{words}</li>
      ))}
    </ul>
  )
}
