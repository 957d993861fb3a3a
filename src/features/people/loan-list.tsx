import { dayNear } from '../../../shared/people/leave-words.ts'
import { failureText } from '../../lib/failure-text.ts'
import { useSession } from '../../lib/session.ts'
import { Button } from '../../ui/button.tsx'
import { FormFailure } from '../../ui/form-failure.tsx'
import { useToast } from '../../ui/toast.tsx'
import { useAddLoan, useDropLoan } from './time-queries.ts'

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
  const toast = useToast()
  const back = ({ personId: id, crewId, day, note }: LoanRow) =>
    add.mutate(
      { id, crewId, day, note },
      { onError: (error) => toast(failureText(error) ?? '', { kind: 'stop' }) },
    )
  const takeBack = (loan: LoanRow) =>
    drop.mutate(
      { id: loan.personId, loanId: loan.id },
      { onSuccess: () => toast('Day taken back.', { undo: () => back(loan) }) },
    )
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
      <FormFailure error={drop.error} />
    </>
  )
}
