import type { BevelDialData } from '../../shared/drawing/bevel-dials.ts'
import { angleText, bevelOf, edgeWord, squareWord } from '../../shared/marking/marking-figures.ts'

type Props = {
  dial: BevelDialData
  /** What the bevel is set to. */
  roundDeg: number
}

const centre = { x: 96, y: 26 }
const radius = 62
const whereWords = { side: 'On the side', top: 'Across the top', end: 'Off the top' } as const

/** One setting of the bevel: drawn as it lies on the timber, and read as the marking card reads it. */
export function BevelDial({ dial, roundDeg }: Props) {
  const bevel = bevelOf(dial.title, dial.where, dial.angle, { roundDeg })
  return (
    <div className="flex items-center gap-3 rounded-md border border-rule bg-sheet p-2 break-inside-avoid">
      {dial.where === 'end' ? <BackingDrawing dial={dial} /> : <DialDrawing dial={dial} />}
      <div className="min-w-0">
        <p className="flex items-center gap-2 text-sm font-semibold">
          <span className="inline-flex size-6 shrink-0 items-center justify-center rounded-full border border-ink text-sm font-extrabold">
            {dial.letter}
          </span>
          {dial.title}
        </p>
        <p className="text-sm">
          {whereWords[dial.where]}: {dial.uses.join(' · ')}
        </p>
        <p className="leading-tight">
          <span className="text-2xl font-extrabold tabular-nums">{bevel.fromSquareText}</span>{' '}
          <span className="text-sm">{squareWord(bevel)}</span>
        </p>
        <p className="leading-tight">
          <span className="text-2xl font-extrabold tabular-nums">{bevel.fromEdgeText}</span>{' '}
          <span className="text-sm">from {edgeWord(bevel)}</span>
        </p>
        <DialNotes dial={dial} roundDeg={roundDeg} />
      </div>
    </div>
  )
}

function DialNotes({ dial, roundDeg }: Props) {
  const tilt =
    dial.bladeTiltDeg === null ? [] : [`Blade tilt ${angleText(dial.bladeTiltDeg, { roundDeg })}`]
  const other = dial.otherTop
    ? [`${dial.otherTop.title} ${angleText(dial.otherTop.fromEdgeDeg, { roundDeg })} from edge`]
    : []
  return (
    <>
      {[...tilt, ...other].map((note) => (
        <p key={note} className="text-sm">
          {note}
        </p>
      ))}
      {dial.pastSaw && dial.where === 'top' ? (
        <p className="text-sm font-semibold text-stop">Past the saw's tilt</p>
      ) : null}
    </>
  )
}

/** Edge along the top, square line dashed, bevel heavy; foot of the timber to the left. */
function DialDrawing({ dial }: Pick<Props, 'dial'>) {
  const deg = dial.angle.fromEdgeDeg
  const isFlipped = dial.where === 'top' && dial.longSide === 'right'
  const bevel = onDial(deg, radius + 6)
  const square = onDial(90, radius + 6)
  const place = isFlipped ? 'matrix(1 0 0 -1 0 104)' : undefined
  return (
    <svg viewBox="0 0 132 104" width={132} height={104} aria-hidden="true" className="shrink-0">
      <g transform={place}>
        <path d={sector(deg)} className="fill-chalk opacity-20" />
        <path d={ticks()} className="fill-none stroke-ink-soft [stroke-width:1]" />
        <path d={`M2 ${centre.y}H130`} className="stroke-ink [stroke-width:3]" />
        <line
          x1={centre.x}
          y1={centre.y}
          x2={square.x}
          y2={square.y}
          className="stroke-ink-soft [stroke-width:1.25] [stroke-dasharray:4_3]"
        />
        <line
          x1={centre.x}
          y1={centre.y}
          x2={bevel.x}
          y2={bevel.y}
          strokeLinecap="round"
          className="stroke-clay [stroke-width:3.5]"
        />
      </g>
    </svg>
  )
}

/** A point on the dial; degrees from the edge towards the foot, turning down into the timber. */
function onDial(deg: number, atRadius: number): { x: number; y: number } {
  const turn = (deg * Math.PI) / 180
  return { x: centre.x - Math.cos(turn) * atRadius, y: centre.y + Math.sin(turn) * atRadius }
}

function sector(deg: number): string {
  const end = onDial(deg, radius)
  return `M${centre.x} ${centre.y}H${centre.x - radius}A${radius} ${radius} 0 0 0 ${end.x} ${end.y}Z`
}

function ticks(): string {
  return Array.from({ length: 13 }, (_, i) => i * 10)
    .map((deg) => {
      const from = onDial(deg, radius - (deg % 30 === 0 ? 8 : 4))
      const to = onDial(deg, radius)
      return `M${from.x} ${from.y}L${to.x} ${to.y}`
    })
    .join('')
}

/** The end of the timber: its square top dashed, the planed top heavy, as far as it is planed. */
function BackingDrawing({ dial }: Pick<Props, 'dial'>) {
  const fall = Math.tan((dial.angle.fromSquareDeg * Math.PI) / 180) * 30
  const isLeft = !dial.uses.includes('right edge')
  const isRight = !dial.uses.includes('left edge')
  // Backed it falls to its edges, dished to its middle.
  const isDish = dial.title === 'Dish'
  const middle = isDish ? 22 + fall : 22
  const left = isDish ? 22 + (isLeft ? 0 : fall) : 22 + (isLeft ? fall : 0)
  const right = isDish ? 22 + (isRight ? 0 : fall) : 22 + (isRight ? fall : 0)
  return (
    <svg viewBox="0 0 132 104" width={132} height={104} aria-hidden="true" className="shrink-0">
      <path
        d={`M36 ${left}L66 ${middle}L96 ${right}V98H36Z`}
        className="fill-paper stroke-ink [stroke-width:2]"
      />
      <path d="M36 22H96" className="stroke-ink-soft [stroke-width:1.25] [stroke-dasharray:4_3]" />
      <path
        d={`${isLeft ? `M36 ${left}L66 ${middle}` : ''}${isRight ? `M66 ${middle}L96 ${right}` : ''}`}
        strokeLinecap="round"
        className="fill-none stroke-clay [stroke-width:3.5]"
      />
    </svg>
  )
}
