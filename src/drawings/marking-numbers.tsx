import type { MarkingCard } from '../../shared/marking/marking-card.ts'
import {
  bearsText,
  cutsSawnAlike,
  type CutsSawnAlike,
  type MarkingCut,
  type MarkingEnd,
} from '../../shared/marking/marking-cuts.ts'
import {
  type MarkingBevel,
  edgeWord,
  type MarkingFigure,
  squareWord,
} from '../../shared/marking/marking-figures.ts'
import { pastSawSafety } from '../../shared/marking/saw-words.ts'

/** A length to read off at arm's length. */
export function FigureView({
  figure,
  isMain = false,
}: {
  figure: MarkingFigure
  isMain?: boolean
}) {
  return (
    <div className="min-w-0">
      <dt className="text-base print:text-xs font-semibold leading-tight">{figure.label}</dt>
      <dd className="leading-tight">
        <span
          className={`numeral ${isMain ? 'text-[2.5rem] print:text-xl' : 'text-[1.75rem] print:text-lg'}`}
        >
          {figure.text}
        </span>
        {figure.unit ? <span className="text-base print:text-xs"> {figure.unit}</span> : null}
        {figure.note ? <span className="block text-sm print:text-xs">{figure.note}</span> : null}
      </dd>
    </div>
  )
}

/** An angle both ways. */
export function BevelView({ bevel, extra }: { bevel: MarkingBevel; extra?: string | undefined }) {
  return (
    <div className="min-w-0">
      <dt className="text-base print:text-xs font-semibold leading-tight">{bevel.label}</dt>
      <dd className="flex flex-wrap items-baseline gap-x-4">
        <span className="whitespace-nowrap">
          <span className="numeral text-[1.75rem] print:text-lg">{bevel.fromSquareText}</span>{' '}
          <span className="text-base print:text-xs">{squareWord(bevel)}</span>
        </span>
        <span className="whitespace-nowrap">
          <span className="numeral text-[1.75rem] print:text-lg">{bevel.fromEdgeText}</span>{' '}
          <span className="text-base print:text-xs">from {edgeWord(bevel)}</span>
        </span>
        {extra ? <span className="text-base print:text-xs">{extra}</span> : null}
      </dd>
    </div>
  )
}

function isSquareDown({ kind }: MarkingCut): boolean {
  return kind === 'square cut' || kind === 'mitre'
}

/** What the bevels below do not say by themselves. */
function CutName({ name, cut }: { name: string; cut: MarkingCut }) {
  const kinds: Record<string, string> = { 'plumb cut': '', mitre: 'mitre, square down the side' }
  const kind = kinds[cut.kind] ?? cut.kind
  const saysSquare = cut.edge || cut.kind === 'square cut' || name === 'Square across'
  const across = saysSquare ? '' : 'square across the top'
  const words = [name, kind, across].filter(Boolean).join(', ')
  if (words === '') return null
  return (
    <p className="text-base print:text-xs font-semibold">
      {words.charAt(0).toUpperCase() + words.slice(1)}
    </p>
  )
}

function EndNumbers({ end }: { end: MarkingEnd }) {
  return (
    <div className="border-t border-rule pt-3 print:pt-1">
      <p className="mb-1 text-base print:text-xs font-extrabold">{end.title}</p>
      {end.points.length > 0 ? (
        <dl className="grid grid-cols-2 gap-x-4 gap-y-2">
          {end.points.map((point) => (
            <FigureView key={point.label} figure={point} />
          ))}
        </dl>
      ) : null}
      {cutsSawnAlike(end).map(({ name, first, cuts }, i) => (
        <div key={i} className="mt-2">
          <CutName name={name} cut={first} />
          <dl className="space-y-1">
            {isSquareDown(first) ? null : <BevelView bevel={first.face} />}
            {first.edge ? (
              <BevelView bevel={first.edge} extra={`blade tilt ${first.bladeTiltText}`} />
            ) : null}
            {first.edgeOtherTop ? (
              <div className="text-base print:text-xs">
                <dt className="inline">{first.edgeOtherTop.label}: </dt>
                <dd className="inline">
                  {first.edgeOtherTop.fromSquareText} {squareWord(first.edgeOtherTop)},{' '}
                  {first.edgeOtherTop.fromEdgeText} from edge
                </dd>
              </div>
            ) : null}
          </dl>
          {cuts.map(bearsText).map((text) =>
            text ? (
              <p key={text} className="text-base print:text-xs">
                {text}.
              </p>
            ) : null,
          )}
          {first.sawWords.length > 0 ? (
            <p className="mt-1 border-l-8 border-ochre pl-2 text-base print:text-xs font-semibold">
              {first.sawWords.join(' ')}
            </p>
          ) : null}
        </div>
      ))}
    </div>
  )
}

/** The length a piece is known by, on one line. */
export function CutLengthLine({ card }: { card: MarkingCard }) {
  const { cutLength } = card
  return (
    <p className="flex-1 text-base leading-tight print:text-xs">
      <span className="block text-sm font-semibold print:inline print:text-xs">
        {cutLength.label}{' '}
      </span>
      <span className="whitespace-nowrap">
        <span className="numeral text-[1.75rem] print:text-lg">{cutLength.text}</span>{' '}
        {cutLength.unit}
      </span>
    </p>
  )
}

/** What the saw waits for: the length, the head's points and its bevels. Paper shows every number. */
export function CutNumbers({ card }: { card: MarkingCard }) {
  const head = card.ends.find((end) => end.end === 'head')
  const points = head?.points ?? []
  return (
    <div className="space-y-2 print:hidden">
      <dl className="grid grid-cols-2 gap-x-4 gap-y-2">
        <FigureView figure={card.cutLength} isMain />
        <FigureView figure={{ ...card.setOutLength, note: '' }} />
        {[...card.edges, ...points].map((point) => (
          <FigureView key={point.label} figure={point} />
        ))}
      </dl>
      {head ? cutsSawnAlike(head).map((alike, i) => <CutBevels key={i} {...alike} />) : null}
      {card.ends.some((end) => end.cuts.some((cut) => cut.pastSaw)) ? (
        <p className="border-l-8 border-ochre pl-2 text-base font-semibold">
          Past the saw: the way round is under all numbers. {pastSawSafety}
        </p>
      ) : null}
    </div>
  )
}

function CutBevels({ name, first }: Pick<CutsSawnAlike, 'name' | 'first'>) {
  return (
    <>
      <CutName name={name} cut={first} />
      <dl className="space-y-1">
        {isSquareDown(first) ? null : <BevelView bevel={first.face} />}
        {first.edge ? (
          <BevelView bevel={first.edge} extra={`blade tilt ${first.bladeTiltText}`} />
        ) : null}
      </dl>
    </>
  )
}

/** Every number of a marking card, the ones the saw waits for first and largest. */
export function MarkingNumbers({ card }: { card: MarkingCard }) {
  return (
    <div className="space-y-3 print:space-y-1">
      <dl className="grid grid-cols-2 gap-x-4 gap-y-3">
        <FigureView figure={card.cutLength} isMain />
        <FigureView figure={card.setOutLength} isMain />
        {card.edges.map((figure) => (
          <FigureView key={figure.label} figure={figure} />
        ))}
      </dl>
      {card.ends.map((end) => (
        <EndNumbers key={end.end} end={end} />
      ))}
      <BirdsmouthNumbers card={card} />
      {card.backing.length > 0 || card.drop ? (
        <div className="border-t border-rule pt-3 print:pt-1">
          {card.dish ? (
            <p className="mb-1 text-base print:text-xs font-semibold">{card.dish}</p>
          ) : null}
          <dl className="space-y-1">
            {card.backing.map((bevel) => (
              <BevelView key={bevel.label} bevel={bevel} />
            ))}
            {card.drop ? <FigureView figure={card.drop} /> : null}
          </dl>
        </div>
      ) : null}
    </div>
  )
}

function BirdsmouthNumbers({ card }: { card: MarkingCard }) {
  const mouth = card.birdsmouth
  if (!mouth) return null
  return (
    <div className="border-t border-rule pt-3 print:pt-1">
      <p className="mb-1 text-base print:text-xs font-extrabold">Birdsmouth</p>
      <dl className="grid grid-cols-2 gap-x-4 gap-y-2 sm:grid-cols-3">
        {mouth.figures.map((figure) => (
          <FigureView key={figure.label} figure={figure} />
        ))}
      </dl>
      <dl className="mt-2 space-y-1">
        {mouth.bevels.map((bevel) => (
          <BevelView key={bevel.label} bevel={bevel} />
        ))}
      </dl>
    </div>
  )
}
