import { memo, useState } from 'react'
import type { RoofSettings } from '../../../shared/roof/roof-types.ts'
import { Card } from '../../ui/card.tsx'
import { CardDialog } from './card-dialog.tsx'
import { CutList } from './cut-list.tsx'
import { EditorPlan } from './editor-plan.tsx'
import { useMarkingOptions } from './marking-options.ts'
import { SpecCautions, SpecFit, SpecTotals } from './spec-summary.tsx'
import { useRestedValue, useSteadyReading } from './use-results.ts'
import type { RoofReading } from './use-framed-roof.ts'

type Props = {
  now: RoofReading
  settings: RoofSettings
  /** On a phone one part shows at a time. */
  part: 'plan' | 'numbers'
}

/** What is out of sight is laid out when it comes into it. */
const asNeeded = '[contain-intrinsic-size:auto_400px] [content-visibility:auto]'

/** Plan, frame spec, totals and cautions of what is typed so far. */
export const RoofResults = memo(function RoofResults({ now, settings, part }: Props) {
  const [picked, setPicked] = useState<string | null>(null)
  const options = useMarkingOptions(settings)
  const steady = useSteadyReading(now)
  const shown = steady.reading.roof ? steady.framed : null
  const spec = useRestedValue(shown?.spec ?? null)
  return (
    <div className="space-y-4">
      <Card aria-label="Plan" className={part === 'plan' ? '' : 'hidden lg:block'}>
        <EditorPlan
          now={now}
          steady={steady}
          units={options.units}
          selected={picked}
          onPick={setPicked}
        />
      </Card>
      {spec ? (
        <div className={`space-y-4 ${part === 'numbers' ? '' : 'hidden lg:block'}`}>
          <Card className={asNeeded}>
            <h2 className="mb-2 text-lg font-extrabold">Cautions</h2>
            <SpecCautions spec={spec} />
          </Card>
          <Card className={asNeeded}>
            <h2 className="mb-2 text-lg font-extrabold">Totals</h2>
            <SpecTotals spec={spec} options={options} />
          </Card>
          <Card className={asNeeded}>
            <h2 className="mb-1 text-lg font-extrabold">Cut list</h2>
            <CutList spec={spec} options={options} onPick={setPicked} />
          </Card>
          <Card className={asNeeded}>
            <h2 className="mb-2 text-lg font-extrabold">Fit</h2>
            <SpecFit spec={spec} options={options} />
          </Card>
          <CardDialog
            spec={spec}
            mark={picked}
            options={options}
            platesMeasured={false}
            onClose={() => setPicked(null)}
          />
        </div>
      ) : (
        <p className={`text-ink-soft ${part === 'numbers' ? '' : 'hidden'}`}>
          The numbers are here once the roof can be framed.
        </p>
      )}
    </div>
  )
})
