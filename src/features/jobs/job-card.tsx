import { CircleAlert } from 'lucide-react'
import { Link } from 'react-router-dom'
import type { JobCard as Card } from '../../../shared/jobs/job-views.ts'
import { CrewPennant } from '../../drawings/crew-pennant.tsx'
import { RoofGlyph } from '../../drawings/roof-glyph.tsx'
import { useSession } from '../../lib/session.ts'
import { bookingDaysText, dayText, unbroken } from './day-words.ts'
import { missingText } from './missing-text.ts'
import { NoRoofGlyph } from './no-roof-glyph.tsx'

const glyphPx = 40

function roofText(card: Card): string | null {
  if (card.latestLetter) return `Roof ${card.latestLetter}`
  return card.hasDraft ? 'Roof in draft' : null
}

function CardTiming({ card }: { card: Card }) {
  const { today } = useSession().firm
  const booking = card.nextBooking
  if (booking) {
    return (
      <span className="flex items-center gap-2 font-semibold">
        <CrewPennant
          letter={booking.crew.letter}
          colour={booking.crew.colour}
          name={booking.crew.name}
        />
        <span>
          {bookingDaysText(booking, today)}
          {booking.state === 'pencilled' ? (
            <span className="font-normal text-ink-soft"> in pencil</span>
          ) : null}
        </span>
      </span>
    )
  }
  if (!card.wantedBy || card.stage === 'complete') return null
  return <span className="text-ink-soft">Wanted by {unbroken(dayText(card.wantedBy, today))}</span>
}

/** A job on the board: its shape, where it is, when it is on, and what it lacks. */
export function JobCard({
  card,
  holding = {},
}: {
  card: Card
  /** How it is taken hold of, where it can be. */
  holding?: { 'aria-describedby'?: string }
}) {
  const roof = roofText(card)
  return (
    <Link
      {...holding}
      to={`/jobs/${card.id}`}
      draggable={false}
      className="block rounded-md border border-rule bg-sheet p-2.5 leading-snug hover:border-ink-soft"
    >
      <span className="flex items-center gap-2.5">
        {card.glyph ? (
          <RoofGlyph glyph={card.glyph} sizePx={glyphPx} />
        ) : (
          <NoRoofGlyph sizePx={glyphPx} />
        )}
        <span className="min-w-0 flex-1 text-sm text-ink-soft">
          <span className="block font-semibold tabular-nums [overflow-wrap:anywhere]">
            {card.number}
          </span>
          {roof ? <span className="block">{roof}</span> : null}
        </span>
      </span>
      <span className="mt-1 line-clamp-4 font-semibold [overflow-wrap:anywhere]">{card.title}</span>
      {card.siteAddress ? (
        <span className="mt-0.5 line-clamp-2 text-sm text-ink-soft [overflow-wrap:anywhere]">
          {card.siteAddress}
        </span>
      ) : null}
      <span className="mt-1.5 block space-y-1 text-sm empty:hidden">
        <CardTiming card={card} />
        {card.missing.length > 0 ? (
          <span className="flex items-start gap-1.5 text-ochre">
            <CircleAlert size={16} aria-hidden className="mt-0.5 shrink-0" />
            <span>{missingText(card.missing)}</span>
          </span>
        ) : null}
      </span>
    </Link>
  )
}
