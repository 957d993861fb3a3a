import type { ReactNode } from 'react'
import type { PosedMember } from '../../../shared/drawing/timber-pose.ts'
import { cutOneFirst, type MarkingCard } from '../../../shared/marking/marking-card.ts'
import { bearsText } from '../../../shared/marking/marking-cuts.ts'
import { bevelWords, type MarkingFigure } from '../../../shared/marking/marking-figures.ts'
import type { LengthUnits } from '../../../shared/units/format-length.ts'
import { TimberDrawing } from '../../drawings/timber-drawing.tsx'
import { Note } from '../../ui/states.tsx'

type Props = { card: MarkingCard; member: PosedMember; units: LengthUnits }

/** One line of the cut list on one sheet: everything to mark it from. */
export function PrintCard({ card, member, units }: Props) {
  return (
    <div className="space-y-4">
      <div>
        <p>
          <span className="font-semibold">{card.section}</span> · {card.quantityWords} ·{' '}
          {card.pitchText} pitch
        </p>
        <p className="text-ink-soft">{card.handWords}</p>
      </div>
      <dl className="grid grid-cols-2 gap-3">
        <BigFigure figure={card.cutLength} />
        <BigFigure figure={card.setOutLength} />
        {card.edges.map((figure) => (
          <BigFigure key={figure.label} figure={figure} />
        ))}
      </dl>
      <TimberDrawing member={member} units={units} />
      <div className="grid grid-cols-2 items-start gap-x-8 gap-y-3">
        {card.ends.map((end) =>
          end.points.length > 0 || end.cuts.some((cut) => cut.bearsOn || cut.pastSaw) ? (
            <Part key={end.title} title={end.title}>
              <Figures figures={end.points} />
              {end.cuts.map((cut, i) => (
                <div key={i}>
                  {cut.bearsOn ? <p>{bearsText(cut)}.</p> : null}
                  {cut.sawWords.map((words) => (
                    <p key={words} className="font-semibold text-stop">
                      {words}
                    </p>
                  ))}
                </div>
              ))}
            </Part>
          ) : null,
        )}
        {card.birdsmouth ? (
          <Part title="Birdsmouth">
            <Figures figures={card.birdsmouth.figures} />
            {card.birdsmouth.bevels.map((bevel) => (
              <p key={bevel.label}>
                {bevel.label}: {bevelWords(bevel)}
              </p>
            ))}
          </Part>
        ) : null}
        <Part title="Further">
          <Figures
            figures={[
              ...(card.tailLength ? [card.tailLength] : []),
              ...(card.drop ? [card.drop] : []),
              ...card.further,
            ]}
          />
          {card.backing.map((bevel) => (
            <p key={bevel.label}>
              {bevel.label}: {bevelWords(bevel)}
            </p>
          ))}
          {card.dish ? <p className="font-semibold">{card.dish}</p> : null}
          {card.planing.map((words) => (
            <p key={words}>{words}</p>
          ))}
        </Part>
      </div>
      {card.warnings.map(({ text, remedy }) => (
        <Note key={text} kind="caution" title={text}>
          <p className="text-sm">{remedy}</p>
        </Note>
      ))}
      <p className="font-semibold">{cutOneFirst}</p>
    </div>
  )
}

function BigFigure({ figure }: { figure: MarkingFigure }) {
  return (
    <div>
      <dt className="text-sm font-semibold text-ink-soft">{figure.label}</dt>
      <dd>
        <span className="numeral text-[1.75rem]">{figure.text}</span>{' '}
        <span className="text-sm">{figure.unit}</span>
        <span className="block text-sm text-ink-soft">{figure.note}</span>
      </dd>
    </div>
  )
}

function Part({ title, children }: { title: string; children: ReactNode }) {
  return (
    <section className="break-inside-avoid">
      <h3 className="font-extrabold">{title}</h3>
      {children}
    </section>
  )
}

function Figures({ figures }: { figures: MarkingFigure[] }) {
  return (
    <dl className="divide-y divide-rule border-b border-rule">
      {figures.map((figure) => (
        <div key={figure.label} className="flex items-baseline justify-between gap-3 py-1">
          <dt>
            {figure.label}
            {figure.note ? <span className="text-sm text-ink-soft"> {figure.note}</span> : null}
          </dt>
          <dd className="shrink-0 whitespace-nowrap">
            <span className="text-lg font-extrabold tabular-nums">{figure.text}</span>{' '}
            <span className="text-sm">{figure.unit}</span>
          </dd>
        </div>
      ))}
    </dl>
  )
}
