import { useQuery } from '@tanstack/react-query'
import { Link, useNavigate, useParams, useSearchParams } from 'react-router-dom'
import type { Crew, Person } from '../../../shared/people/people-schemas.ts'
import { failureText } from '../../lib/failure-text.ts'
import { useSession } from '../../lib/session.ts'
import { buttonClass } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { Field } from '../../ui/field.tsx'
import { Select } from '../../ui/inputs.tsx'
import { PageHeader } from '../../ui/page-header.tsx'
import { SearchBox } from '../../ui/search-box.tsx'
import { PageSkeleton } from '../../ui/skeleton.tsx'
import { EmptyState, ErrorState } from '../../ui/states.tsx'
import { CrewCards } from './crew-cards.tsx'
import { CrewForm } from './crew-form.tsx'
import { CrewPanel } from './crew-panel.tsx'
import { peopleQueries } from './people-queries.ts'
import { isShown, isShownKind, type ShownKind, shownKinds } from './people-shown.ts'
import { PersonForm } from './person-form.tsx'
import { PersonPanel } from './person-panel.tsx'
import { PersonRow } from './person-row.tsx'

const kinds = Object.keys(shownKinds).filter(isShownKind)

/** What is looked for and what is shown, both in the address. */
function useSearch() {
  const [params, setParams] = useSearchParams()
  const show = params.get('show')
  const set = (name: string, value: string) => {
    const next = new URLSearchParams(params)
    if (value === '') next.delete(name)
    else next.set(name, value)
    setParams(next, { replace: true })
  }
  return {
    text: params.toString(),
    q: params.get('q') ?? '',
    show: isShownKind(show) ? show : ('all' satisfies ShownKind),
    setQ: (q: string) => set('q', q),
    setShow: (kind: string) => set('show', kind === 'all' ? '' : kind),
  }
}

function Everybody({ people, crews }: { people: Person[]; crews: Crew[] }) {
  const { firm } = useSession()
  const { text, q, show, setQ, setShow } = useSearch()
  const wanted = q.toLowerCase()
  const counted = (kind: ShownKind) => people.filter((one) => isShown(one, kind, firm.today))
  const shown = counted(show).filter((person) =>
    `${person.name} ${person.email}`.toLowerCase().includes(wanted),
  )
  return (
    <section>
      <h2 className="mb-2 text-lg font-extrabold">Everybody</h2>
      <div className="mb-3 grid gap-3 sm:max-w-2xl sm:grid-cols-2">
        <SearchBox label="Find by name or e-mail" maxLength={80} value={q} onChange={setQ} />
        <Field label="Show">
          <Select value={show} onChange={(event) => setShow(event.target.value)}>
            {kinds.map((kind) => (
              <option key={kind} value={kind}>
                {shownKinds[kind]} ({counted(kind).length})
              </option>
            ))}
          </Select>
        </Field>
      </div>
      {shown.length === 0 ? (
        <EmptyState title={q ? 'Nobody by that name' : `${shownKinds[show]}: nobody`}>
          Clear the search and show everybody to see all.
        </EmptyState>
      ) : null}
      <ul className="space-y-2">
        {shown.map((person) => (
          <PersonRow
            key={person.id}
            person={person}
            crews={crews}
            today={firm.today}
            search={text}
          />
        ))}
      </ul>
    </section>
  )
}

/** The person or the crew whose address this is, or the form for a new one. */
function Beside({ people, crews }: { people: Person[]; crews: Crew[] }) {
  const { personId, crewId } = useParams()
  const navigate = useNavigate()
  const { text } = useSearch()
  const close = () => void navigate({ pathname: '/people', search: text })
  const person = people.find((one) => one.id === personId)
  const crew = crews.find((one) => one.id === crewId)
  if (person) return <PersonPanel key={person.id} person={person} crews={crews} onClose={close} />
  if (crew)
    return <CrewPanel key={crew.id} crew={crew} crews={crews} people={people} onClose={close} />
  return (
    <>
      <Dialog open={personId === 'new'} onClose={close} title="Add a person" place="panel">
        <PersonForm person={null} crews={crews} onDone={close} />
      </Dialog>
      <Dialog open={crewId === 'new'} onClose={close} title="Add a crew" place="panel">
        <CrewForm crew={null} crews={crews} onDone={close} />
      </Dialog>
    </>
  )
}

function isMissing(id: string | undefined, rows: { id: string }[]): boolean {
  return id !== undefined && id !== 'new' && rows.every((row) => row.id !== id)
}

/** Everybody who works here, their crews, tickets and leave. */
export function PeoplePage() {
  const people = useQuery(peopleQueries.list())
  const crews = useQuery(peopleQueries.crews())
  const { firm } = useSession()
  const { personId, crewId } = useParams()
  const { text } = useSearch()
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
  const all = crews.data.crews
  return (
    <>
      <PageHeader
        title="People"
        actions={
          <Link to={{ pathname: '/people/new', search: text }} className={buttonClass()}>
            Add a person
          </Link>
        }
      />
      {isMissing(personId, everybody) || isMissing(crewId, all) ? (
        <div className="mb-4">
          <ErrorState message="Nobody by that address is here. The link may be old." />
        </div>
      ) : null}
      <CrewCards crews={all} people={everybody} today={firm.today} search={text} />
      <Everybody people={everybody} crews={all} />
      <Beside people={everybody} crews={all} />
    </>
  )
}
