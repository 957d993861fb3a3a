import { useQuery } from '@tanstack/react-query'
import { Link } from 'react-router-dom'
import { roleNames } from '../../../shared/auth/roles.ts'
import { dayNear } from '../../../shared/people/leave-words.ts'
import type { Crew, CrewPeople, Person } from '../../../shared/people/people-schemas.ts'
import { failureText } from '../../lib/failure-text.ts'
import { useSession } from '../../lib/session.ts'
import { Dialog } from '../../ui/dialog.tsx'
import { Fold } from '../../ui/fold.tsx'
import { PageSkeleton } from '../../ui/skeleton.tsx'
import { ErrorState } from '../../ui/states.tsx'
import { CrewForm } from './crew-form.tsx'
import { LoanForm } from './loan-form.tsx'
import { LoanList } from './loan-list.tsx'
import { PanelParts, PanelSection } from './panel-section.tsx'
import { peopleQueries } from './people-queries.ts'

type Props = { crew: Crew; crews: Crew[]; people: Person[]; onClose: () => void }
type Member = CrewPeople['members'][number]

function spanText({ startsOn, endsOn }: Member, today: string): string {
  const start = dayNear(startsOn, today)
  if (startsOn > today) return endsOn ? `${start} to ${dayNear(endsOn, today)}` : `from ${start}`
  if (endsOn === null) return `since ${start}`
  return endsOn < today
    ? `${start} to ${dayNear(endsOn, today)}`
    : `until ${dayNear(endsOn, today)}`
}

/** Leading hands first, then by name. */
function byRole(a: Member, b: Member): number {
  const lead = (member: Member) => Number(member.role === 'leading-hand')
  return lead(b) - lead(a) || a.name.localeCompare(b.name)
}

function Members({ members, today }: { members: Member[]; today: string }) {
  return (
    <ul className="divide-y divide-rule">
      {members.map((member) => (
        <li key={member.id} className="sm:flex sm:items-center sm:justify-between sm:gap-x-4">
          <Link
            to={`/people/${member.personId}`}
            className="flex min-h-11 items-center font-semibold text-chalk underline"
          >
            {member.name}
          </Link>
          <span className="block pb-2 text-ink-soft sm:pb-0">
            {roleNames[member.role]}, {spanText(member, today)}
          </span>
        </li>
      ))}
    </ul>
  )
}

function Parts({ crew, crews, people, seen }: Omit<Props, 'onClose'> & { seen: CrewPeople }) {
  const { firm } = useSession()
  const stays = (member: Member) => member.endsOn === null || member.endsOn >= firm.today
  const now = seen.members.filter(stays).sort(byRole)
  const past = seen.members.filter((member) => !stays(member))
  // Those who work in crews first.
  const others = people
    .filter((person) => person.active && person.crewId !== crew.id)
    .sort((a, b) => Number(a.crewId === null) - Number(b.crewId === null))
  const loans = seen.loans.map((loan) => ({ ...loan, crewId: crew.id, words: loan.name }))
  return (
    <>
      <PanelSection
        title="In the crew"
        action="Name and pennant"
        form={(close) => <CrewForm crew={crew} crews={crews} onDone={close} />}
      >
        {now.length === 0 ? (
          <p className="text-ink-soft">
            {crew.active ? 'Nobody is in it. Open a person and move them here.' : 'Not in use.'}
          </p>
        ) : null}
        <Members members={now} today={firm.today} />
        {past.length > 0 ? (
          <Fold title={`Were in it (${past.length})`}>
            <Members members={past} today={firm.today} />
          </Fold>
        ) : null}
      </PanelSection>
      <PanelSection
        title="Borrowed"
        {...(crew.active && others.length > 0
          ? {
              action: 'Borrow for a day',
              form: (close: () => void) => (
                <LoanForm choose="person" people={others} crews={[crew]} onDone={close} />
              ),
            }
          : {})}
      >
        {loans.length === 0 ? <p className="text-ink-soft">Nobody from today on.</p> : null}
        <LoanList loans={loans} />
      </PanelSection>
    </>
  )
}

/** One crew beside the list: who is, was and will be in it, and whom it borrows. */
export function CrewPanel({ crew, crews, people, onClose }: Props) {
  const seen = useQuery(peopleQueries.crewPeople(crew.id))
  return (
    <Dialog open onClose={onClose} title={crew.name} place="panel">
      {seen.data ? (
        <PanelParts>
          <Parts crew={crew} crews={crews} people={people} seen={seen.data} />
        </PanelParts>
      ) : seen.error ? (
        <ErrorState message={failureText(seen.error) ?? ''} onRetry={() => void seen.refetch()} />
      ) : (
        <PageSkeleton />
      )}
    </Dialog>
  )
}
