import { memo, useState } from 'react'
import type { FormReading } from '../../../shared/revisions/roof-of-form.ts'
import type { RoofSettings } from '../../../shared/roof/roof-types.ts'
import { Card } from '../../ui/card.tsx'
import { CardDialog } from './card-dialog.tsx'
import { CutList } from './cut-list.tsx'
import { EditorPlan } from './editor-plan.tsx'
import { useMarkingOptions } from './marking-options.ts'
import { SpecCautions, SpecFit, SpecTotals } from './spec-summary.tsx'
import type { Framed } from './use-framed-roof.ts'

type Props = {
  reading: FormReading
  framed: Framed | null
  settings: RoofSettings
  /** On a phone one part shows at a time. */
  part: 'plan' | 'numbers'
}

/** Plan, frame spec, totals and cautions of what is typed so far. */
export const RoofResults = memo(function RoofResults({ reading, framed, settings, part }: Props) {
  const [picked, setPicked] = useState<string | null>(null)
  const options = useMarkingOptions(settings)
  const shown = reading.roof ? framed : null
  const spec = shown?.spec ?? null
  return (
    <div className="space-y-4">
      <Card aria-label="Plan" className={part === 'plan' ? '' : 'hidden lg:block'}>
        <EditorPlan
          reading={reading}
          framed={framed}
          units={options.units}
          selected={picked}
          onPick={setPicked}
        />
      </Card>
      {spec ? (
        <div className={`space-y-4 ${part === 'numbers' ? '' : 'hidden lg:block'}`}>
          <Card>
            <h2 className="mb-2 text-lg font-extrabold">Cautions</h2>
            <SpecCautions spec={spec} />
          </Card>
          <Card>
            <h2 className="mb-2 text-lg font-extrabold">Totals</h2>
            <SpecTotals spec={spec} options={options} />
          </Card>
          <Card>
            <h2 className="mb-1 text-lg font-extrabold">Cut list</h2>
            <CutList spec={spec} options={options} onPick={setPicked} />
          </Card>
          <Card>
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
