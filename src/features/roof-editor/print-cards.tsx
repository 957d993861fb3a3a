import { posedMemberOf } from '../../../shared/drawing/timber-pose.ts'
import { markingCardOf } from '../../../shared/marking/marking-card.ts'
import type { MarkingOptions } from '../../../shared/marking/marking-figures.ts'
import type { FrameSpec } from '../../../shared/roof/roof-types.ts'
import { PrintCard } from './print-card.tsx'
import { usePrinting } from '../../lib/use-printing.ts'

type Props = { spec: FrameSpec; options: MarkingOptions }

/** A sheet for each line of the cut list; drawn only when the page goes to paper. */
export function PrintCards({ spec, options }: Props) {
  if (!usePrinting()) return null
  return (
    <div>
      {spec.cutLines.map((line) => {
        const card = markingCardOf(spec, line.mark, options)
        const member = posedMemberOf(spec, card.drawnMark)
        return member ? (
          <section key={line.mark} className="break-before-page [zoom:0.74]">
            <h2 className="mb-2 text-xl font-extrabold">
              {card.mark} · {card.name}
            </h2>
            <PrintCard card={card} member={member} units={options.units} />
          </section>
        ) : null
      })}
    </div>
  )
}
