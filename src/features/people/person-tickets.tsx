import { useState } from 'react'
import type { PersonDetail } from '../../../shared/people/people-schemas.ts'
import type { Ticket } from '../../../shared/people/ticket-schemas.ts'
import { ticketTitle } from '../../../shared/people/ticket-words.ts'
import { TicketLine } from '../../drawings/ticket-line.tsx'
import { useSession } from '../../lib/session.ts'
import { AskOnce } from '../../ui/ask-once.tsx'
import { Button } from '../../ui/button.tsx'
import { PanelSection } from './panel-section.tsx'
import { PhotoButton } from './photo-button.tsx'
import { TicketForm } from './ticket-form.tsx'
import { photoPath, useDropPhoto, useDropTicket } from './ticket-queries.ts'

type Asking = { what: 'ticket' | 'photo'; ticket: Ticket }

/** Asks once before a ticket, or the photo of its card, goes for good. */
function Removal({
  personId,
  asking,
  onClose,
}: {
  personId: string
  asking: Asking
  onClose: () => void
}) {
  const dropTicket = useDropTicket()
  const dropPhoto = useDropPhoto()
  const { what, ticket } = asking
  const drop = what === 'ticket' ? dropTicket : dropPhoto
  const title = ticketTitle(ticket)
  const number = ticket.number ? `, no. ${ticket.number},` : ''
  const text =
    what === 'photo'
      ? `The photo of the card for ${title}${number} goes for good. The ticket stays.`
      : `${title}${number} goes for good${ticket.photoAt ? ', and the photo of its card with it' : ''}.`
  return (
    <AskOnce
      open
      title={what === 'ticket' ? 'Remove this ticket' : 'Remove this photo'}
      text={text}
      doWords="Remove it"
      keepWords="Keep it"
      busy={drop.isPending}
      error={drop.error}
      onDo={() => drop.mutate({ personId, ticketId: ticket.id }, { onSuccess: onClose })}
      onClose={onClose}
    />
  )
}

type ItemProps = { personId: string; ticket: Ticket; onAsk: (what: Asking['what']) => void }

function ChangeTicket({ personId, ticket, onAsk, onDone }: ItemProps & { onDone: () => void }) {
  return (
    <div className="rounded-md border border-rule bg-paper p-3">
      <TicketForm key={ticket.version} personId={personId} ticket={ticket} onDone={onDone} />
      <div className="mt-3 flex flex-wrap gap-2 border-t border-rule pt-3">
        {ticket.photoAt ? (
          <Button kind="danger" onClick={() => onAsk('photo')}>
            Remove the photo
          </Button>
        ) : null}
        <Button kind="danger" onClick={() => onAsk('ticket')}>
          Remove the ticket
        </Button>
      </div>
    </div>
  )
}

function TicketItem({ personId, ticket, onAsk }: ItemProps) {
  const { firm } = useSession()
  const [isChanging, setIsChanging] = useState(false)
  const title = ticketTitle(ticket)
  const owned = { personId, ticketId: ticket.id }
  return (
    <TicketLine
      ticket={ticket}
      today={firm.today}
      photoPath={photoPath(owned)}
      below={
        isChanging ? (
          <ChangeTicket
            personId={personId}
            ticket={ticket}
            onAsk={onAsk}
            onDone={() => setIsChanging(false)}
          />
        ) : null
      }
    >
      <div className="-ml-2 flex flex-wrap">
        <PhotoButton owned={owned} title={title} hasPhoto={ticket.photoAt !== null} />
        <Button
          kind="quiet"
          className="!px-2"
          aria-expanded={isChanging}
          aria-label={isChanging ? `Close ${title}` : `Change ${title}`}
          onClick={() => setIsChanging(!isChanging)}
        >
          {isChanging ? 'Close' : 'Change'}
        </Button>
      </div>
    </TicketLine>
  )
}

export function PersonTickets({ person }: { person: PersonDetail }) {
  const [asking, setAsking] = useState<Asking | null>(null)
  return (
    <PanelSection
      title="Tickets"
      action="Add a ticket"
      form={(close) => <TicketForm personId={person.id} ticket={null} onDone={close} />}
    >
      {person.tickets.length === 0 ? <p className="text-ink-soft">None kept yet.</p> : null}
      <ul className="divide-y divide-rule">
        {person.tickets.map((ticket) => (
          <TicketItem
            key={ticket.id}
            personId={person.id}
            ticket={ticket}
            onAsk={(what) => setAsking({ what, ticket })}
          />
        ))}
      </ul>
      {asking ? (
        <Removal personId={person.id} asking={asking} onClose={() => setAsking(null)} />
      ) : null}
    </PanelSection>
  )
}
