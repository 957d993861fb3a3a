import { useQuery } from '@tanstack/react-query'
import { TicketLine } from '../../drawings/ticket-line.tsx'
import { failureText } from '../../lib/failure-text.ts'
import { useSession } from '../../lib/session.ts'
import { Card } from '../../ui/card.tsx'
import { Skeleton } from '../../ui/skeleton.tsx'
import { ErrorState } from '../../ui/states.tsx'
import { ownTicketsQuery } from './auth-queries.ts'

/** The tickets the office keeps of whoever is signed in. */
export function OwnTickets() {
  const { firm } = useSession()
  const own = useQuery(ownTicketsQuery)
  return (
    <Card>
      <h2 className="mb-1 text-lg font-extrabold">Your tickets</h2>
      <p className="text-ink-soft">Kept by the office. Tell them when one is renewed.</p>
      {own.data ? (
        <ul className="divide-y divide-rule">
          {own.data.tickets.map((ticket) => (
            <TicketLine
              key={ticket.id}
              ticket={ticket}
              today={firm.today}
              photoPath={`/api/account/tickets/${ticket.id}/photo`}
            />
          ))}
        </ul>
      ) : own.error ? (
        <ErrorState message={failureText(own.error) ?? ''} onRetry={() => void own.refetch()} />
      ) : (
        <Skeleton className="mt-3 h-16" />
      )}
      {own.data?.tickets.length === 0 ? <p className="mt-3">None kept yet.</p> : null}
    </Card>
  )
}
