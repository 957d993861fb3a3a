import { pieceHand } from '../../shared/drawing/timber-hand.ts'
import type { PosedMember } from '../../shared/drawing/timber-pose.ts'
import { cutOneFirst, type MarkingCard } from '../../shared/marking/marking-card.ts'
import type { LengthUnits } from '../../shared/units/format-length.ts'
import { Fold } from '../ui/fold.tsx'
import { Note } from '../ui/states.tsx'
import { MarkingNumbers } from './marking-numbers.tsx'
import { TimberDrawing } from './timber-drawing.tsx'

type Props = {
  card: MarkingCard
  member: PosedMember | null
  units: LengthUnits
  /** What the plates say of these numbers; shown first. */
  platesMeasured: boolean
}

/** A whole marking card: numbers at reading size, the timber with its bevels, and what to mind. */
export function MarkingCardView({ card, member, units, platesMeasured }: Props) {
  const hand = member ? pieceHand(member) : null
  return (
    <div className="space-y-4">
      <div>
        <p className="font-extrabold">{cutOneFirst}</p>
        {platesMeasured ? null : <p className="font-semibold">From plan, plates not measured.</p>}
        <p>{card.handWords}</p>
      </div>
      <PlaningNote card={card} />
      <MarkingNumbers card={card} />
      <CardCautions card={card} />
      {member ? (
        <div className="border-t border-rule pt-3">
          <p className="mb-2 font-extrabold">
            Drawn: {member.mark}
            {hand ? `, ${hand.side} hand` : ''}
          </p>
          <TimberDrawing member={member} units={units} roundDeg={card.roundDeg} />
        </div>
      ) : null}
      <div className="border-t border-rule">
        <Fold title="Further numbers">
          <dl className="grid grid-cols-2 gap-x-4 gap-y-1 text-base">
            {card.further.map((figure) => (
              <div key={figure.label}>
                <dt className="inline">{figure.label} </dt>
                <dd className="inline font-extrabold tabular-nums">
                  {figure.text} {figure.unit}
                </dd>
              </div>
            ))}
            <div>
              <dt className="inline">Pitch </dt>
              <dd className="inline font-extrabold tabular-nums">{card.pitchText}</dd>
            </div>
          </dl>
        </Fold>
      </div>
    </div>
  )
}

/** Top corners to plane off. */
export function PlaningNote({ card }: { card: MarkingCard }) {
  if (card.planing.length === 0) return null
  return (
    <ul className="list-none border-l-8 border-rule p-0 pl-2">
      {card.planing.map((text) => (
        <li key={text} className="text-base print:text-xs">
          {text}
        </li>
      ))}
    </ul>
  )
}

function CardCautions({ card }: { card: MarkingCard }) {
  return card.warnings.map(({ text, remedy }) => (
    <Note key={text} kind="caution" title="Caution">
      <p className="text-base">{text}</p>
      <p className="text-base">{remedy}</p>
    </Note>
  ))
}
