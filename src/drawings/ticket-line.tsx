import { IdCard } from 'lucide-react'
import { type ReactNode, useState } from 'react'
import type { Day } from '../../shared/calendar/days.ts'
import type { Ticket } from '../../shared/people/ticket-schemas.ts'
import { ticketState, ticketStateText, ticketTitle } from '../../shared/people/ticket-words.ts'
import { Dialog } from '../ui/dialog.tsx'
import { FlagLine } from '../ui/flag-line.tsx'
import { Note } from '../ui/states.tsx'

type Props = {
  ticket: Ticket
  today: Day
  /** Where the photo of its card is read from. */
  photoPath: string
  /** Beside the card. */
  children?: ReactNode
  /** Under it, over the whole width. */
  below?: ReactNode
}

function TicketTime({ ticket, today }: { ticket: Ticket; today: Day }) {
  const state = ticketState(ticket, today)
  const text = ticketStateText(ticket, today)
  if (state === 'holds') return <span className="block">{text}</span>
  return (
    <FlagLine weight={state === 'lapsed' ? 'clash' : 'caution'}>
      {state === 'lapsing' ? `${text}, lapses soon` : text}
    </FlagLine>
  )
}

function CardPhoto({ src, title }: { src: string; title: string }) {
  const [isOpen, setIsOpen] = useState(false)
  const [isBroken, setIsBroken] = useState(false)
  const alt = `Card: ${title}`
  return (
    <>
      <button
        type="button"
        onClick={() => setIsOpen(true)}
        className="h-16 w-24 shrink-0 overflow-hidden rounded-sm border border-rule"
        aria-label={`Show the card of ${title}`}
      >
        {isBroken ? (
          <span className="text-sm text-ink-soft">Photo not loaded</span>
        ) : (
          <img
            src={src}
            alt=""
            loading="lazy"
            className="h-full w-full object-cover"
            onError={() => setIsBroken(true)}
          />
        )}
      </button>
      <Dialog open={isOpen} onClose={() => setIsOpen(false)} title={title}>
        {isBroken ? (
          <Note kind="caution" title="The photo could not be loaded">
            Check the signal, then open this page again.
          </Note>
        ) : (
          <img src={src} alt={alt} className="mx-auto max-h-[70vh] rounded-sm" />
        )}
      </Dialog>
    </>
  )
}

/** A ticket: its card, what it is for, its number and how long it holds. */
export function TicketLine({ ticket, today, photoPath, children, below }: Props) {
  const title = ticketTitle(ticket)
  const src = ticket.photoAt ? `${photoPath}?at=${Date.parse(ticket.photoAt)}` : null
  return (
    <li className="flex flex-wrap gap-x-3 py-3">
      {src ? (
        <CardPhoto key={src} src={src} title={title} />
      ) : (
        <span
          aria-hidden
          className="flex h-16 w-24 shrink-0 items-center justify-center rounded-sm border border-dashed border-rule text-ink-soft"
        >
          <IdCard size={28} />
        </span>
      )}
      <div className="min-w-0 flex-1">
        <p className="font-semibold [overflow-wrap:anywhere]">{title}</p>
        {ticket.number ? (
          <p className="text-ink-soft [overflow-wrap:anywhere]">No. {ticket.number}</p>
        ) : null}
        <TicketTime ticket={ticket} today={today} />
        {children}
      </div>
      {below ? <div className="mt-2 w-full">{below}</div> : null}
    </li>
  )
}
