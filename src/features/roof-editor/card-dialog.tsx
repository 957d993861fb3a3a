import { pieceHand } from '../../../shared/drawing/timber-hand.ts'
import { posedMemberOf } from '../../../shared/drawing/timber-pose.ts'
import { markingCardOf } from '../../../shared/marking/marking-card.ts'
import type { MarkingOptions } from '../../../shared/marking/marking-figures.ts'
import type { FrameSpec } from '../../../shared/roof/roof-types.ts'
import { MarkingCardView } from '../../drawings/marking-card-view.tsx'
import { Dialog } from '../../ui/dialog.tsx'

type Props = {
  spec: FrameSpec
  /** Mark of a member or of a cut line; null closes. */
  mark: string | null
  options: MarkingOptions
  platesMeasured: boolean
  onClose: () => void
}

/** The marking card of a picked timber, beside the page. */
export function CardDialog({ spec, mark, options, platesMeasured, onClose }: Props) {
  const line = spec.cutLines.find((one) => one.mark === mark || one.members.includes(mark ?? ''))
  if (!line || mark === null) return null
  const card = markingCardOf(spec, line.mark, options)
  const picked = posedMemberOf(spec, mark)
  const member = picked ?? posedMemberOf(spec, card.drawnMark)
  const side = picked ? pieceHand(picked)?.side : undefined
  const hand = side ? `, ${side} hand` : ''
  return (
    <Dialog
      open
      place="panel"
      onClose={onClose}
      title={`${picked?.mark ?? line.mark} · ${card.name}${hand}`}
    >
      <p className="mb-2 font-semibold">
        {card.section} · {card.quantityWords}
      </p>
      <MarkingCardView
        card={card}
        member={member}
        units={options.units}
        platesMeasured={platesMeasured}
      />
    </Dialog>
  )
}
