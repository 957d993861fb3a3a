import { dayNear } from '../../../shared/people/leave-words.ts'
import { useSession } from '../../lib/session.ts'
import { Button } from '../../ui/button.tsx'
import { FormFailure } from '../../ui/form-failure.tsx'
import { useAddLoan, useDropLoan } from './time-queries.ts'
import { useUndoLine } from './use-undo-line.tsx'

export type LoanRow = {
  id: string
  personId: string
  crewId: string
  day: string
  note: string
  /** With whom, or who. */
  words: string
}

/** Days that somebody is lent, each to take back, and the taking back to undo. */
export function LoanList({ loans }: { loans: LoanRow[] }) {
  const { firm } = useSession()
  const drop = useDropLoan()
  const add = useAddLoan()
  const { line, say } = useUndoLine()
  const takeBack = (loan: LoanRow) => {
    const { personId: id, crewId, day, note } = loan
    drop.mutate(
      { id, loanId: loan.id },
      {
        onSuccess: () =>
          say(`Taken back: ${dayNear(day, firm.today)} ${loan.words}.`, () =>
            add.mutateAsync({ id, crewId, day, note }),
          ),
      },
    )
  }
  return (
    <>
      <ul className="divide-y divide-rule">
        {loans.map((loan) => (
          <li key={loan.id} className="flex items-center justify-between gap-3 py-1">
            <span className="min-w-0 [overflow-wrap:anywhere]">
              <span className="font-semibold">{dayNear(loan.day, firm.today)}</span> {loan.words}
              {loan.note ? <span className="block text-ink-soft">{loan.note}</span> : null}
            </span>
            <Button
              kind="quiet"
              className="shrink-0"
              busy={drop.isPending && drop.variables.loanId === loan.id}
              aria-label={`Take back ${dayNear(loan.day, firm.today)} ${loan.words}`}
              onClick={() => takeBack(loan)}
            >
              Take back
            </Button>
          </li>
        ))}
      </ul>
      {line}
      <FormFailure error={drop.error} />
    </>
  )
}
