import { useMemo } from 'react'
import { type MarkingCard, markingCardOf } from '../../../shared/marking/marking-card.ts'
import type { MarkingFigure, MarkingOptions } from '../../../shared/marking/marking-figures.ts'
import { roundingWords } from '../../../shared/marking/rounding-words.ts'
import type { FrameSpec } from '../../../shared/roof/roof-types.ts'

type Props = { spec: FrameSpec; options: MarkingOptions; onPick: (cutLineMark: string) => void }

/** 'Head, left cheek 65.0° / 44.5°': down the side, then across the top, both from the edge. */
function bevelRows(card: MarkingCard): { where: string; angles: string }[] {
  return card.ends.flatMap((end) =>
    end.cuts.map((cut) => ({
      where: [end.title, cut.cheek.toLowerCase()].filter(Boolean).join(', '),
      angles: [cut.face.fromEdgeText, cut.edge?.fromEdgeText ?? 'square'].join(' / '),
    })),
  )
}

function FigureText({ figure }: { figure: MarkingFigure }) {
  return (
    <>
      {figure.text}
      {figure.unit ? (
        <span className="text-sm font-normal text-ink-soft"> {figure.unit}</span>
      ) : null}
    </>
  )
}

/** Every line of the cut list; a table at the desk and on paper, cards on a phone. */
export function CutList({ spec, options, onPick }: Props) {
  const cardOf = useMemo(() => cardsAsNeeded(spec, options), [spec, options])
  return (
    <>
      <p className="text-sm text-ink-soft">{roundingWords(spec, options)}</p>
      <p className="mb-2 text-sm text-ink-soft">
        Bevels from the edge: down the side / across the top.
      </p>
      <ul className="space-y-2 sm:hidden print:hidden">
        {spec.cutLines.map(({ mark }) => (
          <CutLineCard key={mark} mark={mark} cardOf={cardOf} onPick={onPick} />
        ))}
      </ul>
      <CutTable spec={spec} cardOf={cardOf} onPick={onPick} />
    </>
  )
}

type CardOf = (mark: string) => MarkingCard
type RowProps = { mark: string; cardOf: CardOf; onPick: Props['onPick'] }

/** Each card is made when its line is drawn, so that a key typed meanwhile waits for one line at most. */
function cardsAsNeeded(spec: FrameSpec, options: MarkingOptions): CardOf {
  const made = new Map<string, MarkingCard>()
  return (mark) => {
    const card = made.get(mark) ?? markingCardOf(spec, mark, options)
    made.set(mark, card)
    return card
  }
}

const headings = ['Mark', 'Piece', 'Section', 'Cut length', 'No.', 'L', 'R', 'Set-out', 'Bevels']
const numberHeadings = new Set(['Cut length', 'No.', 'L', 'R', 'Set-out'])

type TableProps = Pick<Props, 'spec' | 'onPick'> & { cardOf: CardOf }

function CutTable({ spec, cardOf, onPick }: TableProps) {
  return (
    <div className="hidden overflow-x-auto sm:block print:block print:overflow-visible">
      <table className="w-full border-collapse text-left">
        <thead>
          <tr className="border-b-2 border-ink-soft text-sm">
            {headings.map((heading) => (
              <th
                key={heading}
                scope="col"
                className={`px-2 py-1 ${numberHeadings.has(heading) ? 'text-right' : ''}`}
              >
                {heading === 'L' ? <abbr title="Left hand">L</abbr> : null}
                {heading === 'R' ? <abbr title="Right hand">R</abbr> : null}
                {heading === 'L' || heading === 'R' ? null : heading}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {spec.cutLines.map(({ mark }) => (
            <CutRow key={mark} mark={mark} cardOf={cardOf} onPick={onPick} />
          ))}
        </tbody>
      </table>
    </div>
  )
}

function CutRow({ mark, cardOf, onPick }: RowProps) {
  const card = cardOf(mark)
  const number = 'px-2 py-1 text-right tabular-nums'
  return (
    <tr className="border-b border-rule align-top break-inside-avoid">
      <th scope="row" className="px-2 py-1">
        <MarkButton card={card} onPick={onPick} />
      </th>
      <td className="px-2 py-1">{card.name}</td>
      <td className="whitespace-nowrap px-2 py-1 tabular-nums">{card.section}</td>
      <td className={`${number} whitespace-nowrap font-extrabold`}>
        <FigureText figure={card.cutLength} />
      </td>
      <td className={number}>{card.quantity}</td>
      <td className={number}>{card.left || '–'}</td>
      <td className={number}>{card.right || '–'}</td>
      <td className={`${number} whitespace-nowrap`}>
        <FigureText figure={card.setOutLength} />
      </td>
      <td className="px-2 py-1 text-sm">
        {bevelRows(card).map(({ where, angles }) => (
          <p key={where} className="whitespace-nowrap">
            {where} <span className="font-semibold tabular-nums">{angles}</span>
          </p>
        ))}
      </td>
    </tr>
  )
}

function MarkButton({ card, onPick }: { card: MarkingCard; onPick: Props['onPick'] }) {
  return (
    <>
      <button
        type="button"
        onClick={() => onPick(card.mark)}
        aria-label={`${card.mark}, ${card.name}: open its card`}
        className="-my-2 -ml-1 min-h-11 min-w-11 rounded-md px-1 text-left font-extrabold text-chalk underline print:hidden"
      >
        {card.mark}
      </button>
      <span className="hidden font-extrabold print:inline">{card.mark}</span>
    </>
  )
}

function CutLineCard({ mark, cardOf, onPick }: RowProps) {
  const card = cardOf(mark)
  return (
    <li className="rounded-md border border-rule bg-sheet p-3">
      <div className="flex items-start justify-between gap-3">
        <div className="min-w-0">
          <MarkButton card={card} onPick={onPick} />
          <p>{card.name}</p>
          <p>
            <span className="whitespace-nowrap tabular-nums">{card.section}</span>,{' '}
            <span className="font-semibold">{card.quantityWords}</span>
          </p>
        </div>
        <div className="shrink-0 text-right">
          <p className="numeral text-[1.75rem]">
            <FigureText figure={card.cutLength} />
          </p>
          <p className="text-sm text-ink-soft">
            set-out <FigureText figure={card.setOutLength} />
          </p>
        </div>
      </div>
      <ul className="mt-2 text-sm">
        {bevelRows(card).map(({ where, angles }) => (
          <li key={where}>
            {where} <span className="font-semibold tabular-nums">{angles}</span>
          </li>
        ))}
      </ul>
    </li>
  )
}
