import { Link } from 'react-router-dom'
import { roleNames } from '../../../shared/auth/roles.ts'
import { nextAwayDay } from '../../../shared/people/leave-days.ts'
import { dayNear, leaveKindNames } from '../../../shared/people/leave-words.ts'
import type { Crew, Person } from '../../../shared/people/people-schemas.ts'
import { ticketState, ticketsToRenew, ticketTitle } from '../../../shared/people/ticket-words.ts'
import { CrewPennant } from '../../drawings/crew-pennant.tsx'
import { Badge } from '../../ui/badge.tsx'
import { crewName } from './crew-name.ts'

type Props = { person: Person; crews: Crew[]; today: string; search: string }

/** What the office should see without opening: access, tickets to renew, the next day away, a day lent. */
function Marks({ person, crews, today }: Omit<Props, 'search'>) {
  const away = person.leave
    .flatMap((leave) => {
      const day = nextAwayDay(leave, today)
      return day === null ? [] : [{ day, kind: leave.kind }]
    })
    .sort((a, b) => (a.day < b.day ? -1 : 1))[0]
  const link = person.link.state
  return (
    <>
      {person.active ? null : <Badge kind="stop">No access</Badge>}
      {person.active && person.invited ? (
        <Badge kind="ochre">
          {link === 'ended' || link === 'failed' ? 'Needs a new link' : 'Not signed in yet'}
        </Badge>
      ) : null}
      {ticketsToRenew(person.tickets, today).map((ticket) => {
        const isLapsed = ticketState(ticket, today) === 'lapsed'
        const last = ticket.expiresOn === null ? '' : dayNear(ticket.expiresOn, today)
        return (
          <Badge key={ticket.id} kind={isLapsed ? 'stop' : 'ochre'}>
            {ticketTitle(ticket)}: {isLapsed ? 'lapsed after' : 'last day'} {last}
          </Badge>
        )
      })}
      {person.lentToId ? (
        <Badge kind="chalk">With {crewName(crews, person.lentToId)} today</Badge>
      ) : null}
      {away ? (
        <Badge kind="chalk">
          {leaveKindNames[away.kind]} {away.day === today ? 'today' : dayNear(away.day, today)}
        </Badge>
      ) : null}
    </>
  )
}

export function PersonRow({ person, crews, today, search }: Props) {
  const crew = crews.find((each) => each.id === person.crewId)
  return (
    <li>
      <Link
        to={{ pathname: `/people/${person.id}`, search }}
        className="grid min-h-14 grid-cols-[2.5rem_1fr] items-center gap-x-3 gap-y-1 rounded-md border border-rule bg-sheet px-3 py-2 hover:border-ink-soft md:grid-cols-[2.5rem_1.5fr_1fr_2fr_2fr]"
      >
        {crew ? (
          <CrewPennant letter={crew.letter} colour={crew.colour} name={crew.name} />
        ) : (
          <span aria-hidden />
        )}
        <span className="font-semibold [overflow-wrap:anywhere]">{person.name}</span>
        <span className="col-start-2 text-ink-soft md:col-start-auto">
          {roleNames[person.role]}
        </span>
        <span className="col-start-2 text-ink-soft [overflow-wrap:anywhere] md:col-start-auto">
          {person.email}
        </span>
        <span className="col-start-2 flex flex-wrap gap-1 md:col-start-auto">
          <Marks person={person} crews={crews} today={today} />
        </span>
      </Link>
    </li>
  )
}
