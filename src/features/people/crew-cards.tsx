import { Link } from 'react-router-dom'
import type { Crew, Person } from '../../../shared/people/people-schemas.ts'
import { CrewPennant } from '../../drawings/crew-pennant.tsx'
import { buttonClass } from '../../ui/button.tsx'
import { EmptyState } from '../../ui/states.tsx'
import { thereToday } from './people-shown.ts'

type Props = { crews: Crew[]; people: Person[]; today: string; search: string }

export function CrewCards({ crews, people, today, search }: Props) {
  return (
    <section className="mb-8">
      <div className="mb-2 flex items-center justify-between gap-3">
        <h2 className="text-lg font-extrabold">Crews</h2>
        <Link to={{ pathname: '/people/crews/new', search }} className={buttonClass('plain')}>
          Add a crew
        </Link>
      </div>
      {crews.length === 0 ? (
        <EmptyState title="No crews yet">Add one, then put people in it.</EmptyState>
      ) : null}
      <ul className="grid gap-3 sm:grid-cols-2 xl:grid-cols-3">
        {crews.map((crew) => {
          const there = thereToday(people, crew.id, today)
          return (
            <li key={crew.id}>
              <Link
                to={{ pathname: `/people/crews/${crew.id}`, search }}
                className="flex min-h-14 items-center gap-3 rounded-md border border-rule bg-sheet px-3 py-2 hover:border-ink-soft"
              >
                <CrewPennant
                  letter={crew.letter}
                  colour={crew.colour}
                  name={crew.name}
                  className="h-8 w-10 text-lg"
                />
                <span className="min-w-0">
                  <span className="block font-semibold [overflow-wrap:anywhere]">{crew.name}</span>
                  <span className="block text-sm text-ink-soft [overflow-wrap:anywhere]">
                    {!crew.active
                      ? 'Not in use'
                      : there.length === 0
                        ? 'Nobody there today'
                        : `Today: ${there.map((person) => person.name).join(', ')}`}
                  </span>
                </span>
              </Link>
            </li>
          )
        })}
      </ul>
    </section>
  )
}
