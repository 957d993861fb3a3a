import { CircleAlert } from 'lucide-react'
import { formatDay } from '../../../shared/calendar/days.ts'
import type { OpeningFound } from '../../../shared/find-days/find-days-schemas.ts'
import { spanWords } from '../../../shared/planning/opening-words.ts'
import { CrewPennant } from '../../drawings/crew-pennant.tsx'
import { Button } from '../../ui/button.tsx'
import { Fold } from '../../ui/fold.tsx'

type Props = { opening: OpeningFound; isFirst: boolean; busy: boolean; onTake: () => void }

function Cautions({ cautions }: { cautions: OpeningFound['cautions'] }) {
  const lines = [...new Map(cautions.map((one) => [one.text, one])).values()]
  const first = lines[0]
  if (!first) return null
  return (
    <Fold title={lines.length === 1 ? '1 caution' : `${lines.length} cautions`}>
      <ul className="space-y-1 text-sm">
        {lines.map(({ day, text, wayOut }) => (
          <li key={text} className="flex items-start gap-1.5">
            <CircleAlert size={16} aria-hidden className="mt-0.5 shrink-0 text-ochre" />
            <span>
              <span className="font-semibold text-ochre">
                {formatDay(day)}: {text}
              </span>{' '}
              {wayOut}
            </span>
          </li>
        ))}
      </ul>
    </Fold>
  )
}

/** One of the three: whose days, which, why, and one press to take them. */
export function OpeningCard({ opening, isFirst, busy, onTake }: Props) {
  const { crew, days, why, cautions } = opening
  const span = spanWords(days)
  const count = days.length === 1 ? '1 working day' : `${days.length} working days`
  return (
    <li
      className={`space-y-2 rounded-md border bg-sheet p-3 ${isFirst ? 'border-2 border-ink' : 'border-rule'}`}
    >
      <p className="flex flex-wrap items-center gap-2">
        <CrewPennant {...crew} />
        <span className="font-semibold">{crew.name}</span>
        <span className="text-ink-soft">{count}</span>
      </p>
      <p className="text-xl font-extrabold">{span}</p>
      <p>{why}</p>
      <Cautions cautions={cautions} />
      <Button
        kind={isFirst ? 'primary' : 'plain'}
        busy={busy}
        aria-label={`Pencil in ${crew.name}, ${span}`}
        onClick={onTake}
      >
        Pencil in
      </Button>
    </li>
  )
}
