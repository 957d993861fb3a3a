import { useQuery } from '@tanstack/react-query'
import { useState } from 'react'
import { Link, useNavigate, useParams, useSearchParams } from 'react-router-dom'
import { roleNames } from '../../../shared/auth/roles.ts'
import { formatDay } from '../../../shared/calendar/days.ts'
import type { Crew, Person } from '../../../shared/people/people-schemas.ts'
import { CrewPennant } from '../../drawings/crew-pennant.tsx'
import { failureText } from '../../lib/failure-text.ts'
import { Badge } from '../../ui/badge.tsx'
import { Button } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { PageHeader } from '../../ui/page-header.tsx'
import { SearchBox } from '../../ui/search-box.tsx'
import { EmptyState, ErrorState } from '../../ui/states.tsx'
import { PageSkeleton } from '../../ui/skeleton.tsx'
import { CrewForm } from './crew-form.tsx'
import { peopleQueries } from './people-queries.ts'
import { PersonForm } from './person-form.tsx'
import { PersonPanel } from './person-panel.tsx'

function PersonRow({
  person,
  crew,
  search,
}: {
  person: Person
  crew: Crew | undefined
  search: string
}) {
  const leave = person.leave[0]
  return (
    <li>
      <Link
        to={{ pathname: `/people/${person.id}`, search }}
        className="grid min-h-14 grid-cols-[2.5rem_1fr] items-center gap-x-3 gap-y-1 rounded-md border border-rule bg-sheet px-3 py-2 hover:border-ink-soft md:grid-cols-[2.5rem_2fr_1fr_2fr_1.5fr]"
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
          {person.active ? null : <Badge kind="stop">No access</Badge>}
          {person.active && person.invited ? <Badge kind="ochre">Not signed in yet</Badge> : null}
          {leave ? <Badge kind="chalk">Away from {formatDay(leave.startsOn)}</Badge> : null}
        </span>
      </Link>
    </li>
  )
}

function Crews({ crews, people }: { crews: Crew[]; people: Person[] }) {
  const [editing, setEditing] = useState<Crew | 'new' | null>(null)
  return (
    <section className="mb-8">
      <div className="mb-2 flex items-center justify-between gap-3">
        <h2 className="text-lg font-extrabold">Crews</h2>
        <Button kind="plain" onClick={() => setEditing('new')}>
          Add a crew
        </Button>
      </div>
      {crews.length === 0 ? (
        <EmptyState title="No crews yet">Add one, then put people in it.</EmptyState>
      ) : null}
      <ul className="grid gap-3 sm:grid-cols-2 xl:grid-cols-3">
        {crews.map((crew) => (
          <li key={crew.id}>
            <button
              type="button"
              onClick={() => setEditing(crew)}
              className="flex min-h-14 w-full items-center gap-3 rounded-md border border-rule bg-sheet px-3 py-2 text-left hover:border-ink-soft"
            >
              <CrewPennant
                letter={crew.letter}
                colour={crew.colour}
                name={crew.name}
                className="h-8 w-10 text-lg"
              />
              <span>
                <span className="block font-semibold">{crew.name}</span>
                <span className="block text-sm text-ink-soft">
                  {people.filter((person) => person.active && person.crewId === crew.id).length}{' '}
                  people today
                </span>
              </span>
            </button>
          </li>
        ))}
      </ul>
      <Dialog
        open={editing !== null}
        onClose={() => setEditing(null)}
        title={editing === 'new' ? 'Add a crew' : 'Crew'}
      >
        <CrewForm
          crew={editing === 'new' ? null : editing}
          crews={crews}
          onDone={() => setEditing(null)}
        />
      </Dialog>
    </section>
  )
}

/** Everybody who works here, their crews and leave. */
export function PeoplePage() {
  const people = useQuery(peopleQueries.list())
  const crews = useQuery(peopleQueries.crews())
  const [params, setParams] = useSearchParams()
  const { personId } = useParams()
  const navigate = useNavigate()
  const search = params.get('q') ?? ''
  const close = () => void navigate({ pathname: '/people', search: params.toString() })
  const failed = people.error ?? crews.error
  if (failed) {
    return (
      <ErrorState
        message={failureText(failed) ?? ''}
        onRetry={() => void Promise.all([people.refetch(), crews.refetch()])}
      />
    )
  }
  if (!people.data || !crews.data) return <PageSkeleton />
  const everybody = people.data.people
  const wanted = search.toLowerCase()
  const shown = everybody.filter((person) =>
    `${person.name} ${person.email}`.toLowerCase().includes(wanted),
  )
  const open = everybody.find((person) => person.id === personId)
  return (
    <>
      <PageHeader
        title="People"
        actions={<Button onClick={() => void navigate('/people/new')}>Add a person</Button>}
      />
      {personId && personId !== 'new' && !open ? (
        <div className="mb-4">
          <ErrorState message="Nobody by that address is here. The link may be old." />
        </div>
      ) : null}
      <Crews crews={crews.data.crews} people={everybody} />
      <section>
        <h2 className="mb-2 text-lg font-extrabold">Everybody</h2>
        <SearchBox
          className="mb-3 max-w-sm"
          label="Find by name or e-mail"
          maxLength={80}
          value={search}
          onChange={(q) => setParams(q ? { q } : {}, { replace: true })}
        />
        {shown.length === 0 ? (
          <EmptyState title="Nobody by that name">Clear the search to see everybody.</EmptyState>
        ) : null}
        <ul className="space-y-2">
          {shown.map((person) => (
            <PersonRow
              key={person.id}
              person={person}
              crew={crews.data.crews.find((crew) => crew.id === person.crewId)}
              search={params.toString()}
            />
          ))}
        </ul>
      </section>
      {open ? (
        <PersonPanel key={open.id} person={open} crews={crews.data.crews} onClose={close} />
      ) : null}
      <Dialog open={personId === 'new'} onClose={close} title="Add a person" place="panel">
        <PersonForm person={null} crews={crews.data.crews} onDone={close} />
      </Dialog>
    </>
  )
}
