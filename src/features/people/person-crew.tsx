import { dayNear } from '../../../shared/people/leave-words.ts'
import type { Crew, PersonDetail } from '../../../shared/people/people-schemas.ts'
import { useSession } from '../../lib/session.ts'
import { Button } from '../../ui/button.tsx'
import { Fold } from '../../ui/fold.tsx'
import { FormFailure } from '../../ui/form-failure.tsx'
import { crewName } from './crew-name.ts'
import { LoanForm } from './loan-form.tsx'
import { LoanList } from './loan-list.tsx'
import { MoveForm } from './move-form.tsx'
import { PanelSection } from './panel-section.tsx'
import { useTellMove } from './use-tell-move.ts'
import { type Say, useUndoLine } from './use-undo-line.tsx'

type Props = { person: PersonDetail; crews: Crew[] }

function PlannedMove({ person, crews, say }: Props & { say: Say }) {
  const { firm } = useSession()
  const { move, tell } = useTellMove(person, crews, say)
  const { nextMove, crewId } = person
  if (!nextMove) return null
  const words = `From ${dayNear(nextMove.from, firm.today)}: ${crewName(crews, nextMove.crewId)}`
  return (
    <>
      <p className="flex items-center justify-between gap-3">
        {words}
        <Button
          kind="quiet"
          busy={move.isPending}
          aria-label={`Take back: ${words}`}
          onClick={() => tell({ crewId, from: nextMove.from })}
        >
          Take back
        </Button>
      </p>
      <FormFailure error={move.error} />
    </>
  )
}

function History({ person, crews }: Props) {
  const { firm } = useSession()
  const past = person.memberships.filter((row) => row.startsOn <= firm.today)
  if (past.length === 0) return null
  const spanOf = ({ startsOn, endsOn }: (typeof past)[number]) =>
    endsOn
      ? `${dayNear(startsOn, firm.today)} to ${dayNear(endsOn, firm.today)}`
      : `since ${dayNear(startsOn, firm.today)}`
  return (
    <Fold title="Crews so far">
      <ul className="divide-y divide-rule">
        {past.map((row) => (
          <li key={row.id} className="flex flex-wrap justify-between gap-x-4 py-2">
            <span className="font-semibold">{crewName(crews, row.crewId)}</span>
            <span>{spanOf(row)}</span>
          </li>
        ))}
      </ul>
    </Fold>
  )
}

function sinceText({ memberships, crewId }: PersonDetail, today: string): string {
  const now = memberships.find((row) => row.crewId === crewId && row.startsOn <= today)
  return now ? `, since ${dayNear(now.startsOn, today)}` : ''
}

/** The crew now and next, who it was, and days with another one. */
export function PersonCrew({ person, crews }: Props) {
  const { firm } = useSession()
  const { line, say } = useUndoLine()
  const others = crews.filter((crew) => crew.active && crew.id !== person.crewId)
  const loans = person.loans.map((loan) => ({
    ...loan,
    personId: person.id,
    words: `with ${crewName(crews, loan.crewId)}`,
  }))
  return (
    <>
      <PanelSection
        title="Crew"
        action="Move"
        form={(close) => <MoveForm person={person} crews={crews} say={say} onDone={close} />}
      >
        <p>
          Now in <span className="font-semibold">{crewName(crews, person.crewId)}</span>
          {sinceText(person, firm.today)}.
        </p>
        <PlannedMove person={person} crews={crews} say={say} />
        {line}
        <History person={person} crews={crews} />
      </PanelSection>
      {others.length > 0 ? (
        <PanelSection
          title="Days with another crew"
          action="Lend for a day"
          form={(close) => (
            <LoanForm choose="crew" people={[person]} crews={others} onDone={close} />
          )}
        >
          {loans.length === 0 ? <p className="text-ink-soft">None from today on.</p> : null}
          <LoanList loans={loans} />
        </PanelSection>
      ) : null}
    </>
  )
}
