import { useQuery } from '@tanstack/react-query'
import { roleNames } from '../../../shared/auth/roles.ts'
import type { Crew, Person, PersonDetail } from '../../../shared/people/people-schemas.ts'
import { failureText } from '../../lib/failure-text.ts'
import { Badge } from '../../ui/badge.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { PageSkeleton } from '../../ui/skeleton.tsx'
import { ErrorState } from '../../ui/states.tsx'
import { PanelParts, PanelSection } from './panel-section.tsx'
import { peopleQueries } from './people-queries.ts'
import { PersonCrew } from './person-crew.tsx'
import { PersonForm } from './person-form.tsx'
import { PersonHours } from './person-hours.tsx'
import { PersonLeave } from './person-leave.tsx'
import { PersonTickets } from './person-tickets.tsx'
import { SignInLink } from './sign-in-link.tsx'

type Props = { person: Person; crews: Crew[]; onClose: () => void }

const linkClass = 'inline-flex min-h-11 items-center text-chalk underline [overflow-wrap:anywhere]'

function Details({ person, crews }: { person: PersonDetail; crews: Crew[] }) {
  return (
    <PanelSection
      title="Details"
      action="Change"
      form={(close) => (
        <PersonForm key={person.version} person={person} crews={crews} onDone={close} />
      )}
    >
      <p>
        {roleNames[person.role]} {person.active ? null : <Badge kind="stop">No access</Badge>}
      </p>
      <p className="flex flex-wrap gap-x-4">
        <a href={`mailto:${person.email}`} className={linkClass}>
          {person.email}
        </a>
        {person.phone ? (
          <a href={`tel:${person.phone.replaceAll(/[^0-9+]/g, '')}`} className={linkClass}>
            {person.phone}
          </a>
        ) : null}
      </p>
    </PanelSection>
  )
}

function Parts({ person, crews }: { person: PersonDetail; crews: Crew[] }) {
  return (
    <>
      {person.invited && person.active ? (
        <PanelSection title="Link to sign in">
          <SignInLink person={person} />
        </PanelSection>
      ) : null}
      <Details person={person} crews={crews} />
      <PersonTickets person={person} />
      <PersonLeave person={person} />
      <PersonCrew person={person} crews={crews} />
      <PersonHours person={person} />
      {person.invited && person.active ? null : (
        <PanelSection title="Link to sign in">
          <SignInLink person={person} />
        </PanelSection>
      )}
    </>
  )
}

/** One person beside the list: details, tickets, leave, crew, hours, link to sign in. */
export function PersonPanel({ person, crews, onClose }: Props) {
  const detail = useQuery(peopleQueries.person(person.id))
  return (
    <Dialog open onClose={onClose} title={person.name} place="panel">
      {detail.data ? (
        <PanelParts>
          <Parts person={detail.data} crews={crews} />
        </PanelParts>
      ) : detail.error ? (
        <ErrorState
          message={failureText(detail.error) ?? ''}
          onRetry={() => void detail.refetch()}
        />
      ) : (
        <PageSkeleton />
      )}
    </Dialog>
  )
}
